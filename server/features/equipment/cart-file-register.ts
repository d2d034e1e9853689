import { shelfLineSchema } from '#contract/equipment';
import { checkPlaceCode, checkShelfAgainstFirst } from '#domain/catalogue/check-equipment';
import { shelfColumns } from '#domain/catalogue/equipment-columns';
import type { ShelfFields, ShelfLine } from '#domain/catalogue/equipment-fields';
import { groupBy } from '../../platform/group-by';
import {
  keyOfCode,
  type FiledRegister,
  type Judge,
  type Kept,
  type WriteContext,
  type Written,
} from '../../platform/register/register';
import { listKeptCarts, putCarts, type CartOwn, type KeptCart, type KeptShelf } from './cart-store';
import { noteEquipment, noteImportOf, noteOf } from './equipment-history';

function keyOfLine({ cartCode, level }: Partial<ShelfLine>): string | null {
  const code = keyOfCode(cartCode);
  return code === null || level === undefined ? null : `${code} shelf ${level}`;
}

function lineOf(cart: KeptCart, shelf: KeptShelf): Kept<ShelfLine> {
  const { own } = cart;
  return {
    id: shelf.id,
    version: cart.version,
    fields: {
      ...shelf.fields,
      cartCode: own.code,
      cartName: own.name,
      sizeClass: own.sizeClass,
      isCartUsable: own.isUsable,
      cartNote: own.note,
      placeCode: shelf.placeCode,
    },
  };
}

function judge(kept: readonly Kept<ShelfLine>[]): Judge<ShelfLine> {
  const byKey = new Map(kept.map(({ fields }) => [keyOfLine(fields), fields]));
  return (candidates) => {
    const first = new Map<string, ShelfLine>();
    for (const line of candidates) if (!first.has(line.cartCode)) first.set(line.cartCode, line);
    return new Map(
      candidates.map((line) => [
        line,
        [
          ...checkShelfAgainstFirst(line, first.get(line.cartCode) ?? line),
          ...checkPlaceCode(line, byKey.get(keyOfLine(line))),
        ],
      ]),
    );
  };
}

function ownOf(line: ShelfLine): CartOwn {
  return {
    code: line.cartCode,
    name: line.cartName,
    sizeClass: line.sizeClass,
    isUsable: line.isCartUsable,
    note: line.cartNote,
  };
}

function shelfOf(line: ShelfLine): ShelfFields {
  return {
    level: line.level,
    name: line.name,
    widthMm: line.widthMm,
    depthMm: line.depthMm,
    clearHeightMm: line.clearHeightMm,
    surface: line.surface,
    greatestMassKg: line.greatestMassKg,
    isUsable: line.isUsable,
  };
}

async function write(context: WriteContext, written: readonly Written<ShelfLine>[]): Promise<void> {
  const { trx, actor, ids } = context;
  const kept = new Map((await listKeptCarts(trx, actor.facilityId)).map((cart) => [cart.own.code, cart]));
  const byCart = groupBy(written, ({ after }) => after.fields.cartCode);
  const carts = [...byCart].flatMap(([code, lines]) => {
    const first = lines[0]?.after.fields;
    if (first === undefined) return [];
    const before = kept.get(code);
    return [
      {
        id: before?.id ?? ids.next(),
        version: (before?.version ?? 0) + 1,
        own: ownOf(first),
        shelves: lines.map(({ after }) => ({
          id: after.id,
          placeCode: after.fields.placeCode,
          fields: shelfOf(after.fields),
        })),
      },
    ];
  });
  await putCarts(trx, actor.facilityId, carts);
  await noteEquipment(
    context,
    'shelf',
    written.map((one) => noteOf(one, keyOfLine(one.after.fields) ?? '')),
  );
}

/** Carts as a file states them: one line per shelf. */
export const cartFileRegister: FiledRegister<ShelfLine> = {
  name: 'cart',
  aNoun: 'a shelf',
  columns: shelfColumns,
  schema: shelfLineSchema,
  keyField: 'level',
  keyOf: keyOfLine,
  settle: (stated, before) => ({
    // The place code of what is there may be left empty: it stays.
    fields: { ...stated, placeCode: stated.placeCode ?? before?.placeCode ?? null },
    problems: [],
  }),
  list: async (trx, facilityId) =>
    (await listKeptCarts(trx, facilityId)).flatMap((cart) => cart.shelves.map((shelf) => lineOf(cart, shelf))),
  judge: (_trx, _facilityId, kept) => Promise.resolve(judge(kept)),
  write,
  noteImport: noteImportOf('shelf'),
};
