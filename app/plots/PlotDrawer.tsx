import { useEffect, useRef, useState } from 'react';
import { useStore } from 'zustand';
import type { SumName } from '../../engine/index.ts';
import { SUM_NAMES, SUM_WORDS } from '../../engine/index.ts';
import type { ThemeName } from '../board/styles.ts';
import { currentReading, useReading, useReadingNow } from '../live/reading.ts';
import { type PlotsView, select, setView, type PlotDrawer as Tab } from '../store/viewStore.ts';
import { Checkbox, Segmented, Select } from '../ui/choices.tsx';
import { plotsCsv } from './csv.ts';
import { followPlots } from './follow.ts';
import { createPlotGrid, type PlotGrid } from './plotGrid.ts';
import { dropReference, hasReference, keepReference, referenceStore } from './references.ts';
import { plotsSvg } from './svg.ts';
import { PLOT_TABS } from './tabs.ts';
import './plots.css';

interface PlotDrawerProps {
  readonly tab: Tab;
  readonly theme: ThemeName;
  /** Screen x in the window of a length on the drawing, z in mm from the first surface. */
  readonly lengthX: (zMm: number) => number;
  /** Takes a text to the clipboard and says what it was. */
  readonly onCopy: (text: string, what: string) => void;
}

/** The plots of one tab of the drawer, live. React makes the frame; what changes with the sketch is drawn past it. */
export default function PlotDrawer({ tab, theme, lengthX, onCopy }: PlotDrawerProps) {
  const host = useRef<HTMLDivElement>(null);
  const legend = useRef<HTMLCanvasElement>(null);
  const busy = useRef<HTMLSpanElement>(null);
  const grid = useRef<PlotGrid | null>(null);
  const themeNow = useRef(theme);
  const lengthXNow = useRef(lengthX);
  lengthXNow.current = lengthX;

  useEffect(() => {
    if (!host.current || !legend.current) return;
    const made = createPlotGrid(host.current, legend.current, {
      theme: () => themeNow.current,
      lengthX: (zMm) => lengthXNow.current(zMm),
      onSurface: (glow) => setView({ glow }),
      onChoose: chooseSurface,
    });
    grid.current = made;
    const stop = followPlots(tab, {
      onSets: made.show,
      onBehind: (behind) => {
        if (busy.current) busy.current.hidden = !behind;
      },
      // The stems hang on the drawing's axis: they move with it.
      onFrame: tab === 'sums' ? made.repaint : () => {},
    });
    const stopReferences = referenceStore.subscribe(made.repaint);
    return () => {
      stop();
      stopReferences();
      made.destroy();
      grid.current = null;
      setView({ glow: null });
    };
  }, [tab]);

  useEffect(() => {
    themeNow.current = theme;
    grid.current?.repaint();
  }, [theme]);

  const { label } = PLOT_TABS[tab];
  const copyNumbers = () => {
    if (grid.current) onCopy(plotsCsv(grid.current.sets()), `${label}, as numbers,`);
  };
  const copyDrawing = () => {
    if (!grid.current) return;
    const { title } = currentReading().sketch;
    const layout = grid.current.layout();
    const named = title === '' ? label : `${title}: ${label.toLowerCase()}`;
    onCopy(plotsSvg({ title: named, sets: grid.current.sets(), ...layout }), `${label}, as a drawing,`);
  };

  return (
    <section className="plots" aria-label={label}>
      <div className="plots-head">
        <div className="plots-legend">
          <canvas ref={legend} role="img" aria-label="Legend" />
        </div>
        <span ref={busy} className="plots-busy" role="status" hidden>
          catching up
        </span>
        <div className="plots-ways">
          <Options tab={tab} />
          <References grid={() => grid.current} />
          <button type="button" className="text-button" onClick={copyNumbers}>
            Copy CSV
          </button>
          <button type="button" className="text-button" onClick={copyDrawing}>
            Copy SVG
          </button>
        </div>
      </div>
      <div ref={host} className="plots-grid" />
    </section>
  );
}

const setPlots = (change: Partial<PlotsView>) =>
  setView({ plots: { ...currentReading().view.plots, ...change } });

function chooseSurface(surface: number): void {
  const { analysis, sketch } = currentReading();
  const part = sketch.parts[analysis.train.partOf[surface] ?? -1];
  if (part) select(part.id);
}

function Options({ tab }: { readonly tab: Tab }) {
  const { all, spots, distortion, sum } = useReadingNow(({ view }) => view.plots);
  const several = useReading(({ sketch }) => sketch.positions.length > 1);
  return (
    <>
      {tab === 'spots' && (
        <div className="plots-unlabelled">
          <Segmented
            label="Spots"
            value={spots}
            choices={[
              { value: 'plane', label: 'on the image plane' },
              { value: 'throughFocus', label: 'through focus' },
            ]}
            onChoose={(value) => setPlots({ spots: value })}
          />
        </div>
      )}
      {tab === 'field' && (
        <Segmented
          label="Distortion against"
          value={distortion}
          choices={[
            { value: 'paraxial', label: 'paraxial' },
            { value: 'fTheta', label: 'f·θ' },
          ]}
          onChoose={(value) => setPlots({ distortion: value })}
        />
      )}
      {tab === 'sums' && (
        <Select<SumName>
          label="Sum"
          value={sum}
          choices={SUM_NAMES.map((value) => ({ value, label: SUM_WORDS[value] }))}
          onChoose={(value) => setPlots({ sum: value })}
        />
      )}
      {several && (
        <Checkbox label="All positions" checked={all} onChange={(value) => setPlots({ all: value })} />
      )}
    </>
  );
}

function References({ grid }: { readonly grid: () => PlotGrid | null }) {
  const kept = useStore(referenceStore, (store) => store.kept);
  const [, setPressed] = useState(0);
  const sets = grid()?.sets() ?? [];
  const has = kept.size > 0 && hasReference(sets);
  const press = (act: typeof keepReference) => {
    act(grid()?.sets() ?? []);
    setPressed((count) => count + 1);
  };
  return (
    <>
      <button type="button" className="text-button" onClick={() => press(keepReference)}>
        Keep as reference
      </button>
      {has && (
        <button type="button" className="text-button" onClick={() => press(dropReference)}>
          Drop the reference
        </button>
      )}
    </>
  );
}
