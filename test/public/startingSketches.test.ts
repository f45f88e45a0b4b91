import { readdirSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { exactSetupOf } from '../../engine/exact/analyse.ts';
import { sampleOf, traceFields } from '../../engine/exact/bundles.ts';
import { hexapolarGrid } from '../../engine/exact/grids.ts';
import { landingsOf } from '../../engine/exact/landing.ts';
import { spotSize } from '../../engine/exact/spots.ts';
import { indexOf } from '../../engine/media/medium.ts';
import { type Analysis, analyse } from '../../engine/paraxial/analyse.ts';
import { unbuildable, warningsOf } from '../../engine/paraxial/warnings.ts';
import { cautionOf } from '../../engine/sheet/notes.ts';
import { writeSketch } from '../../engine/sketch/file.ts';
import { parseSketch } from '../../engine/sketch/parse.ts';
import type { GlassPart, Part, PerPosition, Position, Sketch } from '../../engine/sketch/types.ts';
import { settingAt } from '../../engine/sketch/values.ts';
import { given } from '../engine/quantity.ts';
import { STARTING_SKETCHES } from './startingSketches.ts';

/** The images were placed by closed forms in double precision; rounding along a handful of parts stays far below this (mm). */
const ON_SENSOR_MM = 1e-9;

/** Decimals that rounding along a handful of parts leaves alone. */
const ROUNDING_DIGITS = 12;

const folder = new URL('../../public/sketches/', import.meta.url);
const pathOf = (file: string): string => fileURLToPath(new URL(file, folder));

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
});

describe('what each starting sketch is there to show', () => {
  it('the inspection zoom reaches its three magnifications and focal lengths at f/5.6', () => {
    const shown = analysesOf('inspection-zoom.json').map(({ conjugates, firstOrder, light }) => [
      given(conjugates.magnification).toFixed(5),
      given(firstOrder.focalLengthMm).toFixed(4),
      given(light.workingFNumber).toFixed(3),
    ]);
    expect(shown).toEqual([
      ['-0.05000', '25.7481', '5.600'],
      ['-0.08000', '41.1975', '5.600'],
      ['-0.12000', '61.2888', '5.600'],
    ]);
  });

  it('the relay is telecentric on both sides and 60 mm over 100 mm in size', () => {
    const [relay] = analysesOf('sorting-chute-relay.json');
    expect([relay?.pupils.entrance.zMm, relay?.pupils.exit.zMm]).toEqual([
      { ok: false, why: 'pupil at infinity' },
      { ok: false, why: 'pupil at infinity' },
    ]);
    expect(given(relay?.conjugates.magnification)).toBeCloseTo(-0.6, ROUNDING_DIGITS);
  });

  it('the relay in glass has the magnification of the thin one, and spots of a few micrometres', () => {
    const sketch = sketchIn('chute-relay-in-glass.json');
    const [relay] = analysesOf('chute-relay-in-glass.json');
    expect(given(relay?.conjugates.magnification)).toBeCloseTo(-0.6, ROUNDING_DIGITS);
    const setup = given(exactSetupOf(sketch, settingAt(sketch.positions[0]!.id), relay!));
    const sample = sampleOf(0, hexapolarGrid(6), { fine: true });
    for (const field of traceFields(setup, [0, 0.7, 1], sample)) {
      const { rmsMm } = given(spotSize(given(landingsOf(field))));
      expect(rmsMm).toBeLessThan(0.008);
    }
  });

  it('the colour check camera leaves more back focus than its focal length and clears its mount', () => {
    const [camera] = analysesOf('colour-check-camera.json');
    expect(given(camera?.firstOrder.backFocusMm)).toBeGreaterThan(given(camera?.firstOrder.focalLengthMm));
    expect(given(camera?.sensor.mountClearanceMm)).toBeGreaterThan(0);
  });

  it('the expander makes a beam four times wider, and carries the caution', () => {
    const [expander] = analysesOf('chute-scanner-expander.json');
    expect(given(expander?.firstOrder.angularMagnification)).toBeCloseTo(0.25, ROUNDING_DIGITS);
    expect(cautionOf(sketchIn('chute-scanner-expander.json'))).toContain('IEC 60825-1');
  });

  it('the macro gives half size and life size through its window', () => {
    const sizes = analysesOf('germination-macro.json').map(({ conjugates }) =>
      given(conjugates.magnification),
    );
    expect(sizes[0]).toBeCloseTo(-0.5, ROUNDING_DIGITS);
    expect(sizes[1]).toBeCloseTo(-1, ROUNDING_DIGITS);
  });

  it('the loupe puts the image at infinity for the eye', () => {
    const [loupe] = analysesOf('sorters-loupe.json');
    expect(loupe?.conjugates.imageDistanceMm).toEqual({ ok: false, why: 'image at infinity' });
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

function sketchIn(file: string): Sketch {
  const found = STARTING_SKETCHES.find((starting) => starting.file === file);
  if (found === undefined) throw new Error(`no starting sketch ${file}`);
  return found.sketch;
}

function analysesOf(file: string): readonly Analysis[] {
  const sketch = sketchIn(file);
  return sketch.positions.map(({ id }) => analyse(sketch, settingAt(id)));
}

/** How far the image falls behind the sensor: the imaging equation of every part in turn, 1/s′ = 1/s + 1/f. */
function imageBehindSensor(sketch: Sketch, position: Position): number {
  const at = (value: PerPosition): number =>
    typeof value === 'number' ? value : (value[position.id] ?? Number.NaN);
  const distance = sketch.object.distanceMm;
  let imageMm = typeof distance === 'number' ? -distance : Number.NEGATIVE_INFINITY;
  for (const part of sketch.parts) {
    imageMm = imageBehind(sketch, part, imageMm) - at(part.space.lengthMm);
  }
  return imageMm;
}

function imageBehind(sketch: Sketch, part: Part, objectMm: number): number {
  if (part.kind === 'glass') return imageBehindGlass(sketch, part, objectMm);
  if (part.kind === 'thin') return 1 / (1 / objectMm + 1 / part.focalLengthMm);
  return part.kind === 'plate' && 'index' in part.material
    ? objectMm - part.thicknessMm / part.material.index
    : objectMm;
}

/** Surface by surface: n′/s′ = n/s + (n′ − n)/R. */
function imageBehindGlass(
  { lines, air }: Sketch,
  { surfaces, fillings }: GlassPart,
  objectMm: number,
): number {
  let index = 1;
  let imageMm = objectMm;
  for (const [k, { radiusMm }] of surfaces.entries()) {
    const filling = fillings[k];
    const behind = filling ? given(indexOf(filling.material, lines.mainNm, lines, air)) : 1;
    imageMm = behind / (index / imageMm + (radiusMm === null ? 0 : (behind - index) / radiusMm));
    imageMm -= filling?.thicknessMm ?? 0;
    index = behind;
  }
  return imageMm;
}
