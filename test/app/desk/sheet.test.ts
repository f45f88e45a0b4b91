import { createElement } from 'react';
import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, test } from 'vitest';
import { SheetTables } from '../../../app/desk/SheetTables.tsx';
import { Refusals, TakeAway } from '../../../app/desk/TakeAway.tsx';
import { TitleBlock } from '../../../app/desk/TitleBlock.tsx';
import type { Part, PartId, Sketch } from '../../../engine/index.ts';
import { cellText, emptySketch, newThin, spacingTable } from '../../../engine/index.ts';

const part = (id: string, focalLengthMm: number, lengthMm: number): Part => ({
  ...newThin(focalLengthMm, id as PartId),
  name: `lens ${id}`,
  space: { lengthMm, medium: 'air' },
});
const options = { datum: 'first part', digits: 3, unit: 'mm' } as const;
const pair: Sketch = { ...emptySketch('Pair'), parts: [part('p1', -30, 12.3456), part('p2', 20, 0)] };

const texts = (html: string) =>
  [...html.matchAll(/<t[hd](?=[\s>])[^>]*>(.*?)<\/t[hd]>/g)].map((cell) => cell[1] ?? '');

describe('the hand-over sheet', () => {
  test('shows every column and every number of the table, with real minus signs', () => {
    const spacing = spacingTable(pair, options);
    if (!spacing.ok) throw new Error('a table wanted');
    const shown = texts(renderToStaticMarkup(createElement(SheetTables, { table: spacing.value })));
    for (const block of [spacing.value.positions, spacing.value.elements]) {
      for (const column of block.columns)
        expect(shown.some((text) => text.startsWith(column.title.replaceAll('&', '&amp;')))).toBe(true);
      for (const cell of block.rows.flatMap((row) => row.cells))
        expect(shown).toContain(cellText(cell).replace(/^-(?=\d)/, '\u2212'));
    }
  });

  test('offers every form to copy and to download', () => {
    const spacing = spacingTable(pair, options);
    const html = renderToStaticMarkup(
      createElement(TakeAway, {
        table: spacing.ok ? spacing.value : null,
        whyNot: 'why',
        clipboard: {},
        download: () => {},
        downloadDrawing: () => {},
        print: () => {},
      }),
    );
    for (const form of ['CSV', 'CSV, decimal comma', 'TSV, for pasting', 'Markdown', 'JSON'])
      for (const verb of ['Copy', 'Download']) expect(html).toContain(`aria-label="${verb} as ${form}"`);
    expect(html).not.toContain('disabled');
  });

  test('a gap that cannot be built is named, with a way to it, and nothing can be taken away', () => {
    const clash: Sketch = { ...pair, parts: [part('p1', -30, -5), part('p2', 20, 0)] };
    const spacing = spacingTable(clash, options);
    if (spacing.ok) throw new Error('a refusal wanted');
    const refusals = renderToStaticMarkup(
      createElement(Refusals, { id: 'why', refusals: spacing.refusals, onShow: () => {} }),
    );
    for (const { sentence } of spacing.refusals)
      expect(refusals).toContain(sentence.replaceAll("'", '&#x27;'));
    expect(refusals).toContain('Show it');
    const buttons = renderToStaticMarkup(
      createElement(TakeAway, {
        table: null,
        whyNot: 'why',
        clipboard: {},
        download: () => {},
        downloadDrawing: () => {},
        print: () => {},
      }),
    );
    const enabled = [...buttons.matchAll(/<button[^>]*>/g)].filter(
      ([button]) => !(button.includes('disabled') && button.includes('aria-describedby="why"')),
    );
    expect(enabled).toEqual([]);
  });

  test('the title block carries title, date, scale, unit and sheet, and leaves the rest to be filled in', () => {
    const html = renderToStaticMarkup(
      createElement(TitleBlock, {
        title: 'Pair <1>',
        date: new Date(2026, 11, 1),
        scale: 'not to scale',
        unit: 'in',
      }),
    );
    for (const text of ['Pair &lt;1&gt;', '2026-12-01', 'not to scale', '>in<', '1 of 1'])
      expect(html).toContain(text);
    for (const field of ['Number', 'Revision', 'Owner', 'Drawn by', 'Approved by'])
      expect(html).toContain(field);
  });
});
