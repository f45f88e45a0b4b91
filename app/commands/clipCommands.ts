import { copyParts, looksLikePrescription, parseClip, pasteParts, writeClip } from '../../engine/index.ts';
import { copyText, pasteText } from '../desk/clipboard.ts';
import { deskStore } from '../desk/deskStore.ts';
import { faultsLine } from '../desk/faultsText.ts';
import { complain } from '../desk/notices.ts';
import { setView } from '../store/viewStore.ts';
import { command, selectedNow, settingNow, sketchNow } from './now.ts';
import { addAndSelect, removeSelected } from './partCommands.ts';
import type { CommandGroup, Services } from './services.ts';

/** Parts to and from the clipboard, as a text that any sketch takes. */
export function clipCommands({ clipboard }: Services): CommandGroup {
  const copy = () => {
    const ids = selectedNow();
    const clip = copyParts(sketchNow(), ids, settingNow().at);
    const what = ids.length === 1 ? 'The selected part is' : `The ${ids.length} selected parts are`;
    return copyText(clipboard, writeClip(clip), what);
  };
  const cut = async () => {
    if (await copy()) removeSelected();
  };
  const hasSelected = () => selectedNow().length > 0;

  return {
    title: 'Clipboard',
    commands: [
      command('copy', 'Copy the selected parts', ['Ctrl+C'], () => void copy(), hasSelected),
      command('cut', 'Cut the selected parts', ['Ctrl+X'], () => void cut(), hasSelected),
      command(
        'paste',
        'Paste parts, or a table of surfaces, behind the selection',
        ['Ctrl+V'],
        () => void pasteText(clipboard, putIn),
      ),
      command('pastePrescription', 'Paste a prescription…', [], () => openPrescription('')),
    ],
  };
}

function putIn(text: string): void {
  const parsed = parseClip(text);
  if (!parsed.ok) {
    if (looksLikePrescription(text)) openPrescription(text);
    else complain(faultsLine(parsed.faults));
    return;
  }
  const behind = selectedNow().at(-1) ?? sketchNow().parts.at(-1)?.id ?? null;
  addAndSelect((sketch) => pasteParts(sketch, parsed.clip, behind));
}

/** A table of surfaces is shown as it is read before it becomes parts. */
function openPrescription(text: string): void {
  deskStore.setState({ pasted: text });
  setView({ sheet: 'prescription' });
}
