import { beforeAll, describe, expect, it } from 'vitest';
import { anId, openTestApp } from '../../support/test-app';
import { addItem, pack, packOne, packageRow, putInState } from '../packages/packing-room';
import { detailOf, loadSnapshot, openLoad, openLoadingBay, scan, stagedRun, type LoadingBay } from './loading-bay';

const app = openTestApp();
let bay: LoadingBay;
let loadId: string;

beforeAll(async () => {
  bay = await openLoadingBay(app);
  loadId = await openLoad(await app.as('technician'), bay);
});

describe('scanning places', () => {
  it('puts a holder on the cart where there is room, and makes it the current place', async () => {
    const technician = await app.as('technician');
    const reply = await scan(technician, loadId, bay.racks[0].placeCode);
    expect(reply).toMatchObject({ answer: 'place-set', place: { kind: 'holder', holderId: bay.racks[0].id } });
    expect(reply.change?.holders.map((holder) => holder.name)).toEqual(['RS-1']);
    const again = await scan(technician, loadId, bay.racks[0].placeCode);
    expect(again).toMatchObject({ answer: 'place-set', change: null });
  });

  it('takes a shelf of this cart and refuses one of another, naming that cart', async () => {
    const technician = await app.as('technician');
    expect(await scan(technician, loadId, bay.lower.placeCode)).toMatchObject({
      answer: 'place-set',
      place: { kind: 'shelf', shelfId: bay.lower.id },
    });
    const before = await loadSnapshot(app);
    const reply = await scan(technician, loadId, bay.otherCartShelf.placeCode);
    expect(reply).toMatchObject({ answer: 'place-refused', change: null });
    expect(reply.sentence).toContain('C2');
    expect(await loadSnapshot(app)).toBe(before);
  });
});

