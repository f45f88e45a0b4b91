import { describe, expect, test } from 'vitest';
import { faultSentences, faultsLine } from '../../../app/desk/faultsText.ts';
import { fileNameFrom, freeName, nameFrom } from '../../../app/desk/names.ts';

const faults = (count: number) =>
  Array.from({ length: count }, (_, index) => ({
    path: `parts[${index}]`,
    sentence: `Sentence ${index + 1}.`,
  }));

describe('names', () => {
  test('a name is one line, not too long, never empty', () => {
    expect(nameFrom('  Seed \n line\tcamera ')).toBe('Seed line camera');
    expect(nameFrom('   ')).toBe('Untitled');
    expect(nameFrom('x'.repeat(500))).toHaveLength(80);
  });

  test('a taken name is counted up', () => {
    expect(freeName('relay', [])).toBe('relay');
    expect(freeName('relay', ['relay', 'relay 2'])).toBe('relay 3');
  });

  test('a file name keeps letters of any script and nothing a disk would choke on', () => {
    expect(fileNameFrom('../../Größe: f/4 <β>', 'json')).toBe('größe-f-4-β.json');
    expect(fileNameFrom('???', 'csv')).toBe('sketch.csv');
  });
});

describe('faults in words', () => {
  test('a few are all said, many are counted', () => {
    expect(faultSentences(faults(3))).toEqual(['Sentence 1.', 'Sentence 2.', 'Sentence 3.']);
    expect(faultSentences(faults(7)).at(-1)).toBe('And one more fault.');
    expect(faultSentences(faults(40)).at(-1)).toBe('And 34 more faults.');
    expect(faultSentences(faults(40))).toHaveLength(7);
  });

  test('in one line the first is said and the rest counted', () => {
    expect(faultsLine(faults(1))).toBe('Sentence 1.');
    expect(faultsLine(faults(3))).toBe('Sentence 1. (and 2 more)');
  });
});
