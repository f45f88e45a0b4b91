import type { PointerEvent } from 'react';
import { useRef } from 'react';
import { useStore } from 'zustand';
import { setView, type TrayKind, viewStore } from '../store/viewStore.ts';
import type { Board } from './board.ts';
import { setDown, TRAY } from './tray.ts';
import './tray.css';

interface TrayProps {
  readonly board: () => Board | null;
}

/** New parts: drag one onto the axis, or tap one and then the axis. */
export function Tray({ board }: TrayProps) {
  const placing = useStore(viewStore, (view) => view.placing);
  const armed = useRef(false);

  const onDown = (kind: TrayKind) => (event: PointerEvent<HTMLButtonElement>) => {
    if (event.button !== 0) return;
    event.currentTarget.setPointerCapture(event.pointerId);
    armed.current = placing === kind;
    setView({ placing: kind, typing: null });
  };
  const onMove = (event: PointerEvent<HTMLButtonElement>) => {
    if (!event.currentTarget.hasPointerCapture(event.pointerId)) return;
    board()?.showDrop(board()?.spotUnder(event.clientX, event.clientY)?.zMm ?? null);
  };
  const onUp = (kind: TrayKind) => (event: PointerEvent<HTMLButtonElement>) => {
    const spot = board()?.spotUnder(event.clientX, event.clientY) ?? null;
    board()?.showDrop(null);
    if (spot) setDown(kind, spot);
    else if (armed.current || !inside(event)) setView({ placing: null });
  };
  const onCancel = () => {
    board()?.showDrop(null);
    setView({ placing: null });
  };

  return (
    <div
      className="tray"
      role="toolbar"
      aria-label="Tray: drag a part onto the axis, or tap it and then the axis"
    >
      {TRAY.map(({ kind, label }) => (
        <button
          key={kind}
          type="button"
          className="tray-part"
          aria-pressed={placing === kind}
          onPointerDown={onDown(kind)}
          onPointerMove={onMove}
          onPointerUp={onUp(kind)}
          onPointerCancel={onCancel}
          onClick={(event) => {
            // A click without a pointer comes from the keyboard.
            if (event.detail === 0) setView({ placing: placing === kind ? null : kind });
          }}
        >
          <TrayMark kind={kind} />
          {label}
        </button>
      ))}
    </div>
  );
}

function inside(event: PointerEvent<HTMLElement>): boolean {
  const box = event.currentTarget.getBoundingClientRect();
  const { clientX: x, clientY: y } = event;
  return x >= box.left && x <= box.right && y >= box.top && y <= box.bottom;
}

const MARKS: Readonly<Record<TrayKind, string>> = {
  positive: 'M12 3v22M8 7l4-4 4 4M8 21l4 4 4-4',
  negative: 'M12 6v16M8 2l4 4 4-4M8 26l4-4 4 4',
  stop: 'M12 3v7M12 18v7M7 10h10M7 18h10',
  plate: 'M9 4h6v20H9z',
  glass: 'M8 4h8q4 10 0 20H8q-4-10 0-20z',
};

function TrayMark({ kind }: { readonly kind: TrayKind }) {
  return (
    <svg className="tray-mark" width="24" height="28" viewBox="0 0 24 28" aria-hidden="true">
      <path d={MARKS[kind]} fill="none" stroke="currentColor" strokeWidth="1.6" />
    </svg>
  );
}
