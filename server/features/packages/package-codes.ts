import { firstPackageNumber, formatPackageCode } from '#domain/label/package-code';
import type { ItemKind } from '#domain/load/model';
import type { Transaction } from '../../platform/db';

/** Takes so many codes that no package of any facility has or will get. A rolled-back act loses its codes; that is all. */
export async function takePackageCodes(trx: Transaction, kind: ItemKind, quantity: number): Promise<string[]> {
  const { rows } = await trx.raw<{ rows: { number: number }[] }>(
    "select nextval('package_code_numbers') as number from generate_series(1, ?)",
    [quantity],
  );
  return rows.map((row) => formatPackageCode(kind, firstPackageNumber - 1 + row.number));
}
