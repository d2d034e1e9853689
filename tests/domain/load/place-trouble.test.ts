import { evaluateLoad } from '#domain/load/evaluate-load';
import { troubleOf, worstAdded } from '#domain/load/place-trouble';
import { defaultPolicy } from '#domain/load/policy';
import { describe, expect, it } from 'vitest';
import {
  aHolder,
  aPackage,
  aView,
  forceps,
  inSlot,
  lowerShelf,
  onShelf,
  smallRack,
  tray,
} from '../../support/building-load';

describe('worstAdded', () => {
  const before = new Map([['overlap|a+b', 'stop']] as const);

  it('finds nothing new in what was there before', () => {
    expect(worstAdded(before, before)).toBeNull();
    expect(worstAdded(before, new Map())).toBeNull();
  });

  it('names the worst of what is new', () => {
    const accept = new Map([...before, ['gap|a', 'accept']] as const);
    expect(worstAdded(before, accept)).toBe('accept');
    expect(worstAdded(before, new Map([...accept, ['overlap|a+c', 'stop']] as const))).toBe('stop');
  });

  it('takes a finding with another figure for a new one', () => {
    const [was, is] = ['shelf-mass|lower|61.00 kg', 'shelf-mass|lower|64.00 kg'];
    expect(worstAdded(new Map([[was, 'stop']] as const), new Map([[is, 'stop']] as const))).toBe('stop');
  });
});

describe('troubleOf', () => {
  it('knows what is wrong with where things are, and nothing else', () => {
    const view = aView({
      holders: [aHolder('rs-1', smallRack)],
      packages: [
        aPackage('p1', forceps, { placement: inSlot('rs-1', 1) }),
        aPackage('p2', forceps, { placement: inSlot('rs-1', 1) }),
        aPackage('t1', tray, { placement: onShelf(lowerShelf, -40, 30) }),
        aPackage('t2', tray, { isScanned: false }),
      ],
      airRemoval: null,
    });
    const trouble = troubleOf(view, defaultPolicy);
    const rules = new Set([...trouble.keys()].map((key) => key.split('|')[0]));
    expect(rules).toContain('slot-shared');
    expect(rules).toContain('shelf-edge');
    for (const rule of ['air-removal-test', 'unscanned', 'count-missing', 'unplaced'])
      expect(rules).not.toContain(rule);
    // Key by key and weight by weight the same as the whole evaluation says.
    const findings = evaluateLoad(view, defaultPolicy);
    for (const [key, severity] of trouble) {
      expect(findings.find((finding) => finding.key === key)?.severity).toBe(severity);
    }
  });
});
