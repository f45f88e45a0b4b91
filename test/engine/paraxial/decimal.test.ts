import type { Decimal } from 'decimal.js';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Quantity } from '../../../engine/paraxial/absence.ts';
import { axialOf } from '../../../engine/paraxial/axial.ts';
import { conjugates } from '../../../engine/paraxial/conjugates.ts';
import { firstOrder } from '../../../engine/paraxial/firstOrder.ts';
import { conjugateChain } from '../../../engine/paraxial/ledger.ts';
import { light } from '../../../engine/paraxial/light.ts';
import { pupils } from '../../../engine/paraxial/pupils.ts';
import { referenceRays } from '../../../engine/paraxial/rays.ts';
import { buildTrain } from '../../../engine/train/build.ts';
import type { Train } from '../../../engine/train/types.ts';
import { absoluteMatrix, absoluteRay } from '../absolute.ts';
import { anyTrain } from '../anyTrain.ts';
import { axialHeights, D, matrixBetween, times, type Vergences, vergences } from './decimal.ts';

/** Of the natural scale of each quantity: what was added up to get it, at worst. */
const AGREEMENT = 1e-11;

/** What forty digits leave of 0, far below any height. */
const DUST = 1e-20;

const TRAINS = fc.sample(anyTrain(), { seed: 20261201, numRuns: 200 }).map(buildTrain);

/** Counts what was compared, so that a chain of absences cannot pass for agreement. */
class Comparison {
  readonly counts = new Map<string, number>();

  /** `got` within the agreement of `wanted`; an absent quantity is left to `absent`. */
  agree(name: string, got: Quantity | number, wanted: Decimal, scale: number): void {
    const value = typeof got === 'number' ? got : got.ok ? got.value : null;
    if (value === null) return;
    this.counts.set(name, (this.counts.get(name) ?? 0) + 1);
    const difference = wanted.minus(value).abs().toNumber();
    expect(difference, `${name} ${value} against ${wanted.toNumber()}`).toBeLessThanOrEqual(
      AGREEMENT * scale,
    );
  }

  /** A quantity that the engine calls absent has a denominator that rounding cannot tell from 0. */
  absent(name: string, got: Quantity, denominator: Decimal, scale: number): void {
    if (got.ok) return;
    expect(denominator.abs().toNumber(), `${name}: ${got.why}`).toBeLessThanOrEqual(AGREEMENT * scale);
  }
}

const number = (value: Decimal | undefined): number => value?.toNumber() ?? Number.NaN;

function compareCardinals(train: Train, seen: Comparison): void {
  const first = firstOrder(train);
  const { a, c, d } = matrixBetween(train, 0, train.count);
  const abs = absoluteMatrix(train);
  const [n, nRear] = [train.index[0]!, train.index[train.count]!];
  const power = c.neg();
  seen.agree('power', first.powerPerMm, power, abs.c);
  seen.absent('focal length', first.focalLengthMm, power, abs.c);
  const size = (numerator: number) => (numerator / Math.abs(number(c))) * (abs.c / Math.abs(number(c)));
  seen.agree('focal length', first.focalLengthMm, new D(1).div(power), size(1));
  seen.agree('rear focal length', first.rearFocalLengthMm, new D(nRear).div(power), size(nRear));
  seen.agree('back focus', first.backFocusMm, a.times(nRear).div(power), size(nRear * abs.a));
  seen.agree('front focus', first.frontFocusMm, d.times(-n).div(power), size(n * abs.d));
  seen.agree('V1H', first.principalFrontMm, new D(1).minus(d).times(n).div(power), size(n * (1 + abs.d)));
  seen.agree('V2H′', first.principalRearMm, a.minus(1).times(nRear).div(power), size(nRear * (1 + abs.a)));
  seen.agree('V1N', first.nodalFrontMm, new D(nRear).minus(d.times(n)).div(power), size(nRear + n * abs.d));
  seen.agree('V2N′', first.nodalRearMm, a.times(nRear).minus(n).div(power), size(nRear * abs.a + n));
  seen.agree('angular magnification', first.angularMagnification, d.times(n).div(nRear), abs.d * (n / nRear));
}

