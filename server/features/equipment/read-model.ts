import type { AirRemovalState, Cart, HolderKind, Program, Shelf, Sterilizer } from '#domain/load/model';
import type { Db, Transaction } from '../../platform/db';
import {
  holderKindFromRow,
  programFromRow,
  shelfFromRow,
  sterilizerFromRow,
  type CartRow,
  type HolderKindRow,
  type HolderRow,
  type ProgramRow,
  type ShelfRow,
  type SterilizerRow,
} from './equipment-rows';

export type SizeClass = 'large' | 'small';
export type SizedSterilizer = Sterilizer & { readonly sizeClass: SizeClass };
export type SizedCart = Cart & { readonly sizeClass: SizeClass; readonly isUsable: boolean; readonly note: string };
export type Holder = {
  readonly holderId: string;
  readonly name: string;
  readonly placeCode: string;
  readonly condition: 'good' | 'in-repair' | 'missing';
  readonly kind: HolderKind;
};
export type ShelfOfCart = { readonly shelf: Shelf; readonly cartId: string; readonly cartCode: string };

/** The facility's sterilizers by number, whatever their service state. */
export async function sterilizersOf(trx: Transaction | Db, facilityId: string): Promise<SizedSterilizer[]> {
  const rows = await trx('sterilizers')
    .where('sterilizers.facility_id', facilityId)
    .orderBy('sterilizers.code')
    .select<SterilizerRow[]>('sterilizers.*');
  return rows.map((row) => ({ ...sterilizerFromRow(row), sizeClass: row.size_class }));
}

export async function sterilizerById(
  trx: Transaction | Db,
  facilityId: string,
  sterilizerId: string,
): Promise<SizedSterilizer | undefined> {
  const row = await trx('sterilizers')
    .where({ 'sterilizers.facility_id': facilityId, 'sterilizers.id': sterilizerId })
    .first<SterilizerRow | undefined>('sterilizers.*');
  return row && { ...sterilizerFromRow(row), sizeClass: row.size_class };
}

function programsOnPanels(trx: Transaction | Db, facilityId: string) {
  return trx('programs')
    .join('sterilizer_programs', 'sterilizer_programs.program_id', 'programs.id')
    .where({ 'programs.facility_id': facilityId, 'programs.is_retired': false })
    .orderBy('programs.code');
}

export type Panel = {
  /** What the sterilizer is qualified for and that is still in use, by code. */
  readonly qualified: readonly Program[];
  /** What its panel offers although it is not qualified for it, by code. */
  readonly unqualified: readonly Program[];
};

type PanelRow = ProgramRow & { readonly sterilizer_id: string; readonly is_qualified: boolean };

/** The panels of all the facility's sterilizers, in one reading. */
export async function panelsOf(trx: Transaction | Db, facilityId: string): Promise<(sterilizerId: string) => Panel> {
  const rows = await programsOnPanels(trx, facilityId).select<PanelRow[]>(
    'programs.*',
    'sterilizer_programs.sterilizer_id',
    'sterilizer_programs.is_qualified',
  );
  return (sterilizerId) => {
    const own = rows.filter((row) => row.sterilizer_id === sterilizerId);
    return {
      qualified: own.filter((row) => row.is_qualified).map(programFromRow),
      unqualified: own.filter((row) => !row.is_qualified).map(programFromRow),
    };
  };
}

/** A program of the facility, also one that is retired or that no sterilizer is qualified for. */
export async function programById(
  trx: Transaction | Db,
  facilityId: string,
  programId: string,
): Promise<Program | undefined> {
  const row = await trx('programs')
    .where({ 'programs.facility_id': facilityId, 'programs.id': programId })
    .first<ProgramRow | undefined>('programs.*');
  return row && programFromRow(row);
}

/** Programs this sterilizer is qualified for and that are still in use, by code. */
export async function qualifiedPrograms(
  trx: Transaction | Db,
  facilityId: string,
  sterilizerId: string,
): Promise<Program[]> {
  const rows = await programsOnPanels(trx, facilityId)
    .where({ 'sterilizer_programs.sterilizer_id': sterilizerId, 'sterilizer_programs.is_qualified': true })
    .select<ProgramRow[]>('programs.*');
  return rows.map(programFromRow);
}

function cartOf(row: CartRow, shelves: readonly ShelfRow[]): SizedCart {
  return {
    id: row.id,
    code: row.code,
    name: row.name,
    sizeClass: row.size_class,
    isUsable: row.is_usable,
    note: row.note,
    shelves: shelves.filter((shelf) => shelf.cart_id === row.id).map(shelfFromRow),
  };
}

