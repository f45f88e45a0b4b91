import type { MainLines } from '../../../engine/index.ts';
import { LINES, setAssumedIndex, setBlur, setLines } from '../../../engine/index.ts';
import { useReadingNow } from '../../live/reading.ts';
import type { Choice } from '../../ui/choices.tsx';
import { Select } from '../../ui/choices.tsx';
import { tryEdit } from '../edit.ts';
import { SketchNumber } from '../SketchNumber.tsx';

type Preset = keyof typeof LINES | 'own';

const PRESETS: readonly Choice<Preset>[] = [
  { value: 'e', label: 'e, F′, C′' },
  { value: 'd', label: 'd, F, C' },
  { value: 'own', label: 'own' },
];

/** The three wavelengths, and what is assumed where nothing is given. */
export function LinesFields() {
  const preset = useReadingNow(({ sketch }) => presetOf(sketch.lines));
  return (
    <>
      <Select
        label="Lines"
        value={preset}
        choices={preset === 'own' ? PRESETS : PRESETS.slice(0, 2)}
        onChoose={(chosen) =>
          tryEdit((sketch) => (chosen === 'own' ? sketch : setLines(sketch, LINES[chosen])))
        }
      />
      <LineField label="Main" line="mainNm" />
      <LineField label="Short" line="shortNm" />
      <LineField label="Long" line="longNm" />
      <SketchNumber
        label="Assumed index"
        unit=""
        digits={4}
        step={0.01}
        read={({ sketch }) => sketch.assumedIndex}
        edit={(value) => (sketch) => setAssumedIndex(sketch, value)}
      />
      <SketchNumber
        label="Blur allowed"
        unit="µm"
        digits={2}
        read={({ sketch }) => sketch.blurMm}
        edit={(value) => (sketch) => setBlur(sketch, value)}
        empty={{ words: 'one pixel', edit: (sketch) => setBlur(sketch, null) }}
      />
    </>
  );
}

function LineField({ label, line }: { readonly label: string; readonly line: keyof MainLines }) {
  return (
    <SketchNumber
      label={label}
      unit="nm"
      digits={2}
      read={({ sketch }) => sketch.lines[line]}
      edit={(value) => (sketch) => setLines(sketch, { [line]: value })}
    />
  );
}

function presetOf(lines: MainLines): Preset {
  const same = (other: MainLines) =>
    lines.mainNm === other.mainNm && lines.shortNm === other.shortNm && lines.longNm === other.longNm;
  return same(LINES.e) ? 'e' : same(LINES.d) ? 'd' : 'own';
}
