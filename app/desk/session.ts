import type { Sketch } from '../../engine/index.ts';
import { writeSketch } from '../../engine/index.ts';
import type { Document } from '../store/document.ts';
import { documentOf } from '../store/document.ts';
import { openSketch, sketchStore } from '../store/sketchStore.ts';
import { setView, viewStore } from '../store/viewStore.ts';
import { createAutosave } from './autosave.ts';
import { deskStore } from './deskStore.ts';
import type { FileHandle } from './files.ts';
import { freeName, nameFrom } from './names.ts';
import { complain, say } from './notices.ts';
import type { Kept, OpenSketch, Storage } from './storage.ts';

/** Where the open sketch belongs. */
export interface Place {
  /** Its name on the shelf. */
  readonly shelfName: string | null;
  /** The file it came from or went to. */
  readonly handle: FileHandle | null;
  /** The sketch as it lies there; null when what is open differs from it anyway. */
  readonly untouched: Sketch | null;
}

/** Watches over the open sketch: writes it after every step, and keeps it when another one takes its place. */
export interface Session {
  readonly place: () => Place;
  /** Says where the open sketch belongs from now on, and saves that. */
  readonly settle: (place: Place) => void;
  /** Opens `sketch`. What was open is kept on the shelf when it was changed, and can be gone back to. */
  readonly open: (sketch: Sketch, place: Partial<Place>) => Promise<void>;
  /** Puts back what was read from storage, without writing it again. */
  readonly restore: (sketch: Sketch, kept: OpenSketch) => void;
  /** Writes what is not yet written. */
  readonly flush: () => Promise<void>;
  /** Starts to watch; returns the way to stop. */
  readonly watch: () => () => void;
}

/** Long enough that typing a title is one write, short enough that a closed tab has lost nothing. */
const QUIET_MS = 400;

/** A session that keeps the open sketch in `storage`. `newStamp` gives a text that no other tab gives. */
export function createSession(storage: Storage, now: () => Date, newStamp: () => string): Session {
  let place: Place = { shelfName: null, handle: null, untouched: sketchStore.getState().sketch };
  /** The sketch in storage, and the stamp it was written under. */
  let written: Sketch | null = null;
  let stamp: string | null = null;
  /** Once another tab has written the open sketch, this one writes to the shelf under this name. */
  let aside: string | null = null;

  const keptNow = (sketch: Sketch) => ({ text: writeSketch(sketch), savedAt: now().toISOString() });

  const names = async () => {
    const list = await storage.list();
    return list.ok ? list.value.map((entry) => entry.name) : [];
  };

  const otherTabWrote = async () => {
    const stored = await storage.readOpen();
    return stored.ok && stored.value !== null && stored.value.stamp !== stamp;
  };

  const put = async (sketch: Sketch): Promise<Kept<true>> => {
    if (aside === null && (await otherTabWrote())) {
      aside = freeName(nameFrom(sketch.title), await names());
      say(`Another tab works on this sketch too. The one in this tab is kept on the shelf as “${aside}”.`);
    }
    if (aside !== null) return storage.writeShelf(aside, keptNow(sketch));
    const next = newStamp();
    const result = await storage.writeOpen({
      ...keptNow(sketch),
      stamp: next,
      shelfName: place.shelfName,
      changed: sketch !== place.untouched,
    });
    if (result.ok) stamp = next;
    return result;
  };

  const autosave = createAutosave(async () => {
    const sketch = steadySketch(sketchStore.getState());
    const result = await put(sketch);
    written = sketch;
    const current = steadySketch(sketchStore.getState()) === sketch;
    deskStore.setState({
      save: result.ok ? (current ? 'saved' : 'saving') : { notSaved: result.why },
    });
  }, QUIET_MS);

  const mark = () => {
    deskStore.setState({ save: 'saving' });
    autosave.mark();
  };

  const settle = (next: Place) => {
    place = next;
    deskStore.setState({ shelfName: place.shelfName });
    mark();
  };

  /** Keeps a sketch that is being left; gives the name it has now, or why it is not kept. */
  const keep = async (sketch: Sketch, from: Place): Promise<Kept<string>> => {
    const name = from.shelfName ?? freeName(nameFrom(sketch.title), await names());
    const result = await storage.writeShelf(name, keptNow(sketch));
    return result.ok ? { ok: true, value: name } : result;
  };

  const takePlaceOf = async (next: Document, nextPlace: Place): Promise<void> => {
    const doc = sketchStore.getState();
    const left = steadySketch(doc);
    const leftPlace = place;
    const changed = left !== leftPlace.untouched;

    sketchStore.setState(next, true);
    const { camera } = viewStore.getState();
    setView({ selection: [], setting: firstSetting(next.sketch), camera: { ...camera, follow: 'parts' } });
    settle(nextPlace);

    if (!changed) return;
    const kept = await keep(left, leftPlace);
    const back = {
      label: 'Go back to it',
      run: () =>
        void takePlaceOf(
          { ...doc, sketch: left, running: null, note: null },
          kept.ok ? { ...leftPlace, shelfName: kept.value, untouched: left } : leftPlace,
        ),
    };
    if (kept.ok) say(`“${kept.value}” is kept on the shelf.`, back);
    else complain(`“${nameFrom(left.title)}” is not kept. ${kept.why}`, { action: back });
  };

  return {
    place: () => place,
    settle,
    open: (sketch, { shelfName = null, handle = null, untouched = sketch }) =>
      takePlaceOf(documentOf(sketch), { shelfName, handle, untouched }),
    restore: (sketch, kept) => {
      openSketch(sketch);
      place = { shelfName: kept.shelfName, handle: null, untouched: kept.changed ? null : sketch };
      written = sketch;
      stamp = kept.stamp;
      deskStore.setState({ shelfName: kept.shelfName, save: 'saved' });
    },
    flush: autosave.flush,
    watch: () =>
      sketchStore.subscribe((doc) => {
        if (!doc.running && doc.sketch !== written) mark();
      }),
  };
}

/** The sketch without a gesture that is still going on. */
const steadySketch = (doc: Document): Sketch => doc.running?.before ?? doc.sketch;

const firstSetting = (sketch: Sketch) => {
  const [first] = sketch.positions;
  return first ? { at: first.id, toNext: 0 } : viewStore.getState().setting;
};
