import { describe, expect, it } from 'vitest';
import { exactSetupOf } from '../../../engine/exact/analyse.ts';
import { lostFields, lostFieldWarnings, lostWords, refracts } from '../../../engine/exact/lostFields.ts';
import { analyse } from '../../../engine/paraxial/analyse.ts';
import { newGlass } from '../../../engine/sketch/create.ts';
import type { PartId, Sketch } from '../../../engine/sketch/types.ts';
import { trainOf } from '../../../engine/train/train.ts';
import { given } from '../quantity.ts';
import { realZoom } from '../realZoom.ts';
import { diaphragm, onFirst, plate, sketchOf, thin } from '../sketchOf.ts';

/** A stop, and `gapMm` behind it a biconcave lens of radii 8 mm: rays that are too steep pass outside its rear sphere. */
function steepField(angleDeg: number, gapMm = 2): Sketch {
  const lens = newGlass(-8, 6, 'p2' as PartId);
  return sketchOf([diaphragm('p1', gapMm), lens], 'p1', {
    field: { size: { kind: 'angle', angleDeg }, fractions: [0, 0.5, 1], vignetting: 0 },
    aperture: { kind: 'stopDiameter', diameterMm: 2 },
  });
}

const setupOf = (sketch: Sketch) => {
  const setting = onFirst(sketch);
  return given(exactSetupOf(sketch, setting, analyse(sketch, setting)));
};

describe('fields that no exact ray gets through', () => {
  it('are told with what is in the way of their chief ray', () => {
    const setup = setupOf(steepField(40));
    expect(lostFields(setup, [0, 0.5, 1])).toEqual([{ fraction: 1, lost: { why: 'missed', surface: 2 } }]);
    expect(lostFields(setupOf(steepField(60)), [0, 0.5, 1]).map(({ fraction }) => fraction)).toEqual([
      0.5, 1,
    ]);
  });

  it('are none where light gets through', () => {
    expect(lostFields(setupOf(realZoom()), [0, 0.7, 1])).toEqual([]);
  });

  it('become one sentence each, which names field, surface and part', () => {
    const sketch = steepField(40);
    const [warning, ...more] = lostFieldWarnings(sketch, onFirst(sketch).at, setupOf(sketch));
    expect(more).toEqual([]);
    expect(warning?.sentence('mm')).toBe(
      'No exact ray at 100 % of the field gets through: missed surface 3 (glass 2).',
    );
    expect(warning).toMatchObject({ kind: 'field lost', severity: 'look at this', partId: 'p2' });
  });
});

it('what happened to a ray is said in words', () => {
  const sketch = steepField(40);
  const train = trainOf(sketch, onFirst(sketch));
  expect(lostWords({ why: 'totally reflected', surface: 1 }, sketch, train)).toBe(
    'totally reflected at surface 2 (glass 2)',
  );
});

it('thin parts and stops refract nothing; plates and glass do', () => {
  const refractsIn = (sketch: Sketch) => refracts(trainOf(sketch, onFirst(sketch)));
  expect(refractsIn(sketchOf([thin('p1', 50, 5), diaphragm('p2', 5), thin('p3', -40)]))).toBe(false);
  expect(refractsIn(sketchOf([thin('p1', 50, 5), plate('p2', 3)]))).toBe(true);
  expect(refractsIn(realZoom())).toBe(true);
});
