import type { PositionId } from '../../engine/index.ts';
import { copyPosition, movePosition, removePosition, renamePosition } from '../../engine/index.ts';
import { useReadingNow } from '../live/reading.ts';
import type { IconName } from '../ui/Icon.tsx';
import { Icon } from '../ui/Icon.tsx';
import { Popover } from '../ui/Popover.tsx';
import { TextField } from '../ui/TextField.tsx';
import { tryEdit } from './edit.ts';
import { addPositionHere, goToPosition } from './steps.ts';
import './positions.css';

/** A button that opens the list of positions. */
export function PositionsButton() {
  return (
    <Popover label="Positions" button={<Icon name="down" />}>
      {() => <Positions />}
    </Popover>
  );
}

/** The list of positions: go to, rename, copy, reorder, remove, add. */
export function Positions() {
  const positions = useReadingNow(({ sketch }) => sketch.positions);
  return (
    <section className="positions" aria-label="Positions">
      <ul>
        {positions.map(({ id, name }, index) => (
          <PositionRow key={id} id={id} name={name} index={index} count={positions.length} />
        ))}
      </ul>
      <button type="button" className="text-button" onClick={addPositionHere}>
        <Icon name="plus" /> Add position
      </button>
    </section>
  );
}

interface PositionRowProps {
  readonly id: PositionId;
  readonly name: string;
  readonly index: number;
  readonly count: number;
}

function PositionRow({ id, name, index, count }: PositionRowProps) {
  const here = useReadingNow(({ setting }) => setting.at === id && setting.toNext === 0);
  const act = (verb: string, icon: IconName, disabled: boolean, run: () => void) => (
    <button
      type="button"
      className="icon-button"
      aria-label={`${verb} ${name}`}
      title={verb}
      disabled={disabled}
      onClick={run}
    >
      <Icon name={icon} size={14} />
    </button>
  );
  const remove = () => {
    tryEdit((sketch) => removePosition(sketch, id));
  };
  return (
    <li className="positions-row">
      <button
        type="button"
        className="positions-go"
        aria-current={here ? 'true' : undefined}
        aria-label={`Go to ${name}`}
        onClick={() => goToPosition(id)}
      >
        {index + 1}
      </button>
      <TextField
        label={`Name of position ${index + 1}`}
        labelHidden
        value={name}
        onCommit={(text) => tryEdit((sketch) => renamePosition(sketch, id, text.trim()))}
      />
      {act('Move up', 'up', index === 0, () => tryEdit((sketch) => movePosition(sketch, id, index - 1)))}
      {act('Move down', 'down', index === count - 1, () =>
        tryEdit((sketch) => movePosition(sketch, id, index + 1)),
      )}
      {act('Copy', 'copy', false, () => tryEdit((sketch) => copyPosition(sketch, id)))}
      {act('Remove', 'remove', count === 1, remove)}
    </li>
  );
}
