import type { DispersionFormula } from './dispersion.ts';
import data from './materials.json' with { type: 'json' };

export type Family = 'glass' | 'plastic' | 'crystal' | 'liquid';

/** Constants of the change of the absolute index with temperature. */
export interface ThermalConstants {
  readonly D0: number;
  readonly D1: number;
  readonly D2: number;
  readonly E0: number;
  readonly E1: number;
  readonly lambdaTkUm: number;
  readonly referenceC: number;
}

/** A material of the catalogue. `null` stands where its data page gives nothing. */
export interface Material {
  readonly id: string;
  readonly name: string;
  readonly family: Family;
  readonly sixDigitCode: string | null;
  readonly formula: DispersionFormula;
  /** Where the formula holds. */
  readonly rangeNm: readonly [number, number];
  /** What the formula's index is relative to. */
  readonly relativeTo: 'air' | 'vacuum';
  /** The formula's index in the d line. */
  readonly nd: number | null;
  /** (nd − 1)/(nF − nC) of the formula. */
  readonly vd: number | null;
  readonly densityGPerCm3: number | null;
  readonly thermal: ThermalConstants | null;
  /** Mean over −30 to 70 °C. */
  readonly expansionPerK: number | null;
  readonly source: { readonly dataSet: string; readonly path: string; readonly reference: string };
}

/** The data do not say it; known from other sources, see README.md here. */
const RELATIVE_TO_VACUUM: ReadonlySet<string> = new Set(['water']);

/** Every material of the catalogue, in its order: glasses, crystals, plastics, water. */
export const materials: readonly Material[] = (
  data as unknown as readonly Omit<Material, 'relativeTo'>[]
).map((item) => ({ ...item, relativeTo: RELATIVE_TO_VACUUM.has(item.id) ? 'vacuum' : 'air' }));

const byId = new Map(materials.map((material) => [material.id, material]));

/** The material with this id; null when the catalogue has none. */
export const materialOf = (id: string): Material | null => byId.get(id) ?? null;
