import { setTimeout as sleep } from 'node:timers/promises';
import type { Locator } from 'playwright-core';

/** How long anything may take to show on a machine that is busy with other things too. */
export const patienceMs = 30_000;

/** Waits until it is on screen. */
export async function see(locator: Locator): Promise<void> {
  // Words may also stand hidden beside it, for those who are read to.
  await locator.filter({ visible: true }).first().waitFor({ timeout: patienceMs });
}

export async function seeGone(locator: Locator): Promise<void> {
  await locator.first().waitFor({ state: 'hidden', timeout: patienceMs });
}

/** Waits until something holds, and says what was seen instead when it never does. */
export async function until<Seen>(
  what: string,
  look: () => Promise<Seen>,
  isWanted: (seen: Seen) => boolean,
): Promise<Seen> {
  const giveUpAtMs = Date.now() + patienceMs;
  for (;;) {
    const seen = await look();
    if (isWanted(seen)) return seen;
    if (Date.now() > giveUpAtMs) throw new Error(`${what} did not come about. Seen last: ${JSON.stringify(seen)}`);
    await sleep(50);
  }
}
