import type { Compared, Comparison, LengthUnit, Quantity } from '../../../engine/index.ts';
import { some } from '../../../engine/index.ts';
import { type QuantityKind, quantityText } from '../quantity.ts';

/** One quantity of first order beside what exact rays say. */
export interface ComparedRow {
  readonly label: string;
  /** How the exact value comes about, in words. */
  readonly title: string;
  readonly kind: QuantityKind;
  readonly digits: number;
  readonly read: (comparison: Comparison) => Compared;
}

export const COMPARED_ROWS: readonly ComparedRow[] = [
  {
    label: 'Focal length',
    title:
      'exact: height over the sine of its last angle, of a ray parallel to the axis as high as the marginal ray',
    kind: 'length',
    digits: 3,
    read: ({ focalLengthMm }) => focalLengthMm,
  },
  {
    label: 'Back focus',
    title: 'exact: where that parallel ray crosses the axis, from the last vertex',
    kind: 'length',
    digits: 3,
    read: ({ backFocusMm }) => backFocusMm,
  },
  {
    label: 'Magnification',
    title: 'height of the chief ray in the image plane over that of the object',
    kind: 'ratio',
    digits: 4,
    read: ({ magnification }) => magnification,
  },
  {
    label: 'Marginal height',
    title: 'height of the marginal ray in the image plane',
    kind: 'length',
    digits: 4,
    read: ({ marginalHeightMm }) => marginalHeightMm,
  },
  {
    label: 'Chief height',
    title: 'height of the chief ray in the image plane',
    kind: 'length',
    digits: 4,
    read: ({ chiefHeightMm }) => chiefHeightMm,
  },
  {
    label: 'Distortion, %',
    title: 'exact chief ray height over the paraxial one, less 1',
    kind: 'share',
    digits: 3,
    read: ({ distortion }) => distortion,
  },
  {
    label: 'Longitudinal',
    title: 'longitudinal error: from the paraxial image to where the marginal ray crosses the axis',
    kind: 'length',
    digits: 3,
    read: ({ imageDistanceMm: { difference } }) => ({
      paraxial: difference.ok ? some(0) : difference,
      exact: difference,
      difference,
    }),
  },
  {
    label: 'f-number',
    title:
      'working f-number: 1 over twice the index times slope, exact with the sine of the angle, at the image',
    kind: 'number',
    digits: 3,
    read: ({ workingFNumber }) => workingFNumber,
  },
];

/** The columns of the table, with their heads. */
export const COMPARED_COLUMNS = ['paraxial', 'exact', 'difference'] as const;
export type ComparedColumn = (typeof COMPARED_COLUMNS)[number];

/** What stands in a cell: the number, a difference with its sign, or the reason why there is none. */
export function comparedText(
  { kind, digits }: ComparedRow,
  column: ComparedColumn,
  quantity: Quantity,
  unit: LengthUnit,
): string {
  if (!quantity.ok) return quantity.why;
  const text = quantityText(quantity.value, kind, digits, unit);
  const isMore = column === 'difference' && quantity.value > 0 && /[1-9]/.test(text);
  return isMore ? `+${text}` : text;
}
