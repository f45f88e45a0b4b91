import fc from 'fast-check';
import type {
  Aperture,
  Field,
  GlassSurface,
  Group,
  Medium,
  ObjectDistance,
  Part,
  PartId,
  PerPosition,
  Position,
  PositionId,
  Sensor,
  Setting,
  Sketch,
  SolidMedium,
} from '../../../engine/sketch/types.ts';

export interface SketchSize {
  readonly leastParts?: number;
  readonly mostParts?: number;
  readonly mostPositions?: number;
}

/** A number between two limits: often round, otherwise any double; never −0, nor so small that lengths in mm lose it. */
export function anyNumber(low: number, high: number): fc.Arbitrary<number> {
  const any = fc
    .double({ min: low, max: high, noNaN: true })
    .map((value) => (Math.abs(value) < 1e-9 && low <= 0 ? 0 : value));
  const [least, most] = [Math.ceil(low), Math.floor(high)];
  return least > most ? any : fc.oneof(any, fc.integer({ min: least, max: most }));
}

/** Focal lengths of either sign, from strong to nearly none. */
const anyFocalLength = (): fc.Arbitrary<number> =>
  fc
    .tuple(fc.oneof(anyNumber(5, 300), fc.constantFrom(25, 50, 100), anyNumber(300, 1e6)), fc.boolean())
    .map(([size, negative]) => (negative ? -size : size));

/** One to `most` positions; ids are not in order of the list. */
const anyPositions = (most = 4): fc.Arbitrary<readonly Position[]> =>
  fc
    .uniqueArray(fc.constantFrom('wide', 'middle', 'narrow', 'only', 'pos1', 'pos2', 'near', 'far'), {
      minLength: 1,
      maxLength: most,
    })
    .map((ids) => ids.map((id) => ({ id: id as PositionId, name: id })));

/** A value common to all positions, or one for each. */
const anyPerPosition = <T>(
  value: fc.Arbitrary<T>,
  positions: readonly Position[],
): fc.Arbitrary<PerPosition<T>> =>
  fc.oneof(
    value,
    fc
      .array(value, { minLength: positions.length, maxLength: positions.length })
      .map((values) => Object.fromEntries(positions.map(({ id }, index) => [id, values[index] as T]))),
  );

/** Any place of the scrubber: on a position or between two. */
export const anySetting = (positions: readonly Position[]): fc.Arbitrary<Setting> =>
  fc
    .tuple(fc.nat({ max: positions.length - 1 }), fc.constantFrom(0, 0.25, 0.5, 0.999))
    .map(([index, toNext]) => ({
      at: positions[index]?.id as PositionId,
      toNext: index === positions.length - 1 ? 0 : toNext,
    }));

const anyMedium = (): fc.Arbitrary<Medium> =>
  fc.oneof({ weight: 4, arbitrary: fc.constant('air' as const) }, { weight: 1, arbitrary: anySolid() });

/** A medium of each kind; each has an index in all lines of `anySketch`. */
const anySolid = (): fc.Arbitrary<SolidMedium> =>
  fc.oneof(
    anyFixedMedium(),
    fc.constantFrom('n-bk7', 'n-sf6', 'f2').map((material) => ({ material })),
    fc.constantFrom('517642', '620364').map((code) => ({ code })),
    fc.constant({
      name: 'own plastic',
      formula: { kind: 'cauchy' as const, coefficients: [1.48, 0.004, -2] },
      rangeNm: [400, 1000] as const,
    }),
  );

const anyFixedMedium = () =>
  fc.record({
    name: fc.constantFrom('water', 'oil', 'crown'),
    index: anyNumber(1, 2),
    abbeNumber: fc.option(anyNumber(20, 90)),
  });

/** A part of any kind, its gap common or split. */
const anyPart = (positions: readonly Position[], id: string): fc.Arbitrary<Part> => {
  const base = {
    id: fc.constant(id as PartId),
    name: fc.constantFrom('', 'first group', 'field lens', 'Ω “quoted” ✓'),
    note: fc.constantFrom('', 'from stock'),
    semiDiameterMm: fc.option(anyNumber(1, 40)),
    space: fc.record({ lengthMm: anyPerPosition(anyNumber(0, 120), positions), medium: anyMedium() }),
  };
  const thin = fc.record({
    kind: fc.constant('thin' as const),
    ...base,
    focalLengthMm: anyFocalLength(),
    abbeNumber: fc.option(anyNumber(20, 90)),
    index: fc.option(anyNumber(1, 2)),
    material: fc.option(anySolid(), { freq: 2 }),
    shapeFactor: fc.option(anyNumber(-3, 3)),
    roomFrontMm: anyNumber(0, 10),
    roomBehindMm: anyNumber(0, 10),
  });
  const stop = fc.record({ kind: fc.constant('stop' as const), ...base });
  const plate = fc.record({
    kind: fc.constant('plate' as const),
    ...base,
    thicknessMm: anyNumber(0.5, 20),
    material: anySolid(),
  });
  const glass = fc.integer({ min: 2, max: 4 }).chain((count) =>
    fc.record({
      kind: fc.constant('glass' as const),
      ...base,
      surfaces: fc.array(anySurface(), { minLength: count, maxLength: count }),
      fillings: fc.array(fc.record({ thicknessMm: anyNumber(0, 15), material: anySolid() }), {
        minLength: count - 1,
        maxLength: count - 1,
      }),
    }),
  );
  return fc.oneof(
    { weight: 5, arbitrary: thin },
    { weight: 1, arbitrary: stop },
    { weight: 1, arbitrary: plate },
    { weight: 2, arbitrary: glass },
  );
};

