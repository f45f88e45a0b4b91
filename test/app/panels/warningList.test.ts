import { describe, expect, it } from 'vitest';
import { listWarnings } from '../../../app/panels/warningList.ts';
import type { PartId, Sketch } from '../../../engine/index.ts';
import { setGap, setRoom } from '../../../engine/index.ts';
import { inspectionZoom, MIDDLE, NARROW, WIDE } from '../../engine/demo.ts';
import { empty } from './sketches.ts';

const idAt = (sketch: Sketch, index: number): PartId => sketch.parts[index]?.id ?? ('none' as PartId);

describe('the list of warnings', () => {
  it('is empty for the inspection zoom and for an empty sketch', () => {
    expect(listWarnings(inspectionZoom())).toEqual([]);
    expect(listWarnings(empty())).toEqual([]);
  });

  it('names the one position that a negative gap stands at, before what is only to be looked at', () => {
    const demo = inspectionZoom();
    const [first] = listWarnings(setGap(demo, idAt(demo, 0), -1, MIDDLE));
    expect(first?.warning.severity).toBe('cannot be built');
    expect(first?.warning.partId).toBe(idAt(demo, 0));
    expect(first?.positionIds).toEqual([MIDDLE]);
  });

  it('lists once what reads the same at every position', () => {
    const demo = inspectionZoom();
    const list = listWarnings(setRoom(demo, idAt(demo, 3), 'behind', 30));
    expect(list.map(({ positionIds }) => positionIds)).toEqual([[WIDE, MIDDLE, NARROW]]);
  });

  it('is worked out once for a sketch', () => {
    const demo = inspectionZoom();
    expect(listWarnings(demo)).toBe(listWarnings(demo));
  });
});
