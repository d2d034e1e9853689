import { formatPlaceCode, type Place } from '#domain/label/place-code';
import type { Transaction } from '../../platform/db';

/** Gives out so many place codes, none of them twice over the whole installation. */
export async function takePlaceCodes(trx: Transaction, place: Place, count: number): Promise<string[]> {
  if (count === 0) return [];
  const { rows } = await trx.raw<{ rows: { number: number }[] }>(
    `select nextval('place_code_numbers') as number from generate_series(1, ?)`,
    [count],
  );
  return rows.map(({ number }) => formatPlaceCode(place, number));
}
