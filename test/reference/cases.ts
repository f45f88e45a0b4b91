import { readFileSync } from 'node:fs';
import { finite } from '../../engine/paraxial/absence.ts';
import { heightInSpace, paraxialRay } from '../../engine/paraxial/trace.ts';
import { readAxisRays } from './axisRays.ts';
import { readClosedForm } from './closedForms.ts';
import { readDispersion } from './dispersion.ts';
import { runExactRays } from './exactRays.ts';
import { isRecord, numberIn } from './json.ts';
import { type Reader, readTrain } from './measure.ts';
import { type Laid, layOut } from './prescription.ts';
import { type CaseReport, COMPUTED_RELATIVE, compare, type Miss, missLine, reportOf } from './report.ts';
import { runSeidel } from './seidelSums.ts';

/** Printed tolerances end on a digit; this keeps the conversion to binary from counting as a miss. */
const PRINTED_SLACK = 1e-12;

/** Runs every case of a list of cases. Entries that are no case, or that cannot be expressed, are skipped with their id. */
export function runCases(list: unknown): readonly CaseReport[] {
  const entries: readonly unknown[] = Array.isArray(list) ? list : [];
  return entries.map((entry, place) => {
    const id =
      isRecord(entry) && typeof entry.id === 'string' ? entry.id : `entry ${place + 1} without an id`;
    return isRecord(entry) ? runCase(id, entry) : reportOf(id, [], [], []);
  });
}

/**
 * Runs case files and prints a line per miss, what cannot be expressed, and `N passed, N failed, N skipped`. Returns the exit
 * code: 1 on a miss or a file that cannot be read.
 */
export function main(paths: readonly string[], print: (line: string) => void): number {
  if (paths.length === 0) {
    print('Name at least one case file: npm run cases -- FILE…');
    return 1;
  }
  const reports: CaseReport[] = [];
  let unreadable = 0;
  for (const path of paths) {
    const found = runFile(path);
    if (typeof found === 'string') {
      print(found);
      unreadable++;
    } else {
      reports.push(...found);
    }
  }
  for (const { id, misses } of reports) for (const miss of misses) print(missLine(id, miss));
  for (const { id, outcome, left } of reports) {
    if (outcome === 'skipped') print(`cannot express: ${id}`);
    else if (left.length > 0) print(`left out: ${id}, ${left.join(', ')}`);
  }
  const count = (outcome: CaseReport['outcome']) =>
    reports.filter((report) => report.outcome === outcome).length;
  print(`${count('passed')} passed, ${count('failed')} failed, ${count('skipped')} skipped`);
  return count('failed') + unreadable > 0 ? 1 : 0;
}

/** The reports of one file, or the sentence that says why there are none. */
function runFile(path: string): readonly CaseReport[] | string {
  let text: string;
  try {
    text = readFileSync(path, 'utf8');
  } catch {
    return `${path} cannot be read: no such file, or no permission.`;
  }
  try {
    return runParsed(JSON.parse(text)) ?? `${path} holds no list of cases and no systems with rays or sums.`;
  } catch (error) {
    if (error instanceof SyntaxError) return `${path} is not JSON.`;
    throw error;
  }
}

/** A list of cases, or systems with exact rays or with Seidel sums; null when it is none of them. */
function runParsed(file: unknown): readonly CaseReport[] | null {
  if (Array.isArray(file)) return runCases(file);
  const systems: readonly unknown[] = isRecord(file) && Array.isArray(file.systems) ? file.systems : [];
  const hold = (key: string) => systems.some((system) => isRecord(system) && key in system);
  if (hold('rays')) return runExactRays(file);
  return hold('sums') ? runSeidel(file) : null;
}

