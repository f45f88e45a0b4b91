import type { Edit, Field, FieldSize, Sketch } from '../../../engine/index.ts';
import {
  fixSensor,
  indexOf,
  isCommon,
  setAperture,
  setField,
  setObjectDistance,
  setStopDiameter,
} from '../../../engine/index.ts';
import { snapTo } from '../../board/snap.ts';
import { xOf, yOf } from '../../board/viewport.ts';
import { catchesFor } from '../catches.ts';
import type { Handle, LayoutDrag } from '../handle.ts';
import { BETWEEN, plainMove } from '../handle.ts';
import { objectTipPx } from '../layers/ends.ts';
import type { Sight } from '../sight.ts';

/** Change of a folded object's distance or height for each px of drag. */
const FOLDED_PER_PX = 0.002;
/** No drag shrinks a length or a height below this; a height that is smaller has no grip. */
const LEAST_MM = 0.01;
/** A drag never scales aperture or field by more than this at once. */
const MOST_RATIO = 1000;

/** The grips of the stop's edges, the object, the image plane and the field's end. */
export function endHandles(sight: Sight): readonly Handle[] {
  return [...stopHandles(sight), ...objectHandles(sight), ...imageHandles(sight), ...fieldEnd(sight)];
}

function stopHandles(sight: Sight): readonly Handle[] {
  const { scene, view, reading } = sight;
  const { stop } = scene;
  if (!stop || stop.semiMm < LEAST_MM) return [];
  const { sketch, setting } = reading;
  const selected = scene.parts.some((part) => part.carriesStop && part.selected);
  const set = (semiMm: number): Edit => {
    const ratio = limited(Math.max(LEAST_MM, semiMm) / stop.semiMm);
    return (before) => scaleAperture(before, ratio, 2 * Math.max(LEAST_MM, semiMm), setting.at);
  };
  const { aperture } = sketch;
  const held = setting.toNext !== 0 && aperture.kind === 'stopDiameter' && !isCommon(aperture.diameterMm);
  return ([1, -1] as const).map((side) => ({
    id: `stop:${side > 0 ? 'upper' : 'lower'}`,
    order: selected ? 4 : 5.5,
    xPx: xOf(view, stop.zMm),
    yPx: yOf(view, side * stop.semiMm),
    line: null,
    cursor: 'ns-resize',
    label: `stop, ${side > 0 ? 'upper' : 'lower'} edge`,
    slider: {
      valueNow: 2 * stop.semiMm,
      valueText: `stop diameter ${sight.length(2 * stop.semiMm)}`,
      orientation: 'vertical',
    },
    tabStop: selected && side > 0,
    selects: sketch.stop,
    look: selected ? 'square' : 'none',
    drag: held
      ? null
      : (drag: LayoutDrag) => {
          const semi = Math.max(LEAST_MM, stop.semiMm + side * drag.dyMm);
          return plainMove(set(semi), `stop ⌀ ${sight.length(2 * semi)}`);
        },
    step: held ? null : (amountMm: number) => set(stop.semiMm + side * amountMm),
    entry: held
      ? null
      : {
          label: 'stop diameter',
          unit: 'mm',
          value: 2 * stop.semiMm,
          set: (diameter: number) => set(diameter / 2),
        },
    why: held ? BETWEEN : null,
  }));
}

/** The aperture opened by `ratio`, in the kind it is given in; a stop diameter becomes exactly `diameterMm`. */
function scaleAperture(
  sketch: Sketch,
  ratio: number,
  diameterMm: number,
  at: Sight['reading']['setting']['at'],
): Sketch {
  const { aperture } = sketch;
  switch (aperture.kind) {
    case 'stopDiameter':
      return setStopDiameter(sketch, diameterMm, at);
    case 'workingFNumber':
    case 'infinityFNumber':
      return setAperture(sketch, { ...aperture, fNumber: aperture.fNumber / ratio });
    case 'objectNA':
      return setAperture(sketch, { ...aperture, na: scaledNA(sketch, aperture.na, ratio) });
    case 'entrancePupilDiameter':
      return setAperture(sketch, { ...aperture, diameterMm: aperture.diameterMm * ratio });
  }
}

/** The marginal slope is what scales: NA = n sin(arctan u). */
function scaledNA({ object, lines, air }: Sketch, na: number, ratio: number): number {
  const known = indexOf(object.medium, lines.mainNm, lines, air);
  const index = known.ok ? known.value : 1;
  return index * Math.sin(Math.atan(Math.tan(Math.asin(Math.min(1, na / index))) * ratio));
}

function objectHandles(sight: Sight): readonly Handle[] {
  const { scene, view, reading } = sight;
  const { objectMm } = scene.stage;
  if (objectMm === null) return [];
  const { sketch, setting } = reading;
  const folded = view.fold !== null;
  const distanceMm = -objectMm;
  const held = setting.toNext !== 0 && !isCommon(sketch.object.distanceMm);
  const set =
    (value: number): Edit =>
    (before) =>
      setObjectDistance(before, value, setting.at);
  const footPx = yOf(view, 0);
  const tipPx = objectTipPx(view, scene.objectHeightMm ?? 0);
  const foot: Handle = {
    id: 'object:foot',
    order: 7,
    xPx: xOf(view, objectMm),
    yPx: footPx,
    line: { topPx: Math.min(footPx, tipPx), bottomPx: Math.max(footPx, tipPx) },
    cursor: 'ew-resize',
    label: 'object, distance',
    slider: {
      valueNow: distanceMm,
      valueText: `object ${sight.length(distanceMm)} away`,
      orientation: 'horizontal',
    },
    tabStop: reading.view.selection.includes('object'),
    selects: 'object',
    look: 'square',
    drag: held
      ? null
      : (drag) => {
          const value = folded ? distanceMm * (1 - drag.dxPx * FOLDED_PER_PX) : distanceMm - drag.dzMm;
          const next = Math.max(LEAST_MM, value);
          return plainMove(set(next), `object ${sight.length(next)} away`);
        },
    step: held ? null : (amountMm) => set(distanceMm - amountMm),
    entry: held
      ? null
      : {
          label: 'object distance',
          unit: 'mm',
          value: distanceMm,
          allowInfinity: true,
          set: (value) => (before) =>
            setObjectDistance(before, Number.isFinite(value) ? value : 'infinity', setting.at),
        },
    why: held ? BETWEEN : null,
  };
  const heightMm = scene.objectHeightMm;
  if (heightMm === null || Math.abs(heightMm) < LEAST_MM) return [foot];
  return [foot, fieldHandle(sight, 'object:tip', 'object, height', xOf(view, objectMm), tipPx, heightMm)];
}

