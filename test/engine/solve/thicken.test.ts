import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Analysis, analyse } from '../../../engine/paraxial/analyse.ts';
import { parseSketch } from '../../../engine/sketch/parse.ts';
import { faultsOf } from '../../../engine/sketch/rules.ts';
import type { Part, PartId, Sketch, SolidMedium } from '../../../engine/sketch/types.ts';
import { settingAt, valueOn } from '../../../engine/sketch/values.ts';
import { bendingOf } from '../../../engine/solve/bending.ts';
import type { Recipe } from '../../../engine/solve/recipe.ts';
import { thickenPart } from '../../../engine/solve/thicken.ts';
import { thinPart } from '../../../engine/solve/thin.ts';
import { given } from '../quantity.ts';
import { anySketch } from '../sketch/arbitrary.ts';
import { GLASS, onFirst, sketchOf, thin } from '../sketchOf.ts';

/** What is asked of focal length, magnification and the image's place: issue of the exact rays, and far above rounding. */
const KEPT = 1e-10;

const DEMO = fileURLToPath(new URL('../../../public/sketches/inspection-zoom.json', import.meta.url));

function demo(): Sketch {
  const parsed = parseSketch(readFileSync(DEMO, 'utf8'));
  if (!parsed.ok) throw new Error('the demo opens');
  return parsed.sketch;
}

const CROWN: SolidMedium = { material: 'n-bk7' };
const FLINT: SolidMedium = { material: 'f2' };
const singlet = (q: number, thicknessMm = 4, material: SolidMedium = CROWN): Recipe => ({
  kind: 'singlet',
  material,
  bending: bendingOf(q),
  thickness: { kind: 'centre', thicknessMm },
});

const RECIPES: readonly (readonly [string, Recipe])[] = [
  ['equi-curved', singlet(0)],
  ['flat behind', singlet(1)],
  ['flat in front', singlet(-1)],
  ['a meniscus bent to the right', singlet(3)],
  ['a meniscus bent to the left', singlet(-3)],
  [
    'a cemented pair',
    { kind: 'cemented pair', materials: [CROWN, FLINT], thicknessesMm: [5, 2], bending: bendingOf(0.2) },
  ],
];

const near = (got: number, wanted: number) =>
  expect(Math.abs(got - wanted)).toBeLessThanOrEqual(KEPT * Math.max(1, Math.abs(wanted)));

describe('the demo with one of its groups made of glass', () => {
  const before = demo();
  const at = (sketch: Sketch, position: (typeof before.positions)[number]): Analysis =>
    analyse(sketch, settingAt(position.id));

  for (const [index, part] of before.parts.entries()) {
    it.each(RECIPES)(
      `keeps focal length, magnification and image in all positions: ${part.name}, %s`,
      (_, recipe) => {
        const { sketch, equivalent } = given(thickenPart(before, part.id, recipe));
        expect(faultsOf(sketch)).toEqual([]);
        const last = index === before.parts.length - 1;
        for (const position of before.positions) {
          const [was, is] = [at(before, position), at(sketch, position)];
          near(given(is.firstOrder.focalLengthMm), given(was.firstOrder.focalLengthMm));
          near(given(is.conjugates.magnification), given(was.conjugates.magnification));
          // The image behind the last principal plane, and the sensor with it.
          const rear = last ? equivalent.principalRearMm : 0;
          near(given(is.conjugates.imageDistanceMm) - rear, given(was.conjugates.imageDistanceMm));
          near(given(is.conjugates.imagePlaneMm) - rear, given(was.conjugates.imagePlaneMm));
          near(given(is.firstOrder.backFocusMm), given(was.firstOrder.backFocusMm) + rear);
          const step = equivalent.principalSpacingMm;
          near(given(is.conjugates.objectToImageMm), given(was.conjugates.objectToImageMm) + step);
          const lead = index === 0 ? equivalent.principalFrontMm : 0;
          near(given(is.conjugates.trackMm), given(was.conjugates.trackMm) + step + lead);
        }
      },
    );
  }

  it('keeps them too when all four are glass, and is the demo again when all are thin again', () => {
    let sketch = before;
    let spacings = 0;
    for (const { id } of before.parts) {
      const made = given(thickenPart(sketch, id, singlet(0.4)));
      sketch = made.sketch;
      spacings += made.equivalent.principalSpacingMm;
    }
    for (const position of before.positions) {
      const [was, is] = [at(before, position), at(sketch, position)];
      near(given(is.firstOrder.focalLengthMm), given(was.firstOrder.focalLengthMm));
      near(given(is.conjugates.magnification), given(was.conjugates.magnification));
      near(given(is.conjugates.objectToImageMm), given(was.conjugates.objectToImageMm) + spacings);
    }
    for (const { id } of before.parts) sketch = given(thinPart(sketch, id)).sketch;
    near(Number(sketch.object.distanceMm), 500);
    for (const [index, part] of before.parts.entries()) {
      const again = sketch.parts[index];
      if (part.kind !== 'thin' || again?.kind !== 'thin') throw new Error('thin again');
      near(again.focalLengthMm, part.focalLengthMm);
      expect({ ...again, focalLengthMm: part.focalLengthMm, space: part.space }).toEqual({
        ...part,
        material: CROWN,
        shapeFactor: expect.closeTo(0.4, 12),
      });
      for (const { id } of before.positions)
        near(valueOn(again.space.lengthMm, id), valueOn(part.space.lengthMm, id));
    }
    expect(sketch.stop).toBe(before.stop);
  });

  it('leaves gaps that are common to all positions common, and those of each position apart', () => {
    const { sketch } = given(thickenPart(before, 'p4' as PartId, singlet(0)));
    expect(Object.keys(sketch.parts[2]?.space.lengthMm ?? {})).toHaveLength(3);
    expect(sketch.parts[3]?.space.lengthMm).toBeTypeOf('number');
    expect(sketch.parts.slice(0, 2)).toEqual(before.parts.slice(0, 2));
  });
});

