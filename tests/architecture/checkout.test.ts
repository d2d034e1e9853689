import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';

const top = path.resolve(import.meta.dirname, '../..');

/** Names and endings that .gitignore keeps out: what lies there is this machine's own. */
const ignored = readFileSync(path.join(top, '.gitignore'), 'utf8')
  .split('\n')
  .filter((line) => line !== '')
  .map((line) => line.replace(/\/$/, ''));

function isIgnored(name: string): boolean {
  return (
    name === '.git' || ignored.some((line) => (line.startsWith('*') ? name.endsWith(line.slice(1)) : name === line))
  );
}

function listFiles(folder: string): string[] {
  return readdirSync(path.join(top, folder), { withFileTypes: true })
    .filter((entry) => !isIgnored(entry.name))
    .flatMap((entry) => {
      const place = path.posix.join(folder, entry.name);
      return entry.isDirectory() ? listFiles(place) : [place];
    });
}

/** Without git, which a machine that only runs the program need not have. */
const files = listFiles('');

const allowedFolders = ['.ci', '.github', 'migrations', 'public', 'scripts', 'seeds', 'server', 'src', 'tests'];

/** Each lies where the tool or the reader it is for looks for it. */
const allowedFiles = [
  ...['.dependency-cruiser.cjs', '.editorconfig', '.env.example', '.gitignore', '.npmrc', '.nvmrc'],
  ...['.prettierignore', '.prettierrc', 'DEVELOPERS.md', 'LICENSE', 'README.md', 'eslint.config.js', 'index.html'],
  ...['knexfile.ts', 'knip.json', 'package-lock.json', 'package.json', 'postcss.config.js', 'tailwind.config.ts'],
  ...['tsconfig.json', 'vite.config.ts'],
];

function isText(file: string): boolean {
  return !/\.(png|jpg|pdf|woff2|ico|wav|mp3|ttf)$/.test(file);
}

function read(file: string): string {
  return readFileSync(path.join(top, file), 'utf8');
}

describe('the checkout', () => {
  it('holds nothing at the top but what belongs there', () => {
    const names = new Set(files.map((file) => file.split('/')[0] ?? ''));
    expect(names.size).toBeGreaterThan(10);
    expect([...names].filter((name) => ![...allowedFolders, ...allowedFiles].includes(name))).toEqual([]);
  });

  it('names files in kebab-case', () => {
    const named = files.filter((file) => /^(src|server|seeds|scripts|tests)\/.*\.(ts|tsx|mjs)$/.test(file));
    const odd = named.filter(
      (file) => !/^[a-z0-9]+(-[a-z0-9]+)*(\.(routes|test))?\.(ts|tsx|mjs)$/.test(path.basename(file)),
    );
    expect(named.length).toBeGreaterThan(100);
    expect(odd).toEqual([]);
  });

  it('names no path of one machine', () => {
    // Put together here, or this file would find itself.
    const machinePaths = new RegExp(['/wo' + 'rk/', '/ho' + 'me/[a-z]', '/ro' + 'ot/[a-z.]', '/Us' + 'ers/'].join('|'));
    expect(files.filter(isText).filter((file) => machinePaths.test(read(file)))).toEqual([]);
  });

  it('pins packages by version and checksum, not by the host they came from', () => {
    const lock = read('package-lock.json');
    expect(lock).toContain('"integrity"');
    expect(lock).not.toContain('"resolved"');
    const settings = [read('package.json'), read('.npmrc')].join('\n');
    expect(settings).not.toMatch(/registry\s*=|https?:\/\//);
  });

  it('has every path that its guide for developers names', () => {
    const named = listNamedPaths(read('DEVELOPERS.md'));
    expect(named.length).toBeGreaterThan(10);
    expect(named.filter((place) => !existsSync(path.join(top, place)))).toEqual([]);
  });
});

/** What stands between backticks and begins with one of our folders. `*`, `<name>`, `x` and `your-…` stand for any name. */
function listNamedPaths(text: string): string[] {
  const starts = new RegExp(`^(${allowedFolders.map((name) => name.replace('.', '\\.')).join('|')})/`);
  return [...text.matchAll(/`([^`\s]+)`/g)]
    .map((match) => match[1] ?? '')
    .filter((place) => starts.test(place) && !/[*<>{}…]|\/x(\/|$)|\/your-/.test(place));
}
