import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { parseArgs } from 'node:util';
import { Stryker } from '@stryker-mutator/core';
import { localFolder, top } from '../setup/checkout.mjs';
import { runMain } from '../setup/refusal.mjs';

/*
 * npm run mutate [-- WORD]: plants small faults in the code of the rules, the geometry and the heat, file by file, and counts
 * which of them the tests of that very file notice. A file without tests of its own is tried with those of the files that
 * use it. What only the properties over hundreds of generated carts would notice counts as having survived.
 */

const folders = ['src/domain/load/rules', 'src/domain/geometry', 'src/domain/steam'];
const singles = ['src/domain/load/layout.ts', 'src/domain/load/cycle-match.ts'];
/** Nothing in it runs: lists of sources and of rules. */
const withoutCode = new Set(['sources.ts', 'all-rules.ts', 'slack.ts']);

type Tally = { readonly file: string; caught: number; survived: number; leftOut: number; readonly survivors: string[] };

function filesOf(folder: string): string[] {
  return readdirSync(path.join(top, folder))
    .filter((name) => name.endsWith('.ts') && !withoutCode.has(name))
    .map((name) => `${folder}/${name}`);
}

function testOf(file: string): string {
  return file.replace(/^src/, 'tests').replace(/\.ts$/, '.test.ts');
}

function hasTest(file: string): boolean {
  return readdirSync(path.join(top, path.dirname(testOf(file)))).includes(path.basename(testOf(file)));
}

function usersOf(file: string, all: readonly string[]): readonly string[] {
  const name = path.basename(file, '.ts');
  const imports = new RegExp(`from '\\./(?:[^']*/)?${name}'`);
  return all.filter((other) => other !== file && imports.test(readFileSync(path.join(top, other), 'utf8')));
}

/** The tests of a file, else of the files that use it, else of those that use these. */
function testsFor(file: string, all: readonly string[]): readonly string[] {
  const seen = new Set([file]);
  let files: readonly string[] = [file];
  for (;;) {
    const tests = files.filter(hasTest).map(testOf);
    if (tests.length > 0 || files.length === 0) return tests;
    files = files.flatMap((one) => usersOf(one, all)).filter((one) => !seen.has(one));
    for (const one of files) seen.add(one);
  }
}

async function mutate(file: string, all: readonly string[]): Promise<Tally> {
  process.env.MUTATION_TESTS = testsFor(file, all).join(',');
  const options: unknown = {
    testRunner: 'vitest',
    vitest: { configFile: 'scripts/mutation/test-config.ts' },
    plugins: ['@stryker-mutator/vitest-runner', path.join(import.meta.dirname, 'ignore-words.mjs')],
    ignorers: ['words'],
    mutate: [file],
    // Only what these tests need is copied for each run.
    ignorePatterns: [
      '/*',
      '!/src',
      '!/tests',
      '!/seeds',
      '!/scripts',
      '!/server',
      '!/migrations',
      '!/package.json',
      '!/tsconfig.json',
      'tests/e2e',
    ],
    coverageAnalysis: 'perTest',
    concurrency: 2,
    tempDirName: path.join(localFolder, 'mutation'),
    reporters: [],
    logLevel: 'error',
    timeoutMS: 20_000,
    dryRunTimeoutMinutes: 30,
  };
  const results = await new Stryker(options as ConstructorParameters<typeof Stryker>[0]).runMutationTest();
  const tally: Tally = { file, caught: 0, survived: 0, leftOut: 0, survivors: [] };
  for (const { status, location, mutatorName, replacement } of results) {
    if (status === 'Killed' || status === 'Timeout' || status === 'RuntimeError') tally.caught += 1;
    else if (status === 'Ignored' || status === 'CompileError') tally.leftOut += 1;
    else {
      tally.survived += 1;
      const text = replacement.replaceAll(/\s+/g, ' ').slice(0, 90);
      tally.survivors.push(
        `${file}:${location.start.line}:${location.start.column} ${mutatorName} ${text} (${status})`,
      );
    }
  }
  return tally;
}

function share({ caught, survived }: Pick<Tally, 'caught' | 'survived'>): string {
  return caught + survived === 0 ? '' : `${((100 * caught) / (caught + survived)).toFixed(1)} %`;
}

await runMain(async () => {
  const { positionals } = parseArgs({ allowPositionals: true });
  const all = [...folders.flatMap(filesOf), ...singles];
  const chosen = all.filter((file) => positionals.every((word) => file.includes(word)));
  const whole: Tally = { file: 'all', caught: 0, survived: 0, leftOut: 0, survivors: [] };
  const print = (tally: Tally) => {
    const cells = [tally.caught, tally.survived, tally.leftOut].map((count) => String(count).padStart(9));
    console.log(`  ${tally.file.replace('src/domain/', '').padEnd(44)}${cells.join('')}  ${share(tally).padStart(8)}`);
  };
  console.log(`\n  ${'file'.padEnd(44)}   caught survived left out`);
  for (const file of chosen) {
    const tally = await mutate(file, all);
    print(tally);
    whole.caught += tally.caught;
    whole.survived += tally.survived;
    whole.leftOut += tally.leftOut;
    whole.survivors.push(...tally.survivors);
  }
  print(whole);
  console.log('\n  Survived:');
  for (const line of whole.survivors) console.log(`  ${line}`);
  const { caught, survived } = whole;
  const figures = { mutants: caught + survived, caught, score: Number((caught / (caught + survived)).toFixed(4)) };
  console.log(`\n${JSON.stringify(figures)}`);
  return 0;
});