function runCase(id: string, entry: Record<string, unknown>): CaseReport {
  const input = isRecord(entry.input) ? entry.input : {};
  const expected = isRecord(entry.expected) ? entry.expected : {};
  const computed = isRecord(entry.computed) && isRecord(entry.computed.values) ? entry.computed.values : {};
  const reader = readerOf(id, input, entry.kind);
  const names = [...new Set([...Object.keys(expected), ...Object.keys(computed)])];
  const covered: string[] = [];
  const left: string[] = [];
  const misses: Miss[] = [];
  for (const quantity of names) {
    const measured = reader?.(quantity) ?? null;
    const claim = claimOf(expected[quantity]);
    const figure =
      claim ?? (quantity in computed ? { value: numberIn(computed, quantity), tolerance: null } : null);
    if (measured === null || figure === null) {
      left.push(quantity);
      continue;
    }
    covered.push(quantity);
    const { value, floor } = measured;
    if (claim) misses.push(...compare(quantity, value, claim.value, claim.tolerance + slack(claim.value)));
    const exact = numberIn(computed, quantity);
    if (exact !== null)
      misses.push(...compare(quantity, value, exact, COMPUTED_RELATIVE * Math.abs(exact) + floor));
  }
  return reportOf(id, covered, left, misses);
}

const slack = (value: number | null): number => PRINTED_SLACK * Math.abs(value ?? 0);

/** The printed figure of a quantity; its value is null when the quantity does not exist. Null when it is not of that form. */
function claimOf(entry: unknown): { value: number | null; tolerance: number } | null {
  if (!isRecord(entry)) return null;
  const value = entry.value === null ? null : numberIn(entry, 'value');
  const tolerance = numberIn(entry, 'tolerance') ?? (entry.tolerance === undefined ? 0 : null);
  if (tolerance === null || (value === null && entry.value !== null)) return null;
  return { value, tolerance };
}

function readerOf(id: string, input: Record<string, unknown>, kind: unknown): Reader | null {
  if (kind === 'dispersion') return readDispersion(input);
  if (input.prescription === undefined) return readClosedForm(input);
  const prescription = isRecord(input.prescription) ? input.prescription : {};
  if (Array.isArray(input.positions)) return readPositions(prescription, input.positions);
  const laid = layOut(prescription);
  if (laid === null) return null;
  const readers = [readTrain(laid, prescription), readAxisRays(laid, input), NOTES[id]?.(laid)];
  return (quantity) => {
    for (const reader of readers) {
      const measured = reader?.(quantity);
      if (measured) return measured;
    }
    return null;
  };
}

/** The quantities of several positions, prefixed by the position's name and a dot. */
function readPositions(prescription: Record<string, unknown>, positions: readonly unknown[]): Reader | null {
  const readers = new Map<string, Reader>();
  for (const position of positions) {
    if (!isRecord(position) || typeof position.name !== 'string') return null;
    const laid = layOut(prescription, isRecord(position.gaps) ? position.gaps : {});
    if (laid === null) return null;
    readers.set(position.name, readTrain(laid, prescription));
  }
  return (quantity) => {
    const dot = quantity.lastIndexOf('.');
    return readers.get(quantity.slice(0, dot))?.(quantity.slice(dot + 1)) ?? null;
  };
}

/** Quantities that only the note of one case explains: an object 20 high, an axial ray 10 high, a ray through the first vertex. */
const NOTES: Readonly<Record<string, (laid: Laid) => Reader>> = {
  'smith-doublet-finite': ({ train }) => {
    const objectZ = train.objectZ ?? -1;
    const [axial, fromVertex] = [paraxialRay(train, 10, -10 / objectZ), paraxialRay(train, 0, 20 / objectZ)];
    const nuRear = axial.nu[train.count] ?? 1;
    const plane = (train.z[train.count - 1] ?? 0) - (axial.y[train.count - 1] ?? 0) / nuRear;
    const table = new Map([
      ['imageHeight', heightInSpace(train, fromVertex, train.count, plane)],
      ['axial.y2', axial.y[1] ?? 0],
      ['axial.y3', axial.y[2] ?? 0],
      ['axial.nu3', axial.nu[3] ?? 0],
      ['fromVertex.y3', fromVertex.y[2] ?? 0],
      ['fromVertex.nu3', fromVertex.nu[3] ?? 0],
    ]);
    return (quantity) => {
      const value = table.get(quantity);
      return value === undefined
        ? null
        : { value: finite(value), floor: COMPUTED_RELATIVE * Math.abs(value) };
    };
  },
};
