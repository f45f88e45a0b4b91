import { emptySketch, newPlate, newStop, newThin } from '../../engine/sketch/create.ts';
import type {
  FixedMedium,
  Part,
  PartId,
  PlatePart,
  Setting,
  Sketch,
  StopPart,
  ThinPart,
} from '../../engine/sketch/types.ts';
import { settingAt } from '../../engine/sketch/values.ts';

const id = (name: string) => name as PartId;

/** A thin part in air with `gapMm` behind it; its name is its id. */
export const thin = (
  name: string,
  focalLengthMm: number,
  gapMm = 0,
  more: Partial<ThinPart> = {},
): ThinPart => ({
  ...newThin(focalLengthMm, id(name)),
  name,
  space: { lengthMm: gapMm, medium: 'air' },
  ...more,
});

/** A free diaphragm in air. */
export const diaphragm = (name: string, gapMm = 0, more: Partial<StopPart> = {}): StopPart => ({
  ...newStop(id(name)),
  name,
  space: { lengthMm: gapMm, medium: 'air' },
  ...more,
});

export const GLASS: FixedMedium = { name: 'glass', index: 1.5, abbeNumber: 60 };

/** A flat plate of index 1.5 in air. */
export const plate = (
  name: string,
  thicknessMm: number,
  gapMm = 0,
  more: Partial<PlatePart> = {},
): PlatePart => ({
  ...newPlate(thicknessMm, id(name), GLASS),
  name,
  space: { lengthMm: gapMm, medium: 'air' },
  ...more,
});

/** A sketch of these parts, the stop named by its part. */
export const sketchOf = (
  parts: readonly Part[],
  stop: string | null = null,
  more: Partial<Sketch> = {},
): Sketch => ({
  ...emptySketch(),
  parts,
  stop: stop === null ? null : id(stop),
  ...more,
});

/** The setting on the first position. */
export const onFirst = (sketch: Sketch): Setting => {
  const [first] = sketch.positions;
  if (!first) throw new Error('a sketch has a position');
  return settingAt(first.id);
};
