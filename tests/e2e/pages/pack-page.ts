import type { Page } from 'playwright-core';
import { see } from '../support/see';

/** The packing station and the runs. */
export function packPage(page: Page) {
  return {
    /** Packs so many of an item and prints their labels. Returns their codes and the address of the labels. */
    async pack(itemCode: string, quantity: number): Promise<{ codes: string[]; pdf: string }> {
      await page.getByRole('link', { name: 'Pack' }).first().click();
      await page.getByRole('link', { name: 'Packing station' }).click();
      await page.getByLabel('Find an item').fill(itemCode);
      const items = page.getByRole('table', { name: 'Items that can be packed' });
      await items.getByRole('row').filter({ hasText: itemCode }).getByRole('button').click();
      await page.getByLabel('Contents complete and in order').check();
      await page.getByLabel('Internal CI lies inside').check();
      await page.getByLabel('External CI is on the outside').check();
      await page.getByLabel('How many').fill(String(quantity));
      const tab = page.context().waitForEvent('page');
      await page.getByRole('button', { name: quantity === 1 ? 'Print 1 label' : `Print ${quantity} labels` }).click();
      const open = page.getByRole('link', { name: 'Open the labels' });
      await see(open);
      // The labels come up in a tab of their own, ready to be printed.
      await (await tab).close();
      const codes = await page.getByRole('list', { name: 'Codes' }).getByRole('listitem').allInnerTexts();
      return { codes: codes.map((code) => code.trim()), pdf: (await open.getAttribute('href')) ?? '' };
    },

    /** Stages what has just been packed. */
    async stageInto(run: string): Promise<void> {
      const choice = page.getByLabel('Stage into a run');
      const option = choice.locator('option').filter({ hasText: run });
      await choice.selectOption((await option.getAttribute('value')) ?? '');
      await page.getByRole('button', { name: /^Stage (it|\d+)$/ }).click();
      await see(page.getByText(`staged into “${run}”`));
    },

    /** Opens the load of a run that waits. */
    async openLoadOf(run: string): Promise<void> {
      await page.getByRole('link', { name: 'Runs' }).click();
      await page
        .getByRole('link', { name: run })
        .or(page.getByRole('button', { name: run }))
        .first()
        .click();
      await page.getByRole('button', { name: 'Open its load' }).click();
      await page.getByRole('button', { name: 'Open the load' }).click();
      await see(page.getByRole('heading', { level: 1, name: /^Load / }));
    },
  };
}
