import { itemListResponseSchema } from '../../../src/contract/items';
import {
  closeLoadResponseSchema,
  loadChangeResponseSchema,
  loadDetailSchema,
  loadOpeningOptionsSchema,
  openLoadResponseSchema,
  scanResponseSchema,
} from '../../../src/contract/loads';
import { packResponseSchema } from '../../../src/contract/packages';
import { paths } from '../../../src/contract/paths';
import { shelfIdOf } from '../../../src/domain/load/look-up';
import type { Caller } from '../../../scripts/running/caller';

/** A load of one wrapped set, closed, through the API: for what comes after a close. */
export async function closeALoad(caller: Caller): Promise<string> {
  const { items } = await caller.get(`${paths.items}?search=W-03`, itemListResponseSchema);
  const packing = { quantity: 1, isContentsConfirmed: true, hasInternalIndicator: true, hasExternalIndicator: true };
  const { packages } = await caller.post(
    paths.packages,
    { ...packing, itemId: items.find((item) => item.code === 'W-03')?.id, destination: '' },
    packResponseSchema,
  );
  const { sterilizers } = await caller.get(`${paths.loads}/opening-options`, loadOpeningOptionsSchema);
  const option = sterilizers.find(({ sterilizer }) => sterilizer.code === 'ST-1');
  const { loadId } = await caller.post(
    paths.loads,
    {
      sterilizerId: option?.sterilizer.id,
      programId: option?.programs.find((program) => program.code === 'W4-30')?.id,
      cartId: option?.carts.find((cart) => cart.isFree)?.id,
      runId: null,
    },
    openLoadResponseSchema,
  );
  const load = paths.load(loadId);
  await caller.post(`${load}/scans`, { raw: packages[0]?.code, entry: 'wedge', place: null }, scanResponseSchema);
  const { view } = await caller.get(load, loadDetailSchema);
  for (const shelf of view.cart.shelves) {
    const counted = view.packages.filter((one) => shelfIdOf(view, one.placement) === shelf.id).length;
    await caller.post(`${load}/counts`, { shelfId: shelf.id, counted }, loadChangeResponseSchema);
  }
  await caller.post(`${load}/close`, {}, closeLoadResponseSchema);
  return loadId;
}
