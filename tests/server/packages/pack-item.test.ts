import { beforeAll, describe, expect, it } from 'vitest';
import { parsePackageCode } from '../../../src/domain/label/package-code';
import { anId, openTestApp } from '../../support/test-app';
import { addItem, eventsAbout, packageRow, packRequest, snapshot, type TestItem } from './packing-room';

const app = openTestApp();
let scissors: TestItem;

beforeAll(async () => {
  scissors = await addItem(app);
});

type Packed = { packages: { id: string; code: string }[]; warnings: { code: string; sentence: string }[] };

describe('packing an item', () => {
  it('makes as many packages as asked, each with a code of its own that a scanner can read', async () => {
    const technician = await app.as('technician');
    const reply = await technician
      .post('/api/packages')
      .send(packRequest(scissors.id, { quantity: 50, destination: 'Room 4' }));
    expect(reply.status).toBe(201);
    const { packages, warnings } = reply.body as Packed;
    expect(packages).toHaveLength(50);
    expect(warnings).toEqual([]);
    expect(new Set(packages.map((one) => one.code)).size).toBe(50);
    for (const { code } of packages) {
      expect(parsePackageCode(code)).toMatchObject({ ok: true, value: { code, itemKind: 'pouch' } });
    }
    const row = await packageRow(app, packages[0]?.id ?? '');
    expect(row).toMatchObject({
      state: 'packed',
      facility_id: app.facilities.A,
      packed_by: app.person('technician').id,
      is_contents_confirmed: true,
      destination: 'Room 4',
      expires_on: null,
    });
  });

  it('writes the packer and the code into the history', async () => {
    const technician = await app.as('technician');
    const reply = await technician.post('/api/packages').send(packRequest(scissors.id)).expect(201);
    const [one] = (reply.body as Packed).packages;
    expect(await eventsAbout(app, one?.id ?? '')).toEqual([
      { kind: 'package.packed', payload: { code: one?.code, itemCode: scissors.code } },
    ]);
  });

  it('dates a package whose item has a dated expiry, from the facility’s day', async () => {
    const dated = await addItem(app, { expiry_rule: 'dated', expiry_days: 30 });
    // 23:30 on 3 March at the hospital is 4 March in Greenwich already.
    app.clock.set('2026-03-04T05:30:00.000Z');
    const technician = await app.as('technician');
    const reply = await technician.post('/api/packages').send(packRequest(dated.id)).expect(201);
    expect(await packageRow(app, (reply.body as Packed).packages[0]?.id ?? '')).toMatchObject({
      expires_on: '2026-04-02',
    });
    app.clock.set('2026-03-03T13:30:00.000Z');
  });

  it('answers a repeated request with the first answer and packs nothing more', async () => {
    const technician = await app.as('technician');
    const request = packRequest(scissors.id, { quantity: 3 });
    const first = await technician.post('/api/packages').send(request).expect(201);
    const before = await snapshot(app);
    const second = await technician.post('/api/packages').send(request).expect(201);
    expect(second.body).toEqual(first.body);
    expect(await snapshot(app)).toBe(before);
  });

  it('packs once when the same request arrives five times at once', async () => {
    const technician = await app.as('technician');
    const request = packRequest(scissors.id, { quantity: 2, destination: 'Five at once' });
    const replies = await Promise.all(Array.from({ length: 5 }, () => technician.post('/api/packages').send(request)));
    const bodies = replies.map((reply) => JSON.stringify(reply.body));
    expect(new Set(bodies).size).toBe(1);
    const rows = await app.db('packages').where({ destination: 'Five at once' });
    expect(rows).toHaveLength(2);
  });

  it('refuses a request id that was used for something else', async () => {
    const technician = await app.as('technician');
    const request = packRequest(scissors.id);
    await technician.post('/api/packages').send(request).expect(201);
    const reply = await technician.post('/api/packages').send({ ...request, quantity: 2 });
    expect(reply.status).toBe(409);
    expect(reply.body).toMatchObject({ code: 'request.reused' });
  });

  it.each([
    {
      said: { isContentsConfirmed: false },
      code: 'package.contents-not-confirmed',
      field: '/body/isContentsConfirmed',
    },
    {
      said: { hasInternalIndicator: false },
      code: 'package.internal-indicator-missing',
      field: '/body/hasInternalIndicator',
    },
  ])('refuses with $code and packs nothing', async ({ said, code, field }) => {
    const technician = await app.as('technician');
    const before = await snapshot(app);
    const reply = await technician.post('/api/packages').send(packRequest(scissors.id, said));
    expect(reply.status).toBe(422);
    expect(reply.headers['content-type']).toContain('application/problem+json');
    expect(reply.body).toMatchObject({ code, fields: [{ pointer: field }] });
    expect(await snapshot(app)).toBe(before);
  });

  it('can be asked again with the same id after a refusal, since nothing was done', async () => {
    const technician = await app.as('technician');
    const request = packRequest(scissors.id, { isContentsConfirmed: false });
    await technician.post('/api/packages').send(request).expect(422);
    await technician
      .post('/api/packages')
      .send({ ...request, isContentsConfirmed: true })
      .expect(201);
  });

  it('refuses a retired item', async () => {
    const retired = await addItem(app, { is_retired: true });
    const technician = await app.as('technician');
    const reply = await technician.post('/api/packages').send(packRequest(retired.id));
    expect(reply.status).toBe(422);
    expect(reply.body).toMatchObject({ code: 'package.item-retired' });
  });

  it('warns about missing instructions for use and a missing external indicator, and packs', async () => {
    const unread = await addItem(app, { ifu_reference: null });
    const technician = await app.as('technician');
    const reply = await technician
      .post('/api/packages')
      .send(packRequest(unread.id, { hasExternalIndicator: false }))
      .expect(201);
    const { packages, warnings } = reply.body as Packed;
    expect(packages).toHaveLength(1);
    expect(warnings.map((warning) => warning.code)).toEqual(['ifu-missing', 'external-indicator-missing']);
  });

  it('does not know another facility’s item, nor one that never was', async () => {
    const theirs = await addItem(app, {}, 'B');
    const technician = await app.as('technician');
    const before = await snapshot(app);
    for (const itemId of [theirs.id, anId()]) {
      const reply = await technician.post('/api/packages').send(packRequest(itemId));
      expect(reply.status).toBe(404);
      expect(reply.body).toMatchObject({ code: 'item.none' });
    }
    expect(await snapshot(app)).toBe(before);
  });
});