function compareConjugates(train: Train, chain: Vergences, seen: Comparison): void {
  const axial = axialOf(train);
  const heights = axialHeights(train, chain);
  const [y0, nu0] = [axial.ray.y[0]!, axial.ray.nu[0]!];
  const abs = absoluteRay(train, 0, y0, nu0);
  /** Worst rounding of n·y/nu at a surface, nu taken in `space`. */
  const size = (space: number, k: number) => {
    const nu = Math.abs(axial.ray.nu[space]!);
    return (train.index[space]! * (abs.y[k] ?? 0) * (abs.nu[space] ?? 0)) / (nu * nu);
  };
  const lost = (space: number) => (abs.nu[space] ?? 0) / Math.abs(axial.ray.nu[space]!);
  const { count } = train;
  let running = new D(1);
  for (const row of conjugateChain(train, axial)) {
    const k = row.partIndex;
    const [before, after] = [chain.inFront[k] ?? new D(0), chain.behind[k] ?? new D(0)];
    const height = number(heights[k]) * y0;
    seen.absent('object', row.objectDistanceMm, before.times(height), abs.nu[k] ?? 0);
    seen.absent('image', row.imageDistanceMm, after.times(height), abs.nu[k + 1] ?? 0);
    seen.agree('object', row.objectDistanceMm, new D(train.index[k]!).div(before), size(k, k));
    seen.agree('image', row.imageDistanceMm, new D(train.index[k + 1]!).div(after), size(k + 1, k));
    if (row.magnification.ok) {
      const m = before.div(after);
      seen.agree(
        'magnification of a part',
        row.magnification,
        m,
        Math.abs(number(m)) * (lost(k) + lost(k + 1)),
      );
    }
  }
  for (let k = 0; k < count; k++)
    running = running.times((chain.inFront[k] ?? new D(0)).div(chain.behind[k] ?? 1));
  const both = conjugates(train, axial);
  const image = new D(train.index[count]!).div(chain.behind[count - 1] ?? 1);
  seen.agree('image distance', both.imageDistanceMm, image, size(count, count - 1));
  if (train.objectZ !== null) {
    seen.agree('magnification', both.magnification, running, Math.abs(number(running)) * lost(count));
    const track = image.plus(train.z[count - 1]!).minus(train.objectZ);
    if (train.imageZ === null) {
      seen.agree(
        'object to image',
        both.objectToImageMm,
        track,
        size(count, count - 1) + 2 * Math.abs(train.objectZ),
      );
    }
  }
}

