import type { DrawnRay, FieldSpot, Outcome } from '../../../engine/index.ts';
import { drawnField, heightInSpace } from '../../../engine/index.ts';
import { fieldBundle, type RayName } from '../../board/styles.ts';
import type { Reading } from '../../live/reading.ts';
import { endedAtRim } from '../exact/rays.ts';
import { axialPupil, fieldPupils } from '../pupilPoints.ts';
import { stageOf } from '../stage.ts';

/** CSS px to the mm of a screen at real size. */
export const REAL_PX_PER_MM = 96 / 25.4;
/** Least and greatest magnification. */
export const TIMES_LIMITS = { least: 0.5, most: 100000 } as const;

/** A point of the layout: z from the first vertex, height above the axis. */
interface Place {
  readonly zMm: number;
  readonly yMm: number;
}

/** What the loupe looks at, in mm of the layout. */
export interface LoupeLook {
  readonly zMm: number;
  readonly yMm: number;
  /** The image plane; null when it is far away. */
  readonly imageMm: number | null;
  /** The plane through focus. */
  readonly planeMm: number;
  /** Share of the field whose chief ray passes nearest. */
  readonly share: number;
  readonly style: RayName;
  readonly spot: Outcome<FieldSpot, string>;
  /** rms radius of the spot on the plane through focus, all lines together. */
  readonly rmsMm: Outcome<number, string>;
  readonly airyRadiusMm: number | null;
  readonly pixelPitchMm: number | null;
  readonly paraxialPoint: Place | null;
  readonly bestFocus: Place | null;
  /** Whether exact rays can differ from paraxial ones. */
  readonly differs: boolean;
}

/** What the loupe of a reading looks at: by the view, or at the end of the field on the image plane. Null without parts. */
export function loupeLook(reading: Reading): LoupeLook | null {
  const { sketch, analysis, view, exact } = reading;
  const { train, light, rays } = analysis;
  if (train.count === 0) return null;
  const { loupe } = view;
  const stage = stageOf(sketch, analysis);
  const zMm = loupe.zMm ?? stage.imageMm ?? stage.endMm;
  const chief = rays.chief.ok ? rays.chief.value : null;
  const chiefMm = chief ? heightInSpace(train, chief, spaceAt(train.z, train.count, zMm), zMm) : 0;
  const { fractions } = sketch.field;
  const outermost = fractions.reduce((most, share) => (Math.abs(share) > Math.abs(most) ? share : most), 0);
  const yMm = loupe.heightMm ?? outermost * chiefMm;
  const share = nearest(fractions, yMm, chiefMm);
  const spot = exact.spot(share);
  const lastMm = train.z[train.count - 1] ?? 0;
  const imageDistance = analysis.conjugates.imagePlaneMm;
  const planeMm = zMm + loupe.planeMm;
  const defocusMm = imageDistance.ok ? planeMm - lastMm - imageDistance.value : 0;
  const sizeAt = (shiftMm: number) => (spot.ok ? spot.value.sizeAt(shiftMm) : spot);
  const size =
    planeMm < lastMm ? ({ ok: false, why: 'only behind the last surface' } as const) : sizeAt(defocusMm);
  const fNumber = light.workingFNumber;
  const paraxial = analysis.conjugates.imageDistanceMm;
  return {
    zMm,
    yMm,
    imageMm: stage.imageMm,
    planeMm,
    share,
    style: styleOf(fractions, share),
    spot,
    rmsMm: size.ok ? { ok: true, value: size.value.rmsMm } : size,
    airyRadiusMm: fNumber.ok ? 1.22 * sketch.lines.mainNm * 1e-6 * fNumber.value : null,
    pixelPitchMm: sketch.sensor?.pixelPitchMm ?? null,
    paraxialPoint:
      paraxial.ok && chief
        ? {
            zMm: lastMm + paraxial.value,
            yMm: share * heightInSpace(train, chief, train.count, lastMm + paraxial.value),
          }
        : null,
    bestFocus: bestOf(spot, imageDistance.ok ? lastMm + imageDistance.value : null),
    differs: exact.differs,
  };
}

