import { readdirSync, readFileSync } from 'node:fs';
import { isDeepStrictEqual } from 'node:util';
import { fc, test } from '@fast-check/vitest';
import { describe, expect } from 'vitest';
import { writeSketch } from '../../../../engine/sketch/file.ts';
import { parseSketch } from '../../../../engine/sketch/parse.ts';
import { propose, unsettled } from '../../../../engine/sketch/propose.ts';
import { faultsOf } from '../../../../engine/sketch/rules.ts';
import type { Sketch } from '../../../../engine/sketch/types.ts';
import { anySketch, frozen } from '../arbitrary.ts';
import { anyEdit, asEdit, EDITS } from './anyEdit.ts';

describe('every edit', () => {
  test('is among those tried here', () => {
    const folder = new URL('../../../../engine/sketch/edits/', import.meta.url);
    const helpers = ['change'];
    const sources = readdirSync(folder).filter((file) => !helpers.includes(file.replace('.ts', '')));
    const edits = sources.flatMap((file) => [
      ...readFileSync(new URL(file, folder), 'utf8').matchAll(/^export (?:const|function) (\w+)/gm),
    ]);
    const tried = asEdit.toString() + Object.values(EDITS).map(String).join();
    for (const [, name] of edits) expect(tried, `${name} is tried`).toMatch(new RegExp(`\\b${name}\\b`));
    expect(edits.length).toBeGreaterThan(50);
  });

  test.prop([anySketch(), fc.array(anyEdit(), { maxLength: 8 })], { numRuns: 150 })(
    'leaves a sound sketch or is refused, and touches nothing of the sketch it was given',
    (start, edits) => {
      let sketch: Sketch = frozen(start);
      for (const edit of edits) {
        const text = writeSketch(sketch);
        const proposal = propose(sketch, asEdit(edit), unsettled);
        expect(writeSketch(sketch)).toBe(text);
        expect(faultsOf(proposal.sketch)).toEqual([]);
        if (proposal.note !== null) {
          expect(proposal.sketch).toBe(sketch);
          expect(proposal.note.faults.length).toBeGreaterThan(0);
        }
        sketch = frozen(proposal.sketch);
      }
      expect(parseSketch(writeSketch(sketch))).toEqual({ ok: true, sketch });
    },
  );

  test.prop([anySketch(), anyEdit()], { numRuns: 300 })(
    'gives the same sketch when nothing changes, and never an equal one that is another',
    (sketch, edit) => {
      const edited = asEdit(edit)(sketch);
      if (edited !== sketch) expect(edited).not.toEqual(sketch);
    },
  );

  test.prop([anySketch({ leastParts: 2 }), anyEdit()])(
    'keeps the parts it does not touch as they are',
    (sketch, edit) => {
      const edited = asEdit(edit)(sketch);
      const before = new Map(sketch.parts.map((part) => [part.id, part]));
      for (const part of edited.parts) {
        const old = before.get(part.id);
        if (old !== undefined && isDeepStrictEqual(old, part)) expect(part).toBe(old);
      }
    },
  );
});
