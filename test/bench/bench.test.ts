import { describe, expect, it } from 'vitest';
import { roughMeasure } from '../../app/board/measure.ts';
import { paraxialRay } from '../../engine/paraxial/trace.ts';
import { faultsOf } from '../../engine/sketch/rules.ts';
import { settingAt } from '../../engine/sketch/values.ts';
import { trainOf } from '../../engine/train/train.ts';
import { analyseAll } from './analyseAll.ts';
import { bareRays, traceBareRays } from './bareRays.ts';
import { rowsJson, rowsTable } from './bench.ts';
import { benchSketch } from './benchSketch.ts';
import { liveFrames, liveUpdate } from './liveUpdate.ts';
import { ratioOf } from './measure.ts';
import type { BenchRow } from './row.ts';

describe('the bench', () => {
  it('measures on a sound sketch of the size asked for, the same at every call', () => {
    const sketch = benchSketch(12, 6);
    expect([sketch.parts.length, sketch.positions.length]).toEqual([12, 6]);
    expect(faultsOf(sketch)).toEqual([]);
    expect(benchSketch(12, 6)).toEqual(sketch);
  });

  it('takes as its yardstick the arithmetic that the engine does: the same heights and slopes', () => {
    const sketch = benchSketch(12, 2);
    const trains = sketch.positions.map(({ id }) => trainOf(sketch, settingAt(id)));
    const bare = bareRays(trains, 3);
    traceBareRays(bare);
    for (let ray = 0; ray < 6; ray++) {
      const train = trains[Math.floor(ray / 3)];
      if (train === undefined) throw new Error('a train is missing');
      const traced = paraxialRay(train, bare.start[2 * ray]!, bare.start[2 * ray + 1]!);
      expect([...bare.heights.subarray(12 * ray, 12 * ray + 12)]).toEqual([...traced.y]);
      expect([...bare.slopes.subarray(12 * ray, 12 * ray + 12)]).toEqual([...traced.nu.subarray(1)]);
    }
  });

  it('drags one part to and fro as the app does, each time to another place', () => {
    const pressed = benchSketch(12, 6);
    const next = liveFrames(pressed, roughMeasure);
    const frames = Array.from({ length: 5 }, next);
    const gaps = frames.map(({ reading }) => reading.analysis.train.gap.join());
    expect(new Set(gaps).size).toBe(5);
    for (const { reading, picture } of frames) {
      expect(reading.sketch.parts.map(({ id }) => id)).toEqual(pressed.parts.map(({ id }) => id));
      expect(reading.sketch).not.toBe(pressed);
      expect(picture.scene.parts).toHaveLength(12);
      expect(picture.plan.cells).toHaveLength(13);
      expect(picture.labels.length).toBeGreaterThan(12);
      expect(picture.handles.length).toBeGreaterThan(30);
    }
  });

  it('reads every text of the panels at each move', () => {
    const next = liveFrames(benchSketch(12, 6), roughMeasure);
    const [one, other] = [next().texts, next().texts];
    expect(one.length).toBeGreaterThan(40);
    expect(one.filter((text) => /NaN|undefined/.test(text) || text === '')).toEqual([]);
    expect(one.filter((text, i) => text !== other[i]).length).toBeGreaterThan(10);
  });

  it('has a result that depends on every move', () => {
    const move = liveUpdate(benchSketch(12, 6), roughMeasure);
    const sums = [move(), move(), move(), move(), move()];
    expect(new Set(sums).size).toBe(5);
    expect(sums.every(Number.isFinite)).toBe(true);
  });

  it('compares samples that were taken next to each other', () => {
    const timing = (...samplesMs: readonly number[]) => ({ minMs: 0, medianMs: 0, samplesMs });
    expect(ratioOf(timing(2, 20, 2), timing(1, 10, 1))).toBe(2);
    expect(ratioOf(timing(2, 2, 90), timing(1, 1, 1))).toBe(2);
  });

  it('has a result that depends on the analysis of every position', () => {
    const sketch = benchSketch(4, 3);
    const one = analyseAll({ ...sketch, positions: sketch.positions.slice(0, 1) })();
    expect(analyseAll(sketch)()).not.toBe(one);
  });

  it('prints name, median, unit and ratio as JSON, and a line for each row to read', () => {
    const row: BenchRow = { name: 'a', min: 1.5, median: 2.5, unit: 'µs', ratio: 3.25, against: 'b' };
    expect(JSON.parse(rowsJson([row]))).toEqual([{ name: 'a', median: 2.5, unit: 'µs', ratio: 3.25 }]);
    expect(rowsTable([row]).split('\n')[1]).toMatch(/^a +1\.50 +2\.50 +µs +3\.25 +b$/);
  });
});
