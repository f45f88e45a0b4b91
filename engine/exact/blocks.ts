import { CLIPPED, MISSED, REFLECTED } from './rayBuffer.ts';

/*
 * The inner loops of the trace: one surface, the rays of the work array up to place `stop`. A ray's numbers are WORK[i] to WORK[i + 7]:
 * x, y, z, L, M, N, path, code, counted out because a name from another module costs a look-up for each of them. The array is a constant of
 * this module and has room for one ray more than a block, so that the compiler knows every place to be inside and checks none.
 * Intersection and refraction with direction cosines after Feder, J. Opt. Soc. Am. 41, 630 (1951).
 */

/** So many rays go through a surface before the next one: neighbours do not wait for each other, and they stay in the nearest cache. */
export const BLOCK_RAYS = 128;
const BLOCK_NUMBERS = 8 * BLOCK_RAYS;
/** The rays of one block. */
export const WORK = new Float64Array(BLOCK_NUMBERS + 8);

/** What a block of rays meets at one surface. */
export interface Meeting {
  /** End of the block in the work array. */
  stop: number;
  /** From the vertex that z counts from to that of this surface, mm. */
  reach: number;
  nFront: number;
  nBehind: number;
  /** Square of the radius beyond which rays are clipped. */
  rimSquared: number;
  /** That of the surface; the loss is added. */
  code: number;
}

/**
 * A sphere or a plane of curvature `c` between media of positive index. From the point nearest to the vertex (x, y, z) the sphere is at
 * t = F/(N + √(N² − c F)), F = c(x² + y² + z²) − 2z, which subtracts nothing and survives c = 0; the root is the cosine of incidence.
 */
export function sphereBlock({ stop, reach, nFront, nBehind, rimSquared, code }: Meeting, c: number): void {
  const end = Math.min(BLOCK_NUMBERS, stop);
  const mu = nFront / nBehind;
  const muSquared = mu * mu;
  for (let i = 0; i < end; i += 8) {
    if (WORK[i + 7] !== 0) continue;
    const xFront = WORK[i]!;
    const yFront = WORK[i + 1]!;
    const zFront = WORK[i + 2]! - reach;
    const l = WORK[i + 3]!;
    const m = WORK[i + 4]!;
    const cosZ = WORK[i + 5]!;
    const toFoot = xFront * l + yFront * m + zFront * cosZ;
    const x0 = xFront - toFoot * l;
    const y0 = yFront - toFoot * m;
    const z0 = zFront - toFoot * cosZ;
    const f = c * (x0 * x0 + y0 * y0 + z0 * z0) - 2 * z0;
    const squared = cosZ * cosZ - c * f;
    const squaredBehind = 1 - muSquared * (1 - squared);
    const cosine = Math.sqrt(squared);
    const length = f / (cosZ + cosine) - toFoot;
    const x = xFront + length * l;
    const y = yFront + length * m;
    const z = zFront + length * cosZ;
    // One question for all that may go wrong; which it was is asked only then.
    if (!(squared >= 0 && squaredBehind >= 0 && c * z < 1 && cosZ > 0 && x * x + y * y <= rimSquared)) {
      WORK[i + 7] = code + MISSED;
      if (squared >= 0 && c * z < 1 && cosZ > 0) {
        WORK[i] = x;
        WORK[i + 1] = y;
        WORK[i + 2] = z;
        WORK[i + 6] = WORK[i + 6]! + nFront * length;
        WORK[i + 7] = code + (x * x + y * y <= rimSquared ? REFLECTED : CLIPPED);
      }
      continue;
    }
    WORK[i] = x;
    WORK[i + 1] = y;
    WORK[i + 2] = z;
    WORK[i + 6] = WORK[i + 6]! + nFront * length;
    const bend = Math.sqrt(squaredBehind) - mu * cosine;
    const along = bend * c;
    WORK[i + 3] = mu * l - along * x;
    WORK[i + 4] = mu * m - along * y;
    WORK[i + 5] = mu * cosZ + bend - along * z;
  }
}

/**
 * A conic of curvature `c` and conic constant `conic`, refracting or reflecting, with light of either direction. From the tangent plane it
 * is at t = F/(G ± √(G² − A F)), F = c(x² + y²), G = N − c(xL + yM), A = c(1 + K N²), with the sign of N, so that the ray passes to the
 * far side. The normal before it is made one is (−c x, −c y, 1 − (1 + K) c z).
 */
