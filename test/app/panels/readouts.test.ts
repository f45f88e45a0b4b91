import { fc, test } from '@fast-check/vitest';
import { describe, expect, it } from 'vitest';
import { quantityText } from '../../../app/panels/quantity.ts';
import { READOUT_GROUPS } from '../../../app/panels/readouts/readout.ts';
import { readoutById, readoutsIn } from '../../../app/panels/readouts/table.ts';
import type { Setting, Sketch } from '../../../engine/index.ts';
import { analyse, sentenceOf, settingAt } from '../../../engine/index.ts';
import { inspectionZoom, MIDDLE } from '../../engine/demo.ts';
import { anySetting, anySketch } from '../../engine/sketch/arbitrary.ts';
import { afocal, empty, single } from './sketches.ts';

const firstOf = (sketch: Sketch): Setting => settingAt(sketch.positions[0]?.id ?? MIDDLE);

const all = (sketch: Sketch, setting: Setting = firstOf(sketch)) => {
  const analysis = analyse(sketch, setting);
  return READOUT_GROUPS.flatMap((group) => readoutsIn(group, analysis, sketch.field.fractions)).map(
    (readout) => ({ readout, outcome: readout.read(analysis) }),
  );
};

const shown = (sketch: Sketch, setting: Setting, id: string): string => {
  const { read, kind, digits } = readoutById(id, sketch.field.fractions);
  const outcome = read(analyse(sketch, setting));
  return outcome.ok ? quantityText(outcome.value, kind, digits, 'mm') : outcome.why;
};

describe('the readouts', () => {
  it('show the middle position of the inspection zoom as its brief prints it', () => {
    const sketch = inspectionZoom();
    const middle = settingAt(MIDDLE);
    // Source: brief of the inspection camera.
    expect(shown(sketch, middle, 'focalLength')).toBe('41.198');
    expect(shown(sketch, middle, 'backFocus')).toBe('22.704');
    expect(shown(sketch, middle, 'magnification')).toBe('−0.0800');
    expect(shown(sketch, middle, 'defocus')).toBe('0.000');
    expect(shown(sketch, middle, 'workingFNumber')).toBe('5.600');
    expect(shown(sketch, middle, 'stopDiameter')).toBe('13.383');
    expect(shown(sketch, middle, 'entrancePlace')).toBe('14.427');
    expect(shown(sketch, middle, 'entranceDiameter')).toBe('7.349');
  });

  it('have ids and labels of their own', () => {
    const readouts = all(inspectionZoom()).map(({ readout }) => readout);
    expect(new Set(readouts.map(({ id }) => id)).size).toBe(readouts.length);
    expect(new Set(readouts.map(({ label }) => label)).size).toBe(readouts.length);
  });

  it('say "no parts" for an empty sketch', () => {
    const reasons = all(empty()).map(({ outcome }) => (outcome.ok ? 'a number' : outcome.why));
    expect(reasons.filter((reason) => reason === 'no parts').length).toBeGreaterThan(20);
  });

  it('give an afocal layout an angular magnification in place of a focal length', () => {
    expect(shown(afocal(), firstOf(afocal()), 'focalLength')).toBe('afocal');
    expect(shown(afocal(), firstOf(afocal()), 'afocalMagnification')).toBe('−0.5000');
    const ids = all(afocal()).map(({ readout }) => readout.id);
    expect(ids).toContain('afocalMagnification');
    expect(all(single()).map(({ readout }) => readout.id)).not.toContain('afocalMagnification');
  });

  it('show what the sensor covers at the object, or as an angle when the object is at infinity', () => {
    const near = inspectionZoom();
    const far: Sketch = { ...near, object: { ...near.object, distanceMm: 'infinity' } };
    const idsOf = (sketch: Sketch) => all(sketch).map(({ readout }) => readout.id);
    expect(idsOf(near)).toContain('objectDiagonal');
    expect(idsOf(near)).not.toContain('diagonalAngle');
    expect(idsOf(far)).toContain('diagonalAngle');
    expect(idsOf(far)).not.toContain('objectDiagonal');
  });

  it('list the light that passes at each field drawn', () => {
    const labels = all(inspectionZoom())
      .map(({ readout }) => readout.label)
      .filter((label) => label.startsWith('Passes'));
    expect(labels).toEqual(['Passes on the axis', 'Passes at 0.7 field', 'Passes at full field']);
  });

  const anyReading = anySketch().chain((sketch) =>
    fc.tuple(fc.constant(sketch), anySetting(sketch.positions)),
  );

  test.prop([anyReading])(
    'are a finite number or a reason with a sentence, whatever was drawn',
    (reading) => {
      const [sketch, setting] = reading;
      for (const { readout, outcome } of all(sketch, setting)) {
        if (outcome.ok) {
          expect(outcome.value).toSatisfy(Number.isFinite, readout.id);
          const text = quantityText(outcome.value, readout.kind, readout.digits, 'in');
          expect(text).toMatch(/^−?\d+(\.\d+)?(×10[⁰¹²³⁴⁵⁶⁷⁸⁹]+)?$/);
        } else expect(sentenceOf(outcome.why)).toMatch(/\.$/);
      }
    },
  );
});
