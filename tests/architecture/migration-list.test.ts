import { readdirSync } from 'node:fs';
import path from 'node:path';
import { expect, it } from 'vitest';
import { migrationSource } from '../../migrations/source';

const folder = path.resolve(import.meta.dirname, '../../migrations');

it('lists exactly the migrations that lie in the folder', async () => {
  const files = readdirSync(folder)
    .filter((file) => /^\d/.test(file))
    .map((file) => path.basename(file, '.ts'))
    .sort();
  expect(files.length).toBeGreaterThan(0);
  expect(await migrationSource.getMigrations([])).toEqual(files);
});

it('names every migration by its time and what it does', async () => {
  for (const name of await migrationSource.getMigrations([])) expect(name).toMatch(/^\d{14}_[a-z]+(_[a-z]+)+$/);
});

it('refuses a migration that is not listed', async () => {
  await expect(migrationSource.getMigration('20000101000000_no_such_thing')).rejects.toThrow(
    '20000101000000_no_such_thing',
  );
});
