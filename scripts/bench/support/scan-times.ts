import type { Page } from 'playwright-core';

/** One scan, in milliseconds after the browser got its Enter. */
export type ScanTimes = {
  /** The request left. */
  readonly sent: number;
  /** The first byte of the reply came. */
  readonly replied: number;
  /** The answer stood in the page. */
  readonly changed: number;
  /** Two frames later: the frame with the answer is on the screen by then. */
  readonly painted: number;
  readonly server: number;
};

/**
 * Makes the page time its own scans by its own clock: `scanTimes.begin()` before a scan, `scanTimes.taken` resolves with its
 * times. To be called before the page is opened: the program keeps the keys of a scan from every listener after its own.
 */
export async function watchScans(page: Page): Promise<void> {
  // tsx names functions with a helper of its own, which the page lacks.
  await page.addInitScript('globalThis.__name = (named) => named');
  await page.addInitScript(() => {
    const turnNow = () => document.querySelector('[data-scan-turn]')?.getAttribute('data-scan-turn') ?? null;
    const frame = () =>
      new Promise((resolve) => {
        requestAnimationFrame(resolve);
      });
    let enterMs = 0;
    addEventListener(
      'keydown',
      (event) => {
        if (event.key === 'Enter') enterMs = event.timeStamp;
      },
      true,
    );
    const scanTimes = {
      taken: Promise.resolve<unknown>(null),
      begin() {
        const turnBefore = turnNow();
        performance.clearResourceTimings();
        scanTimes.taken = new Promise<number>((resolve) => {
          const observer = new MutationObserver(() => {
            const turn = turnNow();
            if (turn === null || turn === turnBefore) return;
            observer.disconnect();
            resolve(performance.now());
          });
          observer.observe(document.body, { subtree: true, childList: true, attributes: true });
        }).then(async (changedMs) => {
          await frame();
          await frame();
          const paintedMs = performance.now();
          const request = performance
            .getEntriesByType('resource')
            .find((entry): entry is PerformanceResourceTiming => entry.name.endsWith('/scans'));
          if (!request) throw new Error('no scan was sent');
          return {
            sent: request.requestStart - enterMs,
            replied: request.responseStart - enterMs,
            changed: changedMs - enterMs,
            painted: paintedMs - enterMs,
            server: request.responseStart - request.requestStart,
          };
        });
      },
    };
    Object.assign(window, { scanTimes });
  });
}
