import { describe, expect, it } from 'vitest';
import {
  decidePacking,
  defaultPackingPolicy,
  type PackingItem,
  type PackingStatement,
} from '../../../src/domain/package/decide-packing';

const tray: PackingItem = {
  code: 'W-08',
  name: 'Laceration tray',
  isRetired: false,
  ifuReference: 'IFU-W-08',
  massKg: 1.1,
  massLimitKg: null,
};

const allSaid: PackingStatement = { isContentsConfirmed: true, hasInternalIndicator: true, hasExternalIndicator: true };

function refusalOf(item: PackingItem, statement: PackingStatement, policy = defaultPackingPolicy): string | null {
  const decision = decidePacking(item, statement, policy);
  return decision.ok ? null : decision.refusal.code;
}

function warningsOf(item: PackingItem, statement: PackingStatement): string[] {
  const decision = decidePacking(item, statement, defaultPackingPolicy);
  if (!decision.ok) throw new Error(decision.refusal.sentence);
  return decision.value.warnings.map((warning) => warning.code);
}

describe('packing', () => {
  it('goes without a word when everything is said and on file', () => {
    expect(warningsOf(tray, allSaid)).toEqual([]);
  });

  it('is refused until a person has confirmed the contents', () => {
    expect(refusalOf(tray, { ...allSaid, isContentsConfirmed: false })).toBe('package.contents-not-confirmed');
  });

  it('is refused until the internal indicator is placed', () => {
    expect(refusalOf(tray, { ...allSaid, hasInternalIndicator: false })).toBe('package.internal-indicator-missing');
  });

  it('goes without an internal indicator where the house does not ask for one', () => {
    const without = { ...allSaid, hasInternalIndicator: false };
    expect(refusalOf(tray, without, { needsInternalIndicator: false })).toBeNull();
  });

  it('is refused for a retired item, whatever else is said', () => {
    expect(refusalOf({ ...tray, isRetired: true }, allSaid)).toBe('package.item-retired');
  });

  it('warns when no instructions for use are on file, and goes on', () => {
    expect(warningsOf({ ...tray, ifuReference: null }, allSaid)).toEqual(['ifu-missing']);
  });

  it('warns when no external indicator is on it', () => {
    expect(warningsOf(tray, { ...allSaid, hasExternalIndicator: false })).toEqual(['external-indicator-missing']);
  });

  it('warns above the mass its instructions for use allow, and not at it', () => {
    expect(warningsOf({ ...tray, massKg: 12.1, massLimitKg: 11.3 }, allSaid)).toEqual(['over-its-mass-limit']);
    expect(warningsOf({ ...tray, massKg: 11.3, massLimitKg: 11.3 }, allSaid)).toEqual([]);
  });
});
