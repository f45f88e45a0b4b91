import type { MeasureText } from '../../app/board/measure.ts';
import type { Reading } from '../../app/live/reading.ts';
import type { Plot } from '../../app/plots/plot.ts';
import { sourceOf } from '../../app/plots/source.ts';
import { PLOT_TABS } from '../../app/plots/tabs.ts';
import { traceBatch } from '../../engine/exact/kernel.ts';
import { N, STRIDE, X, Y } from '../../engine/exact/rayBuffer.ts';
import type { ExactSetup } from '../../engine/exact/types.ts';
import type { Sketch } from '../../engine/sketch/types.ts';
import { readingOf } from '../app/reading.ts';
import { liveFrames } from './liveUpdate.ts';

/** The exact rays of one update with all plots: through the whole train, and up to the stop while others are aimed. The test counts them, within 5 %. */
export const UPDATE_RAYS = { through: 2875, toStop: 2611 } as const;

/** The plots of every tab, as while a hand moves, from one source: more than the drawer ever shows at once. */
export function allPlots({ sketch, setting, analysis, view, exact }: Reading): readonly Plot[] {
  const { setup } = exact;
  if (!setup.ok) throw new Error(`allPlots: ${setup.why}`);
  const given = { sketch, setting, analysis, setup: setup.value, view: view.plots, unit: view.unit };
  const source = sourceOf({ ...given, quality: 'coarse' }, { fans: true, spots: true });
  return Object.values(PLOT_TABS).flatMap(({ plots }) => plots(source));
}

/** A task that is one move of a drag with everything on screen and all plots, nothing painted. */
export function liveZoom(pressed: Sketch, measureText: MeasureText): () => number {
  const next = liveFrames(pressed, measureText);
  return () => {
    const { reading, picture, texts } = next();
    let sum = picture.handles.length + texts.length;
    for (const plot of allPlots(reading)) {
      sum += plot.title.length;
      if (plot.kind === 'curves') for (const { y } of plot.curves) sum += y.at(-1) ?? 0;
      if (plot.kind === 'spots') sum += plot.spots[0]?.rms ?? 0;
    }
    return sum;
  };
}

/** A task that traces as many rays as an update needs, with the kernel alone. */
export function zoomRays(sketch: Sketch): () => number {
  const { setup } = readingOf(sketch).exact;
  if (!setup.ok) throw new Error(`zoomRays: ${setup.why}`);
  const { lines, stopSurface } = setup.value;
  const { train } = lines[0];
  const [through, toStop] = [UPDATE_RAYS.through, UPDATE_RAYS.toStop].map((count) =>
    bundle(setup.value, count),
  );
  if (!through || !toStop) throw new Error('zoomRays: no rays');
  const [rays, aimed] = [through.slice(), toStop.slice()];
  return () => {
    rays.set(through);
    aimed.set(toStop);
    traceBatch(train, rays, UPDATE_RAYS.through, true);
    traceBatch(train, aimed, UPDATE_RAYS.toStop, false, 0, stopSurface + 1);
    return (rays.at(Y - STRIDE) ?? 0) + (aimed.at(Y - STRIDE) ?? 0);
  };
}

/** Rays parallel to the axis that fill the entrance pupil. */
function bundle({ marginal }: ExactSetup, count: number): Float64Array {
  const rays = new Float64Array(count * STRIDE);
  for (let i = 0; i < count; i++) {
    const radius = Math.abs(marginal.y[0] ?? 0) * Math.sqrt((i + 0.5) / count);
    rays[i * STRIDE + X] = radius * Math.cos(2.4 * i);
    rays[i * STRIDE + Y] = radius * Math.sin(2.4 * i);
    rays[i * STRIDE + N] = 1;
  }
  return rays;
}
