import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Handle } from '../../../../app/drawing/handle.ts';
import type { Size } from '../../../../app/layout/camera.ts';
import type { Picture } from '../../../../app/layout/picture.ts';
import type { View } from '../../../../app/store/viewStore.ts';
import type { PartId, Setting, Sketch } from '../../../../engine/index.ts';
import { anySetting, anySketch } from '../../../engine/sketch/arbitrary.ts';
import { DESKTOP, expectAlike, kept, moveOf, PHONE, pictureFor } from '../seen.ts';

/** Decimals that a drag's words are asked for here; the app shows 3. */
const DIGITS = 9;
/**
 * A value read off with nine decimals is wrong by 5e-10 mm; where it scales an aperture or a field, by that over the least
 * height of 0.01 mm.
 */
const READ_OFF = 1e-7;
/** Two ways to one number that differ by the order of a few sums. */
const ROUNDING = 1e-12;

/** What is needed for a picture, kept small so that a counterexample can be read. */
interface Screen {
  readonly sketch: Sketch;
  readonly setting: Setting;
  readonly id: PartId;
  readonly size: Size;
  readonly what: 'parts' | 'everything';
}

/** Any sketch anywhere on the scrubber, fitted either way. */
const anyScreen = (): fc.Arbitrary<Screen> =>
  anySketch({ leastParts: 1 }).chain((sketch) =>
    fc.record({
      sketch: fc.constant(sketch),
      setting: anySetting(sketch.positions),
      id: fc.constantFrom(...sketch.parts.map(({ id }) => id)),
      size: fc.constantFrom(DESKTOP, PHONE),
      what: fc.constantFrom('parts' as const, 'everything' as const),
    }),
  );

/** Its picture with one part and both ends selected. */
const pictureOn = ({ sketch, setting, id, size, what }: Screen, change: Partial<View> = {}): Picture =>
  pictureFor(sketch, { setting, selection: [id, 'object', 'image'], digits: DIGITS, ...change }, size, what);

const anyPullMm = () => fc.double({ min: -30, max: 30, noNaN: true });

/** Ten million mm and more are said to four digits only. */
const isSaidWhole = (says: string): boolean => !says.includes('×10');

/** The number in the words of a drag. */
function readOff(says: string): number {
  const [, number = ''] = /([+\u2212]?[\d.]+)/.exec(says) ?? [];
  return Number(number.replace('\u2212', '-'));
}

const draggable = ({ handles }: Picture): readonly Handle[] => handles.filter(({ drag }) => drag !== null);

describe('every grip of any sketch', () => {
  it.each([false, true])(
    'dragged and let go comes to the same as typing the value it said (behind moves: %s)',
    (otherRule) => {
      fc.assert(
        fc.property(anyScreen(), anyPullMm(), (screen, mm) => {
          const picture = pictureOn(screen, { otherRule });
          const drag = { dzMm: mm, dyMm: mm, dxPx: mm, other: otherRule };
          for (const handle of draggable(picture)) {
            if (!handle.entry) continue;
            const move = moveOf(handle, drag);
            if (!isSaidWhole(move.says)) continue;
            const dragged = kept(screen.sketch, move.edit);
            const typed = kept(screen.sketch, handle.entry.set(readOff(move.says)));
            expectAlike(dragged, typed, READ_OFF);
          }
        }),
      );
    },
  );

  it('is moved by a key as far as by the hand', () => {
    fc.assert(
      fc.property(
        anyScreen(),
        fc.constantFrom(-0.1, -0.01, 0.001, 0.1),
        fc.boolean(),
        (screen, mm, other) => {
          const picture = pictureOn(screen);
          for (const handle of draggable(picture)) {
            const folded = picture.view.fold !== null && handle.id.startsWith('object:');
            if (!handle.step || folded || handle.id === 'cell:object') continue;
            const stepped = kept(screen.sketch, handle.step(mm, other));
            const dragged = kept(screen.sketch, moveOf(handle, { dzMm: mm, dyMm: mm, other }).edit);
            expectAlike(dragged, stepped, ROUNDING);
          }
        },
      ),
    );
  });

  it('that is not moved changes nothing', () => {
    fc.assert(
      fc.property(anyScreen(), (screen) => {
        const picture = pictureOn(screen);
        for (const handle of draggable(picture)) {
          // A grip that shows where something follows to fixes it; one that is open gets its rim.
          if (/^(image|cell:gap|rim:)/.test(handle.id)) continue;
          expectAlike(screen.sketch, kept(screen.sketch, moveOf(handle, {}).edit), ROUNDING);
        }
      }),
    );
  });

  it('never makes a focal length change its sign, nor says a number that is none', () => {
    fc.assert(
      fc.property(anyScreen(), fc.double({ min: -1e4, max: 1e4, noNaN: true }), (screen, mm) => {
        const { sketch } = screen;
        for (const handle of draggable(pictureOn(screen))) {
          const move = moveOf(handle, { dzMm: mm, dyMm: mm, dxPx: mm, snap: true, toleranceMm: 5 });
          const signs = (of: Sketch) =>
            of.parts.map((part) => (part.kind === 'thin' ? Math.sign(part.focalLengthMm) : 0));
          expect(signs(move.edit(sketch))).toEqual(signs(sketch));
          expect(Number.isFinite(move.frameMm)).toBe(true);
          expect(move.says).not.toMatch(/NaN|–/);
        }
      }),
    );
  });

  it('that cannot be dragged says why', () => {
    fc.assert(
      fc.property(anyScreen(), (screen) => {
        const { handles } = pictureOn(screen);
        const silent = handles.filter(({ drag, why }) => drag === null && why === null);
        expect(silent.map(({ id }) => id)).toEqual([]);
      }),
    );
  });

  it('has an id of its own and a name', () => {
    fc.assert(
      fc.property(anyScreen(), (screen) => {
        const { handles } = pictureOn(screen);
        expect(new Set(handles.map(({ id }) => id)).size).toBe(handles.length);
        expect(handles.filter(({ label }) => label === '')).toEqual([]);
      }),
    );
  });
});
