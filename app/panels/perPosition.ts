import type { Edit, PartId, Sketch } from '../../engine/index.ts';
import {
  isCommon,
  joinGap,
  joinObjectDistance,
  joinStopDiameter,
  splitGap,
  splitObjectDistance,
  splitStopDiameter,
} from '../../engine/index.ts';
import type { Reading } from '../live/reading.ts';

/** How a value that may differ from position to position is split and joined. */
export interface PerPositionEdits {
  readonly isCommon: (sketch: Sketch) => boolean;
  readonly split: Edit;
  /** Makes the value of the present position that of all. */
  readonly join: (reading: Reading) => Edit;
}

/** For the gap behind a part. */
export const gapPerPosition = (partId: PartId): PerPositionEdits => ({
  isCommon: (sketch) => {
    const part = sketch.parts.find(({ id }) => id === partId);
    return part === undefined || isCommon(part.space.lengthMm);
  },
  split: (sketch) => splitGap(sketch, partId),
  join:
    ({ setting }) =>
    (sketch) =>
      joinGap(sketch, partId, setting.at),
});

/** For the object distance. */
export const OBJECT_PER_POSITION: PerPositionEdits = {
  isCommon: (sketch) => isCommon(sketch.object.distanceMm),
  split: splitObjectDistance,
  join:
    ({ setting }) =>
    (sketch) =>
      joinObjectDistance(sketch, setting.at),
};

/** For the stop diameter; an aperture of another kind has one value anyway. */
export const STOP_PER_POSITION: PerPositionEdits = {
  isCommon: ({ aperture }) => aperture.kind !== 'stopDiameter' || isCommon(aperture.diameterMm),
  split: splitStopDiameter,
  join:
    ({ setting }) =>
    (sketch) =>
      joinStopDiameter(sketch, setting.at),
};
