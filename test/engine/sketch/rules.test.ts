import { fc, test } from '@fast-check/vitest';
import { describe, expect } from 'vitest';
import { emptySketch, newPlate, newStop, newThin } from '../../../engine/sketch/create.ts';
import { faultsOf } from '../../../engine/sketch/rules.ts';
import type { Aperture, Field, FieldSize, Lines, Part, Sketch } from '../../../engine/sketch/types.ts';
import { inspectionZoom } from '../demo.ts';
import { anySketch } from './arbitrary.ts';
import { at, id, row } from './layout.ts';

const withPart = (part: Partial<Part>): Sketch => ({
  ...emptySketch(),
  parts: [{ ...newThin(50), name: 'second group', ...part } as Part],
});
const withAperture = (aperture: Aperture): Sketch => ({ ...emptySketch(), aperture });
const withField = (field: Partial<Field>): Sketch => ({
  ...emptySketch(),
  field: { ...emptySketch().field, ...field },
});
const withLines = (lines: Partial<Lines>): Sketch => ({
  ...emptySketch(),
  lines: { ...emptySketch().lines, ...lines },
});
const withSize = (size: FieldSize): Sketch => withField({ size });

const sentencesOf = (sketch: Sketch): readonly string[] => faultsOf(sketch).map((fault) => fault.sentence);
const pathsOf = (sketch: Sketch): readonly string[] => faultsOf(sketch).map((fault) => fault.path);

describe('a sound sketch', () => {
  test('may be empty, the demo, or two hundred parts', () => {
    expect(faultsOf(emptySketch())).toEqual([]);
    expect(faultsOf(inspectionZoom())).toEqual([]);
    expect(faultsOf(row(...Array.from({ length: 200 }, () => 1)))).toEqual([]);
  });

  test('may have negative gaps, a plate and a free stop', () => {
    const gap = { lengthMm: -3, medium: { name: 'water', index: 1.333, abbeNumber: null } };
    const parts = [newThin(50), { ...newPlate(2), id: id('p2'), space: gap }, newStop(id('p3'))];
    expect(faultsOf({ ...emptySketch(), parts })).toEqual([]);
  });

  test.prop([anySketch()])('has no fault', (sketch) => {
    expect(faultsOf(sketch)).toEqual([]);
  });
});

