import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import fc from 'fast-check';
import { afterAll, describe, expect, it } from 'vitest';
import { main, runCases } from './cases.ts';
import { runExactRays } from './exactRays.ts';
import { runSeidel } from './seidelSums.ts';

const FILE = fileURLToPath(new URL('./cases.json', import.meta.url));
const list = JSON.parse(readFileSync(FILE, 'utf8')) as Record<string, unknown>[];

/** Runs case files and gives the exit code and the printed lines. */
function run(...paths: string[]): { code: number; lines: string[] } {
  const lines: string[] = [];
  const code = main(paths, (line) => lines.push(line));
  return { code, lines };
}

const folder = mkdtempSync(join(tmpdir(), 'cases-'));
afterAll(() => rmSync(folder, { recursive: true }));

/** A file that holds `content`; the next one takes its place. */
function fileWith(content: string): string {
  const path = join(folder, 'cases.json');
  writeFileSync(path, content);
  return path;
}

describe('the published cases', () => {
  const reports = runCases(list);

  it('agree with the printed figures and with the independent computation', () => {
    expect(reports.flatMap(({ id, misses }) => misses.map((miss) => ({ id, ...miss })))).toEqual([]);
  });

  it('are covered to the last quantity, no case left out', () => {
    const covered = reports.flatMap((report) => report.covered);
    process.stdout.write(`reference cases: ${reports.length} cases, ${covered.length} quantities covered\n`);
    expect(reports.filter(({ outcome }) => outcome === 'skipped')).toEqual([]);
    expect(reports.flatMap(({ id, left }) => left.map((quantity) => `${id} ${quantity}`))).toEqual([]);
    expect(reports).toHaveLength(74);
    expect(covered).toHaveLength(495);
  });

  it('would each miss if any figure were off by a millionth', () => {
    const off = (value: unknown) => (typeof value === 'number' ? value + 1e-6 * (1 + Math.abs(value)) : 1);
    for (const [place, report] of reports.entries()) {
      for (const quantity of report.covered) {
        const changed = structuredClone(list[place]) as {
          expected: Record<string, { value: unknown }>;
          computed: { values: Record<string, unknown> };
        };
        const { values } = changed.computed;
        const claim = changed.expected[quantity];
        if (quantity in values && values[quantity] !== null) values[quantity] = off(values[quantity]);
        else if (claim) claim.value = off(claim.value);
        const misses = runCases([changed]).flatMap((again) => again.misses.map((miss) => miss.quantity));
        expect(misses, report.id).toContain(quantity);
      }
    }
  });
});