/** The facility's carts by code, each with its shelves from the lowest up. */
export async function cartsOf(trx: Transaction | Db, facilityId: string): Promise<SizedCart[]> {
  const carts = await trx('carts')
    .where('carts.facility_id', facilityId)
    .orderBy('carts.code')
    .select<CartRow[]>('carts.*');
  const shelves = await trx('shelves')
    .whereIn(
      'shelves.cart_id',
      carts.map((cart) => cart.id),
    )
    .orderBy('shelves.level')
    .select<ShelfRow[]>('shelves.*');
  return carts.map((cart) => cartOf(cart, shelves));
}

export async function cartWithShelves(
  trx: Transaction | Db,
  facilityId: string,
  cartId: string,
): Promise<SizedCart | undefined> {
  const cart = await trx('carts')
    .where({ 'carts.facility_id': facilityId, 'carts.id': cartId })
    .first<CartRow | undefined>('carts.*');
  if (!cart) return undefined;
  const shelves = await trx('shelves')
    .where('shelves.cart_id', cartId)
    .orderBy('shelves.level')
    .select<ShelfRow[]>('shelves.*');
  return cartOf(cart, shelves);
}

export async function shelfByPlaceCode(
  trx: Transaction | Db,
  facilityId: string,
  placeCode: string,
): Promise<ShelfOfCart | undefined> {
  const row = await trx('shelves')
    .join('carts', 'carts.id', 'shelves.cart_id')
    .where({ 'carts.facility_id': facilityId, 'shelves.place_code': placeCode })
    .first<(ShelfRow & { readonly cart_code: string }) | undefined>('shelves.*', 'carts.code as cart_code');
  return row && { shelf: shelfFromRow(row), cartId: row.cart_id, cartCode: row.cart_code };
}

/** Every kind of holder the facility has, by code. */
export async function holderKinds(trx: Transaction | Db, facilityId: string): Promise<HolderKind[]> {
  const rows = await trx('holder_kinds')
    .where('holder_kinds.facility_id', facilityId)
    .orderBy('holder_kinds.code')
    .select<HolderKindRow[]>('holder_kinds.*');
  return rows.map(holderKindFromRow);
}

async function holderWhere(
  trx: Transaction | Db,
  facilityId: string,
  column: 'holders.id' | 'holders.place_code',
  value: string,
): Promise<Holder | undefined> {
  const row = await trx('holders')
    .where({ 'holders.facility_id': facilityId, [column]: value })
    .first<HolderRow | undefined>('holders.*');
  if (!row) return undefined;
  const kind = await trx('holder_kinds')
    .where('holder_kinds.id', row.holder_kind_id)
    .first<HolderKindRow | undefined>('holder_kinds.*');
  if (!kind) return undefined;
  return {
    holderId: row.id,
    name: row.name,
    placeCode: row.place_code,
    condition: row.condition,
    kind: holderKindFromRow(kind),
  };
}

export function holderByPlaceCode(
  trx: Transaction | Db,
  facilityId: string,
  placeCode: string,
): Promise<Holder | undefined> {
  return holderWhere(trx, facilityId, 'holders.place_code', placeCode);
}

export function holderById(trx: Transaction | Db, facilityId: string, holderId: string): Promise<Holder | undefined> {
  return holderWhere(trx, facilityId, 'holders.id', holderId);
}

type TestRow = { readonly sterilizer_id: string; readonly result: 'passed' | 'failed'; readonly tested_at: Date };

/**
 * The last air-removal test of the facility's day (YYYY-MM-DD) of each sterilizer: a passed retest counts, and so does a
 * failed one.
 */
export async function airRemovalsOfDay(
  trx: Transaction | Db,
  facilityId: string,
  day: string,
): Promise<(sterilizerId: string) => AirRemovalState> {
  const rows = await lastTests(trx, facilityId, day);
  return (sterilizerId) => stateOf(rows.find((row) => row.sterilizer_id === sterilizerId));
}

/** The same, of one sterilizer. */
export async function airRemovalOfDay(
  trx: Transaction | Db,
  facilityId: string,
  sterilizerId: string,
  day: string,
): Promise<AirRemovalState> {
  const [row] = await lastTests(trx, facilityId, day).where('air_removal_tests.sterilizer_id', sterilizerId);
  return stateOf(row);
}

function lastTests(trx: Transaction | Db, facilityId: string, day: string) {
  return trx('air_removal_tests')
    .distinctOn('air_removal_tests.sterilizer_id')
    .where({ 'air_removal_tests.facility_id': facilityId, 'air_removal_tests.test_day': day })
    .orderBy([
      { column: 'air_removal_tests.sterilizer_id' },
      { column: 'air_removal_tests.tested_at', order: 'desc' },
      { column: 'air_removal_tests.id', order: 'desc' },
    ])
    .select<TestRow[]>('air_removal_tests.sterilizer_id', 'air_removal_tests.result', 'air_removal_tests.tested_at');
}

function stateOf(row: TestRow | undefined): AirRemovalState {
  return row ? { result: row.result, testedAt: row.tested_at.toISOString() } : null;
}
