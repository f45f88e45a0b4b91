import fc from 'fast-check';
import type { Part, Sketch } from '../../../engine/sketch/types.ts';
import { everyPosition } from '../../../engine/sketch/values.ts';
import { anySketch } from '../sketch/arbitrary.ts';

/** Names that a separator, a quote, a line break, a formula or a mark could break. */
const AWKWARD_NAMES = [
  '',
  'first group',
  '=1+2',
  '+5',
  '-3',
  '@home',
  'a,b;c\td',
  'say "when"',
  'two\r\nlines',
  '"',
  'pipe | and \\ stroke',
  '*bold* _and_ `code` <b>',
  '1.5',
  'Ω′ ✓',
] as const;

const anyName = (): fc.Arbitrary<string> => fc.constantFrom(...AWKWARD_NAMES);

/** Any sound sketch whose parts keep clear of each other at every position, with awkward names. */
export const anyLayout = (): fc.Arbitrary<Sketch> =>
  anySketch({ leastParts: 1, mostParts: 5, mostPositions: 3 }).chain((sketch) =>
    fc
      .record({
        title: anyName(),
        parts: fc.tuple(...sketch.parts.map(anyName)),
        positions: fc.tuple(...sketch.positions.map(anyName)),
      })
      .map((names) => ({
        ...sketch,
        title: names.title,
        object: {
          ...sketch.object,
          distanceMm: everyPosition(sketch.object.distanceMm, (distance) =>
            distance === 'infinity' ? distance : distance + roomInFront(sketch.parts[0]),
          ),
        },
        positions: sketch.positions.map((position, k) => ({ ...position, name: names.positions[k] ?? '' })),
        parts: sketch.parts.map(grindable).map((part, k) => ({
          ...part,
          name: names.parts[k] ?? '',
          space: {
            ...part.space,
            lengthMm: everyPosition(
              part.space.lengthMm,
              (gapMm) => gapMm + roomBehind(part) + roomInFront(sketch.parts[k + 1]),
            ),
          },
        })),
      })),
  );

/** Rims so narrow and glass so thick that no surfaces of `anySketch` cross: at 5 mm from the axis their sag is below 1 mm. */
function grindable(part: Part): Part {
  if (part.kind !== 'glass') return part;
  const narrow = (semiDiameterMm: number | null) => Math.min(semiDiameterMm ?? 5, 5);
  return {
    ...part,
    semiDiameterMm: narrow(part.semiDiameterMm),
    surfaces: part.surfaces.map((one) => ({ ...one, semiDiameterMm: narrow(one.semiDiameterMm) })),
    fillings: part.fillings.map((one) => ({ ...one, thicknessMm: one.thicknessMm + 2 })),
  };
}

/** What a thin part reserves, or more than any rim of `grindable` glass reaches. */
const roomInFront = (part: Part | undefined): number =>
  part?.kind === 'glass' ? 1 : part?.kind === 'thin' ? part.roomFrontMm : 0;
const roomBehind = (part: Part): number =>
  part.kind === 'glass' ? 1 : part.kind === 'thin' ? part.roomBehindMm : 0;
