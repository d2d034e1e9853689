import assert from 'node:assert/strict';
import type { Page } from 'playwright-core';
import { packageListResponseSchema, type PackageSummary } from '../../../src/contract/packages';
import { paths } from '../../../src/contract/paths';
import { demonstrationRuns } from '../../../seeds/demonstration-packages';
import type { Caller } from '../../../scripts/running/caller';
import { loadPage } from '../pages/load-page';
import { packPage } from '../pages/pack-page';
import type { Journey } from '../support/journey';
import { until } from '../support/see';
import { people } from '../support/stage';

async function packagesOf(caller: Caller, query: string): Promise<readonly PackageSummary[]> {
  return (await caller.get(`${paths.packages}?${query}`, packageListResponseSchema)).packages;
}

/** How the mark at the left of the scan line looks, apart from its words. */
function lookOfMark(page: Page): Promise<string> {
  return page
    .locator('[data-answer] > div')
    .first()
    .evaluate((mark) => {
      const style = getComputedStyle(mark);
      const edges = [style.borderTopStyle, style.boxShadow, style.clipPath, style.backgroundImage];
      return [style.backgroundColor, ...edges, mark.querySelector('svg')?.innerHTML ?? mark.textContent].join(' | ');
    });
}

export const scanAnswers: Journey = {
  name: 'Each of the six answers to a scan has its own words and look, and only one of them changes the load',
  async run(stage) {
    const caller = await stage.callAs(people.technician);
    const elsewhere = await stage.callAs(people.technicianElsewhere);
    const packed = await packagesOf(caller, 'state=packed');
    const code = (wanted: PackageSummary | undefined) => {
      if (!wanted) throw new Error('The demonstration lacks such a package.');
      return wanted.code;
    };
    const run = demonstrationRuns.mixed.name;
    const listed = code((await packagesOf(caller, 'state=staged')).find((one) => one.run?.name === run));
    const expected: readonly (readonly [string, code: string, word: string, words: RegExp])[] = [
      ['taken', listed, 'Taken', /./],
      ['already-here', listed, 'On it', /already on this cart/],
      [
        'not-ready',
        code((await packagesOf(caller, 'state=sterile'))[0]),
        'Not taken',
        /has been through a cycle already/,
      ],
      ['held', code(packed.find((one) => one.heldReason !== null)), 'Held', /Seal open at one corner/],
      ['called-back', code((await packagesOf(caller, 'state=recalled'))[0]), 'Call back', /called back|Internal CI/],
      ['not-known', code((await packagesOf(elsewhere, 'state=packed'))[0]), 'Not known', /not known|No label/i],
    ];
    const others = [
      ['not-ready', code(packed.find((one) => one.isExpired)), /expired on/],
      ['not-known', 'P-10000001-00', /./],
      ['not-known', 'this is no label at all', /./],
      ['not-known', people.lead.badge.slice(0, -1), /./],
    ] as const;

    const station = await stage.openStation({ as: caller });
    await station.goto('/pack/runs');
    await packPage(station).openLoadOf(run);
    const load = loadPage(station);
    const looks = new Map<string, string>();
    for (const [answer, scanned, word, words] of expected) {
      const got = await load.scan(scanned);
      assert.equal(got.answer, answer, got.words);
      assert.equal(got.word, word);
      assert.match(got.words, words);
      looks.set(answer, await lookOfMark(station));
      assert.equal((await load.figures('Load')).scanned, 1, `${answer} changed the load`);
    }
    assert.equal(new Set(looks.values()).size, expected.length, 'no two answers look the same');
    for (const [answer, scanned, words] of others) {
      const got = await load.scan(scanned);
      assert.equal(got.answer, answer, got.words);
      assert.match(got.words, words);
    }

    // One touch takes the last act back.
    await station.getByRole('button', { name: `Undo: Scan of ${listed}` }).click();
    await until(
      'the scan taken back',
      () => load.figures('Load'),
      ({ scanned }) => scanned === 0,
    );
  },
};
