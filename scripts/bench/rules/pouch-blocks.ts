import type { CatalogueItem, HolderKind, Turn } from '../../../src/domain/load/model';
import { mm } from '../../../src/domain/units/quantity';
import { clearanceOf, paperSides, putHolder, turnOf, type Block, type Site } from './block';
import { holderSize, leanDegrees, sizeOf } from './geometry';

/* Racks and baskets with pouches in them, and small things in a basket. */

function isLowEnough(site: Site, heightMm: number): boolean {
  return heightMm + site.policy.headroomMm <= site.shelf.clearHeightMm;
}

/** A rack fits a pouch that goes in and that cannot lean far between its neighbours' slots. */
export function fitsRack(item: CatalogueItem, kind: HolderKind): boolean {
  return (
    item.kind === 'pouch' &&
    item.pose === 'on-edge' &&
    item.widthMm <= (kind.greatestHeightMm ?? 0) &&
    item.lengthMm <= (kind.greatestLengthMm ?? 0) &&
    item.heightMm <= (kind.greatestThicknessMm ?? 0) &&
    (kind.pitchMm ?? 0) - item.heightMm <= item.widthMm * Math.tan((18 * Math.PI) / 180)
  );
}

export function rackBlock(site: Site): Block | null {
  const { random, policy } = site;
  const kind = random.pick(site.holderKinds.filter((each) => each.form === 'rack'));
  const slots = kind.slots ?? 0;
  const pitch = kind.pitchMm ?? 0;
  const pouches = site.items.filter((item) => fitsRack(item, kind) && isLowEnough(site, item.widthMm));
  if (pouches.length === 0) return null;
  const filled: { readonly slot: number; readonly item: CatalogueItem }[] = [];
  const share = random.pick([0.4, 0.8, 1, 1]);
  for (let slot = 1; slot <= slots && filled.length < site.wanted; slot += 1) {
    if (!random.chance(share)) continue;
    const item = random.pick(pouches);
    const before = filled.at(-1);
    if (before) {
      const gap = (slot - before.slot) * pitch - (before.item.heightMm + item.heightMm) / 2;
      if (gap < Math.max(clearanceOf(before.item, policy), clearanceOf(item, policy))) continue;
    }
    filled.push({ slot, item });
  }
  if (filled.length === 0) return null;
  const turn = turnOf(random);
  const sides = paperSides(site, turn === 0 ? 'x' : 'y', filled.length);
  const holderId = site.nextId('holder');
  const packages = filled.map((one, index) => ({
    ...one,
    packageId: site.nextId('package'),
    paper: sides[index] ?? null,
  }));
  return {
    ...holderSize(kind, turn),
    dz: Math.max(...filled.map(({ item }) => item.widthMm)),
    clearanceMm: Math.max(...filled.map(({ item }) => clearanceOf(item, policy))),
    insetMm: 5,
    items: filled.map(({ item }) => item),
    holderKinds: [kind],
    put: (_shelfId, x, y) => ({
      holders: [putHolder(holderId, kind, x, y, turn)],
      packages: packages.map(({ packageId, item, slot, paper }) => ({
        packageId,
        item,
        placement: { at: 'slot', holderId, slot, pose: 'on-edge', paper },
      })),
    }),
  };
}

type Row = { readonly items: readonly CatalogueItem[]; readonly gap: number; readonly wall: number };

/** Pouches one behind another across a basket, so close that none can lean far, and apart enough for steam and labels. */
function rowAcross(site: Site, pouches: readonly CatalogueItem[], span: number): Row | null {
  const { random, policy } = site;
  for (let attempt = 0; attempt < 12; attempt += 1) {
    const count = random.whole(2, Math.min(12, Math.max(2, site.wanted)));
    const items = Array.from({ length: count }, () => random.pick(pouches));
    const thick = items.reduce((sum, item) => sum + item.heightMm, 0);
    const gap = Math.floor((span - thick - 2 * random.whole(0, 8)) / (count - 1));
    const wall = Math.floor((span - thick - gap * (count - 1)) / 2);
    const least = Math.max(policy.labelReadingGapMm, ...items.map((item) => clearanceOf(item, policy)));
    if (gap < least || wall < 0 || wall > 12) continue;
    const lowest = Math.min(...items.map((item) => item.widthMm));
    const lean = Math.max(...items.map((item) => leanDegrees(item.widthMm, item.heightMm, gap, lowest)));
    if (lean <= policy.greatestLeanDeg - 2) return { items, gap, wall };
  }
  return null;
}

