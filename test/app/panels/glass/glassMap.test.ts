import { describe, expect, test } from 'vitest';
import { BEYOND, MARKS, nearestMark, placeOn } from '../../../../app/panels/glass/glassMap.ts';
import { isKnownInLines, mediumWords } from '../../../../app/panels/glass/mediumWords.ts';
import { emptySketch, materials } from '../../../../engine/index.ts';

const SIZE = { widthPx: 400, heightPx: 250 };

describe('the glass map', () => {
  test('holds every material once: on the map, or beyond it by its name', () => {
    expect([...MARKS.map(({ material }) => material), ...BEYOND].toSorted()).toHaveLength(materials.length);
    expect(BEYOND.map(({ id }) => id)).toEqual(['mgf2-o', 'si', 'ge', 'znse', 'zns']);
  });

  test('has indices rising upwards and Abbe numbers falling to the right', () => {
    const crown = placeOn({ nd: 1.5, vd: 60 });
    const flint = placeOn({ nd: 1.7, vd: 30 });
    expect((flint?.x ?? 0) > (crown?.x ?? 0) && (flint?.y ?? 0) < (crown?.y ?? 0)).toBe(true);
    expect(placeOn({ nd: 1.5, vd: null })).toBeNull();
  });

  test('gives the nearest material within reach of the pointer', () => {
    for (const mark of MARKS) {
      const point = { xPx: (mark.x / 100) * SIZE.widthPx, yPx: (mark.y / 100) * SIZE.heightPx };
      const found = nearestMark(MARKS, point, SIZE, 5);
      expect([found?.x, found?.y]).toEqual([mark.x, mark.y]);
    }
    expect(nearestMark(MARKS, { xPx: 10, yPx: 10 }, SIZE, 18)).toBeNull();
  });

  test('tells name, figures, kind and range, and whether every line lies in it', () => {
    expect(mediumWords({ material: 'n-bk7' })).toEqual({
      name: 'N-BK7',
      figures: 'nd 1.51680, Vd 64.17',
      about: 'crown, 300 to 2500 nm',
    });
    expect(isKnownInLines({ material: 'n-bk7' }, emptySketch())).toBe(true);
    expect(isKnownInLines({ material: 'ge' }, emptySketch())).toBe(false);
  });
});
