import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { analyse } from '../../../engine/paraxial/analyse.ts';
import { cautionOf } from '../../../engine/sheet/notes.ts';
import { spacingTable } from '../../../engine/sheet/spacingTable.ts';
import type { Block, Cell, SheetOptions, SpacingTable } from '../../../engine/sheet/table.ts';
import { cellText, DEFAULT_SHEET_OPTIONS, headingOf } from '../../../engine/sheet/table.ts';
import { emptySketch, newGlass, newPlate, newSurface, newThin } from '../../../engine/sketch/create.ts';
import type { GlassPart, PartId, Sketch } from '../../../engine/sketch/types.ts';
import { settingAt } from '../../../engine/sketch/values.ts';
import { inspectionZoom, MIDDLE } from '../demo.ts';
import { given } from '../quantity.ts';
import { anyLayout } from './anyLayout.ts';

/** Tables are whole analyses: enough of them to meet every datum, unit and kind of part many times over. */
const RUNS = 50;

describe('the spacing table of the inspection zoom', () => {
  const table = tableOf(inspectionZoom());

  // Focal lengths and stop diameters as the brief of the zoom gives them, to the digits that are printed.
  it('prints the focal lengths, magnifications, f-numbers and stop diameters of the three positions', () => {
    expect(columnTexts(table.positions, 'focalLength')).toEqual(['25.748', '41.198', '61.289']);
    expect(columnTexts(table.positions, 'magnification')).toEqual(['-0.05000', '-0.08000', '-0.12000']);
    expect(columnTexts(table.positions, 'workingFNumber')).toEqual(['5.600', '5.600', '5.600']);
    expect(columnTexts(table.positions, 'stopDiameter')).toEqual(['10.583', '13.383', '16.394']);
  });

  it('counts every element and the sensor from the first group', () => {
    expect(columnTexts(table.positions, 'distance:p1')).toEqual(['0.000', '0.000', '0.000']);
    expect(columnTexts(table.positions, 'distance:p2')).toEqual(['41.219', '26.272', '15.944']);
    expect(columnTexts(table.positions, 'distance:p4')).toEqual(['84.000', '84.000', '84.000']);
    expect(columnTexts(table.positions, 'distance:image')).toEqual(['110.000', '110.000', '110.000']);
  });

  it('takes gaps as differences of the printed distances: 26.1245 beside 57.876 and 84 becomes 26.124', () => {
    expect(columnTexts(table.positions, 'gap:p3')).toEqual(['26.269', '32.413', '26.124']);
  });

  it('says that its gaps run from principal plane to principal plane', () => {
    const titles = table.positions.columns.map(({ title }) => title);
    expect(titles).toContain('First group to second group (principal plane to principal plane)');
    expect(table.notes.join(' ')).toContain('from principal plane to principal plane');
  });

  it('gives every element one clear diameter, the largest of the positions, and names the position', () => {
    const wanted = ['wide', 'middle', 'narrow'].map((id) => {
      const { clear } = analyse(inspectionZoom(), settingAt(id as typeof MIDDLE));
      return 2 * given(clear[3]?.neededMm);
    });
    expect(columnTexts(table.elements, 'clearNeeded')[3]).toBe(Math.max(...wanted).toFixed(3));
    expect(columnTexts(table.elements, 'neededAt')[3]).toBe('middle');
    expect(columnTexts(table.elements, 'clearGiven')).toEqual(['open', 'open', 'open', 'open']);
  });

  it('prints the clear diameter given, twice the semi-diameter', () => {
    const parts = inspectionZoom().parts.map((part, k) =>
      k === 3 ? { ...part, semiDiameterMm: 8.25 } : part,
    );
    const given = columnTexts(tableOf({ ...inspectionZoom(), parts }).elements, 'clearGiven');
    expect(given).toEqual(['open', 'open', 'open', '16.500']);
  });

  it('tells where the stop is when it rides on an element', () => {
    expect(table.notes).toContain('The stop rides on second group, in front of its refraction.');
  });

  it('counts from the sensor or from the mount plane when asked', () => {
    const fromSensor = tableOf(inspectionZoom(), { datum: 'sensor' });
    expect(columnTexts(fromSensor.positions, 'distance:p4')).toEqual(['-26.000', '-26.000', '-26.000']);
    expect(columnTexts(fromSensor.positions, 'distance:image')).toEqual(['0.000', '0.000', '0.000']);
    const fromMount = tableOf({ ...inspectionZoom(), registerMm: 17.526 }, { datum: 'mount' });
    expect(columnTexts(fromMount.positions, 'distance:p4')).toEqual(['-8.474', '-8.474', '-8.474']);
    expect(columnTexts(fromMount.positions, 'distance:image')).toEqual(['17.526', '17.526', '17.526']);
  });

  it('prints inches with two digits more', () => {
    const inches = tableOf(inspectionZoom(), { unit: 'in' });
    expect(columnTexts(inches.positions, 'gap:p4')).toEqual(['1.02362', '1.02362', '1.02362']);
    expect(inches.positions.columns.map(headingOf).join()).toContain(
      'Fourth group to sensor (from principal plane) (in)',
    );
  });
});

