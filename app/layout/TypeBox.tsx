import type { KeyboardEvent } from 'react';
import { useId, useLayoutEffect, useRef, useState } from 'react';
import type { Handle, HandleEntry } from '../drawing/handle.ts';
import { RIBBON_PX } from '../ribbon/layout.ts';
import { applyEdit, dismissNote, sketchStore } from '../store/sketchStore.ts';
import { formatEntry, parseEntry } from '../ui/entry.ts';
import type { Picture } from './picture.ts';
import './typeBox.css';

interface TypeBoxProps {
  readonly handle: Handle;
  readonly entry: HandleEntry;
  readonly picture: Picture;
  /** `back` says whether the grip takes the focus again. */
  readonly onClose: (back: boolean) => void;
}

const WIDTH_PX = 152;

/** The number of a grip, typed on the drawing: Enter or leaving commits, Escape leaves it as it was. */
export function TypeBox({ handle, entry, picture, onClose }: TypeBoxProps) {
  const id = useId();
  const input = useRef<HTMLInputElement>(null);
  const closed = useRef(false);
  const unit = picture.reading.view.unit;
  const stored = entry.value === null ? '' : formatEntry(entry.value, unit);
  const [text, setText] = useState(stored);
  const [fault, setFault] = useState<string | null>(null);

  useLayoutEffect(() => input.current?.select(), []);

  const close = (back: boolean) => {
    closed.current = true;
    onClose(back);
  };

  /** True when nothing stands in the way of closing. */
  const settle = (): boolean => {
    if (text.trim() === stored) return true;
    const typed = parseEntry(text, {
      unit,
      current: entry.value,
      allowInfinity: entry.allowInfinity ?? false,
    });
    if (!typed.ok) {
      setFault(typed.why);
      return false;
    }
    applyEdit(entry.set(typed.value));
    const { note } = sketchStore.getState();
    if (note?.kind !== 'refused') return true;
    setFault(note.faults[0]?.sentence ?? 'This value is not allowed.');
    dismissNote();
    return false;
  };

  const onKeyDown = (event: KeyboardEvent) => {
    event.stopPropagation();
    if (event.key === 'Enter') {
      event.preventDefault();
      if (settle()) close(true);
    } else if (event.key === 'Escape') {
      event.preventDefault();
      close(true);
    }
  };

  const { widthPx, heightPx } = picture.view;
  const left = Math.min(widthPx - WIDTH_PX - 8, Math.max(8, handle.xPx - WIDTH_PX / 2));
  const top = Math.min(heightPx + RIBBON_PX - 84, Math.max(8, handle.yPx - 18));

  return (
    <div className="type-box" style={{ left, top, width: WIDTH_PX }}>
      <label htmlFor={id}>{entry.label}</label>
      <span className="type-box-row">
        <input
          ref={input}
          id={id}
          // biome-ignore lint/a11y/noAutofocus: it opens because the person asked to type here
          autoFocus
          value={text}
          inputMode="text"
          autoComplete="off"
          spellCheck={false}
          aria-invalid={fault !== null}
          aria-describedby={fault ? `${id}-fault` : undefined}
          onChange={(event) => setText(event.target.value)}
          onKeyDown={onKeyDown}
          onBlur={() => {
            if (!closed.current && settle()) close(false);
          }}
        />
        <span className="type-box-unit">{unit}</span>
      </span>
      {fault && (
        <p id={`${id}-fault`} role="alert" className="type-box-fault">
          {fault}
        </p>
      )}
    </div>
  );
}
