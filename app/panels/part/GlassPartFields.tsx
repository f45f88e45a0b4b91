import type { PartId, Quantity } from '../../../engine/index.ts';
import {
  bendGlassToShape,
  bodyOf,
  edgeThicknesses,
  firstOrder,
  none,
  partTrain,
  setMaterial,
  shapeOfGlass,
  unsolvableSentence,
} from '../../../engine/index.ts';
import type { Reading } from '../../live/reading.ts';
import { useReading, useReadingNow } from '../../live/reading.ts';
import { formatLength, formatOutcome } from '../../ui/format.ts';
import { CommandRow } from '../CommandButton.tsx';
import { MaterialField } from '../glass/MaterialField.tsx';
import { SketchNumber } from '../SketchNumber.tsx';
import type { Commands } from '../useCommand.ts';
import { indexIn, partIn, readGlass } from './partReading.ts';
import { SurfaceTable } from './SurfaceTable.tsx';

interface GlassPartFieldsProps {
  readonly id: PartId;
  readonly commands: Commands;
}

const COMMANDS = [
  ['bendLeastSpherical', 'Bend: least spherical'],
  ['bendZeroComa', 'Bend: zero coma'],
  ['makeThin', 'Make thin'],
  ['equivalentGaps', 'Gaps: vertices or planes'],
] as const;

/** Surfaces, glasses and bending of a glass part, and what they make of it. */
export function GlassPartFields({ id, commands }: GlassPartFieldsProps) {
  const count = useReadingNow((reading) => readGlass(id, ({ fillings }) => fillings.length)(reading) ?? 0);
  return (
    <>
      <SurfaceTable id={id} />
      {[...Array(count).keys()].map((k) => (
        <MaterialField
          key={k}
          label={count === 1 ? 'Material' : `Behind surface ${k + 1}`}
          read={readGlass(id, ({ fillings }) => fillings[k]?.material ?? null)}
          edit={(material) => (sketch) => setMaterial(sketch, id, material, k)}
        />
      ))}
      <SketchNumber
        label="Bending"
        unit=""
        digits={3}
        read={readGlass(id, (part) => shapeOfGlass(part) ?? 'equal radii')}
        edit={(value, { sketch }) => {
          const bent = bendGlassToShape(sketch, id, value);
          if (!bent.ok) return unsolvableSentence(bent.why);
          return (before) => {
            const again = bendGlassToShape(before, id, value);
            return again.ok ? again.value.sketch : before;
          };
        }}
        hint="keeps its focal length and principal planes"
        title="Shape factor (R2 + R1)/(R2 − R1) of the outer surfaces: 0 equi-convex, 1 flat behind, −1 flat in front"
      />
      <OwnNumbers id={id} />
      <CommandRow commands={commands} row={COMMANDS} />
    </>
  );
}

function OwnNumbers({ id }: { readonly id: PartId }) {
  return (
    <dl className="own-numbers" aria-label="What the glass amounts to">
      {NUMBERS.map(({ name, read }) => (
        <OwnNumber key={name} id={id} name={name} read={read} />
      ))}
    </dl>
  );
}

type ReadOwn = (reading: Reading, id: PartId) => Quantity | string;

const NUMBERS: readonly { readonly name: string; readonly read: ReadOwn }[] = [
  { name: 'Own focal length', read: (reading, id) => own(reading, id, 'focalLengthMm') },
  { name: 'Front vertex to principal plane', read: (reading, id) => own(reading, id, 'principalFrontMm') },
  { name: 'Rear vertex to principal plane', read: (reading, id) => own(reading, id, 'principalRearMm') },
  { name: 'Edge thickness', read: edgeWords },
];

function OwnNumber({
  id,
  name,
  read,
}: {
  readonly id: PartId;
  readonly name: string;
  readonly read: ReadOwn;
}) {
  const text = useReading((reading) => {
    const value = read(reading, id);
    const { unit, digits } = reading.view;
    if (typeof value === 'string') return value;
    return formatOutcome(value, (mm) => `${formatLength(mm, unit, digits)} ${unit}`);
  });
  return (
    <div className="own-number">
      <dt>{name}</dt>
      <dd>{text}</dd>
    </div>
  );
}

function own(
  reading: Reading,
  id: PartId,
  which: 'focalLengthMm' | 'principalFrontMm' | 'principalRearMm',
): Quantity {
  const train = partTrain(reading.analysis.train, indexIn(reading, id));
  return train ? firstOrder(train)[which] : none('no parts');
}

/** From rim to rim, where the rims are given or the rays tell how wide the glass must be. */
function edgeWords(reading: Reading, id: PartId): string {
  const part = partIn(reading, id);
  if (!part) return '';
  const { train, clear } = reading.analysis;
  const first = train.partOf.indexOf(indexIn(reading, id));
  const body = bodyOf(part, (face) => {
    const need = clear[first + face]?.neededMm;
    return need?.ok ? need.value : 0;
  });
  if (!body) return '';
  if (body.semiMm === 0) return 'no rim';
  const { unit, digits } = reading.view;
  return `${edgeThicknesses(body)
    .map((mm) => formatLength(mm, unit, digits))
    .join(', ')} ${unit}`;
}
