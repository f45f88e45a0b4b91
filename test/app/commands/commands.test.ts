import { createElement } from 'react';
import { renderToStaticMarkup } from 'react-dom/server';
import { afterAll, beforeAll, beforeEach, describe, expect, test, vi } from 'vitest';
import { commandsById, createCommands } from '../../../app/commands/commands.ts';
import { Help } from '../../../app/commands/Help.tsx';
import type { Services } from '../../../app/commands/services.ts';
import type { Desk } from '../../../app/desk/desk.ts';
import { dismissNotice, noticeStore } from '../../../app/desk/notices.ts';
import { applyEdit, openSketch, previewEdit, sketchStore } from '../../../app/store/sketchStore.ts';
import { select, setView, viewStore } from '../../../app/store/viewStore.ts';
import type { PartId, Sketch } from '../../../engine/index.ts';
import { emptySketch, setTitle, sheetText, spacingTable } from '../../../engine/index.ts';

const startView = viewStore.getState();
const called: string[] = [];
const clipboard = { text: '' };

const note = (what: string) => async () => {
  called.push(what);
};

const services: Services = {
  desk: {
    saveFile: async (elsewhere?: boolean) => {
      called.push(elsewhere ? 'save elsewhere' : 'save');
    },
    openFile: note('open'),
    openNew: note('new'),
    link: async (page: string) => ({ ok: true, value: `${page}#sketch=x` }),
  } as unknown as Desk,
  clipboard: {
    writeText: async (text) => {
      clipboard.text = text;
    },
    readText: async () => clipboard.text,
  },
  download: (name) => called.push(`download ${name}`),
  rasterise: async () => ({ ok: false, why: 'no canvas' }),
  drawSheet: () => '<svg/>',
  fitView: (what) => called.push(`fit ${what}`),
  print: () => called.push('print'),
  page: () => 'https://example.org/',
};

const groups = createCommands(services);
const byId = commandsById(groups);
const sketch = () => sketchStore.getState().sketch;
const ids = () => sketch().parts.map((part) => part.id);
const selection = () => viewStore.getState().selection;
const gaps = () => sketch().parts.map((part) => part.space.lengthMm);

/** Runs a command if it is available; gives whether it was. Waits for what it began. */
async function run(id: string): Promise<boolean> {
  const command = byId.get(id);
  if (!command) throw new Error(`no command ${id}`);
  const available = command.available();
  if (available) command.run();
  await new Promise((resolve) => setTimeout(resolve, 0));
  return available;
}

/** Three elements 10 and 20 mm apart. */
async function threeElements(): Promise<readonly [PartId, PartId, PartId]> {
  await run('addPositive');
  await run('addNegative');
  await run('addPositive');
  applyEdit((before) => ({
    ...before,
    parts: before.parts.map((part, index) => ({
      ...part,
      space: { ...part.space, lengthMm: [10, 20, 30][index] ?? 0 },
    })),
  }));
  const [a, b, c] = ids();
  if (!a || !b || !c) throw new Error('three parts wanted');
  return [a, b, c];
}

