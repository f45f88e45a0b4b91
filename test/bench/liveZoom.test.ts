import { describe, expect, it, vi } from 'vitest';
import { roughMeasure } from '../../app/board/measure.ts';
import type { Train } from '../../engine/index.ts';
import { faultsOf } from '../../engine/sketch/rules.ts';
import { readingOf } from '../app/reading.ts';
import { allPlots, liveZoom, UPDATE_RAYS, zoomRays } from './liveZoom.ts';
import { zoomSketch } from './zoomSketch.ts';

const counted = vi.hoisted(() => ({ through: 0, toStop: 0 }));

vi.mock(import('../../engine/exact/kernel.ts'), async (original) => {
  const { traceBatch } = await original();
  return {
    traceBatch: (
      train: Train,
      rays: Float64Array,
      count: number,
      clip = false,
      from = 0,
      to = train.count,
    ) => {
      counted[to === train.count ? 'through' : 'toStop'] += count;
      traceBatch(train, rays, count, clip, from, to);
    },
  };
});

/** Steps of an aim may differ from machine to machine, and a little when aiming is made better. */
const FEW_MORE = 0.05;

const count = (task: () => unknown): typeof counted => {
  Object.assign(counted, { through: 0, toStop: 0 });
  task();
  return { ...counted };
};

describe('the bench of a real zoom', () => {
  it('is one of 14 elements, 28 surfaces, five fields and three lines, and sound', () => {
    const sketch = zoomSketch();
    expect(faultsOf(sketch)).toEqual([]);
    const { setup } = readingOf(sketch).exact;
    if (!setup.ok) throw new Error(setup.why);
    expect([sketch.parts.length, setup.value.lines[0].train.count]).toEqual([14, 28]);
    expect([sketch.field.fractions.length, setup.value.lines.length]).toEqual([5, 3]);
  });

  it('lets every ray through, with fans of 21 rays and spots of about 200', () => {
    const plots = allPlots(readingOf(zoomSketch()));
    expect(plots.filter(({ kind }) => kind === 'empty')).toEqual([]);
    for (const plot of plots) {
      if (plot.key.includes('fan') && plot.kind === 'curves')
        for (const { x } of plot.curves) expect(x).toHaveLength(21);
      if (plot.kind === 'spots')
        for (const { share } of plot.spots[0]?.dots ?? []) expect(share).toHaveLength(217);
    }
  });

  it('is compared with as many rays as it traces, those counted that only aim', () => {
    const traced = count(liveZoom(zoomSketch(), roughMeasure));
    for (const way of ['through', 'toStop'] as const)
      expect(Math.abs(traced[way] / UPDATE_RAYS[way] - 1), way).toBeLessThan(FEW_MORE);
    const bare = zoomRays(zoomSketch());
    expect(count(bare)).toEqual(UPDATE_RAYS);
    expect(bare()).not.toBeNaN();
  });
});
