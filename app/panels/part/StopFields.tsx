import type { Edit, PartId } from '../../../engine/index.ts';
import { releaseStop, rideStop, setStop, setStopDiameter } from '../../../engine/index.ts';
import { useReadingNow } from '../../live/reading.ts';
import { applyEdit } from '../../store/sketchStore.ts';
import { STOP_PER_POSITION } from '../perPosition.ts';
import { orWhy, SketchNumber } from '../SketchNumber.tsx';
import { partIn } from './partReading.ts';

/** The aperture stop as far as this part has to do with it. */
export function StopFields({ id }: { readonly id: PartId }) {
  const isCarrier = useReadingNow(({ sketch }) => sketch.stop === id);
  const isStopPart = useReadingNow((reading) => partIn(reading, id)?.kind === 'stop');
  if (!isCarrier) {
    return (
      <Action
        words={isStopPart ? 'Make it the aperture stop' : 'Let the stop ride on it'}
        edit={(sketch) => (isStopPart ? setStop(sketch, id) : rideStop(sketch, id))}
      />
    );
  }
  return (
    <>
      <StopDiameter />
      {!isStopPart && (
        <p className="card-line">
          The stop rides on it, in front of its refraction. <Action words="Release" edit={releaseStop} />
        </p>
      )}
    </>
  );
}

function Action({ words, edit }: { readonly words: string; readonly edit: Edit }) {
  return (
    <button type="button" className="card-link" onClick={() => applyEdit(edit)}>
      {words}
    </button>
  );
}

function StopDiameter() {
  const follows = useReadingNow(({ sketch }) => FOLLOWS[sketch.aperture.kind]);
  return (
    <SketchNumber
      label="Stop diameter"
      unit="length"
      read={({ analysis }) => orWhy(analysis.pupils.stopDiameterMm)}
      edit={(value, { setting }) =>
        (sketch) =>
          setStopDiameter(sketch, value, setting.at)
        }
      hint={follows === null ? undefined : `follows from the ${follows}; typing sets the diameter instead`}
      {...(follows === null && { perPosition: STOP_PER_POSITION })}
    />
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
