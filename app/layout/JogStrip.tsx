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

/** The grips that a finger can take without covering them, by the start of their ids. */
const CHIPS = [
  { id: 'part:', end: '', label: 'Position' },
  { id: 'focal:', end: ':rear', label: 'Focal' },
  { id: 'rim:', end: ':upper', label: 'Rim' },
  { id: 'thickness:', end: '', label: 'Thickness' },
] as const;

/**
 * The phone's way to drag: chips choose a grip of the selected part, the strip moves it, so that the finger never covers it. Two
 * toggles stand for Shift and Alt.
 */
export function JogStrip({ board }: JogStripProps) {
  const id = useReading((reading) => onlySelected(reading)?.id);
  const kind = useReading((reading) => onlySelected(reading)?.kind);
  const behindMoves = useReading(({ view }) => view.otherRule);
  const snap = useReading(({ view }) => view.snap);
  const [chip, setChip] = useState<(typeof CHIPS)[number]>(CHIPS[0]);
  const from = useRef<{ readonly x: number; readonly y: number } | null>(null);
  if (id === undefined) return <p className="jog-hint">Tap a part to move it from here.</p>;

  const chips = CHIPS.filter((item) => {
    if (item.id === 'focal:') return kind === 'thin';
    if (item.id === 'thickness:') return kind === 'plate';
    return item.id === 'part:' || kind !== 'stop';
  });
  const chosen = chips.includes(chip) ? chip : chips[0];
  const handleId = `${chosen?.id}${id}${chosen?.end}`;

  const onMove = (event: PointerEvent) => {
    const { current } = from;
    if (!current) return;
    const along = event.clientX - current.x;
    const vertical = chosen?.id === 'rim:';
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
            key={item.id}
            type="button"
            className="jog-chip"
            aria-pressed={item === chosen}
            onClick={() => setChip(item)}
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
