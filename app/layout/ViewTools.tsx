import { useStore } from 'zustand';
import { viewStore } from '../store/viewStore.ts';
import { Icon } from '../ui/Icon.tsx';
import type { Board } from './board.ts';
import './viewTools.css';

interface ViewToolsProps {
  readonly board: () => Board | null;
}

const STEP = 1.25;

/** Fits, zoom and the stretch of heights for a hand without wheel or keys. */
export function ViewTools({ board }: ViewToolsProps) {
  const follow = useStore(viewStore, (view) => view.camera.follow);
  return (
    <div className="view-tools" role="toolbar" aria-label="View of the drawing">
      <button type="button" aria-pressed={follow === 'parts'} onClick={() => board()?.fit('parts')}>
        fit parts
      </button>
      <button type="button" aria-pressed={follow === 'everything'} onClick={() => board()?.fit('everything')}>
        fit all
      </button>
      <Pair name="zoom" change={(factor) => board()?.zoomBy(factor)} />
      <Pair name="heights" change={(factor) => board()?.stretchBy(factor)} />
    </div>
  );
}

interface PairProps {
  readonly name: string;
  readonly change: (factor: number) => void;
}

function Pair({ name, change }: PairProps) {
  return (
    <span className="view-tools-pair">
      <button type="button" aria-label={`${name}, less`} onClick={() => change(1 / STEP)}>
        <Icon name="minus" />
      </button>
      {name}
      <button type="button" aria-label={`${name}, more`} onClick={() => change(STEP)}>
        <Icon name="plus" />
      </button>
    </span>
  );
}
