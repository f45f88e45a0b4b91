import type { KeyboardEvent, PointerEvent } from 'react';
import { useId, useRef } from 'react';
import type { Material, Nominal } from '../../../engine/index.ts';
import { kindOf, neighbour } from '../../../engine/index.ts';
import { formatNumber } from '../../ui/format.ts';
import { ABBE_TICKS, ARROWS, INDEX_TICKS, MARKS, type MapMark, nearestMark, placeOn } from './glassMap.ts';

interface GlassMapProps {
  /** What can be chosen; the others stay on the map, faintly. */
  readonly fitting: readonly Material[];
  /** The marked material. */
  readonly marked: Material | null;
  /** Where the steps of the arrow keys begin while no material is marked. */
  readonly from: Nominal;
  /** Whether a medium that is not of the catalogue stands there; it is drawn as a cross. */
  readonly isOwn: boolean;
  /** Whether the index of a material is known in every line. */
  readonly isKnown: (material: Material) => boolean;
  /** The pointer is over a material, or over none any more. */
  readonly onHover: (material: Material | null) => void;
  readonly onStep: (material: Material) => void;
  readonly onChoose: (material: Material) => void;
  /** A letter was typed: it belongs to the filter. */
  readonly onLetter: () => void;
}

/** How near the pointer must come to a mark, in px. */
const REACH_PX = { mouse: 18, touch: 32 } as const;

/** The materials by index against Abbe number, to point at or to step through by the arrow keys. */
export function GlassMap(props: GlassMapProps) {
  const { fitting, marked, from, isOwn, isKnown, onHover, onStep, onChoose, onLetter } = props;
  const id = useId();
  const area = useRef<HTMLDivElement>(null);
  const fits = new Set(fitting);
  const own = isOwn ? placeOn(from) : null;
  const label = MARKS.find(({ material }) => material === marked);

  const under = (event: PointerEvent): MapMark | null => {
    const box = area.current?.getBoundingClientRect();
    if (!box) return null;
    return nearestMark(
      MARKS.filter(({ material }) => fits.has(material)),
      { xPx: event.clientX - box.left, yPx: event.clientY - box.top },
      { widthPx: box.width, heightPx: box.height },
      event.pointerType === 'touch' ? REACH_PX.touch : REACH_PX.mouse,
    );
  };

  const onKeyDown = (event: KeyboardEvent) => {
    const direction = ARROWS[event.key];
    if (direction !== undefined) {
      event.preventDefault();
      const next = neighbour(fitting, marked ?? from, direction) ?? (marked ? null : fitting[0]);
      if (next) onStep(next);
    } else if (event.key === 'Enter' || event.key === ' ') {
      event.preventDefault();
      if (marked) onChoose(marked);
    } else if (event.key.length === 1 && !event.ctrlKey && !event.metaKey && !event.altKey) onLetter();
  };

  /** A finger hides what it touches: the first touch marks, the second chooses. */
  const onPointerUp = (event: PointerEvent) => {
    const mark = under(event);
    if (!mark) return;
    if (event.pointerType === 'touch' && mark.material !== marked) onStep(mark.material);
    else onChoose(mark.material);
  };

  return (
    <div className="glass-map">
      <span className="glass-map-title glass-map-index" aria-hidden="true">
        index
      </span>
      <span className="glass-map-title glass-map-abbe" aria-hidden="true">
        Abbe number
      </span>
      <div
        ref={area}
        className="glass-map-area"
        role="listbox"
        aria-label="Glass by index and Abbe number"
        aria-activedescendant={label && `${id}-${label.material.id}`}
        tabIndex={0}
        onKeyDown={onKeyDown}
        onPointerMove={(event) => event.pointerType !== 'touch' && onHover(under(event)?.material ?? null)}
        onPointerLeave={() => onHover(null)}
        onPointerUp={onPointerUp}
      >
        <div className="glass-map-grid" aria-hidden="true">
          {ABBE_TICKS.map(({ text, at }) => (
            <span key={text} className="glass-map-upright" style={{ left: `${at}%` }}>
              {text}
            </span>
          ))}
          {INDEX_TICKS.map(({ text, at }) => (
            <span key={text} className="glass-map-level" style={{ top: `${at}%` }}>
              {text}
            </span>
          ))}
        </div>
        {MARKS.map(({ material, x, y }) => (
          // biome-ignore lint/a11y/useFocusableInteractive: the list box keeps the focus and names the marked option
          <div
            key={material.id}
            id={`${id}-${material.id}`}
            role="option"
            aria-selected={material === marked}
            aria-disabled={!fits.has(material) || undefined}
            aria-label={optionWords(material, isKnown(material))}
            className={markClass(material, fits.has(material), isKnown(material))}
            style={{ left: `${x}%`, top: `${y}%` }}
          />
        ))}
        {own && (
          <span
            className="glass-map-own"
            aria-hidden="true"
            style={{ left: `${own.x}%`, top: `${own.y}%` }}
          />
        )}
        {label && (
          <span
            className={label.x > 55 ? 'glass-map-name glass-map-name-left' : 'glass-map-name'}
            aria-hidden="true"
            style={{ left: `${label.x}%`, top: `${label.y}%` }}
          >
            {label.material.name}
          </span>
        )}
      </div>
    </div>
  );
}

function optionWords(material: Material, known: boolean): string {
  const { name, nd, vd } = material;
  const figures = `${formatNumber(nd ?? Number.NaN, 4)}, ${formatNumber(vd ?? Number.NaN, 1)}`;
  return `${name}, ${kindOf(material)}, ${figures}${known ? '' : ', a line lies outside its range'}`;
}

const markClass = (material: Material, fits: boolean, known: boolean): string =>
  `glass-mark glass-mark-${material.family}${fits ? '' : ' glass-mark-faint'}${known ? '' : ' glass-mark-hollow'}`;
