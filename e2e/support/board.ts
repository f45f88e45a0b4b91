import type { Page } from '@playwright/test';
import type { Mark } from '../../app/board/recorderPen.ts';
import type { Point } from './hand.ts';

type Lines = Extract<Mark, { kind: 'lines' }>;

/** What is drawn now, as plain data. */
export const recorded = (page: Page): Promise<readonly Mark[]> =>
  page.evaluate(() => {
    const board = document.querySelector('.board') as (Element & { record(): readonly Mark[] }) | null;
    return board?.record() ?? [];
  });

/** All lines of a style, at any depth. */
export function linesIn(marks: readonly Mark[], style: Lines['style']): readonly (readonly number[])[] {
  return marks.flatMap((mark) => {
    if (mark.kind === 'group' || mark.kind === 'clipped') return linesIn(mark.marks, style);
    return mark.kind === 'lines' && mark.style === style ? mark.lines : [];
  });
}

/** Every text that is drawn, at any depth. */
export function textsIn(marks: readonly Mark[]): readonly string[] {
  return marks.flatMap((mark) => {
    if (mark.kind === 'group' || mark.kind === 'clipped') return textsIn(mark.marks);
    return mark.kind === 'text' ? [mark.text] : [];
  });
}

/** The last point of a line, in px of the board. */
export const endOf = (line: readonly number[]): Point => ({ x: line.at(-2) ?? NaN, y: line.at(-1) ?? NaN });
