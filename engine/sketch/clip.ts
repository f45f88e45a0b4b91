import * as v from 'valibot';
import type { Fault } from '../outcome.ts';
import { emptySketch } from './create.ts';
import { faultOfIssue } from './issues.ts';
import { faultsOf } from './rules.ts';
import { clipSchema } from './schema.ts';
import { treeFaults } from './tree.ts';
import type { Part } from './types.ts';
import { isCommon } from './values.ts';
import { capped } from './words.ts';

export const CLIP_FORMAT = 'gapwright-parts';

/**
 * Parts on their way from one sketch to another: plain data with common gaps. The space behind the last one is the gap that
 * is put in front of the first when they are pasted behind another part.
 */
export interface Clip {
  readonly format: typeof CLIP_FORMAT;
  readonly parts: readonly Part[];
}

export type ParsedClip =
  | { readonly ok: true; readonly clip: Clip }
  | { readonly ok: false; readonly faults: readonly Fault[] };

const LONGEST_CLIP = 500_000;

/** The clip as text for the clipboard. */
export const writeClip = (clip: Clip): string => JSON.stringify(clip, null, 2);

/** Reads parts from clipboard text. Never throws: what is no clip has one fault, a damaged clip has all of its own. */
export function parseClip(text: string): ParsedClip {
  const data = text.length <= LONGEST_CLIP && text.includes(CLIP_FORMAT) ? jsonOf(text) : undefined;
  if (typeof data !== 'object' || data === null || (data as { format?: unknown }).format !== CLIP_FORMAT) {
    const sentence = 'The clipboard holds no parts; copy parts from a Gapwright sketch first.';
    return { ok: false, faults: [{ path: '', sentence }] };
  }
  const tree = treeFaults(data);
  if (tree.length > 0) return { ok: false, faults: capped(tree) };
  const read = v.safeParse(clipSchema, data);
  if (!read.success)
    return { ok: false, faults: capped(read.issues.map((issue) => faultOfIssue(issue, [], data))) };
  const clip = read.output as unknown as Clip;
  const split = clip.parts.findIndex((part) => !isCommon(part.space.lengthMm));
  const faults =
    split < 0
      ? faultsOf({ ...emptySketch(), parts: clip.parts })
      : [
          {
            path: `parts[${split}].space.lengthMm`,
            sentence: `The gap behind part ${split + 1} is an object; in copied parts it must be a number.`,
          },
        ];
  return faults.length === 0 ? { ok: true, clip } : { ok: false, faults: capped(faults) };
}

function jsonOf(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}
