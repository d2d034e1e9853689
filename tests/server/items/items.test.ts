import { describe, expect, it } from 'vitest';
import { anId, openTestApp } from '../../support/test-app';
import { addItem, anItem, answerOf, itemsOnFile } from './items-support';

const app = openTestApp();

describe('adding an item', () => {
  it('keeps what was stated and writes it to the history', async () => {
    const lead = await app.as('lead');
    const requestId = anId();
    const { body } = await answerOf(
      lead
        .post('/api/items')
        .send({ ...anItem('C-01'), requestId })
        .expect(201),
    );
    expect(body).toMatchObject({ ...anItem('C-01'), version: 1 });
    expect(await app.db('audit_events').where({ request_id: requestId })).toMatchObject([
      {
        kind: 'item.added',
        subject_kind: 'item',
        subject_id: body.id,
        payload: { code: 'C-01' },
        actor_id: app.person('lead').id,
      },
    ]);
    const { body: again } = await answerOf(lead.get(`/api/items/${body.id}`).expect(200));
    expect(again).toEqual(body);
  });

  it('keeps codes in capitals and device identifiers as they are looked up', async () => {
    const added = await addItem(app, anItem('P-02', { code: ' p-102 ', deviceIdentifier: ' 2012345678903 ' }));
    expect(added).toMatchObject({ code: 'P-102', deviceIdentifier: '02012345678903' });
  });

  it('does once what is asked twice', async () => {
    const lead = await app.as('lead');
    const body = { ...anItem('P-03'), requestId: anId() };
    const [one, other] = await Promise.all([
      lead.post('/api/items').send(body).expect(201),
      lead.post('/api/items').send(body).expect(201),
    ]);
    expect(one.body).toEqual(other.body);
    expect(await app.db('items').where({ code: 'P-03' })).toHaveLength(1);
    const changed = await answerOf(
      lead
        .post('/api/items')
        .send({ ...body, name: 'Other' })
        .expect(409),
    );
    expect(changed.body.code).toBe('request.reused');
  });

  it('refuses a code that is taken, also when two ask for it at once', async () => {
    const lead = await app.as('lead');
    const supervisor = await app.as('supervisor');
    const replies = await Promise.all(
      [lead, supervisor, lead, supervisor].map((agent) =>
        agent.post('/api/items').send({ ...anItem('P-04', { deviceIdentifier: null }), requestId: anId() }),
      ),
    );
    expect(replies.map((reply) => reply.status).sort()).toEqual([201, 409, 409, 409]);
    const refused = replies.find((reply) => reply.status === 409);
    expect(refused?.body).toMatchObject({
      code: 'item.code-taken',
      detail: 'There is already an item P-04.',
      fields: [{ pointer: '/body/code' }],
    });
    expect(await app.db('items').where({ code: 'P-04' })).toHaveLength(1);
  });

  it('takes the same code in another facility', async () => {
    await addItem(app, anItem('P-16'));
    await addItem(app, anItem('P-16'), 'B');
    expect(await app.db('items').where({ code: 'P-16' })).toHaveLength(2);
  });

  it.each<[string, Record<string, unknown>, string, string]>([
    [
      'a filter over the edge',
      anItem('C-02', { filterZones: [{ face: 'lid', xMm: 500, yMm: 0, lengthMm: 100, widthMm: 50 }] }),
      'item.not-consistent',
      '/body/filterZones',
    ],
    ['metal heavier than the whole', anItem('C-02', { metalMassKg: 9.4 }), 'item.not-consistent', '/body/metalMassKg'],
    [
      'a holder that is not there',
      anItem('P-01', { preferredHolder: 'RX' }),
      'item.not-consistent',
      '/body/preferredHolder',
    ],
    ['a stack on what is not there', anItem('C-02', { standsOn: ['C-99'] }), 'item.not-consistent', '/body/standsOn'],
    [
      'a wrong device identifier',
      anItem('C-02', { deviceIdentifier: '2012345678904' }),
      'item.not-consistent',
      '/body/deviceIdentifier',
    ],
    ['a value too many', anItem('C-02', { colour: 'blue' }), 'request.not-understood', '/body'],
    ['a mistyped value', anItem('C-02', { massKg: '9.3' }), 'request.not-understood', '/body/massKg'],
    ['a mass in grams', anItem('C-02', { massKg: 9300 }), 'request.not-understood', '/body/massKg'],
    ['a size of nothing', anItem('C-02', { lengthMm: 0 }), 'request.not-understood', '/body/lengthMm'],
    ['an endless size', anItem('C-02', { lengthMm: 1e300 }), 'request.not-understood', '/body/lengthMm'],
    ['a kind of its own', anItem('C-02', { kind: 'box' }), 'request.not-understood', '/body/kind'],
    ['a code that is a formula', anItem('C-02', { code: '=1+1' }), 'request.not-understood', '/body/code'],
    ['a code of 41 characters', anItem('C-02', { code: 'X'.repeat(41) }), 'request.not-understood', '/body/code'],
    ['a name of control characters', anItem('C-02', { name: 'Set\u0000A' }), 'request.not-understood', '/body/name'],
    ['a name of blanks', anItem('C-02', { name: '   ' }), 'request.not-understood', '/body/name'],
    [
      'a note of 10,000 characters',
      anItem('C-02', { note: 'x'.repeat(10_000) }),
      'request.not-understood',
      '/body/note',
    ],
    [
      'expiry in half days',
      anItem('C-02', { expiryRule: 'dated', expiryDays: 1.5 }),
      'request.not-understood',
      '/body/expiryDays',
    ],
    [
      'thirteen cycles',
      anItem('C-02', { cycleNeeds: Array.from({ length: 13 }, () => (anItem('C-02').cycleNeeds as unknown[])[0]) }),
      'request.not-understood',
      '/body/cycleNeeds',
    ],
  ])('refuses %s and keeps nothing', async (_what, fields, code, pointer) => {
    const before = await itemsOnFile(app);
    const lead = await app.as('lead');
    const { body, status } = await answerOf(lead.post('/api/items').send({ ...fields, requestId: anId() }));
    expect({ status, code: body.code }).toEqual({ status: 400, code });
    expect(body.fields?.map((field) => field.pointer)).toContain(pointer);
    expect(body.detail).not.toMatch(/expected|received|undefined|null/i);
    expect(await itemsOnFile(app)).toEqual(before);
  });

  it('refuses what is missing, one by one', async () => {
    const lead = await app.as('lead');
    const before = await itemsOnFile(app);
    for (const field of Object.keys(anItem('C-02'))) {
      const { [field]: _left, ...rest } = anItem('C-02');
      const { body } = await answerOf(
        lead
          .post('/api/items')
          .send({ ...rest, requestId: anId() })
          .expect(400),
      );
      expect(body.code).toBe('request.not-understood');
    }
    await lead.post('/api/items').send(anItem('C-02')).expect(400);
    expect(await itemsOnFile(app)).toEqual(before);
  });

  it('refuses a device identifier another item carries', async () => {
    await addItem(app, anItem('P-05'));
    const lead = await app.as('lead');
    const twin = anItem('P-06', { deviceIdentifier: anItem('P-05').deviceIdentifier });
    const { body } = await answerOf(
      lead
        .post('/api/items')
        .send({ ...twin, requestId: anId() })
        .expect(400),
    );
    expect(body.detail).toBe('P-05 already carries this device identifier.');
    expect(await app.db('items').where({ code: 'P-06' })).toEqual([]);
  });
});

