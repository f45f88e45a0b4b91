import { describe, expect, it } from 'vitest';
import { canvasMeasure, roughMeasure } from '../../../app/board/measure.ts';

describe('measuring texts', () => {
  it('asks the canvas once for a text in a style, and again when the type face has arrived', () => {
    const asked: string[] = [];
    const ctx = {
      font: '',
      measureText(text: string) {
        asked.push(`${text} in ${ctx.font.slice(0, 8)}`);
        return { width: 10 * text.length } as TextMetrics;
      },
    };
    const { measure, forget } = canvasMeasure(ctx);
    expect([measure('f 28', 'label'), measure('f 28', 'label'), measure('f 28', 'value')]).toEqual([
      40, 40, 40,
    ]);
    expect(asked).toEqual(['f 28 in 400 13px', 'f 28 in 550 15px']);
    forget();
    measure('f 28', 'label');
    expect(asked).toHaveLength(3);
  });

  it('without a canvas grows with the text and the size of the style', () => {
    expect(roughMeasure('abcd', 'label')).toBe(2 * roughMeasure('ab', 'label'));
    expect(roughMeasure('ab', 'value')).toBeGreaterThan(roughMeasure('ab', 'label'));
  });
});
