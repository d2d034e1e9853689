import { mkdirSync } from 'node:fs';
import path from 'node:path';
import type { Browser, BrowserContext, Page } from 'playwright-core';
import { launchBrowser, tablet } from '../../../scripts/running/browser';
import { callAs, type Caller } from '../../../scripts/running/caller';
import type { RunningDemonstration } from '../../../scripts/running/demonstration-server';
import { localFolder } from '../../../scripts/setup/checkout.mjs';
import { allDemonstrationSignIns, type DemonstrationSignIn } from '../../../seeds/demonstration-people';
import { patienceMs } from './see';
import { watchPage, type ExpectedNo } from './watch-page';

export type Size = { readonly width: number; readonly height: number };

export type StationOptions = {
  readonly size?: Size;
  readonly expected?: readonly ExpectedNo[];
  /** Signed in before the page is opened, where signing in is not what the journey is about. */
  readonly as?: Caller;
  /** Without motion: what is on screen is there at once. */
  readonly isStill?: boolean;
  /** What its camera sees. Such a station has a browser of its own. */
  readonly film?: string;
};

/** The program running for one journey, and the stations that look at it. */
export type Stage = ReturnType<typeof createStage>;

export const picturesFolder = path.join(localFolder, 'e2e');

/** The person of the demonstration hospital who signs with these initials. */
export function personWith(staffNumber: string): DemonstrationSignIn {
  const found = allDemonstrationSignIns.find((person) => person.staffNumber === staffNumber);
  if (!found) throw new Error(`Nobody in the demonstration has the staff number ${staffNumber}.`);
  return found;
}

export const people = {
  technician: personWith('T2041'),
  otherTechnician: personWith('T2056'),
  lead: personWith('T1102'),
  supervisor: personWith('T1031'),
  technicianElsewhere: personWith('Q127'),
} as const;

export function createStage(demonstration: RunningDemonstration, browser: Browser) {
  const contexts: BrowserContext[] = [];
  const browsers: Browser[] = [];
  const stations: { readonly page: Page; readonly troubles: readonly string[] }[] = [];

  return {
    url: demonstration.url,

    /** A tablet at the sterilizer, or a phone. */
    async openStation({ size = tablet, expected = [], as, isStill, film }: StationOptions = {}): Promise<Page> {
      const own = film === undefined ? undefined : await launchBrowser({ film });
      if (own) browsers.push(own);
      const context = await (own ?? browser).newContext({
        baseURL: demonstration.url,
        viewport: size,
        ...(isStill === true ? { reducedMotion: 'reduce' } : {}),
        ...(film === undefined ? {} : { permissions: ['camera'] }),
      });
      contexts.push(context);
      context.setDefaultTimeout(patienceMs);
      if (as) await context.addCookies([as.cookie]);
      const page = await context.newPage();
      stations.push({ page, troubles: watchPage(page, expected) });
      return page;
    },

    callAs: (person: DemonstrationSignIn) => callAs(demonstration.url, person),

    /** Everything that went wrong unseen, at whichever station. */
    troubles: () => stations.flatMap(({ troubles }) => troubles),

    async takePictures(name: string): Promise<readonly string[]> {
      mkdirSync(picturesFolder, { recursive: true });
      const files: string[] = [];
      for (const [index, { page }] of stations.entries()) {
        if (page.isClosed()) continue;
        const file = path.join(picturesFolder, `${name}-${index + 1}.png`);
        await page.screenshot({ path: file }).then(
          () => files.push(file),
          () => undefined,
        );
      }
      return files;
    },

    async close(): Promise<void> {
      for (const context of contexts) await context.close();
      for (const own of browsers) await own.close();
    },
  };
}