describe('the case runner', () => {
  it('closes with the counts and code 0 when nothing is missed, and names what it cannot express', () => {
    const { code, lines } = run(FILE);
    expect(code).toBe(0);
    expect(lines).toEqual(['74 passed, 0 failed, 0 skipped']);
    const odd = fileWith(JSON.stringify([{ id: 'odd', input: {}, expected: { efl: { value: 1 } } }]));
    expect(run(odd)).toEqual({ code: 0, lines: ['cannot express: odd', '0 passed, 0 failed, 1 skipped'] });
  });

  it('runs files of all three forms and closes over all of them', () => {
    const others = ['exact-rays.json', 'seidel.json'].map((name) =>
      fileURLToPath(new URL(name, import.meta.url)),
    );
    expect(run(FILE, ...others)).toEqual({ code: 0, lines: ['139 passed, 0 failed, 0 skipped'] });
  });

  it('tells which quantities of a case it left out', () => {
    const prescription = { thinLenses: [{ focalLength: 50 }] };
    const expected = { efl: { value: 50 }, sumS1: { value: 1 } };
    const { lines } = run(fileWith(JSON.stringify([{ id: 'bare', input: { prescription }, expected }])));
    expect(lines).toEqual(['left out: bare, sumS1', '1 passed, 0 failed, 0 skipped']);
  });

  it('tells of a surface whose sum is off', () => {
    const path = fileURLToPath(new URL('./seidel.json', import.meta.url));
    const file = JSON.parse(readFileSync(path, 'utf8')) as {
      systems: { surfaces: { S1: number }[]; sums: { S5: number } }[];
    };
    const [system] = file.systems;
    if (system?.surfaces[1]) system.surfaces[1].S1 *= 1 + 1e-9;
    if (system) system.sums.S5 *= 1 + 1e-9;
    const { code, lines } = run(fileWith(JSON.stringify(file)));
    expect(code).toBe(1);
    expect(lines.map((line) => line.split(':').slice(0, 2).join(':'))).toEqual([
      'miss: doublet, surfaces.1.S1',
      'miss: doublet, sums.S5',
      '3 passed, 1 failed, 0 skipped',
    ]);
  });

  it('prints case, quantity, got, wanted and tolerance of a miss, and code 1', () => {
    const lens = { thinLenses: [{ focalLength: 50, gapAfter: 0 }] };
    const expected = { focalLength: { value: 51, tolerance: 0.5 }, backFocus: { value: 50, tolerance: 0 } };
    const { code, lines } = run(
      fileWith(JSON.stringify([{ id: 'off', input: { prescription: lens }, expected }])),
    );
    expect(code).toBe(1);
    expect(lines[0]).toMatch(/^miss: off, focalLength: got 50, wanted 51, tolerance 0\.5/);
    expect(lines.at(-1)).toBe('0 passed, 1 failed, 0 skipped');
  });

  it('counts a quantity that should not exist but does as a miss', () => {
    const input = { prescription: { thinLenses: [{ focalLength: 50 }] } };
    const [report] = runCases([{ id: 'has-power', input, expected: { efl: { value: null, tolerance: 0 } } }]);
    expect(report?.misses[0]?.wanted).toBe('none');
  });

  it('says in a sentence why a file cannot be read', () => {
    expect(run('/nowhere/cases.json')).toEqual({
      code: 1,
      lines: [
        '/nowhere/cases.json cannot be read: no such file, or no permission.',
        '0 passed, 0 failed, 0 skipped',
      ],
    });
    expect(run(fileWith('{')).lines[0]).toMatch(/is not JSON\.$/);
    expect(run(fileWith('{}')).lines[0]).toMatch(
      /holds no list of cases and no systems with rays or sums\.$/,
    );
    expect(run().code).toBe(1);
  });

  it('skips whatever is no case, naming it, and never throws', () => {
    const near = fc.record(
      {
        id: fc.string(),
        input: fc.record(
          {
            prescription: fc.record({
              surfaces: fc.jsonValue(),
              thinLenses: fc.jsonValue(),
              stop: fc.jsonValue(),
            }),
          },
          { requiredKeys: [] },
        ),
        expected: fc.dictionary(fc.constantFrom('efl', 'power', 'lagrange'), fc.jsonValue()),
        computed: fc.jsonValue(),
      },
      { requiredKeys: [] },
    );
    fc.assert(
      fc.property(fc.array(fc.oneof(fc.jsonValue(), near)), (entries) => {
        expect(runCases(entries)).toHaveLength(entries.length);
      }),
      { seed: 20261201 },
    );
    expect(runCases([7, {}, { id: 'odd', kind: 'unheard of', input: [] }]).map(({ id }) => id)).toEqual([
      'entry 1 without an id',
      'entry 2 without an id',
      'odd',
    ]);
  });

  it('never throws on systems that are none, whatever they hold', () => {
    const near = fc.record(
      {
        prescription: fc.record({ surfaces: fc.jsonValue(), stop: fc.jsonValue(), aperture: fc.jsonValue() }),
        rays: fc.oneof(
          fc.jsonValue(),
          fc.array(fc.record({ start: fc.jsonValue(), surfaces: fc.jsonValue() })),
        ),
        sums: fc.jsonValue(),
      },
      { requiredKeys: [] },
    );
    fc.assert(
      fc.property(fc.array(fc.oneof(fc.jsonValue(), near)), (systems) => {
        expect(runSeidel({ systems })).toHaveLength(systems.length);
        expect(runExactRays({ systems })).not.toBeNull();
      }),
      { seed: 20261201 },
    );
  });

  // Starting node and the build tool takes a while on a busy machine.
  it('runs as a command', { timeout: 60_000 }, () => {
    const script = fileURLToPath(new URL('./run-cases.mjs', import.meta.url));
    const { status, stdout } = spawnSync(process.execPath, [script, FILE], { encoding: 'utf8' });
    expect(stdout.trimEnd().split('\n').at(-1)).toBe('74 passed, 0 failed, 0 skipped');
    expect(status).toBe(0);
  });
});
