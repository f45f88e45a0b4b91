import type { KeyboardEvent, PointerEvent } from 'react';
import { useRef } from 'react';
import { settingAt } from '../../engine/index.ts';
import { analysisOf } from '../live/analysis.ts';
import type { Reading } from '../live/reading.ts';
import { currentReading, useReading } from '../live/reading.ts';
import { setView } from '../store/viewStore.ts';
import { formatNumber } from '../ui/format.ts';
import { settingName } from './names.ts';
import { PositionsButton } from './Positions.tsx';
import { addPositionHere, goToPosition, settingOf, standOf } from './steps.ts';
import './scrubber.css';

/** Of a step between two stops. */
const FINE_STEP = 0.05;
/** A drag that comes this near a stop stands on it. */
const CATCH_PX = 7;
/** More names than this do not fit under the track. */
const MOST_NAMES = 5;

/** Moves through the positions, also between them: stops by tap, the thumb by drag, all of it by keys. */
export function Scrubber() {
  const count = useReading(({ sketch }) => sketch.positions.length);
  const isBetween = useReading(({ setting }) => setting.toNext > 0);
  return (
    <div className="scrubber">
      {count > 1 && <Track count={count} />}
      <div className="scrubber-side">
        {isBetween && <span className="scrubber-between">between</span>}
        <button type="button" className="text-button scrubber-add" onClick={addPositionHere}>
          {isBetween ? 'Add position here' : '+ position'}
        </button>
        {count > 1 && <PositionsButton />}
      </div>
    </div>
  );
}

function Track({ count }: { readonly count: number }) {
  const track = useRef<HTMLDivElement>(null);
  const ids = useReading(({ sketch }) => sketch.positions);

  const moveTo = (clientX: number) => {
    const box = track.current?.getBoundingClientRect();
    if (!box) return;
    const perStop = box.width / (count - 1);
    const stand = (clientX - box.left) / perStop;
    const stop = Math.round(stand);
    const caught = Math.abs(stand - stop) * perStop <= CATCH_PX ? stop : stand;
    setView({ setting: settingOf(currentReading().sketch, caught) });
  };

  const onPointerDown = (event: PointerEvent<HTMLDivElement>) => {
    if (event.button !== 0) return;
    event.currentTarget.setPointerCapture(event.pointerId);
    moveTo(event.clientX);
  };

  const onPointerMove = (event: PointerEvent<HTMLDivElement>) => {
    if (event.currentTarget.hasPointerCapture(event.pointerId)) moveTo(event.clientX);
  };

  return (
    <div className="scrubber-body">
      <div className="scrubber-press" onPointerDown={onPointerDown} onPointerMove={onPointerMove}>
        <div ref={track} className="scrubber-track">
          {ids.map(({ id }, index) => (
            <span key={id} className="scrubber-tick" style={{ left: `${(100 * index) / (count - 1)}%` }} />
          ))}
          <Thumb />
        </div>
      </div>
      <ol className="scrubber-stops">
        {ids.map(({ id }, index) => (
          <li key={id} style={{ left: `${(100 * index) / (count - 1)}%`, maxWidth: `${100 / (count - 1)}%` }}>
            <Stop index={index} />
          </li>
        ))}
      </ol>
    </div>
  );
}

function Thumb() {
  const stand = useReading(({ sketch, setting }) => standOf(sketch, setting));
  const last = useReading(({ sketch }) => sketch.positions.length - 1);
  const words = useReading(thumbWords);

  const onKeyDown = (event: KeyboardEvent) => {
    const { sketch, setting } = currentReading();
    const target = keyTarget(event, standOf(sketch, setting), last);
    if (target === null) return;
    event.preventDefault();
    setView({ setting: settingOf(sketch, target) });
  };

  return (
    <div
      className="scrubber-thumb"
      style={{ left: `${(100 * stand) / last}%` }}
      role="slider"
      tabIndex={0}
      aria-label="Scrubber"
      aria-valuemin={1}
      aria-valuemax={last + 1}
      aria-valuenow={Number((stand + 1).toFixed(3))}
      aria-valuetext={words}
      onKeyDown={onKeyDown}
    />
  );
}

function thumbWords(reading: Reading): string {
  const { sketch, setting } = reading;
  const name = settingName(sketch, setting);
  return setting.toNext > 0 ? `${name}, ${Math.round(100 * setting.toNext)} % of the way` : name;
}

/** Where a key takes the thumb: arrows finely, with Shift and Page to the next stop, the ends, 1 to 9; null for any other key. */
export function keyTarget(
  event: Pick<KeyboardEvent, 'key' | 'shiftKey'>,
  stand: number,
  last: number,
): number | null {
  const forward = ['ArrowRight', 'ArrowUp', 'PageUp'].includes(event.key);
  const back = ['ArrowLeft', 'ArrowDown', 'PageDown'].includes(event.key);
  if (forward || back) {
    const byStop = event.shiftKey || event.key.startsWith('Page');
    if (byStop) return forward ? Math.floor(stand) + 1 : Math.ceil(stand) - 1;
    const steps = Math.round(stand / FINE_STEP) + (forward ? 1 : -1);
    return steps * FINE_STEP;
  }
  if (event.key === 'Home') return 0;
  if (event.key === 'End') return last;
  return /^[1-9]$/.test(event.key) && Number(event.key) <= last + 1 ? Number(event.key) - 1 : null;
}

function Stop({ index }: { readonly index: number }) {
  const name = useReading(({ sketch }) => sketch.positions[index]?.name ?? '');
  const here = useReading(({ sketch, setting }) => standOf(sketch, setting) === index);
  const magnification = useReading((reading) => magnificationAt(reading, index));
  const named = useReading(
    ({ sketch, setting }) =>
      sketch.positions.length <= MOST_NAMES ||
      index === 0 ||
      index === sketch.positions.length - 1 ||
      Math.round(standOf(sketch, setting)) === index,
  );
  const id = useReading(({ sketch }) => sketch.positions[index]?.id);
  return (
    <button
      type="button"
      className={named ? 'scrubber-stop' : 'scrubber-stop scrubber-stop-small'}
      aria-current={here ? 'true' : undefined}
      aria-label={`Go to ${name}${magnification === '' ? '' : `, magnification ${magnification}`}`}
      title={name}
      onClick={() => id !== undefined && goToPosition(id)}
    >
      {named ? (
        <>
          <span className="scrubber-name">{name}</span>
          {magnification !== '' && <span className="scrubber-m">{magnification}</span>}
        </>
      ) : (
        '·'
      )}
    </button>
  );
}

function magnificationAt({ sketch }: Reading, index: number): string {
  const position = sketch.positions[index];
  if (position === undefined) return '';
  const { magnification } = analysisOf(sketch, settingAt(position.id)).conjugates;
  return magnification.ok ? formatNumber(magnification.value, 3) : '';
}
