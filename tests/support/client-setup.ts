import '@testing-library/jest-dom/vitest';
import { cleanup, configure } from '@testing-library/react';
import { afterEach, beforeEach, expect, vi } from 'vitest';

/*
 * The page a component test runs in. Whatever a screen complains of on the console, and every call to a server that the
 * test did not answer, fails the test: both are faults that nobody would otherwise see.
 */

// Several suites share few processors: what is waited for may take a while, and is there at once when it is not.
configure({ asyncUtilTimeout: 8_000 });
vi.setConfig({ testTimeout: 30_000 });

const complaints: string[] = [];

function inWords(value: unknown): string {
  return value instanceof Error ? (value.stack ?? value.message) : String(value);
}

beforeEach(() => {
  complaints.length = 0;
  for (const level of ['error', 'warn'] as const) {
    vi.spyOn(console, level).mockImplementation((...values: unknown[]) => {
      complaints.push(`console.${level}: ${values.map(inWords).join(' ')}`);
    });
  }
  vi.stubGlobal('fetch', (input: unknown) => {
    complaints.push(`a call that the test does not answer: ${String(input)}`);
    return Promise.reject(new Error('no server in this test'));
  });
});

afterEach(() => {
  cleanup();
  vi.useRealTimers();
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
  localStorage.clear();
  const heard = complaints.splice(0);
  expect(heard).toEqual([]);
});
