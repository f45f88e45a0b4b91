import { exactRaysOf } from '../../drawing/exact/rays.ts';
import { beyondLimit, whiskersOf } from '../../drawing/exact/whiskers.ts';
import { plainLength } from '../../drawing/words.ts';
import { currentReading, type Reading, useReading, useReadingNow } from '../../live/reading.ts';
import { type ExactView, select, setView, viewStore } from '../../store/viewStore.ts';
import { ExactSwitch } from './ExactSwitch.tsx';
import { IDEAL } from './ideal.ts';
import { LengthField, TimesField } from './ViewNumber.tsx';
import { largestWords, lostSummary } from './words.ts';

const change = (part: Partial<ExactView>) => setView({ exact: { ...viewStore.getState().exact, ...part } });

const raysIn = (reading: Reading) => (reading.exact.differs ? exactRaysOf(reading) : null);

/** Exact minus paraxial heights: whiskers at the surfaces, and where the largest is. */
export function Drift() {
  const none = useReading((reading) => (raysIn(reading) ? null : IDEAL));
  const stretch = useReadingNow(({ view }) => view.exact.stretch);
  const limitMm = useReadingNow(({ view }) => view.exact.driftLimitMm);
  if (none !== null) return <p className="exact-note">{none}</p>;
  return (
    <>
      <LargestDrift />
      <LostRays />
      <ExactSwitch what="whiskers" label="Drift whiskers" />
      <TimesField
        label="Stretch ×"
        value={stretch}
        digits={0}
        step={5}
        least={1}
        most={100000}
        onSet={(next) => change({ stretch: next })}
      />
      <LengthField
        label="Limit"
        valueMm={limitMm}
        digits={4}
        step={0.01}
        least={0}
        onSet={(driftLimitMm) => change({ driftLimitMm })}
      />
      <Beyond />
    </>
  );
}

/** The largest drift; pressing it selects its part and points at it on the drawing, pressing again lets go. */
function LargestDrift() {
  const words = useReading((reading) => {
    const rays = raysIn(reading);
    return rays ? largestWords(reading.sketch, rays, reading.view.unit) : '';
  });
  const pressed = useReadingNow(({ view }) => view.exact.largest);
  return (
    <button type="button" className="exact-largest" aria-pressed={pressed} onClick={pointAtLargest}>
      <span className="exact-largest-name">largest</span> {words}
    </button>
  );
}

function pointAtLargest(): void {
  const reading = currentReading();
  const { largest } = reading.view.exact;
  change({ largest: !largest });
  const rays = raysIn(reading);
  if (largest || !rays?.largest) return;
  const part = reading.sketch.parts[rays.train.partOf[rays.largest.surface] ?? -1];
  select(part?.id ?? 'image');
}

function LostRays() {
  const words = useReading((reading) => {
    const rays = raysIn(reading);
    return rays ? lostSummary(reading.sketch, rays) : '';
  });
  return words === '' ? null : <p className="exact-note">Lost rays: {words}.</p>;
}

function Beyond() {
  const words = useReading((reading) => {
    const rays = raysIn(reading);
    if (!rays) return '';
    const whiskers = whiskersOf(rays);
    const { driftLimitMm } = reading.view.exact;
    const limit = plainLength(driftLimitMm, reading.view.unit, 4);
    const count = beyondLimit(whiskers, driftLimitMm);
    return count === 0
      ? `None of ${whiskers.length} whiskers is beyond ${limit}.`
      : `✗ ${count} of ${whiskers.length} whiskers ${count === 1 ? 'is' : 'are'} beyond ${limit}.`;
  });
  return <p className={words.startsWith('✗') ? 'exact-note exact-beyond' : 'exact-note'}>{words}</p>;
}
