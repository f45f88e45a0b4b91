import { aimChief } from './chief.ts';
import { yOn } from './imagePlane.ts';
import { launch, sourceOf } from './launch.ts';
import { CODE, STRIDE } from './rayBuffer.ts';
import { sightOf } from './sight.ts';
import { traceThrough } from './through.ts';
import type { ExactSetup } from './types.ts';

/** Exact chief rays over the field in one line. Rims do not end them: a curve shall not break off where the light becomes faint. */
export interface ChiefSweep {
  readonly setup: ExactSetup;
  /** Place in the lines of the setup. */
  readonly line: number;
  /** Shares of the field, one for each ray. */
  readonly fractions: Float64Array;
  /** The rays at the first vertex plane, and behind the last surface. */
  readonly starts: Float64Array;
  readonly rays: Float64Array;
}

/** `count` shares of the field from 0 to 1. */
export const fieldShares = (count: number): Float64Array =>
  Float64Array.from({ length: count }, (_, i) => (count < 2 ? 1 : i / (count - 1)));

/** Aims and traces the chief ray at each share of the field. */
export function chiefSweep(setup: ExactSetup, line: number, fractions: Float64Array): ChiefSweep {
  const sight = sightOf(setup, line);
  const starts = new Float64Array(fractions.length * STRIDE);
  for (const [i, fraction] of fractions.entries()) {
    const chief = aimChief(sight, setup, line, fraction);
    launch(sourceOf(setup, line, fraction), 0, chief.b, starts, i * STRIDE);
    if (chief.code !== 0) starts[i * STRIDE + CODE] = chief.code;
  }
  const rays = starts.slice();
  traceThrough(sight.train, rays, fractions.length);
  return { setup, line, fractions, starts, rays };
}

/** Height (mm) of the sweep's ray `i` on the plane `planeMm` behind the last vertex; NaN when it is lost. */
export const sweepHeight = ({ rays }: ChiefSweep, i: number, planeMm: number): number =>
  yOn(rays, i * STRIDE, planeMm);
