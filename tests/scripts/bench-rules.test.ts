import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { changePackage } from '../../scripts/bench/rules/change';
import { onPackage, type Fault } from '../../scripts/bench/rules/fault';
import { faults } from '../../scripts/bench/rules/faults';
import { holderSize, itemOf, kindOf, placedOn, rectOf, type Rect } from '../../scripts/bench/rules/geometry';
import { legalCart, type LegalCart } from '../../scripts/bench/rules/legal-cart';
import { randomFrom } from '../../scripts/bench/rules/random';
import { judgeCart, tryFault } from '../../scripts/bench/rules/trial';
import { ruleIds } from '../../src/domain/load/finding';

const seed = 11;
const made = new Map<number, LegalCart>();

function cartNumber(number: number): LegalCart {
  const cart = made.get(number) ?? legalCart(seed, number);
  made.set(number, cart);
  return cart;
}

const carts = Array.from({ length: 80 }, (_, index) => cartNumber(index + 1));

function reachInto(one: Rect, other: Rect): boolean {
  return (
    Math.min(one.right, other.right) - Math.max(one.left, other.left) > 1e-6 &&
    Math.min(one.back, other.back) - Math.max(one.front, other.front) > 1e-6
  );
}

/** Racks and baskets, and packages that stand on the deck by themselves. Wedges belong under what they tilt. */
function onDecks({ view }: LegalCart): readonly { readonly shelfId: string; readonly rect: Rect }[] {
  const holders = view.holders
    .filter((holder) => kindOf(view, holder).form !== 'wedge')
    .map((holder) => ({
      shelfId: holder.shelfId,
      rect: rectOf(holder.xMm, holder.yMm, holderSize(kindOf(view, holder), holder.turn)),
    }));
  return [...holders, ...placedOn(view).filter(({ one }) => one.placement?.at === 'shelf')];
}

