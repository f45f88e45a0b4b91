import type { Line, Lines, Medium, Part, Setting, Sketch } from '../sketch/types.ts';
import { objectDistanceAt, valueAt } from '../sketch/values.ts';
import { buildTrain, type SurfaceSpec } from './build.ts';
import type { Train } from './types.ts';

/**
 * The sketch at one setting and in one line, as the flat arrays that rays run through. A thin part or a stop is one surface, a
 * plate two. The aperture stop has no rim of its own (the aperture sets its size); a part it rides on keeps its rim.
 *
 * Away from the main line the index follows a two-term Cauchy law through the Abbe number V:
 * n(λ) = n + (n − 1)/V · s(λ), and a thin power φ(λ) = φ · (1 + s(λ)/V), with s from `spreadShare`.
 */
export function trainOf(sketch: Sketch, setting: Setting, line: Line = 'main'): Train {
  const share = spreadShare(sketch.lines, line);
  const surfaces: SurfaceSpec[] = [];
  let stopSurface = -1;
  for (const [part, drawn] of sketch.parts.entries()) {
    if (drawn.id === sketch.stop) stopSurface = surfaces.length;
    const gapMm = valueAt(drawn.space.lengthMm, sketch.positions, setting);
    pushSurfaces(surfaces, drawn, part, gapMm, share, drawn.id === sketch.stop);
  }
  const last = sketch.parts.at(-1);
  const distance = objectDistanceAt(sketch.object.distanceMm, sketch.positions, setting);
  return buildTrain({
    objectIndex: indexIn(sketch.object.medium, share),
    objectSpread: spreadOf(sketch.object.medium),
    surfaces,
    stopSurface,
    objectZ: distance === 'infinity' ? null : -distance,
    imageDistanceMm:
      sketch.image === 'fixed' && last !== undefined
        ? valueAt(last.space.lengthMm, sketch.positions, setting)
        : null,
  });
}

/**
 * How far `line` lies from the main line, as a share of the spread short − long in a two-term Cauchy law n = a + b/λ²:
 * (λ⁻² − λm⁻²)/(λs⁻² − λl⁻²). 0 for the main line; short minus long is 1.
 */
export function spreadShare(lines: Lines, line: Line): number {
  if (line === 'main') return 0;
  const wavelengthNm = line === 'short' ? lines.shortNm : lines.longNm;
  return (wavelengthNm ** -2 - lines.mainNm ** -2) / (lines.shortNm ** -2 - lines.longNm ** -2);
}

function pushSurfaces(
  surfaces: SurfaceSpec[],
  drawn: Part,
  part: number,
  gapMm: number,
  share: number,
  isStop: boolean,
): void {
  const after = drawn.space.medium;
  const indexAfter = indexIn(after, share);
  const spreadAfter = spreadOf(after);
  let thinPowerPerMm = 0;
  let powerSpreadPerMm = 0;
  let semiDiameterMm = drawn.semiDiameterMm ?? Number.POSITIVE_INFINITY;
  if (drawn.kind === 'thin') {
    const power = 1 / drawn.focalLengthMm;
    powerSpreadPerMm = drawn.abbeNumber === null ? 0 : power / drawn.abbeNumber;
    thinPowerPerMm = power + powerSpreadPerMm * share;
  } else if (drawn.kind === 'plate') {
    surfaces.push({
      part,
      thinPowerPerMm,
      powerSpreadPerMm,
      semiDiameterMm,
      indexAfter: indexIn(drawn.material, share),
      spreadAfter: spreadOf(drawn.material),
      gapMm: drawn.thicknessMm,
    });
  } else if (isStop) {
    semiDiameterMm = Number.POSITIVE_INFINITY;
  }
  surfaces.push({
    part,
    thinPowerPerMm,
    powerSpreadPerMm,
    semiDiameterMm,
    indexAfter,
    spreadAfter,
    gapMm,
  });
}

const spreadOf = (medium: Medium): number =>
  medium === 'air' || medium.abbeNumber === null ? 0 : (medium.index - 1) / medium.abbeNumber;

const indexIn = (medium: Medium, share: number): number =>
  medium === 'air' ? 1 : medium.index + spreadOf(medium) * share;
