import { describe, expect, it } from 'vitest';
import { analyse } from '../../../engine/paraxial/analyse.ts';
import type { Part, Sketch } from '../../../engine/sketch/types.ts';
import { given } from '../quantity.ts';
import { diaphragm, onFirst, plate, sketchOf, thin } from '../sketchOf.ts';

const analysed = (parts: readonly Part[], distanceMm: number | 'infinity', more: Partial<Sketch> = {}) => {
  const sketch = sketchOf(parts, null, { object: { distanceMm, medium: 'air' }, ...more });
  return analyse(sketch, onFirst(sketch));
};

describe('the ledger', () => {
  it('counts a plate as one part of magnification 1 that shifts the image by t(1 − 1/n)', () => {
    const { ledger, conjugates } = analysed([thin('p1', 50, 60), plate('p2', 6, 0)], 150);
    expect(ledger.map((row) => row.partIndex)).toEqual([0, 1]);
    const [, row] = ledger;
    // The lens forms its image 75 behind itself, 15 behind the plate's front face.
    expect(given(row?.objectDistanceMm)).toBeCloseTo(15, 12);
    expect(given(row?.imageDistanceMm)).toBeCloseTo(15 - 6 / 1.5, 12);
    expect(row?.objectIs).toBe('virtual');
    expect(row?.imageIs).toBe('real');
    expect(given(row?.magnification)).toBe(1);
    expect(given(row?.imageZ)).toBeCloseTo(77, 12);
    expect(given(conjugates.imageDistanceMm)).toBeCloseTo(11, 12);
  });

  it('has no row for a diaphragm', () => {
    const { ledger } = analysed([diaphragm('p1', 5), thin('p2', 50, 5), diaphragm('p3')], 150);
    expect(ledger.map((row) => row.partIndex)).toEqual([1]);
    expect(given(ledger[0]?.objectDistanceMm)).toBeCloseTo(-155, 12);
  });

  it('passes through infinity and back when the object stands in a focus', () => {
    const { ledger, conjugates } = analysed([thin('p1', 50, 31), thin('p2', 80)], 50);
    const [first, second] = ledger;
    expect(first?.imageDistanceMm).toEqual({ ok: false, why: 'image at infinity' });
    expect(first?.imageIs).toBe('at infinity');
    expect(first?.magnification).toEqual({ ok: false, why: 'image at infinity' });
    expect(second?.objectDistanceMm).toEqual({ ok: false, why: 'object at infinity' });
    expect(second?.objectIs).toBe('at infinity');
    expect(given(second?.imageDistanceMm)).toBeCloseTo(80, 12);
    expect(given(second?.runningMagnification)).toBeCloseTo(-80 / 50, 13);
    expect(given(conjugates.magnification)).toBeCloseTo(-1.6, 13);
  });

  it('gives a virtual image in front of a negative lens and a magnification of its own', () => {
    const { ledger } = analysed([thin('p1', -60, 0)], 30);
    const [row] = ledger;
    expect(given(row?.imageDistanceMm)).toBeCloseTo(-20, 13);
    expect(row?.imageIs).toBe('virtual');
    expect(given(row?.magnification)).toBeCloseTo(2 / 3, 14);
    expect(given(row?.realIsPositive.objectDistanceMm)).toBe(30);
    expect(given(row?.realIsPositive.imageDistanceMm)).toBeCloseTo(-20, 13);
  });

  it('has no running magnification for an object at infinity', () => {
    const { ledger } = analysed([thin('p1', 50, 80), thin('p2', 20)], 'infinity');
    expect(ledger[1]?.runningMagnification).toEqual({ ok: false, why: 'object at infinity' });
    expect(given(ledger[1]?.magnification)).toBeCloseTo(-2, 13);
  });

  it('stays right when the image falls on a part', () => {
    // A field lens on the image neither moves nor enlarges it.
    const { ledger } = analysed([thin('p1', 50, 75), thin('p2', 33, 40), thin('p3', 20)], 150);
    const [, fieldLens, eye] = ledger;
    expect(given(fieldLens?.objectDistanceMm)).toBeCloseTo(0, 12);
    expect(given(fieldLens?.imageDistanceMm)).toBeCloseTo(0, 12);
    expect(given(fieldLens?.magnification)).toBeCloseTo(1, 12);
    expect(given(eye?.imageDistanceMm)).toBeCloseTo(40, 11);
  });
});

describe('the conjugates', () => {
  it('state defocus, track and object to image with the sensor fixed', () => {
    const { conjugates } = analysed([thin('p1', 50, 70)], 150, { image: 'fixed' });
    expect(given(conjugates.imageDistanceMm)).toBeCloseTo(75, 12);
    expect(given(conjugates.imagePlaneMm)).toBe(70);
    expect(given(conjugates.defocusMm)).toBeCloseTo(5, 12);
    expect(given(conjugates.trackMm)).toBe(70);
    expect(given(conjugates.objectToImageMm)).toBe(220);
  });

  it('follow the focus without defocus', () => {
    const { conjugates } = analysed([thin('p1', 50, 70)], 150);
    expect(given(conjugates.defocusMm)).toBe(0);
    expect(given(conjugates.objectToImageMm)).toBeCloseTo(225, 12);
    expect(given(conjugates.longitudinalMagnification)).toBeCloseTo(0.25, 13);
    expect(given(conjugates.angularMagnification)).toBeCloseTo(-2, 13);
  });

  it('keep a fixed sensor when the image goes to infinity', () => {
    const { conjugates } = analysed([thin('p1', 50, 70)], 50, { image: 'fixed' });
    expect(conjugates.imageDistanceMm).toEqual({ ok: false, why: 'image at infinity' });
    expect(conjugates.defocusMm).toEqual({ ok: false, why: 'image at infinity' });
    expect(given(conjugates.trackMm)).toBe(70);
  });

  it('magnify by the media too: m = n s′/(n′ s)', () => {
    const water = { name: 'water', index: 1.333, abbeNumber: null };
    const sketch = sketchOf([thin('p1', 50)], null, { object: { distanceMm: 200, medium: water } });
    const { conjugates } = analyse(sketch, onFirst(sketch));
    const image = 1 / (1 / 50 - 1.333 / 200);
    expect(given(conjugates.imageDistanceMm)).toBeCloseTo(image, 11);
    expect(given(conjugates.magnification)).toBeCloseTo((1.333 * image) / -200, 13);
    expect(given(conjugates.longitudinalMagnification)).toBeCloseTo(
      given(conjugates.magnification) ** 2 / 1.333,
      13,
    );
  });
});

describe('an empty sketch', () => {
  it('has no quantity, and says that there are no parts', () => {
    const { firstOrder, conjugates, ledger, rays, pupils, windows, depth, colour, petzval } = analysed(
      [],
      100,
    );
    for (const quantity of [
      firstOrder.powerPerMm,
      firstOrder.focalLengthMm,
      conjugates.imageDistanceMm,
      conjugates.trackMm,
      rays.marginal,
      rays.chief,
      pupils.entrance.zMm,
      windows.entrance.zMm,
      depth.focusQuarterWaveMm,
      colour.axialMm,
      petzval.sumPerMm,
    ]) {
      expect(quantity).toEqual({ ok: false, why: 'no parts' });
    }
    expect(firstOrder.afocal).toBe(false);
    expect(ledger).toEqual([]);
  });
});
