import { fc, test } from '@fast-check/vitest';
import { describe, expect } from 'vitest';
import { emptySketch } from '../../../engine/sketch/create.ts';
import { writeSketch } from '../../../engine/sketch/file.ts';
import { LONGEST_FILE, type Parsed, parseSketch } from '../../../engine/sketch/parse.ts';
import { faultsOf } from '../../../engine/sketch/rules.ts';
import { inspectionZoom } from '../demo.ts';
import { anySketch } from './arbitrary.ts';

type Json = Record<string, unknown>;

/** The text of the demo's file with some entries of it changed. */
function demoText(change: (file: Json & { parts: Json[] }) => void): string {
  const file = JSON.parse(writeSketch(inspectionZoom()));
  change(file);
  return JSON.stringify(file);
}

const faultsIn = (parsed: Parsed) => (parsed.ok ? [] : parsed.faults);
const sentencesIn = (text: string) => faultsIn(parseSketch(text)).map((fault) => fault.sentence);

describe('a file that is sound', () => {
  test('is JSON with format and version first', () => {
    const text = writeSketch(inspectionZoom());
    expect(
      text.startsWith('{\n  "format": "gapwright-sketch",\n  "version": 2,\n  "title": "Inspection zoom"'),
    ).toBe(true);
    expect(text.endsWith('}\n')).toBe(true);
  });

  test('gives back the empty sketch and the demo', () => {
    expect(parseSketch(writeSketch(emptySketch()))).toEqual({ ok: true, sketch: emptySketch() });
    expect(parseSketch(writeSketch(inspectionZoom()))).toEqual({ ok: true, sketch: inspectionZoom() });
  });

  test('may begin with a byte-order mark', () => {
    expect(parseSketch(`\uFEFF${writeSketch(emptySketch())}`).ok).toBe(true);
  });

  test.prop([anySketch()])(
    'gives back every sketch as it was, and writes it again to the letter',
    (sketch) => {
      const parsed = parseSketch(writeSketch(sketch));
      expect(parsed).toEqual({ ok: true, sketch });
      if (parsed.ok) expect(JSON.parse(writeSketch(parsed.sketch))).toEqual(JSON.parse(writeSketch(sketch)));
    },
  );
});

describe('a text that is no sketch', () => {
  test.each([
    ['', 'The file is empty; a sketch file is JSON text as Gapwright writes it.'],
    ['focal length 50', 'The text is not JSON; a sketch file is JSON text as Gapwright writes it.'],
    [
      '[1, 2]',
      'The file is not a Gapwright sketch: it is a list; it must be an object with the format “gapwright-sketch”.',
    ],
    [
      'null',
      'The file is not a Gapwright sketch: it is empty (null); it must be an object with the format “gapwright-sketch”.',
    ],
    [
      '{"format": "other"}',
      'The file is not a Gapwright sketch: its “format” is “other”; it must be an object with the format “gapwright-sketch”.',
    ],
    [
      '{"version": 1}',
      'The file is not a Gapwright sketch: its “format” is missing; it must be an object with the format “gapwright-sketch”.',
    ],
    [
      '{"format": "gapwright-sketch", "version": 7}',
      'The file is of version 7; this Gapwright reads version 2.',
    ],
    [
      '{"format": "gapwright-sketch", "version": "one"}',
      'The version of the file is “one”; it must be a whole number from 1 to 2.',
    ],
    [
      '{"format": "gapwright-sketch"}',
      'The version of the file is missing; it must be a whole number from 1 to 2.',
    ],
  ])('has one fault: %s', (text, sentence) => {
    expect(sentencesIn(text)).toEqual([sentence]);
  });

  test('is refused unread when it is too long', () => {
    expect(sentencesIn('x'.repeat(10 * 1024 * 1024))).toEqual([
      'The file has 10,485,760 characters; a sketch file has at most 2,000,000.',
    ]);
    expect(sentencesIn(`${writeSketch(emptySketch())}${' '.repeat(LONGEST_FILE)}`)).toHaveLength(1);
  });

  test('is refused however deep or wide it is', () => {
    const head = '{"format":"gapwright-sketch","version":1,';
    expect(sentencesIn('['.repeat(2e5))).toHaveLength(1);
    expect(sentencesIn(`${head}"title":${'['.repeat(1e5)}${']'.repeat(1e5)}}`).length).toBeLessThanOrEqual(
      50,
    );
    expect(sentencesIn(`${head}"parts":[${'{},'.repeat(1e5)}{}]}`)).toEqual([
      'The list “parts” has 100,001 entries; it must have at most 200.',
    ]);
    const keys = Array.from({ length: 2e4 }, (_, index) => `"k${index}":1`).join(',');
    expect(sentencesIn(`${head}${keys}}`)).toEqual([
      'The sketch has 20,000 entries; it must have at most 100.',
    ]);
  });

  test.prop([fc.oneof(fc.string(), fc.json())])('never throws', (text) => {
    expect(parseSketch(text).ok).toBe(false);
  });

  test.prop([fc.dictionary(fc.constantFrom(...Object.keys(emptySketch())), fc.jsonValue())])(
    'never throws, even when it calls itself one',
    (entries) => {
      const text = JSON.stringify({ format: 'gapwright-sketch', version: 1, ...entries });
      expect(faultsIn(parseSketch(text)).length).toBeGreaterThan(0);
    },
  );
});

