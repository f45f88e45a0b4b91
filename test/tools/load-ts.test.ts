import { resolve } from 'node:path';
import { expect, test } from 'vitest';
import { loadTs } from './load-ts.mjs';

test('a script gets the exports of a TypeScript module and of all it imports', async () => {
  const { some } = await loadTs<typeof import('../../engine/outcome.ts')>(
    resolve(import.meta.dirname, '../../engine/outcome.ts'),
  );
  expect(some(41.2)).toEqual({ ok: true, value: 41.2 });
});
