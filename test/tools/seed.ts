import fc from 'fast-check';

/** Property tests use one seed, so that a failure comes back; `SEED=… npm run test:unit` tries another. */
fc.configureGlobal({ seed: Number(process.env.SEED ?? 20261201) });
