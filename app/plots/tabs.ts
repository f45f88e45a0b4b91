import type { LengthUnit, Setting, Sketch } from '../../engine/index.ts';
import { sentenceOf } from '../../engine/index.ts';
import { analysisOf } from '../live/analysis.ts';
import { exactOf } from '../live/exact.ts';
import type { PlotDrawer, PlotsView } from '../store/viewStore.ts';
import { emptyPlot, type Plot } from './plot.ts';
import { type Quality, type Source, sourceOf, type Wants } from './source.ts';
import { colourPlots } from './tabs/colour.ts';
import { contrastPlots } from './tabs/contrast.ts';
import { fanPlots } from './tabs/fans.ts';
import { fieldPlots } from './tabs/field.ts';
import { spotPlots } from './tabs/spots.ts';
import { sumPlots } from './tabs/sums.ts';
import { wavefrontPlots } from './tabs/wavefront.ts';

/** Plots that are shown together. */
export interface PlotTab {
  readonly label: string;
  readonly wants: Wants;
  readonly plots: (source: Source) => readonly Plot[];
}

const NOTHING: Wants = { fans: false, spots: false };

export const PLOT_TABS: Readonly<Record<PlotDrawer, PlotTab>> = {
  fans: { label: 'Fans', wants: { fans: true, spots: false }, plots: fanPlots },
  wavefront: { label: 'Wavefront', wants: { fans: true, spots: false }, plots: wavefrontPlots },
  spots: { label: 'Spots', wants: { fans: false, spots: true }, plots: spotPlots },
  field: { label: 'Field', wants: NOTHING, plots: fieldPlots },
  contrast: { label: 'Contrast', wants: NOTHING, plots: contrastPlots },
  colour: { label: 'Colour', wants: NOTHING, plots: colourPlots },
  sums: { label: 'Sums', wants: NOTHING, plots: sumPlots },
};

/** What decides what a tab shows at one setting. */
export interface PlotQuestion {
  readonly tab: PlotDrawer;
  readonly sketch: Sketch;
  readonly setting: Setting;
  readonly view: PlotsView;
  readonly unit: LengthUnit;
}

/** The plots of a tab for a sketch at a setting. */
export function plotsFor(
  { tab, sketch, setting, view, unit }: PlotQuestion,
  quality: Quality,
): readonly Plot[] {
  const analysis = analysisOf(sketch, setting);
  if (tab === 'sums') return sumPlots({ sketch, analysis, view });
  const { label, wants, plots } = PLOT_TABS[tab];
  const { setup } = exactOf(sketch, setting);
  if (!setup.ok) return [emptyPlot(tab, label, sentenceOf(setup.why))];
  return plots(sourceOf({ sketch, setting, analysis, setup: setup.value, view, unit, quality }, wants));
}
