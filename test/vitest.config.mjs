// Everything that needs no browser and no editor. Totals come last, on a line of their own, for people and for CI.
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  root: fileURLToPath(new URL('..', import.meta.url)),
  test: {
    include: ['test/**/*.test.ts'],
    reporters: ['default', fileURLToPath(new URL('./totals-reporter.ts', import.meta.url))],
    testTimeout: 30_000,
  },
});
