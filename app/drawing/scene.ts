import type { Analysis, ParaxialRay, PartId, Sketch, Train, Warning } from '../../engine/index.ts';
import { halfDiagonal, heightInSpace } from '../../engine/index.ts';
import type { ExactView, View } from '../store/viewStore.ts';
import type { ExactRays } from './exact/rays.ts';
import { axialPupil, fieldPupils } from './pupilPoints.ts';
import { faultsIn, partsOf, type SceneFault, type ScenePart } from './sceneParts.ts';
import { type Stage, stageOf } from './stage.ts';

/** A ray as it is drawn: z and y in mm, alternating, from the stage's start to its end. */
export type RayLine = Float64Array;

export type { ScenePart } from './sceneParts.ts';

/** Off-axis rays of one field; `share` is its fraction of the largest field. */
export interface SceneBundle {
  readonly share: number;
  readonly rays: readonly RayLine[];
}

/** Exact rays and how they are shown; `rays` is null when none are asked for, or there are none. */
export interface SceneExact {
  readonly shown: ExactView;
  readonly rays: ExactRays | null;
}

/** An image between two parts (or in front of all of them), as arrow from the axis to the full field's height. */
export interface SceneImage {
  /** Index of the part that forms it. */
  readonly partIndex: number;
  readonly zMm: number;
  readonly heightMm: number;
  readonly real: boolean;
  /** It serves the part behind as an object beyond it. */
  readonly objectOf: number | null;
  /** Marginal ray's straight extension to the image, where light itself does not go; null when light gets there. */
  readonly extension: RayLine | null;
}

/** An upright mark of a plane, with half its size where it has one. */
export interface ScenePlane {
  readonly name:
    | 'entrance pupil'
    | 'exit pupil'
    | 'front principal plane'
    | 'rear principal plane'
    | 'front focus'
    | 'rear focus';
  readonly zMm: number;
  readonly semiMm: number | null;
}

/** The layout at one setting, in mm from the first part's front vertex: all that the layers draw. */
export interface Scene {
  readonly stage: Stage;
  readonly parts: readonly ScenePart[];
  /** What cannot be made as it is drawn. */
  readonly faults: readonly SceneFault[];
  readonly stop: { readonly zMm: number; readonly semiMm: number } | null;
  readonly marginal: readonly RayLine[];
  readonly chief: RayLine | null;
  readonly axial: readonly RayLine[];
  readonly bundles: readonly SceneBundle[];
  /** What exact rays do beside these; null where both are the same, in a layout of ideal thin parts. */
  readonly exact: SceneExact | null;
  readonly images: readonly SceneImage[];
  readonly planes: readonly ScenePlane[];
  /** Height of the largest field's object point; null at infinity. */
  readonly objectHeightMm: number | null;
  /** Where the largest field's chief ray meets the image plane. */
  readonly imageHeightMm: number | null;
  readonly sensorFixed: boolean;
  readonly sensorSemiMm: number | null;
  readonly mountMm: number | null;
  /** Tallest thing near the parts, for fitting. */
  readonly tallestMm: number;
}

/** The scene of a sketch at the view's setting, with what of `warnings` is drawn at the parts. */
export function sceneOf(
  sketch: Sketch,
  analysis: Analysis,
  view: View,
  warnings: readonly Warning[] = [],
  exact: SceneExact | null = null,
): Scene {
  const stage = stageOf(sketch, analysis);
  const { train } = analysis;
  const marginal = analysis.rays.marginal.ok ? analysis.rays.marginal.value : null;
  const chief = analysis.rays.chief.ok ? analysis.rays.chief.value : null;
  const parts = partsOf(sketch, analysis, view, stage, marginal, chief);
  const line = (share: number, pupil: number) => rayLine(train, stage, chief, share, marginal, pupil);
  const stop = stopOf(analysis, marginal);
  const sensorSemiMm = sketch.sensor ? halfDiagonal(sketch.sensor) : null;
  const tallestMm = Math.max(
    ...parts.map((part) => part.semiMm),
    stop?.semiMm ?? 0,
    sensorSemiMm ?? 0,
    Number.MIN_VALUE,
  );
  return {
    stage,
    parts,
    faults: faultsIn(parts, warnings),
    stop,
    marginal: marginal ? [line(0, 1), line(0, -1)] : [],
    chief: chief ? line(1, 0) : null,
    axial:
      marginal && view.shown.bundles
        ? axialPupil(analysis, view.raysPerBundle).map((point) => line(0, point))
        : [],
    bundles:
      marginal && chief && view.shown.bundles
        ? fieldPupils(analysis, view.raysPerBundle).map(({ share, points }) => ({
            share,
            rays: points.map((point) => line(share, point)),
          }))
        : [],
    exact,
    images: view.shown.images && marginal ? imagesOf(sketch, analysis, stage, marginal, chief) : [],
    planes: planesOf(analysis, view),
    objectHeightMm: stage.objectMm !== null && chief ? heightInSpace(train, chief, 0, stage.objectMm) : null,
    imageHeightMm:
      stage.imageMm !== null && chief ? heightInSpace(train, chief, train.count, stage.imageMm) : null,
    sensorFixed: sketch.image === 'fixed',
    sensorSemiMm,
    mountMm: sketch.registerMm !== null && stage.imageMm !== null ? stage.imageMm - sketch.registerMm : null,
    tallestMm: parts.length === 0 ? 0 : tallestMm,
  };
}

/**
 * How far from the axis (mm) the drawn rays are where they come into the sheet at `zMm`, in front of the parts. Far-off objects would
 * flatten everything else, so it counts up to twice the tallest part.
 */