function bestOf(spot: Outcome<FieldSpot, string>, imageMm: number | null): Place | null {
  if (!spot.ok || imageMm === null || !spot.value.bestMm.ok) return null;
  const shiftMm = spot.value.bestMm.value;
  const size = spot.value.sizeAt(shiftMm);
  return size.ok ? { zMm: imageMm + shiftMm, yMm: size.value.centroidYMm } : null;
}

/** The number of surfaces that stand at or in front of the plane. */
function spaceAt(z: ArrayLike<number>, count: number, zMm: number): number {
  let space = count;
  while (space > 0 && (z[space - 1] ?? 0) > zMm) space--;
  return space;
}

/** The share of the field whose paraxial chief ray, `chiefMm` high at the full field, is nearest to the height. */
function nearest(fractions: readonly number[], yMm: number, chiefMm: number): number {
  const apart = (share: number) => Math.abs(share * chiefMm - yMm);
  return fractions.reduce((best, share) => (apart(share) < apart(best) ? share : best), fractions[0] ?? 0);
}

function styleOf(fractions: readonly number[], share: number): RayName {
  if (share === 0) return 'axial bundle';
  const off = fractions.filter((one) => one !== 0).sort((a, b) => Math.abs(a) - Math.abs(b));
  return fieldBundle(off.indexOf(share), off.length);
}

/** Rays of the bundle in the loupe. */
const LOUPE_RAYS = 9;

/** The rays of the field that the loupe looks at, drawn from `fromMm` to `toMm`, with the rims' share of the pupil. */
export function loupeRays(
  reading: Reading,
  share: number,
  fromMm: number,
  toMm: number,
): readonly DrawnRay[] {
  const { analysis, exact } = reading;
  const map = exact.pencil(share);
  if (!map) return [];
  const points =
    share === 0
      ? axialPupil(analysis, LOUPE_RAYS)
      : (fieldPupils(analysis, LOUPE_RAYS).find((field) => field.share === share)?.points ?? [0]);
  const { marginal, stopSurface } = map.setup;
  const up = (marginal.y[stopSurface] ?? 0) < 0 ? -1 : 1;
  const pupil = points.flatMap((point) => [0, up * point]);
  const { rays } = drawnField(map, pupil, { fromMm, toMm, clip: false, aimed: true });
  return rays.map((ray) => endedAtRim(ray, analysis.train));
}

/** Half of what the loupe shows, as a share of the reach that shall be seen. */
const ROOM = 1.4;
/** The radius that magnifications are fitted for, px. */
const FITTED_PX = 85;

/** The magnifications, in steps of 1, 2 and 5, at which the loupe shows image, best focus, spot and Airy disc. */
export function fittedTimes(look: LoupeLook): { readonly lengths: number; readonly heights: number } {
  const { bestFocus, spot, zMm, yMm, airyRadiusMm, paraxialPoint, pixelPitchMm } = look;
  const airyMm = airyRadiusMm ?? pixelPitchMm ?? 0.005;
  const places = [bestFocus, paraxialPoint].filter((place) => place !== null);
  const size = spot.ok ? spot.value.sizeAt(0) : null;
  const spotMm = size?.ok ? size.value.largestMm + Math.abs(size.value.centroidYMm - yMm) : 0;
  const reachZ = Math.max(8 * airyMm, ...places.map((place) => Math.abs(place.zMm - zMm)));
  const reachY = Math.max(3 * airyMm, spotMm, ...places.map((place) => Math.abs(place.yMm - yMm)));
  return { lengths: timesFor(reachZ), heights: timesFor(reachY) };
}

function timesFor(reachMm: number): number {
  const times = FITTED_PX / (ROOM * reachMm * REAL_PX_PER_MM);
  const power = 10 ** Math.floor(Math.log10(times));
  const step = [5, 2, 1].find((one) => one * power <= times) ?? 1;
  return Math.min(TIMES_LIMITS.most, Math.max(TIMES_LIMITS.least, step * power));
}
