import greek from '@fontsource-variable/source-sans-3/files/source-sans-3-greek-wght-normal.woff2?url';
import latin from '@fontsource-variable/source-sans-3/files/source-sans-3-latin-wght-normal.woff2?url';
import latinExt from '@fontsource-variable/source-sans-3/files/source-sans-3-latin-ext-wght-normal.woff2?url';
import type { Rasterise } from './exports.ts';
import { noPicture, pictureOf, svgSize, withStyle } from './exports.ts';

/** Dots for each px of the drawing. */
const DOTS_PER_PX = 2;
const FAMILY = 'Source Sans 3';

/** The drawing as a PNG, drawn by this browser at twice its size. */
export const rasterise: Rasterise = async (svg) => {
  const size = svgSize(svg);
  if (!size) return noPicture();
  const url = URL.createObjectURL(new Blob([withStyle(svg, await fontFaces())], { type: 'image/svg+xml' }));
  try {
    const image = new Image();
    image.src = url;
    await image.decode();
    const canvas = document.createElement('canvas');
    canvas.width = Math.round(size.widthPx * DOTS_PER_PX);
    canvas.height = Math.round(size.heightPx * DOTS_PER_PX);
    const context = canvas.getContext('2d');
    if (!context) return noPicture();
    context.drawImage(image, 0, 0, canvas.width, canvas.height);
    return pictureOf(await new Promise<Blob | null>((resolve) => canvas.toBlob(resolve, 'image/png')));
  } catch {
    return noPicture();
  } finally {
    URL.revokeObjectURL(url);
  }
};

/** The type face written out: a picture may not fetch anything. Empty when it cannot be had; then the system's face serves. */
async function fontFaces(): Promise<string> {
  try {
    const faces = await Promise.all(
      [
        { url: latin, range: 'U+0000-00FF, U+2000-22FF' },
        { url: latinExt, range: 'U+0100-02BA, U+1E00-1EFF' },
        { url: greek, range: 'U+0370-03FF' },
      ].map(async ({ url, range }) => {
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