describe('the six answers to a package', () => {
  const rack = () => ({ kind: 'holder', holderId: bay.racks[0].id }) as const;

  it('takes a package into the next free slot of the current holder and says which way it faces', async () => {
    const technician = await app.as('technician');
    const one = await packOne(app, bay.pouch.id);
    const reply = await scan(technician, loadId, one.code, rack());
    expect(reply).toMatchObject({ answer: 'taken', placement: { at: 'slot', holderId: bay.racks[0].id, slot: 1 } });
    expect(reply.package).toMatchObject({ code: one.code, itemName: 'Mayo scissors curved' });
    expect(await packageRow(app, one.id)).toMatchObject({ state: 'in-load' });
  });

  it('takes what finds no slot any more, without a place, and says so', async () => {
    const technician = await app.as('technician');
    const [second, third, fourth] = await pack(app, bay.pouch.id, 3);
    if (!second || !third || !fourth) throw new Error('nothing was packed');
    expect(await scan(technician, loadId, second.code, rack())).toMatchObject({ placement: { slot: 2 } });
    expect(await scan(technician, loadId, third.code, rack())).toMatchObject({ placement: { slot: 3 } });
    expect(await scan(technician, loadId, fourth.code, rack())).toMatchObject({
      answer: 'taken',
      look: 'no-slot-left',
      placement: null,
    });
  });

  it('tells where to put a package when no place was scanned', async () => {
    const reply = await scan(await app.as('technician'), loadId, (await packOne(app, bay.container.id)).code);
    expect(reply).toMatchObject({ answer: 'taken', placement: { at: 'shelf', shelfId: bay.lower.id } });
    expect(reply.sentence).toMatch(/lower shelf/i);
  });

  it('changes nothing for a label scanned twice, unknown, held, called back, processed, expired, foreign, or in another load', async () => {
    const technician = await app.as('technician');
    const twice = await packOne(app, bay.pouch.id);
    await scan(technician, loadId, twice.code, { kind: 'shelf', shelfId: bay.upper.id });
    const held = await packOne(app, bay.pouch.id);
    await putInState(app, held.id, { held_reason: 'Seal looked torn' });
    const calledBack = await packOne(app, bay.pouch.id);
    await putInState(app, calledBack.id, { state: 'recalled' });
    const processed = await packOne(app, bay.pouch.id);
    await putInState(app, processed.id, { state: 'sterile' });
    const expired = await packOne(app, bay.pouch.id);
    await putInState(app, expired.id, { expires_on: '2026-03-02' });
    const elsewhere = await packOne(app, bay.pouch.id);
    const otherLoad = await openLoad(technician, bay, { cart: 1 });
    await scan(technician, otherLoad, elsewhere.code);
    const foreign = await packOne(app, (await addItem(app, {}, 'B')).id, 'B');

    const before = await loadSnapshot(app);
    const answers = [
      [twice.code, 'already-here', /already/],
      ['P-00000001-00', 'not-known', /./],
      [held.code, 'held', /Seal looked torn.*hold shelf/],
      [calledBack.code, 'called-back', /called back.*hold shelf/i],
      [processed.code, 'not-ready', /./],
      [expired.code, 'not-ready', /./],
      [elsewhere.code, 'not-ready', /1-26062-02/],
      [foreign.code, 'not-known', /Nobody here knows this label/],
    ] as const;
    for (const [raw, answer, sentence] of answers) {
      const reply = await scan(technician, loadId, raw);
      expect({ raw, answer: reply.answer, change: reply.change }).toEqual({ raw, answer, change: null });
      expect(reply.sentence).toMatch(sentence);
    }
    expect(await loadSnapshot(app)).toBe(before);
  });

  it.each([
    ['nothing', ''],
    ['control characters', '\u0000\u0001\u001b[2J'],
    ['ten thousand characters', 'P'.repeat(10_000)],
    ['a truncated code', 'P-2043'],
    ['a lone surrogate', 'P-\ud800'],
    ['words', 'please load me'],
    ['a maker’s code', ']d20109501101020917'],
  ])('answers %s in words and changes nothing', async (_what, raw) => {
    const before = await loadSnapshot(app);
    const reply = await scan(await app.as('technician'), loadId, raw);
    expect(reply.answer).toBe('not-known');
    expect(reply.sentence).toMatch(/^[A-Z].*\.$/);
    expect(reply.code.length).toBeLessThanOrEqual(41);
    expect(await loadSnapshot(app)).toBe(before);
  });

  it('never keeps or shows a badge that was scanned here', async () => {
    const technician = await app.as('technician');
    const { badge } = app.person('lead');
    const reply = await scan(technician, loadId, badge);
    expect(reply).toMatchObject({ answer: 'not-known', code: 'a badge' });
    const history = await technician.get(`/api/loads/${loadId}/history`).expect(200);
    expect(JSON.stringify([reply, history.body])).not.toContain(badge);
    const kept = await app.db('audit_events').where({ load_id: loadId }).select<{ payload: unknown }[]>('payload');
    expect(JSON.stringify(kept)).not.toContain(badge);
  });

  it('keeps every refused scan in the history', async () => {
    const technician = await app.as('technician');
    await scan(technician, loadId, 'please load me');
    const history = await technician.get(`/api/loads/${loadId}/history`).expect(200);
    const [latest] = (history.body as { events: { kind: string; sentence: string }[] }).events;
    expect(latest).toMatchObject({ kind: 'load.scan-refused' });
    expect(latest?.sentence).toContain('please load me');
  });
});

describe('a repeated request', () => {
  it('gets the first answer and changes nothing, also when both arrive at once', async () => {
    const technician = await app.as('technician');
    const one = await packOne(app, bay.pouch.id);
    const requestId = anId();
    const [first, second] = await Promise.all([
      scan(technician, loadId, one.code, null, requestId),
      scan(technician, loadId, one.code, null, requestId),
    ]);
    expect(first).toEqual(second);
    expect(first.answer).toBe('taken');
    const events = await app.db('audit_events').where({ request_id: requestId });
    expect(events).toHaveLength(1);
  });

  it('is refused when its id was used for another scan', async () => {
    const technician = await app.as('technician');
    const requestId = anId();
    await scan(technician, loadId, 'something', null, requestId);
    const reply = await technician
      .post(`/api/loads/${loadId}/scans`)
      .send({ requestId, raw: 'something else', entry: 'wedge', place: null });
    expect(reply.status).toBe(409);
    expect(reply.body).toMatchObject({ code: 'request.reused' });
  });
});

