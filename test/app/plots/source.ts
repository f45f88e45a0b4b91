import { analysisOf } from '../../../app/live/analysis.ts';
import { exactOf } from '../../../app/live/exact.ts';
import type { Plot } from '../../../app/plots/plot.ts';
import { type Quality, type Source, sourceOf } from '../../../app/plots/source.ts';
import type { PlotsView } from '../../../app/store/viewStore.ts';
import type { Sketch } from '../../../engine/index.ts';
import { settingAt } from '../../../engine/index.ts';

export const PLOTS_VIEW: PlotsView = { all: false, spots: 'plane', distortion: 'paraxial', sum: 'spherical' };

/** The source of the plots of a sketch at its first position. */
export function plotSource(sketch: Sketch, quality: Quality = 'fine', view: Partial<PlotsView> = {}): Source {
  const [position] = sketch.positions;
  if (!position) throw new Error('plotSource: no position');
  const setting = settingAt(position.id);
  const { setup } = exactOf(sketch, setting);
  if (!setup.ok) throw new Error(setup.why);
  return sourceOf(
    {
      sketch,
      setting,
      analysis: analysisOf(sketch, setting),
      setup: setup.value,
      view: { ...PLOTS_VIEW, ...view },
      unit: 'mm',
      quality,
    },
    { fans: true, spots: true },
  );
}

/** The plot of this title, of the kind asked for. */
export function plotOf<Kind extends Plot['kind']>(
  plots: readonly Plot[],
  title: string,
  kind: Kind,
): Extract<Plot, { kind: Kind }> {
  const plot = plots.find((one) => one.title === title);
  if (plot?.kind !== kind)
    throw new Error(`no plot "${title}" of kind ${kind}: ${plots.map((p) => p.title)}`);
  return plot as Extract<Plot, { kind: Kind }>;
}
