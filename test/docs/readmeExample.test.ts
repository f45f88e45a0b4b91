import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { CONJUGATE_READOUTS } from '../../app/panels/readouts/conjugates.ts';
import { LIGHT_READOUTS } from '../../app/panels/readouts/light.ts';
import { POWER_READOUTS } from '../../app/panels/readouts/power.ts';
import { PUPIL_READOUTS } from '../../app/panels/readouts/pupils.ts';
import { SENSOR_READOUTS } from '../../app/panels/readouts/sensor.ts';
import { formatNumber } from '../../app/ui/format.ts';
import type { PartId, PositionId, Quantity, Sketch } from '../../engine/index.ts';
import {
  analyse,
  compare,
  DEFAULT_SHEET_OPTIONS,
  exactSetupOf,
  fixSensor,
  insertPart,
  moveParts,
  newPlate,
  parseSketch,
  setGap,
  settingAt,
  sheetText,
  spacingTable,
  warningsOf,
} from '../../engine/index.ts';
import { given } from '../engine/quantity.ts';

const readme = readFileSync(fileURLToPath(new URL('../../README.md', import.meta.url)), 'utf8');
/** Line breaks are set by hand and mean nothing. */
const prose = readme.replaceAll(/\s+/g, ' ');

/** A sketch that comes with the tool, as the person who walks along has it. */
function starting(file: string): Sketch {
  const path = fileURLToPath(new URL(`../../public/sketches/${file}`, import.meta.url));
  const parsed = parseSketch(readFileSync(path, 'utf8'));
  if (!parsed.ok) throw new Error(parsed.faults.map(({ sentence }) => sentence).join(' '));
  return parsed.sketch;
}

describe('the sketch file printed in the README', () => {
  const example = /```json\n(.*?)```/s.exec(readme)?.[1] ?? '';

  it('opens without faults', () => {
    expect(parseSketch(example)).toMatchObject({ ok: true });
  });

  it('is in focus at both of its positions, with nothing to warn of', () => {
    const parsed = parseSketch(example);
    if (!parsed.ok) return expect.unreachable();
    expect(parsed.sketch.positions).toHaveLength(2);
    for (const { id } of parsed.sketch.positions) {
      expect(given(analyse(parsed.sketch, settingAt(id)).conjugates.defocusMm)).toBeCloseTo(0, 12);
      expect(warningsOf(parsed.sketch, settingAt(id))).toEqual([]);
    }
  });
});

describe('the figures of the walk in the README', () => {
  const demo = starting('inspection-zoom.json');
  const wide = demo.positions[0]?.id as PositionId;
  const second = 'p2' as PartId;
  const shown = (quantity: Quantity | undefined, digits = 3): string => formatNumber(given(quantity), digits);
  const at = (sketch: Sketch, position = wide) => {
    const { firstOrder, conjugates, pupils } = analyse(sketch, settingAt(position));
    return {
      f: shown(firstOrder.focalLengthMm),
      backFocus: shown(firstOrder.backFocusMm),
      m: shown(conjugates.magnification, 4),
      defocus: shown(conjugates.defocusMm),
      track: shown(conjugates.trackMm),
      stop: shown(pupils.stopDiameterMm),
    };
  };

  it('are those of the three positions', () => {
    for (const { id, name } of demo.positions) {
      const { f, backFocus, m, stop, defocus } = at(demo, id);
      expect(readme).toContain(`| ${name} | ${f} | ${backFocus} | ${m} | ${stop} |`);
      expect(defocus).toBe('0.000');
    }
  });

  it('are those of the second group moved to 42 mm', () => {
    const gap = demo.parts[0]?.space.lengthMm as Readonly<Record<PositionId, number>>;
    const moved = moveParts(demo, [second], 42 - (gap[wide] ?? Number.NaN), wide);
    const { f, backFocus, m, defocus } = at(moved);
    expect(prose).toContain(`f ${f}, back focus ${backFocus}, m ${m}, defocus ${defocus}, and one warning`);
    const sentences = warningsOf(moved, settingAt(wide)).map(({ sentence }) => sentence('mm'));
    expect(sentences).toEqual(['The image falls 0.755 mm behind the sensor; 0.019 mm is allowed.']);
    expect(prose).toContain('falls 0.755 mm behind the sensor where 0.019 mm is allowed');
  });

  it('are those of the gap behind the second group at 18 mm', () => {
    const { f, track, defocus } = at(setGap(demo, second, 18, wide, 'carry'));
    expect(prose).toContain(`track ${track}, f ${f}, defocus ${defocus}`);
  });

  it('are those of the cover glass and the sensor moved after it', () => {
    const glass = insertPart(demo, newPlate(1, 'p5' as PartId), 97, wide);
    const mended = fixSensor(glass, 12.342, wide);
    for (const { id } of demo.positions) {
      expect(prose).toContain(`defocus ${at(glass, id).defocus}, at every position`);
      const { defocus, track } = at(mended, id);
      expect(prose).toContain(`defocus ${defocus} at each, track ${track}, no warnings`);
      expect(warningsOf(mended, settingAt(id))).toEqual([]);
    }
    const spacing = spacingTable(mended, DEFAULT_SHEET_OPTIONS);
    if (!spacing.ok) return expect.unreachable();
    const row = sheetText(spacing.value, 'csv').split('\r\n')[1] ?? '';
    for (const figure of ['41.219', '57.731', '84.000', '110.342', '0.40']) {
      expect(row.split(',')).toContain(figure);
      expect(prose).toContain(figure);
    }
  });
});

describe('the figures of the relay in glass', () => {
  it('are those of its starting sketch', () => {
    const sketch = starting('chute-relay-in-glass.json');
    const setting = settingAt(sketch.positions[0]!.id);
    const setup = given(exactSetupOf(sketch, setting, analyse(sketch, setting)));
    const { magnification, chiefHeightMm } = compare(setup);
    const both = ({ paraxial, exact }: typeof magnification, unit: string) =>
      `${formatNumber(given(paraxial), 4)} and ${formatNumber(given(exact), 4)}${unit}`;
    expect(prose).toContain(`magnification ${both(magnification, '')}`);
    expect(prose).toContain(`chief height ${both(chiefHeightMm, ' mm')}`);
  });
});

describe('the readouts in the README', () => {
  const all = [
    ...POWER_READOUTS,
    ...CONJUGATE_READOUTS,
    ...LIGHT_READOUTS,
    ...PUPIL_READOUTS,
    ...SENSOR_READOUTS,
  ];

  it.each(all.map(({ label }) => label))('%s has its line', (label) => {
    expect(readme).toContain(`\n| ${label} | `);
  });
});
