import { describe, expect, it } from 'vitest';
import { challengePack, demonstrationItems } from '../../../seeds/demonstration-catalogue';
import { demonstrationHolderKinds } from '../../../seeds/demonstration-equipment-plan';
import { itemFieldsSchema } from '../../../src/contract/items';
import { checkHolderKind } from '../../../src/domain/catalogue/check-equipment';
import { checkItem, checkItemReferences } from '../../../src/domain/catalogue/check-item';
import { readDeviceIdentifier } from '../../../src/domain/catalogue/device-identifier';

const everything = [...demonstrationItems, challengePack];

describe('the demonstration catalogue', () => {
  it('has 22 pouches, 17 containers, 10 wrapped trays, 2 basins and a textile pack', () => {
    const counts = new Map<string, number>();
    for (const { kind } of demonstrationItems) counts.set(kind, (counts.get(kind) ?? 0) + 1);
    expect(Object.fromEntries(counts)).toEqual({
      pouch: 22,
      'rigid-container': 17,
      'wrapped-tray': 10,
      basin: 2,
      'textile-pack': 1,
    });
  });

  it.each(everything.map((item) => [item.code, item] as const))('%s holds together', (_code, item) => {
    const references = {
      itemCodes: new Set(everything.map((one) => one.code)),
      holderKindCodes: new Set(demonstrationHolderKinds.map((kind) => kind.code)),
      deviceIdentifiers: new Map<string, string>(),
    };
    expect(itemFieldsSchema.parse(item)).toEqual(item);
    expect(checkItem(item)).toEqual([]);
    expect(checkItemReferences(item, references)).toEqual([]);
  });

  it('gives every device identifier to one item only, and keeps each in the form it is looked up in', () => {
    const identifiers = everything.flatMap((item) => item.deviceIdentifier ?? []);
    expect(new Set(identifiers).size).toBe(identifiers.length);
    for (const identifier of identifiers) {
      expect(readDeviceIdentifier(identifier)).toEqual({ ok: true, value: identifier });
    }
  });

  it('uses no number that belongs to a company: restricted circulation, or the labeler of the standard’s examples', () => {
    for (const item of demonstrationItems) expect(item.deviceIdentifier).toMatch(/^(02\d{12}|A999[A-Z0-9]+)$/);
  });

  it('has pouches that fit the holder they belong in', () => {
    for (const item of demonstrationItems.filter((one) => one.preferredHolder !== null)) {
      const kind = demonstrationHolderKinds.find((one) => one.code === item.preferredHolder);
      expect(item.widthMm, item.code).toBeLessThanOrEqual(kind?.greatestHeightMm ?? 0);
      expect(item.lengthMm, item.code).toBeLessThanOrEqual(kind?.greatestLengthMm ?? 0);
      expect(item.heightMm, item.code).toBeLessThanOrEqual(kind?.greatestThicknessMm ?? 0);
      // Two of the same in neighbouring slots keep the gap the pouch asks for.
      expect((kind?.pitchMm ?? 0) - item.heightMm, item.code).toBeGreaterThanOrEqual(item.clearanceMm ?? 0);
    }
  });

  it.each(demonstrationHolderKinds.map((kind) => [kind.code, kind] as const))(
    'holder kind %s holds together',
    (_code, kind) => {
      expect(checkHolderKind(kind)).toEqual([]);
    },
  );
});
