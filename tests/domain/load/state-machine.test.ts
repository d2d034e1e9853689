import { loadStateSchema } from '#contract/loads';
import { permissions } from '#domain/access/permissions';
import { decideAct, loadActs, loadStates, loadStateWords, stateOffLoad, transitions } from '#domain/load/state-machine';
import { describe, expect, it } from 'vitest';

/** Every state and act that go together, and what comes of it. Everything else is refused. */
const possible: Readonly<Record<string, { to: string; packages: string }>> = {
  'none open': { to: 'building', packages: 'listed' },
  'building build': { to: 'building', packages: 'none' },
  'building accept-finding': { to: 'building', packages: 'none' },
  'building print-stickers': { to: 'building', packages: 'none' },
  'building close': { to: 'closed', packages: 'stay' },
  'building abandon': { to: 'abandoned', packages: 'go-back' },
  'closed print-stickers': { to: 'closed', packages: 'none' },
};

describe('decideAct', () => {
  const pairs = [null, ...loadStates].flatMap((state) => loadActs.map((act) => ({ state, act })));

  it.each(pairs)('answers for $act while the load is $state', ({ state, act }) => {
    const expected = possible[`${state ?? 'none'} ${act}`];
    const result = decideAct(state, act);
    if (expected) {
      expect(result).toEqual({ ok: true, value: expected });
      return;
    }
    expect(result.ok).toBe(false);
    if (result.ok) return;
    expect(result.refusal.code).toBe('load.not-in-that-state');
    expect(result.refusal.sentence).toMatch(/^[A-Z].+\.$/);
  });

  it('says of a closed load that its contents stay as they were signed', () => {
    const result = decideAct('closed', 'build');
    expect(!result.ok && result.refusal.sentence).toBe('This load is closed. Its contents stay as they were signed.');
  });

  it('says of a later state which one it is', () => {
    const result = decideAct('released-implant-early', 'abandon');
    expect(!result.ok && result.refusal.sentence).toBe(
      'This load cannot be changed any more: released with implant early.',
    );
  });
});

describe('the table of a load’s life', () => {
  it('has the same states as everything that crosses the wire', () => {
    expect([...loadStates].sort()).toEqual([...loadStateSchema.options].sort());
  });

  it('names a permission that exists for every act, and a word for every state', () => {
    for (const act of loadActs) expect(permissions).toContain(transitions[act].permission);
    expect(new Set(Object.values(loadStateWords)).size).toBe(loadStates.length);
  });

  it('sends packages of an abandoned load back to where they were', () => {
    expect(stateOffLoad(true)).toBe('staged');
    expect(stateOffLoad(false)).toBe('packed');
  });
});
