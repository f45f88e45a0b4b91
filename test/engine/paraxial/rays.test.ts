import { describe, expect, it } from 'vitest';
import { analyse } from '../../../engine/paraxial/analyse.ts';
import { bundle } from '../../../engine/paraxial/rays.ts';
import { heightAt, heightInSpace, paraxialRay, slopeIn } from '../../../engine/paraxial/trace.ts';
import type { Aperture, FieldSize, Part, Sketch } from '../../../engine/sketch/types.ts';
import { trainOf } from '../../../engine/train/train.ts';
import { given } from '../quantity.ts';
import { diaphragm, onFirst, plate, sketchOf, thin } from '../sketchOf.ts';

const lens = [thin('p1', 50)];
const near = { object: { distanceMm: 150, medium: 'air' } } as const;
const analysed = (parts: readonly Part[], stop: string | null, more: Partial<Sketch>) => {
  const sketch = sketchOf(parts, stop, more);
  return analyse(sketch, onFirst(sketch));
};

describe('the marginal ray of a lens of 50 mm with the stop on it', () => {
  const heightFor = (aperture: Aperture, more: Partial<Sketch> = near) => {
    const { rays } = analysed(lens, 'p1', { ...more, aperture });
    return rays.marginal.ok ? (rays.marginal.value.y[0] ?? Number.NaN) : rays.marginal.why;
  };

  // Object 150, image 75: a height y leaves at slope y/150 and arrives at y/75.
  it.each([
    ['stop diameter', { kind: 'stopDiameter', diameterMm: 10 }, 5],
    ['working f-number', { kind: 'workingFNumber', fNumber: 7.5 }, 5],
    ['f-number at infinity', { kind: 'infinityFNumber', fNumber: 5 }, 5],
    ['NA at the object', { kind: 'objectNA', na: Math.sin(Math.atan(5 / 150)) }, 5],
    ['entrance-pupil diameter', { kind: 'entrancePupilDiameter', diameterMm: 10 }, 5],
  ] as const)('has the height that its %s asks for', (_, aperture, height) => {
    expect(heightFor(aperture)).toBeCloseTo(height, 13);
  });

  it('is the same by f-number and by pupil for an object at infinity', () => {
    const infinity = {};
    expect(heightFor({ kind: 'workingFNumber', fNumber: 5 }, infinity)).toBeCloseTo(5, 13);
    expect(heightFor({ kind: 'infinityFNumber', fNumber: 5 }, infinity)).toBeCloseTo(5, 13);
    expect(heightFor({ kind: 'entrancePupilDiameter', diameterMm: 10 }, infinity)).toBeCloseTo(5, 13);
  });

  it('says why when the aperture asks for what the layout cannot have', () => {
    const infinity = { object: { distanceMm: 'infinity', medium: 'air' } } as const;
    expect(heightFor({ kind: 'objectNA', na: 0.1 }, infinity)).toBe('object at infinity');
    expect(heightFor({ kind: 'objectNA', na: 1 })).toBe('NA beyond the medium');
    const atFocus = { object: { distanceMm: 50, medium: 'air' } } as const;
    expect(heightFor({ kind: 'workingFNumber', fNumber: 4 }, atFocus)).toBe('image at infinity');
    const { rays } = analysed([thin('p1', -50, 150), thin('p2', 200)], 'p1', {
      aperture: { kind: 'infinityFNumber', fNumber: 4 },
    });
    expect(rays.marginal).toEqual({ ok: false, why: 'afocal' });
  });

  it('needs a stop to set a stop diameter, but not to set the light itself', () => {
    const { marginal } = analysed(lens, null, { aperture: { kind: 'stopDiameter', diameterMm: 10 } }).rays;
    expect(marginal).toEqual({ ok: false, why: 'no stop' });
    const rimmed = analysed([thin('p1', 50, 0, { semiDiameterMm: 6 })], null, {
      aperture: { kind: 'stopDiameter', diameterMm: 10 },
    });
    expect(rimmed.rays.marginal).toEqual({ ok: false, why: 'no stop to size' });
    const bare = analysed(lens, null, { aperture: { kind: 'workingFNumber', fNumber: 5 } });
    expect(given(bare.rays.marginal).y[0]).toBeCloseTo(5, 13);
    expect(bare.rays.chief).toEqual({ ok: false, why: 'no stop' });
    const finite = analysed(lens, null, {
      ...near,
      aperture: { kind: 'entrancePupilDiameter', diameterMm: 5 },
    });
    expect(finite.rays.marginal).toEqual({ ok: false, why: 'no stop' });
  });

  it('cannot be limited by a stop on an image of the object', () => {
    const relay = [thin('p1', 50, 75), diaphragm('p2', 75), thin('p3', 50)];
    const { rays } = analysed(relay, 'p2', { ...near, aperture: { kind: 'stopDiameter', diameterMm: 4 } });
    expect(rays.marginal).toEqual({ ok: false, why: 'stop at an image' });
    expect(rays.chief).toEqual({ ok: false, why: 'stop at an image' });
  });

  it('keeps its f-number but loses its pupil diameter with a telecentric object side', () => {
    const telecentric = [thin('p1', 50, 50), diaphragm('p2', 20)];
    const working = { kind: 'workingFNumber', fNumber: 8 } as const;
    const { light, pupils } = analysed(telecentric, 'p2', {
      ...near,
      aperture: working,
      field: { size: { kind: 'objectHeight', heightMm: 5 }, fractions: [1], vignetting: 0 },
    });
    expect(given(light.workingFNumber)).toBeCloseTo(8, 12);
    expect(pupils.entrance.diameterMm).toEqual({ ok: false, why: 'pupil at infinity' });
    expect(given(light.chiefAngleObjectRad)).toBeCloseTo(0, 15);
    const byPupil = analysed(telecentric, 'p2', {
      ...near,
      aperture: { kind: 'entrancePupilDiameter', diameterMm: 10 },
    });
    expect(byPupil.rays.marginal).toEqual({ ok: false, why: 'pupil at infinity' });
  });
});

