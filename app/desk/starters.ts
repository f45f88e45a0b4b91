import * as v from 'valibot';
import type { Fault, Outcome, Parsed } from '../../engine/index.ts';
import { none, parseSketch, some } from '../../engine/index.ts';

/** One of the sketches that come with the app. The first in the list is the demo. */
export interface Starter {
  readonly file: string;
  readonly title: string;
  readonly summary: string;
}

/** Fetches a text that lies beside the app; rejects when it cannot. */
export type FetchText = (path: string) => Promise<string>;

/** Fetches below the address that the app is served from. */
export const fetchBesideApp: FetchText = async (path) => {
  const response = await fetch(`${import.meta.env.BASE_URL}${path}`);
  if (!response.ok) throw new Error(`status ${response.status}`);
  return response.text();
};

const listShape = v.array(v.object({ file: v.string(), title: v.string(), summary: v.string() }));
const absent = 'The starting sketches could not be fetched: check the connection and reload the page.';

/** The starting sketches, the demo first; a sentence when the list cannot be fetched or read. */
export async function loadStarters(fetchText: FetchText): Promise<Outcome<readonly Starter[], string>> {
  try {
    const list = v.safeParse(listShape, JSON.parse(await fetchText('sketches/index.json')));
    return list.success && list.output.length > 0 ? some(list.output) : none(absent);
  } catch {
    return none(absent);
  }
}

/** The sketch of `starter`, or what is wrong with it. */
export async function loadStarter(fetchText: FetchText, starter: Starter): Promise<Parsed> {
  try {
    return parseSketch(await fetchText(`sketches/${starter.file}`));
  } catch {
    const fault: Fault = {
      path: '',
      sentence: `The starting sketch “${starter.title}” could not be fetched: check the connection and try again.`,
    };
    return { ok: false, faults: [fault] };
  }
}