describe('f = 48 at 4 mm, by hand', () => {
  const glass = { ...GLASS, index: 1.5168 };
  const sketch = sketchOf([thin('a', 100, 30), thin('b', 48, 20)], 'a');
  const made = (q: number) => given(thickenPart(sketch, 'b' as PartId, singlet(q, 4, glass)));
  const glassOf = ({ parts }: Sketch) => {
    const part = parts[1];
    if (part?.kind !== 'glass') throw new Error('b is glass');
    return part;
  };

  // R = f(n − 1), V1H = 0, V2H′ = −t/n.
  it('flat behind: R1 = 24.8064, the gap in front stays, the one behind is shorter by t/n', () => {
    const { sketch: after, equivalent, notes } = made(1);
    const part = glassOf(after);
    expect(part.surfaces[0]?.radiusMm).toBeCloseTo(24.8064, 12);
    expect(part.surfaces[1]?.radiusMm).toBeNull();
    expect(after.parts[0]?.space.lengthMm).toBeCloseTo(30, 12);
    expect(part.space.lengthMm).toBeCloseTo(20 - 4 / 1.5168, 12);
    expect(equivalent.principalSpacingMm).toBeCloseTo(4 - 4 / 1.5168, 12);
    expect(notes.map((note) => note('mm'))).toEqual([
      'The glass is 4.000 mm thick; its principal planes, +1.363 mm from front to rear, stand for the thin part.',
      'The back focus changes by −2.637 mm, the track by +1.363 mm.',
    ]);
  });

  // R = (n − 1)(f + √(f² − f t/n)), V1H = −V2H′ = f(n − 1)t/(nR).
  it('equi-convex: R = 48.9217, both gaps shorter by 1.3372', () => {
    const R = 0.5168 * (48 + Math.sqrt(48 * 48 - (48 * 4) / 1.5168));
    const inside = (48 * 0.5168 * 4) / (1.5168 * R);
    const { sketch: after } = made(0);
    const part = glassOf(after);
    expect(part.surfaces.map(({ radiusMm }) => radiusMm)).toEqual([
      expect.closeTo(R, 10),
      expect.closeTo(-R, 10),
    ]);
    expect(R).toBeCloseTo(48.9217, 4);
    expect(after.parts[0]?.space.lengthMm).toBeCloseTo(30 - inside, 12);
    expect(part.space.lengthMm).toBeCloseTo(20 - inside, 12);
    expect(inside).toBeCloseTo(1.3372, 4);
  });

  it('given at its edge, or with equal radii curved either way', () => {
    const equal = (curved: 1 | -1): Recipe => ({
      kind: 'singlet',
      material: glass,
      bending: { front: 1, rear: 1 },
      thickness: { kind: 'edge', thicknessMm: 4, semiDiameterMm: 3 },
      curved,
    });
    for (const curved of [1, -1] as const) {
      const { sketch: after } = given(thickenPart(sketch, 'b' as PartId, equal(curved)));
      const [front, rear] = glassOf(after).surfaces.map(({ radiusMm }) => radiusMm ?? 0);
      expect(front).toBeCloseTo(curved * 0.5168 * Math.sqrt((48 * 4) / 1.5168), 12);
      expect(rear).toBe(front);
      expect(
        glassOf(given(thickenPart(sketch, 'b' as PartId, equal(curved))).sketch).fillings[0]?.thicknessMm,
      ).toBeCloseTo(4, 14);
    }
  });
});

