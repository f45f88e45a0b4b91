import { useStore } from 'zustand';
import { PartCard } from '../panels/PartCard.tsx';
import { Readouts } from '../panels/Readouts.tsx';
import { SketchCard } from '../panels/SketchCard.tsx';
import type { Commands } from '../panels/useCommand.ts';
import { Warnings } from '../panels/Warnings.tsx';
import { setView, type View, viewStore } from '../store/viewStore.ts';
import { SheetDialog } from '../ui/SheetDialog.tsx';

type Panel = NonNullable<View['panel']>;

const PANELS: readonly { readonly id: Panel; readonly label: string; readonly title: string }[] = [
  { id: 'readouts', label: 'Readouts', title: 'Readouts' },
  { id: 'part', label: 'Part', title: 'Selected part' },
  { id: 'sketch', label: 'Sketch', title: 'Sketch' },
  { id: 'warnings', label: 'Warnings', title: 'Warnings' },
];

interface BottomBarProps {
  readonly commands: Commands;
}

/** The narrow screen's way to the panels: each rises from below and leaves the drawing in view. */
export function BottomBar({ commands }: BottomBarProps) {
  const panel = useStore(viewStore, (view) => view.panel);
  const close = () => setView({ panel: null });
  const open = PANELS.find(({ id }) => id === panel);
  return (
    <>
      <nav className="bottom-bar" aria-label="Panels">
        {PANELS.map(({ id, label }) => (
          <button
            key={id}
            type="button"
            aria-pressed={panel === id}
            onClick={() => setView({ panel: panel === id ? null : id })}
          >
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
            {panel === 'readouts' && <Readouts />}
            {panel === 'part' && <PartCard commands={commands} />}
            {panel === 'sketch' && <SketchCard titled={false} />}
            {panel === 'warnings' && <Warnings titled={false} />}
          </SheetDialog>
        </div>
      )}
    </>
  );
}
