import type { Line, Lines } from './types.ts';

/** One wavelength of a sketch: its name, nm, and how much it counts. */
export interface WeightedLine {
  readonly line: Line;
  readonly wavelengthNm: number;
  readonly weight: number;
}

/** All wavelengths of a sketch, the main line first. */
export function weightedLines({ mainNm, shortNm, longNm, weights, more }: Lines): readonly WeightedLine[] {
  return [
    { line: 'main', wavelengthNm: mainNm, weight: weights.main },
    { line: 'short', wavelengthNm: shortNm, weight: weights.short },
    { line: 'long', wavelengthNm: longNm, weight: weights.long },
    ...more.map((extra, at) => ({ line: EXTRA[at] ?? 'fifth', ...extra })),
  ];
}

const EXTRA: readonly Line[] = ['fourth', 'fifth'];

/** The wavelength of a line in nm; that of the main line when the sketch has no such line. */
export function wavelengthOf(lines: Lines, line: Line): number {
  if (line === 'short') return lines.shortNm;
  if (line === 'long') return lines.longNm;
  const extra = line === 'main' ? undefined : lines.more[EXTRA.indexOf(line)];
  return extra?.wavelengthNm ?? lines.mainNm;
}
