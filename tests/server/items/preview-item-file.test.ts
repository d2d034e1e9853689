import { beforeEach, describe, expect, it } from 'vitest';
import { openTestApp } from '../../support/test-app';
import { fileOf, header, itemFiles, row } from './item-files';
import { addItem, anItem, answerOf, itemsOnFile } from './items-support';

const app = openTestApp();
const { preview, take } = itemFiles(app);

beforeEach(async () => {
  await app.db('items').delete();
});

describe('the preview of a file', () => {
  it('says what would be added, changed and left alone, and writes nothing', async () => {
    await addItem(app, anItem('W-01', { name: 'Minor set' }));
    await take(fileOf(row('T-1')), 'all-or-nothing');
    const before = await itemsOnFile(app);
    const { body, status } = await preview(
      fileOf(
        row('T-1'),
        row('t-2'),
        row('W-01', {
          name: 'Minor set plain',
          cycles: 'dynamic-air-removal 132 C 240-1080 s dry 1800 s',
          length_mm: '560',
          height_mm: '110',
          mass_kg: '5.4',
          metal_mass_kg: '4.97',
          service: 'OR',
        }),
      ),
    );
    expect(status).toBe(200);
    expect(body).toMatchObject({ rows: 3, added: 1, changed: 1, unchanged: 1, refused: 0, problems: [] });
    expect(body.changes).toEqual([
      { line: 3, name: 'T-2', what: 'added', changes: [] },
      {
        line: 4,
        name: 'W-01',
        what: 'changed',
        changes: [{ column: 'name', before: 'Minor set', after: 'Minor set plain' }],
      },
    ]);
    expect(await itemsOnFile(app)).toEqual(before);
  });

  it('says of each row and column what is wrong', async () => {
    const { body } = await preview(
      fileOf(
        row('T-1', { mass_kg: 'heavy', pose: 'upright' }),
        row('T-2', { metal_mass_kg: '3.5' }),
        row('T-3'),
        row('t-3'),
        row('T-4', { cycles: 'W4-30' }),
        row('T 5'),
        row('T-6', { mass_kg: '3400' }),
        `${row('T-7')},surplus`,
        'T-8,cut off',
        row('T-9', { kind: 'pouch', packaging: 'wrap' }),
        row('T-10', { name: '' }),
      ),
    );
    expect(body).toMatchObject({ rows: 11, added: 1, refused: 10 });
    expect(body.problems.map((one) => [one.line, one.column, one.sentence])).toEqual([
      [2, 'mass_kg', '“heavy” is not a number.'],
      [2, 'pose', '“upright” is none of flat, on-edge, tilted.'],
      [3, 'metal_mass_kg', 'Metal and textile together are heavier than the whole.'],
      [5, 'code', 'T-3 stands on line 4 already.'],
      [6, 'cycles', '“W4-30” is not a cycle. Write it like “dynamic-air-removal 132 C 240 s dry 1800 s”.'],
      [7, 'code', 'Letters A to Z, digits and - . _ / only, beginning with a letter or digit.'],
      [8, 'mass_kg', 'At most 500 kg.'],
      [9, null, 'This row has 13 cells, and 12 columns are named.'],
      [10, null, 'This row has 2 cells, and 12 columns are named.'],
      [11, 'packaging', 'Something of the kind pouch is packed in: paper-film-pouch, double-pouch.'],
      [12, 'name', 'Please fill this in.'],
    ]);
  });

  it('refuses a row that leans on a refused one', async () => {
    const withStack = `${header},stands_on`;
    const file = [
      withStack,
      `${row('T-1', { mass_kg: '0' })},`,
      `${row('T-2')},T-1`,
      `${row('T-3')},T-2`,
      `${row('T-4')},T-4`,
    ].join('\n');
    const { body } = await preview(file);
    expect(body).toMatchObject({ added: 1, refused: 3 });
    expect(body.problems.map((one) => [one.line, one.sentence])).toEqual([
      [2, 'At least 0.001 kg.'],
      [3, 'There is no item with the code T-1.'],
      [4, 'There is no item with the code T-2.'],
    ]);
  });

  it('lets the first of two lines have a device identifier', async () => {
    const file = [`${header},device_identifier`, `${row('T-1')},2012345678903`, `${row('T-2')},02012345678903`].join(
      '\n',
    );
    const { body } = await preview(file);
    expect(body.problems).toEqual([
      { line: 3, column: 'device_identifier', sentence: 'T-1 already carries this device identifier.' },
    ]);
  });

  it('lets two items swap their device identifiers', async () => {
    await addItem(app, anItem('P-01'));
    await addItem(app, anItem('P-02'));
    const lead = await app.as('lead');
    const { text } = await answerOf(lead.get('/api/items/export').expect(200));
    const [one, other] = [String(anItem('P-01').deviceIdentifier), String(anItem('P-02').deviceIdentifier)];
    const swapped = text.replace(one, 'X').replace(other, one).replace('X', other);
    const { body } = await take(swapped, 'all-or-nothing');
    expect(body).toMatchObject({ changed: 2, refused: 0 });
    expect(await app.db('items').orderBy('code').pluck('device_identifier')).toEqual([other, one]);
  });
});
