import { describe, expect, it } from 'vitest';
import { ledgerCells } from '../../../app/panels/Ledger.tsx';
import { ledgerWords } from '../../../app/panels/ledgerWords.ts';
import type { Sketch } from '../../../engine/index.ts';
import { analyse, settingAt } from '../../../engine/index.ts';
import { inspectionZoom, WIDE } from '../../engine/demo.ts';
import { afocal } from './sketches.ts';

const ledgerOf = (sketch: Sketch, at = sketch.positions[0]?.id ?? WIDE) =>
  analyse(sketch, settingAt(at)).ledger;

describe('the ledger', () => {
  const [first, , third] = ledgerOf(inspectionZoom(), WIDE);

  it('says in words where a virtual image and a virtual object stand', () => {
    // Source: brief of the inspection camera: 30.0752 mm in front of the first group, 29.5964 mm behind the third.
    expect(first && ledgerWords(first, 'mm')).toMatch(
      /^object 500\.000 mm in front of it, real → image 30\.075 mm in front of it, virtual; m 0\.0602$/,
    );
    expect(third && ledgerWords(third, 'mm')).toMatch(/^object 29\.596 mm behind it, virtual → image /);
  });

  it('says "at infinity" and no magnification for an object at infinity', () => {
    const [row] = ledgerOf(afocal());
    expect(row && ledgerWords(row, 'mm')).toBe('object at infinity → image 50.000 mm behind it, real');
  });

  it('turns signs over in the form that is positive when real', () => {
    expect(first && ledgerCells(first, 'mm', false).slice(0, 4)).toEqual([
      '−500.000',
      'real',
      '−30.075',
      'virtual',
    ]);
    expect(first && ledgerCells(first, 'mm', true).slice(0, 4)).toEqual([
      '500.000',
      'real',
      '−30.075',
      'virtual',
    ]);
    expect(third && ledgerCells(third, 'mm', true)[0]).toBe('−29.596');
  });

  it('shows lengths in inches when they are asked for', () => {
    expect(first && ledgerCells(first, 'in', false)[0]).toBe('−19.68504');
  });
});
