import { useStore } from 'zustand';
import type { ClipboardHost } from '../desk/clipboard.ts';
import type { Board } from '../layout/board.ts';
import { ParaxialAndExact } from '../panels/exact/ParaxialAndExact.tsx';
import { PartCard } from '../panels/PartCard.tsx';
import { Readouts } from '../panels/Readouts.tsx';
import { SketchCard } from '../panels/SketchCard.tsx';
import type { Commands } from '../panels/useCommand.ts';
import { Warnings } from '../panels/Warnings.tsx';
import { setView, type View, viewStore } from '../store/viewStore.ts';
import { SheetDialog } from '../ui/SheetDialog.tsx';
import { DrawerTabs } from './Drawers.tsx';

type Panel = NonNullable<View['panel']>;

const PANELS: readonly { readonly id: Panel; readonly label: string; readonly title: string }[] = [
  { id: 'readouts', label: 'Readouts', title: 'Readouts' },
  { id: 'part', label: 'Part', title: 'Selected part' },
  { id: 'sketch', label: 'Sketch', title: 'Sketch' },
  { id: 'plots', label: 'Plots', title: 'Plots and tables' },
  { id: 'warnings', label: 'Warnings', title: 'Warnings' },
];

interface BottomBarProps {
  readonly commands: Commands;
  readonly clipboard: ClipboardHost;
  readonly board: () => Board | null;
}

/** The narrow screen's way to the panels: each rises from below and leaves the drawing in view. */
export function BottomBar({ commands, clipboard, board }: BottomBarProps) {
  const panel = useStore(viewStore, (view) => view.panel);
  const close = () => setView({ panel: null });
  const open = PANELS.find(({ id }) => id === panel);
  const press = (id: Panel) => {
    setView({ panel: panel === id ? null : id });
    // A sheet of tabs with none chosen would show nothing.
    if (id === 'plots') setView({ drawer: viewStore.getState().drawer ?? 'fans' });
  };
  return (
    <>
      <nav className="bottom-bar" aria-label="Panels">
        {PANELS.map(({ id, label }) => (
          <button key={id} type="button" aria-pressed={panel === id} onClick={() => press(id)}>
            {label}
          </button>
        ))}
        <button type="button" onClick={() => setView({ sheet: 'handOver' })}>
          Hand over
        </button>
      </nav>
      {open && (
        <div className="bottom-sheet">
          <SheetDialog key={open.id} title={open.title} place="below" onClose={close}>
            {panel === 'readouts' && (
              <>
                <Readouts />
                <ParaxialAndExact commands={commands} />
              </>
            )}
            {panel === 'part' && <PartCard commands={commands} />}
            {panel === 'plots' && <DrawerTabs clipboard={clipboard} board={board} />}
            {panel === 'sketch' && <SketchCard titled={false} />}
            {panel === 'warnings' && <Warnings titled={false} />}
          </SheetDialog>
        </div>
      )}
    </>
  );
}
