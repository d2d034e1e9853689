import { judgedAgainSchema, keptFindingSchema } from '#contract/judged-again';
import { loadViewSchema } from '#contract/load-view';
import { evaluateLoad } from '#domain/load/evaluate-load';
import type { LoadView } from '#domain/load/model';
import { defaultPolicy } from '#domain/load/policy';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { aLoad } from '../support/arbitrary-load';

const anId = '0198a000-0000-7000-8000-00000000000';

/** The loads of the core's own tests name things by short words; on the wire they are UUIDs. */
function withIds(view: LoadView): unknown {
  const ids = new Map<string, string>();
  const idOf = (name: string) => {
    const id = ids.get(name) ?? `0198a000-0000-7000-8000-${String(ids.size).padStart(12, '0')}`;
    ids.set(name, id);
    return id;
  };
  const named = /^(id|.*Id)$/;
  return JSON.parse(JSON.stringify(view), (key, value: unknown) =>
    typeof value === 'string' && named.test(key) ? idOf(value) : value,
  );
}

describe('what a closed load keeps', () => {
  it('comes back whole: every finding that the rules make, and everything they looked at', () => {
    const seen = new Set<string>();
    fc.assert(
      fc.property(aLoad, (load) => {
        // Slots are counted from 1 on the wire.
        fc.pre(load.packages.every(({ placement }) => placement?.at !== 'slot' || placement.slot >= 1));
        const sent = withIds(load);
        const view = loadViewSchema.parse(sent);
        expect(view).toEqual(sent);
        for (const { fix: _fix, ...finding } of evaluateLoad(view, defaultPolicy)) {
          seen.add(finding.ruleId);
          const kept: unknown = JSON.parse(JSON.stringify(finding));
          expect(keptFindingSchema.parse(kept)).toEqual(kept);
        }
      }),
      { numRuns: 40 },
    );
    // Or the loads would be too tame to show anything.
    expect(seen.size).toBeGreaterThan(12);
  });

  it('has no figure where what was kept is no number', () => {
    const kept = {
      key: 'k',
      ruleId: 'a-rule-of-long-ago',
      severity: 'stop',
      title: 'Too near',
      reason: 'Because.',
      remedy: 'Move it.',
      source: { text: 'Common practice, no source.', provenance: 'a-word-of-long-ago' },
      places: [{ on: 'load' }],
      figure: { measured: null, limit: 25, unit: 'fathom', want: 'at-least', limitFrom: 'default' },
    };
    expect(keptFindingSchema.parse(kept)).toEqual({ ...kept, figure: null });
    expect(keptFindingSchema.parse({ ...kept, figure: { ...kept.figure, measured: 3 } }).figure?.unit).toBe('fathom');
  });
});

describe('a load judged again', () => {
  it('either is, or says why not', () => {
    const closed = {
      load: { id: `${anId}1`, number: '1-26062-01', closedAt: '2026-03-03T13:30:00.000Z', closedBy: 'Ada' },
      then: { ruleSet: '1', policyNumber: 1, policyEffectiveOn: '2026-03-01', findings: [], acceptances: [] },
      now: null,
      comparison: null,
      whyNot: 'It was closed long ago.',
    };
    expect(judgedAgainSchema.parse(closed)).toEqual(closed);
    expect(judgedAgainSchema.safeParse({ ...closed, then: { ...closed.then, policyNumber: 1.5 } }).success).toBe(false);
  });
});
