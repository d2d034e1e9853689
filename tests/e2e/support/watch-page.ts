import type { Page } from 'playwright-core';

/** A reply that is a "no" although nothing is wrong with the program: the journey is about it. */
export type ExpectedNo = { readonly method: string; readonly path: RegExp; readonly status: number };

/** Whoever opens the program is asked for; what the first screen shows is asked for at the same time. Nobody is here yet. */
const nobodyIsHere: ExpectedNo = { method: 'GET', path: /^\/api\/(session|today)$/, status: 401 };

/** Collects what a person would not see: errors in the console, failed requests, refusals nobody expected. */
export function watchPage(page: Page, expected: readonly ExpectedNo[]): string[] {
  const troubles: string[] = [];
  page.on('pageerror', (error) => troubles.push(`page error: ${error.message}`));
  page.on('console', (message) => {
    // Replies are judged below, where their status can be read.
    if (message.type() !== 'error' || message.text().startsWith('Failed to load resource')) return;
    troubles.push(`console: ${message.text()}`);
  });
  page.on('requestfailed', (request) => {
    // A question that is not worth its answer any more is taken back by the program itself.
    if (request.failure()?.errorText === 'net::ERR_ABORTED') return;
    troubles.push(`${request.method()} ${request.url()}: ${request.failure()?.errorText ?? 'failed'}`);
  });
  page.on('response', (response) => {
    if (response.status() < 400) return;
    const method = response.request().method();
    const { pathname } = new URL(response.url());
    const isExpected = [nobodyIsHere, ...expected].some(
      (no) => no.method === method && no.status === response.status() && no.path.test(pathname),
    );
    if (!isExpected) troubles.push(`${method} ${pathname} was answered ${response.status()}`);
  });
  return troubles;
}
