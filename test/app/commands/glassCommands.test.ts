import { afterAll, beforeEach, describe, expect, test } from 'vitest';
import { glassCommands } from '../../../app/commands/glassCommands.ts';
import { dismissNotice, noticeStore } from '../../../app/desk/notices.ts';
import { openSketch, sketchStore } from '../../../app/store/sketchStore.ts';
import { select, setView, viewStore } from '../../../app/store/viewStore.ts';
import type { PartId } from '../../../engine/index.ts';
import { newGlass } from '../../../engine/index.ts';
import { cementedPair, glassIn, surface, withGlass } from '../drawing/glassSketch.ts';

const startView = viewStore.getState();
const P1 = 'p1' as PartId;
const P2 = 'p2' as PartId;
const commands = new Map(glassCommands().commands.map((command) => [command.id, command]));
const isOffered = (id: string) => commands.get(id)?.available() ?? false;
const run = (id: string) => commands.get(id)?.run();
const sketch = () => sketchStore.getState().sketch;
const singlet = () => newGlass(80, 5, P2);

beforeEach(() => {
  openSketch(withGlass(singlet()));
  dismissNotice();
});
afterAll(() => setView(startView));

describe('the commands about glass', () => {
  test('are offered for what they can act on', () => {
    select(P1);
    expect(['thicken', 'makeThin', 'bendZeroComa'].map(isOffered)).toEqual([true, false, true]);
    select(P2);
    expect(['thicken', 'makeThin', 'bendZeroComa'].map(isOffered)).toEqual([false, true, true]);
    select(P1, P2);
    expect([...commands.keys()].map(isOffered)).toEqual([false, false, false, false]);
    openSketch(withGlass(cementedPair()));
    select(P2);
    expect(isOffered('bendLeastSpherical')).toBe(false);
  });

  test('thicken opens the form of the selected part', () => {
    select(P1);
    run('thicken');
    expect(viewStore.getState().thickening).toBe(P1);
  });

  test('make thin is one step of history and says what it did', () => {
    select(P2);
    run('makeThin');
    expect(sketch().parts[1]).toMatchObject({ kind: 'thin', shapeFactor: 0 });
    expect(noticeStore.getState().notice?.text).toMatch(/thin part stands for both principal planes/);
    expect(sketchStore.getState().past).toHaveLength(1);
  });

  test('bending to a best form changes the radii of glass, and what a thin part means to be', () => {
    select(P2);
    run('bendLeastSpherical');
    expect(glassIn(sketch()).surfaces[0]?.radiusMm).not.toBe(80);
    select(P1);
    run('bendZeroComa');
    const thin = sketch().parts[0];
    expect(thin?.kind === 'thin' && thin.shapeFactor !== null).toBe(true);
  });

  test('say why they cannot: a window has no power', () => {
    openSketch(withGlass({ ...singlet(), surfaces: [surface(null), surface(null)] }));
    select(P2);
    run('makeThin');
    expect(noticeStore.getState().notice).toMatchObject({ urgent: true });
    expect(sketch().parts[1]?.kind).toBe('glass');
  });
});
