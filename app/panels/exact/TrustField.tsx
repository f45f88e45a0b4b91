import { useReading, useReadingNow } from '../../live/reading.ts';
import { setView, viewStore } from '../../store/viewStore.ts';
import { LengthField } from './ViewNumber.tsx';
import { trustWords } from './words.ts';

/** How far down aperture and field the first order can be trusted, and the limit that says so. */
export function TrustField() {
  const limitMm = useReadingNow(({ view }) => view.exact.trustLimitMm);
  return (
    <>
      <LengthField
        label="Trusted within"
        valueMm={limitMm}
        digits={4}
        step={0.005}
        least={1e-6}
        onSet={(trustLimitMm) => setView({ exact: { ...viewStore.getState().exact, trustLimitMm } })}
      />
      <TrustWords />
    </>
  );
}

function TrustWords() {
  const words = useReading(({ exact, analysis, view }) => {
    const fNumber = analysis.light.workingFNumber;
    const { trustLimitMm } = view.exact;
    return trustWords(exact.trust(trustLimitMm), trustLimitMm, fNumber.ok ? fNumber.value : null, view.unit);
  });
  return (
    <p className="exact-note" data-trust>
      {words}
    </p>
  );
}
