import { holderListResponseSchema } from '../../src/contract/equipment';
import { itemListResponseSchema } from '../../src/contract/items';
import {
  loadOpeningOptionsSchema,
  openLoadResponseSchema,
  scanResponseSchema,
  type ScanPlace,
} from '../../src/contract/loads';
import { packResponseSchema } from '../../src/contract/packages';
import { paths } from '../../src/contract/paths';
import { addRunResponseSchema, stagePackagesResponseSchema } from '../../src/contract/runs';
import type { Caller } from './caller';

/** Nine racks on one cart: five small ones below with eight slots each, four medium ones above with five. */
const racks = [
  { kind: 'RS', count: 5, slots: 8, shelf: 1, items: ['P-01', 'P-02', 'P-03', 'P-04'] },
  { kind: 'RM', count: 4, slots: 5, shelf: 2, items: ['P-14'] },
] as const;

export type FullCart = {
  readonly loadId: string;
  /** Codes of the packages of the load that are still on the table. */
  readonly waiting: readonly string[];
  /** Place code of the rack in which the first of them belongs. */
  readonly placeCode: string;
};

type Pouch = { readonly id: string; readonly code: string };

/**
 * Packs and stages sixty pouches, opens a load of them and scans all but those that `wait` into nine racks, the way a
 * station does: through the API, place codes first. Small racks keep a free slot for each that waits.
 */
export async function fillCart(caller: Caller, { wait }: { readonly wait: number }): Promise<FullCart> {
  const pouches = new Map<string, Pouch[]>();
  for (const { count, slots, items } of racks) {
    for (const code of items) pouches.set(code, await pack(caller, code, (count * slots) / items.length));
  }
  const waiting = racks[0].items.flatMap((code) => pouches.get(code)?.at(-1) ?? []).slice(0, wait);
  const opened = await openLoadOf(caller, [...pouches.values()].flat());
  const { holders } = await caller.get(`${paths.holders}?pageSize=200`, holderListResponseSchema);

  async function scan(raw: string, place: ScanPlace | null): Promise<ScanPlace | null> {
    const path = `${paths.load(opened.loadId)}/scans`;
    const reply = await caller.post(path, { raw, entry: 'wedge', place }, scanResponseSchema);
    if (reply.answer !== 'taken' && reply.answer !== 'place-set') throw new Error(`${raw}: ${reply.sentence}`);
    return reply.place;
  }

  let lastRack = '';
  for (const { kind, count, slots, shelf, items } of racks) {
    const owned = holders.filter((holder) => holder.name.startsWith(`${kind}-`)).slice(0, count);
    for (const holder of owned) {
      const onShelf = await scan(opened.shelfCode(shelf), null);
      const place = await scan(holder.placeCode, onShelf);
      for (let slot = 0; slot < slots; slot += 1) {
        const pouch = pouches.get(items[slot % items.length] ?? items[0])?.shift();
        if (pouch && waiting.includes(pouch)) lastRack = holder.placeCode;
        else if (pouch) await scan(pouch.code, place);
      }
    }
  }
  return { loadId: opened.loadId, waiting: waiting.map(({ code }) => code), placeCode: lastRack };
}

async function pack(caller: Caller, code: string, quantity: number): Promise<Pouch[]> {
  const { items } = await caller.get(`${paths.items}?search=${code}`, itemListResponseSchema);
  const item = items.find((one) => one.code === code);
  if (!item) throw new Error(`The catalogue has no ${code}.`);
  const { packages } = await caller.post(
    paths.packages,
    {
      itemId: item.id,
      quantity,
      isContentsConfirmed: true,
      hasInternalIndicator: true,
      hasExternalIndicator: true,
      destination: '',
    },
    packResponseSchema,
  );
  return packages;
}

async function openLoadOf(
  caller: Caller,
  packages: readonly Pouch[],
): Promise<{ readonly loadId: string; readonly shelfCode: (level: number) => string }> {
  const { runId } = await caller.post(
    paths.runs,
    { name: 'A full cart of pouches', sterilizerId: null, programId: null, wantedAt: null },
    addRunResponseSchema,
  );
  await caller.post(
    `${paths.run(runId)}/packages`,
    { packageIds: packages.map(({ id }) => id) },
    stagePackagesResponseSchema,
  );
  const { sterilizers } = await caller.get(`${paths.loads}/opening-options`, loadOpeningOptionsSchema);
  const option = sterilizers.find(({ sterilizer }) => sterilizer.code === 'ST-1');
  const cart = option?.carts.find((one) => one.isFree);
  const program = option?.programs.find((one) => one.code === 'W4-20');
  if (!option || !cart || !program) throw new Error('No cart or program is free at the first sterilizer.');
  const { loadId } = await caller.post(
    paths.loads,
    { sterilizerId: option.sterilizer.id, programId: program.id, cartId: cart.id, runId },
    openLoadResponseSchema,
  );
  return { loadId, shelfCode: (level) => cart.shelves.find((one) => one.level === level)?.placeCode ?? '' };
}
