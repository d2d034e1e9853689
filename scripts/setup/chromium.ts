import { existsSync } from 'node:fs';
import { ensureDebianPackage } from './debian-package';

/** Path of the browser that the end-to-end tests and the benchmarks drive: CHROMIUM, else Debian's. */
export function ensureChromium(): string {
  return ensureDebianPackage({
    title: 'Chromium',
    packageName: 'chromium',
    otherwise: 'Install Chromium and set CHROMIUM to its program file.',
    find: () => [process.env.CHROMIUM ?? '', '/usr/bin/chromium'].find((file) => file !== '' && existsSync(file)),
  });
}
