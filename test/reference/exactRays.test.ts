import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { runExactRays } from './exactRays.ts';

const FILE = fileURLToPath(new URL('./exact-rays.json', import.meta.url));
const json: unknown = JSON.parse(readFileSync(FILE, 'utf8'));

describe('the exact rays computed in forty digits', () => {
  const reports = runExactRays(json) ?? [];

  it('are met: points, directions, cosines and paths at every surface, failures at the right one for the right reason', () => {
    expect(reports.flatMap(({ id, misses }) => misses.map((miss) => ({ id, ...miss })))).toEqual([]);
  });

  it('are all compared', () => {
    expect(reports.filter(({ outcome }) => outcome === 'passed')).toHaveLength(61);
  });
});
