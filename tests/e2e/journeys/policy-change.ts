import assert from 'node:assert/strict';
import { signInPage } from '../pages/sign-in-page';
import { closeALoad } from '../support/close-a-load';
import type { Journey } from '../support/journey';
import { see, seeGone } from '../support/see';
import { people, personWith } from '../support/stage';

const infectionPrevention = personWith('T3012');

export const policyChange: Journey = {
  name: 'One person proposes a change of policy, another confirms it at the same station, and a closed load keeps its verdict',
  async run(stage) {
    const loadId = await closeALoad(await stage.callAs(people.technician));
    const station = await stage.openStation({ as: await stage.callAs(people.supervisor) });

    await station.goto('/policy/settings');
    await station.getByRole('link', { name: 'Propose a change' }).click();
    await station.getByLabel('When a challenge device has to be in the load').selectOption('In every load');
    await station.getByRole('button', { name: 'Propose 1 change' }).click();
    await see(station.getByText('Please fill this in.'));
    await station.getByLabel('Reason').fill('From now on every load has one.');
    await station.getByRole('button', { name: 'Propose 1 change' }).click();
    const proposed = station.getByRole('region', { name: '1 change proposed' });
    await see(proposed);

    // Who proposed it presses in vain.
    await proposed.getByRole('button', { name: 'Confirm version 3' }).press('Enter');
    await see(station.getByText('Another person has to confirm it.'));
    assert.equal(await station.getByRole('alertdialog').count(), 0);

    await signInPage(station).signInWithBadge(infectionPrevention);
    await proposed.getByRole('button', { name: 'Confirm version 3' }).click();
    await station.getByRole('alertdialog').getByRole('button', { name: 'Confirm version 3' }).click();
    await seeGone(proposed);
    await station.getByRole('link', { name: /^Versions/ }).click();
    const newest = station.getByRole('listitem').filter({ has: station.getByRole('heading', { name: 'Version 3' }) });
    await see(newest.getByText(people.supervisor.name));
    await see(newest.getByText(infectionPrevention.name));

    await station.goto(`/loads/${loadId}`);
    await see(station.getByText(/^Policy version 2/));
    await station.getByRole('link', { name: 'Judge it again' }).click();
    await see(station.getByText('The verdict of then stands.'));
    await see(station.getByRole('region', { name: 'As closed' }).getByText('Policy version 2'));
    await see(station.getByRole('region', { name: 'By today’s rules' }).getByText('Policy version 3'));
    await see(station.getByRole('region', { name: 'Found only today, 1' }).getByText(/no challenge device is placed/));
  },
};
