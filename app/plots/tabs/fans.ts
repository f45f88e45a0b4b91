import type { Curve, FieldRays } from '../../../engine/index.ts';
import { rayFans, sentenceOf } from '../../../engine/index.ts';
import type { CurveInk } from '../../board/styles.ts';
import { curveStyle, emptyPlot, type Plot } from '../plot.ts';
import { alike, evenAxis, reachOf } from '../scale.ts';
import { drawnFractions, type Source } from '../source.ts';
import { fieldInk, fieldName, lineDash, lineName, lineWord, lostNote, scaled } from '../words.ts';

const MICRO = 1000;
/** The least reach of an upright axis, µm: below it the errors of an ideal layout are rounding. */
const LEAST = 0.1;

/** Transverse ray errors over the stop, two plots for each field: along the meridian and across it. */
export function fanPlots(source: Source): readonly Plot[] {
  const fractions = drawnFractions(source.sketch);
  return alike(
    source.fields().flatMap((field, index) => {
      const ink = fieldInk(fractions, index);
      const name = fieldName(field.fraction);
      const fans = rayFans(field);
      if (!fans.ok) return [emptyPlot(`fan ${index}`, `Ray fans, ${name}`, sentenceOf(fans.why))];
      return [
        overStop(field, `tangential fan ${index}`, `Tangential, ${name}`, fans.value.tangential, ink, {
          factor: MICRO,
          unit: 'µm',
          digits: 2,
          label: 'error',
          least: LEAST,
        }),
        overStop(field, `sagittal fan ${index}`, `Sagittal, ${name}`, fans.value.sagittal, ink, {
          factor: MICRO,
          unit: 'µm',
          digits: 2,
          label: 'error',
          least: LEAST,
        }),
      ];
    }),
  );
}

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
  const curves = found.map(({ line, at, value }) => ({
    name: lineName(setup, line),
    word: lineWord(setup, line),
    style: curveStyle(ink, lineDash(setup, line)),
    x: at,
    y: scaled(value, factor),
  }));
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
