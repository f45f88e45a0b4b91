import { describe, expect, it } from 'vitest';
import { pupilMapOf } from '../../../engine/exact/pupilMap.ts';
import { pupilOutline } from '../../../engine/exact/pupilOutline.ts';
import { setupOfRows } from './systems.ts';

/** Of the stop's radius: what twenty halvings leave. */
const EDGE = 2e-6;
/** Of the stop's area, in 64 directions with corners between them. */
const AREA = 5e-3;

const STOP_MM = 5;
const RIM_MM = 6;
const APART_MM = 20;
/** A bare stop, and a ring behind it without any lens, so that the outline is where two discs overlap. */
const tube = (angleDeg: number) =>
  setupOfRows(
    {
      rows: [
        [0, APART_MM, 1],
        [0, 10, 1, { semiDiameterMm: RIM_MM }],
        [0, 0, 1, { thinPowerPerMm: 0.02 }],
      ],
      stop: 0,
    },
    { kind: 'stopDiameter', diameterMm: 2 * STOP_MM },
    { kind: 'angle', angleDeg },
  );

/** Area common to discs of radius a and b whose centres are d apart, by the well-known lens of two circles. */
function common(a: number, b: number, d: number): number {
  if (d <= Math.abs(a - b)) return Math.PI * Math.min(a, b) ** 2;
  if (d >= a + b) return 0;
  const [p, q] = [
    Math.acos((d * d + a * a - b * b) / (2 * d * a)),
    Math.acos((d * d + b * b - a * a) / (2 * d * b)),
  ];
  return a * a * (p - Math.sin(2 * p) / 2) + b * b * (q - Math.sin(2 * q) / 2);
}

describe('the outline of the vignetted stop', () => {
  it('is the whole stop where no rim cuts', () => {
    const outline = pupilOutline(pupilMapOf(tube(2), 0, 1));
    if (!outline.ok) throw new Error(outline.why);
    expect(outline.value.share).toBeCloseTo(1, 12);
    expect(outline.value.cutBy.every((cut) => cut === null)).toBe(true);
    for (let i = 0; i < outline.value.points.length; i += 2) {
      expect(Math.hypot(outline.value.points[i]!, outline.value.points[i + 1]!)).toBeCloseTo(1, 12);
    }
  });

  it('is where the discs of stop and rim overlap, also when the chief ray is cut', () => {
    for (const shiftMm of [2, 4, 5.5, 7, 9, 10.5]) {
      const setup = tube((Math.atan(shiftMm / APART_MM) * 180) / Math.PI);
      for (const aimed of [false, true]) {
        const outline = pupilOutline(pupilMapOf(setup, 0, 1), aimed);
        if (!outline.ok) throw new Error(outline.why);
        const { points, cutBy, share } = outline.value;
        for (let i = 0; i < cutBy.length; i++) {
          const [x, y] = [points[2 * i]!, points[2 * i + 1]!];
          const onStop = Math.abs(Math.hypot(x, y) - 1);
          const onRim = Math.abs(Math.hypot(x, y + shiftMm / STOP_MM) - RIM_MM / STOP_MM);
          expect(cutBy[i] === null ? onStop : onRim).toBeLessThanOrEqual(EDGE);
          if (cutBy[i]) expect(cutBy[i]).toEqual({ why: 'clipped', surface: 1 });
        }
        expect(
          Math.abs(share - common(STOP_MM, RIM_MM, shiftMm) / (Math.PI * STOP_MM ** 2)),
        ).toBeLessThanOrEqual(AREA);
      }
    }
  });

  it('is absent, with the reason, when nothing gets through', () => {
    const outline = pupilOutline(pupilMapOf(tube((Math.atan(12 / APART_MM) * 180) / Math.PI), 0, 1));
    expect(outline).toEqual({ ok: false, why: 'clipped' });
  });
});
