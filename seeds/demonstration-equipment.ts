import type { Knex } from 'knex';
import { v7 } from 'uuid';
import type { HolderKindFields } from '../src/domain/catalogue/equipment-fields';
import { formatPlaceCode, type Place } from '../src/domain/label/place-code';
import type { ServiceState } from '../src/domain/load/model';
import { productionDay } from '../src/domain/time/production-day';
import {
  demonstrationHolderKinds,
  dynamicPrograms,
  gravityPrograms,
  hospitalCarts,
  hospitalSterilizers,
  immediatePrograms,
  largeCart,
  largeChamber,
  smallChamber,
  surgeryCenterSterilizers,
  type CartSeed,
  type SterilizerSeed,
} from './demonstration-equipment-plan';

async function takePlaceCodes(trx: Knex.Transaction, place: Place, count: number): Promise<string[]> {
  const { rows } = await trx.raw<{ rows: { number: number | string }[] }>(
    `select nextval('place_code_numbers') as number from generate_series(1, ?)`,
    [count],
  );
  return rows.map(({ number }) => formatPlaceCode(place, Number(number)));
}

async function seedPrograms(trx: Knex.Transaction, facilityId: string): Promise<ReadonlyMap<string, string>> {
  const greatestLoadMassKg: Readonly<Record<string, number>> = { 'T4-20': 40, 'P18-30': 60, 'G121-30': 40 };
  const all = [
    ...dynamicPrograms.map((program) => ['dynamic-air-removal', program] as const),
    ...gravityPrograms.map((program) => ['gravity', program] as const),
    ...immediatePrograms.map((program) => ['immediate-use', program] as const),
  ];
  const rows = all.map(([type, [code, name, temperatureC, exposureMin, dryMin]]) => ({
    id: v7(),
    facility_id: facilityId,
    code,
    name,
    cycle_type: type,
    temperature_c: temperatureC,
    exposure_s: exposureMin * 60,
    dry_s: dryMin * 60,
    greatest_load_mass_kg: greatestLoadMassKg[code] ?? null,
  }));
  await trx('programs').insert(rows);
  return new Map(rows.map((row) => [row.code, row.id]));
}

async function seedSterilizers(
  trx: Knex.Transaction,
  facilityId: string,
  sterilizers: readonly SterilizerSeed[],
): Promise<void> {
  const programs = await seedPrograms(trx, facilityId);
  for (const { number, isLarge, ...seed } of sterilizers) {
    const id = v7();
    const chamber = isLarge ? largeChamber : smallChamber;
    await trx('sterilizers').insert({
      id,
      facility_id: facilityId,
      code: `ST-${number}`,
      number,
      name: seed.name,
      size_class: isLarge ? 'large' : 'small',
      chamber_width_mm: chamber.widthMm,
      chamber_depth_mm: chamber.depthMm,
      chamber_height_mm: chamber.heightMm,
      drain_x_mm: chamber.drainXMm,
      drain_y_mm: chamber.drainYMm,
      greatest_load_mass_kg: isLarge ? 100 : 15,
      steam_line: seed.steamLine,
      has_air_detector: seed.hasAirDetector,
      needs_air_removal_test: isLarge,
      service_state: 'in-service' satisfies ServiceState,
    });
    const panel = [
      ...seed.qualified.map((code) => [code, true] as const),
      ...seed.other.map((code) => [code, false] as const),
    ];
    await trx('sterilizer_programs').insert(
      panel.map(([code, isQualified]) => ({
        sterilizer_id: id,
        program_id: programs.get(code),
        is_qualified: isQualified,
      })),
    );
  }
}

async function seedCarts(trx: Knex.Transaction, facilityId: string, carts: readonly CartSeed[]): Promise<void> {
  for (const { shelves, ...cart } of carts) {
    const cartId = v7();
    await trx('carts').insert({
      id: cartId,
      facility_id: facilityId,
      code: cart.code,
      name: cart.name,
      size_class: cart.sizeClass,
      note: cart.note,
    });
    const codes = await takePlaceCodes(trx, 'shelf', shelves.length);
    await trx('shelves').insert(
      shelves.map((shelf, at) => ({
        id: v7(),
        cart_id: cartId,
        level: shelf.level,
        name: shelf.name,
        place_code: codes[at],
        width_mm: shelf.widthMm,
        depth_mm: shelf.depthMm,
        clear_height_mm: shelf.clearHeightMm,
        surface: shelf.surface,
        greatest_mass_kg: shelf.greatestMassKg,
        is_usable: shelf.isUsable,
      })),
    );
  }
}