export function tallestAt({ bundles, axial, tallestMm }: Scene, zMm: number): number {
  const lines = [...axial, ...bundles.flatMap(({ rays }) => rays)];
  const heights = lines.map((line) => Math.abs(heightOnFirstStretch(line, zMm)));
  return Math.max(tallestMm, Math.min(2 * tallestMm, Math.max(0, ...heights)));
}

/** Height in mm of a ray's line at `zMm`, along the straight line of its first stretch. */
export function heightOnFirstStretch(line: RayLine, zMm: number): number {
  const [z0 = 0, y0 = 0, z1 = 0, y1 = 0] = line;
  return z1 === z0 ? y0 : y0 + ((y1 - y0) * (zMm - z0)) / (z1 - z0);
}

function stopOf({ pupils, train }: Analysis, marginal: ParaxialRay | null): Scene['stop'] {
  const surface = pupils.stopSurface;
  if (!surface.ok || !marginal) return null;
  return { zMm: train.z[surface.value] ?? 0, semiMm: Math.abs(marginal.y[surface.value] ?? 0) };
}

/** A straight-line drawing of share · chief + pupil · marginal. */
function rayLine(
  train: Train,
  stage: Stage,
  chief: ParaxialRay | null,
  share: number,
  marginal: ParaxialRay | null,
  pupil: number,
): RayLine {
  const points = new Float64Array(2 * (train.count + 2));
  const combine = (of: (ray: ParaxialRay) => number) =>
    (chief && share !== 0 ? share * of(chief) : 0) + (marginal && pupil !== 0 ? pupil * of(marginal) : 0);
  points[0] = stage.startMm;
  points[1] = combine((ray) => heightInSpace(train, ray, 0, stage.startMm));
  for (let k = 0; k < train.count; k++) {
    points[2 * k + 2] = train.z[k] ?? 0;
    points[2 * k + 3] = combine((ray) => ray.y[k] ?? 0);
  }
  points[2 * train.count + 2] = stage.endMm;
  points[2 * train.count + 3] = combine((ray) => heightInSpace(train, ray, train.count, stage.endMm));
  return points;
}

function imagesOf(
  sketch: Sketch,
  { ledger, train, places }: Analysis,
  stage: Stage,
  marginal: ParaxialRay,
  chief: ParaxialRay | null,
): SceneImage[] {
  const images: SceneImage[] = [];
  // Images further away than the parts are long are told by the ledger; drawn, their lines would only cross the sheet.
  const lengthMm = stage.parts.toMm - stage.parts.fromMm;
  for (const [row, entry] of ledger.entries()) {
    const next = ledger[row + 1];
    // What a plate only shifts is no image of its own.
    const shifts = sketch.parts[entry.partIndex]?.kind === 'plate';
    if (!entry.imageZ.ok || !next || shifts) continue;
    const zMm = entry.imageZ.value;
    if (zMm < stage.parts.fromMm - lengthMm || zMm > stage.parts.toMm + lengthMm) continue;
    const last = lastSurfaceOf(train, entry.partIndex);
    const nextFrontMm = places.parts[next.partIndex]?.frontMm ?? 0;
    const rearMm = places.parts[entry.partIndex]?.rearMm ?? 0;
    const reached = zMm >= rearMm && zMm <= nextFrontMm;
    images.push({
      partIndex: entry.partIndex,
      zMm,
      heightMm: chief ? heightInSpace(train, chief, last + 1, zMm) : 0,
      real: reached,
      objectOf: zMm > nextFrontMm ? next.partIndex : null,
      extension: reached ? null : Float64Array.of(train.z[last] ?? 0, marginal.y[last] ?? 0, zMm, 0),
    });
  }
  return images;
}

function lastSurfaceOf(train: Train, partIndex: number): number {
  let last = 0;
  for (let k = 0; k < train.count; k++) if (train.partOf[k] === partIndex) last = k;
  return last;
}

function planesOf({ firstOrder, pupils }: Analysis, { shown }: View): ScenePlane[] {
  const planes: ScenePlane[] = [];
  const lastMm = firstOrder.vertexLengthMm;
  const { principalFrontMm, principalRearMm, frontFocusMm, backFocusMm } = firstOrder;
  if (shown.pupils) {
    const { entrance, exit } = pupils;
    if (entrance.zMm.ok)
      planes.push({ name: 'entrance pupil', zMm: entrance.zMm.value, semiMm: half(entrance.diameterMm) });
    if (exit.zMm.ok)
      planes.push({ name: 'exit pupil', zMm: lastMm + exit.zMm.value, semiMm: half(exit.diameterMm) });
  }
  if (shown.principalPlanes && principalFrontMm.ok && principalRearMm.ok) {
    planes.push({ name: 'front principal plane', zMm: principalFrontMm.value, semiMm: null });
    planes.push({ name: 'rear principal plane', zMm: lastMm + principalRearMm.value, semiMm: null });
  }
  if (shown.focalPoints && frontFocusMm.ok && backFocusMm.ok) {
    planes.push({ name: 'front focus', zMm: frontFocusMm.value, semiMm: null });
    planes.push({ name: 'rear focus', zMm: lastMm + backFocusMm.value, semiMm: null });
  }
  return planes;
}

const half = (diameter: Analysis['pupils']['entrance']['diameterMm']): number | null =>
  diameter.ok ? diameter.value / 2 : null;

/** The scene's part with this id. */
export const partIn = (scene: Scene, id: PartId): ScenePart | undefined =>
  scene.parts.find(({ part }) => part.id === id);
