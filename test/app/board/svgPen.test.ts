import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { PALETTES } from '../../../app/board/styles.ts';
import { escaped, type SvgSheet, svgPen } from '../../../app/board/svgPen.ts';
import { SEED } from './generators.ts';
import { smallScene } from './scene.ts';

const sheet: SvgSheet = { widthPx: 100, heightPx: 80, palette: PALETTES.paper, title: 'A layout' };

function drawn(change: Partial<SvgSheet> = {}): string {
  const pen = svgPen({ ...sheet, ...change });
  smallScene(pen);
  return pen.document();
}

/** The names of elements in order; throws where tags do not close, or text or attributes hold bare < or &. */
function wellFormed(xml: string): readonly string[] {
  const names: string[] = [];
  const open: string[] = [];
  const token =
    /<\?xml[^>]*\?>|<\/([a-zA-Z]+)>|<([a-zA-Z]+)((?:\s+[a-zA-Z:-]+="(?:[^"<&]|&(?:amp|lt|gt|quot|#39);)*")*)\s*(\/?)>|((?:[^<&]|&(?:amp|lt|gt|quot|#39);)+)/y;
  let at = 0;
  while (at < xml.length) {
    token.lastIndex = at;
    const found = token.exec(xml);
    if (found === null) throw new Error(`not XML from "${xml.slice(at, at + 60)}"`);
    const [all, closing, opening, , selfClosing] = found;
    if (closing !== undefined && open.pop() !== closing) throw new Error(`</${closing}> closes nothing`);
    if (opening !== undefined) {
      names.push(opening);
      if (selfClosing === '') open.push(opening);
    }
    at += all.length;
  }
  if (open.length > 0) throw new Error(`<${open.at(-1)}> is never closed`);
  return names;
}

describe('the SVG pen', () => {
  it('writes one well-formed document, one path for a batch of lines', () => {
    expect(wellFormed(drawn())).toEqual(
      'svg title defs clipPath circle rect g path path g path g path circle g path text text'.split(' '),
    );
  });

  it('keeps texts as texts in the type face, with a rim of paper behind them', () => {
    const text = drawn();
    expect(text).toContain('>f −32 &amp; &quot;second&quot; &lt;group&gt;</text>');
    expect(text).toMatch(
      /font-family="&#39;Source Sans 3 Variable&#39;[^"]*" font-size="13" font-weight="600"/,
    );
    expect(text).toContain('paint-order="stroke"');
    expect(text.match(/paint-order/g)).toHaveLength(1);
  });

  it('dots a virtual ray in the colour of its ray', () => {
    expect(drawn()).toMatch(/M0 40L90 41.96" fill="none" stroke="#7c1257"[^>]*stroke-dasharray="1.5 3"/);
  });

  it('gives the printed size in millimetres when asked to, and the sheet unless told not to', () => {
    expect(drawn({ printed: { widthMm: 250, heightMm: 200 } })).toContain(
      'width="250mm" height="200mm" viewBox="0 0 100 80"',
    );
    expect(drawn()).toContain('<rect width="100" height="80" fill="#fbfaf6"/>');
    expect(wellFormed(drawn({ background: false }))).not.toContain('rect');
  });

  it('says what it shows', () => {
    const text = drawn({ title: 'f < 32', description: 'Four groups & a stop' });
    expect(text).toContain('<title>f &lt; 32</title>');
    expect(text).toContain('<desc>Four groups &amp; a stop</desc>');
  });

  it('stays well-formed whatever is written on it', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary' }), (text) => {
        const pen = svgPen({ ...sheet, title: text });
        pen.group(text, () => pen.text(1, 1, text, 'label'));
        expect(() => wellFormed(pen.document())).not.toThrow();
      }),
      SEED,
    );
  });

  it('leaves out characters that XML forbids', () => {
    expect(escaped('a\u0000b\u001fc\uFFFEd\ud800e\nf')).toBe('abcde\nf');
  });

  it('draws nothing for a point that is not a number', () => {
    const pen = svgPen(sheet);
    pen.circle(Number.NaN, 1, 2, 'grip');
    pen.text(1, Number.NaN, 'lost', 'label');
    pen.polyline([0, 0, Number.NaN, 5], 'axis');
    pen.closed([0, 0, 1, 1, Number.NaN, 5], 'grip');
    expect(wellFormed(pen.document())).toEqual(['svg', 'title', 'rect']);
  });
});
