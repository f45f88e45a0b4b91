import { describe, expect, it } from 'vitest';
import { catchesFor } from '../../../app/drawing/catches.ts';
import type { PartId } from '../../../engine/index.ts';
import { inspectionZoom } from '../../engine/demo.ts';
import { AT_MIDDLE, demoPicture, edited, frontsOf, grip, moveOf, sightFor } from './seen.ts';

const demo = inspectionZoom();
const sight = sightFor(demo, { setting: AT_MIDDLE });
const [, SECOND, THIRD, FOURTH] = frontsOf(demo) as [number, number, number, number];
const catches = (...moving: readonly string[]) => catchesFor(sight, moving as readonly PartId[]);
const names = (...moving: readonly string[]) => catches(...moving).map(({ name }) => name);

describe('what catches a drag', () => {
  it('are the focal points of the parts that stay, by name', () => {
    expect(names('p3').filter((name) => name.includes('focus'))).toEqual([
      'front focus of first group',
      'rear focus of first group',
      'front focus of second group',
      'rear focus of second group',
      'front focus of fourth group',
      'rear focus of fourth group',
    ]);
    const rear = catches('p3').find(({ name }) => name === 'rear focus of second group');
    expect(rear?.at).toBeCloseTo(SECOND + 28, 9);
    const negative = catches('p3').find(({ name }) => name === 'rear focus of first group');
    expect(negative?.at).toBe(-32);
  });

  it('are the images that parts in front of it form, where the first are not the moving ones’ own', () => {
    expect(names('p3').filter((name) => name.startsWith('image'))).toEqual([
      'image of first group',
      'image of second group',
    ]);
    expect(catches('p3').find(({ name }) => name === 'image of second group')?.at).toBeCloseTo(
      THIRD + 30.3422,
      4,
    );
    expect(names('p1').filter((name) => name.startsWith('image'))).toEqual([]);
  });

  it('is the sensor where it is fixed', () => {
    expect(catches('p4').find(({ name }) => name === 'sensor')?.at).toBeCloseTo(110, 9);
    expect(
      catchesFor(sightFor({ ...demo, image: 'focus' }, { setting: AT_MIDDLE }), []).map(({ name }) => name),
    ).not.toContain('sensor');
  });
});

describe('a drag that is caught', () => {
  const picture = demoPicture({ selection: ['p2' as PartId] });
  const near = { snap: true, toleranceMm: 0.5 };

  it('lands exactly on what caught it, and names it', () => {
    const wantedMm = SECOND + 28;
    const move = moveOf(grip(picture, 'part:p3'), { ...near, dzMm: wantedMm - THIRD + 0.3 });
    expect(move.caught?.name).toBe('rear focus of second group');
    expect(frontsOf(edited(demo, move.edit))[2]).toBeCloseTo(wantedMm, 9);
  });

  it('goes free with snapping off, and beyond the reach', () => {
    const dzMm = SECOND + 28 - THIRD;
    for (const how of [
      { dzMm: dzMm + 0.3, snap: false, toleranceMm: 0.5 },
      { dzMm: dzMm + 0.6, snap: true, toleranceMm: 0.5 },
    ]) {
      const move = moveOf(grip(picture, 'part:p3'), how);
      expect(move.caught).toBeNull();
      expect(frontsOf(edited(demo, move.edit))[2]).toBeCloseTo(THIRD + how.dzMm, 9);
    }
  });

  it('of a focal point lands the focal point there', () => {
    const move = moveOf(grip(picture, 'focal:p2:rear'), { ...near, dzMm: FOURTH + 48 - SECOND - 28 - 0.2 });
    expect(move.caught?.name).toBe('rear focus of fourth group');
    expect(edited(demo, move.edit).parts[1]).toMatchObject({
      focalLengthMm: expect.closeTo(FOURTH + 48 - SECOND, 9),
    });
  });

  it('of the first part tells how far the frame went', () => {
    const move = moveOf(grip(picture, 'part:p1'), { ...near, dzMm: SECOND - 28 + 0.2 });
    expect(move.caught?.name).toBe('front focus of second group');
    expect(move.frameMm).toBeCloseTo(SECOND - 28, 9);
  });

  it('with Shift is not caught by what moves along', () => {
    const carried = { ...near, other: true };
    const toFourth = FOURTH - 48 - SECOND + 0.1;
    expect(moveOf(grip(picture, 'part:p2'), { ...near, dzMm: toFourth }).caught?.name).toBe(
      'front focus of fourth group',
    );
    expect(moveOf(grip(picture, 'part:p2'), { ...carried, dzMm: toFourth }).caught).toBeNull();
    expect(moveOf(grip(picture, 'part:p4'), { ...near, dzMm: 26.1 }).caught?.name).toBe('sensor');
    expect(moveOf(grip(picture, 'part:p4'), { ...carried, dzMm: 26.1 }).caught).toBeNull();
  });
});
