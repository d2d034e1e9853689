import { readdirSync } from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { Refusal, runMain } from '../setup/refusal.mjs';

/** A file beside this one, named as it is called: `npm run bench -- NAME`. */
type Benchmark = {
  /** What it measures, in one sentence. */
  readonly description: string;
  /** Prints a table and, as its last line, one line of JSON that begins with {"bench":"NAME". */
  readonly run: () => Promise<void>;
};

const folder = import.meta.dirname;

function listNames(): string[] {
  return readdirSync(folder)
    .filter((file) => file.endsWith('.ts') && file !== 'run.ts')
    .map((file) => path.basename(file, '.ts'))
    .sort();
}

async function load(name: string): Promise<Benchmark> {
  const module: unknown = await import(pathToFileURL(path.join(folder, `${name}.ts`)).href);
  if (isBenchmark(module)) return module;
  throw new Error(`scripts/bench/${name}.ts exports no description and run.`);
}

function isBenchmark(module: unknown): module is Benchmark {
  return (
    typeof module === 'object' &&
    module !== null &&
    'description' in module &&
    typeof module.description === 'string' &&
    'run' in module &&
    typeof module.run === 'function'
  );
}

await runMain(async () => {
  const [name] = process.argv.slice(2);
  const names = listNames();
  if (name === undefined) {
    console.log('\n  npm run bench -- NAME\n');
    for (const each of names) console.log(`  ${each.padEnd(12)} ${(await load(each)).description}`);
    console.log('');
    return 0;
  }
  if (!names.includes(name)) throw new Refusal(`There is no benchmark called ${name}. There are: ${names.join(', ')}.`);
  await (await load(name)).run();
  return 0;
});
