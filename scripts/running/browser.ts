import { chromium, type Browser } from 'playwright-core';
import { ensureChromium } from '../setup/chromium';

/** Nothing that talks to anybody; --no-sandbox because Chromium refuses to run as root with one. */
const quiet = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** A film the browser shows in place of what a camera sees. It is fixed for the life of the browser. */
function cameraFilm(file: string): readonly string[] {
  return [
    '--use-fake-ui-for-media-stream',
    '--use-fake-device-for-media-stream',
    `--use-file-for-fake-video-capture=${file}`,
  ];
}

export function launchBrowser({ film }: { readonly film?: string } = {}): Promise<Browser> {
  return chromium.launch({
    executablePath: ensureChromium(),
    args: [...quiet, ...(film === undefined ? [] : cameraFilm(film))],
    // The machine may be busy.
    timeout: 60_000,
  });
}

export const tablet = { width: 1280, height: 800 } as const;
export const phone = { width: 390, height: 844 } as const;
