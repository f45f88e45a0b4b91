import { useId } from 'react';
import { fittedTimes, loupeLook, TIMES_LIMITS } from '../../drawing/loupe/look.ts';
import { currentReading, useReading, useReadingNow } from '../../live/reading.ts';
import { type LoupeView, setView, viewStore } from '../../store/viewStore.ts';
import { Checkbox } from '../../ui/choices.tsx';
import { formatNumber } from '../../ui/format.ts';
import { LengthField, TimesField } from './ViewNumber.tsx';

const change = (part: Partial<LoupeView>) => setView({ loupe: { ...viewStore.getState().loupe, ...part } });

/** Shows the loupe, at magnifications that fit what is there the first time. */
function show(shown: boolean): void {
  const { lengths } = viewStore.getState().loupe;
  change({ shown });
  if (shown && lengths === null) fitTimes();
}

function fitTimes(): void {
  const look = loupeLook(currentReading());
  if (look) change({ ...fittedTimes(look), planeMm: 0 });
}

const lookAtImage = () => change({ zMm: null, heightMm: null, planeMm: 0 });

/** Where the loupe looks, how much it magnifies, and its plane through focus. */
export function LoupeFields() {
  const shown = useReadingNow(({ view }) => view.loupe.shown);
  return (
    <>
      <Checkbox label="Loupe on the drawing" checked={shown} onChange={show} />
      {shown && <LoupeSettings />}
    </>
  );
}

function LoupeSettings() {
  const zMm = useReadingNow(({ view }) => view.loupe.zMm);
  const heightMm = useReadingNow(({ view }) => view.loupe.heightMm);
  const lengths = useReadingNow(({ view }) => view.loupe.lengths);
  const heights = useReadingNow(({ view }) => view.loupe.heights);
  return (
    <>
      <PlaneSlider />
      <LengthField
        label="Looks at"
        valueMm={zMm}
        digits={3}
        step={1}
        follows="image"
        onSet={(next) => change({ zMm: next })}
        onFollow={() => change({ zMm: null })}
      />
      <LengthField
        label="At height"
        valueMm={heightMm}
        digits={3}
        step={0.1}
        follows="field end"
        onSet={(next) => change({ heightMm: next })}
        onFollow={() => change({ heightMm: null })}
      />
      <TimesField
        label="Lengths ×"
        value={lengths}
        digits={1}
        step={10}
        {...TIMES_LIMITS}
        follows="fitted"
        onSet={(next) => change({ lengths: next })}
        onFollow={() => change({ lengths: null })}
      />
      <TimesField
        label="Heights ×"
        value={heights}
        digits={1}
        step={10}
        {...TIMES_LIMITS}
        follows="fitted"
        onSet={(next) => change({ heights: next })}
        onFollow={() => change({ heights: null })}
      />
      <div className="card-actions">
        <button type="button" className="text-button" onClick={fitTimes}>
          Fit
        </button>
        <button type="button" className="text-button" onClick={lookAtImage}>
          Look at the image
        </button>
      </div>
      <p className="exact-note">
        ○ paraxial image, ◆ best focus; the bracket is the Airy disc, dots the plane through focus.
      </p>
    </>
  );
}

/** Steps of the slider from end to end. */
const STEPS = 200;
/** What the slider reaches to either side, in times of the quick depth λF². */
const REACH = 12;

/** Moves the plane through focus, and tells the spot there. */
function PlaneSlider() {
  const id = useId();
  const planeMm = useReadingNow(({ view }) => view.loupe.planeMm);
  const reachMm = useReadingNow((reading) => {
    const best = loupeLook(reading)?.bestFocus;
    const look = loupeLook(reading);
    const shift = best && look ? Math.abs(best.zMm - look.zMm) : 0;
    const airy = look?.airyRadiusMm ?? 0.005;
    // In steps of 1, 2, 5, so that the slider keeps its scale while something is dragged.
    return rounded(Math.max(REACH * airy, 2 * shift));
  });
  const words = useReading((reading) => {
    const look = loupeLook(reading);
    if (!look) return '';
    return look.rmsMm.ok ? `rms spot ${formatNumber(1000 * look.rmsMm.value, 2)} µm` : look.rmsMm.why;
  });
  const shift = `${planeMm > 0 ? '+' : ''}${formatNumber(1000 * planeMm, 1)} µm`;
  return (
    <div className="loupe-plane">
      <label htmlFor={id}>Plane through focus</label>
      <input
        id={id}
        type="range"
        min={-reachMm}
        max={reachMm}
        step={(2 * reachMm) / STEPS}
        value={planeMm}
        aria-valuetext={`${shift}, ${words}`}
        onChange={(event) => change({ planeMm: Number(event.target.value) })}
      />
      <output htmlFor={id} className="loupe-plane-words">
        <span>{shift}</span> <span data-rms>{words}</span>
      </output>
    </div>
  );
}

function rounded(value: number): number {
  const power = 10 ** Math.floor(Math.log10(value));
  return ([1, 2, 5].find((step) => step * power >= value) ?? 10) * power;
}
