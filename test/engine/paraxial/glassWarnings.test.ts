import { describe, expect, it } from 'vitest';
import { warningsOf } from '../../../engine/paraxial/warnings.ts';
import { newGlass, newSurface } from '../../../engine/sketch/create.ts';
import type { GlassPart, GlassSurface, Part, PartId, Sketch } from '../../../engine/sketch/types.ts';
import { diaphragm, onFirst, sketchOf, thin } from '../sketchOf.ts';

/** A singlet of crown, its radii and thickness given; open unless a rim is. */
const lens = (
  name: string,
  radii: readonly [number | null, number | null],
  thicknessMm: number,
  semiDiameterMm: number | null,
  gapMm = 0,
  shapes: readonly Partial<GlassSurface>[] = [],
): GlassPart => ({
  ...newGlass(50, thicknessMm, name as PartId),
  name,
  surfaces: radii.map((radius, k) => ({ ...newSurface(radius), ...shapes[k] })),
  semiDiameterMm,
  space: { lengthMm: gapMm, medium: 'air' },
});

const sound: Partial<Sketch> = {
  object: { distanceMm: 400, medium: 'air' },
  aperture: { kind: 'workingFNumber', fNumber: 16 },
  field: { size: { kind: 'imageHeight', heightMm: 1 }, fractions: [0, 1], vignetting: 0 },
};
/** What is said about bodies and the rooms they take; the light is as it falls. */
const OF_BODIES: ReadonlySet<string> = new Set([
  'surfaces cross',
  'surface ends',
  'rims clash',
  'rooms overlap',
  'image inside',
]);
const warned = (parts: readonly Part[], more: Partial<Sketch> = {}) => {
  const sketch = sketchOf(parts, 'p1', { ...sound, ...more });
  return warningsOf(sketch, onFirst(sketch))
    .filter(
      ({ kind, severity }) => OF_BODIES.has(kind) && (kind !== 'image inside' || severity !== 'look at this'),
    )
    .map(({ kind, severity, partId, sentence }) => ({ kind, severity, partId, sentence: sentence('mm') }));
};

describe('the warnings about glass', () => {
  it('are none for lenses that can be ground, menisci that nest included', () => {
    expect(warned([lens('p1', [50, -50], 4, 12)])).toEqual([]);
    // The rear of the first and the front of the second run side by side: only their vertices are 0.5 apart, and so are their rims.
    expect(warned([lens('p1', [60, 30], 4, 10, 0.5), lens('p2', [30, 60], 4, 10)])).toEqual([]);
  });

  it('refuse surfaces that cross within a rim that is given, by how much the glass is too thin there', () => {
    // Sag of 50 at 15: 50 − √(50² − 15²) = 2.3030, twice, against a thickness of 4.
    expect(warned([lens('p1', [50, -50], 4, 15)])).toEqual([
      {
        kind: 'surfaces cross',
        severity: 'cannot be built',
        partId: 'p1',
        sentence:
          'The surfaces of p1 cross within the clear diameter: 15.000 mm from the axis the glass is 0.606 mm too thin.',
      },
    ]);
  });

  it('only point at surfaces that cross where the rim is open and the rays ask for it', () => {
    const found = warned([lens('p1', [10, -10], 0.2, null)], {
      aperture: { kind: 'entrancePupilDiameter', diameterMm: 8 },
    });
    expect(found).toMatchObject([{ kind: 'surfaces cross', severity: 'look at this' }]);
  });

  it('name the two surfaces of a cemented pair that cross', () => {
    const pair: GlassPart = {
      ...lens('p1', [60, -40], 5, 12),
      surfaces: [newSurface(60), newSurface(-40), newSurface(40)],
      fillings: [
        { thicknessMm: 5, material: { material: 'n-bk7' } },
        { thicknessMm: 0, material: { material: 'n-sf5' } },
      ],
    };
    expect(warned([pair])).toEqual([]);
    const crossed = { ...pair, surfaces: [newSurface(60), newSurface(-40), newSurface(-30)] };
    expect(warned([crossed])[0]?.sentence).toContain('Surfaces 2 and 3 of p1 cross');
  });

  it('say that a radius is smaller than its rim, and where any other conic ends', () => {
    const found = warned([lens('p1', [10, null], 30, 12)]);
    expect(found).toContainEqual({
      kind: 'surface ends',
      severity: 'cannot be built',
      partId: 'p1',
      sentence: 'The radius of surface 1 of p1 is 10.000 mm, smaller than its rim of 12.000 mm.',
    });
    // An oblate ellipsoid of K = 3 ends at R/√(1 + 3).
    const conic = warned([lens('p1', [10, null], 30, 8, 0, [{ conic: 3 }])]);
    expect(conic[0]?.sentence).toBe(
      'The conic of surface 1 of p1 ends 5.000 mm from the axis, inside its rim of 8.000 mm.',
    );
  });

  it('say that powers run away, and stay finite', () => {
    const found = warned([lens('p1', [50, null], 5, 8, 0, [{ asphere: [1e30] }])]);
    expect(found[0]?.sentence).toMatch(/^The powers of surface 1 of p1 run away 0\.000 mm/);
    expect(JSON.stringify(found)).not.toMatch(/NaN|Infinity/);
  });

  it('refuse rims that clash across the air between two lenses', () => {
    // Flat rear against a front that is hollow by 2.0871 at 9.
    const parts = [lens('p1', [50, null], 4, 9, 1.5), lens('p2', [-20.449, 50], 3, 9)];
    expect(warned(parts)).toMatchObject([{ kind: 'rims clash', severity: 'cannot be built', partId: 'p1' }]);
    expect(warned([lens('p1', [50, null], 4, 9, 2.2), lens('p2', [-20.449, 50], 3, 9)])).toEqual([]);
  });

  it('count how far a hollow face reaches against what a thin neighbour reserves', () => {
    const hollow = (gap: number, more = {}) => [
      thin('p1', 200, gap, { semiDiameterMm: 9, ...more }),
      lens('p2', [-20.449, 50], 3, 9),
    ];
    expect(warned(hollow(2.2))).toEqual([]);
    expect(warned(hollow(2))).toMatchObject([{ kind: 'rooms overlap', severity: 'look at this' }]);
    expect(warned(hollow(2.2, { roomBehindMm: 1 }))).toMatchObject([
      { kind: 'rooms overlap', severity: 'cannot be built' },
    ]);
  });

  it('point at a rim that reaches beyond a narrower diaphragm', () => {
    const parts = [diaphragm('p1', 1), lens('p2', [-20.449, 50], 3, 9)];
    expect(warned(parts)).toMatchObject([{ kind: 'rims clash', severity: 'look at this', partId: 'p2' }]);
  });

  it('count a hollow rear against the sensor', () => {
    const parts = [lens('p1', [-50, 20.449], 3, 9, 1.5)];
    expect(warned(parts, { image: 'fixed' })).toContainEqual(
      expect.objectContaining({ kind: 'image inside', severity: 'cannot be built' }),
    );
  });
});
