import { describe, expect, it } from 'vitest';
import { exactRaysOf } from '../../../../app/drawing/exact/rays.ts';
import { COMPARED_COLUMNS, COMPARED_ROWS, comparedText } from '../../../../app/panels/exact/rows.ts';
import { largestWords, lostSummary, trustWords } from '../../../../app/panels/exact/words.ts';
import { none, some } from '../../../../engine/index.ts';
import { realZoom } from '../../../engine/realZoom.ts';
import { readingOf } from '../../reading.ts';

const zoom = realZoom();
const reading = readingOf(zoom);

describe('how far the first order can be trusted', () => {
  const words = (apertureShare: number, fieldShare: number, fNumber: number | null = 4) =>
    trustWords(some({ apertureShare, fieldShare }), 0.01, fNumber, 'mm');

  it('is said in shares of aperture and field, with the f-number that is left', () => {
    expect(words(0.5, 0.7)).toBe(
      'First order holds within 0.01 mm up to 50 % of the aperture (f/8) and 70 % of the field.',
    );
    expect(words(0.5, 1)).toBe(
      'First order holds within 0.01 mm up to 50 % of the aperture (f/8) and the whole field.',
    );
    expect(words(1, 0.7, null)).toBe(
      'First order holds within 0.01 mm up to the whole aperture and 70 % of the field.',
    );
  });

  it('is one plain word where it holds everywhere or nowhere', () => {
    expect(words(1, 1)).toBe('First order holds within 0.01 mm over the whole aperture and field.');
    expect(words(0, 0)).toBe('First order holds within 0.01 mm nowhere: not even close to the axis.');
  });

  it('never rounds what is almost all to all, nor what is little to nothing', () => {
    expect(words(0.9996, 0.004)).toBe(
      'First order holds within 0.01 mm up to 99 % of the aperture (f/4) and less than 1 % of the field.',
    );
  });

  it('gives the reason when there is no image plane', () => {
    expect(trustWords(none('image at infinity'), 0.01, 4, 'mm')).toMatch(/^The image is at infinity/);
  });

  it('speaks in the unit of the screen', () => {
    expect(trustWords(some({ apertureShare: 1, fieldShare: 1 }), 0.0254, 4, 'in')).toContain('0.001 in');
  });
});

describe('the table of paraxial and exact values', () => {
  const { comparison } = reading.exact;
  if (!comparison.ok) throw new Error(comparison.why);
  const texts = new Map(
    COMPARED_ROWS.map((row) => [
      row.label,
      COMPARED_COLUMNS.map((column) => comparedText(row, column, row.read(comparison.value)[column], 'mm')),
    ]),
  );

  it('puts both and their signed difference side by side', () => {
    expect(texts.get('Focal length')).toEqual(['38.959', '40.625', '+1.666']);
    expect(texts.get('Chief height')).toEqual(['4.0947', '4.0829', '−0.0119']);
    expect(texts.get('Distortion, %')).toEqual(['0.000', '−0.290', '−0.290']);
  });

  it('counts the longitudinal error from the paraxial image', () => {
    expect(texts.get('Longitudinal')).toEqual(['0.000', '3.405', '+3.405']);
  });

  it('gives the reason where there is no such quantity', () => {
    expect(texts.get('Magnification')).toEqual(Array(3).fill('object at infinity'));
  });

  it('has no sign before a difference that is shown as nothing', () => {
    const [row] = COMPARED_ROWS;
    expect(row && comparedText(row, 'difference', some(1e-6), 'mm')).toBe('0.000');
  });
});

describe('the largest drift', () => {
  it('is named with its ray and its place', () => {
    const rays = exactRaysOf(reading);
    expect(rays && largestWords(zoom, rays, 'mm')).toBe(
      '0.2103 mm, bundle at 70 % of the field, at the image plane',
    );
  });
});

it('lost rays are counted by their reason', () => {
  const rays = exactRaysOf(reading);
  if (!rays) throw new Error('the zoom has exact rays');
  expect(lostSummary(zoom, rays)).toBe('');
  const lost = { why: 'missed', surface: 2 } as const;
  const pencils = rays.pencils.map((pencil) => ({
    ...pencil,
    rays: pencil.name === 'marginal ray' ? pencil.rays.map((ray) => ({ ...ray, lost })) : pencil.rays,
  }));
  expect(lostSummary(zoom, { ...rays, pencils })).toMatch(/^2 missed surface 3 \(.+\)$/);
});
