import { describe, expect, it } from 'vitest';
import { aligned, canvasPen, type Paintable, widthOf } from '../../../app/board/canvasPen.ts';
import { PALETTES } from '../../../app/board/styles.ts';
import { smallScene } from './scene.ts';

/** A context that writes down its calls, each stroke and fill with the paint in force. */
function paintedContext(): { ctx: Paintable; calls: string[] } {
  const calls: string[] = [];
  const state = { strokeStyle: '', fillStyle: '', lineWidth: 0, lineJoin: '', font: '', textAlign: '' };
  const ctx = new Proxy(state as unknown as Paintable, {
    get(target, name) {
      if (name in target) return Reflect.get(target, name);
      return (...args: unknown[]) => {
        const paint =
          name === 'stroke'
            ? ` ${state.strokeStyle} ${state.lineWidth}`
            : name === 'fill'
              ? ` ${state.fillStyle}`
              : '';
        calls.push(`${String(name)}(${args.join(' ')})${paint}`);
      };
    },
    set: (target, name, value) => Reflect.set(target, name, value),
  });
  return { ctx, calls };
}

const count = (calls: readonly string[], name: string): number =>
  calls.filter((call) => call.startsWith(`${name}(`)).length;

describe('the canvas pen', () => {
  it('strokes a batch of lines as one path', () => {
    const { ctx, calls } = paintedContext();
    canvasPen(ctx, PALETTES.paper, 2).polylines([0, 0, 5, 5, 0, 9, 5, 5, 8, 8], [0, 2], 'axial bundle');
    expect(count(calls, 'beginPath')).toBe(1);
    expect(count(calls, 'moveTo')).toBe(2);
    expect(calls.at(-1)).toBe('stroke() #0a71b1 0.5');
  });

  it('fills before it strokes, in the colours of the theme', () => {
    const { ctx, calls } = paintedContext();
    canvasPen(ctx, PALETTES.night, 1).circle(10, 10, 4, 'grip');
    expect(calls.filter((call) => /fill|stroke/.test(call))).toEqual([
      'fill() #12171d',
      'stroke() #e5e9ec 1.6',
    ]);
  });

  it('leaves the context as it found it after turned text and after a clip', () => {
    const { ctx, calls } = paintedContext();
    smallScene(canvasPen(ctx, PALETTES.paper, 1));
    expect(count(calls, 'save')).toBe(2);
    expect(count(calls, 'restore')).toBe(2);
  });

  it('draws hairlines one device pixel wide', () => {
    expect(widthOf('axis', 3)).toBeCloseTo(1 / 3, 12);
    expect(widthOf('chief ray', 3)).toBe(2);
  });

  it('sets upright and level lines on device pixels and leaves slanting ones alone', () => {
    // One device pixel wide: centred on a pixel. Three wide (sensor): centred too. Two wide (dimension at 1.5): on an edge.
    expect(aligned([50.3, 5, 50.3, 60], 'axis', 1)).toEqual([50.5, 5, 50.5, 60]);
    expect(aligned([5, 20.2, 60, 20.2], 'sensor', 1)).toEqual([5, 20.5, 60, 20.5]);
    expect(aligned([50.3, 5, 50.3, 60], 'dimension', 1.5)).toEqual([50, 5, 50, 60]);
    const slanting = [1.2, 3.4, 5.6, 7.8];
    expect(aligned(slanting, 'part', 2)).toBe(slanting);
  });
});
