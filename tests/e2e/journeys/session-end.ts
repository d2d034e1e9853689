import assert from 'node:assert/strict';
import { packageListResponseSchema } from '../../../src/contract/packages';
import { paths } from '../../../src/contract/paths';
import { demonstrationRuns } from '../../../seeds/demonstration-packages';
import { wedge } from '../../../scripts/running/wedge';
import { loadPage } from '../pages/load-page';
import { packPage } from '../pages/pack-page';
import { signInPage } from '../pages/sign-in-page';
import type { Journey } from '../support/journey';
import { see, seeGone, until } from '../support/see';
import { people } from '../support/stage';

const run = demonstrationRuns.mixed.name;

export const sessionEnd: Journey = {
  name: 'A sign-in that ends in the middle of scanning asks who is there, and no scan is lost',
  async run(stage) {
    const caller = await stage.callAs(people.technician);
    const { packages } = await caller.get(`${paths.packages}?state=staged`, packageListResponseSchema);
    const [first = '', second = '', third = ''] = packages
      .filter((one) => one.run?.name === run)
      .map((one) => one.code);
    const station = await stage.openStation({
      as: caller,
      expected: [
        { method: 'POST', path: /\/scans$/, status: 401 },
        { method: 'GET', path: /^\/api\//, status: 401 },
      ],
    });
    await station.goto('/pack/runs');
    await packPage(station).openLoadOf(run);
    const load = loadPage(station);
    const number = await load.number();
    await load.mustTake(first);

    // The session is gone from the server's point of view; the next two scans meet that.
    await station.context().clearCookies();
    await wedge(station, second);
    await see(load.sheet.getByRole('heading', { name: 'Sign in to go on' }));
    await see(load.sheet.getByText(`The sign-in of ${people.technician.name} has ended.`));
    assert.equal((await load.figures('Load')).scanned, 1);

    await signInPage(station).signInWithBadge(people.technician);
    await seeGone(load.sheet);
    await until(
      'the scan that waited',
      () => load.figures('Load'),
      ({ scanned }) => scanned === 2,
    );
    assert.equal((await load.lastAnswer()).answer, 'taken');
    assert.equal(await load.number(), number);
    await load.mustTake(third);
    assert.equal((await load.figures('Load')).scanned, 3);

    // Somebody else comes: what was scanned in the first name is not taken in the second, and the screen says so.
    await station.context().clearCookies();
    await wedge(station, third);
    await see(load.sheet.getByRole('heading', { name: 'Sign in to go on' }));
    await signInPage(station).signInWithBadge(people.otherTechnician);
    await see(load.scanLine.getByText('Do it again in your own name.'));
    assert.equal((await load.figures('Load')).scanned, 3);
  },
};
