import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { SheetForm } from '../../../engine/sheet/sheetText.ts';
import { SHEET_FORMS, sheetText } from '../../../engine/sheet/sheetText.ts';
import type { Spacing } from '../../../engine/sheet/spacingTable.ts';
import { spacingTable } from '../../../engine/sheet/spacingTable.ts';
import type { Block, Cell, SheetOptions, SpacingTable } from '../../../engine/sheet/table.ts';
import { DEFAULT_SHEET_OPTIONS } from '../../../engine/sheet/table.ts';
import type { Part, Sketch } from '../../../engine/sketch/types.ts';
import { inspectionZoom } from '../demo.ts';
import { anyLayout } from './anyLayout.ts';
import { readMarkdownTables, readRecords } from './readText.ts';

const anyOptions = (): fc.Arbitrary<SheetOptions> =>
  fc.record({
    datum: fc.constant('first part' as const),
    digits: fc.integer({ min: 0, max: 6 }),
    unit: fc.constantFrom('mm' as const, 'in' as const),
  });

const DELIMITED: readonly { form: SheetForm; separator: string; decimal: string }[] = [
  { form: 'csv', separator: ',', decimal: '.' },
  { form: 'csv comma', separator: ';', decimal: ',' },
  { form: 'tsv', separator: '\t', decimal: '.' },
];

/** Tables are whole analyses: enough of them to meet every awkward name many times over. */
const RUNS = 50;

describe('the text of a spacing table', () => {
  it('begins with the headings and a line for each position, in commas', () => {
    const lines = sheetText(demoTable(), 'csv').split('\r\n');
    expect(lines[0]).toMatch(
      /^Position,Object to first group \(principal plane\) \(mm\),first group \(datum\)/i,
    );
    expect(lines[2]).toMatch(
      /^middle,500\.000,0\.000,26\.272,51\.587,84\.000,110\.000,26\.272,25\.315,32\.413,26\.000,41\.198,-0\.08000,5\.600,13\.383,0\.00,-0\.\d\d$/,
    );
  });

  it('writes decimal commas and parts by semicolons where the comma is the decimal mark', () => {
    expect(sheetText(demoTable(), 'csv comma')).toContain('\r\nmiddle;500,000;0,000;26,272;51,587;');
  });

  it.each(DELIMITED)('has the same number of fields in every record of $form', ({ form, separator }) => {
    const widths = readRecords(sheetText(demoTable(), form), separator).map((record) => record.length);
    expect(new Set(widths).size).toBe(1);
  });

  it.each(DELIMITED)(
    'quotes what would break a field of $form, and doubles the quotes',
    ({ form, separator }) => {
      const name = `a${separator}"b"`;
      const records = readRecords(sheetText(demoTable({ name }), form), separator);
      const shown = separator === '\t' ? 'a "b"' : name;
      expect(records.flat().filter((field) => field === shown)).toHaveLength(1);
    },
  );

  it.each(['=1+2', '+5', '-3', '@home', '\t=1', '\r\n=1'])(
    'keeps a spreadsheet from reckoning the name %j',
    (name) => {
      for (const { form, separator } of DELIMITED) {
        const fields = readRecords(sheetText(demoTable({ name }), form), separator).flat();
        const texts = fields.filter((field) => !/^-?\d+(?:[.,]\d+)?$/.test(field));
        expect(texts.filter((field) => /^[=+\-@\t\r\n]/.test(field))).toEqual([]);
      }
    },
  );

  it('leaves names as they are in Markdown and JSON, which no spreadsheet reckons', () => {
    const table = demoTable({ name: '=1+2' });
    expect(sheetText(table, 'markdown')).toContain('| =1+2 |');
    expect(sheetText(table, 'json')).toContain('"=1+2"');
  });

  it('escapes pipes in Markdown, so that a name stays in its cell', () => {
    expect(sheetText(demoTable({ name: 'a | b' }), 'markdown')).toContain('| a \\| b |');
  });

  it('names its format and version in JSON and keeps the reasons of absent numbers apart from texts', () => {
    const table = tableOf(spacingTable(afocalPair(), DEFAULT_SHEET_OPTIONS));
    const json = JSON.parse(sheetText(table, 'json'));
    expect(json).toMatchObject({ format: 'gapwright-spacing-table', version: 1, unit: 'mm', digits: 3 });
    const focal = json.positions.columns.findIndex(({ id }: { id: string }) => id === 'focalLength');
    expect(json.positions.rows[0].values[focal]).toEqual({ absent: 'afocal' });
  });

  it.each(SHEET_FORMS)(
    'ends with a line break and holds no control characters but line breaks and tabs: %s',
    (form) => {
      const text = sheetText(demoTable(), form);
      expect(text.endsWith('\n')).toBe(true);
      expect([...text].filter((character) => character < ' ' && !'\r\n\t'.includes(character))).toEqual([]);
    },
  );
});

