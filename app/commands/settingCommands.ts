import type { PartId } from '../../engine/index.ts';
import {
  addPosition,
  fixSensor,
  leastSpotShift,
  releaseStop,
  rideStop,
  setImagePlane,
  settingAt,
} from '../../engine/index.ts';
import { analysisOf } from '../live/analysis.ts';
import { exactOf } from '../live/exact.ts';
import { applyEdit } from '../store/sketchStore.ts';
import { select, setView } from '../store/viewStore.ts';
import { command, selectedNow, settingNow, sketchNow } from './now.ts';
import type { CommandGroup } from './services.ts';

/** The stop on a part or free, the image plane fixed or following. */
export function stopAndImageCommands(): CommandGroup {
  return {
    title: 'Stop and image',
    commands: [
      command('rideStop', 'Let the stop ride on the selected part', [], ride, () => rideable() !== null),
      command(
        'releaseStop',
        'Release the stop from the part it rides on',
        [],
        release,
        () => carrier() !== undefined,
      ),
      command('fixSensor', 'Fix the sensor where the image is', [], fix, () => imageDistance() !== null),
      command(
        'focusLeastSpot',
        'Focus for the least spot: fix the sensor at the exact best focus',
        [],
        focusLeastSpot,
        () => sketchNow().parts.length > 0 && exactNow().setup.ok,
      ),
      command(
        'followFocus',
        'Let the image plane follow the focus',
        [],
        () => applyEdit((sketch) => setImagePlane(sketch, 'focus')),
        () => sketchNow().image === 'fixed',
      ),
    ],
  };
}

/** Going to positions and adding one. */
export function positionCommands(): CommandGroup {
  const goTo = Array.from({ length: 9 }, (_, index) =>
    command(
      `position${index + 1}`,
      `Go to position ${index + 1}`,
      [String(index + 1)],
      () => {
        const position = sketchNow().positions[index];
        if (position) setView({ setting: settingAt(position.id) });
      },
      () => index < sketchNow().positions.length,
    ),
  );
  return {
    title: 'Positions',
    commands: [...goTo, command('addPosition', 'Add a position here', ['Insert'], add)],
  };
}

/** The one selected part, when the stop can ride on it and does not yet. */
function rideable(): PartId | null {
  const [id, ...more] = selectedNow();
  if (id === undefined || more.length > 0 || sketchNow().stop === id) return null;
  const part = sketchNow().parts.find((one) => one.id === id);
  return part && part.kind !== 'stop' ? id : null;
}

function ride(): void {
  const id = rideable();
  if (id) applyEdit((sketch) => rideStop(sketch, id));
}

const carrier = () => {
  const { stop, parts } = sketchNow();
  return parts.find((part) => part.id === stop && part.kind !== 'stop');
};

function release(): void {
  applyEdit(releaseStop);
  const { stop } = sketchNow();
  if (stop) select(stop);
}

/** From the last part to the paraxial image in mm, while the image plane follows it; null when there is none. */
function imageDistance(): number | null {
  const sketch = sketchNow();
  if (sketch.image === 'fixed' || sketch.parts.length === 0) return null;
  const { imageDistanceMm } = analysisOf(sketch, settingNow()).conjugates;
  return imageDistanceMm.ok ? imageDistanceMm.value : null;
}

function fix(): void {
  const distanceMm = imageDistance();
  if (distanceMm !== null) applyEdit((sketch) => fixSensor(sketch, distanceMm));
}

const exactNow = () => exactOf(sketchNow(), settingNow());

/** Fixes the sensor where the spots of all drawn fields, in all lines, are least together. */
function focusLeastSpot(): void {
  const { setup } = exactNow();
  if (!setup.ok || !setup.value.imagePlaneMm.ok) return;
  const planeMm = setup.value.imagePlaneMm.value;
  const shift = leastSpotShift(setup.value, sketchNow().field.fractions);
  const { at, toNext } = settingNow();
  if (shift.ok && toNext === 0) applyEdit((sketch) => fixSensor(sketch, planeMm + shift.value, at));
}

function add(): void {
  const before = sketchNow().positions;
  const names = new Set(before.map((position) => position.name));
  let number = before.length + 1;
  while (names.has(`position ${number}`)) number += 1;
  const from = settingNow();
  applyEdit((sketch) => addPosition(sketch, `position ${number}`, from));
  const added = sketchNow().positions.find((position) => !before.some(({ id }) => id === position.id));
  if (added) setView({ setting: settingAt(added.id) });
}
