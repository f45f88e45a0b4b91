import { useEffect, useRef, useState } from 'react';
import { useStore } from 'zustand';
import type { ThemeName } from '../board/styles.ts';
import type { Handle } from '../drawing/handle.ts';
import { setView, viewStore } from '../store/viewStore.ts';
import { type Board, createBoard } from './board.ts';
import type { Picture } from './picture.ts';
import { TypeBox } from './TypeBox.tsx';
import { setDown } from './tray.ts';
import './layout.css';

interface LayoutProps {
  readonly theme: ThemeName;
  readonly onBoard: (board: Board | null) => void;
  readonly say: (sentence: string) => void;
  readonly speak: (text: string | null) => void;
}

/** Several grips under one finger, offered by name. */
interface Choice {
  readonly handles: readonly Handle[];
  readonly xPx: number;
  readonly yPx: number;
}

/** The drawing with its ribbon: one board, and over it the number being typed. React draws neither rays nor grips. */
export function Layout({ theme, onBoard, say, speak }: LayoutProps) {
  const host = useRef<HTMLDivElement>(null);
  const board = useRef<Board | null>(null);
  const themeNow = useRef(theme);
  const [choice, setChoice] = useState<Choice | null>(null);
  const [frame, setFrame] = useState(0);
  const typing = useStore(viewStore, (view) => view.typing);
  const typingNow = useRef(typing);
  typingNow.current = typing;

  // The board lives as long as the element; what it calls reads the newest props from refs.
  const client = useRef({ say, speak, onBoard });
  client.current = { say, speak, onBoard };
  useEffect(() => {
    if (!host.current) return;
    const made = createBoard(host.current, {
      theme: () => themeNow.current,
      say: (sentence) => client.current.say(sentence),
      speak: (text) => client.current.speak(text),
      choose: (handles, xPx, yPx) => setChoice({ handles, xPx, yPx }),
      setDown: (spot) => {
        const { placing } = viewStore.getState();
        if (placing) setDown(placing, spot);
      },
      onFrame: () => {
        if (typingNow.current) setFrame((count) => count + 1);
      },
    });
    board.current = made;
    client.current.onBoard(made);
    return () => {
      client.current.onBoard(null);
      made.destroy();
    };
  }, []);

  useEffect(() => {
    themeNow.current = theme;
    board.current?.repaint();
  }, [theme]);

  return (
    <div className="layout">
      <section
        ref={host}
        className="board"
        data-drawing
        // biome-ignore lint/a11y/noNoninteractiveTabindex: the drawing takes keys; its grips are real sliders inside it
        tabIndex={0}
        aria-label="Drawing and ribbon"
      />
      <Typed key={typing ?? ''} board={board.current} typing={typing} frame={frame} />
      {choice && (
        <div
          className="grip-choice"
          style={{ left: Math.max(8, choice.xPx - 80), top: choice.yPx + 16 }}
          role="menu"
          aria-label="Which one?"
        >
          {choice.handles.slice(0, 4).map((handle) => (
            <button
              key={handle.id}
              type="button"
              role="menuitem"
              onClick={() => {
                setChoice(null);
                if (handle.selects) setView({ selection: [handle.selects] });
                board.current?.focusGrip(handle.id);
                if (handle.id.startsWith('cell:')) board.current?.type(handle.id);
              }}
            >
              {handle.label}
            </button>
          ))}
        </div>
      )}
    </div>
  );
}

/** A focal length is typed at its part: its focal points may be far away. */
function placeOfEntry(handle: Handle, { handles }: Picture): Handle {
  const part = handle.id.startsWith('focal:') && handles.find(({ id }) => id === `part:${handle.selects}`);
  return part ? { ...handle, xPx: part.xPx, yPx: (part.line?.topPx ?? part.yPx) - 34 } : handle;
}

interface TypedProps {
  readonly board: Board | null;
  readonly typing: string | null;
  /** Counts the frames while something is typed, so that a grip made in this frame is found in the next. */
  readonly frame: number;
}

function Typed({ board, typing }: TypedProps) {
  const picture = board?.picture();
  const handle = picture?.handles.find(({ id }) => id === typing);
  if (!picture || !handle?.entry) return null;
  return (
    <TypeBox
      handle={placeOfEntry(handle, picture)}
      entry={handle.entry}
      picture={picture}
      onClose={(back) => {
        setView({ typing: null });
        if (back) board?.focusGrip(handle.id);
      }}
    />
  );
}
