import { describe, expect, it } from 'vitest';
import type { Quantity } from '../../../engine/paraxial/absence.ts';
import { type Analysis, analyse } from '../../../engine/paraxial/analyse.ts';
import { warningsOf } from '../../../engine/paraxial/warnings.ts';
import { settingAt } from '../../../engine/sketch/values.ts';
import { inspectionZoom, MIDDLE, NARROW, WIDE } from '../demo.ts';
import { given } from '../quantity.ts';

// Source: brief of the inspection camera, figures printed to the digits given here.
const sketch = inspectionZoom();
const [wide, middle, narrow] = [WIDE, MIDDLE, NARROW].map((id) => analyse(sketch, settingAt(id))) as [
  Analysis,
  Analysis,
  Analysis,
];
const all = [wide, middle, narrow];

const printed = (quantities: readonly (Quantity | undefined)[], digits: number) =>
  quantities.map((quantity) => given(quantity).toFixed(digits));

describe('the inspection zoom', () => {
  it('has the focal lengths of the brief', () => {
    expect(
      printed(
        all.map((a) => a.firstOrder.focalLengthMm),
        4,
      ),
    ).toEqual(['25.7481', '41.1975', '61.2888']);
  });

  it('has the back focus of the brief', () => {
    expect(
      printed(
        all.map((a) => a.firstOrder.backFocusMm),
        4,
      ),
    ).toEqual(['24.7126', '22.7042', '18.6453']);
  });

  it('needs the stop diameters of the brief for f/5.6', () => {
    expect(
      printed(
        all.map((a) => a.pupils.stopDiameterMm),
        3,
      ),
    ).toEqual(['10.583', '13.383', '16.394']);
    for (const { light } of all) expect(given(light.workingFNumber)).toBeCloseTo(5.6, 12);
  });

  it('reproduces the three magnifications', () => {
    expect(
      printed(
        all.map((a) => a.conjugates.magnification),
        9,
      ),
    ).toEqual(['-0.050000000', '-0.080000000', '-0.120000000']);
  });

  it('forms all three images on the sensor', () => {
    for (const { conjugates } of all) {
      expect(Math.abs(given(conjugates.defocusMm))).toBeLessThan(1e-9);
      expect(given(conjugates.trackMm)).toBeCloseTo(110, 11);
      expect(given(conjugates.objectToImageMm)).toBeCloseTo(610, 11);
    }
  });

  it('has a virtual image 30.0752 mm in front of the first group', () => {
    for (const { ledger } of all) {
      expect(printed([ledger[0]?.imageDistanceMm], 4)).toEqual(['-30.0752']);
      expect(ledger[0]?.imageIs).toBe('virtual');
      expect(printed([ledger[0]?.realIsPositive.imageDistanceMm], 4)).toEqual(['-30.0752']);
    }
  });

  it('gives the third group a virtual object behind it', () => {
    expect(
      printed(
        all.map((a) => a.ledger[2]?.objectDistanceMm),
        4,
      ),
    ).toEqual(['29.5964', '30.3422', '29.5780']);
    for (const { ledger } of all) expect(ledger[2]?.objectIs).toBe('virtual');
  });

  it('has the entrance pupil of the middle position 14.427 mm behind the first group', () => {
    expect(printed([middle.pupils.entrance.zMm], 3)).toEqual(['14.427']);
    expect(printed([middle.pupils.entrance.diameterMm], 3)).toEqual(['7.349']);
  });

  it('covers the sensor and warns about nothing', () => {
    for (const id of [WIDE, MIDDLE, NARROW]) expect(warningsOf(sketch, settingAt(id))).toEqual([]);
    for (const { light } of all) expect(given(light.imageHeightMm)).toBeCloseTo(5.5, 12);
  });
});
