import { useState } from 'react';
import { useReading } from '../live/reading.ts';
import { setView } from '../store/viewStore.ts';
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
  const [seen, setSeen] = useState<readonly HintId[]>([]);
  if (!wanted) return null;

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
