import assert from 'node:assert/strict';
import type { Locator, Page } from 'playwright-core';
import { wedge } from '../../../scripts/running/wedge';
import { see, seeGone, until } from '../support/see';

export type Answer = {
  readonly answer: string;
  /** The word in the mark: "Taken". */
  readonly word: string;
  /** Everything the scan line says. */
  readonly words: string;
};

/** The Load screen at one station. */
export function loadPage(page: Page) {
  const sheet = page.getByRole('dialog').or(page.getByRole('alertdialog'));
  const scanLine = page.getByRole('region', { name: 'Last scan' });
  const findings = page.getByRole('region', { name: 'Findings' });
  const gate = page.getByRole('region', { name: 'What holds the load open' });
  const table = page.getByRole('region', { name: 'Still on the table' });
  const reckoning = page.getByRole('table', { name: 'Listed, scanned and counted' });

  /** Playwright does not click what is aria-disabled; people do, and are then told why it is. */
  async function press(button: Locator): Promise<void> {
    await button.focus();
    await page.keyboard.press('Enter');
  }

  async function turnNow(): Promise<number> {
    const said = page.locator('[data-scan-turn]');
    return (await said.count()) === 0 ? 0 : Number(await said.first().getAttribute('data-scan-turn'));
  }

  async function figures(row: string): Promise<{ listed: number; scanned: number; counted: string }> {
    const cells = await reckoning.getByRole('row').filter({ hasText: row }).getByRole('cell').allInnerTexts();
    const [listed = '', scanned = '', counted = ''] = cells.slice(-3);
    return { listed: Number(listed), scanned: Number(scanned), counted };
  }

  async function findingTitles(): Promise<string[]> {
    return findings.locator('ol > li').locator('button[id^="finding-"]').allInnerTexts();
  }

  return {
    sheet,
    scanLine,
    findings,
    gate,
    table,
    figures,
    findingTitles,

    async isOpen(): Promise<void> {
      await see(page.getByRole('heading', { level: 1, name: /^Load / }));
    },

    async number(): Promise<string> {
      const heading = await page.getByRole('heading', { level: 1, name: /^Load / }).innerText();
      return heading.replace(/^Load\s+/, '');
    },

    /** Scans with the hand scanner and waits for what the scan line says to it. */
    async scan(code: string): Promise<Answer> {
      const before = await turnNow();
      await wedge(page, code);
      await until(`an answer to ${code}`, turnNow, (turn) => turn > before);
      return this.lastAnswer();
    },

    async lastAnswer(): Promise<Answer> {
      const said = page.locator('[data-answer]').first();
      const words = await said.innerText();
      return {
        answer: (await said.getAttribute('data-answer')) ?? '',
        word: (words.split('\n').find((line) => line.trim().length > 1) ?? '').trim(),
        words: words.replaceAll(/\s+/g, ' '),
      };
    },

    async mustTake(code: string): Promise<Answer> {
      const answer = await this.scan(code);
      assert.equal(answer.answer, 'taken', `${code}: ${answer.words}`);
      return answer;
    },

    async mustSetPlace(code: string): Promise<Answer> {
      const answer = await this.scan(code);
      assert.equal(answer.answer, 'place-set', `${code}: ${answer.words}`);
      return answer;
    },

    async whereToPutIt(): Promise<string> {
      return scanLine.innerText();
    },

    async tellMeWhere(): Promise<void> {
      await scanLine.getByRole('button', { name: 'Tell me where instead' }).click();
    },

    async keyIn(code: string): Promise<void> {
      await page.getByRole('button', { name: 'Key in' }).click();
      await sheet.getByLabel('Code').fill(code);
      await sheet.getByRole('button', { name: 'Take this code' }).click();
      await seeGone(sheet);
    },

    async scanWithCamera(): Promise<Answer> {
      const before = await turnNow();
      await page.getByRole('button', { name: 'Key in' }).click();
      await sheet.getByRole('button', { name: 'Use the camera' }).click();
      await see(sheet.getByLabel('Picture of the camera'));
      await until('an answer to what the camera sees', turnNow, (turn) => turn > before);
      const answer = await this.lastAnswer();
      await sheet.getByRole('button', { name: 'Close' }).click();
      await seeGone(sheet);
      return answer;
    },

    /** One package of the shelf that is drawn from above. */
    onPlan(name: string | RegExp): Locator {
      return page.getByRole('group', { name: /from above, the door at the bottom/ }).getByRole('button', { name });
    },

    async chooseShelf(name: string): Promise<void> {
      await reckoning.getByRole('button', { name: new RegExp(`^${name}`) }).click();
      await see(page.getByRole('heading', { name: `${name}, from above` }));
    },

    async openPackage(name: string | RegExp, { turn = 0 }: { readonly turn?: number } = {}): Promise<void> {
      await this.onPlan(name).nth(turn).click();
      await see(sheet);
    },

    /** Listed and not scanned, or scanned and without a place. */
    async openFromTable(code: string): Promise<void> {
      const more = table.getByRole('button', { name: /^Show \d+ more$/ });
      if (await more.isVisible()) await more.click();
      await table.getByRole('button', { name: code }).click();
      await see(sheet);
    },

    async moveTo(place: string, slot: string): Promise<void> {
      await sheet.getByLabel('Move it to').selectOption({ label: place });
      await sheet.getByRole('button', { name: slot, exact: true }).click();
      await see(sheet.getByRole('status').filter({ hasText: `${place}, ${slot.toLowerCase()}` }));
    },

    /** Of the open finding. Also where it is not allowed: a blocked button is there to say why. */
    async letItStay(): Promise<void> {
      await press(findings.getByRole('button', { name: 'Let it stay' }));
    },

    async done(): Promise<void> {
      await sheet.getByRole('button', { name: 'Done' }).click();
      await seeGone(sheet);
    },

    /** Opens the finding with this title and returns what it says. */
    async readFinding(title: RegExp): Promise<string> {
      const button = findings.getByRole('button', { name: title }).first();
      await see(button);
      if ((await button.getAttribute('aria-expanded')) !== 'true') await button.click();
      const open = findings.locator('li').filter({ has: page.locator('[aria-expanded="true"]') });
      return open.innerText();
    },

    /** Puts the open finding right by its own button. */
    async fix(): Promise<string> {
      const open = findings.locator('li').filter({ has: page.locator('[aria-expanded="true"]') });
      const button = open.getByRole('button').filter({ hasNotText: 'Let it stay' }).nth(1);
      const words = await button.innerText();
      await button.click();
      return words;
    },

    async noFindingLike(title: RegExp): Promise<void> {
      await seeGone(findings.getByRole('button', { name: title }));
    },

    async count(shelf: string, pieces: number): Promise<void> {
      await reckoning
        .getByRole('button', { name: new RegExp(`(Count ${shelf.toLowerCase()}|^${shelf}: counted)`) })
        .click();
      await this.enterCount(pieces);
    },

    async enterCount(pieces: number): Promise<void> {
      await see(sheet);
      for (const digit of String(pieces)) await sheet.getByRole('button', { name: digit, exact: true }).click();
      await sheet.getByRole('button', { name: 'That is what I count' }).click();
      await seeGone(sheet);
    },

    async gateSays(words: string | RegExp): Promise<void> {
      await see(gate.getByText(words));
    },

    /** Also while something holds the load open: the button then leads there. */
    async close(): Promise<void> {
      await press(gate.getByRole('button', { name: 'Close load' }));
    },
  };
}

export type LoadPage = ReturnType<typeof loadPage>;
