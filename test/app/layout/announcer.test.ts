import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { createAnnouncer } from '../../../app/layout/announcer.ts';

describe('the live region', () => {
  beforeEach(() => void vi.useFakeTimers());
  afterEach(() => void vi.useRealTimers());

  const speaking = () => {
    const spoken: string[] = [];
    return { spoken, say: createAnnouncer((text) => spoken.push(text)) };
  };

  it('speaks at most twice a second, and then only the newest', () => {
    const { spoken, say } = speaking();
    for (let ms = 0; ms < 3000; ms += 50) {
      say(`value ${ms}`);
      vi.advanceTimersByTime(50);
    }
    vi.advanceTimersByTime(1000);
    expect(spoken.length).toBeLessThanOrEqual(7);
    expect(spoken.length).toBeGreaterThanOrEqual(5);
    expect(spoken.at(-1)).toBe('value 2950');
  });

  it('says nothing twice, and speaks again after a rest', () => {
    const { spoken, say } = speaking();
    say('first');
    vi.advanceTimersByTime(5000);
    expect(spoken).toEqual(['first']);
    say('second');
    vi.advanceTimersByTime(500);
    expect(spoken).toEqual(['first', 'second']);
  });
});
