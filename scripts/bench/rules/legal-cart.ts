import type { CatalogueItem, LoadHolder, LoadPackage, LoadView, Program, Shelf } from '../../../src/domain/load/model';
import type { LoadPolicy } from '../../../src/domain/load/policy';
import { kg, mm } from '../../../src/domain/units/quantity';
import { massLimitOf, singleBlock, type Block, type PutHolder, type PutPackage, type Site } from './block';
import { facingIn, permits, variedCatalogue } from './catalogue';
import { Deck, massOf } from './deck';
import { holderKinds, programs, roomFor } from './equipment';
import { gapOf, kindOf, placedOn, sizeOf, type Rect } from './geometry';
import { houseRules } from './house-rules';
import { basketOfOne, basketOfPouches, emptyHolder, rackBlock } from './pouch-blocks';
import { randomFrom, type Random } from './random';
import { oneOf, spacedTrays, stackBlock } from './set-blocks';

/** A cart with nothing to find fault with, by the trade's papers, and the house rules it is loaded under. */
export type LegalCart = { readonly number: number; readonly view: LoadView; readonly policy: LoadPolicy };

const today = '2026-03-10';
/** Early and late on that day, in Chicago and in Auckland. */
const todayIn = ['2026-03-10T11:10:00Z', '2026-03-11T03:30:00Z', '2026-03-09T14:00:00Z', '2026-03-10T09:40:00Z'];

/** Cart `number` of a seed; always the same one. `wanted` asks for so many packages, as near as the cart holds them. */
export function legalCart(seed: number, number: number, wanted?: number): LegalCart {
  for (let attempt = 0; ; attempt += 1) {
    const cart = tryCart(randomFrom(seed, number, attempt), number, wanted);
    if (cart) return cart;
  }
}

type Maker = (site: Site) => Block | null;

const small: Maker = (site) =>
  basketOfOne(
    site,
    site.items.filter((item) => item.code === 'C-14'),
  );
const tray: Maker = (site) => oneOf(site, ['wrapped-tray']);
const container: Maker = (site) => oneOf(site, ['rigid-container']);
const basin: Maker = (site) => oneOf(site, ['basin']);
const flatPouch: Maker = (site) => {
  const items = site.items.filter((item) => item.kind === 'pouch' && item.pose === 'flat');
  return items.length > 0 ? singleBlock(site, site.random.pick(items), site.random.pick([0, 90])) : null;
};
const textile: Maker = (site) => oneOf(site, ['textile-pack']);

/** What a cart mostly holds: each maker as often as it is named. */
const mixes: readonly (readonly Maker[])[] = [
  [rackBlock, rackBlock, rackBlock, basketOfPouches, tray],
  [tray, tray, container, stackBlock, spacedTrays, rackBlock],
  [container, stackBlock, tray],
  [tray, container, basin, textile, rackBlock, rackBlock, basketOfPouches, small, spacedTrays, stackBlock, flatPouch],
  [container, container, stackBlock, stackBlock, spacedTrays],
  [textile, textile, tray, basin, rackBlock],
  [basin, basin, tray, rackBlock, textile],
  [rackBlock],
  [basketOfPouches, basketOfPouches, rackBlock, small],
];
const manyPouches: readonly Maker[] = [rackBlock, rackBlock, rackBlock, rackBlock, basketOfPouches, tray, textile];

function tryCart(random: Random, number: number, asked: number | undefined): LegalCart | null {
  const wanted = asked ?? Math.round(2 * 100 ** random.next());
  const policy = houseRules(random);
  const { sterilizer, cart } = roomFor(random, wanted);
  const program = programFor(random);
  const catalogue = variedCatalogue(random, program, policy.facing);
  const device = challengeDeviceFor(catalogue, program, random);
  const items = catalogue.filter(
    (item) => mayGoIn(item, program, policy) && (!item.isImplant || mayHoldImplants(device, policy)),
  );
  const needsDevice = policy.challengeDevice === 'every-load' || random.chance(0.3);
  const hasDevice = needsDevice && policy.challengeDevice !== 'not-asked';
  if (hasDevice && !device) return null;
  const withoutImplants = hasDevice || policy.challengeDevice === 'not-asked';
  const usable = withoutImplants ? items : items.filter((item) => !item.isImplant);

  const facing = facingIn(catalogue, policy.facing);
  const filling = new Filling({ random, policy, facing, program, sterilizer, cart, items: usable, wanted });
  if (hasDevice && device && !filling.putOverDrain(device)) return null;
  filling.fill(wanted > 45 ? manyPouches : random.pick(mixes));
  if (filling.packages.length < (asked ?? 2)) return null;

  const view: LoadView = {
    loadId: `load ${number}`,
    sterilizer,
    program,
    qualifiedPrograms: random.shuffled([
      program,
      ...programs.filter((one) => one.id !== program.id && random.chance(0.5)),
    ]),
    cart,
    holders: filling.holders,
    holderKinds,
    items: catalogue,
    packages: random.shuffled(filling.packages),
    counts: [],
    acceptances: [],
    airRemoval:
      sterilizer.needsAirRemovalTest || random.chance(0.5)
        ? { result: 'passed', testedAt: random.pick(todayIn) }
        : null,
    today,
  };
  const counts = cart.shelves.map((shelf) => ({ shelfId: shelf.id, counted: filling.countOn(shelf) }));
  const counted = { ...view, counts };
  return { number, view: random.chance(0.15) ? justEnough(counted, policy) : counted, policy };
}

