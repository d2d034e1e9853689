import assert from 'node:assert/strict';
import type { Page } from 'playwright-core';
import { loadDetailSchema, loadOpeningOptionsSchema, openLoadResponseSchema } from '../../../src/contract/loads';
import { paths } from '../../../src/contract/paths';
import { policyOverviewSchema, policyProposalResponseSchema } from '../../../src/contract/policies';
import { z } from 'zod';
import { phone, tablet } from '../../../scripts/running/browser';
import type { Caller } from '../../../scripts/running/caller';
import { fillCart } from '../../../scripts/running/full-cart';
import { faultsOf } from '../support/accessibility';
import { closeALoad } from '../support/close-a-load';
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
  {
    // Drawing, card, a wrong answer and the right one.
    name: 'A lesson',
    address: '/lessons/package-expired',
    show: async (page) => {
      for (const answer of ['Sterilize it as it is.', 'Have it packed again.']) {
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

function sightsOfPolicy(closed: string): readonly Sight[] {
  return [
    { name: 'The policy, with a change proposed', address: '/policy/settings' },
    { name: 'Confirming a change', address: '/policy/settings', show: press(/^Confirm version/) },
    {
      name: 'Versions of the policy',
      address: '/policy/versions',
      show: (page) => page.getByText(/^All \d+ settings of version 2$/).click(),
    },
    { name: 'A closed load', address: `/loads/${closed}` },
    { name: 'A load judged again', address: `/loads/${closed}/judged-again` },
  ];
}

/** Filled in wrongly, so that its complaints are there too; where nothing is proposed yet. */
const proposing: readonly Sight[] = [
  {
    name: 'Proposing a change of policy',
    address: '/policy/propose',
    show: async (page) => {
      await page.getByLabel('Least clearance to the chamber walls').fill('far');
      await page.getByRole('button', { name: 'Propose it' }).click();
      await see(page.getByText('Please write a number.'));
    },
  },
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

/** A change that waits for its second person. */
async function proposeChange(caller: Caller): Promise<void> {
  const { today, versions } = await caller.get(paths.policies, policyOverviewSchema);
  await caller.post(
    paths.policyProposals,
    {
      baseNumber: versions[0]?.number,
      changes: { packageClearanceMm: 30, challengeDevice: 'every-load' },
      reason: 'The makers of the new trays ask for it.',
      effectiveOn: today,
    },
    policyProposalResponseSchema,
  );
}

async function prepare(stage: Stage) {
  const technician = await stage.callAs(people.technician);
  const closed = await closeALoad(technician);
  const loads = await prepareLoads(technician);
  const administrator = await stage.callAs(personWith('T9003'));
  await proposeChange(administrator);
  return {
    loads: { ...loads, closed },
    administrator,
    supervisor: await stage.callAs(people.supervisor),
    // Of the place where nothing is proposed, and where inches are used.
    administratorElsewhere: await stage.callAs(personWith('Q101')),
  };
}

async function lookAt(stage: Stage, size: Size, prepared: Awaited<ReturnType<typeof prepare>>): Promise<string[]> {
  const { loads, administrator, supervisor, administratorElsewhere } = prepared;
  const faults: string[] = [];
  for (const [as, sights] of [
    [null, [{ name: 'Sign-in', address: '/sign-in' }]],
    [
      supervisor,
      [
        ...others,
        ...lessons,
        ...packing,
        ...stock,
        ...sightsOfLoads(loads.full, loads.empty),
        ...sightsOfPolicy(loads.closed),
      ],
    ],
    [administrator, sightsOfPeople(size)],
    [administratorElsewhere, proposing],
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
