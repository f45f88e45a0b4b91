import { describe, expect, it } from 'vitest';
import {
  fieldBundle,
  fontOf,
  LOOKS,
  markLook,
  PALETTES,
  type Palette,
  type TextStyle,
  textLook,
} from '../../../app/board/styles.ts';

/** Relative luminance and contrast ratio as WCAG 2.2 defines them. */
function contrast(one: string, other: string): number {
  const luminance = (hex: string): number => {
    const [r, g, b] = [1, 3, 5].map((at) => {
      const c = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
      return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
    }) as [number, number, number];
    return 0.2126 * r + 0.7152 * g + 0.0722 * b;
  };
  const [light, dark] = [luminance(one), luminance(other)].sort((a, b) => b - a) as [number, number];
  return (light + 0.05) / (dark + 0.05);
}

const themes: [string, Palette][] = [
  ['paper', PALETTES.paper],
  ['night', PALETTES.night],
];
const texts: TextStyle[] = [
  'label',
  'label quiet',
  'label marginal ray',
  'label chief ray',
  'value held',
  'value bad',
];

describe('the looks of lines', () => {
  it('draw the marginal ray 1.5 px, the chief ray 2 px and every other ray as a hairline', () => {
    expect(markLook('marginal ray').width).toBe(1.5);
    expect(markLook('chief ray').width).toBe(2);
    expect(markLook('axial bundle').width).toBe('hairline');
    expect(markLook('field outer bundle').width).toBe('hairline');
  });

  it('dot a backward extension and dash a paraxial ray, in the colour of the ray', () => {
    const [real, virtual, paraxial] = [
      markLook('chief ray'),
      markLook('chief ray virtual'),
      markLook('chief ray paraxial'),
    ];
    expect(new Set([real.stroke, virtual.stroke, paraxial.stroke]).size).toBe(1);
    expect(real.dash).toEqual([]);
    expect(Math.max(...virtual.dash)).toBeLessThan(Math.min(...paraxial.dash));
  });

  it('keep the colour of held values off the rays', () => {
    for (const [name, look] of LOOKS) if (/ray|bundle/.test(name)) expect(look.stroke).not.toBe('held');
  });

  it.each(themes)(
    'stand out from the sheet three to one on %s, but for hairlines between areas',
    (_name, palette) => {
      for (const [name, { stroke }] of LOOKS)
        if (stroke !== null && stroke !== 'line')
          expect(contrast(palette[stroke], palette.paper), name).toBeGreaterThanOrEqual(3);
    },
  );

  it('run the off-axis bundles through one ramp from inner to outer', () => {
    expect(fieldBundle(0, 1)).toBe('field outer bundle');
    expect([0, 1].map((i) => fieldBundle(i, 2))).toEqual(['field inner bundle', 'field outer bundle']);
    expect([0, 1, 2, 3, 4].map((i) => fieldBundle(i, 5))).toEqual([
      'field inner bundle',
      'field middle bundle',
      'field middle bundle',
      'field outer bundle',
      'field outer bundle',
    ]);
  });
});

describe('the looks of texts', () => {
  it.each(themes)('are readable four and a half to one on %s', (_name, palette) => {
    for (const style of texts)
      expect(contrast(palette[textLook(style).colour], palette.paper), style).toBeGreaterThanOrEqual(4.5);
  });

  it('are never below 12 px', () => {
    for (const style of texts) expect(textLook(style).sizePx).toBeGreaterThanOrEqual(12);
  });

  it('give a CSS font with weight, size and face', () => {
    expect(fontOf('value')).toMatch(/^550 15px 'Source Sans 3 Variable', /);
  });
});
