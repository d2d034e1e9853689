import { describe, expect, test } from 'vitest';
import { unreadable, unreadableReasons } from '#domain/label/unreadable-scan';

describe('what cannot be used', () => {
  test('has a sentence of its own for every reason, which says what to do next or what it is', () => {
    const sentences = unreadableReasons.map((reason) => unreadable(reason).sentence);
    expect(new Set(sentences).size).toBe(unreadableReasons.length);
    for (const sentence of sentences) expect(sentence).toMatch(/[Ss]can|[Ss]et|label of ours/);
  });

  test('never speaks of errors, records or users', () => {
    for (const reason of unreadableReasons) {
      expect(unreadable(reason).sentence).not.toMatch(/invalid|error|record|entity|submit|sync|user|status/i);
    }
  });
});
