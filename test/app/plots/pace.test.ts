import { describe, expect, it } from 'vitest';
import { REST_MS, whenBehind, whenCoarse } from '../../../app/plots/pace.ts';

describe('the pace of plots', () => {
  it('begins coarsely, as long as nothing is known of the cost', () => {
    expect(whenBehind({ coarse: null, fine: null }, 0, 1000)).toEqual({ kind: 'compute', quality: 'coarse' });
  });

  it('is fine at every frame where that is quick', () => {
    expect(whenBehind({ coarse: 1, fine: 4 }, 0, 0)).toEqual({ kind: 'compute', quality: 'fine' });
  });

  it('is coarse while a hand moves and fine plots are slow', () => {
    expect(whenBehind({ coarse: 3, fine: 30 }, 0, 0)).toEqual({ kind: 'compute', quality: 'coarse' });
  });

  it('leaves frames to the drawing where even coarse plots are slow', () => {
    expect(whenBehind({ coarse: 20, fine: 90 }, 0, 10)).toEqual({ kind: 'wait', ms: 30 });
    expect(whenBehind({ coarse: 20, fine: 90 }, 0, 40)).toEqual({ kind: 'compute', quality: 'coarse' });
  });

  it('waits for the hand to rest where plots would be felt', () => {
    expect(whenBehind({ coarse: 80, fine: 400 }, 50, 5000)).toEqual({ kind: 'wait', ms: REST_MS - 50 });
    expect(whenBehind({ coarse: 80, fine: 400 }, REST_MS, 5000)).toEqual({
      kind: 'compute',
      quality: 'coarse',
    });
  });

  it('refines when the hand rests, and not before', () => {
    expect(whenCoarse(0)).toEqual({ kind: 'wait', ms: REST_MS });
    expect(whenCoarse(REST_MS)).toEqual({ kind: 'compute', quality: 'fine' });
  });
});
