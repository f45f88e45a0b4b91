import { codeFault, formulaFaults, materialFault } from '../media/faults.ts';
import { indexOf, mediumName, rangeOf } from '../media/medium.ts';
import type { Fault } from '../outcome.ts';
import { numberFault, textFault } from './faults.ts';
import { keeps, LIMITS, LONGEST_TEXT } from './limits.ts';
import { wavelengthOf } from './lines.ts';
import type { Line, Medium, Sketch, SolidMedium } from './types.ts';
import { quantityText } from './words.ts';

/**
 * The rules on one medium: its own numbers, and that every line of the sketch lies where its index is known. So a train never
 * meets a medium without an index.
 */
export function mediumFaults(
  faults: Fault[],
  sketch: Sketch,
  medium: SolidMedium,
  path: string,
  owner: string,
): void {
  const before = faults.length;
  if ('material' in medium) add(faults, `${path}.material`, owner, materialFault(medium.material));
  else if ('code' in medium) add(faults, `${path}.code`, owner, codeFault(medium.code));
  else {
    if (medium.name.length > LONGEST_TEXT.name)
      textFault(faults, `${path}.name`, `The name of the medium of ${owner}`, medium.name, LONGEST_TEXT.name);
    if ('formula' in medium)
      add(faults, `${path}.formula`, owner, formulaFaults(medium.formula, medium.rangeNm));
    else {
      if (!keeps(LIMITS.index, medium.index))
        numberFault(faults, LIMITS.index, medium.index, `${path}.index`, owner);
      if (medium.abbeNumber !== null && !keeps(LIMITS.abbeNumber, medium.abbeNumber))
        numberFault(faults, LIMITS.abbeNumber, medium.abbeNumber, `${path}.abbeNumber`, owner);
    }
  }
  if (faults.length === before) rangeFaults(faults, sketch, medium, owner);
}

/** A fault of media says what is wrong and what is allowed; here it gets its place. */
function add(faults: Fault[], path: string, owner: string, sentence: string | null): void {
  if (sentence !== null) faults.push({ path, sentence: sentence.replace(/\.$/, ` (in ${owner}).`) });
}

const LINE_WORDS: Readonly<Record<Line, { readonly path: string; readonly words: string }>> = {
  main: { path: 'lines.mainNm', words: 'main wavelength' },
  short: { path: 'lines.shortNm', words: 'short wavelength' },
  long: { path: 'lines.longNm', words: 'long wavelength' },
  fourth: { path: 'lines.more[0].wavelengthNm', words: 'fourth wavelength' },
  fifth: { path: 'lines.more[1].wavelengthNm', words: 'fifth wavelength' },
};

/** A fault for each line of the sketch in which the medium has no index. */
export function rangeFaults(faults: Fault[], sketch: Sketch, medium: Medium, owner: string): void {
  const { lines, air } = sketch;
  for (let at = 0; at < 3 + lines.more.length; at++) {
    const line = LINES_IN_ORDER[at] ?? 'main';
    const wavelengthNm = wavelengthOf(lines, line);
    if (indexOf(medium, wavelengthNm, lines, air).ok) continue;
    const { path, words } = LINE_WORDS[line];
    const [low, high] = rangeOf(medium, air) ?? [Number.NaN, Number.NaN];
    const inside = !(wavelengthNm < low || wavelengthNm > high);
    const allowed = inside
      ? `a wavelength at which ${mediumName(medium)} in ${owner} has an index above 0`
      : `between ${quantityText(low, '')} and ${quantityText(high, 'nm')}, where the index of ${mediumName(medium)} in ${owner} is known`;
    faults.push({
      path,
      sentence: `The ${words} is ${quantityText(wavelengthNm, 'nm')}; it must be ${allowed}.`,
    });
  }
}

const LINES_IN_ORDER: readonly Line[] = ['main', 'short', 'long', 'fourth', 'fifth'];