describe('the chief ray', () => {
  const field = (size: FieldSize) => ({ field: { size, fractions: [0, 1], vignetting: 0 } });

  it('comes from the lower edge of the object and ends on the upper side of the image', () => {
    const { light, rays } = analysed(lens, 'p1', {
      ...near,
      ...field({ kind: 'objectHeight', heightMm: 12 }),
    });
    expect(given(light.objectHeightMm)).toBeCloseTo(-12, 13);
    expect(given(light.imageHeightMm)).toBeCloseTo(6, 13);
    expect(given(rays.chief).y[0]).toBe(0);
    expect(given(light.chiefAngleObjectRad)).toBeCloseTo(Math.atan(12 / 150), 14);
  });

  it('is the same by angle, by object height and by image height', () => {
    const angleDeg = (Math.atan(12 / 150) * 180) / Math.PI;
    for (const size of [
      { kind: 'angle', angleDeg },
      { kind: 'imageHeight', heightMm: 6 },
    ] as const) {
      const { light } = analysed(lens, 'p1', { ...near, ...field(size) });
      expect(given(light.objectHeightMm)).toBeCloseTo(-12, 12);
      expect(given(light.imageHeightMm)).toBeCloseTo(6, 12);
      expect(given(light.fieldAngleRad)).toBeCloseTo(Math.atan(12 / 150), 14);
    }
  });

  it('rises from infinity and meets the focal plane at f tan of the field angle', () => {
    const { light } = analysed(lens, 'p1', field({ kind: 'angle', angleDeg: 20 }));
    expect(given(light.imageHeightMm)).toBeCloseTo(50 * Math.tan(Math.PI / 9), 12);
    expect(light.objectHeightMm).toEqual({ ok: false, why: 'object at infinity' });
  });

  it('has its image height on the fixed sensor, in focus or not', () => {
    const sketch = { ...near, image: 'fixed', ...field({ kind: 'imageHeight', heightMm: 6 }) } as const;
    const { light } = analysed([thin('p1', 50, 70)], 'p1', sketch);
    expect(given(light.imageHeightMm)).toBeCloseTo(6, 13);
    expect(given(light.objectHeightMm)).toBeCloseTo((-6 * 150) / 70, 12);
  });

  it('crosses the axis exactly in front of the part that the stop rides on', () => {
    const { rays } = analysed([thin('p1', 80, 21), thin('p2', -33, 9), thin('p3', 40)], 'p2', near);
    expect(given(rays.chief).y[1]).toBe(0);
  });

  it('says why when the field asks for what the layout cannot have', () => {
    const telecentric = [thin('p1', 50, 50), diaphragm('p2', 20)];
    const chief = (parts: readonly Part[], stop: string, more: Partial<Sketch>) => {
      const outcome = analysed(parts, stop, more).rays.chief;
      return outcome.ok ? 'found' : outcome.why;
    };
    const angle = field({ kind: 'angle', angleDeg: 5 });
    const object = field({ kind: 'objectHeight', heightMm: 5 });
    const image = field({ kind: 'imageHeight', heightMm: 5 });
    expect(chief(telecentric, 'p2', { ...near, ...angle })).toBe('stop at a focus');
    expect(chief(telecentric, 'p2', { ...near, ...object })).toBe('found');
    expect(chief(telecentric, 'p2', { ...near, ...image })).toBe('found');
    expect(chief(telecentric, 'p2', image)).toBe('stop at a focus');
    expect(chief(lens, 'p1', object)).toBe('object at infinity');
    // A sensor fixed in the exit pupil, 150 behind the lens, gets every chief ray on the axis.
    const inPupil = [diaphragm('p1', 75), thin('p2', 50, 150)];
    expect(chief(inPupil, 'p1', { ...near, ...image, image: 'fixed' })).toBe('stop at an image');
    const expander = [thin('p1', -50, 150), thin('p2', 200)];
    expect(chief(expander, 'p1', image)).toBe('image at infinity');
    expect(chief(expander, 'p1', angle)).toBe('found');
  });
});

