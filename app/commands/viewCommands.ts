import { cancelEdit, sketchStore } from '../store/sketchStore.ts';
import type { Selected, ThemeChoice } from '../store/viewStore.ts';
import { select, setView, viewStore } from '../store/viewStore.ts';
import { command, sketchNow } from './now.ts';
import type { CommandGroup, Services } from './services.ts';

const NEXT_THEME: Readonly<Record<ThemeChoice, ThemeChoice>> = {
  system: 'paper',
  paper: 'night',
  night: 'system',
};

/** What changes only the view: fits, theme, units, snapping, help, and the step back by Escape. */
export function viewCommands({ fitView }: Services): CommandGroup {
  return {
    title: 'View',
    commands: [
      command('fitParts', 'Fit the parts', ['F'], () => fitView('parts')),
      command('fitEverything', 'Fit everything, object to image', ['A'], () => fitView('everything')),
      command('theme', 'Change the theme: system, paper, night', [], () =>
        setView({ theme: NEXT_THEME[viewStore.getState().theme] }),
      ),
      command('units', 'Switch between mm and inch', [], () =>
        setView({ unit: viewStore.getState().unit === 'mm' ? 'in' : 'mm' }),
      ),
      command('snap', 'Switch snapping on and off', ['Q'], () =>
        setView({ snap: !viewStore.getState().snap }),
      ),
      command(
        'equivalentGaps',
        'Measure the gaps of glass from its vertices or its principal planes',
        [],
        () => {
          const { shown } = viewStore.getState();
          setView({ shown: { ...shown, equivalentGaps: !shown.equivalentGaps } });
        },
      ),
      command('help', 'Help', ['?'], () => setView({ sheet: 'help' })),
      command('escape', 'One step back: gesture, entry, sheet, selection', ['Escape'], stepBack),
    ],
  };
}

/** One rung of the ladder: cancel the gesture, put back what was taken, close the entry, close the sheet, deselect. */
function stepBack(): void {
  const { placing, typing, sheet, panel } = viewStore.getState();
  if (sketchStore.getState().running) cancelEdit();
  else if (placing !== null) setView({ placing: null });
  else if (typing !== null) setView({ typing: null });
  else if (sheet !== null) setView({ sheet: null });
  else if (panel !== null) setView({ panel: null });
  else select();
}

/** Ways through what can be selected. */
export function selectionCommands(): CommandGroup {
  return {
    title: 'Selection',
    commands: [
      command('previous', 'Previous part, object and image included', [','], () => step(-1)),
      command('next', 'Next part, object and image included', ['.'], () => step(1)),
      command(
        'selectAll',
        'Select all parts',
        ['Ctrl+A'],
        () => select(...sketchNow().parts.map((part) => part.id)),
        () => sketchNow().parts.length > 0,
      ),
    ],
  };
}

/** From the selected one to its neighbour along the axis; from nothing to the end where the step begins. */
function step(by: 1 | -1): void {
  const chain: readonly Selected[] = ['object', ...sketchNow().parts.map((part) => part.id), 'image'];
  const chosen = new Set<Selected>(viewStore.getState().selection);
  const from =
    by > 0 ? chain.findLastIndex((one) => chosen.has(one)) : chain.findIndex((one) => chosen.has(one));
  const start = by > 0 ? -1 : chain.length;
  const to = Math.min(chain.length - 1, Math.max(0, (from < 0 ? start : from) + by));
  const target = chain[to];
  if (target) select(target);
}