describe('what rounding does to the image', () => {
  it('is printed as zero where every length is a whole number of steps', () => {
    const table = tableOf(simple({ image: 'fixed' }));
    expect(columnTexts(table.positions, 'imageMiss')).toEqual(['0.00']);
  });

  it('is what the imaging equation gives for the printed numbers', () => {
    for (const digits of [0, 1, 2, 3]) {
      const sketch = inspectionZoom();
      const table = tableOf(sketch, { digits });
      for (const row of table.positions.rows) {
        const read = (id: string): number => numberIn(table.positions, row.cells, id);
        let imageMm = -read('object');
        for (const part of sketch.parts) {
          if (part.kind !== 'thin') continue;
          imageMm = 1 / (1 / imageMm + 1 / part.focalLengthMm) - read(`gap:${part.id}`);
        }
        expect(Math.abs(read('imageMiss') - 1000 * imageMm)).toBeLessThan(PRINTED_MISS_UM);
      }
    }
  });

  it('leaves out the defocus that was there before, which has a column of its own', () => {
    const table = tableOf(simple({ image: 'fixed', lastMm: 48.5 }));
    expect(columnTexts(table.positions, 'defocus')).toEqual(['1500.00']);
    expect(columnTexts(table.positions, 'imageMiss')).toEqual(['0.00']);
  });

  it('is at most half a step when the image follows the focus and nothing else is rounded', () => {
    const table = tableOf(simple({ image: 'focus', objectMm: 217 }));
    expect(
      Math.abs(numberIn(table.positions, table.positions.rows[0]?.cells ?? [], 'imageMiss')),
    ).toBeLessThanOrEqual(0.5);
  });
});

describe('glass in the table', () => {
  const cemented: GlassPart = {
    ...newGlass(-50, 4, 'p2' as PartId),
    name: 'rear lens',
    semiDiameterMm: 10,
    surfaces: [newSurface(-50), newSurface(null), newSurface(40)],
    fillings: [
      { thicknessMm: 2.0004, material: { name: 'n 1.5', index: 1.5, abbeNumber: null } },
      { thicknessMm: 3.0004, material: { name: 'n 1.6', index: 1.6, abbeNumber: null } },
    ],
    space: { lengthMm: 30, medium: 'air' },
  };
  const table = tableOf({
    ...emptySketch(),
    parts: [{ ...newThin(50), space: { lengthMm: 10, medium: 'air' } }, cemented],
  });

  it('has its own focal length, and the sum of its rounded thicknesses', () => {
    // By hand, 1/f of three thin-lens powers with the two reduced thicknesses: φ1 = 0.5/−50, φ2 = 0, φ3 = −0.6/40.
    const [first, last] = [0.5 / -50, -0.6 / 40];
    const reduced = 2.0004 / 1.5 + 3.0004 / 1.6;
    const focalLength = 1 / (first + last - first * last * reduced);
    expect(columnTexts(table.elements, 'focalLength')).toEqual(['50.000', focalLength.toFixed(3)]);
    expect(columnTexts(table.elements, 'thickness')).toEqual(['thin element', '5.000']);
    expect(columnTexts(table.elements, 'clearGiven')).toEqual(['open', '20.000']);
  });

  it('leaves the gap less what its rim takes as the clear gap', () => {
    // Sag of a radius of 50 mm at 10 mm from the axis: 50 − √(50² − 10²).
    const sag = 50 - Math.sqrt(50 ** 2 - 10 ** 2);
    expect(columnTexts(table.positions, 'clear:p1')).toEqual([(10 - Number(sag.toFixed(3))).toFixed(3)]);
    expect(table.notes.some((note) => note.startsWith('A clear gap is the gap less'))).toBe(true);
  });
});

describe('a plate in the table', () => {
  it('keeps its rounded thickness at every position, and the printed numbers still add up', () => {
    const sketch = simple({ image: 'fixed' });
    const plate = {
      ...newPlate(1.2346, 'p9' as PartId),
      space: { lengthMm: 5.4999, medium: 'air' } as const,
    };
    const table = tableOf({ ...sketch, parts: [...sketch.parts, plate] });
    expect(columnTexts(table.elements, 'thickness')).toEqual(['thin element', '1.235']);
    const [front, gap, sensor] = ['distance:p9', 'gap:p9', 'distance:image'].map((id) =>
      numberIn(table.positions, table.positions.rows[0]?.cells ?? [], id),
    );
    expect(((front ?? 0) + 1.235 + (gap ?? 0)).toFixed(3)).toBe(sensor?.toFixed(3));
  });
});