/** The same load on equipment that takes exactly this much and no more. */
function justEnough(view: LoadView, policy: LoadPolicy): LoadView {
  const placed = placedOn(view);
  const massOn = (shelfId: string | null) => {
    const items = placed.filter((each) => shelfId === null || each.shelfId === shelfId).map(({ item }) => item);
    const holders = view.holders.filter((holder) => shelfId === null || holder.shelfId === shelfId);
    const masses = [...items, ...holders.map((holder) => kindOf(view, holder))].map(({ massKg }) => massKg);
    return kg(Number(masses.reduce<number>((sum, mass) => sum + mass, 0).toFixed(6)));
  };
  const isMassExact = policy.massMarginPercent === 0;
  const shelves = view.cart.shelves.map((shelf) => {
    const tops = placed.filter((each) => each.shelfId === shelf.id).map(({ top }) => top);
    if (tops.length === 0) return shelf;
    const clearHeightMm = mm(Math.max(...tops) + policy.headroomMm);
    return { ...shelf, clearHeightMm, ...(isMassExact ? { greatestMassKg: massOn(shelf.id) } : {}) };
  });
  const sterilizer = isMassExact ? { ...view.sterilizer, greatestLoadMassKg: massOn(null) } : view.sterilizer;
  return { ...view, sterilizer, cart: { ...view.cart, shelves } };
}

function programFor(random: Random): Program {
  const code = random.pick([
    'W4-30',
    'W4-30',
    'W4-20',
    'W4-40',
    'W4-40',
    'W4-50',
    'W4-50',
    'T4-20',
    'P18-30',
    'W3-16',
    'G121-30',
  ]);
  const program = programs.find((one) => one.code === code);
  if (!program) throw new Error(`the demonstration has no program ${code}`);
  return random.chance(0.6) ? program : { ...program, greatestLoadMassKg: kg(random.pick([40, 60, 90])) };
}

function challengeDeviceFor(items: readonly CatalogueItem[], program: Program, random: Random): CatalogueItem | null {
  const devices = items.filter((item) => item.kind === 'challenge-device' && permits(item, program));
  return devices.length > 0 ? random.pick(devices) : null;
}

function mayHoldImplants(device: CatalogueItem | null, policy: LoadPolicy): boolean {
  return device !== null || policy.challengeDevice === 'not-asked';
}

function mayGoIn(item: CatalogueItem, program: Program, policy: LoadPolicy): boolean {
  return item.kind !== 'challenge-device' && permits(item, program) && item.massKg <= massLimitOf(item, policy);
}

type Plan = Pick<Site, 'random' | 'policy' | 'facing' | 'program' | 'items' | 'wanted'> &
  Pick<LoadView, 'sterilizer' | 'cart'>;

/** One cart being filled, shelf by shelf and block by block. */
class Filling {
  readonly holders: LoadHolder[] = [];
  readonly packages: LoadPackage[] = [];
  readonly #plan: Plan;
  readonly #decks: readonly Deck[];
  readonly #sides: ReadonlyMap<string, Site['paperTowards']>;
  readonly #counts = new Map<string, number>();
  readonly #greatestMassKg: number;
  #massKg = 0;
  #ids = 0;

  constructor(plan: Plan) {
    this.#plan = plan;
    const { random, policy, program, sterilizer, cart } = plan;
    const isWhole = random.chance(0.85);
    this.#decks = cart.shelves
      .filter((shelf) => shelf.isUsable)
      .map((shelf) => new Deck(shelf, sterilizer, policy, isWhole));
    const side = () => random.pick(['left', 'right'] as const);
    this.#sides = new Map(cart.shelves.map((shelf) => [shelf.id, { x: side(), y: side() }]));
    const limit = Math.min(sterilizer.greatestLoadMassKg, program.greatestLoadMassKg ?? Infinity);
    this.#greatestMassKg = limit * (1 - policy.massMarginPercent / 100);
  }

  countOn(shelf: Shelf): number {
    return this.#counts.get(shelf.id) ?? 0;
  }

