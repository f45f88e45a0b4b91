import type { Edit, PartId } from '../../engine/index.ts';
import {
  duplicateParts,
  flipParts,
  flipSign,
  removeParts,
  reorderPart,
  settingAt,
  tieParts,
  untie,
} from '../../engine/index.ts';
import { setDown } from '../layout/tray.ts';
import { analysisOf } from '../live/analysis.ts';
import { applyEdit } from '../store/sketchStore.ts';
import { select, type TrayKind, viewStore } from '../store/viewStore.ts';
import { command, selectedNow, settingNow, sketchNow } from './now.ts';
import { placeBehind } from './placing.ts';
import type { CommandGroup } from './services.ts';

/** Adding, removing and changing parts. */
export function partCommands(): CommandGroup {
  return {
    title: 'Parts',
    commands: [
      command('addPositive', 'Add a positive element behind the selection', ['P'], add('positive')),
      command('addNegative', 'Add a negative element behind the selection', ['N'], add('negative')),
      command('addStop', 'Add a stop behind the selection', ['S'], add('stop')),
      command('addPlate', 'Add a plate behind the selection', ['L'], add('plate')),
      command('addGlass', 'Add a glass lens behind the selection', ['G'], add('glass')),
      command('delete', 'Delete the selected parts', ['Delete', 'Backspace'], removeSelected, hasSelected),
      command('duplicate', 'Duplicate the selected parts', ['D'], duplicateSelected, hasSelected),
      command('flip', 'Flip: reverse the order of the selected parts, or of all', ['V'], flip, hasParts),
      command(
        'flipSign',
        'Flip the sign of the selected powers',
        [],
        flipSigns,
        () => selectedThin().length > 0,
      ),
      command(
        'earlier',
        'Put the selected part one place to the left',
        ['['],
        reorder(-1),
        () => placeFor(-1) !== null,
      ),
      command(
        'later',
        'Put the selected part one place to the right',
        [']'],
        reorder(1),
        () => placeFor(1) !== null,
      ),
      command('tie', 'Tie the selected parts into a group', [], tie, () => selectedNow().length > 1),
      command(
        'untie',
        'Untie the group of the selected part',
        [],
        untieSelected,
        () => groupsOfSelected().length > 0,
      ),
    ],
  };
}

/** Makes an edit and selects the parts it added; gives their ids, none when the edit was refused. */
export function addAndSelect(edit: Edit): readonly PartId[] {
  const before = new Set(sketchNow().parts.map((part) => part.id));
  applyEdit(edit);
  const added = sketchNow()
    .parts.map((part) => part.id)
    .filter((id) => !before.has(id));
  if (added.length > 0) select(...added);
  return added;
}

/** Sets a new part down behind the selection, as the tray does. */
const add = (kind: TrayKind) => () => {
  const sketch = sketchNow();
  const analysis = analysisOf(sketch, settingAt(settingNow().at));
  setDown(kind, { zMm: placeBehind(sketch, viewStore.getState().selection, analysis), onto: null });
};

const hasParts = () => sketchNow().parts.length > 0;
const hasSelected = () => selectedNow().length > 0;

/** Deletes, and selects what then stands in the place, so that the keyboard keeps its place too. */
export function removeSelected(): void {
  const ids = selectedNow();
  const first = sketchNow().parts.findIndex((part) => part.id === ids[0]);
  applyEdit((sketch) => removeParts(sketch, ids));
  const { parts } = sketchNow();
  if (parts.some((part) => ids.includes(part.id))) return;
  const heir = parts[Math.min(first, parts.length - 1)];
  if (heir) select(heir.id);
  else select();
}

function duplicateSelected(): void {
  const ids = selectedNow();
  addAndSelect((sketch) => duplicateParts(sketch, ids));
}

/** The one selected part and the place beside it, when there is one. */
function placeFor(by: 1 | -1): { readonly id: PartId; readonly place: number } | null {
  const [id, another] = selectedNow();
  if (id === undefined || another !== undefined) return null;
  const { parts } = sketchNow();
  const place = parts.findIndex((part) => part.id === id) + by;
  return parts[place] ? { id, place } : null;
}

/** The gaps stay where they are; the part changes places with its neighbour. */
const reorder = (by: 1 | -1) => () => {
  const to = placeFor(by);
  if (to) applyEdit((sketch) => reorderPart(sketch, to.id, to.place));
};

function flip(): void {
  const ids = selectedNow();
  applyEdit((sketch) => flipParts(sketch, ids.length > 0 ? ids : sketch.parts.map((part) => part.id)));
}

const selectedThin = () => {
  const ids = selectedNow();
  return sketchNow().parts.filter((part) => part.kind === 'thin' && ids.includes(part.id));
};

function flipSigns(): void {
  const ids = selectedThin().map((part) => part.id);
  applyEdit((sketch) => ids.reduce(flipSign, sketch));
}

function tie(): void {
  const ids = selectedNow();
  applyEdit((sketch) => tieParts(sketch, ids, `group ${sketch.groups.length + 1}`));
}

const groupsOfSelected = () => {
  const ids = selectedNow();
  return sketchNow().groups.filter((group) => group.partIds.some((id) => ids.includes(id)));
};

function untieSelected(): void {
  const ids = groupsOfSelected().map((group) => group.id);
  applyEdit((sketch) => ids.reduce(untie, sketch));
}
