import { beforeAll, describe, expect, it } from 'vitest';
import { parsePlaceCode } from '../../../src/domain/label/place-code';
import { anId, openTestApp } from '../../support/test-app';
import {
  addPiece,
  aCart,
  aHolder,
  aHolderKind,
  answerOf,
  aProgram,
  aShelf,
  aSterilizer,
  equipmentOnFile,
} from './equipment-support';

const app = openTestApp();

beforeAll(async () => {
  await addPiece(app, '/api/programs', aProgram('W4-30'));
  await addPiece(app, '/api/holder-kinds', aHolderKind('RS'));
});

/** Each kind of equipment: how one is stated, a change of it, and what may not be changed. */
const nouns = [
  { path: '/api/programs', list: 'programs', fields: aProgram('G121'), change: { dryS: 60 }, fixed: { code: 'X' } },
  {
    path: '/api/sterilizers',
    list: 'sterilizers',
    fields: aSterilizer('9', { qualifiedPrograms: ['W4-30'] }),
    change: { serviceState: 'out-of-service' },
    fixed: { number: '8' },
  },
  { path: '/api/carts', list: 'carts', fields: aCart('C9'), change: { isUsable: false }, fixed: { code: 'X' } },
  {
    path: '/api/holder-kinds',
    list: 'holderKinds',
    fields: aHolderKind('RX'),
    change: { owned: 7 },
    fixed: { code: 'X' },
  },
  {
    path: '/api/holders',
    list: 'holders',
    fields: aHolder('RS-9', 'RS'),
    change: { condition: 'missing' },
    fixed: { placeCode: 'H-00001-00' },
  },
] as const;

describe.each(nouns)('$path', ({ path, list, fields, change, fixed }) => {
  const nameOf = () => ('code' in fields ? fields.code : fields.name) as string;
  let added: { id: string; version: number };

  it('adds one, shows it and lists it', async () => {
    added = await addPiece(app, path, fields);
    expect(added).toMatchObject({ ...fields, version: 1 });
    const technician = await app.as('technician');
    const { body } = await answerOf(technician.get(`${path}/${added.id}`).expect(200));
    expect(body).toEqual(added);
    const { body: found } = await answerOf(technician.get(path).query({ search: nameOf().toLowerCase() }).expect(200));
    expect(found).toMatchObject({ total: 1, [list]: [{ id: added.id }] });
    const events = await app.db('audit_events').where({ subject_id: added.id });
    expect(events).toMatchObject([{ kind: 'equipment.added', payload: { code: nameOf() } }]);
  });

  it('does not add a second of the same name', async () => {
    const before = await equipmentOnFile(app);
    const engineer = await app.as('engineer');
    const { status, body } = await answerOf(engineer.post(path).send({ ...fields, requestId: anId() }));
    expect(status).toBe(409);
    expect(body.code).toMatch(/\.code-taken$/);
    expect(body.detail).toBe(`There is already ${body.detail.split(' ').slice(3, -1).join(' ')} ${nameOf()}.`);
    expect(await equipmentOnFile(app)).toEqual(before);
  });

  it('changes it once for a request that is sent twice', async () => {
    const engineer = await app.as('engineer');
    const request = { ...change, version: 1, requestId: anId() };
    const { body } = await answerOf(engineer.patch(`${path}/${added.id}`).send(request).expect(200));
    expect(body).toMatchObject({ ...fields, ...change, version: 2 });
    const { body: again } = await answerOf(engineer.patch(`${path}/${added.id}`).send(request).expect(200));
    expect(again).toEqual(body);
    const events = await app.db('audit_events').where({ subject_id: added.id, kind: 'equipment.changed' });
    expect(events).toHaveLength(1);
  });

  it('refuses a change of what somebody else changed, in plain words', async () => {
    const before = await equipmentOnFile(app);
    const engineer = await app.as('engineer');
    const { status, body } = await answerOf(
      engineer.patch(`${path}/${added.id}`).send({ ...change, version: 1, requestId: anId() }),
    );
    expect(status).toBe(409);
    expect(body.code).toMatch(/\.changed-meanwhile$/);
    expect(await equipmentOnFile(app)).toEqual(before);
  });

  it.each([
    ['what stays for good', () => ({ ...fixed, version: 2, requestId: anId() })],
    ['a field too many', () => ({ colour: 'blue', version: 2, requestId: anId() })],
    ['no version', () => ({ ...change, requestId: anId() })],
    ['a version in words', () => ({ ...change, version: '2', requestId: anId() })],
    ['no request id', () => ({ ...change, version: 2 })],
    [
      'a mistyped value',
      () => ({
        ...Object.fromEntries(Object.keys(change).map((key) => [key, { a: 1 }])),
        version: 2,
        requestId: anId(),
      }),
    ],
  ])('refuses a change with %s', async (_what, body) => {
    const before = await equipmentOnFile(app);
    const engineer = await app.as('engineer');
    const reply = await answerOf(engineer.patch(`${path}/${added.id}`).send(body()));
    expect([reply.status, reply.body.code]).toEqual([400, 'request.not-understood']);
    expect(await equipmentOnFile(app)).toEqual(before);
  });

  it('refuses what is missing, field by field', async () => {
    const before = await equipmentOnFile(app);
    const engineer = await app.as('engineer');
    for (const field of Object.keys(fields)) {
      const { [field]: _left, ...rest } = fields as Record<string, unknown>;
      const reply = await answerOf(engineer.post(path).send({ ...rest, requestId: anId() }));
      expect([field, reply.status, reply.body.code]).toEqual([field, 400, 'request.not-understood']);
    }
    expect(await equipmentOnFile(app)).toEqual(before);
  });

  it('does not know another facility’s', async () => {
    const stranger = await app.as('supervisor', 'B');
    const before = await equipmentOnFile(app);
    await stranger.get(`${path}/${added.id}`).expect(404);
    const { body } = await answerOf(
      stranger
        .patch(`${path}/${added.id}`)
        .send({ ...change, version: 2, requestId: anId() })
        .expect(404),
    );
    expect(body.code).toMatch(/\.none$/);
    const { body: page } = await answerOf(stranger.get(path).expect(200));
    expect(page).toMatchObject({ total: 0, [list]: [] });
    expect(await equipmentOnFile(app)).toEqual(before);
  });

  it('answers an id that is none in plain words', async () => {
    const engineer = await app.as('engineer');
    await engineer.get(`${path}/${anId()}`).expect(404);
    await engineer.get(`${path}/1`).expect(400);
  });
});

