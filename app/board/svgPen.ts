import type { ClipShape, Flat, Pen, TextPlace } from './pen.ts';
import { FONT_FAMILY, type MarkStyle, markLook, type Palette, type TextStyle, textLook } from './styles.ts';
import { isNear, tracePath } from './trim.ts';

export interface SvgSheet {
  readonly widthPx: number;
  readonly heightPx: number;
  readonly palette: Palette;
  /** Said by screen readers and shown as the file's title. */
  readonly title: string;
  /** Longer description, or nothing. */
  readonly description?: string;
  /** Printed size; without it the document is as large as its px. */
  readonly printed?: { readonly widthMm: number; readonly heightMm: number };
  /** Width of hairlines, px. Default 0.75. */
  readonly hairlinePx?: number;
  /** Whether the sheet's colour is laid under everything. Default true. */
  readonly background?: boolean;
}

export interface SvgPen extends Pen {
  /** The whole document of what was drawn so far. */
  document(): string;
}

/** A pen that writes an SVG document; texts stay texts, numbers are rounded to 0.01 px. */
export function svgPen(sheet: SvgSheet): SvgPen {
  const { palette } = sheet;
  const body: string[] = [];
  const clips: string[] = [];
  let depth = 1;
  const put = (line: string): void => {
    body.push('  '.repeat(depth) + line);
  };
  const within = (open: string, draw: () => void): void => {
    put(open);
    depth++;
    draw();
    depth--;
    put('</g>');
  };
  const paint = (style: MarkStyle): string => paintOf(style, palette, sheet.hairlinePx ?? 0.75);

  return {
    polyline(points, style) {
      const d = openPath(points, 0, points.length / 2);
      if (d !== '') put(`<path d="${d}"${paint(style)}/>`);
    },
    polylines(points, starts, style) {
      const lines: string[] = [];
      for (let i = 0; i < starts.length; i++)
        lines.push(openPath(points, starts[i] as number, starts[i + 1] ?? points.length / 2));
      const d = lines.join('');
      if (d !== '') put(`<path d="${d}"${paint(style)}/>`);
    },
    closed(points, style) {
      if (points.length >= 6 && isNear(points))
        put(`<path d="${openPath(points, 0, points.length / 2)}Z"${paint(style)}/>`);
    },
    circle(xPx, yPx, radiusPx, style) {
      if (isNear([xPx, yPx]))
        put(`<circle cx="${n(xPx)}" cy="${n(yPx)}" r="${n(radiusPx)}"${paint(style)}/>`);
    },
    text(xPx, yPx, text, style, place = {}) {
      if (!isNear([xPx, yPx])) return;
      put(
        `<text${textPlace(xPx, yPx, style, place)}${textPaint(style, place, palette)}>${escaped(text)}</text>`,
      );
    },
    group(name, draw) {
      within(`<g data-name="${escaped(name)}">`, draw);
    },
    clipped(shape, draw) {
      clips.push(`<clipPath id="clip${clips.length + 1}">${clipOutline(shape)}</clipPath>`);
      within(`<g clip-path="url(#clip${clips.length})">`, draw);
    },
    document() {
      return [opening(sheet), ...definitions(clips), ...background(sheet), ...body, '</svg>', ''].join('\n');
    },
  };
}

/** The text with the five characters that XML reserves written as entities, and those it forbids left out. */
export function escaped(text: string): string {
  return Array.from(text, (c) => ENTITIES[c] ?? (isForbidden(c.codePointAt(0) ?? 0) ? '' : c)).join('');
}

const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

/** Characters outside the production Char of XML 1.0, section 2.2. */
function isForbidden(code: number): boolean {
  const control = code < 0x20 && code !== 0x9 && code !== 0xa && code !== 0xd;
  return control || (code >= 0xd800 && code <= 0xdfff) || code === 0xfffe || code === 0xffff;
}

