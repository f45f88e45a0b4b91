import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { checkDocs } from './docs-links.mjs';

let folder = '';
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'docs-links-'));
  writeFileSync(join(folder, 'package.json'), JSON.stringify({ scripts: { start: 'x', 'test:unit': 'x' } }));
  writeFileSync(join(folder, 'OTHER.md'), '# One job, `step` by step\n## Again\n## Again\n');
});
afterEach(() => rmSync(folder, { recursive: true }));

function check(text: string) {
  writeFileSync(join(folder, 'README.md'), text);
  return checkDocs(folder, ['README.md']);
}

describe('the check of the documents', () => {
  test.each([
    'Read [the other page](OTHER.md) or [its part](OTHER.md#one-job-step-by-step).',
    'The second [Again](OTHER.md#again-1).',
    '# Signs and units\nSee [above](#signs-and-units).',
    'The net is not followed: [a page](https://example.org/gone).',
    'By [name][other].\n\n[other]: OTHER.md "title"',
    'Code is no link: `[x](gone.md)`.\n```\n[y](gone.md)\n```\n',
    'Run `npm run test:unit` after `npm ci && npm start`.',
  ])('passes what leads somewhere: %j', (text) => {
    expect(check(text).faults).toEqual([]);
  });

  test.each([
    { text: '[Gone](gone.md)', fault: 'README.md: gone.md: no such file' },
    { text: '![Picture](pictures/gone.png)', fault: 'README.md: pictures/gone.png: no such file' },
    { text: '<img src="gone.png" alt="">', fault: 'README.md: gone.png: no such file' },
    { text: '[Gone](OTHER.md#gone)', fault: 'README.md: OTHER.md#gone: no such heading' },
    { text: '[Gone](#gone)', fault: 'README.md: #gone: no such heading' },
    { text: '[Gone][other]\n\n[other]: gone.md', fault: 'README.md: gone.md: no such file' },
    { text: '```\nnpm run gone\n```', fault: 'README.md: package.json has no script "gone"' },
    { text: '`npm test`', fault: 'README.md: package.json has no script "test"' },
  ])('names what leads nowhere: $text', ({ text, fault }) => {
    expect(check(text).faults).toEqual([fault]);
  });

  test('counts what it looked at', () => {
    expect(check('[a](OTHER.md) `npm start` [b](gone.md)').checked).toBe(3);
  });
});
