import { describe, expect, it } from 'vitest';
import { unbuildable, warningsOf } from '../../../engine/paraxial/warnings.ts';
import type { Part, PositionId, Sketch } from '../../../engine/sketch/types.ts';
import { inspectionZoom } from '../demo.ts';
import { diaphragm, onFirst, plate, sketchOf, thin } from '../sketchOf.ts';

const sensor = { size: { widthMm: 8, heightMm: 6 }, pixelPitchMm: 0.004 };
const sound: Partial<Sketch> = {
  object: { distanceMm: 150, medium: 'air' },
  aperture: { kind: 'workingFNumber', fNumber: 8 },
  field: { size: { kind: 'imageHeight', heightMm: 5 }, fractions: [0, 1], vignetting: 0 },
  sensor,
};
const warned = (parts: readonly Part[], more: Partial<Sketch> = {}, stop = 'p1') => {
  const sketch = sketchOf(parts, stop, { ...sound, ...more });
  return warningsOf(sketch, onFirst(sketch)).map(({ kind, severity, partId, sentence }) => ({
    kind,
    severity,
    partId,
    sentence: sentence('mm'),
  }));
};

describe('the warnings', () => {
  it('are none for a sound layout, an empty sketch and parts that touch', () => {
    expect(warned([thin('p1', 50)])).toEqual([]);
    expect(warned([])).toEqual([]);
    const touching = [
      thin('p1', 80, 4.1 + 2.2, { roomBehindMm: 4.1 }),
      thin('p2', 80, 0, { roomFrontMm: 2.2 }),
    ];
    expect(warned(touching)).toEqual([]);
  });

  it('write their lengths in inches when asked', () => {
    const sketch = sketchOf([thin('p1', 80, -2.54), thin('p2', 80)], 'p1', sound);
    expect(warningsOf(sketch, onFirst(sketch))[0]?.sentence('in')).toBe(
      'P2 stands 0.10000 in in front of p1: the gap must be 0 or more.',
    );
  });

  it('refuse a negative gap', () => {
    expect(warned([thin('p1', 80, -2.5), thin('p2', 80)])).toEqual([
      {
        kind: 'negative gap',
        severity: 'cannot be built',
        partId: 'p1',
        sentence: 'P2 stands 2.500 mm in front of p1: the gap must be 0 or more.',
      },
    ]);
  });

  it('refuse rooms that overlap, with the gap that is there', () => {
    const parts = [thin('p1', 80, 3, { roomBehindMm: 2 }), thin('p2', 80, 0, { roomFrontMm: 1.5 })];
    expect(warned(parts)).toMatchObject([
      {
        kind: 'rooms overlap',
        severity: 'cannot be built',
        partId: 'p1',
        sentence: 'P1 and p2 overlap by 0.500 mm: the gap of 3.000 mm is smaller than their rooms.',
      },
    ]);
  });

  it('refuse an object inside the room of the first part', () => {
    const parts = [thin('p1', 10, 0, { roomFrontMm: 21 })];
    expect(warned(parts, { object: { distanceMm: 20, medium: 'air' } })).toMatchObject([
      {
        kind: 'object inside',
        severity: 'cannot be built',
        partId: 'p1',
        sentence: 'The object stands 1.000 mm inside the room of p1.',
      },
    ]);
  });

  it('refuse a fixed sensor inside the last part, and point at an image there', () => {
    const parts = [thin('p1', 50, 3, { roomBehindMm: 4 })];
    expect(warned(parts, { image: 'fixed' })).toContainEqual(
      expect.objectContaining({ kind: 'image inside', severity: 'cannot be built', partId: 'p1' }),
    );
    const virtual = [thin('p1', -50)];
    expect(warned(virtual)).toContainEqual(
      expect.objectContaining({
        kind: 'image inside',
        severity: 'look at this',
        sentence: 'The image stands 37.500 mm in front of where p1 ends: no sensor can stand there.',
      }),
    );
  });

  it('point at a rim that cuts the axial bundle, once per part', () => {
    const parts = [thin('p1', 50, 5), plate('p2', 2, 0, { semiDiameterMm: 3 })];
    // f/8 with the image 75 behind the lens: 2 · 75/16 = 9.375 there, 8.75 at the plate.
    expect(warned(parts)).toEqual([
      {
        kind: 'axial bundle cut',
        severity: 'look at this',
        partId: 'p2',
        sentence: 'The rim of p2 cuts the axial bundle: it is 6.000 mm wide, the aperture asks for 8.750 mm.',
      },
    ]);
  });

  it('point at a field edge that no light reaches', () => {
    const parts = [thin('p1', 50, 60), diaphragm('p2', 0, { semiDiameterMm: 1 })];
    expect(warned(parts).map(({ kind }) => kind)).toContain('field edge dark');
  });

  it('point at a sensor that the field does not cover', () => {
    const field = { size: { kind: 'imageHeight', heightMm: 4 }, fractions: [1], vignetting: 0 } as const;
    expect(warned([thin('p1', 50)], { field })).toMatchObject([
      {
        kind: 'sensor not covered',
        partId: null,
        sentence: 'The field reaches 4.000 mm from the axis, the sensor’s corner stands at 5.000 mm.',
      },
    ]);
  });

  it('point at an image farther from the sensor than the blur allows', () => {
    const kinds = (lengthMm: number, more: Partial<Sketch> = {}) =>
      warned([thin('p1', 50, lengthMm)], { image: 'fixed', ...more }).map(({ kind }) => kind);
    // f/8 and 4 µm: ±0.032 mm.
    expect(kinds(75.03)).toEqual([]);
    expect(kinds(75.034)).toEqual(['out of focus']);
    expect(kinds(75.034, { blurMm: 0.01 })).toEqual([]);
    // Without a blur a quarter wave decides: ±0.0755 mm.
    expect(kinds(75.07, { sensor: null })).toEqual([]);
    expect(kinds(75.08, { sensor: null })).toEqual(['out of focus']);
  });

  it('point at a last part that reaches behind the mount plane', () => {
    const parts = [thin('p1', 50, 0, { roomBehindMm: 3 })];
    expect(warned(parts, { registerMm: 71 })).toEqual([]);
    expect(warned(parts, { registerMm: 73 })).toMatchObject([
      { kind: 'behind the mount', partId: 'p1', sentence: 'P1 reaches 1.000 mm behind the mount plane.' },
    ]);
  });

  it('say in a sentence why aperture or field cannot be', () => {
    const infinity = { object: { distanceMm: 'infinity', medium: 'air' } } as const;
    const aperture = { kind: 'objectNA', na: 0.1 } as const;
    expect(warned([thin('p1', 50)], { ...infinity, aperture })).toMatchObject([
      {
        kind: 'no marginal ray',
        severity: 'look at this',
        sentence: expect.stringMatching(/^No aperture: .+\.$/),
      },
    ]);
    const telecentric = [thin('p1', 50, 50), diaphragm('p2')];
    const field = { size: { kind: 'angle', angleDeg: 5 }, fractions: [1], vignetting: 0 } as const;
    expect(warned(telecentric, { field }, 'p2').map(({ kind }) => kind)).toEqual(['no chief ray']);
  });

  it('number a part without a name along the axis', () => {
    const parts = [thin('p1', 80, -1, { name: '' }), thin('p2', 80, 0, { name: 'field lens' })];
    expect(warned(parts)[0]?.sentence).toMatch(/^Field lens stands 1\.000 mm in front of element 1/);
  });
});

describe('what cannot be built', () => {
  it('is looked for in all positions and names them', () => {
    const sketch = inspectionZoom();
    expect(unbuildable(sketch)).toEqual([]);
    const [first, ...others] = sketch.parts;
    if (!first || typeof first.space.lengthMm === 'number') throw new Error('the first gap is per position');
    const narrow = 'narrow' as PositionId;
    const space = { ...first.space, lengthMm: { ...first.space.lengthMm, [narrow]: -1 } };
    const broken = { ...sketch, parts: [{ ...first, space }, ...others] };
    expect(unbuildable(broken).map(({ kind, positionId }) => ({ kind, positionId }))).toEqual([
      { kind: 'negative gap', positionId: 'narrow' },
    ]);
  });
});
