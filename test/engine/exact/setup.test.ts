import { describe, expect, it } from 'vitest';
import { drawnField } from '../../../engine/exact/drift.ts';
import { pupilMapOf } from '../../../engine/exact/pupilMap.ts';
import { exactSetup } from '../../../engine/exact/setup.ts';
import { conjugates } from '../../../engine/paraxial/conjugates.ts';
import { referenceRays } from '../../../engine/paraxial/rays.ts';
import type { FieldSize } from '../../../engine/sketch/types.ts';
import type { ApertureAt } from '../../../engine/train/places.ts';
import { type Layout, setupOfRows, trainOfRows } from './systems.ts';

const WIDE: ApertureAt = { kind: 'entrancePupilDiameter', diameterMm: 10 };
const FIELD: FieldSize = { kind: 'angle', angleDeg: 5 };
const LENS: Layout = {
  rows: [
    [0, 10, 1],
    [40, 5, 1.5],
    [-60, 0, 1],
  ],
  stop: 0,
};

/** The setup or why there is none. */
function setupFor(layout: Layout, aperture: ApertureAt = WIDE, field: FieldSize = FIELD) {
  const train = trainOfRows(layout);
  return exactSetup(
    [{ line: 'main', wavelengthNm: 587.5618, weight: 1, train }],
    referenceRays(train, aperture, field),
    conjugates(train).imagePlaneMm,
  );
}

describe('the setup of exact analyses', () => {
  it('takes stop radius, field and image plane from the paraxial rays', () => {
    const setup = setupFor(LENS);
    if (!setup.ok) throw new Error(setup.why);
    const { stopSurface, stopRadiusMm, object, imagePlaneMm } = setup.value;
    expect([stopSurface, stopRadiusMm]).toEqual([0, 5]);
    expect(object).toEqual({ kind: 'infinite', slope: expect.closeTo(Math.tan((5 * Math.PI) / 180), 14) });
    expect(imagePlaneMm.ok && imagePlaneMm.value).toBeGreaterThan(40);
  });

  it('has the object’s edge below the axis, as the paraxial chief ray has', () => {
    const { object } = setupOfRows(
      { ...LENS, objectZ: -80 },
      { kind: 'objectNA', na: 0.05 },
      { kind: 'objectHeight', heightMm: 7 },
    );
    expect(object).toEqual({ kind: 'finite', zMm: -80, heightMm: expect.closeTo(-7, 12) });
  });

  it('is absent for the reason that the paraxial rays are', () => {
    expect(setupFor({ rows: LENS.rows })).toEqual({ ok: false, why: 'no stop' });
    expect(setupFor(LENS, WIDE, { kind: 'objectHeight', heightMm: 5 })).toEqual({
      ok: false,
      why: 'object at infinity',
    });
    const focus: Layout = {
      rows: [
        [0, 25, 1, { thinPowerPerMm: 1 / 25 }],
        [0, 10, 1],
      ],
      stop: 1,
    };
    expect(setupFor(focus, { kind: 'stopDiameter', diameterMm: 4 }).ok).toBe(false);
  });

  it('of an afocal train has no image plane, and its rays are drawn all the same', () => {
    const telescope: Layout = {
      rows: [
        [0, 150, 1, { thinPowerPerMm: 1 / 100 }],
        [0, 20, 1, { thinPowerPerMm: 1 / 50 }],
      ],
      stop: 0,
    };
    const setup = setupOfRows(
      telescope,
      { kind: 'stopDiameter', diameterMm: 20 },
      { kind: 'angle', angleDeg: 2 },
    );
    expect(setup.imagePlaneMm).toEqual({ ok: false, why: 'image at infinity' });
    const { rays } = drawnField(pupilMapOf(setup, 0, 1), [0, -1, 0, 0, 0, 1], {
      fromMm: -10,
      toMm: 200,
      clip: true,
      aimed: true,
    });
    for (const { lost, exact, imageDriftMm } of rays) {
      expect([lost, imageDriftMm, exact.at(-2)]).toEqual([null, null, 200]);
    }
  });
});
