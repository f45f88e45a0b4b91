import { CLIPPED, MISSED, REFLECTED } from './rayBuffer.ts';

/*
 * The inner loops of the trace: one surface, a block of rays. A ray's numbers are rays[i] to rays[i + 7]: x, y, z, L, M, N, path, code; they
 * are counted out here because a name from another module costs a look-up for each of them.
 * Intersection from the tangent plane and refraction with direction cosines after Feder, J. Opt. Soc. Am. 41, 630 (1951). With
 * F = c(x² + y²), G = N − c(xL + yM), A = c(1 + K N²) the conic is at t = F/(G ± √(G² − A F)), which subtracts nothing and survives c = 0;
 * the sign is that of N, so that the ray passes to the far side of the surface.
 */

/** Rays from `start` up to, not including, `stop` (places in the array), and what they meet at one surface. */
export interface Block {
  readonly rays: Float64Array;
  start: number;
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

/** A sphere or a plane, of curvature `c`. */
export function sphereBlock(block: Block, c: number): void {
  const { rays, start, stop, reach, nFront, nBehind, rimSquared, code } = block;
  const side = nFront > 0 ? 1 : -1;
  const mirror = nFront * nBehind < 0;
  const mu = Math.abs(nFront / nBehind);
  const muSquared = mu * mu;
  const n = Math.abs(nFront);
  for (let i = start; i < stop; i += 8) {
    if (rays[i + 7] !== 0) continue;
    const l = rays[i + 3]!;
    const m = rays[i + 4]!;
    const cosZ = rays[i + 5]!;
    const xFront = rays[i]!;
    const yFront = rays[i + 1]!;
    const zFront = rays[i + 2]! - reach;
    const toFoot = -(xFront * l + yFront * m + zFront * cosZ);
    const x0 = xFront + toFoot * l;
    const y0 = yFront + toFoot * m;
    const z0 = zFront + toFoot * cosZ;
    const f = c * (x0 * x0 + y0 * y0 + z0 * z0) - 2 * z0;
    const radicand = cosZ * cosZ - c * f;
    const cosine = side * Math.sqrt(radicand);
    const t = f / (cosZ + cosine);
    const z = z0 + t * cosZ;
    if (!(radicand >= 0 && c * z < 1 && side * cosZ > 0)) {
      rays[i + 7] = code + MISSED;
      continue;
    }
    const x = x0 + t * l;
    const y = y0 + t * m;
    rays[i] = x;
    rays[i + 1] = y;
    rays[i + 2] = z;
    rays[i + 6] = rays[i + 6]! + n * (toFoot + t);
    if (x * x + y * y > rimSquared) {
      rays[i + 7] = code + CLIPPED;
      continue;
    }
    const behind = 1 - muSquared * (1 - radicand);
    if (behind < 0) {
      rays[i + 7] = code + REFLECTED;
      continue;
    }
    const bend = mirror ? -2 * cosine : side * Math.sqrt(behind) - mu * cosine;
    rays[i + 3] = mu * l - bend * c * x;
    rays[i + 4] = mu * m - bend * c * y;
    rays[i + 5] = mu * cosZ + bend * (1 - c * z);
  }
}

/** A conic of curvature `c` and conic constant `conic`. Its normal before it is made one: (−c x, −c y, 1 − (1 + K) c z). */
export function conicBlock(block: Block, c: number, conic: number): void {
  const { rays, start, stop, reach, nFront, nBehind, rimSquared, code } = block;
  const side = nFront > 0 ? 1 : -1;
  const mirror = nFront * nBehind < 0;
  const mu = Math.abs(nFront / nBehind);
  const muSquared = mu * mu;
  const n = Math.abs(nFront);
  const cEdge = (1 + conic) * c;
  for (let i = start; i < stop; i += 8) {
    if (rays[i + 7] !== 0) continue;
    const l = rays[i + 3]!;
    const m = rays[i + 4]!;
    const cosZ = rays[i + 5]!;
    const toPlane = (reach - rays[i + 2]!) / cosZ;
    const x0 = rays[i]! + toPlane * l;
    const y0 = rays[i + 1]! + toPlane * m;
    const f = c * (x0 * x0 + y0 * y0);
    const g = cosZ - c * (x0 * l + y0 * m);
    const radicand = g * g - c * (1 + conic * cosZ * cosZ) * f;
    const root = side * Math.sqrt(radicand);
    const t = f / (g + root);
    const z = t * cosZ;
    if (!(radicand >= 0 && cEdge * z < 1 && side * cosZ > 0)) {
      rays[i + 7] = code + MISSED;
      continue;
    }
    const x = x0 + t * l;
    const y = y0 + t * m;
    rays[i] = x;
    rays[i + 1] = y;
    rays[i + 2] = z;
    rays[i + 6] = rays[i + 6]! + n * (toPlane + t);
    if (x * x + y * y > rimSquared) {
      rays[i + 7] = code + CLIPPED;
      continue;
    }
    const nz = 1 - cEdge * z;
    const length = 1 / Math.sqrt(c * c * (x * x + y * y) + nz * nz);
    const cosine = root * length;
    const behind = 1 - muSquared * (1 - cosine * cosine);
    if (behind < 0) {
      rays[i + 7] = code + REFLECTED;
      continue;
    }
    const bend = (mirror ? -2 * cosine : side * Math.sqrt(behind) - mu * cosine) * length;
    rays[i + 3] = mu * l - bend * c * x;
    rays[i + 4] = mu * m - bend * c * y;
    rays[i + 5] = mu * cosZ + bend * nz;
  }
}

/** An ideal thin part of the given power (1/mm): the collinear map, in the plane of its vertex. */
export function thinBlock(block: Block, powerPerMm: number): void {
  const { rays, start, stop, reach, nFront, nBehind, rimSquared, code } = block;
  const side = nFront > 0 ? 1 : -1;
  const sideBehind = nBehind > 0 ? 1 : -1;
  const mu = nFront / nBehind;
  const power = powerPerMm / nBehind;
  const n = Math.abs(nFront);
  for (let i = start; i < stop; i += 8) {
    if (rays[i + 7] !== 0) continue;
    const l = rays[i + 3]!;
    const m = rays[i + 4]!;
    const cosZ = rays[i + 5]!;
    const length = (reach - rays[i + 2]!) / cosZ;
    const x = rays[i]! + length * l;
    const y = rays[i + 1]! + length * m;
    const p = (mu * l) / cosZ - power * x;
    const q = (mu * m) / cosZ - power * y;
    const cosBehind = sideBehind / Math.sqrt(1 + p * p + q * q);
    if (!(side * cosZ > 0 && sideBehind * cosBehind > 0)) {
      rays[i + 7] = code + MISSED;
      continue;
    }
    rays[i] = x;
    rays[i + 1] = y;
    rays[i + 2] = 0;
    rays[i + 6] = rays[i + 6]! + n * length;
    if (x * x + y * y > rimSquared) {
      rays[i + 7] = code + CLIPPED;
      continue;
    }
    rays[i + 3] = p * cosBehind;
    rays[i + 4] = q * cosBehind;
    rays[i + 5] = cosBehind;
  }
}
