import type { ReactNode } from 'react';
import { useId, useState } from 'react';
import type { DispersionFormula, SolidMedium } from '../../../engine/index.ts';
import { CODE_MODEL, FORMULA_KINDS, materialOf, nominal, rangeOf } from '../../../engine/index.ts';
import { Select } from '../../ui/choices.tsx';
import { formatEntry } from '../../ui/entry.ts';
import { Field } from '../../ui/Field.tsx';
import type { TypedMedium } from './typedMedium.ts';
import { mediumOfCode, mediumOfFormula, mediumOfIndex } from './typedMedium.ts';

interface OwnMediumProps {
  /** What stood there when the chooser opened. */
  readonly medium: SolidMedium | null;
  /** What was typed, at every change. */
  readonly onTyped: (typed: TypedMedium) => void;
}

/** A glass by its six-digit code. */
export function CodeForm({ medium, onTyped }: OwnMediumProps) {
  const [code, setCode] = useState(() => codeOf(medium));
  return (
    <>
      <Entry
        label="Six-digit code"
        value={code}
        placeholder="517642"
        onType={(text) => {
          setCode(text);
          onTyped(mediumOfCode(text));
        }}
      />
      <p className="glass-note">Three decimals of nd, then ten times Vd. Other lines by {CODE_MODEL}.</p>
    </>
  );
}

/** A medium by index and Abbe number in the sketch's own lines. */
export function IndexForm({ medium, onTyped }: OwnMediumProps) {
  const [typed, setTyped] = useState(() => indexOfMedium(medium));
  const change = (part: Partial<typeof typed>) => {
    const next = { ...typed, ...part };
    setTyped(next);
    onTyped(mediumOfIndex(next));
  };
  return (
    <>
      <Entry label="Index" value={typed.index} placeholder="1.5168" onType={(index) => change({ index })} />
      <Entry
        label="Abbe number"
        value={typed.abbeNumber}
        placeholder="unknown"
        onType={(abbeNumber) => change({ abbeNumber })}
      />
      <Entry label="Name" value={typed.name} placeholder="unnamed" onType={(name) => change({ name })} />
      <p className="glass-note">
        In the sketch’s main line, relative to air; without Abbe number it has no colour.
      </p>
    </>
  );
}

/** A medium by a dispersion formula of the user's own. */
export function FormulaForm({ medium, onTyped }: OwnMediumProps) {
  const id = useId();
  const [typed, setTyped] = useState(() => formulaOfMedium(medium));
  const change = (part: Partial<typeof typed>) => {
    const next = { ...typed, ...part };
    setTyped(next);
    onTyped(mediumOfFormula(next));
  };
  return (
    <>
      <Select
        label="Formula"
        value={typed.kind}
        choices={FORMULA_KINDS.map((kind) => ({ value: kind, label: KIND_WORDS[kind] }))}
        onChoose={(kind) => change({ kind })}
        hint={FORMULA_WORDS[typed.kind]}
      />
      <Field id={id} label="Coefficients in their order, λ in µm" wide>
        <textarea
          id={id}
          className="field-input field-text field-area"
          rows={3}
          spellCheck={false}
          value={typed.coefficients}
          onChange={(event) => change({ coefficients: event.target.value })}
        />
      </Field>
      <Entry label="Holds from" unit="nm" value={typed.fromNm} onType={(fromNm) => change({ fromNm })} />
      <Entry label="to" unit="nm" value={typed.toNm} onType={(toNm) => change({ toNm })} />
      <Entry label="Name" value={typed.name} placeholder="unnamed" onType={(name) => change({ name })} />
    </>
  );
}

const KIND_WORDS: Readonly<Record<DispersionFormula['kind'], string>> = {
  sellmeier: 'Sellmeier',
  'sellmeier-squared': 'Sellmeier, squares given',
  polynomial: 'polynomial of n²',
  combined: 'combined',
  cauchy: 'Cauchy',
  gases: 'gases',
};

const FORMULA_WORDS: Readonly<Record<DispersionFormula['kind'], string>> = {
  sellmeier: 'n² = 1 + C1 + C2 λ²/(λ² − C3²) + C4 λ²/(λ² − C5²) + …',
  'sellmeier-squared': 'n² = 1 + C1 + C2 λ²/(λ² − C3) + C4 λ²/(λ² − C5) + …',
  polynomial: 'n² = C1 + C2 λ^C3 + C4 λ^C5 + …',
  combined: 'n² = C1 + C2 λ^C3/(λ² − C4^C5) + C6 λ^C7/(λ² − C8^C9) + C10 λ^C11 + …',
  cauchy: 'n = C1 + C2 λ^C3 + C4 λ^C5 + …',
  gases: 'n = 1 + C1 + C2/(C3 − λ⁻²) + C4/(C5 − λ⁻²) + …',
};

interface EntryProps {
  readonly label: string;
  readonly value: string;
  readonly unit?: string;
  readonly placeholder?: string;
  readonly onType: (text: string) => void;
}

function Entry({ label, value, unit, placeholder, onType }: EntryProps): ReactNode {
  const id = useId();
  return (
    <Field id={id} label={label} {...(unit !== undefined && { unit })}>
      <input
        id={id}
        className="field-input glass-entry"
        type="text"
        autoComplete="off"
        spellCheck={false}
        value={value}
        placeholder={placeholder}
        onChange={(event) => onType(event.target.value)}
      />
    </Field>
  );
}

function codeOf(medium: SolidMedium | null): string {
  if (medium === null) return '';
  if ('code' in medium) return medium.code;
  return 'material' in medium ? (materialOf(medium.material)?.sixDigitCode ?? '') : '';
}

function indexOfMedium(medium: SolidMedium | null) {
  const { nd, vd } = medium === null ? { nd: null, vd: null } : nominal(medium);
  return {
    name: medium !== null && 'index' in medium ? medium.name : '',
    index: nd === null ? '' : formatEntry(nd, ''),
    abbeNumber: vd === null ? '' : formatEntry(Number(vd.toPrecision(7)), ''),
  };
}

function formulaOfMedium(medium: SolidMedium | null) {
  const own = medium !== null && 'formula' in medium ? medium : null;
  const formula =
    own?.formula ??
    (medium !== null && 'material' in medium ? materialOf(medium.material)?.formula : undefined);
  const range = medium === null || formula === undefined ? null : rangeOf(medium);
  return {
    name: own?.name ?? '',
    kind: formula?.kind ?? ('sellmeier-squared' as const),
    coefficients: (formula?.coefficients ?? []).map((value) => formatEntry(value, '')).join('\n'),
    fromNm: String(range?.[0] ?? 400),
    toNm: String(range?.[1] ?? 700),
  };
}
