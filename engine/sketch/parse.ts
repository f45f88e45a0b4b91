import * as v from 'valibot';
import type { Fault } from '../outcome.ts';
import { emptySketch, newStop } from './create.ts';
import { SKETCH_FORMAT, SKETCH_VERSION } from './file.ts';
import { faultOfIssue, unknownEntry } from './issues.ts';
import { faultsOf } from './rules.ts';
import { partSchema, sectionSchemas } from './schema.ts';
import { treeFaults } from './tree.ts';
import type { Part, Sketch } from './types.ts';
import { capped, numberText, valueText } from './words.ts';

/** A sketch, or everything that is wrong with the text. */
export type Parsed =
  | { readonly ok: true; readonly sketch: Sketch }
  | { readonly ok: false; readonly faults: readonly Fault[] };

const AS_WRITTEN = 'a sketch file is JSON text as Gapwright writes it';

/** No sketch file is longer, in characters. */
export const LONGEST_FILE = 2_000_000;

/**
 * Reads the text of a sketch file. Never throws: it gives a sketch that keeps every rule, or all faults found (at most 50,
 * the rest counted), each with its path and a sentence. A text that is no sketch of a version known here has one fault.
 */
export function parseSketch(text: string): Parsed {
  if (text.length > LONGEST_FILE)
    return alone(
      `The file has ${numberText(text.length)} characters; a sketch file has at most ${numberText(LONGEST_FILE)}.`,
    );
  if (text.trim() === '') return alone(`The file is empty; ${AS_WRITTEN}.`);
  const file = jsonOf(text);
  if (file === undefined) return alone(`The text is not JSON; ${AS_WRITTEN}.`);
  if (!isRecord(file) || file.format !== SKETCH_FORMAT) {
    const found = isRecord(file) ? file.format : file;
    const what = isRecord(file)
      ? found === undefined
        ? 'its “format” is missing'
        : `its “format” is ${valueText(found)}`
      : `it is ${valueText(found)}`;
    return alone(
      `The file is not a Gapwright sketch: ${what}; it must be an object with the format “${SKETCH_FORMAT}”.`,
      isRecord(file) ? 'format' : '',
    );
  }
  const version = file.version;
  if (typeof version !== 'number' || !Number.isInteger(version) || version < 1)
    return alone(
      `The version of the file is ${version === undefined ? 'missing' : valueText(version)}; it must be a whole number from 1 to ${SKETCH_VERSION}.`,
      'version',
    );
  if (version > SKETCH_VERSION)
    return alone(
      `The file is of version ${numberText(version)}; this Gapwright reads version ${SKETCH_VERSION}.`,
      'version',
    );
  const { format: _format, version: _version, ...body } = file;
  return readBody(body);
}

function readBody(body: Record<string, unknown>): Parsed {
  const tree = treeFaults(body);
  if (tree.length > 0) return { ok: false, faults: capped(tree) };
  const faults: Fault[] = [];
  const sections: Record<string, unknown> = { ...emptySketch() };
  for (const [key, schema] of Object.entries(sectionSchemas)) {
    const issues = readInto(sections, key, schema, body);
    for (const issue of issues) faults.push(faultOfIssue(issue, [], body));
  }
  const parts = readParts(body, faults);
  for (const key of Object.keys(body))
    if (key !== 'parts' && !Object.hasOwn(sectionSchemas, key))
      faults.push({
        path: key,
        sentence: `${unknownEntry([key], body)}; it must be left out, or its name corrected.`,
      });
  // What was not of the right shape stands here as a sound stand-in, so that the rules can judge the rest at once.
  const sketch = { ...sections, parts } as unknown as Sketch;
  const judged =
    faults.length === 0 ||
    !faults.some((fault) => /^(positions|parts$|parts\[\d+\]$|parts\[\d+\]\.id$)/.test(fault.path));
  if (judged) faults.push(...faultsOf(sketch));
  return faults.length === 0 ? { ok: true, sketch } : { ok: false, faults: capped(faults) };
}

function readInto(
  sections: Record<string, unknown>,
  key: string,
  schema: v.GenericSchema,
  body: Record<string, unknown>,
) {
  const read = v.safeParse(v.strictObject({ [key]: schema }), key in body ? { [key]: body[key] } : {});
  if (read.success) sections[key] = read.output[key];
  return read.issues ?? [];
}

function readParts(body: Record<string, unknown>, faults: Fault[]): readonly Part[] {
  const list = body.parts;
  if (!Array.isArray(list)) {
    const is = list === undefined ? 'missing' : valueText(list);
    faults.push({
      path: 'parts',
      sentence: `The list of parts is ${is}; it must be a list, empty if there are none.`,
    });
    return [];
  }
  return list.map((raw: unknown, index) => {
    const read = v.safeParse(partSchema, raw);
    if (read.success) return read.output as unknown as Part;
    for (const issue of read.issues) faults.push(faultOfIssue(issue, ['parts', index], body));
    return newStop((isRecord(raw) && typeof raw.id === 'string' ? raw.id : `unread${index}`) as Part['id']);
  });
}

const alone = (sentence: string, path = ''): Parsed => ({ ok: false, faults: [{ path, sentence }] });

const isRecord = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

function jsonOf(text: string): unknown {
  try {
    return JSON.parse(text.startsWith('\uFEFF') ? text.slice(1) : text);
  } catch {
    return undefined;
  }
}