describe('two stations', () => {
  it('scan one label into two loads at once: one takes it, the other is told, twenty times over', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    const other = await openLoad(lead, bay, { cart: 2 });
    for (const one of await pack(app, bay.pouch.id, 20)) {
      const replies = await Promise.all([scan(technician, loadId, one.code), scan(lead, other, one.code)]);
      expect(replies.map((reply) => reply.answer).sort()).toEqual(['not-ready', 'taken']);
      expect(await app.db('load_packages').where({ package_id: one.id, is_open: true })).toHaveLength(1);
    }
  });

  it('scan one label into one load at once: one takes it, the other is told that it is there', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    for (const one of await pack(app, bay.pouch.id, 10)) {
      const replies = await Promise.all([scan(technician, loadId, one.code), scan(lead, loadId, one.code)]);
      expect(replies.map((reply) => reply.answer).sort()).toEqual(['already-here', 'taken']);
    }
  });

  it('want one holder at once: one gets it', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    expect(
      (await detailOf(technician, loadId)).view.holders.some((holder) => holder.holderId === bay.racks[1].id),
    ).toBe(false);
    const open = await technician.get('/api/loads').expect(200);
    const other = (open.body as { loads: { id: string }[] }).loads.find((load) => load.id !== loadId);
    const replies = await Promise.all([
      scan(technician, loadId, bay.racks[1].placeCode),
      scan(lead, other?.id ?? '', bay.racks[1].placeCode),
    ]);
    expect(replies.map((reply) => reply.answer).sort()).toEqual(['place-refused', 'place-set']);
  });

  it('may never hold one package open in two loads, whatever the code above the table does', async () => {
    const { packages } = await stagedRun(app, bay.pouch.id, 1);
    const [one] = packages;
    const loads = await app.db('loads').limit(2).select<{ id: string }[]>('id');
    const row = (load: { id: string } | undefined) => ({
      load_id: load?.id,
      package_id: one?.id,
      was_staged: true,
      listed_at: app.clock.now(),
    });
    await app.db('load_packages').insert(row(loads[0]));
    await expect(app.db('load_packages').insert(row(loads[1]))).rejects.toMatchObject({
      constraint: 'load_packages_package_id_open_key',
    });
  });
});

describe('who may scan', () => {
  it.each(['infection-prevention', 'operating-room', 'engineer', 'surveyor', 'administrator'] as const)(
    'refuses the role %s and changes nothing',
    async (role) => {
      const one = await packOne(app, bay.pouch.id);
      const before = await loadSnapshot(app);
      const reply = await (
        await app.as(role)
      )
        .post(`/api/loads/${loadId}/scans`)
        .send({ requestId: anId(), raw: one.code, entry: 'wedge', place: null });
      expect(reply.status).toBe(403);
      expect(reply.headers['content-type']).toContain('application/problem+json');
      expect(await loadSnapshot(app)).toBe(before);
    },
  );

  it('knows nothing of a load to people of another facility', async () => {
    const stranger = await app.as('technician', 'B');
    const reply = await stranger
      .post(`/api/loads/${loadId}/scans`)
      .send({ requestId: anId(), raw: 'P-1', entry: 'wedge', place: null });
    expect(reply.status).toBe(404);
    expect((await stranger.get(`/api/loads/${loadId}`)).status).toBe(404);
    expect((await stranger.get(`/api/loads/${loadId}/history`)).status).toBe(404);
  });

  it('keeps the load and takes the very same scan after a session has ended in the middle of it', async () => {
    const one = await packOne(app, bay.pouch.id);
    const requestId = anId();
    const body = { requestId, raw: one.code, entry: 'wedge', place: null };
    const refused = await app.anyone().post(`/api/loads/${loadId}/scans`).send(body);
    expect(refused.status).toBe(401);
    const taken = await (await app.as('technician')).post(`/api/loads/${loadId}/scans`).send(body).expect(200);
    expect(taken.body).toMatchObject({ answer: 'taken' });
  });
});

describe('requests that are not understood', () => {
  const good = () => ({ requestId: anId(), raw: 'P-1', entry: 'wedge', place: null });
  it.each([
    ['a field too many', { ...good(), extra: 1 }],
    ['no raw text', { requestId: anId(), entry: 'wedge', place: null }],
    ['an unknown way in', { ...good(), entry: 'thought' }],
    ['a place of no kind', { ...good(), place: { kind: 'sky' } }],
    ['a request id that is none', { ...good(), requestId: '1' }],
    ['a list', []],
    ['text', 'scan'],
  ])('refuses %s with a problem and changes nothing', async (_what, body) => {
    const before = await loadSnapshot(app);
    const reply = await (await app.as('technician')).post(`/api/loads/${loadId}/scans`).send(body);
    expect(reply.status).toBe(400);
    expect(reply.body).toMatchObject({ code: 'request.not-understood', status: 400 });
    expect(JSON.stringify(reply.body)).not.toMatch(/node_modules|at .*\.ts/);
    expect(await loadSnapshot(app)).toBe(before);
  });
});
