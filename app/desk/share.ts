import type { Outcome, Sketch } from '../../engine/index.ts';
import { none, some, writeSketch } from '../../engine/index.ts';
import { TEXT_LIMIT_BYTES } from './files.ts';

const MARK = '#sketch=';
/** Longer links are cut by mail programs and some browsers. */
const LINK_LIMIT = 30_000;

/** A link to `page` that carries `sketch` in its hash, deflated, in base64url. A sentence when it would be too long. */
export async function linkOf(sketch: Sketch, page: string): Promise<Outcome<string, string>> {
  if (typeof CompressionStream === 'undefined')
    return none('This browser cannot make a link of the sketch: save it as a file instead.');
  const text = JSON.stringify(JSON.parse(writeSketch(sketch)));
  const packed = await bytesOf(new Blob([text]).stream().pipeThrough(new CompressionStream('deflate-raw')));
  if (!packed.ok) return packed;
  const link = page.replace(/#.*$/, '') + MARK + toBase64Url(packed.value);
  return link.length <= LINK_LIMIT
    ? some(link)
    : none('The sketch is too large for a link: save it as a file instead.');
}

/** Whether the hash of an address carries a sketch. */
export const carriesSketch = (hash: string): boolean => hash.startsWith(MARK);

/** The sketch text that the hash of a link carries; null when it carries none, a sentence when it is damaged. */
export async function textInHash(hash: string): Promise<Outcome<string, string> | null> {
  if (!carriesSketch(hash)) return null;
  const damaged = none('The link holds a damaged sketch: ask for it again, or for the file.');
  try {
    const packed = new Blob([fromBase64Url(hash.slice(MARK.length))]);
    const bytes = await bytesOf(packed.stream().pipeThrough(new DecompressionStream('deflate-raw')));
    return bytes.ok ? some(new TextDecoder().decode(bytes.value)) : damaged;
  } catch {
    return damaged;
  }
}

/** Reads a stream to its end, or gives up beyond the size of a sketch: a small link can unpack to gigabytes. */
async function bytesOf(
  stream: ReadableStream<Uint8Array>,
): Promise<Outcome<Uint8Array<ArrayBuffer>, string>> {
  const chunks: Uint8Array[] = [];
  let length = 0;
  const reader = stream.getReader();
  for (let step = await reader.read(); !step.done; step = await reader.read()) {
    length += step.value.length;
    if (length > TEXT_LIMIT_BYTES) {
      await reader.cancel();
      return none('The sketch is too large.');
    }
    chunks.push(step.value);
  }
  const bytes = new Uint8Array(length);
  let at = 0;
  for (const chunk of chunks) {
    bytes.set(chunk, at);
    at += chunk.length;
  }
  return some(bytes);
}

function toBase64Url(bytes: Uint8Array): string {
  const text = Array.from(bytes, (byte) => String.fromCharCode(byte)).join('');
  return btoa(text).replaceAll('+', '-').replaceAll('/', '_').replaceAll('=', '');
}

function fromBase64Url(text: string): Uint8Array<ArrayBuffer> {
  return Uint8Array.from(atob(text.replaceAll('-', '+').replaceAll('_', '/')), (char) => char.charCodeAt(0));
}
