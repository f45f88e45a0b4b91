import { describe, expect, it } from 'vitest';
import { batchTask, plainTask } from './kernel.ts';

/** Sums of x + 10 M over the rays as the program in C prints them, to eleven digits. */
const SPHERES = -4.622551041e-1;
const ASPHERES = -4.032223006e-1;
const DIGITS = 1e-10;

describe('the kernel’s yardsticks', () => {
  it('trace the same rays to the same ends as the program in C', () => {
    expect(Math.abs(batchTask(false)() - SPHERES)).toBeLessThanOrEqual(DIGITS);
    expect(Math.abs(plainTask()() - SPHERES)).toBeLessThanOrEqual(DIGITS);
    expect(Math.abs(batchTask(true)() - ASPHERES)).toBeLessThanOrEqual(DIGITS);
  });
});
