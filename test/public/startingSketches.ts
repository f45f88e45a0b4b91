import { emptySketch, LINES, newPlate, newStop, newThin } from '../../engine/sketch/create.ts';
import type {
  FixedMedium,
  GroupId,
  PartId,
  PerPosition,
  Position,
  PositionId,
  Sketch,
  Space,
  ThinPart,
} from '../../engine/sketch/types.ts';
import { bendingOf } from '../../engine/solve/bending.ts';
import type { Recipe } from '../../engine/solve/recipe.ts';
import { thickenPart } from '../../engine/solve/thicken.ts';
import { inspectionZoom } from '../engine/demo.ts';

/** A sketch that comes with the tool, and what the list of starting sketches says about it. */
export interface StartingSketch {
  readonly file: string;
  readonly summary: string;
  readonly sketch: Sketch;
}

/** Every starting sketch, the demo first. All are invented for one seed-sorting line. */
export const STARTING_SKETCHES: readonly StartingSketch[] = [
  {
    file: 'inspection-zoom.json',
    summary: 'Four groups, three positions, the image held on the sensor',
    sketch: seedLineCamera(),
  },
  {
    file: 'sorting-chute-relay.json',
    summary: 'Two lenses and a stop, telecentric on both sides, 0.6 times',
    sketch: sortingChuteRelay(),
  },
  {
    file: 'chute-relay-in-glass.json',
    summary: 'The same relay in real glass: two cemented pairs, to compare exact rays with paraxial ones',
    sketch: chuteRelayInGlass(),
  },
  {
    file: 'colour-check-camera.json',
    summary: 'A negative in front of a positive: short focal length, long back focus',
    sketch: colourCheckCamera(),
  },
  {
    file: 'chute-scanner-expander.json',
    summary: 'A laser beam made four times wider, without a focal length',
    sketch: chuteScannerExpander(),
  },
  {
    file: 'germination-macro.json',
    summary: 'Half size and life size through the window of a dish',
    sketch: germinationMacro(),
  },
  {
    file: 'sorters-loupe.json',
    summary: 'Two equal lenses for the eye, the image at infinity',
    sketch: sortersLoupe(),
  },
];

function seedLineCamera(): Sketch {
  return {
    ...inspectionZoom(),
    title: 'Seed line camera',
    notes:
      'Inspection camera of a seed-sorting line. The chute is 500 mm in front of the first group; the fourth group and the sensor stand still.',
    lines: { ...emptySketch().lines, ...LINES.e },
  };
}

function sortingChuteRelay(): Sketch {
  return {
    ...emptySketch('Sorting-chute relay'),
    notes: 'The stop stands in the common focus of both lenses, so seeds nearer or farther keep their size.',
    object: { distanceMm: 100, medium: 'air' },
    parts: [
      thin('p1', 'chute lens', 100, {
        space: air(100),
        semiDiameterMm: 14.5,
        abbeNumber: 64.2,
        roomFrontMm: 5,
        roomBehindMm: 5,
      }),
      { ...newStop(id('p2')), name: 'stop', space: air(60) },
      thin('p3', 'camera lens', 60, {
        space: air(60),
        semiDiameterMm: 11.5,
        abbeNumber: 64.2,
        roomFrontMm: 4,
        roomBehindMm: 4,
      }),
    ],
    image: 'fixed',
    sensor: { size: { widthMm: 7.2, heightMm: 5.4 }, pixelPitchMm: 0.0024 },
    stop: id('p2'),
    aperture: { kind: 'stopDiameter', diameterMm: 12 },
    field: { size: { kind: 'objectHeight', heightMm: 7.5 }, fractions: [0, 0.7, 1], vignetting: 0 },
  };
}

/** Both lenses as cemented pairs of crown and flint, bent so that the least spots are small over the field. */
function chuteRelayInGlass(): Sketch {
  const [crown, flint] = [{ material: 'n-bk7' }, { material: 'n-sf5' }];
  const chuteLens: Recipe = {
    kind: 'cemented pair',
    materials: [flint, crown],
    thicknessesMm: [3, 7],
    bending: bendingOf(-2.5),
  };
  const cameraLens: Recipe = {
    kind: 'cemented pair',
    materials: [crown, flint],
    thicknessesMm: [5.6, 2.4],
    bending: bendingOf(-0.5),
  };
  const inGlass = thickened(thickened(sortingChuteRelay(), id('p1'), chuteLens), id('p3'), cameraLens);
  return {
    ...inGlass,
    title: 'Chute relay in glass',
    notes:
      'The sorting-chute relay with cemented pairs of N-BK7 and N-SF5 in the place of its thin lenses: the focal lengths and the image are those of the thin relay, the rays are not quite.',
    aperture: { kind: 'stopDiameter', diameterMm: 8 },
    sensor: { size: { widthMm: 7.2, heightMm: 5.4 }, pixelPitchMm: 0.00345 },
  };
}

function thickened(sketch: Sketch, partId: PartId, recipe: Recipe): Sketch {
  const made = thickenPart(sketch, partId, recipe);
  if (!made.ok) throw new Error(`thickened: ${made.why}`);
  return made.value.sketch;
}

