import { renderHook } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { useWrite } from '../../../src/components/stock/use-write';
import { NoLineError, ProblemError } from '../../../src/lib/errors';

function problem(code: string): ProblemError {
  return new ProblemError({ code, status: 409, detail: 'Not now.' });
}

/** Sends the same write as often as there are answers, and returns the ids it went under. */
async function idsFor(answers: readonly (Error | 'done')[]): Promise<string[]> {
  const { result } = renderHook(() => useWrite());
  const ids: string[] = [];
  for (const answer of answers) {
    await result
      .current((requestId) => {
        ids.push(requestId);
        return answer === 'done' ? Promise.resolve(null) : Promise.reject(answer);
      })
      .catch(() => undefined);
  }
  return ids;
}

describe('the id of a write', () => {
  it.each([
    ['silence', new NoLineError('no answer')],
    ['an answer nobody could read', problem('reply.unreadable')],
    ['a refusal', problem('items.code-taken')],
  ])('is the same again after %s', async (_what, error) => {
    const ids = await idsFor([error, error, 'done']);
    expect(new Set(ids).size).toBe(1);
  });

  it.each([
    ['it is done', 'done' as const],
    ['it turned out to stand for something else', problem('request.reused')],
  ])('is another one once %s', async (_what, answer) => {
    const [first, second] = await idsFor([answer, 'done']);
    expect(second).not.toBe(first);
  });
});
