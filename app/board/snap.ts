/** A value that a drag may be caught at, and what is there, in words. */
export interface Catch {
  readonly at: number;
  readonly name: string;
}

export interface Snapped {
  readonly value: number;
  /** What caught the value, or null when nothing did. */
  readonly caught: Catch | null;
}

/** The value moved to the nearest catch within `tolerance` (same unit); the first named wins between equals. */
export function snapTo(catches: readonly Catch[], value: number, tolerance: number, enabled = true): Snapped {
  let caught: Catch | null = null;
  let least = tolerance;
  for (const candidate of enabled ? catches : []) {
    const distance = Math.abs(candidate.at - value);
    if (distance < least || (distance === least && caught === null)) {
      caught = candidate;
      least = distance;
    }
  }
  return { value: caught?.at ?? value, caught };
}
