import type { Sketch, SolidMedium } from '../../../engine/index.ts';
import {
  indexOf,
  kindOf,
  materialOf,
  mediumName,
  nominal,
  rangeOf,
  weightedLines,
} from '../../../engine/index.ts';
import { formatNumber } from '../../ui/format.ts';

/** Name, figures, and where they hold, each as a text of its own. */
export interface MediumWords {
  readonly name: string;
  /** Index in the d line and Abbe number. */
  readonly figures: string;
  /** Kind and range. */
  readonly about: string;
}

/** What the chooser says of a medium. A fixed index belongs to the sketch's own main line. */
export function mediumWords(medium: SolidMedium): MediumWords {
  const { nd, vd } = nominal(medium);
  const letters = 'index' in medium ? ['n', 'V'] : ['nd', 'Vd'];
  const figures = [
    `${letters[0]} ${nd === null ? 'unknown' : formatNumber(nd, 5)}`,
    `${letters[1]} ${vd === null ? 'unknown' : formatNumber(vd, 2)}`,
  ];
  return {
    name: mediumName(medium),
    figures: figures.join(', '),
    about: [kindWords(medium), rangeWords(medium)].join(', '),
  };
}

function kindWords(medium: SolidMedium): string {
  if ('code' in medium) return 'six-digit code';
  if ('index' in medium) return 'fixed index';
  if ('formula' in medium) return 'own formula';
  const material = materialOf(medium.material);
  return material === null ? 'unknown' : kindOf(material);
}

function rangeWords(medium: SolidMedium): string {
  const range = rangeOf(medium);
  return range === null ? 'any wavelength' : `${range[0]} to ${range[1]} nm`;
}

/** The index in the sketch's main line, for a card; why there is none otherwise. */
export function mainIndexWords(medium: SolidMedium, { lines, air }: Pick<Sketch, 'lines' | 'air'>): string {
  const index = indexOf(medium, lines.mainNm, lines, air);
  return index.ok ? `n ${formatNumber(index.value, 4)}` : index.why;
}

/** Whether the index of the medium is known in every line of the sketch. */
export function isKnownInLines(medium: SolidMedium, { lines, air }: Pick<Sketch, 'lines' | 'air'>): boolean {
  const range = rangeOf(medium, air);
  if (range === null) return true;
  return weightedLines(lines).every(
    ({ wavelengthNm }) => wavelengthNm >= range[0] && wavelengthNm <= range[1],
  );
}