function colourCheckCamera(): Sketch {
  const front = -40;
  const rear = 15.7;
  const apart = 28;
  const focalLength = 1 / (1 / front + 1 / rear - apart / (front * rear));
  return {
    ...emptySketch('Colour check camera'),
    notes:
      'Looks over the whole belt. The register distance of the camera asks for a back focus longer than the focal length.',
    parts: [
      thin('p1', 'front lens', front, { space: air(24), abbeNumber: 58.6, roomBehindMm: 2 }),
      { ...newStop(id('p2')), name: 'stop', space: air(4) },
      thin('p3', 'rear lens', rear, {
        space: air(focalLength * (1 - apart / front)),
        abbeNumber: 70.2,
        roomFrontMm: 2,
        roomBehindMm: 1.5,
      }),
    ],
    image: 'fixed',
    sensor: { size: { widthMm: 8.8, heightMm: 6.6 }, pixelPitchMm: 0.00345 },
    registerMm: 17.526,
    stop: id('p2'),
    aperture: { kind: 'infinityFNumber', fNumber: 2.8 },
    field: { size: { kind: 'imageHeight', heightMm: 5.5 }, fractions: [0, 0.7, 1], vignetting: 0.2 },
  };
}

function chuteScannerExpander(): Sketch {
  return {
    ...emptySketch('Chute scanner expander'),
    notes:
      'Widens the beam of a laser diode four times before it reaches the scanning mirror. Backwards it concentrates the beam.',
    parts: [
      thin('p1', 'entry lens', -25, { space: air(75), semiDiameterMm: 4 }),
      thin('p2', 'exit lens', 100, { space: air(60), semiDiameterMm: 12 }),
    ],
    stop: id('p1'),
    aperture: { kind: 'entrancePupilDiameter', diameterMm: 4 },
    field: { size: { kind: 'angle', angleDeg: 0.25 }, fractions: [0, 1], vignetting: 0 },
    lines: { ...emptySketch().lines, mainNm: 638, shortNm: 633, longNm: 643 },
  };
}

function germinationMacro(): Sketch {
  const [half, life] = positions('half size', 'life size');
  const lens = 60;
  const crown: FixedMedium = { name: 'crown 517642', index: 1.5168, abbeNumber: 64.17 };
  const window = newPlate(3, id('p1'), crown);
  /** The object as the first lens sees it stands at its focus in life size, 36 mm farther in half size. */
  const windowToLens = (reducedMm: number): number => reducedMm - 2 - window.thicknessMm / crown.index;
  return {
    ...emptySketch('Germination macro'),
    notes:
      'Two equal lenses about a stop, tied together. The seeds lie 2 mm below the window of a germination dish.',
    object: { distanceMm: 2, medium: 'air' },
    parts: [
      {
        ...window,
        name: 'window',
        space: air({ [half.id]: windowToLens(lens + 36), [life.id]: windowToLens(lens) }),
      },
      thin('p2', 'front lens', lens, { space: air(10), abbeNumber: 60.3, roomFrontMm: 3, roomBehindMm: 3 }),
      { ...newStop(id('p3')), name: 'stop', space: air(10) },
      thin('p4', 'rear lens', lens, {
        space: air({ [half.id]: 42, [life.id]: 60 }),
        abbeNumber: 60.3,
        roomFrontMm: 3,
        roomBehindMm: 3,
      }),
    ],
    image: 'fixed',
    sensor: { size: { widthMm: 12.8, heightMm: 9.6 }, pixelPitchMm: 0.00274 },
    stop: id('p3'),
    aperture: { kind: 'stopDiameter', diameterMm: { [half.id]: 9, [life.id]: 12 } },
    field: { size: { kind: 'imageHeight', heightMm: 8 }, fractions: [0, 0.7, 1], vignetting: 0 },
    positions: [half, life],
    groups: [{ id: 'g1' as GroupId, name: 'lens', partIds: [id('p2'), id('p3'), id('p4')] }],
  };
}

function sortersLoupe(): Sketch {
  return {
    ...emptySketch('Sorter’s loupe'),
    notes: 'For looking at a single seed. It stands in the front focus; the pupil of the eye is the stop.',
    object: { distanceMm: 6.4, medium: 'air' },
    parts: [
      thin('p1', 'field lens', 32, { space: air(24), semiDiameterMm: 7, abbeNumber: 57.4 }),
      thin('p2', 'eye lens', 32, { space: air(14), semiDiameterMm: 6, abbeNumber: 57.4 }),
      { ...newStop(id('p3')), name: 'eye', space: air(20) },
    ],
    stop: id('p3'),
    aperture: { kind: 'stopDiameter', diameterMm: 3 },
    field: { size: { kind: 'objectHeight', heightMm: 3 }, fractions: [0, 0.7, 1], vignetting: 0 },
  };
}

function id(text: string): PartId {
  return text as PartId;
}

function air(lengthMm: PerPosition): Space {
  return { lengthMm, medium: 'air' };
}

function thin(part: string, name: string, focalLengthMm: number, more: Partial<ThinPart>): ThinPart {
  return { ...newThin(focalLengthMm, id(part)), name, ...more };
}

/** Positions named `names`, each with its name as its id, blanks apart. */
function positions<Names extends readonly string[]>(...names: Names): { [Place in keyof Names]: Position } {
  return names.map((name) => ({ id: name.replaceAll(' ', '-') as PositionId, name })) as {
    [Place in keyof Names]: Position;
  };
}
