import type { Quantity } from '../../engine/paraxial/absence.ts';
import { derive, finite } from '../../engine/paraxial/absence.ts';
import { axialOf } from '../../engine/paraxial/axial.ts';
import { petzval, thinColour } from '../../engine/paraxial/colour.ts';
import { conjugates } from '../../engine/paraxial/conjugates.ts';
import { firstOrder } from '../../engine/paraxial/firstOrder.ts';
import { conjugateChain } from '../../engine/paraxial/ledger.ts';
import { light } from '../../engine/paraxial/light.ts';
import { systemMatrix } from '../../engine/paraxial/matrix.ts';
import { pupils } from '../../engine/paraxial/pupils.ts';
import { referenceRays } from '../../engine/paraxial/rays.ts';
import type { FieldSize } from '../../engine/sketch/types.ts';
import type { ApertureAt } from '../../engine/train/places.ts';
import { absoluteMatrix, absoluteRay } from '../engine/absolute.ts';
import { apertureOf, fieldOf } from './light.ts';
import type { Laid } from './prescription.ts';
import { sumRows } from './sums.ts';

/** What the engine gives for a quantity, and the absolute floor below which two computations of it cannot differ. */
export interface Measured {
  readonly value: Quantity;
  readonly floor: number;
}

/** Reads a quantity of the case files by its name; null when the first order cannot express it. */
export type Reader = (quantity: string) => Measured | null;

/** Powers are sums of a few dozen terms; lengths are quotients of such sums. Both against the scale of what was added. */
const POWER_FLOOR = 1e-15;
const LENGTH_FLOOR = 1e-12;

/** The quantities of a train: cardinal points, conjugates, ledger, pupils, Petzval and colour sums. */
export function readTrain(laid: Laid, input: Record<string, unknown>): Reader {
  const table = new Map<string, () => Measured>([
    ...cardinals(laid),
    ...ends(laid),
    ...elements(laid),
    ...sumRows(laid, input),
    ...stopImages(laid, input),
  ]);
  return (quantity) => table.get(quantity)?.() ?? null;
}

type Rows = [string, () => Measured][];

const power = (value: Quantity, scale: number): Measured => ({ value, floor: POWER_FLOOR * scale });
const length = (value: Quantity, scale: number): Measured => ({ value, floor: LENGTH_FLOOR * scale });
const plus = (value: Quantity, more: number): Quantity => derive(value, (mm) => mm + more);

function cardinals({ train, firstZ, lastZ, elements: each }: Laid): Rows {
  const first = firstOrder(train);
  const { a, b, c, d } = systemMatrix(train);
  const abs = absoluteMatrix(train);
  const n = Math.abs(train.index[0] ?? 1);
  const nRear = Math.abs(train.index[train.count] ?? 1);
  const vertexLength = lastZ - firstZ;
  const rearShift = (train.z[train.count - 1] ?? 0) - lastZ;
  // A quotient by the power carries the power's own relative rounding.
  const quotient = (numerator: number) => (numerator / Math.abs(c)) * (abs.c / Math.abs(c));
  const front = (value: Quantity, scale: number) =>
    length(plus(value, -firstZ), quotient(scale) + Math.abs(firstZ));
  const rear = (value: Quantity, scale: number) =>
    length(plus(value, rearShift), quotient(scale) + Math.abs(lastZ));
  const backFocus = () => rear(first.backFocusMm, nRear * abs.a);
  const principalRear = () => rear(first.principalRearMm, nRear * (abs.a + 1));
  const nodalRear = () => rear(first.nodalRearMm, nRear * abs.a + n);
  const fromFirst = (measure: () => Measured) => () => {
    const { value, floor } = measure();
    return { value: plus(value, vertexLength), floor: floor + LENGTH_FLOOR * Math.abs(vertexLength) };
  };
  return [
    ['power', () => power(first.powerPerMm, abs.c)],
    [
      'powerDioptre',
      () =>
        power(
          derive(first.powerPerMm, (value) => 1000 * value),
          1000 * abs.c,
        ),
    ],
    ['A', () => length(finite(a), abs.a)],
    ['B', () => length(finite(b), abs.b)],
    ['C', () => power(finite(c), abs.c)],
    ['D', () => length(finite(d), abs.d)],
    ['efl', () => length(first.focalLengthMm, quotient(1))],
    ['focalLength', () => length(first.rearFocalLengthMm, quotient(nRear))],
    ['frontFocalLength', () => length(first.frontFocalLengthMm, quotient(n))],
    ['backFocus', backFocus],
    ['backFocusFromFirst', fromFirst(backFocus)],
    ['trackLength', fromFirst(backFocus)],
    ['frontFocus', () => front(first.frontFocusMm, n * abs.d)],
    ['principalFront', () => front(first.principalFrontMm, n * (1 + abs.d))],
    ['principalRear', principalRear],
    ['principalRearFromFirst', fromFirst(principalRear)],
    ['nodalFront', () => front(first.nodalFrontMm, nRear + n * abs.d)],
    ['nodalRear', nodalRear],
    ['nodalRearFromFirst', fromFirst(nodalRear)],
    ['angularMagnification', () => length(first.angularMagnification, (abs.d * n) / nRear)],
    [
      'vertexLength',
      () =>
        length(
          finite(vertexLength),
          train.gap.reduce((sum, gap) => sum + Math.abs(gap), 0),
        ),
    ],
    ...each.map((one, k): Rows[number] => {
      const { focalLengthMm } = firstOrder(one);
      return [
        `focalLength${k + 1}`,
        () => length(focalLengthMm, focalLengthMm.ok ? Math.abs(focalLengthMm.value) : 0),
      ];
    }),
  ];
}

