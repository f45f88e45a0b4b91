import { readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { analyse } from '../../engine/paraxial/analyse.ts';
import { unbuildable, warningsOf } from '../../engine/paraxial/warnings.ts';
import { writeSketch } from '../../engine/sketch/file.ts';
import { parseSketch } from '../../engine/sketch/parse.ts';
import type { Part, PerPosition, Position, Sketch } from '../../engine/sketch/types.ts';
import { settingAt } from '../../engine/sketch/values.ts';
import { STARTING_SKETCHES } from './startingSketches.ts';

/** The images were placed by closed forms in double precision; rounding along a handful of parts stays far below this (mm). */
const ON_SENSOR_MM = 1e-9;

const folder = new URL('../../public/sketches/', import.meta.url);
const pathOf = (file: string): string => new URL(file, folder).pathname;

const listText = `${JSON.stringify(
  STARTING_SKETCHES.map(({ file, sketch, summary }) => ({ file, title: sketch.title, summary })),
  null,
  2,
)}\n`;

describe('the starting sketches', () => {
  it('are listed with their titles and a line about each', async () => {
    await expect(listText).toMatchFileSnapshot(pathOf('index.json'));
  });

  it('have no file that the list does not name', () => {
    const files = readdirSync(folder).sort();
    expect(files).toEqual(['index.json', ...STARTING_SKETCHES.map(({ file }) => file)].sort());
  });

  it('are for inspection, relaying, a long back focus, a beam, close distances and the eye', () => {
    expect(STARTING_SKETCHES.length).toBeGreaterThanOrEqual(5);
  });
});

describe.each(STARTING_SKETCHES)('the starting sketch $file', ({ file, sketch }) => {
  const analyses = sketch.positions.map(({ id }) => analyse(sketch, settingAt(id)));

  it('is on file as it is written here', async () => {
    await expect(writeSketch(sketch)).toMatchFileSnapshot(pathOf(file));
  });

  it('opens without faults, to the last digit', () => {
    expect(parseSketch(writeSketch(sketch))).toEqual({ ok: true, sketch });
  });

  it('can be built, and nothing asks for a second look', () => {
    expect(unbuildable(sketch)).toEqual([]);
    expect(sketch.positions.flatMap(({ id }) => warningsOf(sketch, settingAt(id)))).toEqual([]);
  });

  it('has a focal length, or says that it is afocal', () => {
    for (const { firstOrder } of analyses) {
      if (firstOrder.afocal) expect(firstOrder.focalLengthMm).toEqual({ ok: false, why: 'afocal' });
      else expect(firstOrder.focalLengthMm.ok).toBe(true);
    }
  });

  it('has a marginal and a chief ray at every position', () => {
    for (const { rays } of analyses) expect([rays.marginal.ok, rays.chief.ok]).toEqual([true, true]);
  });

  it('has its image on the sensor wherever the sensor is fixed', () => {
    if (sketch.image !== 'fixed') return;
    for (const [k, position] of sketch.positions.entries()) {
      expect(analyses[k]?.conjugates.defocusMm).toMatchObject({ ok: true });
      expect(Math.abs(imageBehindSensor(sketch, position))).toBeLessThan(ON_SENSOR_MM);
    }
  });

  it('draws every bundle to the edge of its field without losing all of its light', () => {
    for (const { vignetting } of analyses)
      for (const { areaShare } of vignetting.ok ? vignetting.value : [])
        expect(areaShare).toBeGreaterThan(0.9);
  });
});

/** How far the image falls behind the sensor: the imaging equation of every part in turn, 1/s′ = 1/s + 1/f. */
function imageBehindSensor(sketch: Sketch, position: Position): number {
  const at = (value: PerPosition): number =>
    typeof value === 'number' ? value : (value[position.id] ?? Number.NaN);
  const distance = sketch.object.distanceMm;
  let imageMm = typeof distance === 'number' ? -distance : Number.NEGATIVE_INFINITY;
  for (const part of sketch.parts) {
    imageMm = imageBehind(part, imageMm) - at(part.space.lengthMm);
  }
  return imageMm;
}

function imageBehind(part: Part, objectMm: number): number {
  if (part.kind === 'thin') return 1 / (1 / objectMm + 1 / part.focalLengthMm);
  return part.kind === 'plate' ? objectMm - part.thicknessMm / part.material.index : objectMm;
}