export function basketOfPouches(site: Site): Block | null {
  const { random, policy } = site;
  const kind = random.pick(site.holderKinds.filter((each) => each.form === 'basket'));
  const pouchTurn = turnOf(random);
  const [span, room] = pouchTurn === 0 ? [kind.acrossMm, kind.alongMm] : [kind.alongMm, kind.acrossMm];
  const pouches = site.items.filter(
    (item) =>
      item.kind === 'pouch' && item.pose === 'on-edge' && item.lengthMm <= room && isLowEnough(site, item.widthMm),
  );
  if (pouches.length === 0 || site.wanted < 2) return null;
  const row = rowAcross(site, pouches, span);
  if (row === null) return null;
  // What "left" means of a pouch turned in a turned basket, people may take either way; nobody is asked to here.
  const turn = pouchTurn === 90 && site.facing === 'one-way' ? 0 : turnOf(random);
  const sides = paperSides(site, pouchTurn === turn ? 'x' : 'y', row.items.length);
  const holderId = site.nextId('holder');
  let across = row.wall;
  const packages = row.items.map((item, index) => {
    const at = across;
    across += item.heightMm + row.gap;
    const along = Math.floor((room - item.lengthMm) / 2);
    const [x, y] = pouchTurn === 0 ? [at, along] : [along, at];
    return { packageId: site.nextId('package'), item, x, y, paper: sides[index] ?? null };
  });
  return {
    ...holderSize(kind, turn),
    dz: Math.max(...row.items.map((item) => item.widthMm)),
    // The film of the last one looks out of the basket, and its label is to be read too.
    clearanceMm: Math.max(policy.labelReadingGapMm, ...row.items.map((item) => clearanceOf(item, policy))),
    insetMm: 0,
    items: row.items,
    holderKinds: [kind],
    put: (_shelfId, left, front) => ({
      holders: [putHolder(holderId, kind, left, front, turn)],
      packages: packages.map(({ packageId, item, x, y, paper }) => ({
        packageId,
        item,
        placement: { at: 'basket', holderId, xMm: mm(x), yMm: mm(y), turn: pouchTurn, pose: 'on-edge', paper },
      })),
    }),
  };
}

/** A rack, basket, wedge or spacer that nobody has used. */
export function emptyHolder(site: Site): Block | null {
  const kind = site.random.pick(site.holderKinds);
  const turn = turnOf(site.random);
  const holderId = site.nextId('holder');
  return {
    ...holderSize(kind, turn),
    dz: 0,
    clearanceMm: 0,
    insetMm: 0,
    items: [],
    holderKinds: [kind],
    put: (_shelfId, x, y) => ({ holders: [putHolder(holderId, kind, x, y, turn)], packages: [] }),
  };
}

/** A small container or challenge device lying in a basket. */
export function basketOfOne(site: Site, small: readonly CatalogueItem[]): Block | null {
  const { random, policy } = site;
  const kind = random.pick(site.holderKinds.filter((each) => each.form === 'basket'));
  const item = small.length > 0 ? random.pick(small) : null;
  if (!item || item.pose !== 'flat') return null;
  const inside = ([0, 90] as const).filter((each: Turn) => {
    const size = sizeOf(item, 'flat', each);
    return size.dx <= kind.acrossMm && size.dy <= kind.alongMm;
  });
  const [itemTurn] = random.shuffled(inside);
  if (itemTurn === undefined || !isLowEnough(site, item.heightMm)) return null;
  const size = sizeOf(item, 'flat', itemTurn);
  const x = random.whole(0, Math.floor(kind.acrossMm - size.dx));
  const y = random.whole(0, Math.floor(kind.alongMm - size.dy));
  const turn = turnOf(random);
  const holderId = site.nextId('holder');
  const packageId = site.nextId('package');
  return {
    ...holderSize(kind, turn),
    dz: size.dz,
    clearanceMm: clearanceOf(item, policy),
    insetMm: 0,
    items: [item],
    holderKinds: [kind],
    put: (_shelfId, left, front) => ({
      holders: [putHolder(holderId, kind, left, front, turn)],
      packages: [
        {
          packageId,
          item,
          placement: { at: 'basket', holderId, xMm: mm(x), yMm: mm(y), turn: itemTurn, pose: 'flat', paper: null },
        },
      ],
    }),
  };
}
