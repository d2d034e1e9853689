import { holderListResponseSchema } from '../../src/contract/equipment';
import { itemListResponseSchema } from '../../src/contract/items';
import {
  closeLoadResponseSchema,
  loadChangeResponseSchema,
  loadDetailSchema,
  loadOpeningOptionsSchema,
  openLoadResponseSchema,
  scanResponseSchema,
  type ScanPlace,
} from '../../src/contract/loads';
import { packResponseSchema } from '../../src/contract/packages';
import { paths } from '../../src/contract/paths';
import { addRunResponseSchema, stagePackagesResponseSchema } from '../../src/contract/runs';
import { shelfIdOf } from '../../src/domain/load/look-up';
import { mm } from '../../src/domain/units/quantity';
import type { Caller } from '../running/caller';

type Piece = { readonly id: string; readonly code: string; readonly item: string };
type Contents = readonly (readonly [item: string, quantity: number])[];

/** Packed as the packing station does it, all said of it that can be said. */
async function pack(caller: Caller, contents: Contents): Promise<Piece[]> {
  const pieces: Piece[] = [];
  for (const [item, quantity] of contents) {
    const { items } = await caller.get(`${paths.items}?search=${item}`, itemListResponseSchema);
    const { packages } = await caller.post(
      paths.packages,
      {
        itemId: items.find(({ code }) => code === item)?.id,
        quantity,
        isContentsConfirmed: true,
        hasInternalIndicator: true,
        hasExternalIndicator: true,
        destination: '',
      },
      packResponseSchema,
    );
    pieces.push(...packages.map(({ id, code }) => ({ id, code, item })));
  }
  return pieces;
}

async function stage(caller: Caller, name: string, pieces: readonly Piece[]): Promise<string> {
  const { runId } = await caller.post(
    paths.runs,
    { name, sterilizerId: null, programId: null, wantedAt: null },
    addRunResponseSchema,
  );
  const packageIds = pieces.map(({ id }) => id);
  await caller.post(`${paths.run(runId)}/packages`, { packageIds }, stagePackagesResponseSchema);
  return runId;
}

type Opening = { readonly sterilizer: string; readonly program: string; readonly runId: string | null };

/** A load on a sterilizer, its first free cart and a program. */
export async function openLoad(caller: Caller, { sterilizer, program, runId }: Opening): Promise<string> {
  const { sterilizers } = await caller.get(`${paths.loads}/opening-options`, loadOpeningOptionsSchema);
  const option = sterilizers.find((one) => one.sterilizer.code === sterilizer);
  const cart = option?.carts.find(({ isFree }) => isFree);
  const programId = option?.programs.find(({ code }) => code === program)?.id;
  if (!option || !cart || programId === undefined) throw new Error(`Nothing is free at ${sterilizer} for ${program}.`);
  const { loadId } = await caller.post(
    paths.loads,
    { sterilizerId: option.sterilizer.id, programId, cartId: cart.id, runId },
    openLoadResponseSchema,
  );
  return loadId;
}

export async function scanInto(
  caller: Caller,
  loadId: string,
  raw: string,
  place: ScanPlace | null = null,
): Promise<ScanPlace | null> {
  const reply = await caller.post(`${paths.load(loadId)}/scans`, { raw, entry: 'wedge', place }, scanResponseSchema);
  if (reply.answer !== 'taken' && reply.answer !== 'place-set') throw new Error(`${raw}: ${reply.sentence}`);
  return reply.place;
}

/** One wrapped set, scanned, counted and closed: for the day's screen. */
export async function closeSmallLoad(caller: Caller): Promise<void> {
  const [set] = await pack(caller, [['W-03', 1]]);
  const loadId = await openLoad(caller, { sterilizer: 'ST-1', program: 'W4-30', runId: null });
  await scanInto(caller, loadId, set?.code ?? '');
  const { view } = await caller.get(paths.load(loadId), loadDetailSchema);
  for (const shelf of view.cart.shelves) {
    const counted = view.packages.filter(({ placement }) => shelfIdOf(view, placement) === shelf.id).length;
    await caller.post(`${paths.load(loadId)}/counts`, { shelfId: shelf.id, counted }, loadChangeResponseSchema);
  }
  await caller.post(`${paths.load(loadId)}/close`, {}, closeLoadResponseSchema);
}

/** What a load looks like to one who builds it: some of everything, a few things to put right, some on the table. */
const some: Contents = [
  ['P-01', 4],
  ['P-02', 4],
  ['P-03', 4],
  ['P-04', 4],
  ['C-14', 3],
  ['W-01', 1],
  ['W-08', 1],
  ['W-10', 1],
  ['W-11', 1],
  ['PCD-02', 1],
];

/** @returns the load; the place code of a rack with room, and the codes of two pouches to scan at the screen itself */
export async function buildTellingLoad(
  caller: Caller,
): Promise<{ readonly loadId: string; readonly rack: string; readonly next: readonly [string, string] }> {
  const pieces = await pack(caller, some);
  const of = (item: string) => pieces.filter((piece) => piece.item === item);
  const runId = await stage(caller, 'Room 4, second list', pieces);
  const loadId = await openLoad(caller, { sterilizer: 'ST-1', program: 'W4-30', runId });
  const { view } = await caller.get(paths.load(loadId), loadDetailSchema);
  const { holders } = await caller.get(`${paths.holders}?kind=RS&pageSize=50`, holderListResponseSchema);
  const [firstRack = '', secondRack = ''] = holders.map(({ placeCode }) => placeCode);
  const [lower, upper] = view.cart.shelves;
  if (!lower || !upper) throw new Error('The cart has no two shelves.');
  const scanAll = async (items: readonly string[], place: ScanPlace | null) => {
    for (const item of items) for (const piece of of(item)) await scanInto(caller, loadId, piece.code, place);
  };

  const onLower = await scanInto(caller, loadId, lower.placeCode);
  await scanAll(['P-01', 'P-02'], await scanInto(caller, loadId, firstRack, onLower));
  await scanAll(['P-03'], await scanInto(caller, loadId, secondRack, onLower));
  await scanAll(['W-10', 'W-11'], onLower);
  await scanAll(['C-14', 'W-01', 'PCD-02'], await scanInto(caller, loadId, upper.placeCode));

  // What happens on every shift: a pouch the wrong way round, a tray laid on a lid, a count that is one off.
  const [turned] = of('P-02');
  const [tray] = of('W-01');
  const [container] = of('C-14');
  if (!turned || !tray || !container) throw new Error('Something was not packed.');
  const onLid = {
    at: 'package',
    belowPackageId: container.id,
    xMm: mm(0),
    yMm: mm(0),
    turn: 0,
    pose: 'flat',
    paper: null,
  };
  for (const edit of [
    { edit: 'turn-paper', packageId: turned.id, paper: 'right' },
    { edit: 'place', packageId: tray.id, placement: onLid },
  ]) {
    await caller.post(`${paths.load(loadId)}/edits`, { edits: [edit] }, loadChangeResponseSchema);
  }
  await caller.post(`${paths.load(loadId)}/counts`, { shelfId: upper.id, counted: 6 }, loadChangeResponseSchema);
  const [one, other] = of('P-04').map(({ code }) => code);
  return { loadId, rack: secondRack, next: [one ?? '', other ?? ''] };
}
