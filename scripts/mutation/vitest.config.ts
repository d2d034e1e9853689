import { defineConfig } from 'vitest/config';

/** The tests that judge the rules and the geometry, and nothing else: they run once for every mutant. */
export default defineConfig({
  test: {
    include: ['tests/domain/{load,geometry,steam}/**/*.test.ts'],
    environment: 'node',
  },
});