/** Spheres, flats, conics and aspheres; rims of their own for some. */
const anySurface = (): fc.Arbitrary<GlassSurface> =>
  fc.record({
    radiusMm: fc.option(
      anyNumber(15, 400).chain((size) => fc.constantFrom(size, -size)),
      { freq: 5 },
    ),
    conic: fc.oneof({ weight: 3, arbitrary: fc.constant(0) }, { weight: 1, arbitrary: anyNumber(-3, 1) }),
    asphere: fc.oneof(
      { weight: 3, arbitrary: fc.constant([]) },
      {
        weight: 1,
        arbitrary: fc.array(
          fc
            .double({ min: -1e-7, max: 1e-7, noNaN: true })
            .map((value) => (Math.abs(value) < 1e-12 ? 0 : value)),
          { maxLength: 3 },
        ),
      },
    ),
    semiDiameterMm: fc.option(anyNumber(1, 40)),
  });

const anyAperture = (positions: readonly Position[]): fc.Arbitrary<Aperture> =>
  fc.oneof(
    fc.record({
      kind: fc.constant('stopDiameter' as const),
      diameterMm: anyPerPosition(anyNumber(1, 30), positions),
    }),
    fc.record({
      kind: fc.constantFrom('workingFNumber' as const, 'infinityFNumber' as const),
      fNumber: anyNumber(1, 22),
    }),
    fc.record({
      kind: fc.constant('objectNA' as const),
      na: fc.double({ min: 0.01, max: 0.9, noNaN: true }),
    }),
    fc.record({ kind: fc.constant('entrancePupilDiameter' as const), diameterMm: anyNumber(1, 30) }),
  );

const anyField = (): fc.Arbitrary<Field> =>
  fc.record({
    size: fc.oneof(
      fc.record({ kind: fc.constant('angle' as const), angleDeg: anyNumber(0, 60) }),
      fc.record({
        kind: fc.constantFrom('objectHeight' as const, 'imageHeight' as const),
        heightMm: anyNumber(0, 100),
      }),
    ),
    fractions: fc.array(anyNumber(-1, 1), { minLength: 1, maxLength: 9 }),
    vignetting: anyNumber(0, 1),
  });

const anySensor = (): fc.Arbitrary<Sensor> =>
  fc.record({
    size: fc.oneof(
      fc.record({ widthMm: anyNumber(1, 40), heightMm: anyNumber(1, 40) }),
      fc.record({ diagonalMm: anyNumber(1, 50) }),
    ),
    pixelPitchMm: fc.option(fc.double({ min: 0.001, max: 0.02, noNaN: true })),
  });

/** Runs of two or three neighbours tied together. */
function groupsOf(parts: readonly Part[], sizes: readonly number[]): readonly Group[] {
  const groups: Group[] = [];
  let from = 0;
  for (const [index, size] of sizes.entries()) {
    const partIds = parts.slice(from, from + size).map((part) => part.id);
    if (partIds.length > 1)
      groups.push({ id: `g${index + 1}` as Group['id'], name: `group ${index + 1}`, partIds });
    from += size;
  }
  return groups;
}

/** Any sound sketch: several positions, common and split gaps, plates, stops, media and groups. Built sound, not filtered. */
export const anySketch = ({
  leastParts = 0,
  mostParts = 7,
  mostPositions = 4,
}: SketchSize = {}): fc.Arbitrary<Sketch> =>
  fc
    .tuple(anyPositions(mostPositions), fc.integer({ min: leastParts, max: mostParts }))
    .chain(([positions, count]) => {
      const ids = Array.from({ length: count }, (_, index) => `p${index + 1}`);
      const distance: fc.Arbitrary<ObjectDistance> = fc.oneof(
        fc.constant('infinity' as const),
        anyNumber(1, 3000),
      );
      return fc.record({
        title: fc.string({ maxLength: 20 }),
        notes: fc.string({ maxLength: 40 }),
        object: fc.record({ distanceMm: anyPerPosition(distance, positions), medium: anyMedium() }),
        parts: fc.tuple(...ids.map((id) => anyPart(positions, id))),
        image:
          count === 0 ? fc.constant('focus' as const) : fc.constantFrom('focus' as const, 'fixed' as const),
        sensor: fc.option(anySensor()),
        registerMm: fc.option(anyNumber(1, 50)),
        stop: fc.option(fc.nat()),
        aperture: anyAperture(positions),
        field: anyField(),
        lines: fc.constantFrom(
          {
            mainNm: 587.5618,
            shortNm: 486.1327,
            longNm: 656.2725,
            weights: { main: 1, short: 1, long: 1 },
            more: [],
          },
          {
            mainNm: 850,
            shortNm: 830,
            longNm: 870,
            weights: { main: 2, short: 1, long: 0.5 },
            more: [{ wavelengthNm: 860, weight: 1 }],
          },
        ),
        air: fc.constantFrom('unity' as const, 'standard' as const),
        positions: fc.constant(positions),
        groups: fc.array(fc.integer({ min: 1, max: 3 }), { maxLength: 3 }),
        assumedIndex: anyNumber(1.4, 1.9),
        blurMm: fc.option(fc.double({ min: 0.001, max: 0.1, noNaN: true })),
      });
    })
    .map((drawn) => ({
      ...drawn,
      stop: drawn.stop === null ? null : (drawn.parts[drawn.stop % drawn.parts.length]?.id ?? null),
      groups: groupsOf(drawn.parts, drawn.groups),
    }));

/** Freezes data to its leaves, so that any change of it throws. */
export function frozen<T>(data: T): T {
  if (typeof data === 'object' && data !== null && !Object.isFrozen(data)) {
    Object.freeze(data);
    for (const value of Object.values(data)) frozen(value);
  }
  return data;
}
