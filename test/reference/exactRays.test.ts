import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { hardshipsOf, runExactRays } from './exactRays.ts';

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

  it('are held to 1e-12 mm and 1e-13 of a cosine, but for one at the critical angle and one across the axis', () => {
    const { systems } = json as { systems: { rays: { id: string }[] }[] };
    const hard = systems.flatMap(({ rays }) =>
      rays.flatMap((ray) => {
        const { nearCritical, farFocus } = hardshipsOf(ray);
        return nearCritical === null && !farFocus ? [] : [{ id: ray.id, nearCritical, farFocus }];
      }),
    );
    expect(hard).toEqual([
      { id: 'ball-03', nearCritical: null, farFocus: true },
      { id: 'block-exit-03', nearCritical: 0, farFocus: true },
    ]);
  });

  it('would miss if a number were off', () => {
    const text = JSON.stringify(json).replace('-0.07233492489862552', '-0.07233492499862552');
    const missed = (runExactRays(JSON.parse(text)) ?? []).filter(({ outcome }) => outcome === 'failed');
    expect(missed.map(({ id }) => id)).toEqual(['biconvex-01']);
  });

  it('of no such file are none', () => {
    expect(runExactRays([])).toBeNull();
    expect(
      runExactRays({ systems: [7, {}, { rays: [{}, { id: 'odd', start: [0, 0] }] }] })?.map(
        ({ outcome }) => outcome,
      ),
    ).toEqual(['skipped', 'skipped']);
  });
});
