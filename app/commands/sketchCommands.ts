import { cautionOf, sheetText, spacingTable } from '../../engine/index.ts';
import { withCaution } from '../desk/cautioned.ts';
import { copyText } from '../desk/clipboard.ts';
import { downloadPng, downloadSvg } from '../desk/exports.ts';
import { complain } from '../desk/notices.ts';
import { redo, sketchStore, undo } from '../store/sketchStore.ts';
import { setView, viewStore } from '../store/viewStore.ts';
import { command, sketchNow } from './now.ts';
import type { CommandGroup, Services } from './services.ts';

/** Opening, saving, handing over, and the way through history. */
export function sketchCommands(services: Services): CommandGroup {
  const { desk, clipboard, download, drawSheet, rasterise } = services;

  const copyTable = () => {
    const { datum, digits, unit } = viewStore.getState();
    const spacing = spacingTable(sketchNow(), { datum, digits, unit });
    if (spacing.ok) void copyText(clipboard, sheetText(spacing.value, 'tsv'), 'The spacing table is');
    else complain(spacing.refusals[0]?.sentence ?? 'The layout cannot be built as it is.');
  };

  const drawing = () => withCaution(drawSheet(), cautionOf(sketchNow()));

  const print = () => {
    setView({ sheet: 'handOver' });
    if (spacingTable(sketchNow(), viewStore.getState()).ok) services.print();
  };

  const copyLink = async () => {
    const link = await desk.link(services.page());
    if (link.ok) await copyText(clipboard, link.value, 'A link that carries the sketch is');
    else complain(link.why);
  };

  return {
    title: 'Sketch',
    commands: [
      command('undo', 'Undo', ['Ctrl+Z'], undo, () => canStep('past')),
      command('redo', 'Redo', ['Ctrl+Shift+Z', 'Ctrl+Y'], redo, () => canStep('future')),
      command('save', 'Save as a file', ['Ctrl+S'], () => void desk.saveFile()),
      command('saveElsewhere', 'Save as another file', ['Ctrl+Shift+S'], () => void desk.saveFile(true)),
      command('open', 'Open a file', ['Ctrl+O'], () => void desk.openFile()),
      command('new', 'New empty sketch', [], () => void desk.openNew()),
      command('shelf', 'Sketches on the shelf', [], () => setView({ sheet: 'shelf' })),
      command('handOver', 'Hand over', [], () => setView({ sheet: 'handOver' })),
      command('print', 'Print the hand-over', ['Ctrl+P'], print),
      command('copyTable', 'Copy the spacing table', [], copyTable),
      command('exportSvg', 'Export the drawing as SVG', [], () =>
        downloadSvg(download, drawing(), sketchNow().title),
      ),
      command(
        'exportPng',
        'Export the drawing as PNG',
        [],
        () => void downloadPng(download, drawing(), sketchNow().title, rasterise),
      ),
      command('copyLink', 'Copy a link to the sketch', [], () => void copyLink()),
    ],
  };
}

/** A gesture in progress can always be stepped out of. */
function canStep(way: 'past' | 'future'): boolean {
  const doc = sketchStore.getState();
  return doc.running !== null || doc[way].length > 0;
}
