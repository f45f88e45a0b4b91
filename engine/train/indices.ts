import { cauchyShare, indexOf } from '../media/medium.ts';
import { wavelengthOf } from '../sketch/lines.ts';
import type { Line, Medium, Sketch, ThinPart } from '../sketch/types.ts';

/** Index of a medium in one line, and n short − n long, 0 where no dispersion is known. */
export interface IndexAt {
  readonly index: number;
  readonly spread: number;
}

/** The media and thin powers of one sketch in one line. */
export interface Indices {
  /** The index relative to air that a thin part's glass gives it; null when no glass is chosen. */
  readonly glassOf: (part: ThinPart) => number | null;
  readonly of: (medium: Medium) => IndexAt;
  /** Power of a thin part in the line and power short − power long, 1/mm. */
  readonly powerOf: (part: ThinPart) => { readonly powerPerMm: number; readonly spreadPerMm: number };
}

/**
 * Reads indices in `line` of `sketch`. A thin part's focal length holds in the main line: with a glass its power goes as that glass's
 * index less that of air, with an Abbe number V alone as φ·(1 + s/V), s from `cauchyShare`. The rules of the sketch see to it that
 * every medium has an index; throws when one has none, naming it.
 */
export function indicesIn(sketch: Sketch, line: Line): Indices {
  const { lines, air } = sketch;
  const wavelengthNm = wavelengthOf(lines, line);
  const share = cauchyShare(wavelengthNm, lines);
  const indexAt = (medium: Medium, nm: number): number => {
    const known = indexOf(medium, nm, lines, air);
    if (!known.ok) throw new Error(`indicesIn: ${JSON.stringify(medium)} at ${nm} nm: ${known.why}`);
    return known.value;
  };
  const plainAir: IndexAt = { index: 1, spread: 0 };
  const of = (medium: Medium): IndexAt =>
    medium === 'air' && air === 'unity'
      ? plainAir
      : {
          index: indexAt(medium, wavelengthNm),
          spread: indexAt(medium, lines.shortNm) - indexAt(medium, lines.longNm),
        };
  return {
    of,
    glassOf: ({ material }) =>
      material === null ? null : indexAt(material, wavelengthNm) / indexAt('air', wavelengthNm),
    powerOf: ({ focalLengthMm, abbeNumber, material }) => {
      const power = 1 / focalLengthMm;
      if (material === null) {
        const spreadPerMm = abbeNumber === null ? 0 : power / abbeNumber;
        return { powerPerMm: power + spreadPerMm * share, spreadPerMm };
      }
      const excess = (nm: number): number => indexAt(material, nm) - indexAt('air', nm);
      const main = excess(lines.mainNm);
      // Glass of index 1 has no power to spread.
      if (main === 0) return { powerPerMm: power, spreadPerMm: 0 };
      return {
        powerPerMm: line === 'main' ? power : (power * excess(wavelengthNm)) / main,
        spreadPerMm: (power * (excess(lines.shortNm) - excess(lines.longNm))) / main,
      };
    },
  };
}
