import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  root: fileURLToPath(new URL('..', import.meta.url)),
  test: {
    include: ['test/**/*.test.ts'],
    globalSetup: ['test/support/globalSetup.ts'],
    pool: 'forks',
    testTimeout: 30_000,
    hookTimeout: 30_000,
    reporters: ['default'],
    allowOnly: false,
    coverage: {
      provider: 'v8',
      include: ['src/**/*.ts', 'commands/**/*.ts'],
      reportsDirectory: 'coverage',
    },
  },
});
