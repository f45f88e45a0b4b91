/**
 * A value, or the reason why it does not exist. The engine's only way to say "no such quantity":
 * never NaN, never a silent zero, never an exception for something the user drew.
 */
export type Outcome<T, Why extends string = string> =
  | { readonly ok: true; readonly value: T }
  | { readonly ok: false; readonly why: Why };

/** The outcome that holds `value`. */
export const some = <T>(value: T): { readonly ok: true; readonly value: T } => ({ ok: true, value });

/** The outcome that says why there is no value. */
export const none = <Why extends string>(why: Why): { readonly ok: false; readonly why: Why } => ({
  ok: false,
  why,
});

/** The outcome with its value changed by `change`; an absent one stays absent for the same reason. */
export const mapOutcome = <T, U, Why extends string>(
  outcome: Outcome<T, Why>,
  change: (value: T) => U,
): Outcome<U, Why> => (outcome.ok ? some(change(outcome.value)) : outcome);

/** What is wrong with something the user gave: where it stands, and one plain sentence. */
export interface Fault {
  /** Dotted path into the sketch, `parts[2].focalLengthMm`; empty for the whole. */
  readonly path: string;
  /** Names the field, the value and what is allowed. */
  readonly sentence: string;
}
