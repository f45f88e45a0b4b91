import type { Part } from '../../engine/index.ts';
import { thinPart, unsolvableSentence } from '../../engine/index.ts';
import { complain, say } from '../desk/notices.ts';
import { analysisOf } from '../live/analysis.ts';
import { bentToBest, hasBestForm } from '../panels/part/thickenWish.ts';
import { applyEdit } from '../store/sketchStore.ts';
import { setView, viewStore } from '../store/viewStore.ts';
import { command, selectedNow, settingNow, sketchNow } from './now.ts';
import type { CommandGroup } from './services.ts';

/** Making thin parts of glass and back, and bending to a best form. */
export function glassCommands(): CommandGroup {
  return {
    title: 'Glass',
    commands: [
      command('thicken', 'Thicken the selected thin part into real glass', [], thicken, () => isKind('thin')),
      command('makeThin', 'Make the selected glass thin', [], makeThin, () => isKind('glass')),
      command(
        'bendLeastSpherical',
        'Bend the selected lens to least spherical aberration for its conjugates',
        [],
        bend('least spherical'),
        canBend,
      ),
      command(
        'bendZeroComa',
        'Bend the selected lens to zero coma for its conjugates',
        [],
        bend('zero coma'),
        canBend,
      ),
    ],
  };
}

/** The one selected part. */
function onlyPart(): Part | undefined {
  const [id, another] = selectedNow();
  return another === undefined ? sketchNow().parts.find((part) => part.id === id) : undefined;
}

const isKind = (kind: Part['kind']): boolean => onlyPart()?.kind === kind;
const canBend = (): boolean => hasBestForm(onlyPart());

function thicken(): void {
  const part = onlyPart();
  if (part) setView({ thickening: part.id });
}

function makeThin(): void {
  const part = onlyPart();
  if (!part) return;
  const made = thinPart(sketchNow(), part.id);
  if (!made.ok) {
    complain(unsolvableSentence(made.why));
    return;
  }
  const { sketch, notes } = made.value;
  applyEdit(() => sketch);
  const { unit } = viewStore.getState();
  say(notes.map((note) => note(unit)).join(' '));
}

const bend = (best: 'least spherical' | 'zero coma') => () => {
  const part = onlyPart();
  if (!hasBestForm(part)) return;
  const setting = settingNow();
  const analysis = analysisOf(sketchNow(), setting);
  const bent = bentToBest({ sketch: sketchNow(), analysis }, part, best);
  if (!bent.ok) {
    complain(bent.why);
    return;
  }
  const { value } = bent;
  applyEdit(() => value);
};
