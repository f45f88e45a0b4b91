import { none, type Outcome, some } from '../outcome.ts';

const SENTENCES = {
  'no power': 'Light passes unbent, so there is nothing to solve for: give it a power.',
  'no such part': 'There is no thin part here to make of glass, or no glass to make thin.',
  'no index': 'A glass has no index in the lines in use: choose another glass or other lines.',
  'no bending': 'Two flat surfaces have no power: curve one of them.',
  'index of its surroundings':
    'Glass with the index of what surrounds it does not bend light: choose another.',
  'no such radii':
    'No radii give this focal length at this thickness and bending: make it thinner or bend it less.',
  'equal radii without thickness': 'Equal radii bend light only by their thickness: give it one.',
  'rim beyond a surface': 'A surface is curved so much that it ends before the rim: make the rim smaller.',
  'no such edge': 'No centre thickness gives this edge: make the edge thicker or the rim smaller.',
  'no dispersion': 'Colour needs glasses with dispersion: choose two that have it.',
  'equal Abbe numbers':
    'Colour cannot be cancelled with two glasses of one Abbe number: choose another glass.',
  'no gap': 'The two parts stand at one place: leave a gap between them.',
  'first needs no power': 'What is wanted comes without a first part of any power.',
  'second needs no power': 'What is wanted comes without a second part of any power.',
  'no such layout': 'No two powers at this gap do what is wanted: change the gap.',
  'out of range': 'The numbers grow too large to compute: check for extreme powers and gaps.',
} as const;

/** Why something cannot be solved for: a short phrase that can stand in its place on the screen. */
export type Unsolvable = keyof typeof SENTENCES;

/** One plain sentence that says why and, where something can be done, what. */
export const unsolvableSentence = (why: Unsolvable): string => SENTENCES[why];

/** What was solved for, or why there is none. */
export type Solved<T> = Outcome<T, Unsolvable>;

/** The value when every number of `numbers` is finite; 'out of range' otherwise. */
export const solvedIf = <T>(value: T, numbers: readonly number[]): Solved<T> =>
  numbers.every(Number.isFinite) ? some(value) : none('out of range');
