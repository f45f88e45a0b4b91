import fc from 'fast-check';

const SEED = Number(process.env.SEED ?? 20261201);

/** Property tests use one seed, so that a failure comes back; `SEED=… npm run test:unit` tries another. */
fc.configureGlobal({ seed: SEED });

/** Says the seed once, before the first test. */
export function setup(): void {
  process.stdout.write(`property tests use seed ${SEED}\n`);
}