describe('what is retired', () => {
  it('is hidden until it is asked for', async () => {
    await addPiece(app, '/api/programs', aProgram('OLD-1', { isRetired: true }));
    const technician = await app.as('technician');
    const { body: hidden } = await answerOf(technician.get('/api/programs?search=OLD-1').expect(200));
    expect(hidden.programs).toEqual([]);
    const { body: shown } = await answerOf(technician.get('/api/programs?search=OLD-1&retired=shown').expect(200));
    expect(shown.programs).toHaveLength(1);
    const { body: missing } = await answerOf(technician.get('/api/holders?search=RS-9').expect(200));
    expect(missing.holders).toEqual([]);
    const { body: all } = await answerOf(technician.get('/api/holders?search=RS-9&retired=shown').expect(200));
    expect(all.holders).toHaveLength(1);
  });
});

describe('a sterilizer', () => {
  it('is qualified for programs that are there, and says so on both sides', async () => {
    await addPiece(app, '/api/programs', aProgram('W4-20'));
    const added = await addPiece(
      app,
      '/api/sterilizers',
      aSterilizer('5', { qualifiedPrograms: ['W4-30'], otherPrograms: ['W4-20'] }),
    );
    const engineer = await app.as('engineer');
    const { body } = await answerOf(
      engineer
        .patch(`/api/sterilizers/${added.id}`)
        .send({ requestId: anId(), version: 1, qualifiedPrograms: ['w4-30', 'W4-20', 'W4-20'], otherPrograms: [] })
        .expect(200),
    );
    expect(body).toMatchObject({ qualifiedPrograms: ['W4-20', 'W4-30'], otherPrograms: [] });
    const { body: page } = await answerOf(engineer.get('/api/programs?search=W4-20').expect(200));
    expect(page.programs[0]?.qualifiedOn).toEqual(['ST-5']);
  });

  it.each<[string, Record<string, unknown>, string]>([
    ['a program that is not there', { qualifiedPrograms: ['W9-99'] }, 'There is no program with the code W9-99.'],
    [
      'a program both qualified and not',
      { qualifiedPrograms: ['W4-30'], otherPrograms: ['W4-30'] },
      'W4-30 cannot be both qualified and not qualified.',
    ],
    ['a number that is taken', { number: '9' }, 'ST-9 already has the number 9.'],
    ['a drain outside of the chamber', { drainXMm: 700 }, 'The drain lies outside of the chamber.'],
  ])('is refused with %s', async (_what, changes, sentence) => {
    const before = await equipmentOnFile(app);
    const engineer = await app.as('engineer');
    const { status, body } = await answerOf(
      engineer.post('/api/sterilizers').send({ ...aSterilizer('6', changes), requestId: anId() }),
    );
    expect([status, body.code, body.detail]).toEqual([400, 'sterilizer.not-consistent', sentence]);
    expect(await equipmentOnFile(app)).toEqual(before);
  });
});

