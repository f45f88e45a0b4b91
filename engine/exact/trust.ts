import { none, type Outcome, some } from '../outcome.ts';
import type { Absence } from '../paraxial/absence.ts';
import { chiefSweep, sweepHeight } from './chiefSweep.ts';
import { paraxialOn, yOn } from './imagePlane.ts';
import { aimRays, pupilMapOf } from './pupilMap.ts';
import { STRIDE } from './rayBuffer.ts';
import { traceThrough } from './through.ts';
import type { ExactSetup } from './types.ts';

/** How far down aperture and field the first order can be trusted: shares from 0 to 1 of the stop's radius and of the field. */
export interface Trust {
  /** Up to here rays of the axial bundle meet the image plane within the limit of the paraxial ones. */
  readonly apertureShare: number;
  /** Up to here chief rays do. */
  readonly fieldShare: number;
}

/** Shares looked at one by one; between two of them the error is taken to run one way. */
const SCANNED = 24;
/** So many at once: beyond the first that passes the limit, where rays are lost and hard to aim, none are needed. */
const AT_ONCE = 6;
/** Halvings of the interval in which the limit is first passed; in what is left of it, 1/1500, the error is taken as straight. */
const HALVINGS = 6;

/**
 * The shares of aperture (on the axis) and field (chief rays) up to which exact and paraxial rays of the main line meet the image plane within `limitMm` of each
 * other. It is the first share beyond which they do not: an error that falls below the limit again further out is not trusted, and a ray that is lost
 * passes every limit. 'image at infinity'.
 */
export function trust(setup: ExactSetup, limitMm: number): Outcome<Trust, Absence> {
  if (!setup.imagePlaneMm.ok) return setup.imagePlaneMm;
  const plane = setup.imagePlaneMm.value;
  const up = Math.sign(setup.marginal.y[setup.stopSurface]!);
  const [marginalMm, chiefMm] = [
    paraxialOn(setup, setup.marginal, plane),
    paraxialOn(setup, setup.chief, plane),
  ];
  if (!Number.isFinite(marginalMm + chiefMm)) return none('out of range');
  const map = pupilMapOf(setup, 0, 0);
  const apertureError = (shares: Float64Array): Float64Array => {
    const rays = new Float64Array(shares.length * STRIDE);
    const pupil = Float64Array.from({ length: 2 * shares.length }, (_, i) =>
      i % 2 === 0 ? 0 : up * shares[(i - 1) / 2]!,
    );
    aimRays(map, pupil, shares.length, rays);
    traceThrough(setup.lines[0].train, rays, shares.length);
    return shares.map((share, i) => yOn(rays, i * STRIDE, plane) - share * marginalMm);
  };
  const fieldError = (shares: Float64Array): Float64Array => {
    const sweep = chiefSweep(setup, 0, shares);
    return shares.map((share, i) => sweepHeight(sweep, i, plane) - share * chiefMm);
  };
  return some({
    apertureShare: firstBeyond(apertureError, limitMm),
    fieldShare: firstBeyond(fieldError, limitMm),
  });
}

/** The largest share up to which no error is beyond the limit. */
function firstBeyond(errorAt: (shares: Float64Array) => Float64Array, limitMm: number): number {
  // How far beyond the limit; NaN, for a lost ray, is beyond too.
  const excess: number[] = [];
  let first = -1;
  while (first < 0 && excess.length < SCANNED) {
    const done = excess.length;
    const shares = Float64Array.from({ length: AT_ONCE }, (_, i) => (done + i + 1) / SCANNED);
    for (const error of errorAt(shares)) excess.push(Math.abs(error) - limitMm);
    first = excess.findIndex((over) => !(over <= 0));
  }
  if (first < 0) return 1;
  let [within, without] = [first / SCANNED, (first + 1) / SCANNED];
  let [under, over] = [first === 0 ? -limitMm : excess[first - 1]!, excess[first]!];
  for (let i = 0; i < HALVINGS; i++) {
    const middle = (within + without) / 2;
    const there = Math.abs(errorAt(Float64Array.of(middle))[0]!) - limitMm;
    if (there <= 0) [within, under] = [middle, there];
    else [without, over] = [middle, there];
  }
  const straight = within + ((without - within) * under) / (under - over);
  return Number.isFinite(straight) ? straight : within;
}
