import type { ColumnSet, FieldProblem } from '#domain/catalogue/csv-column';
import type { z } from 'zod';
import type { Actor } from '../actor';
import type { Clock } from '../clock';
import type { Db, Transaction } from '../db';
import type { Ids } from '../ids';

/** A thing as it is kept, with what a person may state about it. */
export type Kept<Fields> = { readonly id: string; readonly version: number; readonly fields: Fields };

/** One change of a thing: `before` is null for a new one. */
export type Written<Fields> = { readonly after: Kept<Fields>; readonly before: Kept<Fields> | null };

export type Desk = { readonly db: Db; readonly clock: Clock; readonly ids: Ids };

/** Who writes what in which transaction. */
export type WriteContext = {
  readonly trx: Transaction;
  readonly actor: Actor;
  readonly at: Date;
  readonly ids: Ids;
  readonly requestId: string;
};

export type Judge<Fields> = (candidates: readonly Fields[]) => ReadonlyMap<Fields, readonly FieldProblem[]>;

/** A list of things people keep: items, programs, holders. */
export type Register<Fields extends object> = {
  /** First part of codes and acts: "item", "holder-kind". */
  readonly name: string;
  /** As in "There is already an item W-01." */
  readonly aNoun: string;
  /** What tells things apart, spelled as it is kept; null while it is not known. */
  readonly keyOf: (values: Partial<Fields>) => string | null;
  readonly keyField: keyof Fields & string;
  /** Brings values into the form in which they are kept, and says what does not hold together in one thing alone. */
  readonly settle: (
    fields: Fields,
    before: Fields | null,
  ) => { readonly fields: Fields; readonly problems: readonly FieldProblem[] };
  readonly list: (trx: Transaction | Db, facilityId: string) => Promise<Kept<Fields>[]>;
  /** Prepares the question what does not hold together among things: candidates, and what is kept and not among them. */
  readonly judge: (trx: Transaction | Db, facilityId: string, kept: readonly Kept<Fields>[]) => Promise<Judge<Fields>>;
  /** Writes the rows and the history. */
  readonly write: (context: WriteContext, written: readonly Written<Fields>[]) => Promise<void>;
};

export type ImportCounts = { readonly added: number; readonly changed: number; readonly refused: number };

/**
 * A register that is kept by file too. One description serves both ways in, so that a file cannot bring in what the
 * form would refuse.
 */
export type FiledRegister<Fields extends object> = Register<Fields> & {
  readonly columns: ColumnSet<Fields>;
  readonly schema: z.ZodType<Fields>;
  /** Writes what a file did as a whole to the history. */
  readonly noteImport: (context: WriteContext, counts: ImportCounts) => Promise<void>;
};

/**
 * Lets one person at a time write to a facility's register, until the transaction ends. So a code that was found free
 * is still free when the row is written, and no unique key has to be run into.
 */
export async function lockRegister(trx: Transaction, facilityId: string, name: string): Promise<void> {
  await trx.raw('select pg_advisory_xact_lock(hashtextextended(?, 0))', [`${name} of ${facilityId}`]);
}

export function keyOfKept<Fields extends object>(register: Register<Fields>, thing: Kept<Fields>): string {
  return register.keyOf(thing.fields) ?? '';
}

/** The key of what is found by its code: codes are kept in capitals. */
export function keyOfCode(code: string | undefined): string | null {
  const key = code?.trim().toUpperCase() ?? '';
  return key === '' ? null : key;
}
