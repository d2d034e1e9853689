import { beforeEach, describe, expect, it } from 'vitest';
import { anId, openTestApp } from '../../support/test-app';
import { addPiece, answerOf, aProgram, aSterilizer, equipmentOnFile, type EquipmentBody } from './equipment-support';

const app = openTestApp();

let program: EquipmentBody;
let sterilizers: EquipmentBody[];

beforeEach(async () => {
  await app.db('sterilizer_programs').delete();
  await app.db('sterilizers').delete();
  await app.db('programs').delete();
  program = await addPiece(app, '/api/programs', aProgram('W4-30'));
  await addPiece(app, '/api/programs', aProgram('G121', { type: 'gravity', temperatureC: 121 }));
  sterilizers = [
    await addPiece(app, '/api/sterilizers', aSterilizer('1', { qualifiedPrograms: ['G121', 'W4-30'] })),
    await addPiece(app, '/api/sterilizers', aSterilizer('2', { qualifiedPrograms: ['W4-30'] })),
    await addPiece(
      app,
      '/api/sterilizers',
      aSterilizer('3', { qualifiedPrograms: ['G121'], otherPrograms: ['W4-30'] }),
    ),
  ];
});

async function change(body: object, version = 1) {
  const engineer = await app.as('engineer');
  return answerOf(engineer.patch(`/api/programs/${program.id}`).send({ requestId: anId(), version, ...body }));
}

async function panels() {
  const technician = await app.as('technician');
  const { body } = await answerOf(technician.get('/api/sterilizers').expect(200));
  return body.sterilizers.map(({ code, version, qualifiedPrograms, otherPrograms }) => ({
    code,
    version,
    qualifiedPrograms,
    otherPrograms,
  }));
}

const asAdded = [
  { code: 'ST-1', version: 1, qualifiedPrograms: ['G121', 'W4-30'], otherPrograms: [] },
  { code: 'ST-2', version: 1, qualifiedPrograms: ['W4-30'], otherPrograms: [] },
  { code: 'ST-3', version: 1, qualifiedPrograms: ['G121'], otherPrograms: ['W4-30'] },
];

describe('a program whose cycle is changed', () => {
  it.each([
    ['type', { type: 'gravity' }],
    ['temperature', { temperatureC: 134 }],
    ['exposure', { exposureS: 180 }],
    ['drying', { dryS: 1200 }],
  ])('is no longer qualified anywhere after another %s, and stays on the panels', async (_what, body) => {
    const reply = await change(body);
    expect(reply.body).toMatchObject({ ...body, version: 2, qualifiedOn: [] });
    expect(await panels()).toEqual([
      { code: 'ST-1', version: 2, qualifiedPrograms: ['G121'], otherPrograms: ['W4-30'] },
      { code: 'ST-2', version: 2, qualifiedPrograms: [], otherPrograms: ['W4-30'] },
      { code: 'ST-3', version: 1, qualifiedPrograms: ['G121'], otherPrograms: ['W4-30'] },
    ]);
  });

  it('tells it in the history of each sterilizer, with what of the cycle was changed', async () => {
    await change({ exposureS: 180, dryS: 1200, name: 'Shorter' });
    const events = await app
      .db('audit_events')
      .where({ kind: 'equipment.qualification-ended', facility_id: app.facilities.A })
      .whereIn(
        'subject_id',
        sterilizers.map(({ id }) => id),
      )
      .orderBy('id')
      .select<{ subject_id: string; actor_id: string; payload: unknown }[]>('subject_id', 'actor_id', 'payload');
    const because = ['exposureS', 'dryS'];
    expect(events).toEqual([
      {
        subject_id: sterilizers[0]?.id,
        actor_id: app.person('engineer').id,
        payload: { sterilizer: 'ST-1', program: 'W4-30', because },
      },
      {
        subject_id: sterilizers[1]?.id,
        actor_id: app.person('engineer').id,
        payload: { sterilizer: 'ST-2', program: 'W4-30', because },
      },
    ]);
  });

  it('keeps its qualifications after another name, mass or retirement, and after the same cycle once more', async () => {
    await change({ name: 'Wrapped, long', greatestLoadMassKg: 80, exposureS: 240 });
    await change({ isRetired: true }, 2);
    expect(await panels()).toEqual(asAdded);
  });

  it('keeps them when the change is refused', async () => {
    const before = await equipmentOnFile(app);
    expect((await change({ exposureS: 180 }, 7)).status).toBe(409);
    expect(await equipmentOnFile(app)).toEqual(before);
  });

  it('loses them through a file too', async () => {
    const engineer = await app.as('engineer');
    const { text } = await answerOf(engineer.get('/api/programs/export').expect(200));
    const file = Buffer.from(text.replace(/^(W4-30,.*),240,/m, '$1,270,'));
    const { body: preview } = await answerOf(
      engineer.post('/api/programs/import/preview').attach('file', file, 'programs.csv').expect(200),
    );
    expect(preview).toMatchObject({ changed: 1 });
    await engineer
      .post('/api/programs/import')
      .field({ requestId: anId(), mode: 'all-or-nothing', digest: preview.digest })
      .attach('file', file, 'programs.csv')
      .expect(200);
    expect((await panels())[1]).toMatchObject({ qualifiedPrograms: [], otherPrograms: ['W4-30'] });
  });

  it('and the sterilizer’s own form, filled in before, does not bring them back unseen', async () => {
    const [first] = sterilizers;
    await change({ dryS: 1200 });
    const engineer = await app.as('engineer');
    const late = await answerOf(
      engineer
        .patch(`/api/sterilizers/${first?.id ?? ''}`)
        .send({ requestId: anId(), version: 1, qualifiedPrograms: ['G121', 'W4-30'] }),
    );
    expect([late.status, late.body.code]).toEqual([409, 'sterilizer.changed-meanwhile']);
  });

  it('and a sterilizer that is qualified for it at the same moment do not wait for each other for good', async () => {
    const engineer = await app.as('engineer');
    const supervisor = await app.as('supervisor');
    const [, , third] = sterilizers;
    const [changed, qualified] = await Promise.all([
      change({ dryS: 1200 }),
      answerOf(
        supervisor.patch(`/api/sterilizers/${third?.id ?? ''}`).send({
          requestId: anId(),
          version: 1,
          qualifiedPrograms: ['G121', 'W4-30'],
          otherPrograms: [],
        }),
      ),
    ]);
    expect(changed.status).toBe(200);
    expect([200, 409]).toContain(qualified.status);
    const { body } = await answerOf(engineer.get(`/api/sterilizers/${sterilizers[1]?.id ?? ''}`).expect(200));
    expect(body.qualifiedPrograms).toEqual([]);
  });
});
