import type { GlassPart, GlassSurface, Part, PlatePart } from '../sketch/types.ts';
import { conicEdge, type Profile, sagAt } from './profile.ts';

/** One face of a piece of glass; lengths in mm, z from the front vertex of the part. */
export interface Face {
  readonly profile: Profile;
  readonly vertexMm: number;
  /** Half its clear diameter. */
  readonly semiMm: number;
  /** How far from the axis it can be drawn: less than `semiMm` where its conic ends or its powers run away within the rim. */
  readonly reachMm: number;
  /** z at that reach. */
  readonly rimMm: number;
  /** Why the reach is less than the rim. */
  readonly ends: 'conic ends' | 'powers run away' | null;
}

/** What a part of glass is made of: its faces from left to right, and half the diameter of the whole. */
export interface Body {
  readonly faces: readonly Face[];
  readonly semiMm: number;
}

/** A sag larger than this many times the height it is met at belongs to no lens. */
const WILD = 10;
/** How finely a face is searched for where two of them come nearest. */
const SAMPLES = 32;
/** Share of the conic's edge that is left out, so that rounding does not put the rim beyond it. */
const EDGE_SHARE = 1e-9;

/** The profile of a surface of a sketch. */
const profileOf = ({ radiusMm, conic, asphere }: GlassSurface): Profile => ({
  curvaturePerMm: radiusMm === null ? 0 : 1 / radiusMm,
  conic,
  asphere,
});

const FLAT: Profile = { curvaturePerMm: 0, conic: 0, asphere: [] };

/** The body of glass or of a plate, `openMm(k)` being half the diameter of a face whose rim is open; null for parts that have none. */
export function bodyOf(part: Part, openMm: (face: number) => number): Body | null {
  if (part.kind !== 'glass' && part.kind !== 'plate') return null;
  const faces = part.kind === 'glass' ? glassFaces(part, openMm) : plateFaces(part, openMm);
  return { faces, semiMm: Math.max(...faces.map(({ semiMm }) => semiMm)) };
}

function glassFaces(part: GlassPart, openMm: (face: number) => number): readonly Face[] {
  let vertexMm = 0;
  return part.surfaces.map((surface, k) => {
    const semiMm = surface.semiDiameterMm ?? part.semiDiameterMm ?? openMm(k);
    const face = faceOf(profileOf(surface), vertexMm, semiMm);
    vertexMm += part.fillings[k]?.thicknessMm ?? 0;
    return face;
  });
}

const plateFaces = (part: PlatePart, openMm: (face: number) => number): readonly Face[] =>
  [0, part.thicknessMm].map((vertexMm, k) => faceOf(FLAT, vertexMm, part.semiDiameterMm ?? openMm(k)));

function faceOf(profile: Profile, vertexMm: number, semiMm: number): Face {
  const edgeMm = conicEdge(profile) * (1 - EDGE_SHARE);
  const conicMm = Math.min(semiMm, edgeMm);
  const reachMm = profile.asphere.length === 0 ? conicMm : calmReach(profile, conicMm);
  const ends = reachMm === semiMm ? null : reachMm < conicMm ? 'powers run away' : 'conic ends';
  return { profile, vertexMm, semiMm, reachMm, rimMm: vertexMm + (sagAt(profile, reachMm) ?? 0), ends };
}

/** The largest height up to `mostMm` below which no sag is out of all proportion. */
function calmReach(profile: Profile, mostMm: number): number {
  let calmMm = 0;
  for (let i = 1; i <= SAMPLES; i++) {
    const heightMm = (mostMm * i) / SAMPLES;
    const sag = sagAt(profile, heightMm);
    if (sag === null || Math.abs(sag) > WILD * heightMm) return calmMm;
    calmMm = heightMm;
  }
  return mostMm;
}

/** z of a face at a height in mm, from the front vertex of the part; beyond its rim it goes on flat. */
export const faceAt = ({ profile, vertexMm, reachMm, rimMm }: Face, heightMm: number): number =>
  heightMm >= reachMm ? rimMm : vertexMm + (sagAt(profile, heightMm) ?? 0);

/** Thickness at the edge of each piece of glass in mm: from rim to rim, negative where they have crossed. */
export const edgeThicknesses = ({ faces }: Body): readonly number[] =>
  faces.slice(1).map((rear, k) => rear.rimMm - (faces[k]?.rimMm ?? 0));

/** The least of `clear(height)` over the heights from the axis to `upToMm`, and the height it is met at; `also` names heights not to be missed. */
export function leastOver(
  upToMm: number,
  clear: (heightMm: number) => number,
  also: readonly number[] = [],
): { readonly clearMm: number; readonly heightMm: number } {
  let least = { clearMm: clear(0), heightMm: 0 };
  const heights = [
    ...also.filter((height) => height < upToMm),
    ...Array.from({ length: SAMPLES }, (_, i) => (upToMm * (i + 1)) / SAMPLES),
  ];
  for (const heightMm of heights) {
    const clearMm = clear(heightMm);
    if (clearMm < least.clearMm) least = { clearMm, heightMm };
  }
  return least;
}

/** Where the faces on both sides of piece `k` of glass come nearest; a thickness below 0 means that they cross there. */
export function thinnest(
  { faces }: Body,
  k: number,
): { readonly clearMm: number; readonly heightMm: number } {
  const [front, rear] = [faces[k], faces[k + 1]];
  if (!front || !rear) return { clearMm: 0, heightMm: 0 };
  const upToMm = Math.min(front.reachMm, rear.reachMm);
  return leastOver(upToMm, (height) => faceAt(rear, height) - faceAt(front, height));
}

/** How far (mm, ≥ 0) glass reaches in front of its front vertex, or behind its rear vertex, within `withinMm` of the axis. */
export function roomOf(body: Body, side: 'front' | 'behind', withinMm = Number.POSITIVE_INFINITY): number {
  const face = side === 'front' ? body.faces[0] : body.faces.at(-1);
  if (!face) return 0;
  const upToMm = Math.min(body.semiMm, withinMm);
  const sign = side === 'front' ? 1 : -1;
  const inside = (height: number) => sign * (faceAt(face, height) - face.vertexMm);
  return Math.max(0, -leastOver(upToMm, inside, [face.reachMm]).clearMm);
}

/**
 * The room in mm that a part takes in front of its front vertex or behind its rear vertex: what a thin part reserves, and how far the
 * rim of glass reaches. A face whose rim is open counts as wide as `openMm` says, which is nothing unless given.
 */
export function roomBeside(
  part: Part,
  side: 'front' | 'behind',
  openMm: (face: number) => number = () => 0,
): number {
  if (part.kind === 'thin') return side === 'front' ? part.roomFrontMm : part.roomBehindMm;
  const body = bodyOf(part, openMm);
  return body ? roomOf(body, side) : 0;
}
