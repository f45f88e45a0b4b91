import type { Outcome, SheetForm, SpacingTable } from '../../engine/index.ts';
import { none, sheetText, some } from '../../engine/index.ts';
import type { FileHost } from './files.ts';
import { fileNameFrom } from './names.ts';
import { complain, say } from './notices.ts';

type Download = FileHost['download'];

interface FormFile {
  readonly label: string;
  readonly extension: string;
  readonly type: string;
}

/** How each text form of the spacing table is called and saved. */
export const FORM_FILES: Readonly<Record<SheetForm, FormFile>> = {
  csv: { label: 'CSV', extension: 'csv', type: 'text/csv' },
  'csv comma': { label: 'CSV, decimal comma', extension: 'csv', type: 'text/csv' },
  tsv: { label: 'TSV, for pasting', extension: 'tsv', type: 'text/tab-separated-values' },
  markdown: { label: 'Markdown', extension: 'md', type: 'text/markdown' },
  json: { label: 'JSON', extension: 'json', type: 'application/json' },
};

/** Without it common spreadsheets take a CSV file for one in the system's old code page, and µm becomes Âµm. */
const BYTE_ORDER_MARK = '\uFEFF';

/** Hands the table to the browser as a file in one form. */
export function downloadTable(download: Download, table: SpacingTable, form: SheetForm): void {
  const { extension, type } = FORM_FILES[form];
  const text = (type === 'text/csv' ? BYTE_ORDER_MARK : '') + sheetText(table, form);
  const name = fileNameFrom(`${table.title} spacing`, extension);
  download(name, new Blob([text], { type: `${type};charset=utf-8` }));
  say(`The spacing table is in your downloads as “${name}”.`);
}

/** Hands the drawing to the browser as an SVG file. */
export function downloadSvg(download: Download, svg: string, title: string): void {
  const name = fileNameFrom(title, 'svg');
  download(name, new Blob([svg], { type: 'image/svg+xml' }));
  say(`The drawing is in your downloads as “${name}”.`);
}

/** Turns an SVG text into a picture; a sentence when the browser cannot. */
export type Rasterise = (svg: string) => Promise<Outcome<Blob, string>>;

/** Hands the drawing to the browser as a PNG file, or says why it cannot. */
export async function downloadPng(
  download: Download,
  svg: string,
  title: string,
  rasterise: Rasterise,
): Promise<void> {
  const picture = await rasterise(svg);
  if (!picture.ok) return complain(picture.why);
  const name = fileNameFrom(title, 'png');
  download(name, picture.value);
  say(`The drawing is in your downloads as “${name}”.`);
}

/** Size of an SVG text in px, from its root element; null when it does not say. */
export function svgSize(svg: string): { readonly widthPx: number; readonly heightPx: number } | null {
  const root = /<svg\b[^>]*>/.exec(svg)?.[0] ?? '';
  const number = (name: string) => Number(new RegExp(`\\s${name}="([\\d.]+)(?:px)?"`).exec(root)?.[1]);
  const widthPx = number('width');
  const heightPx = number('height');
  return widthPx > 0 && heightPx > 0 ? { widthPx, heightPx } : null;
}

/** The root element of an SVG text alone, to stand inside another. */
export const withoutProlog = (svg: string): string => svg.replace(/^\s*<\?xml[^>]*\?>\s*/, '');

/** Says what to do when no picture comes out. */
export const noPicture = (): Outcome<Blob, string> =>
  none('The browser could not turn the drawing into a PNG: export it as SVG instead.');

/** The picture, once the browser has made it. */
export const pictureOf = (blob: Blob | null): Outcome<Blob, string> => (blob ? some(blob) : noPicture());
