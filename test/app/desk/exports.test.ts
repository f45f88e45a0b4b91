import { beforeEach, describe, expect, test } from 'vitest';
import { withCaution } from '../../../app/desk/cautioned.ts';
import { downloadPng, downloadSvg, downloadTable, svgSize } from '../../../app/desk/exports.ts';
import { dismissNotice, noticeStore } from '../../../app/desk/notices.ts';
import type { PartId, SpacingTable } from '../../../engine/index.ts';
import { emptySketch, newThin, SHEET_FORMS, sheetText, spacingTable } from '../../../engine/index.ts';
import { inputsAndDownloads } from './fakes.ts';

function tableOfOneLens(): SpacingTable {
  const sketch = { ...emptySketch('One lens'), parts: [newThin(50, 'p1' as PartId)] };
  const spacing = spacingTable(sketch, { datum: 'first part', digits: 3, unit: 'mm' });
  if (!spacing.ok) throw new Error('a table wanted');
  return spacing.value;
}

const notice = () => noticeStore.getState().notice?.text;
const svg =
  '<?xml version="1.0"?>\n<svg xmlns="http://www.w3.org/2000/svg" width="320.5" height="200" role="img"><path/></svg>';

describe('what is taken away', () => {
  beforeEach(() => dismissNotice());

  test.each(SHEET_FORMS)(
    'the table as %s is what the engine writes, under its own extension',
    async (form) => {
      const { files, downloads } = inputsAndDownloads();
      const table = tableOfOneLens();
      downloadTable(files.download, table, form);
      const [file] = downloads;
      expect(file?.name).toMatch(/^one-lens-spacing\.(csv|tsv|md|json)$/);
      expect(await file?.content.text()).toBe(sheetText(table, form));
      expect(notice()).toBe(`The spacing table is in your downloads as “${file?.name}”.`);
    },
  );

  test('CSV begins with a byte order mark, so that spreadsheets read µ and Ø', async () => {
    const { files, downloads } = inputsAndDownloads();
    downloadTable(files.download, tableOfOneLens(), 'csv');
    const bytes = new Uint8Array((await downloads[0]?.content.arrayBuffer()) ?? new ArrayBuffer(0));
    expect([...bytes.slice(0, 3)]).toEqual([0xef, 0xbb, 0xbf]);
  });

  test('the drawing is handed over as it was drawn', async () => {
    const { files, downloads } = inputsAndDownloads();
    downloadSvg(files.download, svg, 'One lens');
    expect(downloads[0]?.name).toBe('one-lens.svg');
    expect(await downloads[0]?.content.text()).toBe(svg);
  });

  test('a picture the browser cannot make is said, and nothing is downloaded', async () => {
    const { files, downloads } = inputsAndDownloads();
    await downloadPng(files.download, svg, 'One lens', async () => ({ ok: false, why: 'No picture.' }));
    expect(downloads).toEqual([]);
    expect(notice()).toBe('No picture.');
    const picture = new Blob(['png']);
    await downloadPng(files.download, svg, 'One lens', async () => ({ ok: true, value: picture }));
    expect(downloads).toEqual([{ name: 'one-lens.png', content: picture }]);
  });

  test('the size of a drawing is read from its root, and absent when it is not there', () => {
    expect(svgSize(svg)).toEqual({ widthPx: 320.5, heightPx: 200 });
    expect(svgSize('<svg viewBox="0 0 1 1"/>')).toBeNull();
    expect(svgSize('<svg width="0" height="5"/>')).toBeNull();
    expect(svgSize('')).toBeNull();
  });

  test('a caution stands under the whole drawing, broken into lines that fit, and the drawing is inside as it was', () => {
    const caution = 'Caution: sunlight & laser beams burn. '.repeat(4).trim();
    const whole = withCaution(svg, caution);
    const inner = svg.slice(svg.indexOf('<svg'));
    expect(whole).toContain(inner);
    expect(whole.match(/<\?xml/)).toBeNull();
    const lines = [...whole.matchAll(/<text[^>]*>(.*?)<\/text>/g)].map((line) => line[1] ?? '');
    expect(lines.length).toBeGreaterThan(2);
    expect(lines.join(' ')).toBe(caution.replaceAll('&', '&amp;'));
    expect(svgSize(whole)?.heightPx).toBeGreaterThan(200 + 18 * lines.length);
    expect(withCaution(svg, null)).toBe(svg);
  });
});