describe('changing an item', () => {
  it('changes what is named, leaves the rest, and keeps before and after', async () => {
    const { id } = await addItem(app, anItem('W-01'));
    const lead = await app.as('lead');
    const requestId = anId();
    const { body } = await answerOf(
      lead
        .patch(`/api/items/${id}`)
        .send({ requestId, version: 1, name: 'Minor set, plain', clearanceMm: null })
        .expect(200),
    );
    expect(body).toMatchObject({ ...anItem('W-01'), name: 'Minor set, plain', clearanceMm: null, version: 2 });
    expect(await app.db('audit_events').where({ request_id: requestId })).toMatchObject([
      { kind: 'item.changed', payload: { before: { name: 'Minor set' }, after: { name: 'Minor set, plain' } } },
    ]);
  });

  it('refuses a stale version in plain words', async () => {
    const { id } = await addItem(app, anItem('W-02'));
    const lead = await app.as('lead');
    await lead.patch(`/api/items/${id}`).send({ requestId: anId(), version: 1, note: 'First' }).expect(200);
    const { body } = await answerOf(
      lead.patch(`/api/items/${id}`).send({ requestId: anId(), version: 1, note: 'Second' }).expect(409),
    );
    expect(body).toMatchObject({
      code: 'item.changed-meanwhile',
      detail: 'Somebody else changed this while you were writing. Look at it again, then repeat your change.',
    });
    expect(await app.db('items').where({ id }).first('note', 'version')).toEqual({ note: 'First', version: 2 });
  });

  it('lets one of two win who change it at once', async () => {
    const { id } = await addItem(app, anItem('W-03'));
    const agents = [await app.as('lead'), await app.as('supervisor')];
    const replies = await Promise.all(
      agents.map((agent, at) =>
        agent.patch(`/api/items/${id}`).send({ requestId: anId(), version: 1, note: `By ${String(at)}` }),
      ),
    );
    expect(replies.map((reply) => reply.status).sort()).toEqual([200, 409]);
  });

  it('checks the whole, not only what changes', async () => {
    const { id } = await addItem(app, anItem('W-04'));
    const lead = await app.as('lead');
    const { body } = await answerOf(
      lead.patch(`/api/items/${id}`).send({ requestId: anId(), version: 1, massKg: 1 }).expect(400),
    );
    expect(body.detail).toBe('Metal and textile together are heavier than the whole.');
    await lead.patch(`/api/items/${id}`).send({ requestId: anId(), version: 1, code: 'W-99' }).expect(400);
    expect(await app.db('items').where({ id }).first('mass_kg', 'code', 'version')).toEqual({
      mass_kg: 2.6,
      code: 'W-04',
      version: 1,
    });
  });

  it('that changes nothing leaves version and history alone', async () => {
    const { id } = await addItem(app, anItem('W-05'));
    const before = await itemsOnFile(app);
    const lead = await app.as('lead');
    const { body } = await answerOf(
      lead.patch(`/api/items/${id}`).send({ requestId: anId(), version: 1, name: 'Caesarean set' }).expect(200),
    );
    expect(body.version).toBe(1);
    expect(await itemsOnFile(app)).toEqual(before);
  });
});

