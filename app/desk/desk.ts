import type { Fault } from '../../engine/index.ts';
import { emptySketch, parseSketch } from '../../engine/index.ts';
import { sketchStore } from '../store/sketchStore.ts';
import { setView, viewStore } from '../store/viewStore.ts';
import { createAutosave } from './autosave.ts';
import { deskStore } from './deskStore.ts';
import type { FileHost, OpenedText } from './files.ts';
import { openFile, readFile, saveFile } from './files.ts';
import { freeName } from './names.ts';
import { complain, say } from './notices.ts';
import type { Session } from './session.ts';
import { createSession } from './session.ts';
import { linkOf, textInHash } from './share.ts';
import type { Shelf } from './shelf.ts';
import { createShelf } from './shelf.ts';
import type { FetchText, Starter } from './starters.ts';
import { loadStarter, loadStarters } from './starters.ts';
import type { Kept, Storage } from './storage.ts';
import { keptViewOf, viewFrom } from './viewMemory.ts';

/** What the desk stands on; tests pass their own. */
export interface DeskParts {
  readonly storage: Storage;
  readonly files: FileHost;
  readonly fetchText: FetchText;
  readonly now: () => Date;
  /** A text that no other tab gives. */
  readonly newStamp: () => string;
}

/** Opening, saving and keeping sketches. Nothing here throws; what fails is said, and the last good sketch stays. */
export interface Desk {
  readonly shelf: Shelf;
  /** Puts back sketch and view as they were left, or the demo; then opens the sketch in `hash`, if it holds one. */
  readonly reopen: (hash: string) => Promise<void>;
  /** Opens the sketch that a link's hash carries; true when one is open, false when there is none or it is damaged. */
  readonly openLink: (hash: string) => Promise<boolean>;
  /** Starts to save by itself; returns the way to stop. Call it once `reopen` is done. */
  readonly watch: () => () => void;
  /** Writes at once what is not yet written: the page may be about to go. */
  readonly flush: () => Promise<void>;
  readonly openNew: () => Promise<void>;
  /** Lets the user choose a file; true when its sketch is open. */
  readonly openFile: () => Promise<boolean>;
  readonly openDropped: (file: File) => Promise<boolean>;
  readonly starters: () => Promise<Kept<readonly Starter[]>>;
  readonly openStarter: (starter: Starter) => Promise<boolean>;
  /** Saves into the file the sketch came from; into a new one when there is none, or when `elsewhere` is asked for. */
  readonly saveFile: (elsewhere?: boolean) => Promise<void>;
  /** A link to `page` that carries the sketch. */
  readonly link: (page: string) => Promise<Kept<string>>;
}

/** Shorter than that of the sketch, so that “saved” beside the title is true of the view as well. */
const VIEW_QUIET_MS = 300;

/** The desk made of `parts`. */
export function createDesk(parts: DeskParts): Desk {
  const { storage, files, fetchText, now } = parts;
  const session: Session = createSession(storage, now, parts.newStamp);
  const refuse = (name: string, faults: readonly Fault[]) =>
    deskStore.setState({ refused: { name, faults } });
  const shelf = createShelf(storage, session, now, refuse);

  let viewWritten = '';
  const viewSave = createAutosave(async () => {
    const view = keptViewOf(viewStore.getState());
    const text = JSON.stringify(view);
    if (text === viewWritten) return;
    viewWritten = text;
    await storage.writeView(view);
  }, VIEW_QUIET_MS);

  const openText = async ({ name, text, handle }: OpenedText) => {
    const parsed = parseSketch(text);
    if (parsed.ok) await session.open(parsed.sketch, { handle });
    else refuse(name, parsed.faults);
    return parsed.ok;
  };

  const openRead = async (read: Kept<OpenedText> | null) => {
    if (read?.ok) return openText(read.value);
    if (read) complain(read.why);
    return false;
  };

  const openLink = async (hash: string) => {
    const linked = await textInHash(hash);
    return openRead(
      linked?.ok ? { ok: true, value: { name: 'The link', text: linked.value, handle: null } } : linked,
    );
  };

  const openStarter = async (starter: Starter) => {
    const parsed = await loadStarter(fetchText, starter);
    if (parsed.ok) await session.open(parsed.sketch, {});
    else refuse(starter.title, parsed.faults);
    return parsed.ok;
  };

  const openDemo = async () => {
    const list = await loadStarters(fetchText);
    const [demo] = list.ok ? list.value : [];
    if (demo) await openStarter(demo);
    else if (!list.ok) complain(list.why);
  };

  /** A sketch that cannot be read any more is not thrown away: it stays on the shelf as it is. */
  const setAside = async (text: string) => {
    const list = await storage.list();
    const name = freeName('Unreadable sketch', list.ok ? list.value.map((entry) => entry.name) : []);
    await storage.writeShelf(name, { text, savedAt: now().toISOString() });
    return name;
  };

  const restore = async () => {
    const stored = await storage.readOpen();
    if (!stored.ok) {
      await openDemo();
      deskStore.setState({ save: { notSaved: stored.why } });
      return;
    }
    if (!stored.value) return openDemo();
    const parsed = parseSketch(stored.value.text);
    if (parsed.ok) return session.restore(parsed.sketch, stored.value);
    const name = await setAside(stored.value.text);
    await openDemo();
    const [first] = parsed.faults;
    complain(
      `The sketch kept in this browser could not be read: ${first?.sentence ?? ''} It stays on the shelf as “${name}”.`,
    );
  };

  return {
    shelf,
    reopen: async (hash) => {
      const view = await storage.readView();
      await restore();
      if (view.ok) setView(viewFrom(view.value));
      await openLink(hash);
    },
    openLink,
    watch: () => {
      const stops = [session.watch(), viewStore.subscribe(viewSave.mark)];
      return () => {
        for (const stop of stops) stop();
      };
    },
    flush: async () => {
      await Promise.all([session.flush(), viewSave.flush()]);
    },
    openNew: () => session.open(emptySketch(), {}),
    openFile: async () => openRead(await openFile(files)),
    openDropped: async (file) => openRead(await readFile(file)),
    starters: () => loadStarters(fetchText),
    openStarter,
    saveFile: async (elsewhere = false) => {
      const { running, sketch: shown } = sketchStore.getState();
      const sketch = running?.before ?? shown;
      const saved = await saveFile(files, sketch, elsewhere ? null : session.place().handle);
      if (!saved) return;
      if (!saved.ok) return complain(saved.why);
      session.settle({ ...session.place(), handle: saved.value.handle, untouched: sketch });
      say(`Saved as “${saved.value.name}”.`);
    },
    link: async (page) => linkOf(sketchStore.getState().sketch, page),
  };
}

/** Writes what is not yet written whenever `page` is hidden or left; returns the way to stop. */
export function flushWhenHidden(desk: Desk, page: Document): () => void {
  const hidden = () => {
    if (page.visibilityState === 'hidden') void desk.flush();
  };
  page.addEventListener('visibilitychange', hidden);
  return () => page.removeEventListener('visibilitychange', hidden);
}
