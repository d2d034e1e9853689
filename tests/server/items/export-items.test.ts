import { beforeEach, describe, expect, it } from 'vitest';
import { openTestApp } from '../../support/test-app';
import { cycles, itemFiles } from './item-files';
import { addItem, anItem, answerOf } from './items-support';

const app = openTestApp();
const { preview, take } = itemFiles(app);

beforeEach(async () => {
  await app.db('items').delete();
});

describe('the file that goes out', () => {
  it('reads back to the same', async () => {
    for (const code of ['P-19', 'W-10', 'W-12', 'C-05', 'C-12', 'G-01']) await addItem(app, anItem(code));
    await addItem(
      app,
      anItem('C-17', { standsOn: ['C-05', 'C-12'], note: '=SUM(A1:A9), "quoted"; and; more', service: '-x' }),
    );
    const lead = await app.as('lead');
    const out = await answerOf(lead.get('/api/items/export').expect(200));
    expect(out.headers['content-type']).toBe('text/csv; charset=utf-8');
    expect(out.headers['content-disposition']).toContain('items.csv');
    const { body } = await preview(out.text);
    expect(body).toMatchObject({ rows: 7, unchanged: 7, added: 0, changed: 0, problems: [] });
    const before = await app.db('items').orderBy('code').select('*');
    await app.db('items').delete();
    expect((await take(out.text, 'all-or-nothing')).body).toMatchObject({ added: 7, refused: 0 });
    const after = await app.db('items').orderBy('code').select('*');
    const apart = ({ id: _id, ...rest }: Record<string, unknown>) => rest;
    expect(after.map(apart)).toEqual(before.map(apart));
  });

  it('has nothing that a spreadsheet would run', async () => {
    await addItem(app, anItem('W-03', { note: "=cmd|' /C calc'!A0", service: '@SUM(1)' }));
    const lead = await app.as('lead');
    const { text } = await answerOf(lead.get('/api/items/export').expect(200));
    expect(text).toContain(`'=cmd|' /C calc'!A0`);
    expect(text).toContain(",'@SUM(1),");
    expect(text).not.toMatch(/[,\n"][=+@]/);
  });

  it('has a template that explains its columns and is a file of no rows', async () => {
    const technician = await app.as('technician');
    const { text } = await answerOf(technician.get('/api/items/import/template').expect(200));
    expect(text).toContain('# length_mm: Long side, lying flat. Must be filled in. Example: 560');
    const { body } = await preview(text);
    expect(body.code).toBe('file.no-rows');
    const filled = await preview(
      `${text}W-50,Set,wrapped-tray,wrap,500,260,90,3,2.8,,,,flat,,,,,,${cycles},,,,60,,,,,,,,\r\n`,
    );
    expect(filled.body).toMatchObject({ added: 1, refused: 0 });
  });
});