  fill(makers: readonly Maker[]): void {
    const { random, wanted } = this.#plan;
    for (let failures = 0; failures < 40 + wanted / 2 && this.packages.length < wanted;) {
      const deck = random.pick(this.#decks);
      const maker = random.chance(0.03) ? emptyHolder : random.pick(makers);
      const block = maker(this.#siteOn(deck.shelf));
      if (!block || block.items.length > wanted - this.packages.length || !this.#place(deck, block)) failures += 1;
    }
  }

  /** The challenge device goes over the drain, on the lowest shelf, before everything else. */
  putOverDrain(device: CatalogueItem): boolean {
    const { random, sterilizer, policy } = this.#plan;
    const deck = this.#decks.find((one) => one.shelf.level === 1);
    if (!deck) return false;
    const turn = random.pick([0, 90] as const);
    const site = this.#siteOn(deck.shelf);
    const inBasket = random.chance(0.15) ? basketOfOne(site, [device]) : null;
    const block = inBasket ?? singleBlock(site, device, turn);
    const size = inBasket ?? sizeOf(device, device.pose, turn);
    for (let inset = 0; inset <= 60; inset += 1) {
      const x = within(Math.round(sterilizer.drainXMm - size.dx / 2), inset, deck.shelf.widthMm - size.dx - inset);
      const y = within(Math.round(sterilizer.drainYMm - size.dy / 2), inset, deck.shelf.depthMm - size.dy - inset);
      const away = Math.hypot(x + size.dx / 2 - sterilizer.drainXMm, y + size.dy / 2 - sterilizer.drainYMm);
      // In a basket it may lie anywhere: all of the basket has to be near.
      const spread = inBasket ? Math.hypot(size.dx, size.dy) / 2 : 0;
      if (away + spread > policy.challengeDeviceReachMm - 5) return false;
      if (deck.hasRoomFor(block) && deck.isFree(block, x, y)) {
        this.#add(deck, block, x, y);
        return true;
      }
    }
    return false;
  }

  #siteOn(shelf: Shelf): Site {
    const { random, policy, facing, program, items, wanted } = this.#plan;
    return {
      random,
      policy,
      facing,
      program,
      items,
      holderKinds,
      shelf,
      wanted: wanted - this.packages.length,
      nextId: (word) => `${word} ${(this.#ids += 1)}`,
      paperTowards: this.#sides.get(shelf.id) ?? { x: 'left', y: 'left' },
    };
  }

  #place(deck: Deck, block: Block): boolean {
    if (!deck.hasRoomFor(block) || this.#massKg + massOf(block) > this.#greatestMassKg) return false;
    const spot = deck.findSpot(block, this.#plan.random, (rect) => this.#keepsTextilesDry(deck.shelf, block, rect));
    if (!spot) return false;
    this.#add(deck, block, spot.x, spot.y);
    return true;
  }

  /** No metal on a higher shelf above a textile pack; a rack counts as metal, and shelves of unequal width as wholly above. */
  #keepsTextilesDry(shelf: Shelf, block: Block, rect: Rect): boolean {
    return this.#decks.every((deck) => {
      if (deck.shelf.id === shelf.id) return true;
      return deck.standing.every((one) => {
        const [upper, lower] = deck.shelf.level > shelf.level ? [one.block, block] : [block, one.block];
        if (!isTextile(lower) || !this.#isMetal(upper)) return true;
        return deck.shelf.widthMm === shelf.widthMm && gapOf(one.rect, rect) > 0;
      });
    });
  }

  #isMetal(block: Block): boolean {
    const least = this.#plan.policy.metalOverTextileKg;
    return block.holderKinds.length > 0 || block.items.some((item) => item.metalMassKg >= least);
  }

  #add(deck: Deck, block: Block, x: number, y: number): void {
    const { random } = this.#plan;
    const put = block.put(deck.shelf.id, x, y);
    deck.add(block, x, y);
    this.#massKg += massOf(block);
    this.#counts.set(deck.shelf.id, this.countOn(deck.shelf) + put.packages.length);
    this.holders.push(...put.holders.map((one) => loadHolder(one, deck.shelf.id)));
    this.packages.push(...put.packages.map((one) => loadPackage(one, random)));
  }
}

function isTextile(block: Block): boolean {
  return block.items.some((item) => item.kind === 'textile-pack');
}

function within(value: number, least: number, greatest: number): number {
  return Math.max(least, Math.min(value, Math.floor(greatest)));
}

function loadHolder(one: PutHolder, shelfId: string): LoadHolder {
  return { ...one, name: one.holderId, placeCode: `code ${one.holderId}`, shelfId };
}

export function loadPackage({ packageId, item, placement }: PutPackage, random: Random): LoadPackage {
  return {
    packageId,
    code: `label ${packageId}`,
    itemId: item.id,
    isScanned: true,
    placement,
    state: 'in-load',
    heldReason: null,
    expiresOn: random.pick([null, null, today, '2026-03-11', '2026-09-01', '2027-01-31']),
    hasExternalIndicator: true,
    hasInternalIndicator: true,
  };
}
