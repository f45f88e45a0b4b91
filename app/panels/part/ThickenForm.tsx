import { useState } from 'react';
import type { Analysis, PartId, Quantity, Sketch, ThinPart } from '../../../engine/index.ts';
import { analysisOf } from '../../live/analysis.ts';
import type { Reading } from '../../live/reading.ts';
import { currentReading, useReadingNow } from '../../live/reading.ts';
import { setView } from '../../store/viewStore.ts';
import { Segmented, Select } from '../../ui/choices.tsx';
import { formatLength, formatNumber, formatOutcome } from '../../ui/format.ts';
import { NumberField } from '../../ui/NumberField.tsx';
import { tryEdit } from '../edit.ts';
import { GlassButton } from './GlassButton.tsx';
import { type BendingChoice, firstWish, type ThickenWish, thickened } from './thickenWish.ts';

interface ThickenFormProps {
  readonly part: ThinPart;
}

/** Asks what glass a thin part shall become, and shows what that does before it is done. */
export function ThickenForm({ part }: ThickenFormProps) {
  const [wish, setWish] = useState<ThickenWish>(() => firstWish(currentReading(), part));
  const change = (changes: Partial<ThickenWish>) => setWish((before) => ({ ...before, ...changes }));
  return (
    <fieldset className="thicken" aria-label="Thicken">
      <Segmented
        label="Becomes"
        value={wish.kind}
        choices={[
          { value: 'singlet', label: 'Singlet' },
          { value: 'cemented pair', label: 'Cemented achromat' },
        ]}
        onChoose={(kind) => change({ kind })}
      />
      <GlassWishes wish={wish} change={change} />
      <BendingWish part={part} wish={wish} change={change} />
      <ThicknessWishes wish={wish} change={change} />
      <Outcome id={part.id} wish={wish} />
    </fieldset>
  );
}

interface WishProps {
  readonly wish: ThickenWish;
  readonly change: (changes: Partial<ThickenWish>) => void;
}

function GlassWishes({ wish, change }: WishProps) {
  const [first, second] = wish.materials;
  const isPair = wish.kind === 'cemented pair';
  return (
    <>
      <GlassButton
        label={isPair ? 'First glass' : 'Glass'}
        medium={first}
        onChoose={(medium) => change({ materials: [medium, second] })}
      />
      {isPair && (
        <GlassButton
          label="Second glass"
          medium={second}
          onChoose={(medium) => change({ materials: [first, medium] })}
        />
      )}
    </>
  );
}

const bendingChoices = (isPositive: boolean): readonly { value: BendingChoice; label: string }[] => [
  { value: 'equi', label: isPositive ? 'Equi-convex' : 'Equi-concave' },
  { value: 'flat behind', label: 'Flat behind' },
  { value: 'flat in front', label: 'Flat in front' },
  ...(isPositive
    ? ([
        { value: 'equal radii, centres right', label: 'Meniscus, equal radii, centres right' },
        { value: 'equal radii, centres left', label: 'Meniscus, equal radii, centres left' },
      ] as const)
    : []),
  { value: 'least spherical', label: 'Least spherical' },
  { value: 'zero coma', label: 'Zero coma' },
  { value: 'number', label: 'Shape factor' },
];

function BendingWish({ part, wish, change }: WishProps & { readonly part: ThinPart }) {
  const isPair = wish.kind === 'cemented pair';
  // Colour cannot be cancelled by a first element of equal radii.
  const choices = bendingChoices(part.focalLengthMm > 0).filter(
    ({ value }) => !(isPair && value.startsWith('equal radii')),
  );
  const value = choices.some((choice) => choice.value === wish.bending) ? wish.bending : 'equi';
  return (
    <>
      <Select
        label={isPair ? 'First element' : 'Bending'}
        value={value}
        choices={choices}
        onChoose={(bending) => change({ bending })}
      />
      {value === 'number' && (
        <NumberField
          label="Shape factor"
          value={wish.shapeFactor}
          unit=""
          digits={3}
          onCommit={(shapeFactor) => {
            if (shapeFactor !== null) change({ shapeFactor });
            return null;
          }}
        />
      )}
    </>
  );
}

