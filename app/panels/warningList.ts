import type { PositionId, Sketch, Warning } from '../../engine/index.ts';
import { settingAt } from '../../engine/index.ts';
import { warningsAt } from '../live/analysis.ts';

/** A warning and the positions that have it, in the sketch's order. */
export interface ListedWarning {
  readonly warning: Warning;
  readonly positionIds: readonly PositionId[];
}

const remembered = new WeakMap<Sketch, readonly ListedWarning[]>();

/** The warnings over all positions, what cannot be built first; one that reads the same at several positions is listed once. */
export function listWarnings(sketch: Sketch): readonly ListedWarning[] {
  let list = remembered.get(sketch);
  if (!list) {
    list = merged(sketch.positions.flatMap(({ id }) => warningsAt(sketch, settingAt(id))));
    remembered.set(sketch, list);
  }
  return list;
}

/** How many warnings the list holds. */
export const countWarnings = (sketch: Sketch): number => listWarnings(sketch).length;

function merged(warnings: readonly Warning[]): readonly ListedWarning[] {
  const bySentence = new Map<string, ListedWarning>();
  for (const warning of warnings) {
    const key = `${warning.kind} ${warning.sentence('mm')}`;
    const listed = bySentence.get(key);
    bySentence.set(key, {
      warning: listed?.warning ?? warning,
      positionIds: [...(listed?.positionIds ?? []), warning.positionId],
    });
  }
  return [...bySentence.values()].sort((a, b) => rank(a.warning) - rank(b.warning));
}

const rank = (warning: Warning): number => (warning.severity === 'cannot be built' ? 0 : 1);
