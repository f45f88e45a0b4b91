import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { conjugates } from '../../../engine/paraxial/conjugates.ts';
import { firstOrder } from '../../../engine/paraxial/firstOrder.ts';
import { unsolvableSentence } from '../../../engine/solve/absence.ts';
import { objectForMagnification, objectsForTrack } from '../../../engine/solve/conjugateSolves.ts';
import { type TwoElements, twoForBackFocus, twoForRelay } from '../../../engine/solve/twoElements.ts';
import { buildTrain } from '../../../engine/train/build.ts';
import { given } from '../quantity.ts';
import { uniform } from '../uniform.ts';

/** Shares of what a trace of two lenses keeps, for layouts that are no near miss. */
const TRACED = 1e-9;

const trainOfTwo = (
  { firstFocalLengthMm, secondFocalLengthMm }: TwoElements,
  gapMm: number,
  objectMm: number | null,
) =>
  buildTrain({
    objectIndex: 1,
    surfaces: [
      { part: 0, thinPowerPerMm: 1 / firstFocalLengthMm, indexAfter: 1, gapMm },
      { part: 1, thinPowerPerMm: 1 / secondFocalLengthMm, indexAfter: 1, gapMm: 0 },
    ],
    objectZ: objectMm === null ? null : -objectMm,
    imageDistanceMm: null,
  });

const close = (got: number, wanted: number) =>
  expect(Math.abs(got - wanted)).toBeLessThanOrEqual(TRACED * (1 + Math.abs(wanted)));

describe('two thin parts', () => {
  it('have the focal length and back focus they were solved for', () => {
    const length = () => fc.oneof(uniform(5, 400), uniform(-400, -5));
    fc.assert(
      fc.property(length(), length(), uniform(1, 200), (focalLengthMm, backFocusMm, gapMm) => {
        fc.pre(Math.abs(focalLengthMm - backFocusMm) > 1);
        fc.pre(Math.abs(focalLengthMm - backFocusMm - gapMm) > 1);
        const solved = given(twoForBackFocus({ focalLengthMm, backFocusMm, gapMm }));
        const first = firstOrder(trainOfTwo(solved, gapMm, null));
        close(given(first.focalLengthMm), focalLengthMm);
        close(given(first.backFocusMm), backFocusMm);
      }),
    );
  });

  it('relay the object where and as large as they were solved for', () => {
    const magnification = () => fc.oneof(uniform(-5, -0.2), uniform(0.2, 5));
    fc.assert(
      fc.property(
        magnification(),
        uniform(20, 300),
        uniform(5, 100),
        uniform(20, 300),
        (m, objectMm, gapMm, imageMm) => {
          const solved = twoForRelay({
            objectDistanceMm: objectMm,
            objectToImageMm: objectMm + gapMm + imageMm,
            magnification: m,
            gapMm,
          });
          fc.pre(solved.ok && Object.values(solved.value).every((f) => Math.abs(f) < 1e4));
          const both = conjugates(trainOfTwo(given(solved), gapMm, objectMm));
          close(given(both.imageDistanceMm), imageMm);
          close(given(both.magnification), m);
        },
      ),
    );
  });

  it('are not wanted where one alone would do, and not found at no gap', () => {
    const back = { focalLengthMm: 100, backFocusMm: 100, gapMm: 20 };
    expect(twoForBackFocus(back)).toEqual({ ok: false, why: 'first needs no power' });
    expect(twoForBackFocus({ ...back, backFocusMm: 80 })).toEqual({
      ok: false,
      why: 'second needs no power',
    });
    expect(twoForBackFocus({ ...back, gapMm: 0 })).toEqual({ ok: false, why: 'no gap' });
    expect(twoForBackFocus({ ...back, backFocusMm: 0 })).toEqual({ ok: false, why: 'no such layout' });
    const relay = { objectDistanceMm: 100, objectToImageMm: 200, magnification: -1, gapMm: 0 };
    expect(twoForRelay(relay)).toEqual({ ok: false, why: 'no gap' });
    expect(twoForRelay({ ...relay, gapMm: 100 })).toEqual({ ok: false, why: 'no such layout' });
    // One lens of f = 60 at 80 | 240 has m = −3: with it second, 20 behind nothing, the first is idle.
    const idle = { objectDistanceMm: 60, objectToImageMm: 320, magnification: -3, gapMm: 20 };
    expect(twoForRelay(idle)).toEqual({ ok: false, why: 'first needs no power' });
    expect(twoForRelay({ ...idle, objectDistanceMm: 80 })).toEqual({
      ok: false,
      why: 'second needs no power',
    });
    expect(unsolvableSentence('no gap')).toMatch(/gap/);
  });
});

describe('one thin part', () => {
  const thinAt = (focalLengthMm: number, objectMm: number) =>
    conjugates(
      buildTrain({
        objectIndex: 1,
        surfaces: [{ part: 0, thinPowerPerMm: 1 / focalLengthMm, indexAfter: 1, gapMm: 0 }],
        objectZ: -objectMm,
        imageDistanceMm: null,
      }),
    );

  it('stands where it has a wanted magnification', () => {
    const size = () => fc.oneof(uniform(-20, -0.01), uniform(0.01, 0.9));
    fc.assert(
      fc.property(uniform(5, 500), size(), (focalLengthMm, m) => {
        const objectMm = given(objectForMagnification(focalLengthMm, m));
        close(given(thinAt(focalLengthMm, objectMm).magnification), m);
      }),
    );
    expect(objectForMagnification(50, 0)).toEqual({ ok: false, why: 'out of range' });
  });

  it('stands in two places between an object and its image, as long as they are 4f apart', () => {
    fc.assert(
      fc.property(uniform(5, 500), uniform(4.001, 50), (focalLengthMm, times) => {
        const track = times * focalLengthMm;
        const [near, far] = given(objectsForTrack(focalLengthMm, track));
        expect(near).toBeLessThanOrEqual(far);
        expect(near * far).toBeCloseTo(focalLengthMm * track, 5);
        for (const place of [near, far])
          close(given(thinAt(focalLengthMm, place).objectToImageMm) / track, 1);
      }),
    );
    expect(objectsForTrack(100, 399)).toEqual({ ok: false, why: 'no such layout' });
    expect(objectsForTrack(100, 400)).toEqual({ ok: true, value: [200, 200] });
    // A negative part makes a virtual image: one of the two places has a real object.
    expect(given(objectsForTrack(-100, 50))).toHaveLength(2);
  });
});
