import type { Datum, LengthUnit } from '../../engine/index.ts';
import { digitsIn } from '../../engine/index.ts';
import { useReadingNow } from '../live/reading.ts';
import { setView } from '../store/viewStore.ts';
import { Segmented, Select } from '../ui/choices.tsx';

const DATUMS: readonly { readonly value: Datum; readonly label: string }[] = [
  { value: 'first part', label: 'first part' },
  { value: 'sensor', label: 'sensor' },
  { value: 'mount', label: 'mount plane' },
];
const DIGITS = [0, 1, 2, 3, 4, 5, 6];
const UNITS = [
  { value: 'mm', label: 'mm' },
  { value: 'in', label: 'in' },
] as const;

/** What the table counts from, how finely it is rounded, and in which unit. */
export function SheetChoices({ hasMount }: { readonly hasMount: boolean }) {
  const datum = useReadingNow((reading) => reading.view.datum);
  const digits = useReadingNow((reading) => String(reading.view.digits));
  const unit = useReadingNow((reading) => reading.view.unit);
  return (
    <div className="sheet-choices">
      <Select
        label="Distances from"
        value={datum}
        choices={DATUMS.filter((choice) => hasMount || choice.value !== 'mount' || datum === 'mount')}
        onChoose={(next) => setView({ datum: next })}
      />
      <Select
        label="Rounded to"
        value={digits}
        choices={DIGITS.map((each) => ({ value: String(each), label: finest(each, unit) }))}
        onChoose={(next) => setView({ digits: Number(next) })}
      />
      <Segmented label="Unit" value={unit} choices={UNITS} onChoose={(next) => setView({ unit: next })} />
    </div>
  );
}

/** The last decimal that is kept, in words: "0.001 mm". */
function finest(digits: number, unit: LengthUnit): string {
  const decimals = digitsIn(unit, digits);
  return `${(10 ** -decimals).toFixed(decimals)} ${unit}`;
}
