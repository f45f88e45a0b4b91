import fc from 'fast-check';
import { newGlass, newPlate, newStop, newSurface, newThin } from '../../../../engine/sketch/create.ts';
import { withGroups } from '../../../../engine/sketch/edits/change.ts';
import { copyParts, duplicateParts, pasteParts } from '../../../../engine/sketch/edits/copy.ts';
import * as ends from '../../../../engine/sketch/edits/ends.ts';
import * as gaps from '../../../../engine/sketch/edits/gaps.ts';
import { renameGroup, tieParts, untie } from '../../../../engine/sketch/edits/groups.ts';
import { insertPart } from '../../../../engine/sketch/edits/insert.ts';
import * as light from '../../../../engine/sketch/edits/light.ts';
import { flipParts, reorderPart } from '../../../../engine/sketch/edits/order.ts';
import * as part from '../../../../engine/sketch/edits/parts.ts';
import * as positions from '../../../../engine/sketch/edits/positions.ts';
import { removeParts } from '../../../../engine/sketch/edits/remove.ts';
import { scaleParts, scaleSketch, scaleToFocalLength } from '../../../../engine/sketch/edits/scale.ts';
import { dropStop, releaseStop, rideStop, setStop } from '../../../../engine/sketch/edits/stop.ts';
import { setNotes, setTitle } from '../../../../engine/sketch/edits/text.ts';
import type { Edit } from '../../../../engine/sketch/propose.ts';
import type { GroupId, PartId, PositionId, Setting, Sketch } from '../../../../engine/sketch/types.ts';

/** What an edit is given: numbers, and choices that every sketch can answer. */
interface Given {
  readonly number: number;
  readonly other: number;
  readonly pick: number;
  readonly picks: readonly number[];
  readonly share: number;
  readonly yes: boolean;
}

interface Chosen extends Given {
  readonly part: PartId;
  readonly ids: readonly PartId[];
  readonly position: PositionId;
  readonly setting: Setting;
  readonly group: GroupId;
}

const rule = (yes: boolean) => (yes ? 'carry' : 'neighbours');