describe('a ray of a bundle', () => {
  const sketch = sketchOf([thin('p1', 80, 21), plate('p2', 6, 9), thin('p3', 40)], 'p3', near);
  const { rays, train } = analyse(sketch, onFirst(sketch));
  const [marginal, chief] = [given(rays.marginal), given(rays.chief)];

  it('is the share of the field times the chief ray plus the share of the pupil times the marginal ray', () => {
    const ray = bundle(train, marginal, chief, 0.7, -0.5);
    const traced = paraxialRay(train, ray.y[0] ?? 0, ray.nu[0] ?? 0);
    for (let k = 0; k < train.count; k++) expect(ray.y[k]).toBeCloseTo(traced.y[k] ?? Number.NaN, 12);
    for (let k = 0; k <= train.count; k++) expect(ray.nu[k]).toBeCloseTo(traced.nu[k] ?? Number.NaN, 13);
  });

  it('can be written into a ray that is there already', () => {
    const into = paraxialRay(train, 0, 0);
    expect(bundle(train, marginal, chief, 1, 0, into)).toBe(into);
    expect([...into.y]).toEqual([...chief.y]);
  });
});

describe('the height of a ray at a plane', () => {
  const sketch = sketchOf([thin('p1', 50, 20), plate('p2', 6, 9)], null, near);
  const train = trainOf(sketch, onFirst(sketch));
  const ray = paraxialRay(train, 10, 0);

  it('follows the space that holds the plane', () => {
    // After the lens the slope is −1/5; in the plate it is −1/7.5.
    expect(heightAt(train, ray, -100)).toBe(10);
    expect(heightAt(train, ray, 10)).toBeCloseTo(8, 14);
    expect(heightAt(train, ray, 23)).toBeCloseTo(6 - 3 / 7.5, 14);
    expect(heightAt(train, ray, 36)).toBeCloseTo(6 - 6 / 7.5 - 10 / 5, 14);
  });

  it('can be taken on the extension of any space', () => {
    expect(heightInSpace(train, ray, 0, 40)).toBe(10);
    expect(heightInSpace(train, ray, 1, 50)).toBeCloseTo(0, 14);
    expect(slopeIn(train, ray, 2)).toBeCloseTo(-0.2 / 1.5, 15);
  });
});
