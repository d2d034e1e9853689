import { writeFileSync } from 'node:fs';
import path from 'node:path';
import type { Browser, Page } from 'playwright-core';
import { runListResponseSchema, runDetailSchema } from '../../src/contract/runs';
import { paths } from '../../src/contract/paths';
import { allDemonstrationSignIns } from '../../seeds/demonstration-people';
import { demonstrationRuns } from '../../seeds/demonstration-packages';
import { launchBrowser, phone, tablet } from '../running/browser';
import { callAs, type Caller } from '../running/caller';
import { makeDemonstrations } from '../running/demonstration-server';
import { wedge } from '../running/wedge';
import { Refusal, runMain } from '../setup/refusal.mjs';
import { repackPng } from './repack-png';
import { buildTellingLoad, closeSmallLoad, openLoad, scanInto } from './telling-load';

/*
 * Takes the pictures of README.md from the running program: a demonstration of its own, brought to a telling state through
 * the API as people at stations bring it there, looked at in the browser that the tests use.
 */

const folder = import.meta.dirname;

/** A page with six pictures should come quickly, also over a hospital's network. */
const greatestBytes = 250_000;

type Camera = {
  readonly open: (address: string, size?: { readonly width: number; readonly height: number }) => Promise<Page>;
  readonly take: (page: Page, name: string) => Promise<void>;
};

function cameraOf(browser: Browser, url: string, caller: Caller): Camera {
  return {
    open: async (address, size = tablet) => {
      // Without motion: what is on screen is there at once.
      const context = await browser.newContext({ baseURL: url, viewport: size, reducedMotion: 'reduce' });
      await context.addCookies([caller.cookie]);
      const page = await context.newPage();
      await page.goto(address);
      return page;
    },
    take: async (page, name) => {
      await page.evaluate(() => document.fonts.ready);
      const picture = repackPng(await page.screenshot());
      if (picture.length > greatestBytes) {
        throw new Refusal(`${name}.png would have ${picture.length} bytes, at most ${greatestBytes} are wanted.`);
      }
      writeFileSync(path.join(folder, `${name}.png`), picture);
      console.log(`  ${name}.png`.padEnd(24), `${Math.round(picture.length / 1000)} kB`);
    },
  };
}

async function scanAt(page: Page, code: string): Promise<void> {
  const said = page.locator('[data-scan-turn]').first();
  const before = (await said.count()) === 0 ? null : await said.getAttribute('data-scan-turn');
  await wedge(page, code);
  await page.waitForFunction((turn) => {
    const now = document.querySelector('[data-scan-turn]')?.getAttribute('data-scan-turn') ?? null;
    return now !== null && now !== turn && document.querySelector('[data-answer]') !== null;
  }, before);
}

/** The second run of the morning, half loaded by somebody else: for the day's screen. */
async function buildBeside(caller: Caller): Promise<void> {
  const { runs } = await caller.get(paths.runs, runListResponseSchema);
  const run = runs.find(({ name }) => name === demonstrationRuns.containers.name);
  if (!run) throw new Error(`No run is called ${demonstrationRuns.containers.name}.`);
  const { packages } = await caller.get(paths.run(run.id), runDetailSchema);
  const { sterilizer, program } = demonstrationRuns.containers;
  const loadId = await openLoad(caller, { sterilizer, program, runId: run.id });
  for (const one of packages.slice(0, 3)) await scanInto(caller, loadId, one.code);
}

function signInOf(staffNumber: string) {
  const found = allDemonstrationSignIns.find((person) => person.staffNumber === staffNumber);
  if (!found) throw new Error(`Nobody in the demonstration has the staff number ${staffNumber}.`);
  return found;
}

async function takePictures(browser: Browser, url: string): Promise<void> {
  const technician = await callAs(url, signInOf('T2041'));
  await closeSmallLoad(technician);
  await buildBeside(await callAs(url, signInOf('T2056')));
  const { loadId, rack, next } = await buildTellingLoad(technician);
  const { open, take } = cameraOf(browser, url, technician);

  const load = await open(`/loads/${loadId}`);
  await load.getByRole('heading', { level: 1, name: /^Load / }).waitFor();
  await scanAt(load, rack);
  await scanAt(load, next[0]);
  await load.getByRole('region', { name: 'Findings', exact: true }).getByRole('listitem').nth(2).waitFor();
  await take(load, 'load');

  const small = await open(`/loads/${loadId}`, phone);
  await small.getByRole('heading', { level: 1, name: /^Load / }).waitFor();
  await scanAt(small, rack);
  await scanAt(small, next[1]);
  await take(small, 'load-on-a-phone');

  const today = await open('/');
  await today.getByRole('heading', { name: /^Waits for you/ }).waitFor();
  await take(today, 'today');

  const packing = await open('/pack/station');
  await packing.getByRole('button', { name: /Mayo scissors curved/ }).click();
  await packing.getByLabel('Contents complete and in order').check();
  await packing.getByLabel('Internal CI lies inside').check();
  await take(packing, 'packing');

  const policy = await open('/policy');
  await policy.getByRole('heading', { level: 1 }).waitFor();
  await take(policy, 'policy');
}

await runMain(async () => {
  const maker = await makeDemonstrations('pictures');
  try {
    const demonstration = await maker.start();
    const browser = await launchBrowser();
    try {
      await takePictures(browser, demonstration.url);
    } finally {
      await browser.close();
    }
  } finally {
    await maker.release();
  }
  return 0;
});