describe('the list', () => {
  it('is searched word by word, and wild cards mean themselves', async () => {
    await addItem(app, anItem('W-06', { name: 'Basic 100% plastic_set' }));
    const technician = await app.as('technician');
    const found = async (search: string) => {
      const { body } = await answerOf(technician.get('/api/items').query({ search }).expect(200));
      return body.items.map((item) => item.code);
    };
    expect(await found('plastic basic')).toEqual(['W-06']);
    expect(await found('100%')).toEqual(['W-06']);
    expect(await found('c_set')).toEqual(['W-06']);
    expect(await found('basic%set')).toEqual([]);
    expect(await found('W-06')).toEqual(['W-06']);
    expect(await found('\\')).toEqual([]);
    expect(await found("'; drop table items; --")).toEqual([]);
  });

  it('hides what is retired until it is asked for', async () => {
    const { id } = await addItem(app, anItem('W-07'));
    const lead = await app.as('lead');
    await lead.patch(`/api/items/${id}`).send({ requestId: anId(), version: 1, isRetired: true }).expect(200);
    const hidden = await answerOf(lead.get('/api/items').query({ search: 'W-07' }).expect(200));
    expect(hidden.body).toMatchObject({ items: [], total: 0 });
    const shown = await answerOf(lead.get('/api/items').query({ search: 'W-07', retired: 'shown' }).expect(200));
    expect(shown.body).toMatchObject({ items: [{ code: 'W-07', isRetired: true }], total: 1 });
  });

  it('comes in pages, and in kinds', async () => {
    await addItem(app, anItem('W-12'));
    const lead = await app.as('lead');
    const { body: all } = await answerOf(lead.get('/api/items').query({ pageSize: 200 }).expect(200));
    const { body: second } = await answerOf(lead.get('/api/items').query({ pageSize: 2, page: 2 }).expect(200));
    expect(second.items).toEqual(all.items.slice(2, 4));
    expect(second).toMatchObject({ total: all.total, page: 2, pageSize: 2 });
    const { body: textiles } = await answerOf(lead.get('/api/items').query({ kind: 'textile-pack' }).expect(200));
    expect(textiles.items.map((item) => item.code)).toEqual(['W-12']);
  });

  it.each([
    'page=0',
    'page=x',
    'pageSize=201',
    'kind=box',
    'retired=maybe',
    'sort=name',
    'search=a&search=b',
    `search=${'x'.repeat(101)}`,
    'search=%00',
  ])('answers ?%s in plain words', async (query) => {
    const lead = await app.as('lead');
    const reply = await answerOf(lead.get(`/api/items?${query}`));
    expect(reply.status).toBe(400);
    expect(reply.body.code).toMatch(/^request\./);
  });
});

describe('another facility’s item', () => {
  it('is not there', async () => {
    const { id } = await addItem(app, anItem('W-08'), 'B');
    const before = await itemsOnFile(app);
    const supervisor = await app.as('supervisor');
    await supervisor.get(`/api/items/${id}`).expect(404);
    const { body } = await answerOf(
      supervisor.patch(`/api/items/${id}`).send({ requestId: anId(), version: 1, name: 'Mine now' }).expect(404),
    );
    expect(body.code).toBe('item.none');
    const { body: list } = await answerOf(supervisor.get('/api/items').query({ pageSize: 200 }).expect(200));
    expect(list.items.map((item) => item.id)).not.toContain(id);
    expect(await itemsOnFile(app)).toEqual(before);
  });

  it('and an id that is none are refused alike in words', async () => {
    const supervisor = await app.as('supervisor');
    await supervisor.get(`/api/items/${anId()}`).expect(404);
    await supervisor.get('/api/items/not-an-id').expect(400);
  });
});
