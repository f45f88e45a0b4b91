import type { Analysis, Quantity } from '../../../engine/index.ts';
import type { Reading } from '../../live/reading.ts';
import type { QuantityKind } from '../quantity.ts';

export const READOUT_GROUPS = ['Power', 'Conjugates', 'Light', 'Pupils', 'Sensor'] as const;
export type ReadoutGroup = (typeof READOUT_GROUPS)[number];

/** One number of the analysis as a panel shows it. To add one, add an entry to the list of its group. */
export interface Readout {
  readonly id: string;
  /** Among the few of its group that are shown before more is asked for. */
  readonly isMain?: true;
  readonly label: string;
  readonly kind: QuantityKind;
  readonly digits: number;
  readonly read: (analysis: Analysis) => Quantity;
  /** How it comes about, in words; the trace sheet shows it. */
  readonly formula: string;
  /** What else the trace sheet says of it at present, in sentences; empty when there is nothing. */
  readonly particulars?: (reading: Reading) => string;
  /** Whether it says anything about this layout at all; left out, it always does. */
  readonly applies?: (analysis: Analysis) => boolean;
}
