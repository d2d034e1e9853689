import assert from 'node:assert/strict';
import { itemListResponseSchema } from '../../../src/contract/items';
import { paths } from '../../../src/contract/paths';
import type { Journey } from '../support/journey';
import { see, seeGone } from '../support/see';
import { people } from '../support/stage';

const columns = [
  'code',
  'name',
  'kind',
  'packaging',
  'length_mm',
  'width_mm',
  'height_mm',
  'mass_kg',
  'pose',
  'cycles',
];
const cycle = 'dynamic-air-removal 132 C 240-600 s dry 1200 s';
const rows = [
  ['P-90', 'Bandage scissors', 'pouch', 'paper-film-pouch', '250', '90', '14', '0.11', 'on-edge', cycle],
  ['P-91', 'Towel clips', 'pouch', 'paper-film-pouch', 'long', '90', '14', '0.11', 'on-edge', cycle],
  ['P-90', 'Bandage scissors again', 'pouch', 'paper-film-pouch', '250', '90', '14', '0.11', 'on-edge', cycle],
  ['P-92', '', 'pouch', 'paper-film-pouch', '250', '90', '14', '0.11', 'on-edge', cycle],
  ['P-93', 'Skin hooks', 'pouch', 'paper-film-pouch', '250', '90', '14', '0.07', 'on-edge', cycle],
];

export const importCsv: Journey = {
  name: 'A file of items is looked at before anything happens, and its good rows go in without the bad',
  async run(stage) {
    const caller = await stage.callAs(people.supervisor);
    const before = await caller.get(paths.items, itemListResponseSchema);
    const station = await stage.openStation({
      as: caller,
      expected: [
        { method: 'POST', path: /\/import\/preview$/, status: 422 },
        { method: 'POST', path: /\/import\/preview$/, status: 400 },
      ],
    });
    await station.goto('/stock/items');
    await station.getByRole('button', { name: 'Import a CSV' }).click();
    const sheet = station.getByRole('dialog');

    // A file that is no list of items is told so, in words.
    await sheet.getByLabel('CSV file').setInputFiles({
      name: 'something-else.csv',
      mimeType: 'text/csv',
      buffer: Buffer.from('first,second\n1,2\n'),
    });
    await see(sheet.getByText(/column/i));
    assert.equal((await caller.get(paths.items, itemListResponseSchema)).total, before.total);

    await sheet.getByLabel('CSV file').setInputFiles({
      name: 'items.csv',
      mimeType: 'text/csv',
      buffer: Buffer.from([columns, ...rows].map((row) => row.join(',')).join('\n')),
    });
    const take = sheet.getByRole('button', { name: 'Import the 2 good rows, leave the other 3' });
    await see(take);
    const problems = await sheet.getByRole('table').first().innerText();
    assert.match(problems, /Line 3\s+length_mm/);
    assert.match(problems, /Line 4\s+code\s+P-90 stands on line 2 already/);
    assert.match(problems, /Line 5\s+name/);
    assert.equal(
      (await caller.get(paths.items, itemListResponseSchema)).total,
      before.total,
      'looking changes nothing',
    );

    await take.click();
    await seeGone(sheet);
    const { items } = await caller.get(`${paths.items}?search=P-9`, itemListResponseSchema);
    assert.deepEqual(
      items.map((one) => `${one.code} ${one.name}`),
      ['P-90 Bandage scissors', 'P-93 Skin hooks'],
    );
    assert.equal((await caller.get(paths.items, itemListResponseSchema)).total, before.total + 2);
    await station.getByLabel('Find an item').fill('P-93');
    await see(station.getByRole('table', { name: 'Items' }).getByText('Skin hooks'));
  },
};
