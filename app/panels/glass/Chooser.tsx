import type { FocusEvent, KeyboardEvent } from 'react';
import { useEffect, useId, useLayoutEffect, useRef, useState } from 'react';
import type { Material, SolidMedium } from '../../../engine/index.ts';
import { filterMaterials, materialNamed, materialOf, materials, nominal } from '../../../engine/index.ts';
import { useReadingNow } from '../../live/reading.ts';
import type { Choice } from '../../ui/choices.tsx';
import { Segmented } from '../../ui/choices.tsx';
import { Icon } from '../../ui/Icon.tsx';
import { GlassMap } from './GlassMap.tsx';
import { BEYOND } from './glassMap.ts';
import { isKnownInLines, mediumWords } from './mediumWords.ts';
import { CodeForm, FormulaForm, IndexForm } from './OwnMedium.tsx';
import type { TypedMedium } from './typedMedium.ts';
import './glass.css';

export interface ChooserProps {
  readonly label: string;
  /** What stands there as the chooser opens; null for air or nothing. */
  readonly medium: SolidMedium | null;
  /** What may stand there instead of a glass, in words. */
  readonly instead: string | null;
  /** Shows the medium on the drawing; one sentence when it may not be there. */
  readonly onPreview: (medium: SolidMedium) => string | null;
  /** Puts back what was there. */
  readonly onRestore: () => void;
  /** Makes the change and closes; one sentence when it is refused. */
  readonly onChoose: (medium: SolidMedium | 'instead') => string | null;
  /** Closes; the focus goes back unless the user took it elsewhere. */
  readonly onClose: (focusBack: boolean) => void;
}

type Way = 'catalogue' | 'code' | 'index' | 'formula';

const WAYS: readonly Choice<Way>[] = [
  { value: 'catalogue', label: 'Catalogue' },
  { value: 'code', label: 'Code' },
  { value: 'index', label: 'Index' },
  { value: 'formula', label: 'Formula' },
];