describe('a damaged file', () => {
  test('has a fault for each entry that is missing, unknown or of another kind', () => {
    const text = demoText((file) => {
      file.extra = 1;
      file.image = 'sensor';
      delete file.notes;
      Object.assign(file.parts[0] ?? {}, { focalLengthMm: 'strong', colour: 'red' });
      Object.assign(file.parts[1] ?? {}, {
        abbeNumber: '60',
        space: { lengthMm: { wide: null }, medium: 'water' },
      });
      file.parts[2] = { kind: 'mirror' };
      file.lines = null;
    });
    expect(faultsIn(parseSketch(text))).toEqual([
      { path: 'notes', sentence: 'The text of the notes is missing; it must be text, which may be empty.' },
      { path: 'image', sentence: 'The image plane is “sensor”; it must be “focus” or “fixed”.' },
      { path: 'lines', sentence: 'The set of wavelengths is empty (null); it must be an object.' },
      {
        path: 'parts[0].focalLengthMm',
        sentence:
          'The focal length of “first group” is “strong”; it must be a number other than zero, between 0.001 and 1,000,000 mm in size.',
      },
      {
        path: 'parts[0].colour',
        sentence:
          'The entry “colour” of “first group” is unknown; it must be left out, or its name corrected.',
      },
      {
        path: 'parts[1].space.lengthMm.wide',
        sentence:
          'The gap behind “second group” at position “wide” is empty (null); it must be a number between −1,000,000 and 1,000,000 mm.',
      },
      {
        path: 'parts[1].space.medium',
        sentence:
          'The medium of “second group” is “water”; it must be “air”, or an object with material, with code, with name, formula and rangeNm, or with name, index and abbeNumber.',
      },
      {
        path: 'parts[1].abbeNumber',
        sentence:
          'The Abbe number of “second group” is “60”; it must be a number above 0 and at most 1,000, or null.',
      },
      {
        path: 'parts[2].kind',
        sentence: 'The kind of part 3 is “mirror”; it must be “thin”, “stop”, “plate” or “glass”.',
      },
      {
        path: 'extra',
        sentence: 'The entry “extra” is unknown; it must be left out, or its name corrected.',
      },
    ]);
  });

  test('has its broken rules told beside its broken shape', () => {
    const text = demoText((file) => {
      Object.assign(file.parts[0] ?? {}, { note: 5 });
      Object.assign(file.parts[1] ?? {}, { focalLengthMm: 0 });
      file.aperture = { kind: 'stopDiameter', diameterMm: 0 };
    });
    expect(faultsIn(parseSketch(text)).map((fault) => fault.path)).toEqual([
      'parts[0].note',
      'parts[1].focalLengthMm',
      'aperture.diameterMm',
    ]);
  });

  test('has a gap of 1e300 or of 1e999 told by its value', () => {
    const text = writeSketch(inspectionZoom()).replace('"lengthMm": 26', '"lengthMm": 1e999');
    expect(sentencesIn(text)).toEqual([
      'The distance from “fourth group” to the sensor is infinite; it must be between −1,000,000 and 1,000,000 mm.',
    ]);
  });

  test('has values for positions it does not know, or misses, told', () => {
    const text = demoText((file) => {
      Object.assign(file.parts[0] ?? {}, {
        space: { lengthMm: { wide: 1, middle: 2, tele: 3 }, medium: 'air' },
      });
    });
    expect(faultsIn(parseSketch(text)).map((fault) => fault.path)).toEqual([
      'parts[0].space.lengthMm.narrow',
      'parts[0].space.lengthMm.tele',
    ]);
  });

  test('has at most fifty faults told and the rest counted', () => {
    const text = demoText((file) => {
      file.parts = Array.from({ length: 120 }, () => ({ kind: 'mirror' }));
    });
    const sentences = sentencesIn(text);
    expect(sentences).toHaveLength(50);
    expect(sentences.at(-1)).toBe('There are 72 more faults.');
  });

  test('cannot reach what every object has of itself', () => {
    const text = writeSketch(inspectionZoom()).replace(
      '"title"',
      '"__proto__": { "polluted": true }, "constructor": { "prototype": 1 }, "title"',
    );
    expect(faultsIn(parseSketch(text)).map((fault) => fault.path)).toEqual(['__proto__', 'constructor']);
    const gap = writeSketch(inspectionZoom()).replace('"lengthMm": {', '"lengthMm": { "__proto__": 1,');
    expect(faultsIn(parseSketch(gap)).map((fault) => fault.path)).toEqual([
      'parts[0].space.lengthMm.__proto__',
    ]);
    expect(({} as Json).polluted).toBeUndefined();
  });

  test.prop([
    anySketch({ leastParts: 1 }),
    fc.nat(),
    fc.constantFrom<unknown>(null, 'far', true, -1, 0, 1e300, [], {}, { wide: 1 }, [[]]),
  ])('gives a sound sketch or faults, whatever stands in one of its places', (sketch, which, odd) => {
    const file = JSON.parse(writeSketch(sketch));
    const places: [Json, string][] = [];
    const visit = (value: unknown): void => {
      if (typeof value !== 'object' || value === null) return;
      for (const key of Object.keys(value)) {
        places.push([value as Json, key]);
        visit((value as Json)[key]);
      }
    };
    visit(file);
    const [record, key] = places[which % places.length] ?? [file, 'title'];
    record[key] = odd;
    const parsed = parseSketch(JSON.stringify(file));
    if (parsed.ok) expect(faultsOf(parsed.sketch)).toEqual([]);
    else
      for (const fault of parsed.faults)
        expect(fault.sentence).toMatch(/^(The|Entry|There) .*[^ ]; .*\.$|reads version 2\.$/);
  });
});
