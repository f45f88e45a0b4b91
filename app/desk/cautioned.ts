import { FONT_FAMILY, PALETTES } from '../board/styles.ts';
import { svgSize, withoutProlog } from './exports.ts';

const SIZE_PX = 13;
const LINE_PX = 18;
const MARGIN_PX = 16;
/** Mean width of a character against its size; generous, so that no line runs out of the sheet. */
const CHARACTER = 0.52;

/** The drawing with the caution written under it, in a strip of its own; the drawing itself when there is none. */
export function withCaution(svg: string, caution: string | null): string {
  const size = svgSize(svg);
  if (caution === null || size === null) return svg;
  const { widthPx, heightPx } = size;
  const lines = linesOf(caution, Math.floor((widthPx - 2 * MARGIN_PX) / (SIZE_PX * CHARACTER)));
  const wholePx = heightPx + MARGIN_PX + lines.length * LINE_PX;
  const { paper, ink } = PALETTES.paper;
  const texts = lines.map(
    (line, index) =>
      `  <text x="${MARGIN_PX}" y="${heightPx + (index + 1) * LINE_PX}" font-family="${FONT_FAMILY}" font-size="${SIZE_PX}" font-weight="600" fill="${ink}">${escaped(line)}</text>`,
  );
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${widthPx}" height="${wholePx}" viewBox="0 0 ${widthPx} ${wholePx}">`,
    `  <rect width="${widthPx}" height="${wholePx}" fill="${paper}"/>`,
    withoutProlog(svg),
    ...texts,
    '</svg>\n',
  ].join('\n');
}

/** `text` broken between words into lines of at most `most` characters, where its words allow. */
function linesOf(text: string, most: number): readonly string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(' ')) {
    if (line !== '' && line.length + 1 + word.length > most) {
      lines.push(line);
      line = word;
    } else line = line === '' ? word : `${line} ${word}`;
  }
  return [...lines, line];
}

const escaped = (text: string): string =>
  text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;');
