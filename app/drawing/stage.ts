import type { Analysis, Outcome, Sketch } from '../../engine/index.ts';
import { foldOf } from '../board/fit.ts';
import type { Fold, LengthRange } from '../board/viewport.ts';
import { ownFocalLength } from './own.ts';

/** Where the drawing's lengths run, in mm from the first part's front vertex. */
export interface Stage {
  /** Where rays begin and end on the sheet. */
  readonly startMm: number;
  readonly endMm: number;
  /** Front of the first part to the rear of the last, or to the image when it lies behind: what "fit the parts" shows. */
  readonly parts: LengthRange;
  /** Everything from the object to the image. */
  readonly everything: LengthRange;
  /** Null when the object is at infinity. */
  readonly objectMm: number | null;
  /** The plane the image is taken at; null when it is at infinity. */
  readonly imageMm: number | null;
}

/** The axis of a sketch without parts. */
const EMPTY_AXIS_MM = 200;
/** The lead of rays in front of the first and behind the last part when the end itself is far away, as a share of the parts' length. */
const LEAD_SHARE = 0.35;
const LEAST_LEAD_MM = 10;
/** An image is drawn up to this many times the parts' length, or the shortest focal length, away from them. */
const FAR = 20;

/** The stage of a sketch at one setting. Never empty: a sketch without parts has 200 mm of axis. */
export function stageOf(sketch: Sketch, analysis: Analysis): Stage {
  const { places, conjugates } = analysis;
  if (sketch.parts.length === 0) {
    const range = { fromMm: 0, toMm: EMPTY_AXIS_MM };
    return {
      startMm: 0,
      endMm: EMPTY_AXIS_MM,
      parts: range,
      everything: range,
      objectMm: null,
      imageMm: null,
    };
  }
  const fronts = places.parts.map((place) => place.frontMm);
  const rears = places.parts.map((place) => place.rearMm);
  const firstMm = Math.min(...fronts);
  const lastMm = Math.max(...rears);
  const imageMm = places.sensorMm ?? behindLast(conjugates.imagePlaneMm, rears.at(-1) ?? 0);
  const objectMm = places.objectMm;
  const lengthMm = lastMm - firstMm;
  const shortestMm = shortestFocalMm(sketch, analysis);
  const aloneMm = sketch.parts.length === 1 ? shortestMm : 0;
  const farMm = FAR * Math.max(lengthMm, LEAST_LEAD_MM, shortestMm);
  const imageNear =
    imageMm !== null && (places.sensorMm !== null || (imageMm > lastMm - farMm && imageMm < lastMm + farMm));
  const toMm = imageNear ? Math.max(lastMm, imageMm) : lastMm;
  const leadMm = Math.max(LEAST_LEAD_MM, aloneMm, LEAD_SHARE * (toMm - firstMm));
  const startMm = objectMm ?? firstMm - leadMm;
  const endMm = imageNear && imageMm > lastMm ? imageMm : lastMm + leadMm;
  // A virtual image close in front of the parts belongs to them.
  const fromMm = imageNear ? Math.min(firstMm, Math.max(imageMm, firstMm - 2 * leadMm)) : firstMm;
  return {
    startMm,
    endMm,
    parts: { fromMm, toMm: endMm },
    everything: { fromMm: Math.min(startMm, fromMm), toMm: endMm },
    objectMm,
    imageMm: imageNear ? imageMm : null,
  };
}

/** The long object space cut short, or null when it is drawn to scale. */
export function stageFold(stage: Stage): Fold | null {
  if (stage.objectMm === null) return null;
  return foldOf({ fromMm: stage.objectMm, toMm: stage.parts.fromMm }, stage.parts.toMm - stage.parts.fromMm);
}

/** The least focal length of the parts in size, which a single element is as long as; 0 without any. */
function shortestFocalMm({ parts }: Sketch, analysis: Analysis): number {
  const sizes = parts.map((part, index) =>
    Math.abs(ownFocalLength(part, index, analysis) ?? Number.POSITIVE_INFINITY),
  );
  const least = Math.min(...sizes);
  return Number.isFinite(least) ? least : 0;
}

function behindLast(plane: Outcome<number, string>, lastMm: number): number | null {
  return plane.ok ? lastMm + plane.value : null;
}
