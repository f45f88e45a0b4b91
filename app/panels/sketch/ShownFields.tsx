import { useReadingNow } from '../../live/reading.ts';
import type { Shown } from '../../store/viewStore.ts';
import { setView, viewStore } from '../../store/viewStore.ts';
import type { Choice } from '../../ui/choices.tsx';
import { Checkbox, Select } from '../../ui/choices.tsx';
import { ExactSwitch } from '../exact/ExactSwitch.tsx';

const RAY_COUNTS: readonly Choice<string>[] = ['2', '3', '5', '7', '9', '11', '15', '21'].map((count) => ({
  value: count,
  label: count,
}));

const SHOWN: readonly (readonly [keyof Shown, string])[] = [
  ['bundles', 'Off-axis bundles'],
  ['images', 'Intermediate images'],
  ['pupils', 'Pupils'],
  ['principalPlanes', 'Principal planes'],
  ['focalPoints', 'Focal points'],
  ['equivalentGaps', 'Gaps of glass between its principal planes'],
  ['labels', 'Labels'],
];

/** What the drawing shows. It is a matter of the view: the sketch does not change. */
export function ShownFields() {
  const rays = useReadingNow(({ view }) => String(view.raysPerBundle));
  const counts = RAY_COUNTS.some(({ value }) => value === rays)
    ? RAY_COUNTS
    : [...RAY_COUNTS, { value: rays, label: rays }];
  return (
    <>
      <Select
        label="Rays a bundle"
        value={rays}
        choices={counts}
        onChoose={(count) => setView({ raysPerBundle: Number(count) })}
      />
      <ExactSwitch what="paraxial" label="Paraxial rays" />
      <ExactSwitch what="exact" label="Exact rays" />
      <ExactSwitch what="whiskers" label="Drift whiskers" />
      {SHOWN.map(([key, label]) => (
        <ShownCheckbox key={key} what={key} label={label} />
      ))}
    </>
  );
}

function ShownCheckbox({ what, label }: { readonly what: keyof Shown; readonly label: string }) {
  const checked = useReadingNow(({ view }) => view.shown[what]);
  return (
    <Checkbox
      label={label}
      checked={checked}
      onChange={(on) => setView({ shown: { ...viewStore.getState().shown, [what]: on } })}
    />
  );
}
