import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { installedMatchesLock, requireNode } from '../../scripts/setup/npm-packages.mjs';

describe('the Node it runs on', () => {
  it.each(['20.19.0', '20.20.2', '22.0.0', '24.1.3'])('accepts %s', (version) => {
    expect(() => {
      requireNode(version);
    }).not.toThrow();
  });

  it.each(['20.18.9', '18.20.4', '8.17.0'])('refuses %s and says which it needs', (version) => {
    expect(() => {
      requireNode(version);
    }).toThrow(`Paperside needs Node 20.19 or newer; this is Node ${version}.`);
  });
});

describe('installed packages', () => {
  const wanted = {
    '': { version: '1.0.0' },
    'node_modules/needle': { version: '2.1.0' },
    'node_modules/other-system': { version: '3.0.0', optional: true },
  };
  let top = '';

  beforeEach(() => {
    top = mkdtempSync(path.join(tmpdir(), 'paperside-packages-'));
    write('package-lock.json', wanted);
  });

  afterEach(() => {
    rmSync(top, { recursive: true });
  });

  function write(file: string, packages: object): void {
    mkdirSync(path.dirname(path.join(top, file)), { recursive: true });
    writeFileSync(path.join(top, file), JSON.stringify({ packages }));
  }

  function install(version: string): void {
    write('node_modules/.package-lock.json', { 'node_modules/needle': { version } });
    mkdirSync(path.join(top, 'node_modules/needle'), { recursive: true });
  }

  it('match the lock file when each has its version, whatever is optional and absent', () => {
    install('2.1.0');
    expect(installedMatchesLock(top)).toBe(true);
  });

  it('do not match when there are none', () => {
    expect(installedMatchesLock(top)).toBe(false);
  });

  it('do not match when one has another version', () => {
    install('2.0.9');
    expect(installedMatchesLock(top)).toBe(false);
  });

  it('do not match when a folder was taken away', () => {
    install('2.1.0');
    rmSync(path.join(top, 'node_modules/needle'), { recursive: true });
    expect(installedMatchesLock(top)).toBe(false);
  });

  it('do not match after an installation that was broken off', () => {
    install('2.1.0');
    writeFileSync(path.join(top, 'node_modules/.package-lock.json'), '{"packages": {');
    expect(installedMatchesLock(top)).toBe(false);
  });

  it('cannot be judged in a checkout without a lock file', () => {
    rmSync(path.join(top, 'package-lock.json'));
    expect(() => installedMatchesLock(top)).toThrow('There is no package-lock.json');
  });
});
