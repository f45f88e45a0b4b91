import type { Fault } from '../../engine/index.ts';

/** Enough to mend a file by, few enough to be read. */
const SHOWN = 6;

/** The first sentences on what is wrong, and one that counts the rest. */
export function faultSentences(faults: readonly Fault[]): readonly string[] {
  const sentences = [...new Set(faults.map((fault) => fault.sentence))];
  const shown = sentences.slice(0, SHOWN);
  const more = sentences.length - shown.length;
  if (more === 0) return shown;
  return [...shown, more === 1 ? 'And one more fault.' : `And ${more} more faults.`];
}

/** The same in one line: the first sentence, and how many more there are. */
export function faultsLine(faults: readonly Fault[]): string {
  const more = faults.length - 1;
  const first = faults[0]?.sentence ?? '';
  return more > 0 ? `${first} (and ${more} more)` : first;
}
