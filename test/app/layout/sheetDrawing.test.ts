import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { roughMeasure } from '../../../app/board/measure.ts';
import { sheetDrawing, sheetScale } from '../../../app/layout/sheetDrawing.ts';
import type { View } from '../../../app/store/viewStore.ts';
import type { PartId, Sketch } from '../../../engine/index.ts';
import { emptySketch } from '../../../engine/index.ts';
import { inspectionZoom, WIDE } from '../../engine/demo.ts';
import { anySketch } from '../../engine/sketch/arbitrary.ts';
import { ALL_SHOWN, AT_MIDDLE } from '../drawing/seen.ts';
import { readingOf } from '../reading.ts';

const drawingOf = (sketch: Sketch, change: Partial<View> = {}) =>
  sheetDrawing(readingOf(sketch, change), roughMeasure);
const demo = drawingOf(inspectionZoom(), { setting: AT_MIDDLE });

/** What keeps an XML text from being well formed: tags that do not match, stray angles, unknown entities; null when nothing. */
function faultIn(xml: string): string | null {
  const open: string[] = [];
  let rest = xml.replace(/^<\?xml [^?]*\?>/, '');
  while (rest !== '') {
    const [text = ''] = /^[^<]*/.exec(rest) ?? [];
    if (/>|&(?!amp;|lt;|gt;|quot;|#39;)/.test(text)) return `text: ${text}`;
    rest = rest.slice(text.length);
    if (rest === '') break;
    const tag = /^<(\/?)([\w-]+)((?: [\w:-]+="[^"<]*")*)(\/?)>/.exec(rest);
    if (!tag) return `tag: ${rest.slice(0, 80)}`;
    const [whole, closing, name = '', attributes = '', alone] = tag;
    const names = [...attributes.matchAll(/ ([\w:-]+)=/g)].map(([, attribute]) => attribute);
    if (new Set(names).size < names.length) return `attribute given twice: ${whole}`;
    if (closing) {
      if (open.pop() !== name) return `closed too early: ${whole}`;
    } else if (!alone) open.push(name);
    rest = rest.slice(whole.length);
  }
  return open.length > 0 ? `left open: ${open.join(' ')}` : null;
}

describe('the drawing as a file', () => {
  it('is a well formed document of one picture', () => {
    expect(faultIn(demo)).toBeNull();
    expect(demo).toMatch(
      /^<\?xml version="1.0" encoding="UTF-8"\?>\n<svg xmlns="http:\/\/www.w3.org\/2000\/svg"/,
    );
  });

  it('has the title, and says which position it shows', () => {
    expect(demo).toContain('<title>Inspection zoom</title>');
    expect(demo).toContain('<desc>Layout of 4 parts, drawn at middle</desc>');
    expect(demo).toContain('>drawn at middle</text>');
    const between = drawingOf(inspectionZoom(), { setting: { at: WIDE, toNext: 0.5 } });
    expect(between).toContain('>between wide and middle</text>');
    const [first] = inspectionZoom().positions;
    if (!first) throw new Error('the inspection zoom has positions');
    expect(drawingOf({ ...emptySketch(), positions: [first] })).not.toContain('drawn at');
  });

  it('shows the dimensions and focal lengths that the screen shows', () => {
    for (const text of [
      '500.000',
      '26.272',
      '25.315',
      '32.413',
      '26.000',
      '110.000',
      'f \u221232',
      'f 28, stop',
    ])
      expect(demo).toContain(`>${text}</text>`);
  });

  it('shows no grips and nothing as selected', () => {
    const held = drawingOf(inspectionZoom(), { setting: AT_MIDDLE, selection: ['p2' as PartId, 'image'] });
    expect(held).toBe(demo);
  });

  it('is drawn on paper, in whatever theme the screen is', () => {
    expect(drawingOf(inspectionZoom(), { setting: AT_MIDDLE, theme: 'night' })).toBe(demo);
  });

  it('says how heights are scaled', () => {
    expect(sheetScale(readingOf(inspectionZoom(), { setting: AT_MIDDLE }))).toMatch(
      /^not to a drawing scale; heights (as lengths|×\d+(\.\d+)?)$/,
    );
  });

  it('of any sketch is well formed and knows no NaN', () => {
    fc.assert(
      fc.property(anySketch(), (sketch) => {
        const svg = drawingOf(sketch, { shown: ALL_SHOWN });
        expect(faultIn(svg)).toBeNull();
        expect(svg.replace(/<title>.*?<\/title>/s, '')).not.toMatch(/NaN|Infinity|undefined/);
      }),
    );
  });
});
