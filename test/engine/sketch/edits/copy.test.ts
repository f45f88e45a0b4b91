import { fc, test } from '@fast-check/vitest';
import { describe, expect } from 'vitest';
import { parseClip, writeClip } from '../../../../engine/sketch/clip.ts';
import { copyParts, duplicateParts, pasteParts } from '../../../../engine/sketch/edits/copy.ts';
import { inspectionZoom, MIDDLE } from '../../demo.ts';
import { anySketch } from '../arbitrary.ts';
import { gapsOf, id, idsOf, row } from '../layout.ts';

const gapsIn = (text: string) => {
  const parsed = parseClip(text);
  return parsed.ok ? parsed.clip.parts.map((part) => part.space.lengthMm) : parsed.faults;
};

describe('duplicating', () => {
  test('puts copies with their gaps behind the last of them; what is behind moves along', () => {
    const sketch = duplicateParts(row(10, 20, 30), [id('p1'), id('p2')]);
    expect(idsOf(sketch)).toEqual(['p1', 'p2', 'p4', 'p5', 'p3']);
    expect(gapsOf(sketch)).toEqual([10, 20, 10, 20, 30]);
  });

  test('keeps the gaps of every position', () => {
    const sketch = duplicateParts(inspectionZoom(), [id('p1')]);
    expect(gapsOf(sketch)[1]).toEqual(gapsOf(inspectionZoom())[0]);
  });

  test('behind the last part keeps the sensor at its distance and leaves ten millimetres between', () => {
    expect(gapsOf(duplicateParts({ ...row(10, 55), image: 'fixed' }, [id('p2')]))).toEqual([10, 10, 55]);
  });

  test('of nothing changes nothing', () => {
    const sketch = row(10, 20);
    expect(duplicateParts(sketch, [])).toBe(sketch);
  });
});

describe('copying and pasting', () => {
  test('carries parts over with the distances between them, as they stand at a position', () => {
    const clip = copyParts(inspectionZoom(), [id('p2'), id('p1')], MIDDLE);
    expect(clip.parts.map((part) => [part.name, part.space.lengthMm])).toEqual([
      ['first group', 26.2723430337247],
      ['second group', 25.3145182543316],
    ]);
    const sketch = pasteParts(row(70, 80), clip, id('p1'));
    expect(idsOf(sketch)).toEqual(['p1', 'p3', 'p4', 'p2']);
    expect(gapsOf(sketch)).toEqual([25.3145182543316, 26.2723430337247, 70, 80]);
  });

  test('keeps the distance over parts that were not chosen', () => {
    expect(copyParts(row(10, 20, 30), [id('p1'), id('p3')]).parts.map((part) => part.space.lengthMm)).toEqual(
      [30, 10],
    );
  });

  test('pastes in front of all, and into an empty sketch', () => {
    const clip = copyParts(row(10, 20, 30), [id('p2')]);
    expect(gapsOf(pasteParts(row(7), clip, null))).toEqual([20, 7]);
    expect(idsOf(pasteParts(row(), clip, null))).toEqual(['p1']);
  });

  test('behind a part that is not there changes nothing', () => {
    const sketch = row(10, 20);
    expect(pasteParts(sketch, copyParts(sketch, [id('p1')]), id('p9'))).toBe(sketch);
    expect(pasteParts(sketch, copyParts(sketch, []), null)).toBe(sketch);
  });

  test.prop([anySketch(), fc.array(fc.nat(), { maxLength: 4 })])(
    'goes through the clipboard unchanged',
    (sketch, picks) => {
      const clip = copyParts(
        sketch,
        picks.map((pick) => sketch.parts[pick % Math.max(1, sketch.parts.length)]?.id ?? id('p1')),
      );
      expect(parseClip(writeClip(clip))).toEqual({ ok: true, clip });
    },
  );
});

describe('a clipboard that holds no sound parts', () => {
  test.each(['', 'hello', '{"format":"gapwright-sketch"}', 'gapwright-parts', '[]', 'x'.repeat(1e6)])(
    'is told in one sentence (%#)',
    (text) => {
      expect(gapsIn(text)).toEqual([
        { path: '', sentence: 'The clipboard holds no parts; copy parts from a Gapwright sketch first.' },
      ]);
    },
  );

  test('has its faults told as those of a file', () => {
    const clip = copyParts(row(10, 20), [id('p1'), id('p2')]);
    expect(gapsIn(writeClip(clip).replace('"focalLengthMm": 50', '"focalLengthMm": 0'))).toEqual([
      {
        path: 'parts[0].focalLengthMm',
        sentence:
          'The focal length of part 1 is 0 mm; it must be a number other than zero, between 0.001 and 1,000,000 mm in size.',
      },
    ]);
    expect(gapsIn(writeClip(clip).replace('"lengthMm": 10', '"lengthMm": { "only": 10 }'))).toEqual([
      {
        path: 'parts[0].space.lengthMm',
        sentence: 'The gap behind part 1 is an object; in copied parts it must be a number.',
      },
    ]);
    expect(gapsIn(writeClip(clip).replace('"note"', '"memo"'))).toHaveLength(2);
    expect(gapsIn(writeClip(clip).replace('"parts"', '"__proto__": 1, "parts"'))).toHaveLength(1);
  });
});