describe('reserved room', () => {
  it('adds a column with the gap that is left', () => {
    const parts = inspectionZoom().parts.map((part, k) =>
      part.kind === 'thin' && k === 1 ? { ...part, roomFrontMm: 2.5, roomBehindMm: 3 } : part,
    );
    const table = tableOf({ ...inspectionZoom(), parts });
    expect(columnTexts(table.positions, 'clear:p1')).toEqual(['38.719', '23.772', '13.444']);
    expect(columnTexts(table.positions, 'clear:p2')).toEqual(['13.512', '22.315', '38.932']);
    expect(find(table.positions, 'clear:p3')).toBeUndefined();
    expect(columnTexts(table.elements, 'roomBehind')).toEqual(['0.000', '3.000', '0.000', '0.000']);
  });
});

describe('numbers that do not exist', () => {
  it('give their reason in the table', () => {
    const table = tableOf(beamExpander());
    expect(columnTexts(table.positions, 'object')).toEqual(['object at infinity']);
    expect(columnTexts(table.positions, 'focalLength')).toEqual(['afocal']);
    expect(columnTexts(table.positions, 'gap:p2')).toEqual(['image at infinity']);
    expect(columnTexts(table.positions, 'imageMiss')).toEqual(['image at infinity']);
    expect(columnTexts(table.positions, 'angularMagnification')).toEqual(['0.25000']);
  });
});

describe('a table is refused', () => {
  it('for every gap that cannot be built, at whatever position', () => {
    const demo = inspectionZoom();
    const parts = demo.parts.map((part, k) =>
      k === 0 || k === 2
        ? { ...part, space: { ...part.space, lengthMm: { ...Object(part.space.lengthMm), [MIDDLE]: -1 } } }
        : part,
    );
    const spacing = spacingTable({ ...demo, parts }, DEFAULT_SHEET_OPTIONS);
    expect(spacing).toMatchObject({ ok: false, why: 'cannot be built' });
    const refusals = spacing.ok ? [] : spacing.refusals;
    expect(refusals.map(({ partId, positionId }) => [partId, positionId])).toEqual([
      ['p1', MIDDLE],
      ['p3', MIDDLE],
    ]);
    for (const { sentence } of refusals) expect(sentence).toMatch(/1\.000 mm/);
  });

  it('with every reason at once: a gap that cannot be built and a datum that is not there', () => {
    const space = { lengthMm: -75, medium: 'air' } as const;
    const reversed: Sketch = {
      ...beamExpander(),
      parts: [{ ...newThin(25), space }, newThin(-100, 'p2' as PartId)],
    };
    expect(refusalTexts(reversed, { datum: 'sensor' })).toEqual([
      expect.stringMatching(/75\.000 mm/),
      expect.stringMatching(/image at infinity/),
    ]);
  });

  it('when there are no parts', () => {
    expect(refusalTexts(emptySketch(), {})).toEqual(['The sketch has no parts: there is nothing to space.']);
  });

  it('when it should count from a mount plane that is not given', () => {
    expect(refusalTexts(inspectionZoom(), { datum: 'mount' })).toEqual([
      'There is no mount plane to count from: give a register distance or choose another datum.',
    ]);
  });

  it('when it should count from an image at infinity', () => {
    expect(refusalTexts(beamExpander(), { datum: 'sensor' })).toEqual([
      'There is no image plane to count from (image at infinity): choose the first part as the datum.',
    ]);
  });
});

describe('the caution about collimated light', () => {
  it('stands first in the notes when the object is at infinity or the layout is afocal', () => {
    for (const sketch of [beamExpander(), { ...inspectionZoom(), object: beamExpander().object }]) {
      const [first] = tableOf(sketch).notes;
      expect(first).toBe(cautionOf(sketch));
      expect(first).toMatch(/laser.*IEC 60825-1.*local rules.*laser safety officer/);
    }
  });

  it('is absent from a layout for an object nearby', () => {
    expect(cautionOf(inspectionZoom())).toBeNull();
    expect(tableOf(inspectionZoom()).notes.join(' ')).not.toContain('laser');
  });
});