describe('scanning at the packing station', () => {
  const ask = async (raw: string, facility: 'A' | 'B' = 'A') => {
    const technician = await app.as('technician', facility);
    const reply = await technician.post('/api/packages/identify').send({ raw });
    expect(reply.status).toBe(200);
    return reply.body as Record<string, unknown>;
  };

  it('finds the item by the GTIN in a GS1 symbol', async () => {
    // Check digits worked out by hand, weights 3 and 1 from the left: 78 wants 2, and 81 below wants 9.
    const gtin = '09506000134352';
    await addItem(app, { code: 'C-77', device_identifier: gtin });
    const answer = await ask(`]d201${gtin}17270101`);
    expect(answer).toMatchObject({ found: 'item', item: { code: 'C-77' } });
  });

  it('does not find another facility’s item', async () => {
    expect(await ask('0109506000134352', 'B')).toMatchObject({ found: 'nothing' });
  });

  it('says that a retired item is retired', async () => {
    const gtin = '09506000134369';
    await addItem(app, { code: 'C-78', device_identifier: gtin, is_retired: true });
    const answer = await ask(`01${gtin}`);
    expect(answer).toMatchObject({ found: 'item', item: { isRetired: true } });
    expect(answer.sentence).toContain('retired');
  });

  it('shows the package when our own label is scanned', async () => {
    const technician = await app.as('technician');
    const reply = await technician.post('/api/packages').send(packRequest(scissors.id)).expect(201);
    const code = (reply.body as Packed).packages[0]?.code ?? '';
    expect(await ask(code.replaceAll('-', ''))).toMatchObject({ found: 'package', package: { code } });
    expect(await ask(code.replaceAll('-', ''), 'B')).toMatchObject({ found: 'nothing' });
  });

  it.each([
    { what: 'nothing at all', raw: '' },
    { what: 'a word', raw: 'hello there' },
    { what: '10,000 characters', raw: 'P'.repeat(10_000) },
    { what: 'control characters', raw: 'P2043\u0000\u0007178452' },
    { what: 'half a surrogate pair', raw: '\ud800' },
    { what: 'one damaged character', raw: 'P-20431784-53' },
  ])('answers $what with a plain sentence', async ({ raw }) => {
    const answer = await ask(raw);
    expect(answer.found).toBe('nothing');
    expect(answer.sentence).toMatch(/^[A-Z].*[.]$/);
  });
});