describe('a stop that rode on the part', () => {
  const lay = (more: Partial<Sketch> = {}) =>
    sketchOf([thin('a', -60, 25), thin('b', 48, 20), thin('c', 200, 10)], 'b', {
      object: { distanceMm: 300, medium: 'air' },
      aperture: { kind: 'stopDiameter', diameterMm: 8 },
      ...more,
    });
  const pupilsOf = (sketch: Sketch) => analyse(sketch, onFirst(sketch)).pupils;

  it.each([
    ['in front', 3, 1],
    ['behind', -3, 2],
    ['behind', -1, 2],
  ] as const)(
    'stands %s of a meniscus or flat front as a part of its own, the pupils kept',
    (place, q, at) => {
      const before = lay({
        groups: [
          { id: 'g1' as Sketch['groups'][number]['id'], name: 'moving', partIds: ['b', 'c'] as PartId[] },
        ],
      });
      const { sketch, notes } = given(thickenPart(before, 'b' as PartId, singlet(q)));
      expect(sketch.parts.map(({ kind }) => kind).indexOf('stop')).toBe(at);
      expect(sketch.stop).toBe(sketch.parts[at]?.id);
      expect(sketch.groups[0]?.partIds).toEqual(sketch.parts.slice(1).map(({ id }) => id));
      const [was, is] = [pupilsOf(before), pupilsOf(sketch)];
      near(given(is.entrance.zMm), given(was.entrance.zMm));
      near(given(is.exit.zMm), given(was.exit.zMm));
      near(given(is.entrance.diameterMm), given(was.entrance.diameterMm));
      near(given(is.exit.magnification), given(was.exit.magnification));
      expect(notes.at(-1)?.('mm')).toMatch(new RegExp(`^The stop stands by itself now, .* mm ${place}`));
    },
  );

  it('rides on, its pupils kept, where the front principal plane touches the first surface', () => {
    const { sketch, notes } = given(thickenPart(lay(), 'b' as PartId, singlet(1)));
    expect(sketch.stop).toBe('b');
    near(given(pupilsOf(sketch).entrance.zMm), given(pupilsOf(lay()).entrance.zMm));
    expect(notes).toHaveLength(2);
  });

  it('rides on the first surface and says how far off where both planes lie inside', () => {
    const { sketch, equivalent, notes } = given(thickenPart(lay(), 'b' as PartId, singlet(0)));
    expect(sketch.stop).toBe('b');
    expect(notes.at(-1)?.('mm')).toBe(
      `The stop rides on the first surface now, ${equivalent.principalFrontMm.toFixed(3)} mm in front of the principal plane where it stood, so the pupils move.`,
    );
    const again = given(thinPart(sketch, 'b' as PartId));
    expect(again.notes.map((note) => note('in'))).toContain(
      `The stop rides on the thin part now, ${(equivalent.principalFrontMm / 25.4).toFixed(5)} in behind the first surface where it rode, so the pupils move.`,
    );
    near(given(pupilsOf(again.sketch).entrance.zMm), given(pupilsOf(lay()).entrance.zMm));
  });
});

