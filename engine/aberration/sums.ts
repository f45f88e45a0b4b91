/** The five third-order sums and the two of colour, in the order in which they are told. */
export const SUM_NAMES = [
  'spherical',
  'coma',
  'astigmatism',
  'petzval',
  'distortion',
  'axialColour',
  'lateralColour',
] as const;

export type SumName = (typeof SUM_NAMES)[number];

/** What each sum is called on a screen. */
export const SUM_WORDS: Readonly<Record<SumName, string>> = {
  spherical: 'spherical aberration',
  coma: 'coma',
  astigmatism: 'astigmatism',
  petzval: 'field curvature (Petzval)',
  distortion: 'distortion',
  axialColour: 'axial colour',
  lateralColour: 'lateral colour',
};

/** One number for each sum, in mm: S_I to S_V, C_I and C_II of Welford, Aberrations of Optical Systems (1986). */
export type Sums = Readonly<Record<SumName, number>>;

/** One value for each sum, made from its name. */
export const eachSum = <T>(make: (name: SumName) => T): Record<SumName, T> => ({
  spherical: make('spherical'),
  coma: make('coma'),
  astigmatism: make('astigmatism'),
  petzval: make('petzval'),
  distortion: make('distortion'),
  axialColour: make('axialColour'),
  lateralColour: make('lateralColour'),
});

/**
 * The sums of the same light once the stop is moved along the axis, its image kept as wide as the bundle. `shift` is δȳ/y: how much the
 * chief ray's height changes at a surface over the marginal ray's height there, the same number at every surface. Holds for one surface as
 * for their totals (stop-shift equations, Welford 1986).
 */
export function shiftStop(sums: Sums, shift: number): Sums {
  const { spherical, coma, astigmatism, petzval, distortion, axialColour, lateralColour } = sums;
  return {
    spherical,
    coma: coma + shift * spherical,
    astigmatism: astigmatism + shift * (2 * coma + shift * spherical),
    petzval,
    distortion: distortion + shift * (3 * astigmatism + petzval + shift * (3 * coma + shift * spherical)),
    axialColour,
    lateralColour: lateralColour + shift * axialColour,
  };
}
