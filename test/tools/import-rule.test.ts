import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterAll, describe, expect, test } from 'vitest';
import { checkImports } from './import-rule.mjs';

const folders: string[] = [];
afterAll(() => {
  for (const folder of folders) rmSync(folder, { recursive: true });
});

const SOUND = {
  'engine/outcome.ts': 'export type Outcome = number;',
  'engine/sketch/types.ts': "import type { Outcome } from '../outcome.ts';\nexport type Sketch = Outcome;",
  'engine/train/train.ts':
    "import type { Sketch } from '../sketch/types.ts';\nexport const trainOf = (s: Sketch) => s;",
  'engine/index.ts': "export { trainOf } from './train/train.ts';",
  'app/store/sketchStore.ts':
    "import { trainOf } from '../../engine/index.ts';\nexport const store = trainOf(1);",
  'app/live/frame.ts': "import { store } from '../store/sketchStore.ts';\nexport const frame = store;",
  'app/App.tsx': "import { frame } from './live/frame.ts';\nexport const App = () => frame;",
};

/** The files of a small package, as if it had been installed. */
const installed = (name: string) => ({
  'package.json': JSON.stringify({ dependencies: { [name]: '1.0.0' } }),
  [`node_modules/${name}/package.json`]: JSON.stringify({ name, version: '1.0.0', main: 'index.js' }),
  [`node_modules/${name}/index.js`]: 'export const x = 1;',
});

/** What the rule says about a small sound repository with `changes` made to it. */
async function check(changes: Record<string, string>, base: Record<string, string> = SOUND) {
  const folder = mkdtempSync(join(tmpdir(), 'import-rule-'));
  folders.push(folder);
  for (const house of ['engine', 'app']) mkdirSync(join(folder, house));
  for (const [path, text] of Object.entries({ ...base, ...changes })) {
    mkdirSync(dirname(join(folder, path)), { recursive: true });
    writeFileSync(join(folder, path), text);
  }
  return checkImports(folder);
}

describe('the import rule', () => {
  test('passes a repository whose rooms import only what comes before them', async () => {
    expect(await check({})).toEqual({ seen: Object.keys(SOUND).length, faults: [] });
  });

  test('lets engine/sketch import valibot', async () => {
    const { faults } = await check({
      ...installed('valibot'),
      'engine/sketch/parse.ts': "export { x } from 'valibot';",
    });
    expect(faults).toEqual([]);
  });

  test('fails when it saw no module at all', async () => {
    const { seen, faults } = await check({}, {});
    expect(seen).toBe(0);
    expect(faults).toEqual(['engine: no module was seen', 'app: no module was seen']);
  });

  test.each([
    {
      breach: 'the engine imports the app',
      changes: { 'engine/train/extra.ts': "export { frame } from '../../app/live/frame.ts';" },
      rule: 'the engine imports nothing of the app, the tests or public',
    },
    {
      breach: 'the app goes round the door of the engine',
      changes: { 'app/ui/extra.ts': "export type { Sketch } from '../../engine/sketch/types.ts';" },
      rule: 'the app knows the engine by its door only',
    },
    {
      breach: 'an earlier room of the engine imports a later one for a type only',
      changes: {
        'engine/train/late.ts': 'export type Late = 1;',
        'engine/sketch/extra.ts': "import type { Late } from '../train/late.ts';\nexport type Extra = Late;",
      },
      rule: 'engine/sketch/ imports only what comes before it',
    },
    {
      breach: 'neighbours on one line import each other',
      changes: { 'app/ui/extra.ts': "export { store } from '../store/sketchStore.ts';" },
      rule: 'app/ui/ imports only what comes before it',
    },
    {
      breach: 'an earlier room of the app imports a later one',
      changes: {
        'app/store/extra.ts': "import type { App } from '../App.tsx';\nexport type Extra = typeof App;",
      },
      rule: 'app/store/ imports only what comes before it',
    },
    {
      breach: 'two modules of one room import each other for types only',
      changes: {
        'engine/train/a.ts': "import type { B } from './b.ts';\nexport type A = B | 1;",
        'engine/train/b.ts': "import type { A } from './a.ts';\nexport type B = A | 2;",
      },
      rule: 'no circles',
    },
    {
      breach: 'the engine imports a module of Node',
      changes: {
        'engine/train/extra.ts': "import { readFileSync } from 'node:fs';\nexport const read = readFileSync;",
      },
      rule: 'the engine imports nothing of Node',
    },
    {
      breach: 'engine/sketch imports another package than valibot',
      changes: { ...installed('zustand'), 'engine/sketch/extra.ts': "export { x } from 'zustand';" },
      rule: 'engine/sketch imports no package but valibot',
    },
    {
      breach: 'the engine imports a package elsewhere',
      changes: { ...installed('valibot'), 'engine/train/extra.ts': "export { x } from 'valibot';" },
      rule: 'the engine imports no package',
    },
    {
      breach: 'an import leads nowhere',
      changes: { 'app/ui/extra.ts': "export { x } from './gone.ts';" },
      rule: 'every import resolves',
    },
    {
      breach: 'a module stands outside every room and imports',
      changes: {
        'engine/extra.ts': "import type { Outcome } from './outcome.ts';\nexport type Extra = Outcome;",
      },
      rule: 'every module of engine stands in a known room',
    },
    {
      breach: 'a module stands outside every room, alone',
      changes: { 'app/extra/extra.ts': 'export const extra = 1;' },
      rule: 'every module of app stands in a known room',
    },
  ])('fails when $breach', async ({ changes, rule }) => {
    const { faults } = await check(changes);
    expect(faults).toContainEqual(expect.stringContaining(`: ${rule}`));
  });
});
