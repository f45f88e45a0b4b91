import {
  type Absence,
  type LengthUnit,
  lostWords,
  type Outcome,
  partName,
  type Sketch,
  sentenceOf,
  type Trust,
} from '../../../engine/index.ts';
import { lostPlaces } from '../../drawing/exact/layer.ts';
import type { ExactRays, Largest } from '../../drawing/exact/rays.ts';
import { plain, plainLength } from '../../drawing/words.ts';

/** Whole per cent, rounded down: what is almost all is not said to be all. */
function percent(share: number): string {
  const whole = Math.floor(100 * share + 1e-9);
  return whole === 0 ? 'less than 1 %' : `${whole} %`;
}

/** How far down aperture and field the first order can be trusted, as one sentence. `fNumber` is that of the whole aperture. */
export function trustWords(
  trust: Outcome<Trust, Absence>,
  limitMm: number,
  fNumber: number | null,
  unit: LengthUnit,
): string {
  if (!trust.ok) return sentenceOf(trust.why);
  const { apertureShare, fieldShare } = trust.value;
  const within = `First order holds within ${plainLength(limitMm, unit, 4)}`;
  const stopped = fNumber === null || apertureShare === 0 ? '' : ` (f/${plain(fNumber / apertureShare, 1)})`;
  const aperture =
    apertureShare === 1 ? 'the whole aperture' : `${percent(apertureShare)} of the aperture${stopped}`;
  const field = fieldShare === 1 ? 'the whole field' : `${percent(fieldShare)} of the field`;
  if (apertureShare === 0 && fieldShare === 0) return `${within} nowhere: not even close to the axis.`;
  return apertureShare === 1 && fieldShare === 1
    ? `${within} over the whole aperture and field.`
    : `${within} up to ${aperture} and ${field}.`;
}

/** A surface by its number and part; the image plane behind the last one. */
function surfaceWords(sketch: Sketch, { train }: ExactRays, surface: number): string {
  if (surface >= train.count) return 'the image plane';
  const index = train.partOf[surface] ?? -1;
  const part = sketch.parts[index];
  return `surface ${surface + 1}${part ? ` (${partName(part, index)})` : ''}`;
}

/** Which ray it is. */
function pencilWords({ name, share }: Largest['pencil']): string {
  return name === 'off-axis bundle' ? `bundle at ${percent(share)} of the field` : name;
}

/** The largest drift with its ray and place. */
export const largestWords = (sketch: Sketch, rays: ExactRays, unit: LengthUnit): string =>
  rays.largest
    ? `${plainLength(rays.largest.driftMm, unit, 4)}, ${pencilWords(rays.largest.pencil)}, at ${surfaceWords(sketch, rays, rays.largest.surface)}`
    : '';

/** How many of the drawn rays are lost and why, each reason once; empty when all get through. */
export function lostSummary(sketch: Sketch, rays: ExactRays): string {
  const reasons = lostPlaces(rays).map(({ lost }) => lostWords(lost, sketch, rays.train));
  const counts = new Map<string, number>();
  for (const reason of reasons) counts.set(reason, (counts.get(reason) ?? 0) + 1);
  return [...counts].map(([reason, count]) => `${count} ${reason}`).join('; ');
}