describe('the generator of legal carts', () => {
  it('makes the same cart of the same seed and number, and another of another', () => {
    expect(legalCart(seed, 3)).toEqual(cartNumber(3));
    expect(legalCart(seed + 1, 3)).not.toEqual(cartNumber(3));
    expect(cartNumber(4)).not.toEqual(cartNumber(3));
  });

  it('puts everything inside its shelf, nothing into anything else, and counts it', () => {
    for (const cart of carts) {
      const { view } = cart;
      const placed = placedOn(view);
      expect(placed.length).toBe(view.packages.length);
      const standing = onDecks(cart);
      for (const [index, one] of standing.entries()) {
        const shelf = view.cart.shelves.find((each) => each.id === one.shelfId);
        expect(one.rect.left >= 0 && one.rect.right <= (shelf?.widthMm ?? 0)).toBe(true);
        expect(one.rect.front >= 0 && one.rect.back <= (shelf?.depthMm ?? 0)).toBe(true);
        const others = standing.slice(index + 1).filter((other) => other.shelfId === one.shelfId);
        expect([cart.number, others.filter((other) => reachInto(one.rect, other.rect))]).toEqual([cart.number, []]);
      }
      for (const { shelfId, counted } of view.counts) {
        expect(counted).toBe(placed.filter((each) => each.shelfId === shelfId).length);
      }
    }
  });

  it('keeps to the masses and heights of shelf and load', () => {
    for (const { view, policy } of carts) {
      const left = 1 - policy.massMarginPercent / 100;
      const placed = placedOn(view);
      const holderKg = (shelfId: string | null) =>
        view.holders
          .filter((holder) => shelfId === null || holder.shelfId === shelfId)
          .reduce((sum, holder) => sum + kindOf(view, holder).massKg, 0);
      for (const shelf of view.cart.shelves) {
        const here = placed.filter((each) => each.shelfId === shelf.id);
        const mass = here.reduce((sum, each) => sum + each.item.massKg, holderKg(shelf.id));
        expect(mass).toBeLessThanOrEqual(shelf.greatestMassKg * left + 1e-9);
        for (const each of here) expect(each.top + policy.headroomMm).toBeLessThanOrEqual(shelf.clearHeightMm);
      }
      const all = placed.reduce((sum, each) => sum + each.item.massKg, holderKg(null));
      expect(all).toBeLessThanOrEqual(view.sterilizer.greatestLoadMassKg * left + 1e-9);
    }
  });

  it('makes carts of every kind of thing, small and large', () => {
    const sizes = carts.map(({ view }) => view.packages.length);
    expect(Math.min(...sizes)).toBeLessThan(5);
    expect(Math.max(...sizes)).toBeGreaterThan(100);
    const all = carts.flatMap(({ view }) => view.packages.map((one) => ({ one, item: itemOf(view, one) })));
    expect(new Set(all.map(({ item }) => item.kind)).size).toBe(6);
    expect(new Set(all.map(({ one }) => one.placement?.at))).toEqual(new Set(['shelf', 'slot', 'basket', 'package']));
    expect(new Set(carts.map(({ view }) => view.cart.shelves.length))).toEqual(new Set([1, 2, 3, 4]));
    expect(new Set(carts.map(({ policy }) => policy.facing)).size).toBe(3);
  });

  it('looks at nothing of the rules', () => {
    const top = path.resolve(import.meta.dirname, '../..');
    const folder = path.join(top, 'scripts/bench/rules');
    const judges = new Set(['trial.ts', 'speed.ts']);
    const allowed = /^src\/domain\/(load\/(model|finding|policy)|units\/quantity|catalogue\/item-fields)$/;
    const files = readdirSync(folder, { recursive: true, encoding: 'utf8' }).filter((file) => file.endsWith('.ts'));
    expect(files.length).toBeGreaterThan(20);
    for (const file of files) {
      const text = readFileSync(path.join(folder, file), 'utf8');
      const imported = [...text.matchAll(/from '(\.[^']+)'/g)]
        .map(([, from = '']) => path.relative(top, path.resolve(folder, path.dirname(file), from)))
        .filter((from) => from.startsWith('src/') && !allowed.test(from));
      expect([file, imported]).toEqual([file, judges.has(file) ? ['src/domain/load/evaluate-load'] : []]);
    }
  });
});

describe('the planted faults', () => {
  it('are of every rule, each under a name of its own', () => {
    expect(ruleIds.filter((rule) => !faults.some((fault) => fault.rule === rule))).toEqual([]);
    expect(new Set(faults.map((fault) => fault.name)).size).toBe(faults.length);
  });

  it('can each be planted, and change what they are planted in', () => {
    const never = faults.filter((fault) => {
      for (let number = 1; number <= 400; number += 1) {
        const cart = cartNumber(number);
        const host = { ...cart, placed: placedOn(cart.view) };
        const planted = fault.plant(host, randomFrom(seed, number, fault.name));
        if (!planted) continue;
        expect(planted.at.length).toBeGreaterThan(0);
        expect([fault.name, planted.view === cart.view && planted.policy === undefined]).toEqual([fault.name, false]);
        return false;
      }
      return true;
    });
    expect(never.map((fault) => fault.name)).toEqual([]);
  }, 60_000);

  it('count as found only where a finding of the rule names the place', () => {
    const judged = judgeCart(seed, 3);
    const [one, other] = judged.cart.view.packages;
    const lacking = (name: string, at: string): Fault => ({
      name,
      rule: 'internal-indicator',
      plant: ({ view }) => ({
        view: changePackage(view, one?.packageId ?? '', { hasInternalIndicator: false }),
        at: [onPackage(at)],
      }),
    });
    const isFound = (fault: Fault) => tryFault(seed, judged, fault)?.isFound;
    expect(isFound(lacking('right place', one?.packageId ?? ''))).toBe(true);
    expect(isFound(lacking('another place', other?.packageId ?? ''))).toBe(false);
    expect(isFound({ ...lacking('another rule', one?.packageId ?? ''), rule: 'external-indicator' })).toBe(false);
  });
});
