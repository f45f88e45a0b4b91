import { lostWords } from '../../../engine/index.ts';
import { xOf, yOf } from '../../board/viewport.ts';
import { type Handle, readOnly } from '../handle.ts';
import type { Sight } from '../sight.ts';
import { lostPlaces } from './layer.ts';

/** Where exact rays are lost: to be pointed at, which tells why. */
export function lostHandles({ scene: { exact }, view, reading: { sketch } }: Sight): readonly Handle[] {
  if (!exact?.rays || !exact.shown.exact) return [];
  const { rays } = exact;
  return lostPlaces(rays).map(({ lost, zMm, yMm }, i) => {
    const words = lostWords(lost, sketch, rays.train);
    const place = { xPx: xOf(view, zMm), yPx: yOf(view, yMm), line: null };
    return {
      ...readOnly(`lost:${i}`, `lost ray: ${words}`, `This ray ${saying(words)}.`, place),
      says: words,
    };
  });
}

/** “missed …” is a verb already; the other reasons need one. */
const saying = (words: string): string => (words.startsWith('missed') ? words : `is ${words}`);