/** Every edit by its name. */
export const EDITS: Readonly<Record<string, (sketch: Sketch, given: Chosen) => Sketch>> = {
  setGap: (s, g) => gaps.setGap(s, g.part, g.number, g.position, rule(g.yes)),
  splitGap: (s, g) => gaps.splitGap(s, g.part),
  joinGap: (s, g) => gaps.joinGap(s, g.part, g.position),
  setMedium: (s, g) =>
    gaps.setMedium(s, g.yes ? g.part : 'object', { name: 'oil', index: g.number, abbeNumber: g.other }),
  moveParts: (s, g) => gaps.moveParts(s, g.ids, g.number, g.position, rule(g.yes)),
  moveGroups: (s, g) => gaps.moveParts(s, withGroups(s, g.ids), g.number, g.position, rule(g.yes)),
  setObjectDistance: (s, g) => ends.setObjectDistance(s, g.number, g.position),
  setObjectAtInfinity: (s, g) => ends.setObjectAtInfinity(s, g.position),
  splitObjectDistance: (s) => ends.splitObjectDistance(s),
  joinObjectDistance: (s, g) => ends.joinObjectDistance(s, g.position),
  setImagePlane: (s, g) => ends.setImagePlane(s, g.yes ? 'focus' : 'fixed'),
  fixSensor: (s, g) => (g.yes ? ends.fixSensor(s, g.number, g.position) : ends.fixSensor(s, g.number)),
  setSensor: (s, g) =>
    ends.setSensor(s, { size: { diagonalMm: g.number }, pixelPitchMm: g.yes ? g.other : null }),
  setRegister: (s, g) => ends.setRegister(s, g.yes ? g.number : null),
  setFocalLength: (s, g) => part.setFocalLength(s, g.part, g.number),
  flipSign: (s, g) => part.flipSign(s, g.part),
  setSemiDiameter: (s, g) => part.setSemiDiameter(s, g.part, g.yes ? g.number : null),
  setAbbeNumber: (s, g) => part.setAbbeNumber(s, g.part, g.yes ? g.number : null),
  setIndex: (s, g) => part.setIndex(s, g.part, g.yes ? g.number : null),
  setRoom: (s, g) => part.setRoom(s, g.part, g.yes ? 'front' : 'behind', g.number),
  setThickness: (s, g) => part.setThickness(s, g.part, g.number),
  setShapeFactor: (s, g) => part.setShapeFactor(s, g.part, g.yes ? g.number : null),
  setFillingThickness: (s, g) => part.setThickness(s, g.part, g.number, g.pick % 3),
  setSurface: (s, g) =>
    part.setSurface(
      s,
      g.part,
      g.pick % 4,
      g.yes ? { radiusMm: g.number } : { asphere: [g.other], conic: g.share },
    ),
  setGlass: (s, g) =>
    part.setGlass(s, g.part, {
      surfaces: [newSurface(g.number), newSurface(null)],
      fillings: [{ thicknessMm: g.other, material: { material: 'f2' } }],
    }),
  noMaterial: (s, g) => part.setMaterial(s, g.part, null),
  setAir: (s, g) => light.setAir(s, g.yes ? 'standard' : 'unity'),
  insertGlass: (s, g) => insertPart(s, newGlass(g.other, 4), g.number, g.position),
  setMaterial: (s, g) => part.setMaterial(s, g.part, { name: 'flint', index: g.number, abbeNumber: null }),
  renamePart: (s, g) => part.renamePart(s, g.part, `part ${g.pick}`),
  setNote: (s, g) => part.setNote(s, g.part, `note ${g.pick}`),
  setAperture: (s, g) => light.setAperture(s, { kind: 'objectNA', na: g.number }),
  setStopDiameter: (s, g) => light.setStopDiameter(s, g.number, g.position),
  splitStopDiameter: (s) => light.splitStopDiameter(s),
  joinStopDiameter: (s, g) => light.joinStopDiameter(s, g.position),
  setField: (s, g) =>
    light.setField(
      s,
      g.yes ? { kind: 'angle', angleDeg: g.number } : { kind: 'imageHeight', heightMm: g.number },
    ),
  setFractions: (s, g) => light.setFractions(s, [g.number, g.share]),
  setVignetting: (s, g) => light.setVignetting(s, g.number),
  setLines: (s, g) => light.setLines(s, { mainNm: g.number }),
  setAssumedIndex: (s, g) => light.setAssumedIndex(s, g.number),
  setBlur: (s, g) => light.setBlur(s, g.yes ? g.number : null),
  insertThin: (s, g) => insertPart(s, newThin(g.other), g.number, g.position),
  insertPlate: (s, g) => insertPart(s, newPlate(g.other), g.number, g.position),
  insertStop: (s, g) => insertPart(s, newStop(), g.number, g.position),
  removeParts: (s, g) => removeParts(s, g.ids),
  reorderPart: (s, g) => reorderPart(s, g.part, g.pick % 9),
  flipParts: (s, g) => flipParts(s, g.ids),
  duplicateParts: (s, g) => duplicateParts(s, g.ids),
  copyAndPaste: (s, g) => pasteParts(s, copyParts(s, g.ids, g.position), g.yes ? g.part : null),
  scaleSketch: (s, g) => scaleSketch(s, g.number),
  scaleParts: (s, g) => scaleParts(s, g.ids, g.number),
  scaleToFocalLength: (s, g) => scaleToFocalLength(s, g.other, g.number),
  tieParts: (s, g) => tieParts(s, g.ids, `tied ${g.pick % 9}`),
  untie: (s, g) => untie(s, g.group),
  renameGroup: (s, g) => renameGroup(s, g.group, `tied ${g.pick % 9}`),
  addPosition: (s, g) => positions.addPosition(s, `position ${g.pick}`, g.setting),
  copyPosition: (s, g) => positions.copyPosition(s, g.position),
  renamePosition: (s, g) => positions.renamePosition(s, g.position, `position ${g.pick}`),
  removePosition: (s, g) => positions.removePosition(s, g.position),
  movePosition: (s, g) => positions.movePosition(s, g.position, g.pick % 5),
  rideStop: (s, g) => rideStop(s, g.part),
  releaseStop: (s) => releaseStop(s),
  setStop: (s, g) => setStop(s, g.yes ? g.part : null),
  dropStop: (s, g) => dropStop(s, g.number, g.position),
  setTitle: (s, g) => setTitle(s, `title ${g.pick}`),
  setNotes: (s, g) => setNotes(s, `notes ${g.pick}`),
};

export interface NamedEdit {
  readonly name: string;
  readonly given: Given;
}

const anyGiven = (number: fc.Arbitrary<number>): fc.Arbitrary<Given> =>
  fc.record({
    number,
    other: number,
    pick: fc.nat(),
    picks: fc.array(fc.nat(), { maxLength: 3 }),
    share: fc.constantFrom(0, 0.3, 0.9),
    yes: fc.boolean(),
  });

const sane = fc.oneof(fc.double({ min: 0.01, max: 80, noNaN: true }), fc.integer({ min: -40, max: 200 }));
const wild = fc.constantFrom(0, -0, Number.NaN, Infinity, -Infinity, 1e300, -1e300, 5e-324, 1e6, -1e6, 90, 1);

/** Any edit with sensible numbers, and sometimes with such as nobody should type. */
export const anyEdit = (): fc.Arbitrary<NamedEdit> =>
  fc.record({
    name: fc.constantFrom(...Object.keys(EDITS)),
    given: anyGiven(fc.oneof({ weight: 4, arbitrary: sane }, { weight: 1, arbitrary: wild })),
  });

/** The edit as the store would hand it over; its choices are made on the sketch it meets. */
export const asEdit =
  ({ name, given }: NamedEdit): Edit =>
  (sketch) => {
    const nameOf = (pick: number): PartId =>
      sketch.parts[pick % Math.max(sketch.parts.length, 1)]?.id ?? ('p0' as PartId);
    const last = sketch.positions.length - 1;
    const index = given.pick % sketch.positions.length;
    const position = sketch.positions[index]?.id as PositionId;
    const chosen: Chosen = {
      ...given,
      part: nameOf(given.pick),
      ids: given.picks.map(nameOf),
      position,
      setting: { at: position, toNext: index === last ? 0 : given.share },
      group: sketch.groups[given.pick % Math.max(sketch.groups.length, 1)]?.id ?? ('g0' as GroupId),
    };
    return (EDITS[name] ?? ((same: Sketch) => same))(sketch, chosen);
  };
