import data from './spectral-lines.json' with { type: 'json' };

/** The letters by which catalogues name the spectral lines. */
export type LineLetter = 'i' | 'h' | 'g' | "F'" | 'F' | 'e' | 'd' | 'D' | "C'" | 'C' | 'r' | 's' | 't';

export interface SpectralLine {
  readonly id: LineLetter;
  /** Wavelength in air. */
  readonly nm: number;
  readonly element: string;
  /** One of the two reference lines of ISO 7944, e and d. */
  readonly isoReference: boolean;
  readonly note: string;
}

/** The spectral lines in which glass is measured, from short to long. */
export const spectralLines = data as readonly SpectralLine[];

const byLetter = new Map(spectralLines.map((line) => [line.id, line.nm]));

/** Wavelength in nm, in air, of the line with this letter. */
export const lineNm = (letter: LineLetter): number => byLetter.get(letter) ?? Number.NaN;
