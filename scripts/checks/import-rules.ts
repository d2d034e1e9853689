import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import path from 'node:path';

/** Every folder whose imports have rules. */
const checkedFolders = ['src', 'server', 'migrations', 'seeds', 'scripts', 'tests'];

export type ImportReport = {
  /** "rule: from → to", one for each import that breaks a rule. */
  readonly broken: readonly string[];
  /** Source files on disk that the checker never looked at. */
  readonly unseen: readonly string[];
  readonly seenCount: number;
};

/**
 * Checks the imports of the tree under `folder` against the rules in `rulesFile`.
 *
 * A checker that cannot read TypeScript finds nothing and calls that a pass, so what it saw is held against the disk.
 */
export function checkImports(folder: string, rulesFile: string): ImportReport {
  const present = checkedFolders.filter((name) => existsSync(path.join(folder, name)));
  const program = path.join(
    path.dirname(rulesFile),
    'node_modules',
    'dependency-cruiser',
    'bin',
    'dependency-cruise.mjs',
  );
  const result = spawnSync(process.execPath, [program, '--config', rulesFile, '--output-type', 'json', ...present], {
    cwd: folder,
    encoding: 'utf8',
    maxBuffer: 256 * 1024 * 1024,
  });
  const report = parseReport(result.stdout, result.stderr);
  const seen = new Set(report.modules.map((module) => module.source));
  return {
    broken: report.summary.violations.map(({ rule, from, to }) => `${rule.name}: ${from} → ${to}`),
    unseen: present.flatMap((name) => listSources(folder, name)).filter((file) => !seen.has(file)),
    seenCount: seen.size,
  };
}

type Report = {
  readonly modules: readonly { readonly source: string }[];
  readonly summary: {
    readonly violations: readonly {
      readonly rule: { readonly name: string };
      readonly from: string;
      readonly to: string;
    }[];
  };
};

function parseReport(output: string, errors: string): Report {
  try {
    // The checker's own JSON, whose shape its package documents.
    return JSON.parse(output) as Report;
  } catch {
    throw new Error(`The import checker gave no report: ${errors.trim()}`);
  }
}

function listSources(folder: string, place: string): string[] {
  return readdirSync(path.join(folder, place), { withFileTypes: true }).flatMap((entry) => {
    const inside = `${place}/${entry.name}`;
    if (entry.isDirectory()) return listSources(folder, inside);
    return /\.(ts|tsx|mjs)$/.test(entry.name) ? [inside] : [];
  });
}
