import type { PartId } from '../../../engine/index.ts';
import { fixSensor } from '../../../engine/index.ts';
import { useReadingNow } from '../../live/reading.ts';
import { gapPerPosition } from '../perPosition.ts';
import { orWhy, SketchNumber } from '../SketchNumber.tsx';

interface ImageDistanceFieldProps {
  /** The last part. */
  readonly behind: PartId;
}

/** Behind the last part stands the image plane; typing its distance fixes the sensor there. */
export function ImageDistanceField({ behind }: ImageDistanceFieldProps) {
  const follows = useReadingNow(({ sketch }) => sketch.image === 'focus');
  return (
    <SketchNumber
      label={follows ? 'Image behind' : 'Sensor behind'}
      unit="length"
      read={({ analysis }) => orWhy(analysis.conjugates.imagePlaneMm)}
      edit={(value, { setting }) =>
        (sketch) =>
          fixSensor(sketch, value, setting.at)
        }
      {...(follows
        ? { hint: 'follows the focus; typing fixes the sensor' }
        : { perPosition: gapPerPosition(behind) })}
    />
  );
}
