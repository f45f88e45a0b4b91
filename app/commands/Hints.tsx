import { useEffect, useState } from 'react';
import { useReading } from '../live/reading.ts';
import type { Document } from '../store/document.ts';
import { sketchStore } from '../store/sketchStore.ts';
import { setView, viewStore } from '../store/viewStore.ts';
import { Icon } from '../ui/Icon.tsx';
import './hints.css';

const HINTS = [
  { id: 'drag', text: 'Drag a part along the axis: rays and numbers follow.' },
  { id: 'type', text: 'Click a dimension and type. Everything behind it moves along.' },
  { id: 'step', text: 'Step through the positions above, or press 1, 2, 3.' },
] as const;

type HintId = (typeof HINTS)[number]['id'];

/** Three short hints at the edges of the drawing on the first run. Each is dismissed by itself; none is in the way. */
export function Hints() {
  const wanted = useReading((reading) => reading.view.hints);
  const empty = useReading(({ sketch }) => sketch.parts.length === 0);
  const [seen, setSeen] = useState<readonly HintId[]>([]);
  useEffect(() => sketchStore.subscribe(endWithFirstChange), []);
  if (!wanted || empty) return null;

  const dismiss = (id: HintId) => {
    const next = [...seen, id];
    if (next.length === HINTS.length) setView({ hints: false });
    else setSeen(next);
  };

  return (
    <aside className="hints" aria-label="Hints">
      {HINTS.filter(({ id }) => !seen.includes(id)).map(({ id, text }) => (
        <p key={id} className={`hints-hint hints-${id}`}>
          {text}
          <button
            type="button"
            className="icon-button"
            aria-label={`Dismiss the hint: ${text}`}
            onClick={() => dismiss(id)}
          >
            <Icon name="close" size={12} />
          </button>
        </p>
      ))}
    </aside>
  );
}

/** Whoever has changed something, or opened another sketch, needs no hint any more. */
function endWithFirstChange({ sketch }: Document, before: Document): void {
  const changed = sketch !== before.sketch && before.sketch.parts.length > 0;
  if (changed && viewStore.getState().hints) setView({ hints: false });
}
