import type { Aperture, Edit, Sketch } from '../../../engine/index.ts';
import { setAperture, setStopDiameter } from '../../../engine/index.ts';
import { currentReading, useReading, useReadingNow } from '../../live/reading.ts';
import { Select } from '../../ui/choices.tsx';
import { tryEdit } from '../edit.ts';
import { STOP_PER_POSITION } from '../perPosition.ts';
import { SketchNumber } from '../SketchNumber.tsx';
import { APERTURE_CHOICES, apertureOfKind } from './apertureKinds.ts';

/** How much light: five kinds, one number. */
export function ApertureFields() {
  const kind = useReadingNow(({ sketch }) => sketch.aperture.kind);
  const trouble = useReading(({ analysis }) => (analysis.rays.marginal.ok ? '' : analysis.rays.marginal.why));
  return (
    <>
      <Select
        label="Aperture by"
        value={kind}
        choices={APERTURE_CHOICES}
        onChoose={(chosen) => {
          const aperture = apertureOfKind(chosen, currentReading());
          tryEdit((sketch) => (chosen === sketch.aperture.kind ? sketch : setAperture(sketch, aperture)));
        }}
        hint={trouble === '' ? undefined : `no marginal ray: ${trouble}`}
      />
      <ApertureValue kind={kind} />
    </>
  );
}

function ApertureValue({ kind }: { readonly kind: Aperture['kind'] }) {
  switch (kind) {
    case 'stopDiameter':
      return (
        <SketchNumber
          label="Stop diameter"
          unit="length"
          read={({ analysis: { aperture } }) =>
            aperture.kind === 'stopDiameter' ? aperture.diameterMm : null
          }
          edit={(value, { setting }) =>
            (sketch) =>
              setStopDiameter(sketch, value, setting.at)
            }
          perPosition={STOP_PER_POSITION}
        />
      );
    case 'entrancePupilDiameter':
      return (
        <SketchNumber
          label="Entrance pupil"
          unit="length"
          read={({ sketch: { aperture } }) => (aperture.kind === kind ? aperture.diameterMm : null)}
          edit={(diameterMm) => withAperture({ kind, diameterMm })}
        />
      );
    case 'objectNA':
      return (
        <SketchNumber
          label="NA"
          unit=""
          digits={4}
          step={0.01}
          read={({ sketch: { aperture } }) => (aperture.kind === kind ? aperture.na : null)}
          edit={(na) => withAperture({ kind, na })}
        />
      );
    default:
      return (
        <SketchNumber
          label="f-number"
          unit=""
          read={({ sketch: { aperture } }) => (aperture.kind === kind ? aperture.fNumber : null)}
          edit={(fNumber) => withAperture({ kind, fNumber })}
        />
      );
  }
}

const withAperture =
  (aperture: Aperture): Edit =>
  (sketch: Sketch) =>
    setAperture(sketch, aperture);