describe('a broken rule', () => {
  test.each([
    [
      'zero focal length',
      withPart({ focalLengthMm: 0 }),
      'parts[0].focalLengthMm',
      'The focal length of “second group” is 0 mm; it must be a number other than zero, between 0.001 and 1,000,000 mm in size.',
    ],
    [
      'a focal length that is no number',
      withPart({ focalLengthMm: Number.NaN }),
      'parts[0].focalLengthMm',
      'The focal length of “second group” is not a number; it must be a number other than zero, between 0.001 and 1,000,000 mm in size.',
    ],
    [
      'an infinite focal length',
      withPart({ focalLengthMm: Number.NEGATIVE_INFINITY }),
      'parts[0].focalLengthMm',
      'The focal length of “second group” is minus infinity; it must be a number other than zero, between 0.001 and 1,000,000 mm in size.',
    ],
    [
      'a focal length below a micrometre',
      withPart({ focalLengthMm: -0.0005 }),
      'parts[0].focalLengthMm',
      'The focal length of “second group” is −0.0005 mm; it must be a number other than zero, between 0.001 and 1,000,000 mm in size.',
    ],
    [
      'a gap of 1e300',
      row(1e300, 0),
      'parts[0].space.lengthMm',
      'The gap behind part 1 is 1e300 mm; it must be between −1,000,000 and 1,000,000 mm.',
    ],
    [
      'a sensor beyond a kilometre',
      row(-2_500_000.5),
      'parts[0].space.lengthMm',
      'The distance from part 1 to the sensor is −2,500,000.5 mm; it must be between −1,000,000 and 1,000,000 mm.',
    ],
    [
      'an object inside the first part',
      { ...emptySketch(), object: { distanceMm: -2, medium: 'air' } },
      'object.distanceMm',
      'The object distance is −2 mm; it must be above 0 and at most 1,000,000 mm, in front of the first part, or infinity.',
    ],
    [
      'a stop of zero diameter',
      withAperture({ kind: 'stopDiameter', diameterMm: 0 }),
      'aperture.diameterMm',
      'The stop diameter is 0 mm; it must be above 0 and at most 1,000,000 mm.',
    ],
    [
      'a field of 90°',
      withSize({ kind: 'angle', angleDeg: 90 }),
      'field.size.angleDeg',
      'The field angle is 90°; it must be from 0° up to, but not including, 90°.',
    ],
    [
      'a numerical aperture of air or more',
      withAperture({ kind: 'objectNA', na: 1 }),
      'aperture.na',
      'The numerical aperture at the object is 1; it must be above 0 and below 1, the index of air.',
    ],
    [
      'a clear diameter of nothing',
      withPart({ semiDiameterMm: 0 }),
      'parts[0].semiDiameterMm',
      'The semi-diameter of “second group” is 0 mm; it must be above 0 and at most 1,000,000 mm.',
    ],
    [
      'wavelengths out of order',
      withLines({ mainNm: 500, shortNm: 600, longNm: 700 }),
      'lines',
      'The short, main and long wavelengths are 600 nm, 500 nm and 700 nm; each must be longer than the one before.',
    ],
    [
      'a stop on no part',
      { ...emptySketch(), stop: id('p9') },
      'stop',
      'The stop names “p9”; it must name one of the parts, or none.',
    ],
    [
      'a sensor fixed behind nothing',
      { ...emptySketch(), image: 'fixed' as const },
      'image',
      'The image plane is fixed, but there is no part to measure it from; it must follow the focus.',
    ],
    [
      'more parts than a sketch may have',
      row(...Array.from({ length: 500 }, () => 1)),
      'parts',
      'The number of parts is 500; it must be at most 200.',
    ],
    [
      'no position',
      { ...emptySketch(), positions: [] },
      'positions',
      'The number of positions is 0; it must be between 1 and 60.',
    ],
  ] as const)('is told in one sentence: %s', (_what, sketch, path, sentence) => {
    expect(faultsOf(sketch as Sketch)).toEqual([{ path, sentence }]);
  });

  test.each([
    ['Abbe number', withPart({ abbeNumber: 0 })],
    ['index', withPart({ index: 0.9 })],
    ['room in front', withPart({ roomFrontMm: -1 })],
    ['room behind', withPart({ roomBehindMm: Number.NaN })],
    ['thickness', withPart({ ...newPlate(0) })],
    ['index', withPart({ ...newPlate(1, id('p1'), { name: 'x', index: 6, abbeNumber: null }) })],
    ['index', withPart({ space: { lengthMm: 0, medium: { name: 'x', index: 0.5, abbeNumber: 40 } } })],
    ['working f-number', withAperture({ kind: 'workingFNumber', fNumber: 0 })],
    ['f-number at infinity', withAperture({ kind: 'infinityFNumber', fNumber: -4 })],
    [
      'entrance-pupil diameter',
      withAperture({ kind: 'entrancePupilDiameter', diameterMm: Number.POSITIVE_INFINITY }),
    ],
    ['field angle', withSize({ kind: 'angle', angleDeg: -1 })],
    ['object height', withSize({ kind: 'objectHeight', heightMm: -1 })],
    ['image height', withSize({ kind: 'imageHeight', heightMm: 1e7 })],
    ['field fraction', withField({ fractions: [0, 1.5] })],
    ['number of field fractions', withField({ fractions: [] })],
    ['number of field fractions', withField({ fractions: Array.from({ length: 10 }, () => 0) })],
    ['vignetting', withField({ vignetting: 1.1 })],
    ['wavelength of the main line', withLines({ mainNm: 50, shortNm: 40, longNm: 60 })],
    [
      'width of the sensor',
      { ...emptySketch(), sensor: { size: { widthMm: 0, heightMm: 1 }, pixelPitchMm: null } },
    ],
    ['diagonal of the sensor', { ...emptySketch(), sensor: { size: { diagonalMm: 0 }, pixelPitchMm: null } }],
    ['pixel pitch of the sensor', { ...emptySketch(), sensor: { size: { diagonalMm: 1 }, pixelPitchMm: 0 } }],
    ['register distance', { ...emptySketch(), registerMm: -5 }],
    ['assumed index', { ...emptySketch(), assumedIndex: 0 }],
    ['blur diameter', { ...emptySketch(), blurMm: 0 }],
    ['title', { ...emptySketch(), title: 'x'.repeat(201) }],
    ['name of part 1', withPart({ name: 'x'.repeat(101) })],
  ] as const)('names the field: %s', (words, sketch) => {
    expect(sentencesOf(sketch as Sketch)[0]).toMatch(new RegExp(`^The ${words} `));
  });

  test('is told for every position it breaks at', () => {
    const sketch = row({ [at('wide')]: 1, [at('narrow')]: Number.NaN }, 0);
    expect(faultsOf(sketch)).toEqual([
      {
        path: 'parts[0].space.lengthMm.narrow',
        sentence:
          'The gap behind part 1 at position “narrow” is not a number; it must be between −1,000,000 and 1,000,000 mm.',
      },
    ]);
  });

  test('is a value that misses a position, or one for a position that is not there', () => {
    const sketch: Sketch = { ...row({ [at('wide')]: 1, [at('gone')]: 2 }), positions: row(0).positions };
    expect(faultsOf(sketch).map((fault) => fault.sentence)).toEqual([
      'The distance from part 1 to the sensor at position “only” is missing; it must be between −1,000,000 and 1,000,000 mm.',
      'The distance from part 1 to the sensor has a value for “wide”; it must have one for each position of the sketch and no other.',
      'The distance from part 1 to the sensor has a value for “gone”; it must have one for each position of the sketch and no other.',
    ]);
  });

  test('is told twice where a value stands under the wrong position', () => {
    const sketch: Sketch = { ...row({ [at('wide')]: 1 }), positions: row(0).positions };
    expect(pathsOf(sketch)).toEqual(['parts[0].space.lengthMm.only', 'parts[0].space.lengthMm.wide']);
  });

  test('is an id given twice, of odd characters, or known to every object', () => {
    const two = row(1, 1);
    const same: Sketch = { ...two, parts: two.parts.map((part) => ({ ...part, id: id('p1') })) };
    expect(sentencesOf(same)).toEqual([
      'The id “p1” of part 2 is taken; each part must have an id of its own.',
    ]);
    for (const odd of ['', '1', 'a b', '__proto__', 'constructor', 'toString', 'x'.repeat(41)])
      expect(pathsOf({ ...emptySketch(), positions: [{ id: at(odd), name: '' }] })).toEqual([
        'positions[0].id',
      ]);
  });

  test('is a part in two groups, a group of one, or of parts that are not there', () => {
    const group = (name: string, ...ids: readonly string[]) => ({ id: name, name, partIds: ids }) as never;
    const groups = [group('g1', 'p1', 'p2'), group('g2', 'p2', 'p3'), group('g3', 'p9')];
    expect(pathsOf({ ...row(1, 1, 1), groups })).toEqual([
      'groups[1].partIds[0]',
      'groups[2].partIds',
      'groups[2].partIds[0]',
    ]);
  });

  test('is told beside all others', () => {
    const sketch: Sketch = { ...withPart({ focalLengthMm: 0, semiDiameterMm: -1 }), blurMm: Number.NaN };
    expect(pathsOf(sketch)).toEqual(['parts[0].semiDiameterMm', 'parts[0].focalLengthMm', 'blurMm']);
  });

  test.prop([
    anySketch({ leastParts: 1 }),
    fc.constantFrom(Number.NaN, Infinity, -Infinity, 1e300),
    fc.nat(),
  ])('is found wherever one number is not finite or beyond all measure', (sketch, bad, which) => {
    const places: ((value: number) => Sketch)[] = [
      (value) => ({ ...sketch, assumedIndex: value }),
      (value) => ({ ...sketch, registerMm: value }),
      (value) => ({ ...sketch, object: { ...sketch.object, distanceMm: value } }),
      (value) => ({ ...sketch, parts: sketch.parts.map((part) => ({ ...part, semiDiameterMm: value })) }),
      (value) => ({
        ...sketch,
        parts: sketch.parts.map((part) => ({ ...part, space: { ...part.space, lengthMm: value } })),
      }),
    ];
    expect(faultsOf(places[which % places.length]?.(bad) ?? sketch)).not.toEqual([]);
  });
});