function compareRays(train: Train, chain: Vergences, seen: Comparison): void {
  const { count, stopSurface, objectZ } = train;
  const axial = axialOf(train);
  const fNumber = 5.6;
  const height = 3;
  const field =
    objectZ === null
      ? ({ kind: 'angle', angleDeg: 7 } as const)
      : ({ kind: 'objectHeight', heightMm: height } as const);
  const rays = referenceRays(train, { kind: 'workingFNumber', fNumber }, field, axial);
  if (!rays.stop.ok || !rays.marginal.ok || !rays.chief.ok) return;
  const [n, nRear] = [train.index[0]!, train.index[count]!];

  // Marginal: |n′u′| = 1/(2N) is |last height × last vergence|.
  const heights = axialHeights(train, chain);
  const last = (heights[count - 1] ?? new D(0)).times(chain.behind[count - 1] ?? 0).abs();
  const factor = new D(1).div(new D(2).times(fNumber)).div(last);
  const [y0, nu0] = [axial.ray.y[0]!, axial.ray.nu[0]!];
  const abs = absoluteRay(train, 0, y0, nu0);
  const lost = (abs.nu[count] ?? 0) / Math.abs(axial.ray.nu[count]!);
  const scale = Math.abs(rays.marginal.value.y[0]! / y0) * lost;
  for (let k = 0; k < count; k++) {
    const wanted = (heights[k] ?? new D(0)).times(factor);
    seen.agree('marginal ray', rays.marginal.value.y[k]!, wanted, scale * (abs.y[k] ?? 0));
  }

  // Chief: (−b, a) goes through the centre of the stop.
  const toStop = matrixBetween(train, 0, stopSurface);
  const fromStop = matrixBetween(train, stopSurface, count);
  const central = absoluteRay(train, stopSurface, 0, 1);
  const { entrance, exit, stopDiameterMm } = pupils(train, rays);
  const [a, d] = [Math.abs(number(toStop.a)), Math.abs(number(fromStop.d))];
  const [aLost, dLost] = [(central.nu[0] ?? 0) / a, (central.nu[count] ?? 0) / d];
  const entranceSize = ((n * (central.y[0] ?? 0)) / a) * aLost;
  const exitSize = ((nRear * (central.y[count - 1] ?? 0)) / d) * dLost;
  seen.absent('entrance pupil', entrance.zMm, toStop.a, central.nu[0] ?? 0);
  seen.absent('exit pupil', exit.zMm, fromStop.d, central.nu[count] ?? 0);
  seen.agree('entrance pupil', entrance.zMm, toStop.b.times(n).div(toStop.a), entranceSize);
  seen.agree('exit pupil', exit.zMm, fromStop.b.times(-nRear).div(fromStop.d), exitSize);
  const stopHeight = (heights[stopSurface] ?? new D(0)).times(factor).abs();
  const stopSize = 2 * scale * (abs.y[stopSurface] ?? 0);
  seen.agree('stop diameter', stopDiameterMm, stopHeight.times(2), stopSize);
  seen.agree(
    'entrance pupil diameter',
    entrance.diameterMm,
    stopHeight.times(2).div(toStop.a).abs(),
    (stopSize / a) * aLost,
  );
  seen.agree(
    'exit pupil diameter',
    exit.diameterMm,
    stopHeight.times(2).div(fromStop.d).abs(),
    (stopSize / d) * dLost,
  );

  const atObject = objectZ === null ? toStop.a.div(n) : toStop.b.neg().plus(toStop.a.times(objectZ).div(n));
  const wantedAtObject = objectZ === null ? Math.tan((7 * Math.PI) / 180) : -height;
  const chiefFactor = new D(wantedAtObject).div(atObject);
  const fieldLost =
    (objectZ === null
      ? (central.nu[0] ?? 0) / n
      : (central.y[0] ?? 0) + Math.abs(objectZ / n) * (central.nu[0] ?? 0)) / Math.abs(number(atObject));
  const chiefScale = Math.abs(number(chiefFactor)) * fieldLost;
  let m = matrixBetween(train, 0, 0);
  for (let k = 0; k < count; k++) {
    const wanted = m.b.times(toStop.a).minus(m.a.times(toStop.b)).times(chiefFactor);
    seen.agree('chief ray', rays.chief.value.y[k]!, wanted, chiefScale * Math.max(central.y[k] ?? 0, DUST));
    m = times(matrixBetween(train, k, k + 1), m);
  }
  const said = light(train, rays, axial, firstOrder(train));
  const chiefNu = fromStop.d.times(chiefFactor);
  const chiefAngle = chiefNu.div(nRear).atan();
  seen.agree(
    'chief angle at the image',
    said.chiefAngleImageRad,
    chiefAngle,
    (chiefScale * (central.nu[count] ?? 0)) / nRear,
  );
  // H = nu·ȳ at the stop's image: the marginal height in the stop times the chief ray's nu there.
  const H = (heights[stopSurface] ?? new D(0)).times(factor).times(chiefFactor).neg();
  const size =
    Math.abs(rays.marginal.value.nu[0]!) * chiefScale * (central.y[0] ?? 0) +
    Math.abs(rays.marginal.value.y[0]!) * chiefScale * (central.nu[0] ?? 0);
  seen.agree('Lagrange invariant', said.lagrange, H, size * lost + stopSize * chiefScale);
}

describe('two hundred random trains in forty digits', () => {
  const seen = new Comparison();

  it('agree in their cardinal points', () => {
    for (const train of TRAINS) compareCardinals(train, seen);
  });

  it('agree in the chain of conjugates, part by part', () => {
    for (const train of TRAINS) compareConjugates(train, vergences(train), seen);
  });

  it('agree in marginal ray, chief ray and pupils', () => {
    for (const train of TRAINS) compareRays(train, vergences(train), seen);
  });

  it('were compared in every quantity, most of them in most trains', () => {
    const least = Math.min(...seen.counts.values());
    expect(seen.counts.size).toBe(25);
    expect(least, JSON.stringify([...seen.counts])).toBeGreaterThan(50);
  });
});
