import type {
  Absence,
  Comparison,
  FieldSpot,
  Outcome,
  PupilMap,
  Setting,
  SetupOutcome,
  Sketch,
  Trust,
} from '../../engine/index.ts';
import {
  compare,
  exactSetupOf,
  fieldSpot,
  none,
  pupilMapOf,
  refracts,
  some,
  trust,
} from '../../engine/index.ts';
import { analysisOf, remembering } from './analysis.ts';

/** Exact rays of a sketch at a setting, each thing worked out when first asked for and kept. */
export interface Exact {
  readonly setup: SetupOutcome;
  /** Whether exact rays can differ from paraxial ones at all. */
  readonly differs: boolean;
  readonly comparison: Outcome<Comparison, Absence>;
  /** Up to which shares of aperture and field both meet the image plane within a limit. */
  readonly trust: (limitMm: number) => Outcome<Trust, Absence>;
  /** The main line's pencil of a share of the field; null without a setup. */
  readonly pencil: (fraction: number) => PupilMap | null;
  /** The spot of a share of the field, all lines together. */
  readonly spot: (fraction: number) => Outcome<FieldSpot, Absence>;
}

/** The exact rays of a sketch at a setting, remembered as its analysis is. */
export const exactOf: (sketch: Sketch, setting: Setting) => Exact = remembering((sketch, setting) => {
  const analysis = analysisOf(sketch, setting);
  const setup = once(() => exactSetupOf(sketch, setting, analysis));
  const comparison = once((): Exact['comparison'] => {
    const known = setup();
    return known.ok ? some(compare(known.value)) : known;
  });
  const spots = new Map<number, Outcome<FieldSpot, Absence>>();
  const trusted = new Map<number, Outcome<Trust, Absence>>();
  return {
    get setup() {
      return setup();
    },
    differs: refracts(analysis.train),
    get comparison() {
      return comparison();
    },
    trust(limitMm) {
      const known = setup();
      if (!known.ok) return none(known.why);
      return kept(trusted, limitMm, () => trust(known.value, limitMm));
    },
    spot(fraction) {
      const known = setup();
      if (!known.ok) return none(known.why);
      return kept(spots, fraction, () => fieldSpot(known.value, fraction));
    },
    pencil(fraction) {
      const known = setup();
      return known.ok ? pupilMapOf(known.value, 0, fraction) : null;
    },
  };
});

/** `compute`, called once at most. */
function once<T>(compute: () => T): () => T {
  let result: { readonly value: T } | null = null;
  return () => {
    result ??= { value: compute() };
    return result.value;
  };
}

function kept<K, T>(known: Map<K, T>, key: K, compute: () => T): T {
  let value = known.get(key);
  if (value === undefined) {
    value = compute();
    known.set(key, value);
  }
  return value;
}
