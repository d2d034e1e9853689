import assert from 'node:assert/strict';
import type { Page } from 'playwright-core';
import { packageListResponseSchema } from '../../../src/contract/packages';
import { paths } from '../../../src/contract/paths';
import { demonstrationRuns } from '../../../seeds/demonstration-packages';
import { loadPage } from '../pages/load-page';
import type { Journey } from '../support/journey';
import { see, seeGone, until } from '../support/see';
import { people } from '../support/stage';

const run = demonstrationRuns.mixed.name;
/** More stops than any screen has. */
const mostTabs = 120;

/** What the thing with the focus is called, as a screen reader would say it. */
function focusedName(page: Page): Promise<string> {
  return page.evaluate(() => {
    const focused = document.activeElement;
    if (!focused) return '';
    const labelled = 'labels' in focused ? (focused as HTMLInputElement).labels?.[0]?.textContent : null;
    return (focused.getAttribute('aria-label') ?? labelled ?? focused.textContent).trim();
  });
}

/** Walks on with the Tab key to the thing with this name. */
async function tabTo(page: Page, name: RegExp): Promise<void> {
  const met: string[] = [];
  for (let tab = 0; tab < mostTabs; tab += 1) {
    await page.keyboard.press('Tab');
    const focused = await focusedName(page);
    if (name.test(focused)) return;
    met.push(focused.slice(0, 30));
  }
  throw new Error(`Tab does not lead to ${name}. It led to: ${met.join(' · ')}`);
}

/** Slowly, as hands do: a burst would be a scan. */
async function typeByHand(page: Page, text: string): Promise<void> {
  await page.keyboard.type(text, { delay: 90 });
}

export const keyboardOnly: Journey = {
  name: 'Without a mouse a load is opened, a code keyed in, a shelf counted and the gate reached',
  async run(stage) {
    const caller = await stage.callAs(people.technician);
    const { packages } = await caller.get(`${paths.packages}?state=staged`, packageListResponseSchema);
    const code = packages.find((one) => one.run?.name === run)?.code ?? '';
    const station = await stage.openStation({ as: caller });
    await station.goto('/loads');
    await see(station.getByRole('heading', { level: 1, name: 'Loads' }));
    const load = loadPage(station);

    await tabTo(station, /^Open a load$/);
    await station.keyboard.press('Enter');
    await see(load.sheet.getByRole('heading', { name: 'Open a load' }));
    await tabTo(station, /^Packages/);
    await station.keyboard.press('ArrowDown');
    assert.match(await load.sheet.getByLabel('Packages').locator('option:checked').innerText(), new RegExp(`^${run}`));
    await tabTo(station, /^Cart/);
    // The run has brought its sterilizer, its program and a free cart.
    for (const choice of ['Sterilizer', 'Program', 'Cart']) {
      assert.notEqual(await load.sheet.getByLabel(choice).inputValue(), '', choice);
    }
    await tabTo(station, /^Open the load$/);
    await station.keyboard.press('Enter');
    await load.isOpen();

    await tabTo(station, /^Key in$/);
    await station.keyboard.press('Enter');
    await see(load.sheet.getByLabel('Code'));
    assert.match(await focusedName(station), /^Code/);
    await typeByHand(station, code);
    await station.keyboard.press('Enter');
    await seeGone(load.sheet);
    await until(
      'the package keyed in',
      () => load.figures('Load'),
      ({ scanned }) => scanned === 1,
    );

    const shelf = (await load.figures('Lower shelf')).scanned === 1 ? 'lower shelf' : 'upper shelf';
    await tabTo(station, new RegExp(`^Count ${shelf}$`));
    await station.keyboard.press('Enter');
    await see(load.sheet);
    await typeByHand(station, '1');
    await station.keyboard.press('Enter');
    await seeGone(load.sheet);

    // A package on the drawn shelf is a stop of its own, and opens.
    await tabTo(station, /, (slot|left|right|middle|in the middle)/);
    await station.keyboard.press('Enter');
    await see(load.sheet);
    await station.keyboard.press('Escape');
    await seeGone(load.sheet);

    await tabTo(station, /^Close load$/);
    await station.keyboard.press('Enter');
    // The gate is shut: the focus is led to what holds it, here the shelf that is not counted.
    await see(load.sheet.getByRole('heading', { name: /^Count / }));
    await station.keyboard.press('Escape');
    await seeGone(load.sheet);
  },
};
