import { describe, expect, test } from 'vitest';
import { emptySketch, freshGroupId, freshPartId, freshPositionId } from '../../../engine/sketch/create.ts';
import { setFocalLength, setSemiDiameter } from '../../../engine/sketch/edits/parts.ts';
import { setTitle } from '../../../engine/sketch/edits/text.ts';
import { propose, type Settling, unsettled } from '../../../engine/sketch/propose.ts';
import type { Sketch } from '../../../engine/sketch/types.ts';
import { id, row } from './layout.ts';

describe('the one door', () => {
  test('lets a sound edit through', () => {
    const proposal = propose(row(10), (sketch) => setFocalLength(sketch, id('p1'), 75), unsettled);
    expect(proposal).toEqual({
      sketch: setFocalLength(row(10), id('p1'), 75),
      settling: unsettled,
      note: null,
    });
  });

  test('gives back the sketch it was given when an edit is refused, with all that is wrong', () => {
    const before = row(10);
    const edit = (sketch: Sketch) => setSemiDiameter(setFocalLength(sketch, id('p1'), 0), id('p1'), -1);
    const proposal = propose(before, edit, unsettled);
    expect(proposal.sketch).toBe(before);
    expect(proposal.note?.faults.map((fault) => fault.path)).toEqual([
      'parts[0].semiDiameterMm',
      'parts[0].focalLengthMm',
    ]);
  });

  test('gives back the sketch it was given, without a note, when nothing changes', () => {
    const before = row(10);
    const proposal = propose(before, (sketch) => setTitle(sketch, sketch.title), unsettled);
    expect(proposal).toEqual({ sketch: before, settling: unsettled, note: null });
    expect(proposal.sketch).toBe(before);
  });

  test('asks the settling for sound changes only, and hands on what that answers', () => {
    const asked: [Sketch, Sketch][] = [];
    const settling: Settling = {
      settle: (before, edited) => {
        asked.push([before, edited]);
        return { sketch: setTitle(edited, 'settled'), settling, note: null };
      },
    };
    const before = row(10);
    propose(before, (sketch) => sketch, settling);
    propose(before, (sketch) => setFocalLength(sketch, id('p1'), 0), settling);
    expect(asked).toEqual([]);
    const proposal = propose(before, (sketch) => setTitle(sketch, 'edited'), settling);
    expect(proposal.sketch.title).toBe('settled');
    expect(asked).toEqual([[before, setTitle(before, 'edited')]]);
  });
});

describe('fresh ids', () => {
  test('are the first that are not in use', () => {
    expect(freshPartId(row(1, 1))).toBe('p3');
    expect(freshPartId({ ...row(1, 1, 1), parts: row(1, 1, 1).parts.slice(1) })).toBe('p1');
    expect(freshPositionId(emptySketch())).toBe('pos1');
    expect(freshGroupId(emptySketch())).toBe('g1');
  });
});
