import type { ReactNode } from 'react';
import type { Edit, GlassSurface, PartId } from '../../../engine/index.ts';
import { setSurface, setThickness } from '../../../engine/index.ts';
import { useReadingNow } from '../../live/reading.ts';
import { formatEntry, parseEntry } from '../../ui/entry.ts';
import { TextField } from '../../ui/TextField.tsx';
import { tryEdit } from '../edit.ts';
import { SketchNumber } from '../SketchNumber.tsx';
import { partIn, readGlass } from './partReading.ts';
import './surfaceTable.css';

interface SurfaceTableProps {
  readonly id: PartId;
}

/** The surfaces of glass as columns and their quantities as rows, as on a worksheet. */
export function SurfaceTable({ id }: SurfaceTableProps) {
  const count = useReadingNow((reading) => readGlass(id, ({ surfaces }) => surfaces.length)(reading) ?? 0);
  const terms = useReadingNow((reading) => readGlass(id, termsOf)(reading) ?? 0);
  const unit = useReadingNow(({ view }) => view.unit);
  const surfaces = Array.from({ length: count }, (_, k) => k);
  const powers = Array.from({ length: terms }, (_, i) => i);
  return (
    <div className="surface-table">
      <table aria-label="Surfaces">
        <thead>
          <tr>
            <td className="surface-unit">{unit}</td>
            {surfaces.map((k) => (
              <th key={k} scope="col">
                {k + 1}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          <Row name="Radius">
            {surfaces.map((k) => (
              <RadiusCell key={k} id={id} k={k} />
            ))}
          </Row>
          <Row name="Conic">
            {surfaces.map((k) => (
              <ConicCell key={k} id={id} k={k} />
            ))}
          </Row>
          {powers.map((term) => (
            <Row key={term} name={powerName(term)}>
              {surfaces.map((k) => (
                <PowerCell key={k} id={id} k={k} term={term} />
              ))}
            </Row>
          ))}
          <Row name="Clear ⌀">
            {surfaces.map((k) => (
              <RimCell key={k} id={id} k={k} />
            ))}
          </Row>
          <Row name="Thickness behind">
            {surfaces.map((k) => (k < count - 1 ? <ThicknessCell key={k} id={id} k={k} /> : <td key={k} />))}
          </Row>
        </tbody>
      </table>
      <div className="card-actions">
        <button type="button" className="text-button" onClick={() => tryEdit(withTerms(id, terms + 1))}>
          Add {powerName(terms)}
        </button>
        {terms > 0 && (
          <button type="button" className="text-button" onClick={() => tryEdit(withTerms(id, terms - 1))}>
            Remove {powerName(terms - 1)}
          </button>
        )}
      </div>
    </div>
  );
}

const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** "r⁴" for the first coefficient, "r⁶" for the second. */
const powerName = (term: number): string =>
  `r${[...String(2 * term + 4)].map((digit) => SUPERSCRIPTS[Number(digit)]).join('')}`;

const termsOf = ({ surfaces }: { readonly surfaces: readonly GlassSurface[] }): number =>
  Math.max(0, ...surfaces.map(({ asphere }) => asphere.length));

/** The surface with so many coefficients that term `term` has a place; those added are 0. */
const padded = (asphere: readonly number[], count: number): readonly number[] =>
  Array.from({ length: count }, (_, i) => asphere[i] ?? 0);

/** The first surface carries the powers added; the last term is taken from every surface that has it. */
const withTerms =
  (id: PartId, terms: number): Edit =>
  (sketch) => {
    const part = sketch.parts.find((other) => other.id === id);
    if (part?.kind !== 'glass') return sketch;
    return part.surfaces.reduce((changed, { asphere }, k) => {
      const count = k === 0 && terms > termsOf(part) ? terms : Math.min(asphere.length, terms);
      return setSurface(changed, id, k, { asphere: padded(asphere, count) });
    }, sketch);
  };

function Row({ name, children }: { readonly name: string; readonly children: ReactNode }) {
  return (
    <tr>
      <th scope="row">{name}</th>
      {children}
    </tr>
  );
}

interface CellProps {
  readonly id: PartId;
  /** Which surface, from 0. */
  readonly k: number;
}

function RadiusCell({ id, k }: CellProps) {
  return (
    <td>
      <SketchNumber
        label={`Radius of surface ${k + 1}`}
        labelHidden
        unit="length"
        allowInfinity
        read={readGlass(id, ({ surfaces }) => surfaces[k]?.radiusMm ?? Number.POSITIVE_INFINITY)}
        edit={(value) => (sketch) =>
          setSurface(sketch, id, k, { radiusMm: Number.isFinite(value) ? value : null })
        }
        empty={{ words: 'flat', edit: (sketch) => setSurface(sketch, id, k, { radiusMm: null }) }}
        title="A radius, positive when its centre lies to the right; ∞ or flat for a plane"
      />
    </td>
  );
}

function ConicCell({ id, k }: CellProps) {
  return (
    <td>
      <SketchNumber
        label={`Conic constant of surface ${k + 1}`}
        labelHidden
        unit=""
        digits={4}
        read={readGlass(id, ({ surfaces }) => surfaces[k]?.conic ?? 0)}
        edit={(conic) => (sketch) => setSurface(sketch, id, k, { conic })}
        title="0 a sphere, −1 a paraboloid"
      />
    </td>
  );
}

/** A coefficient may be of any power of ten: all its digits stand there. */
function PowerCell({ id, k, term }: CellProps & { readonly term: number }) {
  const value = useReadingNow(
    (reading) => readGlass(id, ({ surfaces }) => surfaces[k]?.asphere[term] ?? 0)(reading) ?? 0,
  );
  const commit = (text: string): string | null => {
    const entry = parseEntry(text, { unit: '', current: value });
    if (!entry.ok) return entry.why;
    return tryEdit((sketch) => {
      const part = sketch.parts.find((other) => other.id === id);
      const asphere = part?.kind === 'glass' ? part.surfaces[k]?.asphere : undefined;
      if (asphere === undefined) return sketch;
      const all = padded(asphere, Math.max(asphere.length, term + 1));
      return setSurface(sketch, id, k, { asphere: all.with(term, entry.value) });
    });
  };
  return (
    <td className="surface-power">
      <TextField
        label={`${powerName(term)} of surface ${k + 1}`}
        labelHidden
        value={formatEntry(value, '')}
        onCommit={commit}
      />
    </td>
  );
}

function RimCell({ id, k }: CellProps) {
  const shared = useReadingNow((reading) =>
    partIn(reading, id)?.semiDiameterMm === null ? 'open' : 'as part',
  );
  return (
    <td>
      <SketchNumber
        label={`Clear diameter of surface ${k + 1}`}
        labelHidden
        unit="length"
        read={(reading) => {
          const semi = readGlass(id, ({ surfaces }) => surfaces[k]?.semiDiameterMm ?? null)(reading);
          return semi === null ? null : 2 * semi;
        }}
        edit={(value) => (sketch) => setSurface(sketch, id, k, { semiDiameterMm: value / 2 })}
        empty={{ words: shared, edit: (sketch) => setSurface(sketch, id, k, { semiDiameterMm: null }) }}
      />
    </td>
  );
}

function ThicknessCell({ id, k }: CellProps) {
  return (
    <td>
      <SketchNumber
        label={`Thickness behind surface ${k + 1}`}
        labelHidden
        unit="length"
        read={readGlass(id, ({ fillings }) => fillings[k]?.thicknessMm ?? 0)}
        edit={(value) => (sketch) => setThickness(sketch, id, value, k)}
      />
    </td>
  );
}
