import type { Train } from './types.ts';

/**
 * The surfaces of one part by themselves, with the media on both of their sides: the object at infinity, the image at the focus, no
 * stop. Null when no surface belongs to the part.
 */
export function partTrain(train: Train, partIndex: number): Train | null {
  const first = train.partOf.indexOf(partIndex);
  const behind = train.partOf.lastIndexOf(partIndex) + 1;
  if (first < 0) return null;
  const cut = (list: Float64Array) => list.slice(first, behind);
  const from = train.z[first]!;
  const gap = cut(train.gap);
  gap[gap.length - 1] = 0;
  const start = train.asphereFrom[first]!;
  return {
    count: behind - first,
    gap,
    z: cut(train.z).map((z) => z - from),
    curvature: cut(train.curvature),
    conic: cut(train.conic),
    asphere: train.asphere.slice(start, train.asphereFrom[behind]),
    asphereFrom: train.asphereFrom.slice(first, behind + 1).map((at) => at - start),
    thinPower: cut(train.thinPower),
    index: train.index.slice(first, behind + 1),
    indexSpread: train.indexSpread.slice(first, behind + 1),
    powerSpread: cut(train.powerSpread),
    semiDiameter: cut(train.semiDiameter),
    partOf: train.partOf.slice(first, behind),
    stopSurface: -1,
    objectZ: null,
    imageZ: null,
  };
}
