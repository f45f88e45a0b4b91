import greek from '@fontsource-variable/source-sans-3/files/source-sans-3-greek-wght-normal.woff2?url';
import latinExt from '@fontsource-variable/source-sans-3/files/source-sans-3-latin-ext-wght-normal.woff2?url';
import latin from '@fontsource-variable/source-sans-3/files/source-sans-3-latin-wght-normal.woff2?url';
import type { Rasterise } from './exports.ts';
import { noPicture, pictureOf, svgSize, withoutProlog } from './exports.ts';

/** Dots for each px of the drawing. */
const DOTS_PER_PX = 2;
const FAMILY = 'Source Sans 3';
const FACES = [
  { url: latin, range: 'U+0000-00FF, U+2000-22FF', sample: 'n' },
  { url: latinExt, range: 'U+0100-02BA, U+1E00-1EFF', sample: 'ȳ' },
  { url: greek, range: 'U+0370-03FF', sample: 'λ' },
];
/** A strip below the drawing, cut off again, with a sample of each face. */
const SAMPLE_PX = 24;
const PAUSE_MS = 20;
const PATIENCE_MS = 3000;

/** The drawing as a PNG, drawn by this browser at twice its size. */
export const rasterise: Rasterise = async (svg) => {
  const size = svgSize(svg);
  if (!size) return noPicture();
  const url = URL.createObjectURL(
    new Blob([withSamples(svg, size, await fontFaces())], { type: 'image/svg+xml' }),
  );
  try {
    const image = new Image();
    image.src = url;
    await image.decode();
    await facesShown(image, size);
    const canvas = document.createElement('canvas');
    canvas.width = Math.round(size.widthPx * DOTS_PER_PX);
    canvas.height = Math.round(size.heightPx * DOTS_PER_PX);
    const context = canvas.getContext('2d');
    if (!context) return noPicture();
    context.scale(DOTS_PER_PX, DOTS_PER_PX);
    context.drawImage(image, 0, 0, size.widthPx, size.heightPx + SAMPLE_PX);
    return pictureOf(await new Promise<Blob | null>((resolve) => canvas.toBlob(resolve, 'image/png')));
  } catch {
    return noPicture();
  } finally {
    URL.revokeObjectURL(url);
  }
};

interface Size {
  readonly widthPx: number;
  readonly heightPx: number;
}

function withSamples(svg: string, { widthPx, heightPx }: Size, css: string): string {
  const samples = FACES.map(
    ({ sample }, index) =>
      `<text x="${index * SAMPLE_PX + 4}" y="${heightPx + 17}" font-family="'${FAMILY}'" font-size="16">${sample}</text>`,
  );
  const whole = `<svg xmlns="http://www.w3.org/2000/svg" width="${widthPx}" height="${heightPx + SAMPLE_PX}">`;
  return `${whole}<style>${css}</style>${withoutProlog(svg)}${samples.join('')}</svg>`;
}

/** Resolves once every sample is seen: a picture counts as loaded before its type faces are, and until then its texts are blank. */
async function facesShown(image: HTMLImageElement, { widthPx, heightPx }: Size): Promise<void> {
  const strip = document.createElement('canvas');
  strip.width = FACES.length * SAMPLE_PX;
  strip.height = SAMPLE_PX;
  const context = strip.getContext('2d', { willReadFrequently: true });
  for (let waitedMs = 0; context && waitedMs < PATIENCE_MS; waitedMs += PAUSE_MS) {
    context.clearRect(0, 0, strip.width, strip.height);
    context.drawImage(image, 0, -heightPx, widthPx, heightPx + SAMPLE_PX);
    const inked = FACES.every((_, index) =>
      context.getImageData(index * SAMPLE_PX, 0, SAMPLE_PX, SAMPLE_PX).data.some((value) => value > 0),
    );
    if (inked) return;
    await new Promise((resolve) => setTimeout(resolve, PAUSE_MS));
  }
}

/** The type face written out: a picture may not fetch anything. Empty when it cannot be had; then the system's face serves. */
async function fontFaces(): Promise<string> {
  try {
    const faces = await Promise.all(
      FACES.map(async ({ url, range }) => {
        const data = await dataUrl(await (await fetch(url)).blob());
        return `@font-face{font-family:"${FAMILY}";font-weight:200 900;src:url("${data}") format("woff2");unicode-range:${range}}`;
      }),
    );
    return faces.join('');
  } catch {
    return '';
  }
}

function dataUrl(blob: Blob): Promise<string> {
  return new Promise((resolve, reject) => {
    const reader = new FileReader();
    reader.onload = () => resolve(String(reader.result));
    reader.onerror = () => reject(reader.error);
    reader.readAsDataURL(blob);
  });
}