function fieldEnd(sight: Sight): readonly Handle[] {
  const { scene, view } = sight;
  const { imageMm } = scene.stage;
  const heightMm = scene.imageHeightMm;
  if (imageMm === null || heightMm === null || Math.abs(heightMm) < LEAST_MM) return [];
  return [
    fieldHandle(sight, 'field:end', 'field, image height', xOf(view, imageMm), yOf(view, heightMm), heightMm),
  ];
}

/** A grip at an end of the chief ray: it scales the field, whatever it is given as. */
function fieldHandle(
  sight: Sight,
  id: string,
  label: string,
  xPx: number,
  yPx: number,
  heightMm: number,
): Handle {
  const { view } = sight;
  const folded = id === 'object:tip' && view.fold !== null;
  const set = (nextMm: number): Edit => {
    const ratio = limited(Math.abs(nextMm) / Math.abs(heightMm));
    return (sketch) => setField(sketch, scaledField(sketch.field, ratio));
  };
  const kept = (value: number) => Math.sign(heightMm) * Math.max(LEAST_MM, value * Math.sign(heightMm));
  return {
    id,
    order: 5,
    xPx,
    yPx,
    line: null,
    cursor: 'ns-resize',
    label,
    slider: { valueNow: heightMm, valueText: `height ${sight.length(heightMm)}`, orientation: 'vertical' },
    tabStop: id === 'field:end' || sight.reading.view.selection.includes('object'),
    selects: null,
    look: 'round',
    drag: (drag) => {
      const dyPx = drag.dyMm * view.pxPerMm * view.stretch;
      const outward = Math.sign(heightMm);
      const next = kept(folded ? heightMm * (1 + outward * dyPx * FOLDED_PER_PX) : heightMm + drag.dyMm);
      return plainMove(set(next), `height ${sight.length(next)}`);
    },
    step: (amountMm) => set(kept(heightMm + amountMm)),
    entry: { label, unit: 'mm', value: heightMm, set },
    why: null,
  };
}

/** The field `ratio` times as large: heights scale, angles by their tangent. */
function scaledField({ size }: Field, ratio: number): FieldSize {
  if (size.kind !== 'angle') return { ...size, heightMm: size.heightMm * ratio };
  const tangent = Math.tan((size.angleDeg * Math.PI) / 180) * ratio;
  return { ...size, angleDeg: (Math.atan(tangent) * 180) / Math.PI };
}

function imageHandles(sight: Sight): readonly Handle[] {
  const { scene, view, reading } = sight;
  const { imageMm } = scene.stage;
  const { sketch, setting } = reading;
  const last = sketch.parts.at(-1);
  const rearMm = scene.parts.at(-1)?.rearMm;
  if (imageMm === null || !last || rearMm === undefined) return [];
  const held = setting.toNext !== 0 && scene.sensorFixed && !isCommon(last.space.lengthMm);
  const set =
    (distanceMm: number): Edit =>
    (before) =>
      fixSensor(before, distanceMm, setting.at);
  const semiMm = scene.sensorSemiMm ?? 0;
  return [
    {
      id: 'image',
      order: 7,
      xPx: xOf(view, imageMm),
      yPx: yOf(view, 0),
      line: { topPx: yOf(view, semiMm), bottomPx: yOf(view, -semiMm) },
      cursor: 'ew-resize',
      label: scene.sensorFixed ? 'sensor, position' : 'image, follows the focus',
      slider: {
        valueNow: imageMm - rearMm,
        valueText: `${sight.length(imageMm - rearMm)} behind the last part`,
        orientation: 'horizontal',
      },
      tabStop: reading.view.selection.includes('image'),
      selects: 'image',
      look: 'none',
      drag: held
        ? null
        : (drag) => {
            const catches = catchesFor(sight, []).filter(({ name }) => name !== 'sensor');
            const image = reading.analysis.conjugates.imageDistanceMm;
            const focus = image.ok ? [{ at: rearMm + image.value, name: 'paraxial image' }] : [];
            const snapped = snapTo([...focus, ...catches], imageMm + drag.dzMm, drag.toleranceMm, drag.snap);
            const distanceMm = snapped.value - rearMm;
            return { ...plainMove(set(distanceMm), sight.length(distanceMm)), caught: snapped.caught };
          },
      step: held ? null : (amountMm) => set(imageMm - rearMm + amountMm),
      entry: held ? null : { label: 'sensor behind the last part', unit: 'mm', value: imageMm - rearMm, set },
      why: held ? BETWEEN : null,
    },
  ];
}

const limited = (ratio: number): number => Math.min(MOST_RATIO, Math.max(1 / MOST_RATIO, ratio));