function ThicknessWishes({ wish, change }: WishProps) {
  const unit = useReadingNow(({ view }) => view.unit);
  const digits = unit === 'mm' ? 3 : 5;
  const field = (label: string, value: number, set: (mm: number) => void) => (
    <NumberField
      label={label}
      value={value}
      unit={unit}
      digits={digits}
      onCommit={(mm) => {
        if (mm === null) return null;
        if (mm < 0) return 'A thickness is 0 or more.';
        set(mm);
        return null;
      }}
    />
  );
  if (wish.kind === 'cemented pair') {
    const [first, second] = wish.pairMm;
    return (
      <>
        {field('First thickness', first, (mm) => change({ pairMm: [mm, second] }))}
        {field('Second thickness', second, (mm) => change({ pairMm: [first, mm] }))}
      </>
    );
  }
  return (
    <>
      <Segmented
        label="Thickness given"
        value={wish.thickness}
        choices={[
          { value: 'centre', label: 'on the axis' },
          { value: 'edge', label: 'at the edge' },
        ]}
        onChoose={(thickness) => change({ thickness })}
      />
      {field('Thickness', wish.thicknessMm, (thicknessMm) => change({ thicknessMm }))}
    </>
  );
}

/** What would come of the wish: notes and numbers before and after, and the way to do it. */
function Outcome({ id, wish }: { readonly id: PartId; readonly wish: ThickenWish }) {
  const [fault, setFault] = useState<string | null>(null);
  const sketch = useReadingNow((reading) => reading.sketch);
  const setting = useReadingNow((reading) => reading.setting);
  const view = useReadingNow((reading) => reading.view);
  const reading = { sketch, setting, view, analysis: analysisOf(sketch, setting) } as Reading;
  const made = thickened(wish, reading, id);
  const thicken = () => {
    if (!made.ok) return;
    const refused = tryEdit((before) => {
      const again = thickened(wish, { ...reading, sketch: before } as Reading, id);
      return again.ok ? again.value.sketch : before;
    });
    setFault(refused);
    if (refused === null) setView({ thickening: null });
  };
  return (
    <>
      {made.ok ? (
        <>
          <BeforeAfter before={reading.analysis} after={afterOf(made.value.sketch, reading)} view={view} />
          {made.value.notes.map((note) => (
            <p key={note('mm')} className="card-line">
              {note(view.unit)}
            </p>
          ))}
        </>
      ) : (
        <p className="field-fault" role="status">
          {made.why}
        </p>
      )}
      {fault && (
        <p className="field-fault" role="alert">
          {fault}
        </p>
      )}
      <div className="card-actions">
        <button type="button" className="text-button" disabled={!made.ok} onClick={thicken}>
          Thicken
        </button>
        <button type="button" className="text-button" onClick={() => setView({ thickening: null })}>
          Leave it thin
        </button>
      </div>
    </>
  );
}

/** The analysis of the thickened sketch, when the rules allow it. */
const afterOf = (sketch: Sketch, { setting }: Reading): Analysis => analysisOf(sketch, setting);

interface BeforeAfterProps {
  readonly before: Analysis;
  readonly after: Analysis;
  readonly view: Reading['view'];
}

function BeforeAfter({ before, after, view }: BeforeAfterProps) {
  const { unit, digits } = view;
  const length = (quantity: Quantity) => formatOutcome(quantity, (mm) => formatLength(mm, unit, digits));
  const number = (quantity: Quantity) => formatOutcome(quantity, (value) => formatNumber(value, 5));
  const rows = [
    [`Focal length, ${unit}`, length, (of: Analysis) => of.firstOrder.focalLengthMm],
    ['Magnification', number, (of: Analysis) => of.conjugates.magnification],
    [`Back focus, ${unit}`, length, (of: Analysis) => of.firstOrder.backFocusMm],
    [`Track, ${unit}`, length, (of: Analysis) => of.conjugates.trackMm],
    [`Entrance pupil, ${unit}`, length, (of: Analysis) => of.pupils.entrance.diameterMm],
  ] as const;
  return (
    <table className="thicken-numbers">
      <thead>
        <tr>
          <td />
          <th scope="col">before</th>
          <th scope="col">after</th>
        </tr>
      </thead>
      <tbody>
        {rows.map(([name, format, read]) => (
          <tr key={name}>
            <th scope="row">{name}</th>
            <td>{format(read(before))}</td>
            <td>{format(read(after))}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