/** Each kind, and the holders of it that are owned: RS-1 to RS-5, each with its own place code. */
async function seedHolders(
  trx: Knex.Transaction,
  facilityId: string,
  kinds: readonly HolderKindFields[],
): Promise<void> {
  for (const kind of kinds) {
    const kindId = v7();
    await trx('holder_kinds').insert({
      id: kindId,
      facility_id: facilityId,
      code: kind.code,
      name: kind.name,
      form: kind.form,
      slots: kind.slots,
      pitch_mm: kind.pitchMm,
      greatest_height_mm: kind.greatestHeightMm,
      greatest_length_mm: kind.greatestLengthMm,
      greatest_thickness_mm: kind.greatestThicknessMm,
      across_mm: kind.acrossMm,
      along_mm: kind.alongMm,
      mass_kg: kind.massKg,
      owned: kind.owned,
    });
    const codes = await takePlaceCodes(trx, 'holder', kind.owned);
    await trx('holders').insert(
      codes.map((placeCode, at) => ({
        id: v7(),
        facility_id: facilityId,
        holder_kind_id: kindId,
        name: `${kind.code}-${at + 1}`,
        place_code: placeCode,
      })),
    );
  }
}

/** The hospital's four sterilizers, nine programs, eight carts and 33 holders. */
export async function seedEquipment(
  trx: Knex.Transaction,
  { facilityId }: { readonly facilityId: string },
): Promise<void> {
  await seedSterilizers(trx, facilityId, hospitalSterilizers);
  await seedCarts(trx, facilityId, hospitalCarts);
  await seedHolders(trx, facilityId, demonstrationHolderKinds);
}

/** A small place beside it: one sterilizer, two carts, a few holders. */
export async function seedSurgeryCenterEquipment(
  trx: Knex.Transaction,
  { facilityId }: { readonly facilityId: string },
): Promise<void> {
  await seedSterilizers(trx, facilityId, surgeryCenterSterilizers);
  await seedCarts(trx, facilityId, [largeCart(1), largeCart(2)]);
  await seedHolders(
    trx,
    facilityId,
    demonstrationHolderKinds.filter((kind) => kind.form === 'rack').map((kind) => ({ ...kind, owned: 2 })),
  );
}

/**
 * This morning's air-removal tests of the two sterilizers on line A, both passed; the third is left for the visitor to
 * record. The test is dated as early today as `now` permits.
 */
export async function seedMorningTests(
  trx: Knex.Transaction,
  { facilityId, now, readBy }: { readonly facilityId: string; readonly now: Date; readonly readBy: string },
): Promise<void> {
  const facility = await trx('facilities').where({ id: facilityId }).first<{ readonly time_zone: string }>('time_zone');
  const dayAt = (at: Date) => productionDay(at.toISOString(), facility.time_zone, '00:00');
  const today = dayAt(now);
  const minutesBack = [120, 60, 20, 5, 1, 0];
  const testedAt = minutesBack
    .map((minutes) => new Date(now.getTime() - minutes * 60_000))
    .find((at) => dayAt(at) === today);
  const sterilizers = await trx('sterilizers')
    .where({ facility_id: facilityId, steam_line: 'A' })
    .select<{ readonly id: string }[]>('id');
  await trx('air_removal_tests').insert(
    sterilizers.map(({ id }) => ({
      id: v7(),
      facility_id: facilityId,
      sterilizer_id: id,
      tested_at: testedAt,
      test_day: today,
      result: 'passed',
      pack_lot: 'AR-2291',
      pack_expires_on: `${Number(today.slice(0, 4)) + 2}-06-30`,
      is_before_first_load: true,
      read_by: readBy,
      recorded_at: testedAt,
    })),
  );
}
