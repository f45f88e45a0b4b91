import { describe, expect, it } from 'vitest';
import {
  filterMaterials,
  kindOf,
  type MapDirection,
  materialNamed,
  neighbour,
} from '../../../engine/media/chooser.ts';
import { materialOf, materials } from '../../../engine/media/materials.ts';

const ids = (text: string): readonly string[] => filterMaterials(materials, text).map(({ id }) => id);
const DIRECTIONS: readonly MapDirection[] = [
  'higher index',
  'lower index',
  'higher Abbe number',
  'lower Abbe number',
];
const onMap = materials.filter(({ nd, vd }) => nd !== null && vd !== null);

describe('the filter of materials', () => {
  it('lets all through without a word', () => {
    expect(filterMaterials(materials, '  ')).toBe(materials);
  });

  it('finds by name without regard to case and hyphens', () => {
    expect(ids('nbk7')).toEqual(['n-bk7']);
    expect(ids('N-BK')).toEqual(['n-bk7']);
    expect(ids('silica')).toContain('fused-silica');
  });

  it('finds by the code and by either half of it', () => {
    expect(ids('517642')).toEqual(['n-bk7', 'h-k9l']);
    expect(ids('517')).toEqual(['n-bk7', 'h-k9l']);
    expect(ids('517 642')).toEqual(['n-bk7', 'h-k9l']);
  });

  it('finds by kind, and by several words at once', () => {
    expect(ids('plastic')).toHaveLength(5);
    expect(ids('crown').length + ids('flint').length).toBe(ids('glass').length);
    expect(ids('flint sf6')).toEqual(['n-sf6', 'sf6', 'n-sf66']);
    expect(ids('plastic sf6')).toEqual([]);
  });

  it('calls glass crown or flint as their makers do', () => {
    const kind = (id: string) => kindOf(materialOf(id)!);
    expect(['n-bk7', 'n-sk16', 'n-bak4', 'n-ssk5'].map(kind)).toEqual(Array(4).fill('crown'));
    expect(['f2', 'n-sf6', 'llf1', 'n-kzfs4', 'n-lasf44'].map(kind)).toEqual(Array(5).fill('flint'));
    expect(['caf2', 'water', 'pmma'].map(kind)).toEqual(['crystal', 'liquid', 'plastic']);
  });
});

describe('a material looked for by its name', () => {
  it('is found however it is written, and not guessed', () => {
    expect(materialNamed(materials, ' N-BK7 ')?.id).toBe('n-bk7');
    expect(materialNamed(materials, 'nsf6')?.id).toBe('n-sf6');
    expect(materialNamed(materials, 'SF6')?.id).toBe('sf6');
    expect(materialNamed(materials, 'CaF2')?.id).toBe('caf2');
    for (const { id, name } of materials) {
      expect(materialNamed(materials, id)?.id).toBe(id);
      expect(materialNamed(materials, name)?.id).toBe(id);
    }
    expect(materialNamed(materials, 'BK7')).toBeNull();
    expect(materialNamed(materials, '—')).toBeNull();
  });
});

describe('a step on the map of index against Abbe number', () => {
  it('leads to a material on that side', () => {
    for (const from of onMap) {
      expect(neighbour(materials, from, 'higher index')?.nd ?? 9).toBeGreaterThan(from.nd ?? 0);
      expect(neighbour(materials, from, 'lower index')?.nd ?? 0).toBeLessThan(from.nd ?? 0);
      expect(neighbour(materials, from, 'higher Abbe number')?.vd ?? 999).toBeGreaterThan(from.vd ?? 0);
      expect(neighbour(materials, from, 'lower Abbe number')?.vd ?? 0).toBeLessThan(from.vd ?? 0);
    }
  });

  it('takes the nearest of those straight ahead before those aside', () => {
    const place = (id: string, nd: number, vd: number) => ({ ...materialOf('n-bk7')!, id, nd, vd });
    const from = { nd: 1.5, vd: 60 };
    const near = place('near', 1.55, 62);
    const far = place('far', 1.6, 60);
    const aside = place('aside', 1.501, 61);
    expect(neighbour([far, aside, near], from, 'higher index')?.id).toBe('near');
    expect(neighbour([aside], from, 'higher index')?.id).toBe('aside');
    expect(neighbour([far, near], from, 'lower index')).toBeNull();
    expect(neighbour([place('same', 1.5, 60)], from, 'higher index')).toBeNull();
  });

  it('reaches every material from every other', () => {
    for (const start of onMap) {
      const seen = new Set([start]);
      for (const here of seen)
        for (const direction of DIRECTIONS) {
          const next = neighbour(materials, here, direction);
          if (next) seen.add(next);
        }
      expect(seen.size).toBe(onMap.length);
    }
  });

  it('ends at the edge of the map, and begins nowhere off it', () => {
    const last = onMap.reduce((most, one) => ((one.nd ?? 0) > (most.nd ?? 0) ? one : most));
    expect(neighbour(materials, last, 'higher index')).toBeNull();
    for (const direction of DIRECTIONS)
      expect(neighbour(materials, { nd: null, vd: null }, direction)).toBeNull();
  });
});