describe('a cart', () => {
  it('gets a place code for each shelf, and keeps it when the shelf changes', async () => {
    const added = await addPiece(app, '/api/carts', aCart('C1'));
    const codes = added.shelves.map((shelf) => shelf.placeCode);
    expect(new Set(codes).size).toBe(2);
    for (const code of codes) expect(parsePlaceCode(code)).toMatchObject({ ok: true, value: { place: 'shelf' } });
    const engineer = await app.as('engineer');
    const { body } = await answerOf(
      engineer
        .patch(`/api/carts/${added.id}`)
        .send({ requestId: anId(), version: 1, shelves: [aShelf(2, { isUsable: false }), aShelf(3, { name: 'Top' })] })
        .expect(200),
    );
    expect(body.shelves.map((shelf) => [shelf.level, shelf.isUsable, shelf.name])).toEqual([
      [1, true, 'Lower shelf'],
      [2, false, 'Upper shelf'],
      [3, true, 'Top'],
    ]);
    expect(body.shelves.slice(0, 2).map((shelf) => [shelf.id, shelf.placeCode])).toEqual(
      added.shelves.map((shelf) => [shelf.id, shelf.placeCode]),
    );
    const { body: found } = await answerOf(engineer.get('/api/carts').query({ search: codes[0] }).expect(200));
    expect(found.carts.map((cart) => cart.code)).toEqual(['C1']);
  });

  it.each<[string, Record<string, unknown>, string]>([
    ['two shelves on a level', { shelves: [aShelf(1), aShelf(1)] }, 'cart.not-consistent'],
    ['no shelf', { shelves: [] }, 'request.not-understood'],
    ['a shelf on level 0', { shelves: [aShelf(0)] }, 'request.not-understood'],
    [
      'a shelf with a place code of its own',
      { shelves: [aShelf(1, { placeCode: 'S-00001-00' })] },
      'request.not-understood',
    ],
  ])('is refused with %s', async (_what, changes, code) => {
    const before = await equipmentOnFile(app);
    const engineer = await app.as('engineer');
    const { status, body } = await answerOf(
      engineer.post('/api/carts').send({ ...aCart('C2', changes), requestId: anId() }),
    );
    expect([status, body.code]).toEqual([400, code]);
    expect(await equipmentOnFile(app)).toEqual(before);
  });
});

describe('a holder', () => {
  it('gets its own place code, and none is given twice', async () => {
    const [one, other] = await Promise.all([
      addPiece(app, '/api/holders', aHolder('RS-1', 'rs')),
      addPiece(app, '/api/holders', aHolder('RS-2', 'RS')),
    ]);
    expect(one.placeCode).not.toBe(other.placeCode);
    expect(parsePlaceCode(one.placeCode)).toMatchObject({ ok: true, value: { place: 'holder', code: one.placeCode } });
    const engineer = await app.as('engineer');
    const { body } = await answerOf(engineer.get('/api/holder-kinds?search=RS').expect(200));
    expect(body.holderKinds[0]).toMatchObject({ code: 'RS', coded: 3, inGoodOrder: 2 });
  });

  it('of a kind that is not there is refused', async () => {
    const engineer = await app.as('engineer');
    const { status, body } = await answerOf(
      engineer.post('/api/holders').send({ ...aHolder('QQ-1', 'QQ'), requestId: anId() }),
    );
    expect([status, body.detail]).toEqual([400, 'There is no kind of holder with the code QQ.']);
  });

  it('of another facility’s kind is refused', async () => {
    await addPiece(app, '/api/holder-kinds', aHolderKind('BB'), 'B');
    const engineer = await app.as('engineer');
    await engineer
      .post('/api/holders')
      .send({ ...aHolder('BB-1', 'BB'), requestId: anId() })
      .expect(400);
  });

  it('kind that is a rack without pitch is refused', async () => {
    const engineer = await app.as('engineer');
    const { status, body } = await answerOf(
      engineer.post('/api/holder-kinds').send({ ...aHolderKind('RZ', { pitchMm: null }), requestId: anId() }),
    );
    expect([status, body.detail]).toEqual([400, 'Of a rack, say how far it is from slot to slot.']);
  });
});
