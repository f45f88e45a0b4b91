import type { DrawnRay, ExactSetup, Lost, Train } from '../../../engine/index.ts';
import { drawnField } from '../../../engine/index.ts';
import type { Exact } from '../../live/exact.ts';
import type { Reading } from '../../live/reading.ts';
import { axialPupil, fieldPupils } from '../pupilPoints.ts';
import { type Stage, stageOf } from '../stage.ts';

/** The drawn rays that belong together, exact and paraxial through the same points of the stop. */
export interface ExactPencil {
  readonly name: 'marginal ray' | 'chief ray' | 'axial bundle' | 'off-axis bundle';
  /** Share of the largest field. */
  readonly share: number;
  readonly rays: readonly DrawnRay[];
}

/** Where the drift is largest. */
export interface Largest {
  readonly pencil: ExactPencil;
  readonly ray: DrawnRay;
  /** The surface, or the count of surfaces for the image plane. */
  readonly surface: number;
  readonly driftMm: number;
}

/** All exact rays that the drawing shows. */
export interface ExactRays {
  readonly train: Train;
  readonly setup: ExactSetup;
  readonly pencils: readonly ExactPencil[];
  /** Null when no ray meets a surface. */
  readonly largest: Largest | null;
}

/**
 * How far beyond a rim, as a share of its radius, a drawn ray may pass: the edge rays of a bundle are placed on the rims by first order,
 * and a drift too small to see shall not end them.
 */
const RIM_SLACK = 0.01;

const remembered = new WeakMap<Exact, Map<string, ExactRays | null>>();

/** The exact rays of a reading, remembered as its analysis is; null when there are none. */
export function exactRaysOf({ sketch, analysis, exact, view }: Reading): ExactRays | null {
  const known = remembered.get(exact) ?? new Map<string, ExactRays | null>();
  remembered.set(exact, known);
  const key = `${view.raysPerBundle} ${view.shown.bundles}`;
  let rays = known.get(key);
  if (rays === undefined) {
    rays = traced(exact, stageOf(sketch, analysis), pupilsOf(analysis, view));
    known.set(key, rays);
  }
  return rays;
}

type Wanted = Omit<ExactPencil, 'rays'> & { readonly points: readonly number[] };

/** What is drawn, from back to front. */
function pupilsOf(
  analysis: Reading['analysis'],
  { raysPerBundle, shown }: Reading['view'],
): readonly Wanted[] {
  const bundles: readonly Wanted[] = shown.bundles
    ? [
        ...fieldPupils(analysis, raysPerBundle).map((field) => ({
          ...field,
          name: 'off-axis bundle' as const,
        })),
        { name: 'axial bundle', share: 0, points: axialPupil(analysis, raysPerBundle) },
      ]
    : [];
  return [
    ...bundles,
    { name: 'marginal ray', share: 0, points: [1, -1] },
    { name: 'chief ray', share: 1, points: [0] },
  ];
}

function traced(exact: Exact, stage: Stage, wanted: readonly Wanted[]): ExactRays | null {
  const { setup } = exact;
  if (!setup.ok) return null;
  const [{ train }] = setup.value.lines;
  // Drawn points count along the marginal ray, those of the stop upwards.
  const up = (setup.value.marginal.y[setup.value.stopSurface] ?? 0) < 0 ? -1 : 1;
  const drawn = { fromMm: stage.startMm, toMm: stage.endMm, clip: false, aimed: true };
  const pencils = wanted.flatMap(({ points, ...pencil }): ExactPencil[] => {
    const map = exact.pencil(pencil.share);
    if (!map || points.length === 0) return [];
    const { rays } = drawnField(
      map,
      points.flatMap((point) => [0, up * point]),
      drawn,
    );
    // Marginal and chief ray are what others are measured against; rims do not end them.
    const isBundle = pencil.name.endsWith('bundle');
    return [{ ...pencil, rays: isBundle ? rays.map((ray) => endedAtRim(ray, train)) : rays }];
  });
  return { train, setup: setup.value, pencils, largest: largestOf(pencils, train.count) };
}

/** The ray as far as the first rim that it passes clearly outside of. */
export function endedAtRim(ray: DrawnRay, train: Train): DrawnRay {
  for (let k = 0; k < ray.heightDriftMm.length; k++) {
    const height = Math.abs(ray.exact[2 * k + 3] ?? 0);
    if (height <= (train.semiDiameter[k] ?? Infinity) * (1 + RIM_SLACK)) continue;
    const lost: Lost = { why: 'clipped', surface: k };
    return {
      ...ray,
      exact: ray.exact.slice(0, 2 * k + 4),
      lost,
      heightDriftMm: ray.heightDriftMm.slice(0, k + 1),
      slopeDrift: ray.slopeDrift.slice(0, k),
      imageDriftMm: null,
    };
  }
  return ray;
}

function largestOf(pencils: readonly ExactPencil[], imagePlace: number): Largest | null {
  let largest: Largest | null = null;
  let size = -1;
  for (const pencil of pencils) {
    for (const ray of pencil.rays) {
      const { heightDriftMm, imageDriftMm } = ray;
      for (let k = 0; k <= heightDriftMm.length; k++) {
        const atImage = k === heightDriftMm.length;
        const driftMm = atImage ? imageDriftMm : (heightDriftMm[k] ?? 0);
        if (driftMm === null || Math.abs(driftMm) <= size) continue;
        size = Math.abs(driftMm);
        largest = { pencil, ray, surface: atImage ? imagePlace : k, driftMm };
      }
    }
  }
  return largest;
}
