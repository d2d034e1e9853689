import knexModule, { type Knex } from 'knex';
import pg from 'pg';

// DATE as text: a local-midnight Date would shift expiry days by the zone. INT8 as a checked number.
pg.types.setTypeParser(pg.types.builtins.DATE, (text) => text);
pg.types.setTypeParser(pg.types.builtins.INT8, (text) => {
  const value = Number(text);
  if (!Number.isSafeInteger(value)) throw new RangeError(`${text} is too large to be counted exactly`);
  return value;
});

export type Db = Knex;
export type Transaction = Knex.Transaction;

export function openDb(url: string, largestPool = 10): Db {
  const connection = {
    connectionString: url,
    application_name: 'paperside',
    statement_timeout: 15_000,
    // Knex's types do not know this setting of pg. What is asked together goes out together: a transaction's reads then
    // wait for the database once, not one by one.
    pipeline: true,
  };
  return knexModule({
    client: 'pg',
    connection,
    pool: { min: 0, max: largestPool },
    acquireConnectionTimeout: 10_000,
  });
}

/** A pool of its own for the session store, which speaks pg and not knex. */
export function openSessionPool(url: string): pg.Pool {
  return new pg.Pool({ connectionString: url, max: 4, application_name: 'paperside sessions' });
}
