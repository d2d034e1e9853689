import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, readdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { ensureDebianPackage } from './debian-package';

/** Debian keeps each major version in a folder of its own and leaves initdb and postgres off the PATH. */
const debianVersions = '/usr/lib/postgresql';

/** Folder that holds initdb and postgres; installs Debian's package when there is none. */
export function ensurePostgresPrograms(): string {
  return ensureDebianPackage({
    title: 'PostgreSQL',
    packageName: 'postgresql',
    otherwise:
      'Install PostgreSQL 15 or newer and set POSTGRES_BIN to the folder that holds initdb, or set DATABASE_URL to use a server that is already there.',
    find: () => listPostgresPrograms()[0],
    beforeInstall: keepDebianFromMakingACluster,
  });
}

/** Data is readable only by the major version that made it. */
export function findPostgresPrograms(majorVersion: string): string | undefined {
  return listPostgresPrograms().find((folder) => majorVersionOf(folder) === majorVersion);
}

function listPostgresPrograms(): string[] {
  const versions = existsSync(debianVersions) ? readdirSync(debianVersions) : [];
  const newestFirst = versions.sort((a, b) => Number(b) - Number(a));
  const folders = [
    process.env.POSTGRES_BIN ?? '',
    ...newestFirst.map((version) => path.join(debianVersions, version, 'bin')),
    ...(process.env.PATH ?? '').split(':'),
  ];
  return folders.filter(
    (folder) => folder !== '' && ['initdb', 'postgres'].every((program) => existsSync(path.join(folder, program))),
  );
}

/** "postgres (PostgreSQL) 15.18 (Debian 15.18-0+deb12u1)" is major version 15. */
function majorVersionOf(folder: string): string | undefined {
  const said = spawnSync(path.join(folder, 'postgres'), ['--version'], { encoding: 'utf8' }).stdout;
  return /\) (\d+)/.exec(said)?.[1];
}

/** The package would otherwise make a cluster on port 5432 and start it at every boot. */
function keepDebianFromMakingACluster(): void {
  mkdirSync('/etc/postgresql-common/createcluster.d', { recursive: true });
  writeFileSync('/etc/postgresql-common/createcluster.d/no-main-cluster.conf', 'create_main_cluster = false\n');
}
