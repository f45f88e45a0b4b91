import { mapOutcome, none, type Outcome } from '../outcome.ts';
import type { Absence, Quantity } from '../paraxial/absence.ts';
import type { Analysis } from '../paraxial/analyse.ts';
import { weightedLines } from '../sketch/lines.ts';
import type { Setting, Sketch } from '../sketch/types.ts';
import { trainOf } from '../train/train.ts';
import { sampleOf, traceFields } from './bundles.ts';
import { bestFocus, spotMoments, type WeightedMoments } from './focus.ts';
import { hexapolarGrid } from './grids.ts';
import { landingsOf } from './landing.ts';
import { exactSetup } from './setup.ts';
import { type SpotSize, spotSize } from './spots.ts';
import type { ExactLine, ExactSetup, SetupOutcome } from './types.ts';

/**
 * What all exact analyses of a sketch at a setting start from: its trains in all lines, the paraxial rays of `analysis` and its image
 * plane. Trains away from the main line are made when first asked for. Absent for the reason that the reference rays are.
 */
export function exactSetupOf(sketch: Sketch, setting: Setting, analysis: Analysis): SetupOutcome {
  const main: ExactLine = {
    line: 'main',
    wavelengthNm: sketch.lines.mainNm,
    weight: sketch.lines.weights.main,
    train: analysis.train,
  };
  const others = weightedLines(sketch.lines)
    .slice(1)
    .map((line): ExactLine => {
      let train: ExactLine['train'] | null = null;
      return {
        ...line,
        get train() {
          train ??= trainOf(sketch, setting, line.line);
          return train;
        },
      };
    });
  return exactSetup([main, ...others], analysis.rays, analysis.conjugates.imagePlaneMm);
}

/** Rings of rays for the least spot: 1 + 3·6·7 rays a field and line. */
const RINGS = 6;

/**
 * Where the spots of these fields, all lines together, are least: in mm behind the image plane, negative in front of it. Fields count
 * alike, rims cut, every ray is aimed. 'no ray through', 'image at infinity'.
 */
export function leastSpotShift(setup: ExactSetup, fractions: readonly number[]): Quantity {
  const sample = sampleOf(0, hexapolarGrid(RINGS), { fine: true });
  const fields: WeightedMoments[] = [];
  for (const field of traceFields(setup, fractions, sample)) {
    const landings = landingsOf(field);
    if (!landings.ok) return landings;
    const moments = spotMoments(landings.value);
    if (moments.ok) fields.push({ moments: moments.value, weight: 1 });
  }
  return bestFocus(fields);
}

/** The spot of one field on planes near the image, all lines together. */
export interface FieldSpot {
  /** Where its rms radius is least, in mm behind the image plane; 'image at infinity', 'no ray through'. */
  readonly bestMm: Quantity;
  /** Its size on the plane `defocusMm` behind the image plane; 'no ray through'. */
  readonly sizeAt: (defocusMm: number) => Outcome<SpotSize, Absence>;
}

/** Rings of a spot that is looked at while something is dragged: 1 + 3·4·5 rays a line. */
const QUICK_RINGS = 4;

/** The spot of the share `fraction` of the field; rims cut, rays are placed between aimed ones. 'image at infinity'. */
export function fieldSpot(setup: ExactSetup, fraction: number): Outcome<FieldSpot, Absence> {
  const [field] = traceFields(setup, [fraction], sampleOf(0, hexapolarGrid(QUICK_RINGS)));
  if (!field) return none('no ray through');
  return mapOutcome(landingsOf(field), (landings) => {
    const moments = spotMoments(landings);
    return {
      bestMm: moments.ok ? bestFocus([{ moments: moments.value, weight: 1 }]) : moments,
      sizeAt: (defocusMm) => spotSize(landings, defocusMm),
    };
  });
}
