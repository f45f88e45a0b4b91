import type { CurveInk, CurveLine, MarkStyle } from '../board/styles.ts';
import { formatNumber } from '../ui/format.ts';

/** One axis of a plot. Values of the plot are in its unit already. */
export interface Axis {
  readonly label: string;
  /** Empty for a bare number. */
  readonly unit: string;
  /** Decimals of a value that is read off. */
  readonly digits: number;
  readonly from: number;
  readonly to: number;
}

/** One curve: a name in words, a colour by what it stands for, a dash by its line; places ascend in x. */
export interface PlotCurve {
  readonly name: string;
  /** The name in one word, for where there is little room. */
  readonly word: string;
  readonly style: MarkStyle;
  readonly x: Float64Array;
  readonly y: Float64Array;
}

interface PlotBase {
  /** Which plot of its tab it is, the same while its sketch changes. */
  readonly key: string;
  readonly title: string;
  /** What is worth a quiet line: rays lost, and where. */
  readonly notes: readonly string[];
}

/** Curves over a level axis. */
export interface CurvePlot extends PlotBase {
  readonly kind: 'curves';
  readonly x: Axis;
  readonly y: Axis;
  readonly curves: readonly PlotCurve[];
}

/** Where the rays of one line meet a plane, x and y in turn, from the centroid; the share of the light in each, and how much the line counts. */
export interface Dots {
  readonly name: string;
  readonly line: CurveLine;
  readonly style: MarkStyle;
  readonly points: Float64Array;
  readonly share: Float64Array;
  readonly weight: number;
}

/** Where the rays of a field meet one plane. */
export interface Spot {
  /** Place of the plane on the level axis of its plot. */
  readonly at: number;
  readonly dots: readonly Dots[];
  readonly rms: number;
  readonly largest: number;
}

/** Spots of one field, one, or several strung along the axis; lengths in `unit`. */
export interface SpotPlot extends PlotBase {
  readonly kind: 'spots';
  readonly unit: string;
  readonly digits: number;
  /** The planes, null when there is one alone. */
  readonly x: Axis | null;
  readonly spots: readonly Spot[];
  /** Half the side of the square that each is drawn in. */
  readonly reach: number;
  /** Radius of the first dark ring; null when there is none. */
  readonly airy: number | null;
  /** Figures to be read without a pointer. */
  readonly figures: readonly string[];
}

/** What one surface adds to a sum. */
export interface Stem {
  readonly surface: number;
  /** z from the first surface, mm. */
  readonly zMm: number;
  readonly name: string;
  readonly value: number;
  /** The sum up to and with this surface. */
  readonly sum: number;
}

/** Stems under their own surfaces on the length axis of the drawing. */
export interface StemPlot extends PlotBase {
  readonly kind: 'stems';
  readonly y: Axis;
  readonly stems: readonly Stem[];
}

/** A plot that has nothing to show, and why in a sentence. */
export interface EmptyPlot extends PlotBase {
  readonly kind: 'empty';
  readonly sentence: string;
}

export type Plot = CurvePlot | SpotPlot | StemPlot | EmptyPlot;

/** A plot that says why it is empty. */
export const emptyPlot = (key: string, title: string, sentence: string): EmptyPlot => ({
  kind: 'empty',
  key,
  title,
  sentence,
  notes: [],
});

/** The look of a curve of this colour and line. */
export const curveStyle = (ink: CurveInk, line: CurveLine): MarkStyle => `curve ${ink} ${line}`;

/** A value of an axis in words, with its unit. */
export const valueText = (value: number, { digits, unit }: Pick<Axis, 'digits' | 'unit'>): string =>
  unit === '' ? formatNumber(value, digits) : `${formatNumber(value, digits)} ${unit}`;

/** An axis and its unit in words. */
export const axisText = ({ label, unit }: Pick<Axis, 'label' | 'unit'>): string =>
  unit === '' ? label : `${label}, ${unit}`;