describe('any table', () => {
  const anyOptions = fc.record({
    datum: fc.constantFrom('first part' as const, 'sensor' as const, 'mount' as const),
    digits: fc.integer({ min: 0, max: 6 }),
    unit: fc.constantFrom('mm' as const, 'in' as const),
  });

  it('adds up exactly: distance, thickness and gap give the next distance, in steps of the last digit', () => {
    fc.assert(
      fc.property(anyLayout(), anyOptions, (sketch, options) => {
        const spacing = spacingTable(sketch, options);
        if (!spacing.ok) return;
        const { positions, elements } = spacing.value;
        const steps = (block: Block<string>, cells: readonly Cell[], id: string): bigint | null => {
          const cell = cellIn(block, cells, id);
          return cell?.kind === 'number' ? BigInt(cellText(cell).replace('.', '')) : null;
        };
        for (const { cells } of positions.rows)
          for (const [k, part] of sketch.parts.entries()) {
            const next = sketch.parts[k + 1]?.id ?? 'image';
            const behind = steps(positions, cells, `distance:${next}`);
            if (behind === null) continue;
            const thickness = steps(elements, elements.rows[k]?.cells ?? [], 'thickness') ?? 0n;
            const front = steps(positions, cells, `distance:${part.id}`) ?? 0n;
            expect(front + thickness + (steps(positions, cells, `gap:${part.id}`) ?? 0n)).toBe(behind);
          }
      }),
      { numRuns: RUNS },
    );
  });

  it('has a row for each position, a row for each element, a cell for each column and no column twice', () => {
    fc.assert(
      fc.property(anyLayout(), anyOptions, (sketch, options) => {
        const spacing = spacingTable(sketch, options);
        if (!spacing.ok) return;
        const { positions, elements } = spacing.value;
        expect(positions.rows.map(({ id }) => id)).toEqual(sketch.positions.map(({ id }) => id));
        expect(elements.rows.map(({ id }) => id)).toEqual(sketch.parts.map(({ id }) => id));
        for (const { columns, rows } of [positions, elements] as const) {
          expect(new Set(columns.map(({ id }) => id)).size).toBe(columns.length);
          for (const { cells } of rows) {
            expect(cells).toHaveLength(columns.length);
            for (const cell of cells) if (cell.kind === 'number') expect(cell.value).not.toBeNaN();
          }
        }
      }),
      { numRuns: RUNS },
    );
  });
});

/** The miss is printed in steps of 0.01 µm; the equation adds its own rounding, far smaller. */
const PRINTED_MISS_UM = 0.00501;

function tableOf(sketch: Sketch, options: Partial<SheetOptions> = {}): SpacingTable {
  const spacing = spacingTable(sketch, { ...DEFAULT_SHEET_OPTIONS, ...options });
  if (!spacing.ok) throw new Error(spacing.refusals.map(({ sentence }) => sentence).join(' '));
  return spacing.value;
}

function refusalTexts(sketch: Sketch, options: Partial<SheetOptions>): readonly string[] {
  const spacing = spacingTable(sketch, { ...DEFAULT_SHEET_OPTIONS, ...options });
  return spacing.ok ? [] : spacing.refusals.map(({ sentence }) => sentence);
}

const find = (block: Block<string>, id: string) => block.columns.find((column) => column.id === id);

const cellIn = (block: Block<string>, cells: readonly Cell[], id: string): Cell | undefined =>
  cells[block.columns.findIndex((column) => column.id === id)];

function numberIn(block: Block<string>, cells: readonly Cell[], id: string): number {
  const cell = cellIn(block, cells, id);
  if (cell?.kind !== 'number') throw new Error(`no number in column ${id}`);
  return cell.value;
}

const columnTexts = (block: Block<string>, id: string): readonly string[] =>
  block.rows.map(({ cells }) => {
    const cell = cellIn(block, cells, id);
    return cell === undefined ? `no column ${id}` : cellText(cell);
  });

/** One lens of 40 mm; an object 200 mm away has its image 50 mm behind it. */
function simple({
  image,
  lastMm = 50,
  objectMm = 200,
}: {
  image: Sketch['image'];
  lastMm?: number;
  objectMm?: number;
}): Sketch {
  return {
    ...emptySketch(),
    object: { distanceMm: objectMm, medium: 'air' },
    parts: [{ ...newThin(40), space: { lengthMm: lastMm, medium: 'air' } }],
    image,
    stop: 'p1' as PartId,
  };
}

/** −25 mm and 100 mm, 75 mm apart: a beam four times wider. */
function beamExpander(): Sketch {
  return {
    ...emptySketch('Expander'),
    parts: [
      { ...newThin(-25, 'p1' as PartId), space: { lengthMm: 75, medium: 'air' } },
      { ...newThin(100, 'p2' as PartId) },
    ],
    stop: 'p1' as PartId,
    aperture: { kind: 'entrancePupilDiameter', diameterMm: 4 },
  };
}
