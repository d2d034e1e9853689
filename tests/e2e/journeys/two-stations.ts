import assert from 'node:assert/strict';
import { packageListResponseSchema } from '../../../src/contract/packages';
import { paths } from '../../../src/contract/paths';
import { demonstrationRuns } from '../../../seeds/demonstration-packages';
import { wedge } from '../../../scripts/running/wedge';
import { loadPage } from '../pages/load-page';
import { packPage } from '../pages/pack-page';
import type { Journey } from '../support/journey';
import { see, until } from '../support/see';
import { people } from '../support/stage';

const run = demonstrationRuns.mixed.name;

export const twoStations: Journey = {
  name: 'Two stations fill one load and see each other; one label goes into one of two loads, and the other is told',
  async run(stage) {
    const [here, there] = [await stage.callAs(people.technician), await stage.callAs(people.otherTechnician)];
    const { packages } = await here.get(`${paths.packages}?state=staged`, packageListResponseSchema);
    const codes = packages.filter((one) => one.run?.name === run).map((one) => one.code);
    const [stationA, stationB] = [await stage.openStation({ as: here }), await stage.openStation({ as: there })];
    const [a, b] = [loadPage(stationA), loadPage(stationB)];

    await stationA.goto('/pack/runs');
    await packPage(stationA).openLoadOf(run);
    await stationB.goto(new URL(stationA.url()).pathname);
    await b.isOpen();

    // By turns and at the same time; each takes in what the other did.
    await a.mustTake(codes[0] ?? '');
    await b.mustTake(codes[1] ?? '');
    await Promise.all([a.mustTake(codes[2] ?? ''), b.mustTake(codes[3] ?? '')]);
    await Promise.all(
      [a, b].map((load) =>
        until(
          'what both scanned',
          () => load.figures('Load'),
          ({ scanned }) => scanned === 4,
        ),
      ),
    );
    assert.equal((await b.scan(codes[0] ?? '')).answer, 'already-here');

    // Another load at the other station, and one label that nobody has listed, scanned at both at the same moment.
    await stationB.getByRole('link', { name: 'Load' }).first().click();
    await stationB.getByRole('button', { name: 'Open a load' }).click();
    await stationB.getByLabel('Sterilizer').selectOption({ label: 'Sterilizer 2' });
    const program = stationB.getByLabel('Program');
    await program.selectOption({ index: 1 });
    await stationB.getByRole('button', { name: 'Open the load' }).click();
    await b.isOpen();
    const [numberA, numberB] = [await a.number(), await b.number()];
    assert.notEqual(numberA, numberB);
    const loose = (await here.get(`${paths.packages}?state=packed&search=P-14`, packageListResponseSchema)).packages[0];
    if (!loose) throw new Error('Nothing lies loose on the table.');
    const [answerA, answerB] = await Promise.all([a.scan(loose.code), b.scan(loose.code)]);
    const answers = [answerA.answer, answerB.answer].sort();
    assert.deepEqual(answers, ['not-ready', 'taken']);
    const [winner, loser] = answerA.answer === 'taken' ? [numberA, answerB] : [numberB, answerA];
    assert.match(loser.words, new RegExp(`${winner}|another load`));
    await wedge(stationA, loose.code);
    await see(stationA.locator(`[data-answer=${answerA.answer === 'taken' ? 'already-here' : 'not-ready'}]`));
  },
};
