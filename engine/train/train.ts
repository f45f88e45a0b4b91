import type { Line, Part, Setting, Sketch } from '../sketch/types.ts';
import { objectDistanceAt, valueAt } from '../sketch/values.ts';
import { buildTrain, type SurfaceSpec } from './build.ts';
import { type Indices, indicesIn } from './indices.ts';
import type { Train } from './types.ts';

/**
 * The sketch at one setting and in one line, as the flat arrays that rays run through. A thin part or a stop is one surface, a
 * plate two, glass as many as it has. The aperture stop has no rim of its own (the aperture sets its size); a part it rides on
 * keeps its rim, and the stop lies at its first surface. Indices and thin powers away from the main line are told in `indices.ts`.
 */
export function trainOf(sketch: Sketch, setting: Setting, line: Line = 'main'): Train {
  const indices = indicesIn(sketch, line);
  const surfaces: SurfaceSpec[] = [];
  let stopSurface = -1;
  for (const [part, drawn] of sketch.parts.entries()) {
    const isStop = drawn.id === sketch.stop;
    if (isStop) stopSurface = surfaces.length;
    const gapMm = valueAt(drawn.space.lengthMm, sketch.positions, setting);
    pushSurfaces(surfaces, drawn, part, gapMm, indices, isStop);
  }
  const last = sketch.parts.at(-1);
  const distance = objectDistanceAt(sketch.object.distanceMm, sketch.positions, setting);
  const object = indices.of(sketch.object.medium);
  return buildTrain({
    objectIndex: object.index,
    objectSpread: object.spread,
    surfaces,
    stopSurface,
    objectZ: distance === 'infinity' ? null : -distance,
    imageDistanceMm:
      sketch.image === 'fixed' && last !== undefined
        ? valueAt(last.space.lengthMm, sketch.positions, setting)
        : null,
  });
}

function pushSurfaces(
  surfaces: SurfaceSpec[],
  drawn: Part,
  part: number,
  gapMm: number,
  indices: Indices,
  isStop: boolean,
): void {
  const rim = drawn.semiDiameterMm ?? Number.POSITIVE_INFINITY;
  const { index: indexAfter, spread: spreadAfter } = indices.of(drawn.space.medium);
  const behind = { part, indexAfter, spreadAfter, gapMm };
  if (drawn.kind === 'thin') {
    const { powerPerMm, spreadPerMm } = indices.powerOf(drawn);
    surfaces.push({
      ...behind,
      thinPowerPerMm: powerPerMm,
      powerSpreadPerMm: spreadPerMm,
      semiDiameterMm: rim,
    });
  } else if (drawn.kind === 'stop') {
    surfaces.push({ ...behind, semiDiameterMm: isStop ? Number.POSITIVE_INFINITY : rim });
  } else if (drawn.kind === 'plate') {
    const { index, spread } = indices.of(drawn.material);
    surfaces.push({
      part,
      semiDiameterMm: rim,
      indexAfter: index,
      spreadAfter: spread,
      gapMm: drawn.thicknessMm,
    });
    surfaces.push({ ...behind, semiDiameterMm: rim });
  } else {
    for (const [k, surface] of drawn.surfaces.entries()) {
      const filling = drawn.fillings[k];
      const shape = {
        curvaturePerMm: surface.radiusMm === null ? 0 : 1 / surface.radiusMm,
        conic: surface.conic,
        asphere: surface.asphere,
        semiDiameterMm: surface.semiDiameterMm ?? rim,
      };
      if (filling === undefined) surfaces.push({ ...behind, ...shape });
      else {
        const { index, spread } = indices.of(filling.material);
        surfaces.push({
          part,
          ...shape,
          indexAfter: index,
          spreadAfter: spread,
          gapMm: filling.thicknessMm,
        });
      }
    }
  }
}
