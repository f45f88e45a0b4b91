import { expect } from 'vitest';
import { roughMeasure } from '../../../app/board/measure.ts';
import type { Viewport } from '../../../app/board/viewport.ts';
import type { Handle, LayoutDrag, Move } from '../../../app/drawing/handle.ts';
import type { Scene } from '../../../app/drawing/scene.ts';
import { type Sight, sightOf } from '../../../app/drawing/sight.ts';
import { fitCamera, foldIn, type Size, viewportOf } from '../../../app/layout/camera.ts';
import { type Picture, pictureOf, sceneOfReading } from '../../../app/layout/picture.ts';
import { analysisOf } from '../../../app/live/analysis.ts';
import type { View } from '../../../app/store/viewStore.ts';
import type { Edit, PartId, Setting, Sketch } from '../../../engine/index.ts';
import { emptySketch, newPlate, newThin, propose, settingAt, unsettled } from '../../../engine/index.ts';
import { inspectionZoom, MIDDLE } from '../../engine/demo.ts';
import { readingOf } from '../reading.ts';

export const DESKTOP: Size = { widthPx: 1100, heightPx: 620 };
export const PHONE: Size = { widthPx: 390, heightPx: 420 };

export const AT_MIDDLE: Setting = settingAt(MIDDLE);
export const BETWEEN_MIDDLE_AND_NARROW: Setting = { at: MIDDLE, toNext: 0.5 };

/** Everything that may be switched on in the drawing. */
export const ALL_SHOWN: View['shown'] = {
  bundles: true,
  images: true,
  pupils: true,
  principalPlanes: true,
  focalPoints: true,
  equivalentGaps: false,
  labels: true,
};

/** A plate of 6 mm between two thin elements, 10 mm behind the first and 5 mm in front of the second. */
export const withPlate = (): Sketch => ({
  ...emptySketch(),
  parts: [
    { ...newThin(50, 'p1' as PartId), space: { lengthMm: 10, medium: 'air' } },
    { ...newPlate(6, 'p2' as PartId), space: { lengthMm: 5, medium: 'air' } },
    newThin(80, 'p3' as PartId),
  ],
});

export const sceneFor = (sketch: Sketch, change: Partial<View> = {}): Scene =>
  sceneOfReading(readingOf(sketch, change));

/** The view that a fit gives on a board of that size. */
export function fittedView(
  scene: Scene,
  size: Size = DESKTOP,
  what: 'parts' | 'everything' = 'parts',
): Viewport {
  const camera = fitCamera(scene, size, what);
  return viewportOf(camera, size, foldIn(scene, camera));
}

/** The picture of a sketch, fitted. */
export function pictureFor(
  sketch: Sketch,
  change: Partial<View> = {},
  size: Size = DESKTOP,
  what: 'parts' | 'everything' = 'parts',
): Picture {
  const reading = readingOf(sketch, change);
  const scene = sceneOfReading(reading);
  return pictureOf(reading, fittedView(scene, size, what), roughMeasure, scene);
}

/** What handles are made from, in a fitted view. */
export function sightFor(sketch: Sketch, change: Partial<View> = {}, size: Size = DESKTOP): Sight {
  const reading = readingOf(sketch, change);
  const scene = sceneOfReading(reading);
  return sightOf(reading, scene, fittedView(scene, size));
}

/** The demo at its middle position. */
export const demoPicture = (change: Partial<View> = {}, size: Size = DESKTOP): Picture =>
  pictureFor(inspectionZoom(), { setting: AT_MIDDLE, ...change }, size);

/** The grip of that id; fails when the picture has none. */
export function grip({ handles }: Pick<Picture, 'handles'>, id: string): Handle {
  const found = handles.find((handle) => handle.id === id);
  expect(found, `grip ${id}`).toBeDefined();
  return found as Handle;
}

/** A drag in mm without snapping; what is left out is 0. */
export const pull = (change: Partial<LayoutDrag>): LayoutDrag => ({
  dzMm: 0,
  dyMm: 0,
  dxPx: 0,
  other: false,
  snap: false,
  toleranceMm: 0,
  ...change,
});

/** What a drag of the grip comes to; fails when it cannot be dragged. */
export function moveOf(handle: Handle, change: Partial<LayoutDrag>): Move {
  expect(handle.drag, `drag of ${handle.id}`).not.toBeNull();
  return (handle.drag as NonNullable<Handle['drag']>)(pull(change));
}

/** The sketch after an edit through the one door, whatever became of it. */
export const kept = (sketch: Sketch, edit: Edit): Sketch => propose(sketch, edit, unsettled).sketch;

/** The sketch after an edit; fails when it is refused. */
export function edited(sketch: Sketch, edit: Edit): Sketch {
  const { sketch: next, note } = propose(sketch, edit, unsettled);
  expect(note).toBeNull();
  return next;
}

/** Where the fronts of all parts stand at a setting, mm from the first. */
export const frontsOf = (sketch: Sketch, setting: Setting = AT_MIDDLE): number[] =>
  analysisOf(sketch, setting).places.parts.map(({ frontMm }) => frontMm);

/** The part of that id. */
export const partOf = (sketch: Sketch, id: string) => sketch.parts.find((part) => part.id === (id as PartId));

/** Every number of a sketch with its path, for comparing two sketches up to rounding. */
function numbersIn(value: unknown, path = ''): readonly (readonly [string, number])[] {
  if (typeof value === 'number') return [[path, value]];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, inner]) => numbersIn(inner, `${path}.${key}`));
}

/** Fails unless both sketches hold the same fields, with numbers alike within `tolerance` of their size or of 1. */
export function expectAlike(one: Sketch, other: Sketch, tolerance: number): void {
  const numbers = numbersIn(one);
  const others = numbersIn(other);
  expect(others.map(([path]) => path)).toEqual(numbers.map(([path]) => path));
  for (const [i, [path, value]] of numbers.entries()) {
    const second = others[i]?.[1] ?? Number.NaN;
    const allowed = tolerance * Math.max(1, Math.abs(value));
    if (!(Math.abs(second - value) <= allowed)) expect([path, second]).toEqual([path, value]);
  }
}
