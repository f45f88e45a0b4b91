import type { Reading } from '../../live/reading.ts';
import { quantityText, quantityUnit } from '../quantity.ts';
import type { Readout } from './readout.ts';
import { readoutById } from './table.ts';

/** A readout's number with its unit, or the reason why there is none. */
export function readoutText({ read, kind, digits }: Readout, { analysis, view }: Reading): string {
  const outcome = read(analysis);
  if (!outcome.ok) return outcome.why;
  return `${quantityText(outcome.value, kind, digits, view.unit)} ${quantityUnit(kind, view.unit)}`.trimEnd();
}

/** The readout whose working was asked for last, by name and number: "Focal length 25.748 mm". */
export function chosenReadout(reading: Reading): string {
  const readout = readoutById(reading.view.topic, reading.sketch.field.fractions);
  return `${readout.label} ${readoutText(readout, reading)}`;
}
