import type { Fault, Sketch } from '../../engine/index.ts';
import { none, parseSketch, writeSketch } from '../../engine/index.ts';
import { sketchStore } from '../store/sketchStore.ts';
import { deskStore } from './deskStore.ts';
import { freeName, nameFrom } from './names.ts';
import { complain, say } from './notices.ts';
import type { Session } from './session.ts';
import type { Kept, KeptSketch, Storage } from './storage.ts';

/** The sketches kept by name in this browser. Every call says by a notice what it did, or why it could not. */
export interface Shelf {
  /** Reads the list anew. */
  readonly look: () => Promise<void>;
  /** Keeps the open sketch under `name`; refused when another sketch has it. True when it is kept. */
  readonly keepAs: (name: string) => Promise<boolean>;
  readonly open: (name: string) => Promise<boolean>;
  readonly rename: (from: string, to: string) => Promise<boolean>;
  readonly duplicate: (name: string) => Promise<boolean>;
  /** Takes a sketch off the shelf; the notice offers to put it back. */
  readonly remove: (name: string) => Promise<boolean>;
}

/** The shelf in `storage`; `refuse` shows what is wrong with a sketch that cannot be opened. */
export function createShelf(
  storage: Storage,
  session: Session,
  now: () => Date,
  refuse: (name: string, faults: readonly Fault[]) => void,
): Shelf {
  const look = async () => deskStore.setState({ shelf: await storage.list() });

  const isTaken = async (name: string) => {
    const list = await storage.list();
    return list.ok && list.value.some((entry) => entry.name === name);
  };

  /** Says how a write went, and shows the shelf as it is now. */
  const done = async (result: Kept<unknown>, said: string): Promise<boolean> => {
    if (result.ok) say(said);
    else complain(result.why);
    await look();
    return result.ok;
  };

  const belongs = (shelfName: string | null, untouched: Sketch | null) =>
    session.settle({ ...session.place(), shelfName, untouched });

  const keepAs = async (text: string) => {
    const name = nameFrom(text);
    if (name !== session.place().shelfName && (await isTaken(name))) return done(taken(name), '');
    const { running, sketch } = sketchStore.getState();
    const kept = running?.before ?? sketch;
    const result = await storage.writeShelf(name, { text: writeSketch(kept), savedAt: now().toISOString() });
    if (result.ok) belongs(name, kept);
    return done(result, `“${name}” is on the shelf.`);
  };

  const open = async (name: string) => {
    const kept = await storage.readShelf(name);
    if (!kept.ok) return done(kept, '');
    const parsed = parseSketch(kept.value.text);
    if (parsed.ok) await session.open(parsed.sketch, { shelfName: name });
    else refuse(name, parsed.faults);
    await look();
    return parsed.ok;
  };

  const copyTo = async (from: string, to: string): Promise<Kept<KeptSketch>> => {
    const kept = await storage.readShelf(from);
    if (!kept.ok) return kept;
    const result = await storage.writeShelf(to, kept.value);
    return result.ok ? kept : result;
  };

  const rename = async (from: string, text: string) => {
    const to = nameFrom(text);
    if (to === from) return true;
    if (await isTaken(to)) return done(taken(to), '');
    const copied = await copyTo(from, to);
    const result = copied.ok ? await storage.removeShelf(from) : copied;
    if (result.ok && session.place().shelfName === from) belongs(to, session.place().untouched);
    return done(result, `“${from}” is now named “${to}”.`);
  };

  const duplicate = async (name: string) => {
    const list = await storage.list();
    const copy = freeName(nameFrom(`${name} copy`), list.ok ? list.value.map((entry) => entry.name) : []);
    return done(await copyTo(name, copy), `“${copy}” is on the shelf.`);
  };

  const remove = async (name: string) => {
    const kept = await storage.readShelf(name);
    const result = kept.ok ? await storage.removeShelf(name) : kept;
    if (!kept.ok || !result.ok) return done(result, '');
    if (session.place().shelfName === name) belongs(null, null);
    const putBack = async () => {
      await done(await storage.writeShelf(name, kept.value), `“${name}” is back on the shelf.`);
    };
    say(`“${name}” is taken off the shelf.`, { label: 'Put it back', run: () => void putBack() });
    await look();
    return true;
  };

  return { look, keepAs, open, rename, duplicate, remove };
}

const taken = (name: string) =>
  none(
    `There is already a sketch named “${name}” on the shelf: take another name, or remove that one first.`,
  );
