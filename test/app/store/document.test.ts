import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Document } from '../../../app/store/document.ts';
import * as document from '../../../app/store/document.ts';
import type { Edit, PartId, PositionId, Sketch } from '../../../engine/index.ts';
import {
  emptySketch,
  newThin,
  propose,
  setFocalLength,
  setGap,
  setTitle,
  unsettled,
} from '../../../engine/index.ts';

const ONLY = 'only' as PositionId;
const [FIRST, SECOND] = ['p1', 'p2'] as PartId[] as [PartId, PartId];

const start: Sketch = { ...emptySketch('start'), parts: [newThin(50, FIRST), newThin(-20, SECOND)] };

/** Adds to what is there, so that a preview made on a preview would be noticed. */
const append =
  (text: string): Edit =>
  (sketch) =>
    setTitle(sketch, sketch.title + text);
const gap =
  (lengthMm: number): Edit =>
  (sketch) =>
    setGap(sketch, FIRST, lengthMm, ONLY);
const refused: Edit = (sketch) => setFocalLength(sketch, SECOND, 0);
const nothing: Edit = (sketch) => sketch;

const anyEdit = (): fc.Arbitrary<Edit> =>
  fc.oneof(
    fc.constantFrom('a', 'b', 'c').map(append),
    fc.integer({ min: 0, max: 9 }).map(gap),
    fc.constant(refused),
    fc.constant(nothing),
  );

/** The same history as a plain list of sketches with a place in it, and what a gesture shows. */
interface Model {
  states: Sketch[];
  at: number;
  gesture: { shown: Sketch; edit: Edit } | null;
}

interface Step {
  readonly name: string;
  readonly real: (doc: Document) => Document;
  readonly plain: (model: Model) => void;
}

const here = (model: Model): Sketch => model.states[model.at] ?? start;

function push(model: Model, edit: Edit): void {
  const next = edit === refused ? here(model) : edit(here(model));
  if (next === here(model)) return;
  model.states = [...model.states.slice(0, model.at + 1), next];
  model.at += 1;
}

function stepTo(model: Model, at: number): void {
  if (model.gesture) model.gesture = null;
  else model.at = Math.min(Math.max(0, at), model.states.length - 1);
}

const anyStep = (): fc.Arbitrary<Step> =>
  fc.oneof(
    anyEdit().map((edit) => ({
      name: 'preview',
      real: (doc: Document) => document.preview(doc, edit),
      plain: (model: Model) => {
        model.gesture ??= { shown: here(model), edit: nothing };
        if (edit !== refused) model.gesture = { shown: edit(here(model)), edit };
      },
    })),
    anyEdit().map((edit) => ({
      name: 'apply',
      real: (doc: Document) => document.apply(doc, edit),
      plain: (model: Model) => {
        model.gesture = null;
        push(model, edit);
      },
    })),
    fc.constantFrom<Step>(
      {
        name: 'commit',
        real: document.commit,
        plain: (model) => {
          if (model.gesture) push(model, model.gesture.edit);
          model.gesture = null;
        },
      },
      {
        name: 'cancel',
        real: document.cancel,
        plain: (model) => {
          model.gesture = null;
        },
      },
      { name: 'undo', real: document.undo, plain: (model) => stepTo(model, model.at - 1) },
      { name: 'redo', real: document.redo, plain: (model) => stepTo(model, model.at + 1) },
    ),
  );

describe('the document with its history', () => {
  test('a refused edit leaves the sketch as it is and says why', () => {
    const doc = document.apply(document.documentOf(start), refused);
    expect(doc.sketch).toBe(start);
    expect(doc.past).toEqual([]);
    expect(doc.note?.faults[0]?.sentence).toContain('focal length');
  });

  test('an edit that changes nothing is no step of history', () => {
    const doc = document.apply(document.documentOf(start), nothing);
    expect(doc.sketch).toBe(start);
    expect(doc.past).toEqual([]);
  });

  test('a whole drag is one step of history', () => {
    const dragged = [1, 2, 3, 4].reduce(
      (doc, mm) => document.preview(doc, gap(mm)),
      document.documentOf(start),
    );
    const released = document.commit(dragged);
    expect(released.past).toEqual([start]);
    expect(document.undo(released).sketch).toBe(start);
  });

  test('a drag that comes back to where it began is no step of history', () => {
    const there = document.preview(document.documentOf(start), gap(7));
    const back = document.commit(document.preview(there, gap(0)));
    expect(back.sketch).toBe(start);
    expect(back.past).toEqual([]);
  });

  test('undo during a gesture cancels the gesture and nothing else', () => {
    const first = document.apply(document.documentOf(start), gap(5));
    const dragging = document.preview(first, gap(9));
    const undone = document.undo(dragging);
    expect(undone.sketch).toBe(first.sketch);
    expect(undone.past).toEqual([start]);
    expect(undone.running).toBeNull();
    expect(document.redo(dragging).sketch).toBe(first.sketch);
  });

  test('an edit from elsewhere during a gesture cancels the gesture first', () => {
    const dragging = document.preview(document.documentOf(start), gap(9));
    const doc = document.apply(dragging, append('!'));
    expect(doc.sketch).toEqual(setTitle(start, 'start!'));
    expect(doc.past).toEqual([start]);
  });

  test('undo and redo at the ends of history change nothing, so that nobody is woken', () => {
    const doc = document.documentOf(start);
    expect(document.undo(doc)).toBe(doc);
    expect(document.redo(doc)).toBe(doc);
    expect(document.commit(doc)).toBe(doc);
    expect(document.cancel(doc)).toBe(doc);
  });

  test('release equals replay of the last accepted edit on the sketch at press', () => {
    fc.assert(
      fc.property(fc.array(anyEdit(), { minLength: 1, maxLength: 12 }), (edits) => {
        const released = document.commit(edits.reduce(document.preview, document.documentOf(start)));
        const accepted = edits.findLast((edit) => edit !== refused) ?? nothing;
        expect(released.sketch).toEqual(propose(start, accepted, unsettled).sketch);
      }),
    );
  });

  test('undoing every step gives back the very sketch at the beginning', () => {
    fc.assert(
      fc.property(fc.array(anyEdit(), { maxLength: 12 }), (edits) => {
        const edited = edits.reduce(document.apply, document.documentOf(start));
        const undone = edited.past.reduce(document.undo, edited);
        expect(undone.sketch).toBe(start);
        expect(undone.future.length).toBe(edited.past.length);
      }),
    );
  });

  test('any list of previews, releases, cancels, edits, undos and redos agrees with a plain list of sketches', () => {
    fc.assert(
      fc.property(fc.array(anyStep(), { maxLength: 40 }), (steps) => {
        const model: Model = { states: [start], at: 0, gesture: null };
        let doc = document.documentOf(start);
        for (const step of steps) {
          doc = step.real(doc);
          step.plain(model);
          expect(doc.sketch).toEqual(model.gesture?.shown ?? here(model));
          expect(doc.running !== null).toBe(model.gesture !== null);
          expect(doc.past).toEqual(model.states.slice(0, model.at));
          expect(doc.future).toEqual(model.states.slice(model.at + 1));
        }
      }),
      { numRuns: 300 },
    );
  });
});
