import { describe, expect, it } from 'vitest';
import { paraxialRay } from '../../engine/paraxial/trace.ts';
import { faultsOf } from '../../engine/sketch/rules.ts';
import type { Sketch } from '../../engine/sketch/types.ts';
import { settingAt } from '../../engine/sketch/values.ts';
import { trainOf } from '../../engine/train/train.ts';
import { bareRays, traceBareRays } from './bareRays.ts';
import { type BenchRow, rowsJson, rowsTable } from './bench.ts';
import { benchSketch } from './benchSketch.ts';
import { analyseAll, liveUpdate } from './liveUpdate.ts';

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

  it('drags one part to and fro, and hands every frame its sketch and analysis', () => {
    const pressed = benchSketch(12, 6);
    const seen: Sketch[] = [];
    const move = liveUpdate(pressed, [
      (sketch, setting, analysis) => {
        seen.push(sketch);
        expect(setting).toEqual(settingAt(pressed.positions[0]?.id ?? setting.at));
        expect(analysis.train.gap).toEqual(trainOf(sketch, setting).gap);
        return 1;
      },
    ]);
    const sums = [move(), move(), move(), move(), move()];
    expect(new Set(sums).size).toBe(5);
    expect(new Set(seen).size).toBe(5);
    expect(seen).not.toContain(pressed);
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
