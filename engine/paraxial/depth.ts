import { none, some } from '../outcome.ts';
import type { Train } from '../train/types.ts';
import { derive, finite, type Quantity } from './absence.ts';
import type { Axial } from './axial.ts';
import type { Light } from './light.ts';
import type { ReferenceRays } from './rays.ts';
import { isNegligible } from './scale.ts';

/** How far things may be out of focus. Lengths in mm. */
export interface Depth {
  /** Diameter of the blur allowed on the image plane; 'no blur'. */
  readonly blurMm: Quantity;
  /** Half depth of focus for the blur: ± this much from the image plane. */
  readonly focusBlurMm: Quantity;
  /** Half depth of focus for a quarter wave: ± this much. */
  readonly focusQuarterWaveMm: Quantity;
  /** Nearest and farthest sharp object in front of the first vertex, positive. Far: 'reaches infinity'; near: 'reaches the first part'. */
  readonly nearMm: Quantity;
  readonly farMm: Quantity;
}

/** Half depth of focus in mm for a blur of diameter `blurMm`: c/(2|u′|) = n′·N·c, N the working f-number. */
export const blurDepthMm = (blurMm: number, workingFNumber: number, indexAfter: number): number =>
  Math.abs(indexAfter) * workingFNumber * blurMm;

/** Half depth of focus in mm for a quarter wave: λ/(2 n′ sin²U′) = n′λ/(2 NA²) (Born and Wolf, Principles of Optics, 8.8). */
export const quarterWaveDepthMm = (wavelengthNm: number, imageNA: number, indexAfter: number): number =>
  (Math.abs(indexAfter) * wavelengthNm * 1e-6) / (2 * imageNA * imageNA);

/** Depth of focus at the image and depth of field at the object. */
export function depth(
  train: Train,
  rays: ReferenceRays,
  axial: Axial,
  lightOf: Light,
  wavelengthNm: number,
  blurMm: number | null,
): Depth {
  const indexAfter = train.index[train.count]!;
  const blur: Quantity = blurMm === null ? none('no blur') : some(blurMm);
  return {
    blurMm: blur,
    focusBlurMm: blur.ok
      ? derive(lightOf.workingFNumber, (fNumber) => blurDepthMm(blur.value, fNumber, indexAfter))
      : blur,
    focusQuarterWaveMm: derive(lightOf.imageNA, (na) => quarterWaveDepthMm(wavelengthNm, na, indexAfter)),
    ...depthOfField(train, rays, axial, blur),
  };
}

/**
 * The objects whose blur on the image plane is no wider than c, the stop keeping its diameter. With the marginal ray m and the central
 * ray q (0 in the stop), m + κq runs through the same edge of the stop for every κ and meets the image plane at h_m + κh_q, which has
 * to stay within ±c/2. It crosses the axis in object space at z = −(y_m + κy_q)/(u_m + κu_q): the two limits, one of which may lie
 * at infinity or beyond.
 */
function depthOfField(
  train: Train,
  { marginal, stop }: ReferenceRays,
  axial: Axial,
  blur: Quantity,
): Pick<Depth, 'nearMm' | 'farMm'> {
  const absent = (why: Quantity & { ok: false }) => ({ nearMm: why, farMm: why });
  if (!blur.ok) return absent(blur);
  if (!marginal.ok) return absent(marginal);
  if (!stop.ok) return absent(stop);
  const plane = axial.imagePlaneMm;
  if (!plane.ok) return absent(plane);
  const { count, index } = train;
  const { central, centralScale } = stop.value;
  const m = marginal.value;
  const reach = plane.value / index[count]!;
  const focused = train.imageZ === null;
  const hm = focused ? 0 : m.y[count - 1]! + reach * m.nu[count]!;
  const hq = central.y[count - 1]! + reach * central.nu[count]!;
  if (isNegligible(hq, centralScale.y[count - 1]! + Math.abs(reach) * centralScale.nu[count]!)) {
    return absent(none('stop at an image'));
  }
  const limit = (height: number): Limit => {
    const kappa = (height - hm) / hq;
    const y = m.y[0]! + kappa * central.y[0]!;
    const u = (m.nu[0]! + kappa * central.nu[0]!) / index[0]!;
    const uScale = (Math.abs(m.nu[0]!) + Math.abs(kappa * central.nu[0]!)) / Math.abs(index[0]!);
    return { distance: y / u, inside: y <= 0, beyond: u < 0 || isNegligible(u, uScale) };
  };
  return rangeOf(limit(blur.value / 2), limit(-blur.value / 2));
}

/** One end of the sharp range: its distance, whether it has passed the first part or infinity. */
interface Limit {
  readonly distance: number;
  readonly inside: boolean;
  readonly beyond: boolean;
}

function rangeOf(one: Limit, other: Limit): Pick<Depth, 'nearMm' | 'farMm'> {
  if ((one.inside && other.inside) || (one.beyond && other.beyond)) {
    return { nearMm: none('no real object'), farMm: none('no real object') };
  }
  const oneIsNear =
    one.inside || other.beyond || (!other.inside && !one.beyond && one.distance <= other.distance);
  const [near, far] = oneIsNear ? [one, other] : [other, one];
  return {
    nearMm: near.inside ? none('reaches the first part') : finite(near.distance),
    farMm: far.beyond ? none('reaches infinity') : finite(far.distance),
  };
}
