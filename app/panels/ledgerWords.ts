import type { LedgerRow, LengthUnit, Quantity } from '../../engine/index.ts';
import { formatLength, formatNumber } from '../ui/format.ts';

/** One part's ledger line in words: where its object and its image stand, real or virtual, and its magnification. */
export function ledgerWords(row: LedgerRow, unit: LengthUnit): string {
  const object = placeWords(row.objectDistanceMm, row.objectIs, unit);
  const image = placeWords(row.imageDistanceMm, row.imageIs, unit);
  const magnification = row.magnification.ok ? `; m ${formatNumber(row.magnification.value, 4)}` : '';
  return `object ${object} → image ${image}${magnification}`;
}

function placeWords(distanceMm: Quantity, is: LedgerRow['objectIs'], unit: LengthUnit): string {
  if (!distanceMm.ok) return is;
  const length = `${formatLength(Math.abs(distanceMm.value), unit)} ${unit}`;
  return `${length} ${distanceMm.value < 0 ? 'in front of it' : 'behind it'}, ${is}`;
}
