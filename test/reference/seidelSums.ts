import { type Seidel, seidel } from '../../engine/aberration/seidel.ts';
import { finite } from '../../engine/paraxial/absence.ts';
import type { ReferenceRays } from '../../engine/paraxial/rays.ts';
import type { ParaxialRay } from '../../engine/paraxial/trace.ts';
import { absoluteRay } from '../engine/absolute.ts';
import { isRecord } from './json.ts';
import { signedRays } from './light.ts';
import { type Measured, readTrain } from './measure.ts';
import { type Laid, layOut } from './prescription.ts';
import { type CaseReport, COMPUTED_RELATIVE, compare, type Miss, reportOf } from './report.ts';
import { SUM_CODES } from './sums.ts';

/** The sums and each surface's share of them against the sum of absolute terms. */
const SUM_TOLERANCE = 1e-14;
/** Heights and slopes against the recurrence with absolute values. */
const RAY_FLOOR = 1e-14;

/** Runs every system of a file with Seidel sums by surface; a system that cannot be laid out is skipped with its id. */
export function runSeidel(file: unknown): readonly CaseReport[] {
  const systems: readonly unknown[] = isRecord(file) && Array.isArray(file.systems) ? file.systems : [];
  return systems.map((system, place) => {
    const id =
      isRecord(system) && typeof system.id === 'string' ? system.id : `system ${place + 1} without an id`;
    return isRecord(system) ? runSystem(id, system) : reportOf(id, [], [], []);
  });
}

function runSystem(id: string, system: Record<string, unknown>): CaseReport {
  const prescription = isRecord(system.prescription) ? system.prescription : {};
  const laid = layOut(prescription);
  const rays = laid && signedRays(laid, prescription);
  const sums = laid && rays && seidel(laid.train, rays);
  const table = laid && rays && sums?.ok ? measure(laid, prescription, rays, sums.value) : new Map();
  const covered: string[] = [];
  const left: string[] = [];
  const misses: Miss[] = [];
  for (const [quantity, wanted] of figuresOf(system)) {
    const measured: Measured | undefined = table.get(quantity);
    if (measured === undefined) {
      left.push(quantity);
      continue;
    }
    covered.push(quantity);
    const relative = isSum(quantity) ? 0 : COMPUTED_RELATIVE * Math.abs(wanted);
    misses.push(...compare(quantity, measured.value, wanted, relative + measured.floor));
  }
  return reportOf(id, covered, left, misses);
}

const isSum = (quantity: string): boolean => (quantity.split('.').at(-1) ?? '') in SUM_CODES;

/** Every number of a system but its prescription, by its path: `surfaces.0.S1`, `sums.S1`, `pupils.exitPupil`, `focalLength`. */
function figuresOf(record: Record<string, unknown>, path = ''): readonly [string, number][] {
  return Object.entries(record).flatMap(([key, value]): readonly [string, number][] => {
    if (key === 'prescription') return [];
    if (typeof value === 'number') return [[path + key, value]];
    const inner = Array.isArray(value) ? { ...value } : value;
    return isRecord(inner) ? figuresOf(inner, `${path + key}.`) : [];
  });
}

function measure(
  laid: Laid,
  prescription: Record<string, unknown>,
  rays: ReferenceRays,
  { perSurface, totals, absolute }: Seidel,
): ReadonlyMap<string, Measured> {
  const table = new Map<string, Measured>();
  const { train } = laid;
  const read = readTrain(laid, prescription);
  for (const name of ['lagrange', 'petzvalSum', 'focalLength', 'backFocus']) setRead(table, name, read(name));
  for (const end of ['entrancePupil', 'exitPupil'])
    for (const name of [end, `${end}Magnification`]) setRead(table, `pupils.${name}`, read(name));
  for (const [code, name] of Object.entries(SUM_CODES)) {
    const floor = SUM_TOLERANCE * absolute[name];
    table.set(`sums.${code}`, { value: finite(totals[name]), floor });
    for (const [place, k] of written(laid).entries())
      table.set(`surfaces.${place}.${code}`, { value: finite(perSurface[name][k]!), floor });
  }
  if (!rays.marginal.ok || !rays.chief.ok) return table;
  const first = written(laid)[0] ?? 0;
  for (const [ray, end, names] of [
    [rays.marginal.value, 'marginalAtFirst', ['y', 'u', 'uAfter', 'A']],
    [rays.chief.value, 'chiefAtFirst', ['ybar', 'ubar', 'ubarAfter', 'Abar']],
  ] as const) {
    const [y, u, uAfter, A] = names;
    const scale = absoluteRay(train, 0, ray.y[0] ?? 0, ray.nu[0] ?? 0);
    const put = (key: string, value: number, size: number) =>
      table.set(key, { value: finite(value), floor: RAY_FLOOR * size });
    put(`${end}.${y}`, ray.y[first]!, scale.y[first]!);
    put(`${end}.${u}`, ray.nu[first]! / train.index[first]!, scale.nu[first]!);
    for (const [place, k] of written(laid).entries()) {
      const n = train.index[k + 1]!;
      put(`surfaces.${place}.${y}`, ray.y[k]!, scale.y[k]!);
      put(`surfaces.${place}.${uAfter}`, ray.nu[k + 1]! / n, scale.nu[k + 1]! / Math.abs(n));
      put(`surfaces.${place}.${A}`, incidence(laid, ray, k), scale.nu[k]! + scale.y[k]!);
    }
  }
  return table;
}

const setRead = (table: Map<string, Measured>, name: string, measured: Measured | null): void => {
  if (measured) table.set(name, measured);
};

/** n i at surface k. */
const incidence = ({ train }: Laid, ray: ParaxialRay, k: number): number =>
  ray.nu[k]! + train.index[k]! * train.curvature[k]! * ray.y[k]!;

/** Surfaces that the prescription has, in order: a stop standing free is none. */
const written = ({ train }: Laid): readonly number[] =>
  Array.from(train.partOf.keys()).filter((k) => train.partOf[k]! >= 0);
