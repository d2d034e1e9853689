import { defineConfig } from 'vitest/config';

/** The tests that run for each mutant of one file; `run.ts` names them. */
export default defineConfig({
  test: {
    include: process.env.MUTATION_TESTS?.split(',') ?? [],
    environment: 'node',
    testTimeout: 60_000,
  },
});