function ends(laid: Laid): Rows {
  const { train, lastZ } = laid;
  const axial = axialOf(train);
  const both = conjugates(train, axial);
  const first = firstOrder(train);
  const { count } = train;
  const abs = absoluteRay(train, 0, axial.ray.y[0] ?? 0, axial.ray.nu[0] ?? 0);
  const nu = Math.abs(axial.ray.nu[count] ?? 1);
  const lost = (abs.nu[count] ?? 0) / nu;
  const rearShift = (train.z[count - 1] ?? 0) - lastZ;
  const reach = (Math.abs(train.index[count] ?? 1) * (abs.y[count - 1] ?? 0) * lost) / nu;
  const image = plus(both.imageDistanceMm, rearShift);
  const m = both.magnification;
  const rows: Rows = [
    ['imageDistance', () => length(image, reach)],
    ['objectToImage', () => length(both.objectToImageMm, reach + Math.abs(train.objectZ ?? 0))],
    ['magnification', () => length(m, m.ok ? Math.abs(m.value) * lost : 0)],
  ];
  if (train.objectZ === null) return rows;
  const objectZ = train.objectZ - laid.firstZ;
  const table = new Map(cardinals(laid));
  const from = (point: 'principalFront' | 'principalRear', end: Quantity, scale: number) => () => {
    const { value, floor } = table.get(point)?.() ?? { value: first.principalFrontMm, floor: 0 };
    return {
      value: end.ok ? derive(value, (z) => end.value - z) : end,
      floor: floor + LENGTH_FLOOR * scale,
    };
  };
  rows.push(['objectFromH', from('principalFront', finite(objectZ), Math.abs(objectZ))]);
  rows.push(['imageFromH', from('principalRear', image, reach)]);
  return rows;
}

/** The ledger: object, image and magnification of element K alone, K counted from 1. */
function elements({ train }: Laid): Rows {
  const axial = axialOf(train);
  const abs = absoluteRay(train, 0, axial.ray.y[0] ?? 0, axial.ray.nu[0] ?? 0);
  return conjugateChain(train, axial).flatMap((row): Rows => {
    const surface = train.partOf.indexOf(row.partIndex);
    const scale = (k: number, distance: Quantity) => {
      const nu = Math.abs(axial.ray.nu[k] ?? 1);
      const lost = (abs.nu[k] ?? 0) / nu;
      return distance.ok ? (Math.abs(train.index[k] ?? 1) * (abs.y[surface] ?? 0) * lost) / nu : 0;
    };
    const lost = (k: number) => (abs.nu[k] ?? 0) / Math.abs(axial.ray.nu[k] ?? 1);
    const { magnification: m } = row;
    const key = row.partIndex + 1;
    return [
      [`objectDistance${key}`, () => length(row.objectDistanceMm, scale(surface, row.objectDistanceMm))],
      [`imageDistance${key}`, () => length(row.imageDistanceMm, scale(surface + 1, row.imageDistanceMm))],
      [
        `magnification${key}`,
        () => length(m, m.ok ? Math.abs(m.value) * (lost(surface) + lost(surface + 1)) : 0),
      ],
    ];
  });
}

