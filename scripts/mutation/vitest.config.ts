import { defineConfig } from 'vitest/config';

/**
 * The tests that run once for every mutant of the rules and the geometry: quick ones, each about one thing. The properties that
 * are tried on hundreds of generated carts touch every line and would make each mutant take seconds; what only they would
 * find is counted as having survived.
 */
export default defineConfig({
  test: {
    include: [
      'tests/domain/load/rules/**/*.test.ts',
      'tests/domain/load/{demo-carts,layout,cycle-match}.test.ts',
      'tests/domain/{geometry,steam}/**/*.test.ts',
    ],
    environment: 'node',
    testTimeout: 60_000,
  },
});
