import { checkCart } from '#domain/catalogue/check-equipment';
import type { CartFields } from '#domain/catalogue/equipment-fields';
import { keyOfCode, type Register, type WriteContext, type Written } from '../../platform/register/register';
import { listKeptCarts, putCarts } from './cart-store';
import { noteEquipment, noteOf } from './equipment-history';

/** What is stated of a shelf stands in the place of what was on its level; other levels stay as they are. */
function withShelves(stated: CartFields, before: CartFields | null): CartFields {
  const levels = new Set(stated.shelves.map((shelf) => shelf.level));
  const staying = before?.shelves.filter((shelf) => !levels.has(shelf.level)) ?? [];
  const shelves = [...staying, ...stated.shelves].sort((one, other) => one.level - other.level);
  return { ...stated, shelves };
}

async function write(context: WriteContext, written: readonly Written<CartFields>[]): Promise<void> {
  const { trx, actor, ids } = context;
  const kept = new Map((await listKeptCarts(trx, actor.facilityId)).map((cart) => [cart.id, cart]));
  const carts = written.map(({ after: { id, version, fields } }) => {
    const { shelves, ...own } = fields;
    const known = new Map(kept.get(id)?.shelves.map((shelf) => [shelf.fields.level, shelf]));
    return {
      id,
      version,
      own,
      shelves: shelves.map((shelf) => {
        const before = known.get(shelf.level);
        return { id: before?.id ?? ids.next(), placeCode: before?.placeCode ?? null, fields: shelf };
      }),
    };
  });
  await putCarts(trx, actor.facilityId, carts);
  await noteEquipment(
    context,
    'cart',
    written.map((one) => noteOf(one, one.after.fields.code)),
  );
}

/** Carts as a form states them: each with its shelves. */
export const cartRegister: Register<CartFields> = {
  name: 'cart',
  aNoun: 'a cart',
  keyField: 'code',
  keyOf: ({ code }) => keyOfCode(code),
  settle: (stated, before) => ({ fields: withShelves(stated, before), problems: checkCart(stated) }),
  list: async (trx, facilityId) =>
    (await listKeptCarts(trx, facilityId)).map(({ id, version, own, shelves }) => ({
      id,
      version,
      fields: { ...own, shelves: shelves.map((shelf) => shelf.fields) },
    })),
  judge: () => Promise.resolve(() => new Map()),
  write,
};
