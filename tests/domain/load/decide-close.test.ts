import { decideClose } from '#domain/load/decide-close';
import type { Finding } from '#domain/load/finding';
import { defaultPolicy } from '#domain/load/policy';
import { describe, expect, it } from 'vitest';
import {
  aHolder,
  aPackage,
  aView,
  forceps,
  inSlot,
  lowerShelf,
  smallRack,
  upperShelf,
} from '../../support/building-load';

function aFinding(changes: Partial<Finding>): Finding {
  return {
    key: 'facing|p1',
    ruleId: 'facing',
    severity: 'stop',
    title: 'Holder RS-1, slot 7 faces the wrong way',
    reason: 'Steam passes only through paper.',
    remedy: 'Turn it so that paper is left.',
    source: { text: 'House rule', provenance: 'house-rule' },
    places: [{ on: 'package', packageId: 'p1' }],
    figure: null,
    fix: null,
    ...changes,
  };
}

/** Scanned, placed and counted: nothing but findings can hold it open. */
const ready = aView({
  holders: [aHolder('rs-1', smallRack)],
  packages: [
    aPackage('p1', forceps, { placement: inSlot('rs-1', 1) }),
    aPackage('p2', forceps, { placement: inSlot('rs-1', 3) }),
  ],
  counts: [
    { shelfId: lowerShelf.id, counted: 0 },
    { shelfId: upperShelf.id, counted: 2 },
  ],
});

const labels = (view: typeof ready, findings: readonly Finding[] = []) =>
  decideClose(view, defaultPolicy, findings).blocks.map((block) => block.label);

describe('decideClose', () => {
  it('lets a load close when listed, scanned and counted agree and nothing is found', () => {
    expect(decideClose(ready, defaultPolicy, [])).toEqual({
      mayClose: true,
      heading: 'Nothing holds this load open',
      blocks: [],
    });
  });

  it('names every thing that holds the load open, and says how many', () => {
    const fix = { label: 'Turn slot 7', edits: [] };
    const view = {
      ...ready,
      packages: [
        ...ready.packages,
        aPackage('p3', forceps, { isScanned: false }),
        aPackage('p4', forceps, { isScanned: false }),
      ],
      counts: [{ shelfId: upperShelf.id, counted: 4 }],
    };
    const decision = decideClose(view, defaultPolicy, [aFinding({ fix })]);
    expect(decision.mayClose).toBe(false);
    expect(decision.heading).toBe('4 things hold this load open');
    expect(decision.blocks.map((block) => block.label)).toEqual([
      'Turn slot 7',
      'Lower shelf: count it',
      'Upper shelf: counted 4, scanned 2',
      '2 packages: scan or take off the list',
    ]);
    expect(decision.blocks.map((block) => block.kind)).toEqual([
      'finding',
      'count-missing',
      'count-differs',
      'unscanned',
    ]);
  });

  it('uses the singular for a single thing, and the name of a single package', () => {
    const view = { ...ready, packages: [...ready.packages, aPackage('p3', forceps, { isScanned: false })] };
    const decision = decideClose(view, defaultPolicy, []);
    expect(decision.heading).toBe('1 thing holds this load open');
    expect(decision.blocks[0]?.label).toBe('Adson forceps pair: scan or take off the list');
  });

  it('holds a load for a finding that a lead may accept until exactly that finding is accepted', () => {
    const finding = aFinding({
      severity: 'accept',
      ruleId: 'shelf-edge',
      key: 'shelf-edge|p1|12',
      title: '12 mm from the side',
    });
    expect(labels(ready, [finding])).toEqual(['12 mm from the side: fix it or have it accepted']);
    const acceptedAs = (findingKey: string) => ({
      ...ready,
      acceptances: [{ findingKey, ruleId: 'shelf-edge', reason: 'Nothing wider in the house.' }],
    });
    expect(labels(acceptedAs('shelf-edge|p1|12'), [finding])).toEqual([]);
    // Moved nearer to the edge since: another figure, so another finding.
    expect(labels(acceptedAs('shelf-edge|p1|13'), [finding])).toHaveLength(1);
  });

  it('never lets an acceptance settle a finding that holds the load', () => {
    const finding = aFinding({});
    const acceptances = [{ findingKey: finding.key, ruleId: finding.ruleId, reason: 'We are in a hurry.' }];
    expect(decideClose({ ...ready, acceptances }, defaultPolicy, [finding]).mayClose).toBe(false);
  });

  it('is not held by advice', () => {
    expect(labels(ready, [aFinding({ severity: 'advice', ruleId: 'water' })])).toEqual([]);
  });

  it('keeps an empty load open, even when every shelf is counted empty', () => {
    const empty = { ...ready, packages: [], counts: ready.counts.map((count) => ({ ...count, counted: 0 })) };
    const decision = decideClose(empty, defaultPolicy, []);
    expect(decision.blocks.map((block) => block.kind)).toEqual(['empty']);
  });

  it('names a difference once when a rule has found it as well', () => {
    const view = { ...ready, counts: ready.counts.slice(1) };
    const found = aFinding({
      ruleId: 'count-missing',
      key: 'count-missing|lower',
      title: 'Lower shelf is not counted',
    });
    expect(labels(view, [found])).toEqual(['Lower shelf: count it']);
  });

  it('compares shelf by shelf: one too many here does not make up for one too few there', () => {
    const counts = [
      { shelfId: lowerShelf.id, counted: 1 },
      { shelfId: upperShelf.id, counted: 1 },
    ];
    expect(labels({ ...ready, counts })).toEqual([
      'Lower shelf: counted 1, scanned 0',
      'Upper shelf: counted 1, scanned 2',
    ]);
  });
});
