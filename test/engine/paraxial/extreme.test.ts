import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sentenceOf } from '../../../engine/paraxial/absence.ts';
import { type Analysis, analyse } from '../../../engine/paraxial/analyse.ts';
import { warningsOf } from '../../../engine/paraxial/warnings.ts';
import type { Sketch } from '../../../engine/sketch/types.ts';
import { settingAt } from '../../../engine/sketch/values.ts';
import { anySetting, anySketch } from '../sketch/arbitrary.ts';
import { diaphragm, onFirst, plate, sketchOf, thin } from '../sketchOf.ts';

/** Paths of numbers that are not finite and of reasons without a sentence, anywhere in a result but for open rims. */
function unsound(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [`${path} = ${value}`];
  if (path === '.train.semiDiameter') return [];
  if (ArrayBuffer.isView(value)) return unsound([...(value as Float64Array)], path);
  if (Array.isArray(value)) return value.flatMap((item, k) => unsound(item, `${path}[${k}]`));
  if (typeof value !== 'object' || value === null) return [];
  if ('why' in value && !sentenceOf(value.why as never)) return [`${path} without a sentence`];
  return Object.entries(value).flatMap(([key, item]) => unsound(item, `${path}.${key}`));
}

const analysed = (sketch: Sketch): Analysis => analyse(sketch, onFirst(sketch));

describe('the analysis', () => {
  it('holds only finite numbers and reasons, for any sketch at any setting', () => {
    fc.assert(
      fc.property(
        anySketch().chain((sketch) => fc.tuple(fc.constant(sketch), anySetting(sketch.positions))),
        ([sketch, setting]) => {
          expect(unsound(analyse(sketch, setting))).toEqual([]);
          for (const { sentence } of warningsOf(sketch, setting)) {
            for (const unit of ['mm', 'in'] as const) expect(sentence(unit)).toMatch(/^(?!.*NaN).*\.$/);
          }
        },
      ),
    );
  });

  it('stays finite, or out of range, for the strongest parts at the longest gaps', () => {
    for (const count of [1, 2, 5, 12, 20, 40, 200]) {
      for (const f of [1e-3, -1e-3, 1e6]) {
        const parts = Array.from({ length: count }, (_, k) => thin(`p${k}`, f, 1e6, { semiDiameterMm: 1 }));
        const sketch = sketchOf(parts, 'p0', { object: { distanceMm: 1e6, medium: 'air' } });
        expect(unsound(analysed(sketch))).toEqual([]);
      }
    }
    const many = Array.from({ length: 200 }, (_, k) => thin(`p${k}`, 1e-3, 1e6));
    const { firstOrder, conjugates } = analysed(sketchOf(many, 'p0'));
    expect(firstOrder.focalLengthMm).toEqual({ ok: false, why: 'out of range' });
    expect(conjugates.imageDistanceMm).toEqual({ ok: false, why: 'out of range' });
  });

  it('stays finite for fields and apertures at their limits', () => {
    const parts = [
      thin('p1', 50, 1e-9, { semiDiameterMm: 1e-3 }),
      plate('p2', 1e-6, 0),
      diaphragm('p3', 1e6),
    ];
    for (const angleDeg of [0, 89.999999]) {
      for (const fNumber of [1e-6, 1e6]) {
        const sketch = sketchOf(parts, 'p1', {
          aperture: { kind: 'workingFNumber', fNumber },
          field: { size: { kind: 'angle', angleDeg }, fractions: [-1, 0, 1], vignetting: 1 },
        });
        expect(unsound(analysed(sketch))).toEqual([]);
      }
    }
  });

  it('does not move with a diaphragm that is open and not the stop', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 30, noNaN: true }), (shareMm) => {
        const whole = analysed(sketchOf([thin('p1', 50, 30), thin('p2', 80)], 'p1'));
        const split = analysed(
          sketchOf([thin('p1', 50, shareMm), diaphragm('p9', 30 - shareMm), thin('p2', 80)], 'p1'),
        );
        const [one, other] = [whole.firstOrder.backFocusMm, split.firstOrder.backFocusMm];
        expect(one.ok && other.ok && Math.abs(one.value - other.value)).toBeLessThan(1e-12);
      }),
    );
  });

  it('answers on every position of a sketch', () => {
    fc.assert(
      fc.property(anySketch({ leastParts: 1 }), (sketch) => {
        for (const { id } of sketch.positions) {
          const { train, vignetting } = analyse(sketch, settingAt(id));
          expect(train.count).toBeGreaterThan(0);
          if (vignetting.ok) expect(vignetting.value).toHaveLength(sketch.field.fractions.length);
        }
      }),
    );
  });
});