describe('any sketch with a thin part made of glass', () => {
  it('keeps its power, and all of its matrix when the part stands inside, in whatever media, and comes back', () => {
    fc.assert(
      fc.property(
        anySketch({ leastParts: 1, mostParts: 5 }),
        fc.nat(),
        fc.constantFrom(...RECIPES.map(([, recipe]) => recipe)),
        (sketch, pick, recipe) => {
          const thins = sketch.parts.filter(({ kind }) => kind === 'thin');
          const part = thins[pick % Math.max(thins.length, 1)];
          if (part === undefined) return;
          const made = thickenPart(sketch, part.id, recipe);
          if (!made.ok) return;
          const glass = made.value.sketch;
          for (const { id } of sketch.positions) {
            const [was, is] = [analyse(sketch, settingAt(id)), analyse(glass, settingAt(id))];
            const [{ matrix }, { matrix: after }] = [was.firstOrder, is.firstOrder];
            if (!matrix.ok || !after.ok) continue;
            // Rounding of gaps and radii, on the scale that each entry was made from, here and there.
            const same = (entry: 'a' | 'b' | 'c' | 'd') =>
              expect(Math.abs(after.value[entry] - matrix.value[entry])).toBeLessThanOrEqual(
                1e-9 * (matrix.value[`${entry}Scale`] + after.value[`${entry}Scale`]),
              );
            same('c');
            const inside = part !== sketch.parts[0] && part !== sketch.parts.at(-1);
            if (inside) for (const entry of ['a', 'b', 'd'] as const) same(entry);
          }
          const thinAgain = given(thinPart(glass, part.id)).sketch.parts.find(({ id }) => id === part.id);
          if (thinAgain?.kind !== 'thin' || part.kind !== 'thin') throw new Error('thin again');
          expect(thinAgain.focalLengthMm / part.focalLengthMm).toBeCloseTo(1, 9);
        },
      ),
    );
  });

  it('in standard air keeps the power 1/f to the last digits', () => {
    const before = sketchOf([thin('a', 100, 30), thin('b', -48, 20)], null, { air: 'standard' });
    const { sketch } = given(thickenPart(before, 'b' as PartId, singlet(0.5)));
    const [was, is] = [before, sketch].map((one) => analyse(one, onFirst(one)).firstOrder);
    near(given(is?.focalLengthMm), given(was?.focalLengthMm));
    near(given(is?.principalFrontMm), given(was?.principalFrontMm));
  });
});

describe('what cannot be made', () => {
  const sketch = sketchOf([thin('a', 100, 30), thin('b', 48, 20)]);
  const why = (id: string, recipe: Recipe) => {
    const made = thickenPart(sketch, id as PartId, recipe);
    return made.ok ? 'made' : made.why;
  };

  it('says why', () => {
    expect(why('z', singlet(0))).toBe('no such part');
    expect(why('a', singlet(0, 4, { material: 'unobtainium' }))).toBe('no index');
    expect(why('b', singlet(0, 100))).toBe('no such radii');
    const pair = (material: SolidMedium): Recipe => ({
      kind: 'cemented pair',
      materials: [CROWN, material],
      thicknessesMm: [4, 2],
      bending: bendingOf(0),
    });
    expect(why('b', pair({ code: 'not a code' }))).toBe('no index');
    expect(why('b', pair(CROWN))).toBe('equal Abbe numbers');
    expect(why('b', pair({ name: 'silent', index: 1.6, abbeNumber: null }))).toBe('no dispersion');
    expect(thinPart(sketch, 'a' as PartId)).toEqual({ ok: false, why: 'no such part' });
  });

  it('glass without power is not made thin', () => {
    const glass = given(thickenPart(sketch, 'b' as PartId, singlet(1))).sketch;
    const flat = glass.parts.map(
      (part): Part =>
        part.kind === 'glass'
          ? { ...part, surfaces: part.surfaces.map((surface) => ({ ...surface, radiusMm: null })) }
          : part,
    );
    expect(thinPart({ ...glass, parts: flat }, 'b' as PartId)).toEqual({ ok: false, why: 'no power' });
  });

  it('tells that shapes beyond the sphere are lost when glass is made thin', () => {
    const glass = given(thickenPart(sketch, 'b' as PartId, singlet(1))).sketch;
    const aspheric = glass.parts.map(
      (part): Part =>
        part.kind === 'glass'
          ? { ...part, surfaces: part.surfaces.map((surface) => ({ ...surface, asphere: [1e-6] })) }
          : part,
    );
    const { notes } = given(thinPart({ ...glass, parts: aspheric }, 'b' as PartId));
    expect(notes.map((note) => note('mm'))).toContain('Conics and higher powers of its surfaces are lost.');
  });

  it('a cemented pair leaves its colour and Petzval index to the thin part', () => {
    const recipe = RECIPES.at(-1)?.[1];
    if (recipe === undefined) throw new Error('a pair is the last recipe');
    const glass = given(thickenPart(sketch, 'b' as PartId, recipe)).sketch;
    const part = given(thinPart(glass, 'b' as PartId)).sketch.parts[1];
    if (part?.kind !== 'thin') throw new Error('thin again');
    expect(part.material).toBeNull();
    // A pair has a Petzval index below that of its glasses, and hardly any colour: its Abbe number is beyond any glass's.
    expect(part.index).toBeGreaterThan(1.2);
    expect(part.index).toBeLessThan(1.5);
    expect(part.abbeNumber === null || Math.abs(part.abbeNumber) > 300).toBe(true);
  });
});
