import { objectDistanceAt, setObjectAtInfinity, setObjectDistance } from '../../../engine/index.ts';
import { currentReading } from '../../live/reading.ts';
import { OBJECT_PER_POSITION } from '../perPosition.ts';
import { SketchNumber } from '../SketchNumber.tsx';

/** The object's distance in front of the first part, or infinity. */
export function ObjectDistanceField() {
  return (
    <SketchNumber
      label="Object in front"
      unit="length"
      allowInfinity
      read={({ sketch, setting }) => {
        const distance = objectDistanceAt(sketch.object.distanceMm, sketch.positions, setting);
        return distance === 'infinity' ? Infinity : distance;
      }}
      edit={(value, { setting }) =>
        (sketch) =>
          setObjectDistance(sketch, value === Infinity ? 'infinity' : value, setting.at)
        }
      empty={{
        words: '∞',
        edit: (sketch) => setObjectAtInfinity(sketch, currentReading().setting.at),
      }}
      perPosition={OBJECT_PER_POSITION}
    />
  );
}
