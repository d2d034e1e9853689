import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { checkImports, type ImportReport } from '../../scripts/checks/import-rules';

const top = path.resolve(import.meta.dirname, '../..');

/** Modules that keep the rules, so that only the planted import can be what is found. */
const tree = {
  'src/domain/load/load.ts': '',
  'src/contract/loads.ts': `import '#domain/load/load'; import { z } from 'zod'; z.string();`,
  'src/lib/y.ts': '',
  'src/lib/z.ts': `import './y';`,
  'src/lib/api-client.ts': `import '#contract/loads';`,
  'src/components/ui/button.tsx': `import '../../lib/api-client';`,
  'src/features/loads/queries.ts': `import '../../lib/api-client';`,
  'src/features/items/queries.ts': '',
  'src/app/router.tsx': `import '../features/loads/queries'; import '../features/items/queries';`,
  'src/main.tsx': `import './app/router';`,
  'server/platform/db.ts': `import knex from 'knex'; knex({});`,
  'server/http/define-route.ts': `import express from 'express'; express();`,
  'server/features/items/item-store.ts': `import type { Knex } from 'knex'; export type Db = Knex;`,
  'server/features/items/read-model.ts': `import './item-store';`,
  'server/features/loads/close-load.ts': `import '../items/read-model'; import '../../platform/db'; import '#domain/load/load';`,
  'server/app.ts': `import './features/loads/close-load'; import './http/define-route';`,
  'server/main.ts': `import './app';`,
  'migrations/20260101000000_create_loads.ts': `import type { Knex } from 'knex'; export type Db = Knex;`,
  'seeds/demonstration.ts': `import '../server/platform/db';`,
  'scripts/reset.ts': `import '../seeds/demonstration';`,
  'tests/support/builders.ts': `import '../../server/app';`,
};

type Planted = { readonly rule: string; readonly file: string; readonly imports: string };

const planted: readonly Planted[] = [
  { rule: 'domain-is-pure', file: 'src/domain/a.ts', imports: 'zod' },
  { rule: 'domain-is-pure', file: 'src/domain/b.ts', imports: 'node:crypto' },
  { rule: 'domain-is-pure', file: 'src/domain/c.ts', imports: '#contract/loads' },
  { rule: 'domain-is-pure', file: 'src/domain/d.ts', imports: '../../server/platform/db' },
  { rule: 'contract-knows-domain-and-zod', file: 'src/contract/e.ts', imports: '../lib/api-client' },
  { rule: 'contract-knows-domain-and-zod', file: 'src/contract/f.ts', imports: 'react' },
  { rule: 'client-knows-no-server', file: 'src/lib/g.ts', imports: '../../server/platform/db' },
  { rule: 'client-runs-in-a-browser', file: 'src/app/h.ts', imports: 'node:fs' },
  { rule: 'building-blocks-know-no-feature', file: 'src/components/i.ts', imports: '../features/loads/queries' },
  { rule: 'features-know-not-each-other', file: 'src/features/loads/j.ts', imports: '../items/queries' },
  { rule: 'features-know-not-each-other', file: 'src/features/loads/k.ts', imports: '../../app/router' },
  { rule: 'nobody-imports-the-entry', file: 'src/app/l.ts', imports: '../main' },
  {
    rule: 'server-knows-two-folders-of-src',
    file: 'server/features/loads/m.ts',
    imports: '../../../src/lib/api-client',
  },
  { rule: 'server-knows-no-tooling', file: 'server/platform/n.ts', imports: '../../seeds/demonstration' },
  { rule: 'server-features-ask-a-read-model', file: 'server/features/loads/o.ts', imports: '../items/item-store' },
  { rule: 'server-features-know-no-composition', file: 'server/http/p.ts', imports: '../app' },
  { rule: 'platform-knows-no-feature-and-no-http', file: 'server/platform/q.ts', imports: '../http/define-route' },
  { rule: 'http-knows-no-feature', file: 'server/http/r.ts', imports: '../features/items/read-model' },
  { rule: 'only-http-speaks-express', file: 'server/features/loads/s.ts', imports: 'express' },
  { rule: 'only-platform-opens-connections', file: 'server/features/loads/t.ts', imports: 'knex' },
  { rule: 'migrations-stand-alone', file: 'migrations/20260101000001_u.ts', imports: '../src/domain/load/load' },
  { rule: 'migrations-know-the-types-of-knex', file: 'migrations/20260101000002_v.ts', imports: 'knex' },
  { rule: 'nobody-imports-the-outside', file: 'server/features/loads/w.ts', imports: '../../../scripts/reset' },
  { rule: 'everything-resolves', file: 'src/lib/x.ts', imports: './nowhere' },
  { rule: 'no-cycles', file: 'src/lib/y.ts', imports: './z' },
];

const folder = mkdtempSync(path.join(tmpdir(), 'paperside-imports-'));

function write(file: string, content: string): void {
  mkdirSync(path.dirname(path.join(folder, file)), { recursive: true });
  writeFileSync(path.join(folder, file), `${content}\nexport {};\n`);
}

function check(): ImportReport {
  return checkImports(folder, path.join(top, '.dependency-cruiser.cjs'));
}

beforeAll(() => {
  writeFileSync(path.join(folder, 'tsconfig.json'), '{}');
  writeFileSync(
    path.join(folder, 'package.json'),
    JSON.stringify({ imports: { '#domain/*': './src/domain/*.ts', '#contract/*': './src/contract/*.ts' } }),
  );
  symlinkSync(path.join(top, 'node_modules'), path.join(folder, 'node_modules'));
  for (const [file, content] of Object.entries(tree)) write(file, content);
});

afterAll(() => {
  rmSync(folder, { recursive: true });
});

describe('the import rules', () => {
  it('let a tree pass that keeps them, and see all of it', () => {
    const report = check();
    expect(report.broken).toEqual([]);
    expect(report.unseen).toEqual([]);
    expect(report.seenCount).toBeGreaterThanOrEqual(Object.keys(tree).length);
  });

  it('find every planted import that breaks one', () => {
    for (const { file, imports } of planted) write(file, `import '${imports}';`);
    const { broken } = check();
    // A cycle is told once, from whichever of its modules was met first.
    const missed = planted.filter(
      ({ rule, file }) => !broken.some((sentence) => sentence.startsWith(`${rule}: `) && sentence.includes(file)),
    );
    expect(missed).toEqual([]);
  });
}, 60_000);
