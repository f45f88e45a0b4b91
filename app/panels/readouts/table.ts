import type { Analysis } from '../../../engine/index.ts';
import { CONJUGATE_READOUTS } from './conjugates.ts';
import { LIGHT_READOUTS, passingReadouts } from './light.ts';
import { POWER_READOUTS } from './power.ts';
import { PUPIL_READOUTS } from './pupils.ts';
import type { Readout, ReadoutGroup } from './readout.ts';
import { SENSOR_READOUTS } from './sensor.ts';

const GROUPS: Readonly<Record<ReadoutGroup, readonly Readout[]>> = {
  Power: POWER_READOUTS,
  Conjugates: CONJUGATE_READOUTS,
  Light: LIGHT_READOUTS,
  Pupils: PUPIL_READOUTS,
  Sensor: SENSOR_READOUTS,
};

/** The readouts of one group that say something about this layout, in the order they are shown. */
export function readoutsIn(
  group: ReadoutGroup,
  analysis: Analysis,
  fractions: readonly number[],
): readonly Readout[] {
  const all = group === 'Light' ? [...LIGHT_READOUTS, ...passingReadouts(fractions)] : GROUPS[group];
  return all.filter((readout) => readout.applies?.(analysis) ?? true);
}

/** The readout of that id; the focal length when there is none. */
export function readoutById(id: string, fractions: readonly number[]): Readout {
  const all = [...Object.values(GROUPS).flat(), ...passingReadouts(fractions)];
  return all.find((readout) => readout.id === id) ?? (POWER_READOUTS[0] as Readout);
}
