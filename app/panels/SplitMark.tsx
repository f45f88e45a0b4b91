import { currentReading, useReadingNow } from '../live/reading.ts';
import { applyEdit } from '../store/sketchStore.ts';
import type { PerPositionEdits } from './perPosition.ts';
import './card.css';

interface SplitMarkProps extends PerPositionEdits {
  /** Of the value that the mark belongs to. */
  readonly label: string;
}

/** "= all" beside a value that is the same at all positions, "each" beside one that is not; a press changes it. */
export function SplitMark({ label, isCommon, split, join }: SplitMarkProps) {
  const state = useReadingNow(({ sketch }) =>
    sketch.positions.length < 2 ? 'single' : isCommon(sketch) ? 'common' : 'each',
  );
  const isBetween = useReadingNow(({ setting }) => setting.toNext > 0);
  if (state === 'single') return null;
  const common = state === 'common';
  return (
    <button
      type="button"
      className="split-mark"
      disabled={!common && isBetween}
      aria-label={
        common
          ? `${label} is the same at all positions: give each its own`
          : `${label} has its own value at each position: make this one that of all`
      }
      title={
        common
          ? 'The same at all positions. Press to give each its own.'
          : 'Its own at each position. Press to make this one that of all.'
      }
      onClick={() => applyEdit(common ? split : join(currentReading()))}
    >
      {common ? '= all' : 'each'}
    </button>
  );
}