/** Pupils, Lagrange invariant, Petzval and colour sums. */
function stopImages(laid: Laid, input: Record<string, unknown>): Rows {
  const { train, firstZ, lastZ } = laid;
  const { count, stopSurface } = train;
  const rearShift = (train.z[count - 1] ?? 0) - lastZ;
  const aperture = apertureOf(input.aperture);
  const field = fieldOf(input.field);
  const axial = axialOf(train);
  const rays = referenceRays(train, aperture ?? ANY_APERTURE, field?.size ?? ANY_FIELD, axial);
  const rows: Rows = [];
  const petz = petzval(train, new Float64Array(count).fill(Number.POSITIVE_INFINITY));
  const petzScale = petz.perSurface.reduce((sum, term) => sum + Math.abs(term), 0);
  // Thin lenses have no index in the file, so no Petzval sum either.
  if (train.thinPower.every((one) => one === 0)) {
    rows.push(['petzvalSum', () => power(petz.sumPerMm, petzScale)]);
  }
  if (stopSurface >= 0) {
    const { entrance, exit } = pupils(train, rays);
    const front = absoluteMatrix(train, 0, stopSurface);
    const behind = absoluteMatrix(train, stopSurface);
    const central = rays.stop.ok ? rays.stop.value.central : null;
    const [a, d] = [Math.abs(central?.nu[0] ?? 1), Math.abs(central?.nu[count] ?? 1)];
    rows.push(
      [
        'entrancePupil',
        () => length(plus(entrance.zMm, -firstZ), (front.b / a) * (front.a / a) + Math.abs(firstZ)),
      ],
      ['entrancePupilMagnification', () => length(entrance.magnification, front.a / a / a)],
      [
        'exitPupil',
        () => length(plus(exit.zMm, rearShift), (behind.b / d) * (behind.d / d) + Math.abs(rearShift)),
      ],
      ['exitPupilMagnification', () => length(exit.magnification, behind.d / d / d)],
      [
        'exitPupilFromFirst',
        () =>
          length(
            plus(exit.zMm, rearShift + lastZ - firstZ),
            (behind.b / d) * (behind.d / d) + Math.abs(lastZ - firstZ),
          ),
      ],
    );
  }
  if (aperture === null || field === null) return rows;
  const { marginal, chief } = rays;
  if (!marginal.ok || !chief.ok) return rows;
  const side = field.sideOf(chief.value.nu[0] ?? 0);
  const { lagrange } = light(train, rays, axial, firstOrder(train));
  const nuRear = marginal.value.nu[count] ?? 1;
  const product = (k: number) => Math.abs((marginal.value.nu[k] ?? 0) * (chief.value.y[k] ?? 0));
  rows.push([
    'lagrange',
    () =>
      length(
        derive(lagrange, (H) => side * H),
        product(0) + product(stopSurface),
      ),
  ]);
  if (!train.indexSpread.some((spread) => spread !== 0)) return rows;
  const colour = thinColour(train, rays, axial);
  const sumOf = (value: Quantity, factor: number) => {
    const sum = derive(value, (mm) => mm * factor);
    return length(sum, sum.ok ? Math.abs(sum.value) : 0);
  };
  rows.push(
    ['sumC1', () => sumOf(colour.axialMm, (-nuRear * nuRear) / (train.index[count] ?? 1))],
    ['sumC2', () => sumOf(colour.lateralMm, side * nuRear)],
  );
  return rows;
}

const ANY_APERTURE: ApertureAt = { kind: 'stopDiameter', diameterMm: 1 };
const ANY_FIELD: FieldSize = { kind: 'angle', angleDeg: 1 };
