import type { Edit, Sensor } from '../../../engine/index.ts';
import { fixSensor, setImagePlane, setRegister, setSensor } from '../../../engine/index.ts';
import { currentReading, useReadingNow } from '../../live/reading.ts';
import { applyEdit } from '../../store/sketchStore.ts';
import type { Choice } from '../../ui/choices.tsx';
import { Select } from '../../ui/choices.tsx';
import { tryEdit } from '../edit.ts';
import { SketchNumber } from '../SketchNumber.tsx';
import { ImageDistanceField } from './ImageDistanceField.tsx';

type SensorForm = 'none' | 'sides' | 'diagonal';

const FORMS: readonly Choice<SensorForm>[] = [
  { value: 'none', label: 'not given' },
  { value: 'sides', label: 'width × height' },
  { value: 'diagonal', label: 'diagonal' },
];

/** A common machine-vision size, to start from. */
const START = { widthMm: 8.8, heightMm: 6.6 } as const;

/** Where the image is taken, how large the sensor is, and the mount in front of it. */
export function SensorFields() {
  const form = useReadingNow(({ sketch }) => formOf(sketch.sensor));
  return (
    <>
      <ImagePlaneFields />
      <Select
        label="Sensor size"
        value={form}
        choices={FORMS}
        onChoose={(chosen) => tryEdit((sketch) => setSensor(sketch, sensorOf(chosen, sketch.sensor)))}
      />
      {form === 'sides' && (
        <>
          <SideField label="Sensor width" side="widthMm" />
          <SideField label="Sensor height" side="heightMm" />
        </>
      )}
      {form === 'diagonal' && (
        <SketchNumber
          label="Sensor diagonal"
          unit="length"
          read={({ sketch: { sensor } }) =>
            sensor && 'diagonalMm' in sensor.size ? sensor.size.diagonalMm : null
          }
          edit={(diagonalMm) => withSensor((sensor) => ({ ...sensor, size: { diagonalMm } }))}
        />
      )}
      {form !== 'none' && (
        <SketchNumber
          label="Pixel pitch"
          unit="µm"
          digits={2}
          read={({ sketch }) => sketch.sensor?.pixelPitchMm ?? null}
          edit={(pixelPitchMm) => withSensor((sensor) => ({ ...sensor, pixelPitchMm }))}
          empty={{ words: 'unknown', edit: withSensor((sensor) => ({ ...sensor, pixelPitchMm: null })) }}
        />
      )}
      <SketchNumber
        label="Mount to sensor"
        unit="length"
        read={({ sketch }) => sketch.registerMm}
        edit={(value) => (sketch) => setRegister(sketch, value)}
        empty={{ words: 'no mount', edit: (sketch) => setRegister(sketch, null) }}
      />
    </>
  );
}

/** The image plane: behind the last part at the focus, or fixed. */
function ImagePlaneFields() {
  const last = useReadingNow(({ sketch }) => sketch.parts.at(-1)?.id ?? null);
  const follows = useReadingNow(({ sketch }) => sketch.image === 'focus');
  const canFix = useReadingNow(({ analysis }) => analysis.conjugates.imageDistanceMm.ok);
  if (last === null) return null;
  const fixHere = () => {
    const { analysis } = currentReading();
    const { imageDistanceMm } = analysis.conjugates;
    if (imageDistanceMm.ok) tryEdit((sketch) => fixSensor(sketch, imageDistanceMm.value));
  };
  return (
    <>
      <ImageDistanceField behind={last} />
      <p className="card-line">
        {follows ? (
          <button type="button" className="card-link" disabled={!canFix} onClick={fixHere}>
            Fix here
          </button>
        ) : (
          <button
            type="button"
            className="card-link"
            onClick={() => applyEdit((sketch) => setImagePlane(sketch, 'focus'))}
          >
            Follow focus
          </button>
        )}
      </p>
    </>
  );
}

function SideField({ label, side }: { readonly label: string; readonly side: 'widthMm' | 'heightMm' }) {
  return (
    <SketchNumber
      label={label}
      unit="length"
      read={({ sketch: { sensor } }) => (sensor && 'widthMm' in sensor.size ? sensor.size[side] : null)}
      edit={(value) =>
        withSensor((sensor) =>
          'widthMm' in sensor.size ? { ...sensor, size: { ...sensor.size, [side]: value } } : sensor,
        )
      }
    />
  );
}

const withSensor =
  (change: (sensor: Sensor) => Sensor): Edit =>
  (sketch) =>
    sketch.sensor ? setSensor(sketch, change(sketch.sensor)) : sketch;

function formOf(sensor: Sensor | null): SensorForm {
  if (sensor === null) return 'none';
  return 'diagonalMm' in sensor.size ? 'diagonal' : 'sides';
}

/** The sensor in another form, of the same diagonal. */
function sensorOf(form: SensorForm, present: Sensor | null): Sensor | null {
  if (form === 'none' || form === formOf(present)) return form === 'none' ? null : present;
  const pixelPitchMm = present?.pixelPitchMm ?? null;
  const size = present?.size ?? START;
  const diagonalMm = 'diagonalMm' in size ? size.diagonalMm : Math.hypot(size.widthMm, size.heightMm);
  if (form === 'diagonal') return { size: { diagonalMm }, pixelPitchMm };
  return { size: { widthMm: 0.8 * diagonalMm, heightMm: 0.6 * diagonalMm }, pixelPitchMm };
}
