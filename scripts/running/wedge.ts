import type { CDPSession, Page } from 'playwright-core';

const sessions = new WeakMap<Page, Promise<CDPSession>>();

function sessionOf(page: Page): Promise<CDPSession> {
  const known = sessions.get(page);
  if (known) return known;
  const session = page.context().newCDPSession(page);
  sessions.set(page, session);
  return session;
}

/**
 * Types a code and Enter as a scanner does that leaves no pause between its keys. All keys are handed over at once: waiting
 * for each would, on a busy machine, make a hand's pace of it.
 */
export async function wedge(page: Page, code: string): Promise<void> {
  const session = await sessionOf(page);
  const keys = Array.from(code, (key) => ({ key, text: key }));
  await Promise.all(
    [...keys, { key: 'Enter', text: '\r' }].flatMap(({ key, text }) => [
      session.send('Input.dispatchKeyEvent', { type: 'keyDown', key, text }),
      session.send('Input.dispatchKeyEvent', { type: 'keyUp', key }),
    ]),
  );
}