describe('reading a spacing table back', () => {
  it.each(DELIMITED)('gives the numbers shown and the texts, from $form', ({ form, separator, decimal }) => {
    fc.assert(
      fc.property(anyLayout(), anyOptions(), (sketch, options) => {
        const { positions, elements, ...table } = tableOf(spacingTable(sketch, options));
        const text = sheetText({ positions, elements, ...table }, form);
        const records = readRecords(text, separator);
        const blocks = [records.slice(1), records.slice(positions.rows.length + 3)];
        for (const [b, block] of [positions, elements].entries())
          expect(readBlock(blocks[b] ?? [], block, (field) => Number(field.replace(decimal, '.')))).toEqual(
            valuesOf(block),
          );
      }),
      { numRuns: RUNS },
    );
  });

  it('gives the numbers shown and the texts, from Markdown', () => {
    fc.assert(
      fc.property(anyLayout(), anyOptions(), (sketch, options) => {
        const table = tableOf(spacingTable(sketch, options));
        const tables = readMarkdownTables(sheetText(table, 'markdown'));
        for (const [b, block] of [table.positions, table.elements].entries()) {
          expect(tables[b]).toHaveLength(block.rows.length + 1);
          expect(readBlock(tables[b]?.slice(1) ?? [], block, Number)).toEqual(valuesOf(block));
        }
      }),
      { numRuns: RUNS },
    );
  });

  it('gives the numbers shown, the texts and the reasons, from JSON', () => {
    fc.assert(
      fc.property(anyLayout(), anyOptions(), (sketch, options) => {
        const table = tableOf(spacingTable(sketch, options));
        const json = JSON.parse(sheetText(table, 'json'));
        for (const name of ['positions', 'elements'] as const)
          expect(json[name].rows.map(({ values }: { values: unknown[] }) => values)).toEqual(
            cellsOf(table[name]).map((cells) => cells.map(jsonValue)),
          );
      }),
      { numRuns: RUNS },
    );
  });
});

/** The rows of a block read back from texts: numbers where the table has numbers. */
const readBlock = (
  rows: readonly (readonly string[])[],
  block: Block<string>,
  read: (text: string) => number,
): unknown[][] =>
  cellsOf(block).map((cells, r) =>
    cells.map((cell, c) => {
      const text = rows[r]?.[c] ?? '';
      return cell.kind === 'number' ? read(text) : plain(text);
    }),
  );

const valuesOf = (block: Block<string>): unknown[][] =>
  cellsOf(block).map((cells) =>
    cells.map((cell) =>
      cell.kind === 'number' ? cell.value : plain(cell.kind === 'text' ? cell.text : cell.why),
    ),
  );

const cellsOf = (block: Block<string>): (readonly Cell[])[] => block.rows.map(({ cells }) => cells);

/** A text without what the delimited forms may add or fold: the apostrophe in front, tabs and line breaks. */
const plain = (text: string): string => text.replace(/^'/, '').replace(/[\t\r\n]+/g, ' ');

const jsonValue = (cell: Cell): unknown =>
  cell.kind === 'number' ? cell.value : cell.kind === 'text' ? cell.text : { absent: cell.why };

function tableOf(spacing: Spacing): SpacingTable {
  if (!spacing.ok) throw new Error(spacing.refusals.map(({ sentence }) => sentence).join(' '));
  return spacing.value;
}

/** The demo's table, with its second group changed. */
function demoTable(change: Partial<Pick<Part, 'name'>> = {}): SpacingTable {
  const demo = inspectionZoom();
  const parts = demo.parts.map((part, k) => (k === 1 ? { ...part, ...change } : part));
  return tableOf(spacingTable({ ...demo, parts }, DEFAULT_SHEET_OPTIONS));
}

function afocalPair(): Sketch {
  const demo = inspectionZoom();
  const [first, second] = demo.parts;
  if (first?.kind !== 'thin' || second?.kind !== 'thin')
    throw new Error('the demo begins with two thin parts');
  const space = { lengthMm: 75, medium: 'air' } as const;
  return {
    ...demo,
    object: { distanceMm: 'infinity', medium: 'air' },
    image: 'focus',
    parts: [
      { ...first, focalLengthMm: -25, space },
      { ...second, focalLengthMm: 100, space },
    ],
    stop: first.id,
    aperture: { kind: 'entrancePupilDiameter', diameterMm: 4 },
    field: { ...demo.field, size: { kind: 'angle', angleDeg: 1 } },
  };
}
