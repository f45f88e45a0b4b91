import type { LengthUnit } from '../../engine/index.ts';
import { formatLength, formatNumber } from '../ui/format.ts';

/**
 * What a readout's number is, which says how it is shown. The engine gives lengths in mm, angles in rad and powers in 1/mm;
 * `micro` is a length shown in µm, `share` a part of 1 shown in per cent.
 */
export type QuantityKind = 'length' | 'micro' | 'angle' | 'ratio' | 'number' | 'share' | 'power';

/** The number as text with fixed decimals, without its unit. */
export function quantityText(value: number, kind: QuantityKind, digits: number, unit: LengthUnit): string {
  switch (kind) {
    case 'length':
      return formatLength(value, unit, digits);
    case 'micro':
    case 'power':
      return formatNumber(value * 1000, digits);
    case 'angle':
      return formatNumber((value * 180) / Math.PI, digits);
    case 'share':
      return formatNumber(value * 100, digits);
    default:
      return formatNumber(value, digits);
  }
}

/** The unit that stands beside it, empty for a bare number. */
export function quantityUnit(kind: QuantityKind, unit: LengthUnit): string {
  switch (kind) {
    case 'length':
      return unit;
    case 'micro':
      return 'µm';
    case 'angle':
      return '°';
    case 'ratio':
      return '×';
    case 'share':
      return '%';
    case 'power':
      return '1/m';
    default:
      return '';
  }
}
