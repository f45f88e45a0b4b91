import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { App } from './App.tsx';
import { canvasMeasure } from './board/measure.ts';
import { commandsById, createCommands } from './commands/commands.ts';
import { listenToKeys } from './commands/keys.ts';
import type { Services } from './commands/services.ts';
import { browserFiles } from './desk/browserFiles.ts';
import { browserClipboard } from './desk/clipboard.ts';
import { createDesk, flushWhenHidden } from './desk/desk.ts';
import { onFileDropped } from './desk/files.ts';
import { browserKeyValues } from './desk/keyValues.ts';
import { followLinks } from './desk/links.ts';
import { printSoon } from './desk/print.ts';
import { rasterise } from './desk/rasterise.ts';
import { fetchBesideApp } from './desk/starters.ts';
import { createStorage } from './desk/storage.ts';
import type { Board } from './layout/board.ts';
import { sheetDrawing } from './layout/sheetDrawing.ts';
import { currentReading } from './live/reading.ts';

let board: Board | null = null;

const files = browserFiles();
const desk = createDesk({
  storage: createStorage(browserKeyValues()),
  files,
  fetchText: fetchBesideApp,
  now: () => new Date(),
  // randomUUID exists only on https and localhost.
  newStamp: () => crypto.getRandomValues(new Uint32Array(4)).join('-'),
});
const { measure } = canvasMeasure(
  document.createElement('canvas').getContext('2d') as CanvasRenderingContext2D,
);
const services: Services = {
  desk,
  clipboard: browserClipboard(),
  download: files.download,
  rasterise,
  drawSheet: () => sheetDrawing(currentReading(), measure),
  fitView: (what) => board?.fit(what),
  print: printSoon,
  page: () => location.href,
};
const groups = createCommands(services);
const commands = commandsById(groups);

const place = document.getElementById('root');
if (place === null) throw new Error('main: the page has no element "root"');
createRoot(place).render(
  <StrictMode>
    <App
      groups={groups}
      commands={commands}
      services={services}
      board={() => board}
      onBoard={(made) => {
        board = made;
      }}
    />
  </StrictMode>,
);

listenToKeys(document, commands.values(), (element) => element.closest('[data-drawing]') !== null);
onFileDropped(window, (file) => void desk.openDropped(file));
await desk.reopen(location.hash);
followLinks(desk, window);
desk.watch();
flushWhenHidden(desk, document);
