import { describe, expect, test } from 'vitest';
import { createFrameLoop } from '../../../app/live/frame.ts';

/** Frames that come when the test says so. */
function handFrames() {
  const waiting: (() => void)[] = [];
  return {
    request: (run: () => void) => {
      waiting.push(run);
    },
    waiting,
    next: () => waiting.shift()?.(),
  };
}

describe('the frame loop', () => {
  test('settles, then draws, then plots, in whatever order they were asked for', () => {
    const frames = handFrames();
    const loop = createFrameLoop(frames.request);
    const ran: string[] = [];
    loop.ask('plots', 'fan', () => ran.push('plots'));
    loop.ask('draw', 'scene', () => ran.push('draw'));
    loop.ask('settle', 'drag', () => ran.push('settle'));
    frames.next();
    expect(ran).toEqual(['settle', 'draw', 'plots']);
  });

  test('a hundred moves before a frame are one job, the newest', () => {
    const frames = handFrames();
    const loop = createFrameLoop(frames.request);
    const ran: number[] = [];
    for (let move = 1; move <= 100; move += 1) loop.ask('draw', 'scene', () => ran.push(move));
    expect(frames.waiting.length).toBe(1);
    frames.next();
    expect(ran).toEqual([100]);
  });

  test('what settling asks to be drawn is drawn in the same frame', () => {
    const frames = handFrames();
    const loop = createFrameLoop(frames.request);
    const ran: string[] = [];
    loop.ask('settle', 'drag', () => {
      ran.push('settle');
      loop.ask('draw', 'scene', () => ran.push('draw'));
    });
    frames.next();
    expect(ran).toEqual(['settle', 'draw']);
  });

  test('a job that asks for itself runs again in the next frame, not in this one', () => {
    const frames = handFrames();
    const loop = createFrameLoop(frames.request);
    let runs = 0;
    const again = () => {
      runs += 1;
      loop.ask('draw', 'scene', again);
    };
    loop.ask('draw', 'scene', again);
    frames.next();
    expect(runs).toBe(1);
    frames.next();
    expect(runs).toBe(2);
  });

  test('what one frame has done the next one does not do again', () => {
    const frames = handFrames();
    const loop = createFrameLoop(frames.request);
    const ran: string[] = [];
    loop.ask('draw', 'scene', () => ran.push('scene'));
    frames.next();
    loop.ask('draw', 'readers', () => ran.push('readers'));
    frames.next();
    expect(ran).toEqual(['scene', 'readers']);
  });

  test('flush does not wait, and the frame that was asked for has nothing left to do', () => {
    const frames = handFrames();
    const loop = createFrameLoop(frames.request);
    let runs = 0;
    loop.ask('draw', 'scene', () => {
      runs += 1;
    });
    loop.flush();
    expect(runs).toBe(1);
    frames.next();
    expect(runs).toBe(1);
  });
});
