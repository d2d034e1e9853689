import path from 'node:path';
import { top } from '../setup/checkout.mjs';
import { countE2e, countExitCode, countVitest, type Count, type StepResult } from './count';

export type Step = {
  readonly name: string;
  readonly args: readonly [string, ...string[]];
  readonly limitMinutes: number;
  readonly count: (result: StepResult) => Count;
};

/** Where a step that writes a report writes it; its name stands for the file's. */
export const reportFolder = path.join(top, '.tsc', 'reports');
export function reportFileOf(name: string): string {
  return path.join(reportFolder, `${name}.json`);
}

const node = process.execPath;

/** A package's program, started without npx: that is a parent which leaves its child behind when it is ended. */
function program(file: string, ...args: readonly string[]): readonly [string, ...string[]] {
  return [node, path.join(top, 'node_modules', file), ...args];
}

function script(file: string): readonly [string, ...string[]] {
  return [node, '--import', 'tsx', file];
}

function vitest(project: string): Step {
  return {
    name: project,
    args: program(
      'vitest/vitest.mjs',
      ...['run', '--project', project, '--reporter=default', '--reporter=json'],
      ...[`--outputFile.json=${reportFileOf(project)}`, '--allowOnly=false'],
    ),
    limitMinutes: 15,
    count: countVitest,
  };
}

export const types: Step = {
  name: 'types',
  args: program('typescript/bin/tsc', '-b'),
  limitMinutes: 10,
  count: countExitCode,
};

export const lint: Step = {
  name: 'lint',
  args: program('eslint/bin/eslint.js', '.', '--max-warnings=0'),
  limitMinutes: 15,
  count: countExitCode,
};

export const format: Step = {
  name: 'format',
  args: program('prettier/bin/prettier.cjs', '--check', '--log-level=warn', '.'),
  limitMinutes: 5,
  count: countExitCode,
};

export const imports: Step = {
  name: 'imports',
  args: script('scripts/checks/imports.ts'),
  limitMinutes: 5,
  count: countExitCode,
};

export const unused: Step = {
  name: 'unused',
  args: program('knip/bin/knip.js', '--no-progress'),
  limitMinutes: 5,
  count: countExitCode,
};

export const unit = vitest('unit');
export const server = vitest('server');
export const client = vitest('client');

export const commands: Step = vitest('commands');

export const build: Step = {
  name: 'build',
  args: script('scripts/checks/build.ts'),
  limitMinutes: 10,
  count: countExitCode,
};

export const e2e: Step = {
  name: 'e2e',
  args: script('tests/e2e/run.ts'),
  limitMinutes: 30,
  count: countE2e,
};