export function conicBlock(
  { stop, reach, nFront, nBehind, rimSquared, code }: Meeting,
  c: number,
  conic: number,
): void {
  const end = Math.min(BLOCK_NUMBERS, stop);
  const side = nFront > 0 ? 1 : -1;
  const mirror = nFront * nBehind < 0;
  const mu = Math.abs(nFront / nBehind);
  const muSquared = mu * mu;
  const n = Math.abs(nFront);
  const cEdge = (1 + conic) * c;
  for (let i = 0; i < end; i += 8) {
    if (WORK[i + 7] !== 0) continue;
    const l = WORK[i + 3]!;
    const m = WORK[i + 4]!;
    const cosZ = WORK[i + 5]!;
    const toPlane = (reach - WORK[i + 2]!) / cosZ;
    const x0 = WORK[i]! + toPlane * l;
    const y0 = WORK[i + 1]! + toPlane * m;
    const f = c * (x0 * x0 + y0 * y0);
    const g = cosZ - c * (x0 * l + y0 * m);
    const squared = g * g - c * (1 + conic * cosZ * cosZ) * f;
    const root = side * Math.sqrt(squared);
    const t = f / (g + root);
    const z = t * cosZ;
    if (!(squared >= 0 && cEdge * z < 1 && side * cosZ > 0)) {
      WORK[i + 7] = code + MISSED;
      continue;
    }
    const x = x0 + t * l;
    const y = y0 + t * m;
    WORK[i] = x;
    WORK[i + 1] = y;
    WORK[i + 2] = z;
    WORK[i + 6] = WORK[i + 6]! + n * (toPlane + t);
    if (!(x * x + y * y <= rimSquared)) {
      WORK[i + 7] = code + CLIPPED;
      continue;
    }
    const nz = 1 - cEdge * z;
    const unit = 1 / Math.sqrt(c * c * (x * x + y * y) + nz * nz);
    const cosine = root * unit;
    const squaredBehind = 1 - muSquared * (1 - cosine * cosine);
    if (squaredBehind < 0) {
      WORK[i + 7] = code + REFLECTED;
      continue;
    }
    const bend = (mirror ? -2 * cosine : side * Math.sqrt(squaredBehind) - mu * cosine) * unit;
    WORK[i + 3] = mu * l - bend * c * x;
    WORK[i + 4] = mu * m - bend * c * y;
    WORK[i + 5] = mu * cosZ + bend * nz;
  }
}

/** An ideal thin part of the given power (1/mm): the collinear map, in the plane of its vertex. */
export function thinBlock(
  { stop, reach, nFront, nBehind, rimSquared, code }: Meeting,
  powerPerMm: number,
): void {
  const end = Math.min(BLOCK_NUMBERS, stop);
  const side = nFront > 0 ? 1 : -1;
  const sideBehind = nBehind > 0 ? 1 : -1;
  const mu = nFront / nBehind;
  const power = powerPerMm / nBehind;
  const n = Math.abs(nFront);
  for (let i = 0; i < end; i += 8) {
    if (WORK[i + 7] !== 0) continue;
    const l = WORK[i + 3]!;
    const m = WORK[i + 4]!;
    const cosZ = WORK[i + 5]!;
    const length = (reach - WORK[i + 2]!) / cosZ;
    const x = WORK[i]! + length * l;
    const y = WORK[i + 1]! + length * m;
    const p = (mu * l) / cosZ - power * x;
    const q = (mu * m) / cosZ - power * y;
    const cosBehind = sideBehind / Math.sqrt(1 + p * p + q * q);
    if (!(side * cosZ > 0 && sideBehind * cosBehind > 0)) {
      WORK[i + 7] = code + MISSED;
      continue;
    }
    WORK[i] = x;
    WORK[i + 1] = y;
    WORK[i + 2] = 0;
    WORK[i + 6] = WORK[i + 6]! + n * length;
    if (!(x * x + y * y <= rimSquared)) {
      WORK[i + 7] = code + CLIPPED;
      continue;
    }
    WORK[i + 3] = p * cosBehind;
    WORK[i + 4] = q * cosBehind;
    WORK[i + 5] = cosBehind;
  }
}
