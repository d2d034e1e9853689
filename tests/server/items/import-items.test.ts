import { beforeEach, describe, expect, it } from 'vitest';
import { anId, openTestApp } from '../../support/test-app';
import { fileOf, itemFiles, row } from './item-files';
import { addItem, anItem, answerOf, itemsOnFile } from './items-support';

const app = openTestApp();
const { preview, take } = itemFiles(app);

beforeEach(async () => {
  await app.db('items').delete();
});

describe('taking a file over', () => {
  const mixed = fileOf(row('T-1'), row('T-2', { mass_kg: 'x' }), row('T-3'));

  it('writes all of it, with each item in the history', async () => {
    const requestId = anId();
    const { body } = await take(fileOf(row('T-1'), row('T-2')), 'all-or-nothing', { requestId });
    expect(body).toEqual({ rows: 2, added: 2, changed: 0, unchanged: 0, refused: 0 });
    const events = await app
      .db('audit_events')
      .where({ request_id: requestId })
      .orderBy('id')
      .select<{ kind: string; payload: unknown }[]>('kind', 'payload');
    expect(events.map((event) => [event.kind, event.payload])).toEqual([
      ['item.added', { code: 'T-1' }],
      ['item.added', { code: 'T-2' }],
      ['items.imported', { added: 2, changed: 0, refused: 0 }],
    ]);
  });

  it('writes nothing when one row is bad and all were asked for', async () => {
    const before = await itemsOnFile(app);
    const { body, status } = await take(mixed, 'all-or-nothing');
    expect(status).toBe(422);
    expect(body).toMatchObject({
      code: 'import.rows-refused',
      detail: 'One row has something to put right, so nothing was imported.',
    });
    expect(await itemsOnFile(app)).toEqual(before);
  });

  it('writes the good rows without the bad when that was asked for', async () => {
    const { body } = await take(mixed, 'good-rows');
    expect(body).toEqual({ rows: 3, added: 2, changed: 0, unchanged: 0, refused: 1 });
    expect(await app.db('items').orderBy('code').pluck('code')).toEqual(['T-1', 'T-3']);
  });

  it('does once what is asked twice', async () => {
    const requestId = anId();
    const file = fileOf(row('T-1'));
    const digest = (await preview(file)).body.digest;
    const first = await take(file, 'all-or-nothing', { requestId, digest });
    await app.db('items').where({ code: 'T-1' }).update({ name: 'Changed since' });
    const second = await take(file, 'all-or-nothing', { requestId, digest });
    expect(second.body).toEqual(first.body);
    expect(await app.db('items').first('name')).toEqual({ name: 'Changed since' });
    const other = await take(fileOf(row('T-2')), 'all-or-nothing', { requestId });
    expect([other.status, other.body.code]).toEqual([409, 'request.reused']);
  });

  it('goes by the preview: what changed since stops it', async () => {
    await addItem(app, { ...anItem('W-03'), code: 'T-1' });
    const file = fileOf(row('T-1'));
    const digest = (await preview(file)).body.digest;
    await app.db('items').update({ version: 2 });
    const { body, status } = await take(file, 'all-or-nothing', { digest });
    expect([status, body.code]).toEqual([409, 'import.changed-meanwhile']);
    const swapped = await take(fileOf(row('T-9')), 'all-or-nothing', { digest });
    expect([swapped.status, swapped.body.code]).toEqual([409, 'import.changed-meanwhile']);
    expect(await app.db('items').pluck('name')).toEqual([anItem('W-03').name]);
  });

  it('keeps what the file has no column for', async () => {
    await addItem(app, anItem('W-03', { note: 'Keep me', ifuReference: 'IFU-9' }));
    await take(fileOf(row('W-03')), 'all-or-nothing');
    expect(await app.db('items').first('note', 'ifu_reference', 'name', 'version')).toEqual({
      note: 'Keep me',
      ifu_reference: 'IFU-9',
      name: 'Tray W-03',
      version: 2,
    });
  });

  it('does not reach into another facility', async () => {
    await addItem(app, anItem('W-03'), 'B');
    const { body } = await take(fileOf(row('W-03')), 'all-or-nothing');
    expect(body).toMatchObject({ added: 1, changed: 0 });
    expect(await app.db('items').where({ facility_id: app.facilities.B }).first('name', 'version')).toEqual({
      name: 'D&C set',
      version: 1,
    });
  });

  it('takes 10,000 rows within seconds', async () => {
    const file = fileOf(...Array.from({ length: 10_000 }, (_, at) => row(`T-${String(at)}`)));
    const startedMs = performance.now();
    const { body } = await take(file, 'all-or-nothing');
    expect(body).toMatchObject({ added: 10_000 });
    expect(performance.now() - startedMs).toBeLessThan(20_000);
    const again = await preview(file);
    expect(again.body).toMatchObject({ unchanged: 10_000, added: 0, changed: 0 });
  }, 60_000);

  it.each([
    ['a mode of its own', { mode: 'some' }],
    ['no mode', { mode: '' }],
    ['a digest that is none', { digest: 'abc' }],
    ['no request id', { requestId: '' }],
    ['a field too many', { force: 'yes' }],
  ])('is refused with %s', async (_what, changes) => {
    const file = fileOf(row('T-1'));
    const digest = (await preview(file)).body.digest;
    const lead = await app.as('lead');
    const reply = await answerOf(
      lead
        .post('/api/items/import')
        .field({ requestId: anId(), mode: 'good-rows', digest, ...changes })
        .attach('file', Buffer.from(file), 'items.csv'),
    );
    expect(reply.status).toBe(400);
    expect(await app.db('items')).toEqual([]);
  });
});
