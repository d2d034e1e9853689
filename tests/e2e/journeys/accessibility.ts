import assert from 'node:assert/strict';
import type { Page } from 'playwright-core';
import { loadDetailSchema, loadOpeningOptionsSchema, openLoadResponseSchema } from '../../../src/contract/loads';
import { paths } from '../../../src/contract/paths';
import { z } from 'zod';
import { phone, tablet } from '../../../scripts/running/browser';
import type { Caller } from '../../../scripts/running/caller';
import { fillCart } from '../../../scripts/running/full-cart';
import { faultsOf } from '../support/accessibility';
import type { Journey } from '../support/journey';
import { see } from '../support/see';
import { people, personWith, type Size, type Stage } from '../support/stage';

/** A screen or what lies over one; `show` brings it about from the address. */
type Sight = {
  readonly name: string;
  readonly address: string;
  readonly show?: (page: Page) => Promise<void>;
};

const press = (name: string | RegExp) => async (page: Page) => {
  await page.getByRole('button', { name }).filter({ visible: true }).first().click();
  await see(page.getByRole('dialog').or(page.getByRole('alertdialog')));
};

async function openFirstRow(page: Page): Promise<void> {
  await page.getByRole('table').getByRole('row').nth(1).getByRole('button').click();
}

const stock: readonly Sight[] = [
  { name: 'Items', address: '/stock/items' },
  { name: 'An item', address: '/stock/items', show: openFirstRow },
  { name: 'Item form', address: '/stock/items?form=new' },
  { name: 'Sterilizers', address: '/stock/sterilizers' },
  { name: 'A sterilizer', address: '/stock/sterilizers', show: openFirstRow },
  { name: 'Programs', address: '/stock/programs' },
  { name: 'Carts', address: '/stock/carts' },
  { name: 'Holders', address: '/stock/holders' },
  { name: 'Kinds of holders', address: '/stock/holder-kinds' },
  { name: 'Air-removal test', address: '/stock/air-removal' },
];

const packing: readonly Sight[] = [
  { name: 'Packing station', address: '/pack/station' },
  { name: 'Packing an item', address: '/pack/station', show: openFirstRow },
  { name: 'Packages', address: '/pack/packages' },
  {
    name: 'A package',
    address: '/pack/packages',
    show: async (page) => {
      await openFirstRow(page);
      await see(page.getByRole('dialog'));
    },
  },
  { name: 'Runs', address: '/pack/runs' },
  { name: 'New run', address: '/pack/runs', show: press('New run') },
];

const lessons: readonly Sight[] = [
  { name: 'Lessons', address: '/lessons' },
  { name: 'A lesson', address: '/lessons/lid-filter-covered' },
  { name: 'A lesson with a card', address: '/lessons/package-expired' },
  {
    name: 'A lesson, answered',
    address: '/lessons/lid-filter-covered',
    show: async (page) => {
      for (const answer of ['Yes, half is open.', 'No, take the pouch off.']) {
        await page.getByRole('button', { name: answer }).click();
      }
      await see(page.getByText('Kept: you have finished this lesson.'));
    },
  },
];

const others: readonly Sight[] = [
  { name: 'Today', address: '/' },
  { name: 'Loads', address: '/loads' },
  { name: 'Opening a load', address: '/loads', show: press('Open a load') },
  { name: 'New password', address: '/new-password' },
  { name: 'Nothing here', address: '/no-such-place' },
];

function sightsOfLoads(full: string, empty: string): readonly Sight[] {
  const address = `/loads/${full}`;
  return [
    { name: 'An empty load', address: `/loads/${empty}` },
    { name: 'A load of 60', address },
    { name: 'Keying in', address, show: press('Key in') },
    { name: 'Counting', address, show: press(/^Count lower shelf$/) },
    { name: 'Giving up', address, show: press('Give the load up') },
    { name: 'Stickers', address, show: press('Load stickers') },
    {
      name: 'A package on the cart',
      address,
      show: async (page) => {
        await page.locator('[data-walk="0"]').first().click();
        await see(page.getByRole('dialog'));
      },
    },
    {
      name: 'A finding',
      address,
      show: async (page) => {
        await page.locator('button[id^="finding-"]').first().click();
        await see(page.locator('button[id^="finding-"][aria-expanded="true"]'));
      },
    },
    {
      name: 'The lesson of a finding',
      address,
      show: async (page) => {
        await page.locator('button[id^="finding-"]').first().click();
        await press('Why? 90 seconds')(page);
      },
    },
  ];
}

