import { CLIP_FORMAT } from '../clip.ts';
import { newStop, newSurface } from '../create.ts';
import { pasteParts } from '../edits/copy.ts';
import type { GlassPart, Part, PartId, Sketch } from '../types.ts';
import type { Role } from './columns.ts';
import { columnsOf } from './columns.ts';
import { splitTable } from './split.ts';
import { type PrescriptionRow, readSurfaces, type Surface } from './surfaces.ts';

/** How a pasted table is read, and what becomes of it. */
export interface Prescription {
  /** What each column is taken for. */
  readonly roles: readonly Role[];
  readonly rows: readonly PrescriptionRow[];
  /** Every reason why it does not become parts, one sentence each. */
  readonly faults: readonly string[];
  /** What was left out, one sentence each. */
  readonly remarks: readonly string[];
  /** Glass and stops with the gaps between them, ids p1, p2, …; empty as long as there are faults. */
  readonly parts: readonly Part[];
}

/**
 * Reads a table of radius, thickness and index or glass, one surface a line, lengths in mm, cells parted by tabs, semicolons,
 * commas or blanks. What stands in a line lies behind its surface. Each run of glass from air to air becomes a part. `roles` says
 * what the columns hold where the user knows better. Never throws: what cannot be read has its sentence.
 */
export function readPrescription(text: string, roles?: readonly Role[]): Prescription {
  const lines = splitTable(text.slice(0, LONGEST));
  const columns = columnsOf(lines);
  const chosen = roles?.length === columns.roles.length ? roles : columns.roles;
  const table = readSurfaces(columns.data, chosen);
  const faults = [...tableFaults(text, chosen, table.surfaces), ...table.faults];
  const remarks = [
    ...columns.besides.map(({ number }) => `Line ${number} holds no numbers and is left out.`),
    ...table.remarks,
  ];
  const built = partsOf(table.surfaces);
  const all = [...faults, ...built.faults];
  return {
    roles: chosen,
    rows: table.rows,
    faults: all,
    // A cell that is not read leaves its surface in air.
    remarks: [...remarks, ...(faults.length === 0 ? built.remarks : [])],
    parts: all.length === 0 ? built.parts : [],
  };
}

/** Whether a text looks like a table of surfaces: at least two, and most cells of it can be read. */
export function looksLikePrescription(text: string): boolean {
  if (text.length > LONGEST) return false;
  const { rows, parts } = readPrescription(text);
  if (parts.length > 0) return true;
  const cells = rows.flatMap((row) => row.cells);
  return (
    rows.length >= 2 && cells.length >= 6 && cells.filter(({ fault }) => fault).length * 3 < cells.length
  );
}

/** No table of surfaces is longer; reading stops there. */
const LONGEST = 50_000;
/** In mm: the gap in front of the parts when they come behind others, since a table does not tell it. */
const NOMINAL_GAP_MM = 10;

/**
 * Puts the parts of a table behind a part, or into the empty sketch. What stands behind moves along. A stop of the table becomes the
 * aperture stop when the sketch has none; in an empty sketch without one the stop rides on the first part, until another is chosen.
 * Gives the very sketch when the table is not read.
 */
export function insertPrescription(sketch: Sketch, { parts }: Prescription, behind: PartId | null): Sketch {
  const last = parts.at(-1);
  if (last === undefined) return sketch;
  const alone = sketch.parts.length === 0;
  const run = alone ? parts : parts.with(-1, { ...last, space: { ...last.space, lengthMm: NOMINAL_GAP_MM } });
  const next = pasteParts(sketch, { format: CLIP_FORMAT, parts: run }, behind);
  const known = new Set(sketch.parts.map(({ id }) => id));
  const ownStop = next.parts.find(({ id, kind }) => kind === 'stop' && !known.has(id));
  const stop = ownStop ?? (alone ? next.parts[0] : undefined);
  return stop === undefined || next.stop !== null ? next : { ...next, stop: stop.id };
}

function tableFaults(text: string, roles: readonly Role[], surfaces: readonly Surface[]): readonly string[] {
  if (text.trim() === '')
    return ['Paste or type a table: radius, thickness, and index or glass, one surface a line.'];
  if (text.length > LONGEST) return [`The text has more than ${LONGEST} characters.`];
  if (surfaces.length === 0) return ['No line holds a surface: radius, thickness, and index or glass.'];
  const missing = (['radius', 'thickness', 'medium'] as const).filter((role) => !roles.includes(role));
  return missing.map((role) => `No column is taken for the ${ROLE_WORDS[role]}.`);
}

const ROLE_WORDS = { radius: 'radius', thickness: 'thickness', medium: 'index or glass' } as const;

interface Built {
  readonly parts: readonly Part[];
  readonly faults: readonly string[];
  readonly remarks: readonly string[];
}

/** Glass from air to air, stops between; other planes in air are left out, and their distances counted on. */
function partsOf(surfaces: readonly Surface[]): Built {
  const parts: Part[] = [];
  const faults: string[] = [];
  const remarks: string[] = [];
  let run: Surface[] = [];
  for (const surface of surfaces) {
    if (run.length === 0 && surface.medium === 'air') {
      if (surface.isStop) parts.push(withGap(stopOf(surface), surface.thicknessMm));
      else {
        remarks.push(`Line ${surface.line} has air on both sides and is left out; its distance is kept.`);
        addToGap(parts, surface.thicknessMm);
      }
      continue;
    }
    if (surface.isStop) remarks.push(`Line ${surface.line} is both stop and glass; it is taken as glass.`);
    run.push(surface);
    if (surface.medium !== 'air') continue;
    parts.push(withGap(glassOf(run), surface.thicknessMm));
    run = [];
  }
  const open = run.at(-1);
  if (open)
    faults.push(`Line ${open.line} is the last and has glass behind it; a surface to air must follow.`);
  if (parts.every(({ kind }) => kind === 'stop') && faults.length === 0 && surfaces.length > 0)
    faults.push('No line has glass behind it.');
  return { parts: parts.map((part, at) => ({ ...part, id: `p${at + 1}` as PartId })), faults, remarks };
}

function addToGap(parts: Part[], lengthMm: number): void {
  const last = parts.at(-1);
  if (last && typeof last.space.lengthMm === 'number')
    parts[parts.length - 1] = withGap(last, last.space.lengthMm + lengthMm);
}

const withGap = (part: Part, lengthMm: number): Part => ({ ...part, space: { ...part.space, lengthMm } });

const stopOf = ({ semiDiameterMm }: Surface): Part => ({ ...newStop(), semiDiameterMm });

function glassOf(run: readonly Surface[]): GlassPart {
  return {
    ...newStop(),
    kind: 'glass',
    surfaces: run.map(({ radiusMm, conic, semiDiameterMm }) => ({
      ...newSurface(radiusMm),
      conic,
      semiDiameterMm,
    })),
    fillings: run.flatMap(({ thicknessMm, medium }) =>
      medium === 'air' ? [] : [{ thicknessMm, material: medium }],
    ),
  };
}
