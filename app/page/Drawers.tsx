import { lazy, Suspense } from 'react';
import { useStore } from 'zustand';
import { xOf } from '../board/viewport.ts';
import { type ClipboardHost, copyText } from '../desk/clipboard.ts';
import type { Board } from '../layout/board.ts';
import { useThemeName } from '../layout/theme.ts';
import { Ledger } from '../panels/Ledger.tsx';
import { TraceSheet } from '../panels/TraceSheet.tsx';
import { type Drawer, type PlotDrawer, setView, viewStore } from '../store/viewStore.ts';
import { Tabs } from '../ui/Tabs.tsx';
import { SpacingPreview } from './SpacingPreview.tsx';
import { useNarrow } from './useNarrow.ts';

const Plots = lazy(() => import('../plots/PlotDrawer.tsx'));

const PLOTS: readonly { readonly id: PlotDrawer; readonly label: string }[] = [
  { id: 'fans', label: 'Fans' },
  { id: 'wavefront', label: 'Wavefront' },
  { id: 'spots', label: 'Spots' },
  { id: 'field', label: 'Field' },
  { id: 'contrast', label: 'Contrast' },
  { id: 'colour', label: 'Colour' },
  { id: 'sums', label: 'Sums' },
];

const TABS: readonly { readonly id: Drawer; readonly label: string }[] = [
  ...PLOTS,
  { id: 'ledger', label: 'Ledger' },
  { id: 'trace', label: 'Trace sheet' },
  { id: 'table', label: 'Spacing table' },
];

interface DrawersProps {
  readonly clipboard: ClipboardHost;
  readonly board: () => Board | null;
}

/** The drawer under the drawing; on a narrow screen it is a sheet of the bottom bar instead. */
export function Drawers(props: DrawersProps) {
  return useNarrow() ? null : (
    <section className="drawers" aria-label="Drawer">
      <DrawerTabs {...props} />
    </section>
  );
}

/** Plots and tables by tabs; pressing the open tab closes it. */
export function DrawerTabs({ clipboard, board }: DrawersProps) {
  const drawer = useStore(viewStore, (view) => view.drawer);
  const theme = useThemeName();
  const plots = PLOTS.find(({ id }) => id === drawer)?.id;
  const copy = (text: string, what: string) => void copyText(clipboard, text, what);
  return (
    <Tabs
      label="Drawer"
      tabs={TABS}
      selected={drawer}
      onSelect={(id) => setView({ drawer: id === drawer ? null : id })}
    >
      {drawer && (
        <div className="drawers-body" data-plots-room>
          {plots && (
            <Suspense fallback={null}>
              <Plots tab={plots} theme={theme} lengthX={(zMm) => windowX(board(), zMm)} onCopy={copy} />
            </Suspense>
          )}
          {drawer === 'ledger' && <Ledger />}
          {drawer === 'trace' && <TraceSheet onCopy={(text) => copy(text, 'The trace sheet')} />}
          {drawer === 'table' && <SpacingPreview />}
        </div>
      )}
    </Tabs>
  );
}

/** Where the drawing shows a length of the axis, px in the window. */
function windowX(board: Board | null, zMm: number): number {
  const picture = board?.picture();
  const left = document.querySelector('[data-drawing]')?.getBoundingClientRect().left ?? 0;
  return picture ? left + xOf(picture.view, zMm) : left;
}
