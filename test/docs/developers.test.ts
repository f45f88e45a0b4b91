import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { dependencies, devDependencies, scripts } from '../../package.json';

const page = readFileSync(fileURLToPath(new URL('../../DEVELOPERS.md', import.meta.url)), 'utf8');

describe('the page for developers', () => {
  it('says of every dependency what it is for, and of none that is gone', () => {
    const table = page.slice(page.indexOf('## What each dependency is for'));
    const rows = [...table.matchAll(/^\| ([^|]+) \|/gm)].map((row) => row[1] ?? '');
    const told = rows.flatMap((row) => row.split(', ')).filter((name) => !/^(package|-+)$/.test(name));
    const used = [...Object.keys(dependencies), ...Object.keys(devDependencies)];
    expect(told.sort()).toEqual(used.sort());
  });

  it('says of every command what it does', () => {
    for (const name of Object.keys(scripts)) expect(page).toMatch(new RegExp(`npm (run )?${name}\\b`));
  });
});
