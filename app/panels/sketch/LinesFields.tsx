import type { Air, Edit, MainLines, Sketch } from '../../../engine/index.ts';
import { LINES, setAir, setAssumedIndex, setBlur, setLines, spectralLines } from '../../../engine/index.ts';
import { useReadingNow } from '../../live/reading.ts';
import type { Choice } from '../../ui/choices.tsx';
import { Select } from '../../ui/choices.tsx';
import { formatNumber } from '../../ui/format.ts';
import { tryEdit } from '../edit.ts';
import { SketchNumber } from '../SketchNumber.tsx';

type Preset = keyof typeof LINES | 'own';

const PRESETS: readonly Choice<Preset>[] = [
  { value: 'e', label: 'e, F′, C′' },
  { value: 'd', label: 'd, F, C' },
  { value: 'own', label: 'own' },
];

const AIR: readonly Choice<Air>[] = [
  { value: 'unity', label: 'index 1' },
  { value: 'standard', label: 'standard, 15 °C' },
];

/** The wavelengths with their weights, the air around, and what is assumed where nothing is given. */
export function LinesFields() {
  const preset = useReadingNow(({ sketch }) => presetOf(sketch.lines));
  const air = useReadingNow(({ sketch }) => sketch.air);
  const count = useReadingNow(({ sketch }) => sketch.lines.more.length);
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
      <MainLine label="Main" line="main" />
      <MainLine label="Short" line="short" />
      <MainLine label="Long" line="long" />
      {count > 0 && <MoreLine label="Fourth" at={0} />}
      {count > 1 && <MoreLine label="Fifth" at={1} />}
      {count < MOST_MORE && <AddLine />}
      <Select
        label="Air"
        value={air}
        choices={AIR}
        onChoose={(chosen) => tryEdit((sketch) => setAir(sketch, chosen))}
      />
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

/** Beside main, short and long. */
const MOST_MORE = 2;

interface MainLineProps {
  readonly label: string;
  readonly line: 'main' | 'short' | 'long';
}

const NM = { main: 'mainNm', short: 'shortNm', long: 'longNm' } as const;

function MainLine({ label, line }: MainLineProps) {
  return (
    <>
      <SketchNumber
        label={label}
        unit="nm"
        digits={2}
        read={({ sketch }) => sketch.lines[NM[line]]}
        edit={(value) => (sketch) => setLines(sketch, { [NM[line]]: value })}
      />
      <SketchNumber
        label={`${label} weight`}
        unit=""
        digits={2}
        step={0.25}
        read={({ sketch }) => sketch.lines.weights[line]}
        edit={(value) => (sketch) =>
          setLines(sketch, { weights: { ...sketch.lines.weights, [line]: value } })
        }
      />
    </>
  );
}

/** A further line; an emptied wavelength takes it away. */
function MoreLine({ label, at }: { readonly label: string; readonly at: number }) {
  const change =
    (part: Partial<Sketch['lines']['more'][number]>): Edit =>
    (sketch) =>
      setLines(sketch, {
        more: sketch.lines.more.map((line, other) => (other === at ? { ...line, ...part } : line)),
      });
  return (
    <>
      <SketchNumber
        label={label}
        unit="nm"
        digits={2}
        read={({ sketch }) => sketch.lines.more[at]?.wavelengthNm ?? null}
        edit={(value) => change({ wavelengthNm: value })}
        empty={{
          words: 'none',
          edit: (sketch) => setLines(sketch, { more: sketch.lines.more.filter((_, other) => other !== at) }),
        }}
        hint="empty it to take it away"
      />
      <SketchNumber
        label={`${label} weight`}
        unit=""
        digits={2}
        step={0.25}
        read={({ sketch }) => sketch.lines.more[at]?.weight ?? null}
        edit={(value) => change({ weight: value })}
      />
    </>
  );
}

const NONE = '';

/** Takes a further line from those in which glass is measured; its wavelength can then be typed over. */
function AddLine() {
  const lines = useReadingNow(({ sketch }) => sketch.lines);
  const taken = new Set([
    lines.mainNm,
    lines.shortNm,
    lines.longNm,
    ...lines.more.map((line) => line.wavelengthNm),
  ]);
  const choices = spectralLines
    .filter(({ nm }) => !taken.has(nm))
    .map(({ id, nm }) => ({
      value: String(nm),
      label: `${id.replace("'", '′')}  ${formatNumber(nm, 1)} nm`,
    }));
  return (
    <Select
      label="Further line"
      value={NONE}
      choices={[{ value: NONE, label: 'add…' }, ...choices]}
      onChoose={(chosen) =>
        chosen !== NONE &&
        tryEdit((sketch) =>
          setLines(sketch, { more: [...sketch.lines.more, { wavelengthNm: Number(chosen), weight: 1 }] }),
        )
      }
    />
  );
}

function presetOf(lines: MainLines): Preset {
  const same = (other: MainLines) =>
    lines.mainNm === other.mainNm && lines.shortNm === other.shortNm && lines.longNm === other.longNm;
  return same(LINES.e) ? 'e' : same(LINES.d) ? 'd' : 'own';
}
