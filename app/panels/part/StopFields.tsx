import type { PartId } from '../../../engine/index.ts';
import { setStop, setStopDiameter } from '../../../engine/index.ts';
import { useReading } from '../../live/reading.ts';
import { applyEdit } from '../../store/sketchStore.ts';
import type { Commands } from '../CommandButton.tsx';
import { CommandRow } from '../CommandButton.tsx';
import { STOP_PER_POSITION } from '../perPosition.ts';
import { SketchNumber } from '../SketchNumber.tsx';
import { partIn } from './partReading.ts';

interface StopFieldsProps {
  readonly id: PartId;
  readonly commands: Commands;
}

/** The aperture stop as far as this part has to do with it. */
export function StopFields({ id, commands }: StopFieldsProps) {
  const isCarrier = useReading(({ sketch }) => sketch.stop === id);
  const isStopPart = useReading((reading) => partIn(reading, id)?.kind === 'stop');
  const follows = useReading(({ sketch }) => FOLLOWS[sketch.aperture.kind]);
  if (!isCarrier && isStopPart) {
    return (
      <div className="card-actions">
        <button
          type="button"
          className="text-button"
          onClick={() => applyEdit((sketch) => setStop(sketch, id))}
        >
          Make it the stop
        </button>
        <CommandRow commands={commands} ids={['rideStop']} />
      </div>
    );
  }
  if (!isCarrier) return <CommandRow commands={commands} ids={['rideStop']} />;
  return (
    <>
      {!isStopPart && <p className="card-line">The stop rides on it, in front of its refraction.</p>}
      <SketchNumber
        label="Stop diameter"
        unit="length"
        read={({ analysis }) =>
          analysis.pupils.stopDiameterMm.ok ? analysis.pupils.stopDiameterMm.value : null
        }
        edit={(value, { setting }) =>
          (sketch) =>
            setStopDiameter(sketch, value, setting.at)
          }
        hint={follows === null ? undefined : `follows from the ${follows}; typing sets the diameter instead`}
        {...(follows === null && { perPosition: STOP_PER_POSITION })}
      />
      {!isStopPart && <CommandRow commands={commands} ids={['releaseStop']} />}
    </>
  );
}

/** What a stop diameter follows from; null when it is what is given. */
const FOLLOWS = {
  stopDiameter: null,
  workingFNumber: 'working f-number',
  infinityFNumber: 'f-number at infinity',
  objectNA: 'NA at the object',
  entrancePupilDiameter: 'entrance-pupil diameter',
} as const;
