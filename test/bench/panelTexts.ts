import type { Reading } from '../../app/live/reading.ts';
import { quantityText } from '../../app/panels/quantity.ts';
import { READOUT_GROUPS } from '../../app/panels/readouts/readout.ts';
import { readoutsIn } from '../../app/panels/readouts/table.ts';
import { listWarnings } from '../../app/panels/warningList.ts';

/** Every text that a frame may change in the panels: all readouts of all groups, and the warnings over all positions. */
export function panelTexts({ sketch, analysis, view }: Reading): readonly string[] {
  const readouts = READOUT_GROUPS.flatMap((group) => readoutsIn(group, analysis, sketch.field.fractions));
  const texts = readouts.map(({ read, kind, digits }) => {
    const outcome = read(analysis);
    return outcome.ok ? quantityText(outcome.value, kind, digits, view.unit) : outcome.why;
  });
  return [...texts, ...listWarnings(sketch).map(({ warning }) => warning.sentence('mm'))];
}
