import type { Family, Material } from './materials.ts';
import type { Nominal } from './medium.ts';

/** What a material is called by its kind: a glass is a crown or a flint. */
export type Kind = 'crown' | 'flint' | Exclude<Family, 'glass'>;

/** From this index on the border between crown and flint lies at a smaller Abbe number, as glass makers have it. */
const DENSE_INDEX = 1.6;
const BORDER = { light: 55, dense: 50 } as const;

/** Crown or flint for a glass, else the family. */
export function kindOf({ family, nd, vd }: Material): Kind {
  if (family !== 'glass') return family;
  const border = nd !== null && nd >= DENSE_INDEX ? BORDER.dense : BORDER.light;
  return vd !== null && vd >= border ? 'crown' : 'flint';
}

/**
 * The materials that every word of `text` fits: a part of the name, without regard to case and hyphens; the beginning or
 * the end of the six-digit code; or the beginning of its kind (`glass`, `crown`, `flint`, `plastic`, `crystal`, `liquid`). All for an empty text.
 */
export function filterMaterials(materials: readonly Material[], text: string): readonly Material[] {
  const words = text.split(/\s+/).map(plain).filter(Boolean);
  if (words.length === 0) return materials;
  return materials.filter((material) => words.every((word) => fits(material, word)));
}

function fits(material: Material, word: string): boolean {
  const code = material.sixDigitCode ?? '';
  return (
    plain(material.name).includes(word) ||
    plain(material.id).includes(word) ||
    code.startsWith(word) ||
    code.endsWith(word) ||
    material.family.startsWith(word) ||
    kindOf(material).startsWith(word)
  );
}

/** The material of this name or id, without regard to case, hyphens and what stands in brackets; null when there is none. */
export function materialNamed(materials: readonly Material[], text: string): Material | null {
  const wanted = plain(text);
  if (wanted === '') return null;
  return (
    materials.find(({ id }) => plain(id) === wanted) ??
    materials.find(({ name }) => plain(name) === wanted || plain(name.replace(/\(.*/, '')) === wanted) ??
    null
  );
}

const plain = (text: string): string => text.toLowerCase().replace(/[^a-z0-9]/g, '');

/** A step on the map of index against Abbe number. */
export type MapDirection = 'higher index' | 'lower index' | 'higher Abbe number' | 'lower Abbe number';

/** On the map an index of 0.01 counts as much as an Abbe number of 1, about as catalogues draw it. */
const ABBE_PER_INDEX = 100;
/** Sideways distance counts this much more where nothing lies within 45° of the direction. */
const ASIDE = 3;

/**
 * The nearest material in a direction from a place on the map: of those within 45° of it, else of all on that side. Null when none
 * lies there, or the place is not on the map. Materials without index or Abbe number are not on the map.
 */
export function neighbour(
  materials: readonly Material[],
  from: Nominal,
  direction: MapDirection,
): Material | null {
  let ahead: Found | null = null;
  let aside: Found | null = null;
  for (const material of materials) {
    const step = stepTo(from, material, direction);
    if (step === null || !(step.along > 0)) continue;
    if (step.across <= step.along) ahead = nearer(ahead, material, Math.hypot(step.along, step.across));
    else aside = nearer(aside, material, step.along + ASIDE * step.across);
  }
  return (ahead ?? aside)?.material ?? null;
}

interface Found {
  readonly material: Material;
  readonly distance: number;
}

const nearer = (found: Found | null, material: Material, distance: number): Found =>
  found !== null && found.distance <= distance ? found : { material, distance };

/** How far `to` lies from `from` in the direction and, without sign, across it, in Abbe numbers. */
function stepTo(
  from: Nominal,
  to: Nominal,
  direction: MapDirection,
): { readonly along: number; readonly across: number } | null {
  if (from.nd === null || from.vd === null || to.nd === null || to.vd === null) return null;
  const index = (to.nd - from.nd) * ABBE_PER_INDEX;
  const abbe = to.vd - from.vd;
  switch (direction) {
    case 'higher index':
      return { along: index, across: Math.abs(abbe) };
    case 'lower index':
      return { along: -index, across: Math.abs(abbe) };
    case 'higher Abbe number':
      return { along: abbe, across: Math.abs(index) };
    case 'lower Abbe number':
      return { along: -abbe, across: Math.abs(index) };
  }
}
