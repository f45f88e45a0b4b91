import { describe, expect, it } from 'vitest';
import { warningsAt } from '../../../app/live/analysis.ts';
import { exactOf } from '../../../app/live/exact.ts';
import { newGlass, none, type PartId, type Sketch, settingAt } from '../../../engine/index.ts';
import { inspectionZoom, MIDDLE } from '../../engine/demo.ts';
import { realZoom } from '../../engine/realZoom.ts';
import { diaphragm, onFirst, sketchOf } from '../../engine/sketchOf.ts';

const zoom = realZoom();

describe('exact rays of a reading', () => {
  it('are worked out once for a sketch and a setting', () => {
    const setting = onFirst(zoom);
    const exact = exactOf(zoom, setting);
    expect(exactOf(zoom, { ...setting })).toBe(exact);
    expect(exact.setup).toBe(exact.setup);
    expect(exact.comparison).toBe(exact.comparison);
    expect(exact.trust(0.01)).toBe(exact.trust(0.01));
    expect(exact.pencil(0.7)).toBe(exact.pencil(0.7));
    expect(exact.spot(1)).toBe(exact.spot(1));
    expect(exactOf({ ...zoom }, setting)).not.toBe(exact);
  });

  it('differ from paraxial ones only where something refracts', () => {
    expect(exactOf(zoom, onFirst(zoom)).differs).toBe(true);
    expect(exactOf(inspectionZoom(), settingAt(MIDDLE)).differs).toBe(false);
  });

  it('say why there are none', () => {
    const stopless: Sketch = { ...inspectionZoom(), stop: null };
    const exact = exactOf(stopless, settingAt(MIDDLE));
    expect(exact.setup).toEqual(none('no stop'));
    expect(exact.comparison).toEqual(none('no stop'));
    expect(exact.trust(0.01)).toEqual(none('no stop'));
    expect(exact.spot(1)).toEqual(none('no stop'));
    expect(exact.pencil(1)).toBeNull();
  });
});

it('a field that no exact ray gets through is among the warnings', () => {
  const lens = newGlass(-8, 6, 'p2' as PartId);
  const sketch = sketchOf([diaphragm('p1', 2), lens], 'p1', {
    field: { size: { kind: 'angle', angleDeg: 40 }, fractions: [0, 1], vignetting: 0 },
    aperture: { kind: 'stopDiameter', diameterMm: 2 },
  });
  const lostIn = (one: Sketch) => warningsAt(one, onFirst(one)).filter(({ kind }) => kind === 'field lost');
  expect(lostIn(sketch).map(({ sentence }) => sentence('mm'))).toEqual([
    'No exact ray at 100 % of the field gets through: missed surface 3 (glass 2).',
  ]);
  expect(lostIn(zoom)).toEqual([]);
});
