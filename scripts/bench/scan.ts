import { loadavg } from 'node:os';
import { z } from 'zod';
import type { CDPSession, Page } from 'playwright-core';
import { loadDetailSchema } from '../../src/contract/loads';
import { paths } from '../../src/contract/paths';
import { demonstrationSignIns } from '../../seeds/demonstration-people';
import { launchBrowser, tablet } from '../running/browser';
import { callAs, type Caller } from '../running/caller';
import { makeDemonstrations } from '../running/demonstration-server';
import { fillCart } from '../running/full-cart';
import { wedge } from '../running/wedge';
import { table } from '../start/output';
import { percentile } from './support/percentile';
import { watchScans, type ScanTimes } from './support/scan-times';

export const description = 'Time from the Enter of a scan to its painted answer, with 60 packages on the cart.';

/** A slow tablet: Chromium's own slow-down of the page, which leaves the server alone. */
const cpuSlowDown = 4;
const scans = 100;
const warmUps = 10;
const turnedPouches = 5;

/** Scans the sixtieth package onto the cart and takes it back, again and again: told where, and then into a set place. */
export async function run(): Promise<void> {
  const demonstrations = await makeDemonstrations('bench');
  try {
    const { url } = await demonstrations.start();
    const technician = demonstrationSignIns.find(({ role }) => role === 'technician');
    if (!technician) throw new Error('The demonstration has no technician.');
    const caller = await callAs(url, technician);
    const { loadId, waiting, placeCode } = await fillCart(caller, { wait: 1 });
    const [code = ''] = waiting;
    await turnSome(caller, loadId);
    const browser = await launchBrowser();
    try {
      const context = await browser.newContext({ viewport: tablet, baseURL: url });
      await context.addCookies([caller.cookie]);
      const page = await context.newPage();
      await watchScans(page);
      await page.goto(`/loads/${loadId}`);
      await page.getByText('Still on the table, 1').waitFor();
      const before = loadavg()[0] ?? 0;
      for (let turn = 0; turn < warmUps; turn += 1) await measure(page, code);
      const told: ScanTimes[] = [];
      for (let turn = 0; turn < scans / 2; turn += 1) told.push(await measure(page, code));
      await wedge(page, placeCode);
      await page.locator('[data-answer=place-set]').waitFor();
      const placed: ScanTimes[] = [];
      for (let turn = 0; turn < scans / 2; turn += 1) placed.push(await measure(page, code));
      report(told, placed, [before, loadavg()[0] ?? 0]);
    } finally {
      await browser.close();
    }
  } finally {
    await demonstrations.release();
  }
}

/** Findings and their pins are drawn with every scan too, so there are to be some. */
async function turnSome(caller: Caller, loadId: string): Promise<void> {
  const { view } = await caller.get(paths.load(loadId), loadDetailSchema);
  const edits = view.packages
    .filter((entry) => entry.placement !== null)
    .filter((_, turn) => turn % 11 === 5)
    .slice(0, turnedPouches)
    .map(({ packageId, placement }) => ({
      edit: 'turn-paper',
      packageId,
      paper: placement?.paper === 'left' ? 'right' : 'left',
    }));
  await caller.post(`${paths.load(loadId)}/edits`, { edits }, z.unknown());
}

async function measure(page: Page, code: string): Promise<ScanTimes> {
  await page.evaluate('window.scanTimes.begin()');
  await slowDown(page, cpuSlowDown);
  await wedge(page, code);
  const times = await page.evaluate<ScanTimes>('window.scanTimes.taken');
  // What is not measured need not take four times as long.
  await slowDown(page, 1);
  await page.getByRole('button', { name: `Undo: Scan of ${code}` }).click();
  await page.getByText('Still on the table, 1').waitFor();
  return times;
}

const sessions = new WeakMap<Page, CDPSession>();

async function slowDown(page: Page, rate: number): Promise<void> {
  const session = sessions.get(page) ?? (await page.context().newCDPSession(page));
  sessions.set(page, session);
  await session.send('Emulation.setCPUThrottlingRate', { rate });
}

function report(told: readonly ScanTimes[], placed: readonly ScanTimes[], load: readonly [number, number]): void {
  const all = [...told, ...placed];
  const row = (name: string, values: readonly number[]) => [
    name,
    ...[50, 95, 100].map((share) => percentile(values, share).toFixed(1)),
  ];
  console.log(
    `\n  ${scans} scans of the sixtieth package, ${turnedPouches} findings open, page at 1/${cpuSlowDown} of the processor.`,
  );
  console.log('  From the instant the browser got the Enter until two frames after the answer stood in the page.');
  console.log('  Server: from the request leaving the browser until the first byte of the reply.');
  console.log(`  Load average of the machine ${load.map((one) => one.toFixed(1)).join(' before, ')} after.\n`);
  console.log(
    table(
      ['ms', 'p50', 'p95', 'greatest'],
      [
        row(
          'Enter to painted',
          all.map((one) => one.painted),
        ),
        row(
          '  told where',
          told.map((one) => one.painted),
        ),
        row(
          '  into a set place',
          placed.map((one) => one.painted),
        ),
        row(
          'Enter to request',
          all.map((one) => one.sent),
        ),
        row(
          'Server',
          all.map((one) => one.server),
        ),
        row(
          'Reply to page changed',
          all.map((one) => one.changed - one.replied),
        ),
        row(
          'Page changed to painted',
          all.map((one) => one.painted - one.changed),
        ),
      ],
    ),
  );
  const of = (values: readonly number[], share: number) => Number(percentile(values, share).toFixed(1));
  const painted = all.map((one) => one.painted);
  const figures = {
    bench: 'scan',
    packages: 60,
    p50_ms: of(painted, 50),
    p95_ms: of(painted, 95),
    server_p95_ms: of(
      all.map((one) => one.server),
      95,
    ),
  };
  console.log(`\n${JSON.stringify(figures)}`);
}
