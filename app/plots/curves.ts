import type { Curve, ExactSetup, FieldRays } from '../../engine/index.ts';
import { sentenceOf } from '../../engine/index.ts';
import type { CurveInk } from '../board/styles.ts';
import { type Axis, curveStyle, emptyPlot, type Plot, type PlotCurve } from './plot.ts';
import { evenAxis, reachOf } from './scale.ts';
import { type lengthScale, lineDash, lineName, lineWord, lostNote, scaled } from './words.ts';

/** The level axis of what is drawn over the field. */
export const OVER_FIELD: Axis = { label: 'share of the field', unit: '', digits: 2, from: 0, to: 1 };

/** The least reach of an axis of focus, mm. */
const LEAST_FOCUS_MM = 0.01;

/** A curve of the engine in its line's name and dash, its values times a factor. */
export const lineCurve = (
  setup: ExactSetup,
  ink: CurveInk,
  { line, at, value }: Curve,
  factor: number,
): PlotCurve => ({
  name: lineName(setup, line),
  word: lineWord(setup, line),
  style: curveStyle(ink, lineDash(setup, line)),
  x: at,
  y: scaled(value, factor),
});

/** The upright axis of places of focus that are drawn in the unit of `length`. */
export const focusAxis = (
  { unit, digits, perMm }: ReturnType<typeof lengthScale>,
  curves: readonly PlotCurve[],
): Axis => evenAxis('focus behind the image plane', unit, digits, reachOf(curves), LEAST_FOCUS_MM * perMm);

/** What the values of curves over the stop are. */
export interface Values {
  readonly label: string;
  readonly unit: string;
  readonly digits: number;
  /** What the engine's number is multiplied by. */
  readonly factor: number;
  /** The least reach of the axis. */
  readonly least: number;
}

/** Curves of one field over the stop from −1 to 1, one for each line. */
export function overStop(
  { setup }: FieldRays,
  key: string,
  title: string,
  found: readonly Curve[],
  ink: CurveInk,
  { label, unit, digits, factor, least }: Values,
): Plot {
  const curves = found.map((curve) => lineCurve(setup, ink, curve, factor));
  const lost = Math.max(0, ...found.map((curve) => curve.lost));
  if (curves.every(({ x }) => x.length === 0)) return emptyPlot(key, title, sentenceOf('no ray through'));
  return {
    kind: 'curves',
    key,
    title,
    x: { label: 'share of the stop', unit: '', digits: 2, from: -1, to: 1 },
    y: evenAxis(label, unit, digits, reachOf(curves), least),
    curves,
    notes: lostNote(lost),
  };
}
