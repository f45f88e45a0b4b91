/**
 * The engine's only door: what the app uses, by name. Everything it offers is a pure function over readonly data; units, signs,
 * absence and sources stand in the docstrings of the rooms.
 */
export { type Seidel, seidel, type ThinGlass } from './aberration/seidel.ts';
export { SUM_NAMES, SUM_WORDS, type SumName } from './aberration/sums.ts';
export { exactSetupOf, type FieldSpot, fieldSpot, leastSpotShift } from './exact/analyse.ts';
export { bufferSize, type FieldRays, type Sample, sampleOf, traceFields } from './exact/bundles.ts';
export { type ChiefSweep, chiefSweep, fieldShares } from './exact/chiefSweep.ts';
export { type Compared, type Comparison, compare } from './exact/compare.ts';
export { contrastOf, diffractionLimit } from './exact/contrast.ts';
export type { Curve } from './exact/curve.ts';
export { type DrawnRay, drawnField } from './exact/drift.ts';
export { rayFans, type WavefrontFans, wavefrontFans } from './exact/fans.ts';
export { distortion, fieldCurves, lateralColour } from './exact/fieldCurves.ts';
export { hexapolarGrid } from './exact/grids.ts';
export { illumination } from './exact/illumination.ts';
export { landingsOf, type Weighted } from './exact/landing.ts';
export { axialColour, longitudinal, type TrainAt } from './exact/longitudinal.ts';
export { lostFieldWarnings, lostWords, refracts } from './exact/lostFields.ts';
export { type PupilMap, pupilMapOf } from './exact/pupilMap.ts';
export { airyRadius, type SpotSize, spotSize } from './exact/spots.ts';
export { type Trust, trust } from './exact/trust.ts';
export type { ExactSetup, Lost, SetupOutcome } from './exact/types.ts';
export { filterMaterials, kindOf, type MapDirection, materialNamed, neighbour } from './media/chooser.ts';
export { CODE_MODEL } from './media/code.ts';
export { type DispersionFormula, FORMULA_KINDS } from './media/dispersion.ts';
export { codeFault, formulaFaults } from './media/faults.ts';
export { spectralLines } from './media/lines.ts';
export { type Material, materialOf, materials } from './media/materials.ts';
export { indexOf, type MainLines, mediumName, type Nominal, nominal, rangeOf } from './media/medium.ts';
export { type Fault, none, type Outcome, some } from './outcome.ts';
export { type Absence, type Quantity, sentenceOf } from './paraxial/absence.ts';
export { type Analysis, analyse } from './paraxial/analyse.ts';
export { clearDiameters } from './paraxial/clear.ts';
export { type FirstOrder, firstOrder } from './paraxial/firstOrder.ts';
export { conjugateChain, type LedgerRow } from './paraxial/ledger.ts';
export { isZeroPower, systemMatrix } from './paraxial/matrix.ts';
export { pupils } from './paraxial/pupils.ts';
export { chiefRay, marginalRay, type RayOutcome } from './paraxial/rays.ts';
export { halfDiagonal } from './paraxial/sensor.ts';
export { heightInSpace, type ParaxialRay, paraxialRay, powerAt } from './paraxial/trace.ts';
export { type Warning, type WarningKind, warningsOf } from './paraxial/warnings.ts';
export { cautionOf } from './sheet/notes.ts';
export { SHEET_FORMS, type SheetForm, sheetText } from './sheet/sheetText.ts';
export { type Refusal, spacingTable } from './sheet/spacingTable.ts';
export {
  type Block,
  type Cell,
  type ColumnKind,
  cellText,
  type Datum,
  DEFAULT_SHEET_OPTIONS,
  type SheetOptions,
  type SpacingTable,
} from './sheet/table.ts';
export { parseClip, writeClip } from './sketch/clip.ts';
export { emptySketch, freshPartId, LINES, newGlass, newPlate, newStop, newThin } from './sketch/create.ts';
export { withGroups } from './sketch/edits/change.ts';
export { copyParts, duplicateParts, pasteParts } from './sketch/edits/copy.ts';
export {
  fixSensor,
  joinObjectDistance,
  setImagePlane,
  setObjectAtInfinity,
  setObjectDistance,
  setRegister,
  setSensor,
  splitObjectDistance,
} from './sketch/edits/ends.ts';
export { joinGap, moveParts, setGap, setMedium, splitGap } from './sketch/edits/gaps.ts';
export { tieParts, untie } from './sketch/edits/groups.ts';
export { insertPart } from './sketch/edits/insert.ts';
export {
  joinStopDiameter,
  setAir,
  setAperture,
  setAssumedIndex,
  setBlur,
  setField,
  setFractions,
  setLines,
  setStopDiameter,
  setVignetting,
  splitStopDiameter,
} from './sketch/edits/light.ts';
export { flipParts, reorderPart } from './sketch/edits/order.ts';
export {
  flipSign,
  renamePart,
  setAbbeNumber,
  setFocalLength,
  setGlass,
  setIndex,
  setMaterial,
  setNote,
  setRoom,
  setSemiDiameter,
  setShapeFactor,
  setSurface,
  setThickness,
} from './sketch/edits/parts.ts';
export {
  addPosition,
  copyPosition,
  movePosition,
  removePosition,
  renamePosition,
} from './sketch/edits/positions.ts';
export { removeParts } from './sketch/edits/remove.ts';
export { scaleParts, scaleSketch, scaleToFocalLength } from './sketch/edits/scale.ts';
export { dropStop, releaseStop, rideStop, setStop } from './sketch/edits/stop.ts';
export { setNotes, setTitle } from './sketch/edits/text.ts';
export { writeSketch } from './sketch/file.ts';
export { weightedLines } from './sketch/lines.ts';
export { type Parsed, parseSketch } from './sketch/parse.ts';
export type { Role } from './sketch/prescription/columns.ts';
export {
  insertPrescription,
  looksLikePrescription,
  type Prescription,
  readPrescription,
} from './sketch/prescription/prescription.ts';
export { type Edit, type Note, propose, type Settling, unsettled } from './sketch/propose.ts';
export { faultsOf } from './sketch/rules.ts';
export type {
  Air,
  Aperture,
  Field,
  FieldSize,
  Filling,
  FixedMedium,
  GlassPart,
  GlassSurface,
  Lines,
  Medium,
  Part,
  PartId,
  PartKind,
  PerPosition,
  PlatePart,
  PositionId,
  Sensor,
  Setting,
  Sketch,
  SolidMedium,
  ThinPart,
} from './sketch/types.ts';
export { isCommon, objectDistanceAt, settingAt, valueAt } from './sketch/values.ts';
export { partName } from './sketch/words.ts';
export { unsolvableSentence } from './solve/absence.ts';
export { bendGlass, bendGlassToShape, shapeOfGlass } from './solve/bend.ts';
export { type Bending, bendingOf } from './solve/bending.ts';
export { type BestShapes, bestShapes } from './solve/bestShapes.ts';
export type { Recipe } from './solve/recipe.ts';
export type { Remade } from './solve/remake.ts';
export { thickenPart } from './solve/thicken.ts';
export { thinPart } from './solve/thin.ts';
export { type Body, bodyOf, edgeThicknesses, type Face, faceAt } from './train/body.ts';
export { placesOf } from './train/places.ts';
export { partTrain } from './train/slice.ts';
export { trainOf } from './train/train.ts';
export type { Train } from './train/types.ts';
export { digitsIn, type LengthUnit, MM_PER_INCH, mmPer } from './units.ts';
