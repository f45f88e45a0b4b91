import type { PointerEvent } from 'react';
import { useRef, useState } from 'react';
import type { Part } from '../../engine/index.ts';
import type { Reading } from '../live/reading.ts';
import { useReading } from '../live/reading.ts';
import { setView } from '../store/viewStore.ts';
import type { Board } from './board.ts';
import './jogStrip.css';

interface JogStripProps {
  readonly board: () => Board | null;
}

interface Chip {
  readonly handleId: string;
  readonly label: string;
  /** The grip goes up and down. */
  readonly upright?: true;
}

/** The grips of a part that a finger can take without covering them. */
function chipsOf(part: Part): readonly Chip[] {
  const { id } = part;
  const chips: Chip[] = [{ handleId: `part:${id}`, label: 'Position' }];
  if (part.kind === 'thin') chips.push({ handleId: `focal:${id}:rear`, label: 'Focal' });
  if (part.kind === 'glass') {
    chips.push({ handleId: `bend:${id}`, label: 'Bending' });
    for (const k of part.surfaces.keys())
      chips.push({ handleId: `radius:${id}:${k}`, label: `Radius ${k + 1}` });
  }
  if (part.kind !== 'stop') chips.push({ handleId: `rim:${id}:upper`, label: 'Rim', upright: true });
  if (part.kind === 'plate') chips.push({ handleId: `thickness:${id}`, label: 'Thickness' });
  if (part.kind === 'glass')
    for (const k of part.fillings.keys())
      chips.push({
        handleId: `thickness:${id}:${k}`,
        label: part.fillings.length === 1 ? 'Thickness' : `Thickness ${k + 1}`,
      });
  return chips;
}

/**
 * The phone's way to drag: chips choose a grip of the selected part, the strip moves it, so that the finger never covers it. Two
 * toggles stand for Shift and Alt.
 */
export function JogStrip({ board }: JogStripProps) {
  // As a text: the part itself changes with every move of its grips, its chips do not.
  const chipsText = useReading((reading) => {
    const part = onlySelected(reading);
    return part ? JSON.stringify(chipsOf(part)) : '';
  });
  const behindMoves = useReading(({ view }) => view.otherRule);
  const snap = useReading(({ view }) => view.snap);
  const [chip, setChip] = useState('Position');
  const from = useRef<{ readonly x: number; readonly y: number } | null>(null);
  if (chipsText === '') return <p className="jog-hint">Tap a part to move it from here.</p>;

  const chips: readonly Chip[] = JSON.parse(chipsText);
  const chosen = chips.find(({ label }) => label === chip) ?? chips[0];
  const handleId = chosen?.handleId ?? '';

  const onMove = (event: PointerEvent) => {
    const { current } = from;
    if (!current) return;
    const along = event.clientX - current.x;
    const vertical = chosen?.upright ?? false;
    board()?.jog(handleId, vertical ? 0 : along, vertical ? -along : 0, snap);
  };
  const onEnd = (keep: boolean) => () => {
    if (!from.current) return;
    from.current = null;
    board()?.endJog(keep);
  };

  return (
    <div className="jog">
      <fieldset className="jog-chips" aria-label="What the strip moves">
        {chips.map((item) => (
          <button
            key={item.handleId}
            type="button"
            className="jog-chip"
            aria-pressed={item === chosen}
            onClick={() => setChip(item.label)}
          >
            {item.label}
          </button>
        ))}
        <button
          type="button"
          className="jog-chip"
          aria-pressed={behindMoves}
          onClick={() => setView({ otherRule: !behindMoves })}
        >
          behind moves
        </button>
        <button
          type="button"
          className="jog-chip"
          aria-pressed={snap}
          onClick={() => setView({ snap: !snap })}
        >
          snap
        </button>
      </fieldset>
      <div className="jog-row">
        <button
          type="button"
          className="jog-value"
          onClick={() => board()?.type(handleId)}
          aria-label={`Type ${chosen?.label.toLowerCase()}`}
        >
          123
        </button>
        <div
          className="jog-strip"
          aria-hidden="true"
          onPointerDown={(event) => {
            event.currentTarget.setPointerCapture(event.pointerId);
            from.current = { x: event.clientX, y: event.clientY };
          }}
          onPointerMove={onMove}
          onPointerUp={onEnd(true)}
          onPointerCancel={onEnd(false)}
        />
      </div>
    </div>
  );
}

/** The one part that is selected. */
function onlySelected({ sketch, view: { selection } }: Reading): Part | undefined {
  return selection.length === 1 ? sketch.parts.find(({ id }) => id === selection[0]) : undefined;
}