describe('commands', () => {
  // Nothing is drawn here.
  beforeAll(() => vi.stubGlobal('requestAnimationFrame', () => 0));
  afterAll(() => vi.unstubAllGlobals());
  beforeEach(() => {
    openSketch(emptySketch('Test'));
    viewStore.setState(startView, true);
    dismissNotice();
    called.length = 0;
    clipboard.text = '';
  });

  test('no two share an id or a key, and each has a label', () => {
    const all = groups.flatMap((group) => group.commands);
    const keys = all.flatMap((command) => command.keys);
    expect(new Set(all.map((command) => command.id)).size).toBe(all.length);
    expect(new Set(keys).size).toBe(keys.length);
    for (const { label } of all) expect(label).toMatch(/^[A-Z].+/);
  });

  test('what needs something to work on is not available on an empty sketch', async () => {
    const needing = [
      'undo',
      'redo',
      'delete',
      'duplicate',
      'flip',
      'flipSign',
      'tie',
      'untie',
      'copy',
      'cut',
      'selectAll',
    ];
    for (const id of [...needing, 'rideStop', 'releaseStop', 'fixSensor', 'followFocus', 'position2'])
      expect([id, byId.get(id)?.available()]).toEqual([id, false]);
  });

  test('the first element is the datum, is selected, and its focal length is asked for', async () => {
    await run('addPositive');
    expect(sketch().parts).toMatchObject([{ kind: 'thin', focalLengthMm: 50 }]);
    expect(selection()).toEqual(ids());
    expect(viewStore.getState().typing).toBe(`focal:${ids()[0]}:rear`);
    expect(sketch().stop).toBe(ids()[0]);
  });

  test('a new part goes into the middle of the gap behind the selection', async () => {
    const [a, b, c] = await threeElements();
    select(a);
    await run('addNegative');
    expect(ids().filter((id) => [a, b, c].includes(id))).toEqual([a, b, c]);
    expect(ids()[0]).toBe(a);
    expect(selection()).toEqual([ids()[1]]);
    expect(gaps().slice(0, 2)).toEqual([5, 5]);
  });

  test('with the object selected it goes in front of the first part', async () => {
    const [a] = await threeElements();
    select('object');
    await run('addPlate');
    expect(sketch().parts[0]).toMatchObject({ kind: 'plate' });
    expect(ids()[1]).toBe(a);
  });

  test('with nothing selected it goes behind the last part, short of the sensor', async () => {
    const [, , c] = await threeElements();
    select(c);
    await run('fixSensor');
    applyEdit((before) => ({
      ...before,
      parts: before.parts.map((part) =>
        part.id === c ? { ...part, space: { ...part.space, lengthMm: 30 } } : part,
      ),
    }));
    select();
    await run('addPositive');
    expect(ids().at(-2)).toBe(c);
    expect(gaps().slice(-2)).toEqual([15, 15]);
  });

  test('a stop that is added becomes the stop', async () => {
    await threeElements();
    await run('addStop');
    expect(sketch().stop).toBe(selection()[0]);
    expect(sketch().parts.find((part) => part.id === sketch().stop)?.kind).toBe('stop');
  });

  test('deleting selects what then stands in the place', async () => {
    const [a, b, c] = await threeElements();
    select(b);
    await run('delete');
    expect(selection()).toEqual([c]);
    await run('delete');
    expect(selection()).toEqual([a]);
    await run('delete');
    expect(selection()).toEqual([]);
  });

  test('a part changes places with its neighbour, and stops at the ends', async () => {
    const [a, b, c] = await threeElements();
    select(a);
    expect(await run('earlier')).toBe(false);
    expect(await run('later')).toBe(true);
    expect(ids()).toEqual([b, a, c]);
    expect(gaps()).toEqual([10, 20, 30]);
    expect(await run('later')).toBe(true);
    expect(await run('later')).toBe(false);
    expect(ids()).toEqual([b, c, a]);
    select(a, b);
    expect(await run('earlier')).toBe(false);
  });

  test('duplicating selects the copies, undo takes them away in one step', async () => {
    const [a, b] = await threeElements();
    const before = sketch();
    select(a, b);
    await run('duplicate');
    expect(ids().length).toBe(5);
    expect(selection().length).toBe(2);
    expect(selection()).not.toContain(a);
    await run('undo');
    expect(sketch()).toBe(before);
    expect(await run('redo')).toBe(true);
    expect(ids().length).toBe(5);
  });

  test('parts go over the clipboard into another sketch', async () => {
    const [, b, c] = await threeElements();
    select(b, c);
    await run('copy');
    openSketch(emptySketch('Another'));
    await run('paste');
    expect(sketch().parts.map((part) => part.kind === 'thin' && part.focalLengthMm)).toEqual([-50, 50]);
    expect(gaps()[0]).toBe(20);
    expect(selection()).toEqual(ids());
  });

  test('cutting takes away only what reached the clipboard', async () => {
    const [a] = await threeElements();
    select(a);
    await run('cut');
    expect(ids()).not.toContain(a);
    expect(clipboard.text).toContain('gapwright-parts');
    const refused = commandsById(createCommands({ ...services, clipboard: {} }));
    const [left] = ids();
    if (left) select(left);
    refused.get('cut')?.run();
    await new Promise((resolve) => setTimeout(resolve, 0));
    expect(ids()).toContain(left);
  });

  test('a clipboard without parts is refused in one sentence', async () => {
    clipboard.text = 'shopping list';
    await run('paste');
    expect(noticeStore.getState().notice).toMatchObject({
      urgent: true,
      text: 'The clipboard holds no parts; copy parts from a Gapwright sketch first.',
    });
    expect(ids()).toEqual([]);
  });

  test('flipping turns the selection round, or everything when nothing is selected', async () => {
    const [a, b, c] = await threeElements();
    select(a, b);
    await run('flip');
    expect(ids()).toEqual([b, a, c]);
    select();
    await run('flip');
    expect(ids()).toEqual([c, a, b]);
  });

  test('the sign of every selected power flips in one step', async () => {
    const [a, b] = await threeElements();
    select(a, b);
    await run('flipSign');
    const focal = sketch().parts.map((part) => part.kind === 'thin' && part.focalLengthMm);
    expect(focal).toEqual([-50, 50, 50]);
  });

  test('comma and full stop walk from the object over the parts to the image and stop there', async () => {
    const [a, b, c] = await threeElements();
    select();
    const walked = [];
    for (let step = 0; step < 6; step += 1) {
      await run('next');
      walked.push(selection()[0]);
    }
    expect(walked).toEqual(['object', a, b, c, 'image', 'image']);
    await run('previous');
    expect(selection()).toEqual([c]);
    select();
    await run('previous');
    expect(selection()).toEqual(['image']);
  });

  test('the stop rides on a part and is released again', async () => {
    const [, b] = await threeElements();
    select(b);
    await run('rideStop');
    expect(sketch().stop).toBe(b);
    expect(await run('rideStop')).toBe(false);
    await run('releaseStop');
    expect(sketch().parts.find((part) => part.id === sketch().stop)?.kind).toBe('stop');
    expect(selection()).toEqual([sketch().stop]);
  });

  test('fixing the sensor keeps the image where it was, and following lets it go', async () => {
    await run('addPositive');
    await run('fixSensor');
    expect(sketch().image).toBe('fixed');
    expect(gaps()).toEqual([50]);
    await run('followFocus');
    expect(sketch().image).toBe('focus');
  });

  test('parts are tied and untied', async () => {
    const [a, b] = await threeElements();
    select(a, b);
    await run('tie');
    expect(sketch().groups).toMatchObject([{ name: 'group 1', partIds: [a, b] }]);
    select(b);
    await run('untie');
    expect(sketch().groups).toEqual([]);
  });

  test('a position is added behind the present one, gone to, and reached by its number', async () => {
    await run('addPosition');
    expect(sketch().positions.map((position) => position.name)).toEqual(['only', 'position 2']);
    expect(viewStore.getState().setting.at).toBe(sketch().positions[1]?.id);
    await run('position1');
    expect(viewStore.getState().setting.at).toBe(sketch().positions[0]?.id);
    expect(await run('position3')).toBe(false);
  });

  test('Escape goes back one step at a time: gesture, tray, entry, sheet, panel, selection', async () => {
    const [a] = await threeElements();
    select(a);
    setView({ placing: 'stop', typing: 'gap p1', sheet: 'help', panel: 'part' });
    previewEdit((before: Sketch) => setTitle(before, 'half-way'));
    const left = () => {
      const { placing, typing, sheet, panel } = viewStore.getState();
      const steps = { gesture: sketchStore.getState().running, placing, typing, sheet, panel };
      return [
        ...Object.entries(steps).flatMap(([name, value]) => (value === null ? [] : [name])),
        ...(selection().length > 0 ? ['selection'] : []),
      ];
    };
    const ladder = ['gesture', 'placing', 'typing', 'sheet', 'panel', 'selection'];
    for (let rung = 0; rung < ladder.length; rung += 1) {
      expect(left()).toEqual(ladder.slice(rung));
      await run('escape');
    }
    expect(left()).toEqual([]);
  });

  test('undo during a drag gives up only the drag', async () => {
    await run('addPositive');
    const before = sketch();
    previewEdit((sketch_) => setTitle(sketch_, 'half-way'));
    await run('undo');
    expect(sketch()).toBe(before);
  });

  test('the copied table is the engine’s', async () => {
    await threeElements();
    await run('copyTable');
    const spacing = spacingTable(sketch(), { datum: 'first part', digits: 3, unit: 'mm' });
    expect(spacing.ok && sheetText(spacing.value, 'tsv')).toBe(clipboard.text);
  });

  test('a layout that cannot be built is not copied: the first reason is said', async () => {
    await run('copyTable');
    expect(clipboard.text).toBe('');
    expect(noticeStore.getState().notice?.text).toMatch(/no parts/);
  });

  test('printing opens the hand-over and prints only what can be built', async () => {
    await run('print');
    expect(viewStore.getState().sheet).toBe('handOver');
    expect(called).toEqual([]);
    await threeElements();
    called.length = 0;
    await run('print');
    expect(called).toEqual(['print']);
  });

  test('files, fits, sheets, theme, units and snapping do what they say', async () => {
    for (const id of ['save', 'saveElsewhere', 'open', 'new', 'fitParts', 'fitEverything', 'exportSvg'])
      await run(id);
    expect(called).toEqual([
      'save',
      'save elsewhere',
      'open',
      'new',
      'fit parts',
      'fit everything',
      'download test.svg',
    ]);
    for (const id of ['theme', 'units', 'snap', 'shelf']) await run(id);
    expect(viewStore.getState()).toMatchObject({ theme: 'paper', unit: 'in', snap: false, sheet: 'shelf' });
    await run('copyLink');
    expect(clipboard.text).toBe('https://example.org/#sketch=x');
    await run('exportPng');
    expect(noticeStore.getState().notice?.text).toBe('no canvas');
  });

  test('help lists every command and key, the caution, version and licence', () => {
    const html = renderToStaticMarkup(createElement(Help, { groups, apple: false, onClose: () => {} }));
    for (const command of groups.flatMap((group) => group.commands)) {
      expect(html).toContain(command.label);
      for (const key of command.keys) expect(html).toContain(`<kbd>${key}</kbd>`);
    }
    expect(html).toMatch(/Sunlight or a laser beam/);
    expect(html).toMatch(/Gapwright \d+\.\d+\.\d+, MIT licence/);
  });
});