function sightsOfPeople(size: Size): readonly Sight[] {
  const who = size.width < 700 ? /^More$/ : /is at this station/;
  return [
    { name: 'People', address: '/people' },
    { name: 'Adding a person', address: '/people', show: press('Add a person') },
    { name: 'Who is here', address: '/people', show: press(who) },
    {
      name: 'Changing the person',
      address: '/people',
      show: async (page) => {
        await press(who)(page);
        await page.getByRole('dialog').getByRole('button', { name: 'Change person' }).click();
        await see(page.getByRole('heading', { name: 'Change person' }));
      },
    },
  ];
}

/** A load of nothing, and one of sixty with findings. */
async function prepareLoads(caller: Caller): Promise<{ full: string; empty: string }> {
  const { loadId: full } = await fillCart(caller, { wait: 1 });
  const { view } = await caller.get(paths.load(full), loadDetailSchema);
  const edits = view.packages
    .filter((one) => one.placement?.paper === 'left')
    .slice(4, 6)
    .map(({ packageId }) => ({ edit: 'turn-paper', packageId, paper: 'right' }));
  await caller.post(`${paths.load(full)}/edits`, { edits }, z.unknown());
  const { sterilizers } = await caller.get(`${paths.loads}/opening-options`, loadOpeningOptionsSchema);
  const option = sterilizers.find(({ sterilizer }) => sterilizer.code === 'ST-2');
  const { loadId: empty } = await caller.post(
    paths.loads,
    {
      sterilizerId: option?.sterilizer.id,
      programId: option?.programs[0]?.id,
      cartId: option?.carts.find((cart) => cart.isFree)?.id,
      runId: null,
    },
    openLoadResponseSchema,
  );
  return { full, empty };
}

async function prepare(stage: Stage) {
  const loads = await prepareLoads(await stage.callAs(people.technician));
  return {
    loads,
    administrator: await stage.callAs(personWith('T9003')),
    supervisor: await stage.callAs(people.supervisor),
  };
}

async function lookAt(stage: Stage, size: Size, prepared: Awaited<ReturnType<typeof prepare>>): Promise<string[]> {
  const { loads, administrator, supervisor } = prepared;
  const faults: string[] = [];
  for (const [as, sights] of [
    [null, [{ name: 'Sign-in', address: '/sign-in' }]],
    [supervisor, [...others, ...lessons, ...packing, ...stock, ...sightsOfLoads(loads.full, loads.empty)]],
    [administrator, sightsOfPeople(size)],
  ] as const) {
    const station = await stage.openStation({
      size,
      isStill: true,
      ...(as ? { as } : {}),
      expected: [{ method: 'GET', path: /no-such-place/, status: 404 }],
    });
    for (const { name, address, show } of sights as readonly Sight[]) {
      await station.goto(address);
      await see(station.getByRole('heading'));
      await station.waitForLoadState('networkidle');
      await show?.(station);
      faults.push(...(await faultsOf(station)).map((fault) => `${name} at ${size.width}: ${fault}`));
    }
    await station.context().close();
  }
  return faults;
}

export const accessibility: Journey = {
  name: 'No screen and no sheet has a fault that axe can find, on the tablet and on the phone',
  run: async (stage) => {
    const prepared = await prepare(stage);
    // Side by side: each waits most of its time.
    const faults = await Promise.all([tablet, phone].map((size) => lookAt(stage, size, prepared)));
    assert.deepEqual(faults.flat(), []);
  },
};
