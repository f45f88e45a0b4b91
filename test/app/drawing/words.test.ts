import { describe, expect, it } from 'vitest';
import { nameAt, plain, plainLength } from '../../../app/drawing/words.ts';
import { newPlate, newStop, newThin, partName } from '../../../engine/index.ts';
import { inspectionZoom } from '../../engine/demo.ts';

describe('words of the drawing', () => {
  it.each([
    [28, '28'],
    [28.5, '28.5'],
    [-32.1234, '\u221232.123'],
    [100, '100'],
    [0, '0'],
    [-0.0001, '0'],
  ])('%d has no decimals that say nothing', (value, text) => expect(plain(value)).toBe(text));

  it('keeps at most the decimals asked for', () => expect(plain(1.26, 1)).toBe('1.3'));

  it('writes lengths in the unit shown, equally fine in both', () => {
    expect(plainLength(25.4, 'mm')).toBe('25.4 mm');
    expect(plainLength(25.4, 'in')).toBe('1 in');
    expect(plainLength(1, 'in')).toBe('0.03937 in');
  });

  it('calls a part by its name, else by its kind and its place in the row', () => {
    expect(partName({ ...newThin(50), name: 'field lens' }, 3)).toBe('field lens');
    expect([partName(newThin(50), 0), partName(newStop(), 1), partName(newPlate(), 2)]).toEqual([
      'element 1',
      'stop 2',
      'plate 3',
    ]);
    expect(nameAt(inspectionZoom(), 2)).toBe('third group');
    expect(nameAt(inspectionZoom(), 7)).toBe('');
  });
});