function opening(sheet: SvgSheet): string {
  const { widthPx, heightPx, printed } = sheet;
  const size = printed
    ? `width="${n(printed.widthMm)}mm" height="${n(printed.heightMm)}mm"`
    : `width="${n(widthPx)}" height="${n(heightPx)}"`;
  const description = sheet.description ? `\n  <desc>${escaped(sheet.description)}</desc>` : '';
  return [
    '<?xml version="1.0" encoding="UTF-8"?>',
    `<svg xmlns="http://www.w3.org/2000/svg" ${size} viewBox="0 0 ${n(widthPx)} ${n(heightPx)}" role="img">`,
    `  <title>${escaped(sheet.title)}</title>${description}`,
  ].join('\n');
}

function definitions(clips: readonly string[]): readonly string[] {
  return clips.length === 0 ? [] : ['  <defs>', ...clips.map((clip) => `    ${clip}`), '  </defs>'];
}

function background({ background: laid, widthPx, heightPx, palette }: SvgSheet): readonly string[] {
  if (laid === false) return [];
  return [`  <rect width="${n(widthPx)}" height="${n(heightPx)}" fill="${escaped(palette.paper)}"/>`];
}

function paintOf(style: MarkStyle, palette: Palette, hairlinePx: number): string {
  const look = markLook(style);
  const fill = ` fill="${look.fill === null ? 'none' : escaped(palette[look.fill])}"`;
  if (look.stroke === null) return fill;
  const width = look.width === 'hairline' ? hairlinePx : look.width;
  const dash = look.dash.length === 0 ? '' : ` stroke-dasharray="${look.dash.map(n).join(' ')}"`;
  return `${fill} stroke="${escaped(palette[look.stroke])}" stroke-width="${n(width)}" stroke-linejoin="round"${dash}`;
}

function textPlace(xPx: number, yPx: number, style: TextStyle, place: TextPlace): string {
  const anchor = place.align === 'centre' ? 'middle' : place.align === 'right' ? 'end' : 'start';
  // Baselines are written as a shift in y: viewers disagree about dominant-baseline.
  const shift = { top: 0.78, middle: 0.34, alphabetic: 0, bottom: -0.22 }[place.baseline ?? 'alphabetic'];
  const y = yPx + (place.turnRad ? 0 : shift * textLook(style).sizePx);
  const turn = place.turnRad
    ? ` transform="rotate(${n((place.turnRad * 180) / Math.PI)} ${n(xPx)} ${n(yPx)})" dy="${n(shift)}em"`
    : '';
  return ` x="${n(xPx)}" y="${n(y)}" text-anchor="${anchor}"${turn}`;
}

function textPaint(style: TextStyle, place: TextPlace, palette: Palette): string {
  const look = textLook(style);
  const halo =
    place.halo === false
      ? ''
      : ` stroke="${escaped(palette.paper)}" stroke-width="4" stroke-linejoin="round" paint-order="stroke"`;
  const face = ` font-family="${escaped(FONT_FAMILY)}" font-size="${n(look.sizePx)}" font-weight="${look.weight}"`;
  return `${face} fill="${escaped(palette[look.colour])}"${halo} style="font-variant-numeric:tabular-nums"`;
}

function clipOutline(shape: ClipShape): string {
  return shape.kind === 'disc'
    ? `<circle cx="${n(shape.xPx)}" cy="${n(shape.yPx)}" r="${n(shape.radiusPx)}"/>`
    : `<rect x="${n(shape.xPx)}" y="${n(shape.yPx)}" width="${n(shape.widthPx)}" height="${n(shape.heightPx)}"/>`;
}

function openPath(points: Flat, from: number, to: number): string {
  let d = '';
  const path = {
    moveTo: (xPx: number, yPx: number) => {
      d += `M${n(xPx)} ${n(yPx)}`;
    },
    lineTo: (xPx: number, yPx: number) => {
      d += `L${n(xPx)} ${n(yPx)}`;
    },
  };
  tracePath(path, points, from, to);
  return d;
}

function n(value: number): string {
  const rounded = Math.round(value * 100) / 100;
  return String(rounded === 0 ? 0 : rounded);
}
