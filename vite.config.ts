import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

const repository = import.meta.dirname;

export default defineConfig({
  root: `${repository}/app`,
  base: './',
  publicDir: `${repository}/public`,
  plugins: [react()],
  // What the build weighs is judged by size-limit.
  build: {
    outDir: `${repository}/dist`,
    emptyOutDir: true,
    target: 'es2023',
    chunkSizeWarningLimit: 1000,
    // As `var` the trace's arrays would be no constants for the compiler: it would check every index, at half the speed.
    rolldownOptions: { output: { topLevelVar: false } },
  },
  server: { fs: { allow: [repository] } },
  test: {
    root: repository,
    include: ['test/**/*.test.{ts,tsx}'],
    // Case counts bound the property tests, not clocks: a loaded machine must not fail them.
    testTimeout: 60_000,
    globalSetup: ['test/tools/seed.ts'],
    setupFiles: ['test/tools/seed.ts'],
    coverage: {
      provider: 'v8',
      include: ['engine/**', 'app/**'],
      reportsDirectory: `${repository}/coverage`,
    },
  },
});