/** Chooses a medium: on the map of the catalogue, by code, index or formula. What is marked is drawn at once. */
export function Chooser({ label, medium, instead, onPreview, onRestore, onChoose, onClose }: ChooserProps) {
  const id = useId();
  const area = useRef<HTMLDivElement>(null);
  const filter = useRef<HTMLInputElement>(null);
  const [way, setWay] = useState<Way>(() => wayOf(medium));
  const [text, setText] = useState('');
  /** Marked by keys or typed; it counts when the chooser is left. */
  const [stepped, setStepped] = useState<SolidMedium | null>(null);
  const [hovered, setHovered] = useState<Material | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  const lines = useReadingNow(({ sketch }) => sketch.lines);
  const air = useReadingNow(({ sketch }) => sketch.air);
  const isKnown = ({ id: material }: Material) => isKnownInLines({ material }, { lines, air });

  const fitting = filterMaterials(materials, text);
  const shown: SolidMedium | null = hovered ? { material: hovered.id } : (stepped ?? medium);
  const marked = shown !== null && 'material' in shown ? materialOf(shown.material) : null;

  const show = (next: SolidMedium | null) => {
    if (next === null) onRestore();
    setFault(next === null ? null : onPreview(next));
  };
  const step = (next: SolidMedium) => {
    setHovered(null);
    setStepped(next);
    show(next);
  };
  const hover = (material: Material | null) => {
    if (material === hovered) return;
    setHovered(material);
    show(material === null ? stepped : { material: material.id });
  };
  const choose = (next: SolidMedium | 'instead') => setFault(onChoose(next));
  const type = (typed: TypedMedium) => {
    if (typed.ok) return step(typed.value);
    setStepped(null);
    show(null);
    setFault(typed.why);
  };
  const typeFilter = (typed: string) => {
    setText(typed);
    const fits = filterMaterials(materials, typed);
    const next = materialNamed(materials, typed) ?? (marked && fits.includes(marked) ? marked : fits[0]);
    if (typed.trim() !== '' && next && next !== marked) step({ material: next.id });
  };

  const leave = (focusBack: boolean) => {
    if (stepped !== null && fault === null) onChoose(stepped);
    else onRestore();
    onClose(focusBack);
  };
  const giveUp = () => {
    onRestore();
    onClose(true);
  };

  useLayoutEffect(() => {
    area.current?.showPopover();
    area.current?.querySelector<HTMLElement>('[role="listbox"], input[type="text"]')?.focus();
  }, []);

  const latestLeave = useRef(leave);
  latestLeave.current = leave;
  useEffect(() => {
    const onPress = ({ target }: PointerEvent) => {
      const isOpener = target instanceof Element && target.closest('[aria-expanded="true"].material-button');
      if (target instanceof Node && !area.current?.contains(target) && !isOpener) latestLeave.current(false);
    };
    document.addEventListener('pointerdown', onPress, { capture: true });
    return () => document.removeEventListener('pointerdown', onPress, { capture: true });
  }, []);

  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key !== 'Escape') return;
    event.preventDefault();
    event.stopPropagation();
    giveUp();
  };
  const onBlur = ({ relatedTarget }: FocusEvent) => {
    if (relatedTarget instanceof Node && !area.current?.contains(relatedTarget)) leave(false);
  };

  return (
    <div
      ref={area}
      popover="manual"
      className={way === 'catalogue' ? 'glass-chooser' : 'glass-chooser glass-chooser-own'}
      role="dialog"
      aria-labelledby={`${id}-title`}
      onKeyDown={onKeyDown}
      onBlur={onBlur}
    >
      <div className="glass-head">
        <h2 id={`${id}-title`} className="glass-title">
          {label}
        </h2>
        <button type="button" className="icon-button" aria-label="Close without choosing" onClick={giveUp}>
          <Icon name="close" />
        </button>
      </div>
      <form
        className="glass-body"
        onSubmit={(event) => {
          event.preventDefault();
          if (shown !== null && fault === null) choose(shown);
        }}
      >
        <GlassMap
          fitting={fitting}
          marked={marked}
          from={shown === null ? MIDDLE : nominal(shown)}
          isOwn={shown !== null && marked === null}
          isKnown={isKnown}
          onHover={hover}
          onStep={(material) => step({ material: material.id })}
          onChoose={(material) => choose({ material: material.id })}
          onLetter={() => filter.current?.focus()}
        />
        <div className="glass-side">
          <Segmented
            label="Choose by"
            value={way}
            choices={WAYS}
            onChoose={(next) => {
              setWay(next);
              setStepped(null);
              show(null);
            }}
          />
          {way === 'catalogue' && (
            <>
              <input
                ref={filter}
                type="search"
                className="field-input glass-filter"
                aria-label="Filter by name, code or kind"
                placeholder="name, code or kind, such as flint"
                autoComplete="off"
                spellCheck={false}
                value={text}
                onChange={(event) => typeFilter(event.target.value)}
                onKeyDown={(event) => {
                  if (event.key !== 'ArrowDown' && event.key !== 'ArrowUp') return;
                  event.preventDefault();
                  area.current?.querySelector<HTMLElement>('[role="listbox"]')?.focus();
                }}
              />
              <Beyond
                fitting={fitting}
                marked={marked}
                onHover={hover}
                onChoose={(material) => choose({ material: material.id })}
              />
            </>
          )}
          {way === 'code' && <CodeForm medium={medium} onTyped={type} />}
          {way === 'index' && <IndexForm medium={medium} onTyped={type} />}
          {way === 'formula' && <FormulaForm medium={medium} onTyped={type} />}
          <Said medium={shown} fault={fault} />
          <p className="glass-do">
            <button type="submit" className="main-button" disabled={shown === null || fault !== null}>
              Choose
            </button>
            {instead !== null && (
              <button type="button" className="text-button" onClick={() => choose('instead')}>
                {instead}
              </button>
            )}
          </p>
        </div>
      </form>
    </div>
  );
}

/** Where arrow keys begin while there is no glass. */
const MIDDLE = { nd: 1.5168, vd: 64.2 };

function wayOf(medium: SolidMedium | null): Way {
  if (medium === null || 'material' in medium) return 'catalogue';
  if ('code' in medium) return 'code';
  return 'index' in medium ? 'index' : 'formula';
}

/** The medium as it would be chosen, and the rules' sentence when it may not be there. */
function Said({ medium, fault }: { readonly medium: SolidMedium | null; readonly fault: string | null }) {
  const words = medium === null ? null : mediumWords(medium);
  return (
    <div className="glass-said">
      {words && (
        <>
          <p>
            <strong className="glass-name">{words.name}</strong> {words.figures}
          </p>
          <p className="glass-note">{words.about}</p>
        </>
      )}
      <p role="status" className={fault === null ? undefined : 'field-fault'}>
        {fault}
      </p>
    </div>
  );
}

interface BeyondProps {
  readonly fitting: readonly Material[];
  readonly marked: Material | null;
  readonly onHover: (material: Material | null) => void;
  readonly onChoose: (material: Material) => void;
}

/** What has no place on the map. */
function Beyond({ fitting, marked, onHover, onChoose }: BeyondProps) {
  const beyond = BEYOND.filter((material) => fitting.includes(material));
  if (beyond.length === 0) return null;
  return (
    <p className="glass-beyond">
      <span className="glass-note">Beyond the map</span>
      {beyond.map((material) => (
        <button
          key={material.id}
          type="button"
          className="text-button"
          aria-pressed={material === marked}
          title={material.name}
          onPointerEnter={() => onHover(material)}
          onPointerLeave={() => onHover(null)}
          onClick={() => onChoose(material)}
        >
          {material.name.replace(/ \(.*/, '')}
        </button>
      ))}
    </p>
  );
}
