import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { AirRemovalTest } from '../../../src/contract/air-removal-tests';
import type { ProblemDetails } from '../../../src/contract/problem';
import { airRemovalOfDay } from '../../../server/features/equipment/read-model';
import { answer } from '../../support/answer';
import { anId, openTestApp } from '../../support/test-app';
import { addPiece, answerOf, aSterilizer, equipmentOnFile } from './equipment-support';

const app = openTestApp();
const path = '/api/air-removal-tests';

type TestBody = ProblemDetails & {
  readonly test: AirRemovalTest;
  readonly serviceState: string;
  readonly tests: AirRemovalTest[];
  readonly readers: { id: string; name: string }[];
  readonly today: string;
  readonly total: number;
};

let sterilizerId = '';
let foreignSterilizerId = '';

beforeAll(async () => {
  foreignSterilizerId = (await addPiece(app, '/api/sterilizers', aSterilizer('1'), 'B')).id;
});

beforeEach(async () => {
  app.clock.set('2026-03-03T13:30:00.000Z');
  await app.db('air_removal_tests').delete();
  await app.db('sterilizers').where({ facility_id: app.facilities.A }).delete();
  sterilizerId = (await addPiece(app, '/api/sterilizers', aSterilizer('1'))).id;
});

function aTest(changes: Readonly<Record<string, unknown>> = {}): Record<string, unknown> {
  return {
    requestId: anId(),
    sterilizerId,
    testedAt: '2026-03-03T11:40:00.000Z',
    result: 'passed',
    packLot: 'AR-2291',
    packExpiresOn: '2027-06-30',
    isBeforeFirstLoad: true,
    note: '',
    ...changes,
  };
}

async function record(changes: Readonly<Record<string, unknown>> = {}) {
  const technician = await app.as('technician');
  return answer<TestBody>(technician.post(path).send(aTest(changes)));
}

describe('recording an air-removal test', () => {
  it('keeps it with its day, its reader and an event, and shows it at the sterilizer', async () => {
    const { status, body } = await record();
    expect(status).toBe(201);
    expect(body).toMatchObject({
      serviceState: 'in-service',
      test: {
        sterilizer: { code: 'ST-1' },
        testDay: '2026-03-03',
        result: 'passed',
        readBy: app.person('technician').displayName,
        secondReader: null,
      },
    });
    expect(
      await app.db('audit_events').where({ kind: 'air-removal-test.recorded', subject_id: sterilizerId }),
    ).toMatchObject([
      {
        payload: { sterilizer: 'ST-1', result: 'passed', testDay: '2026-03-03' },
        actor_id: app.person('technician').id,
      },
    ]);
    const technician = await app.as('technician');
    const { body: shown } = await answerOf(technician.get(`/api/sterilizers/${sterilizerId}`));
    expect(shown.airRemoval).toEqual({ result: 'passed', testedAt: '2026-03-03T11:40:00.000Z' });
  });

  it('counts for the facility’s day, not for that of UTC', async () => {
    app.clock.set('2026-03-04T05:30:00.000Z');
    const { body } = await record({ testedAt: '2026-03-04T05:00:00.000Z' });
    expect(body.test.testDay).toBe('2026-03-03');
    expect(await airRemovalOfDay(app.db, app.facilities.A, sterilizerId, '2026-03-03')).not.toBeNull();
    expect(await airRemovalOfDay(app.db, app.facilities.A, sterilizerId, '2026-03-04')).toBeNull();
  });

  it('counts for the production day where the facility has settled so', async () => {
    await app
      .db('facilities')
      .where({ id: app.facilities.A })
      .update({ day_rule: 'production-day', production_day_starts_at: '06:30' });
    try {
      const { body } = await record({ testedAt: '2026-03-03T11:40:00.000Z' });
      expect(body.test.testDay).toBe('2026-03-02');
    } finally {
      await app.db('facilities').where({ id: app.facilities.A }).update({ day_rule: 'calendar-day' });
    }
  });

  it('lets the latest test of the day speak, whichever was recorded last', async () => {
    await record({ testedAt: '2026-03-03T12:40:00.000Z', result: 'passed' });
    await record({ testedAt: '2026-03-03T11:40:00.000Z', result: 'failed' });
    expect(await airRemovalOfDay(app.db, app.facilities.A, sterilizerId, '2026-03-03')).toEqual({
      result: 'passed',
      testedAt: '2026-03-03T12:40:00.000Z',
    });
    await record({ testedAt: '2026-03-03T13:10:00.000Z', result: 'failed' });
    expect(await airRemovalOfDay(app.db, app.facilities.A, sterilizerId, '2026-03-03')).toMatchObject({
      result: 'failed',
    });
  });

  it('is done once for a request that is sent twice', async () => {
    const test = aTest();
    const technician = await app.as('technician');
    const replies = await Promise.all([1, 2, 3].map(() => answer<TestBody>(technician.post(path).send(test))));
    expect(new Set(replies.map((reply) => reply.body.test.id)).size).toBe(1);
    expect(await app.db('air_removal_tests')).toHaveLength(1);
  });

  it('takes the sterilizer out of service with a failed test when asked', async () => {
    const { body } = await record({ result: 'failed', isTakenOutOfService: true });
    expect(body.serviceState).toBe('out-of-service');
    expect(await app.db('sterilizers').where({ id: sterilizerId }).first('service_state', 'version')).toEqual({
      service_state: 'out-of-service',
      version: 2,
    });
    expect(await app.db('audit_events').where({ kind: 'equipment.changed', subject_id: sterilizerId })).toMatchObject([
      { payload: { before: { serviceState: 'in-service' }, after: { serviceState: 'out-of-service' } } },
    ]);
  });

  it('leaves it in service with a failed test when not asked, and a passed test brings none back', async () => {
    expect((await record({ result: 'failed' })).body.serviceState).toBe('in-service');
    await app.db('sterilizers').where({ id: sterilizerId }).update({ service_state: 'out-of-service' });
    expect((await record()).body.serviceState).toBe('out-of-service');
  });

  it('takes a second reader who may read tests here', async () => {
    const { body } = await record({ secondReaderId: app.person('lead').id });
    expect(body.test.secondReader).toBe(app.person('lead').displayName);
  });

  it.each<[string, () => Readonly<Record<string, unknown>>, number, string]>([
    ['a pack that had expired', () => ({ packExpiresOn: '2026-03-02' }), 422, 'air-removal-test.pack-expired'],
    ['a time to come', () => ({ testedAt: '2026-03-03T13:40:00.000Z' }), 422, 'air-removal-test.in-the-future'],
    ['a year mistyped', () => ({ testedAt: '2016-03-03T11:40:00.000Z' }), 422, 'air-removal-test.too-long-ago'],
    [
      'a passed test that takes out of service',
      () => ({ isTakenOutOfService: true }),
      422,
      'air-removal-test.passed-stays-in-service',
    ],
    ['another facility’s sterilizer', () => ({ sterilizerId: foreignSterilizerId }), 404, 'sterilizer.none'],
    ['a sterilizer that is none', () => ({ sterilizerId: anId() }), 404, 'sterilizer.none'],
    [
      'oneself as second reader',
      () => ({ secondReaderId: app.person('technician').id }),
      422,
      'air-removal-test.same-reader',
    ],
    [
      'a second reader of another facility',
      () => ({ secondReaderId: app.person('lead', 'B').id }),
      404,
      'air-removal-test.no-such-reader',
    ],
    [
      'a second reader who may not read tests',
      () => ({ secondReaderId: app.person('operating-room').id }),
      404,
      'air-removal-test.no-such-reader',
    ],
    ['a day that is none', () => ({ packExpiresOn: '2027-02-30' }), 400, 'request.not-understood'],
    ['a time without a zone', () => ({ testedAt: '2026-03-03T11:40' }), 400, 'request.not-understood'],
    ['a result in between', () => ({ result: 'doubtful' }), 400, 'request.not-understood'],
    ['no lot', () => ({ packLot: ' ' }), 400, 'request.not-understood'],
    ['a field too many', () => ({ readBy: app.person('lead').id }), 400, 'request.not-understood'],
    ['no request id', () => ({ requestId: undefined }), 400, 'request.not-understood'],
  ])('is refused with %s, and nothing changes', async (_what, changes, status, code) => {
    const before = await equipmentOnFile(app);
    const reply = await record(changes());
    expect([reply.status, reply.body.code]).toEqual([status, code]);
    expect(await equipmentOnFile(app)).toEqual(before);
  });

  it('and the form of the sterilizer do not undo each other', async () => {
    const engineer = await app.as('engineer');
    const [, patched] = await Promise.all([
      record({ result: 'failed', isTakenOutOfService: true }),
      answerOf(
        engineer.patch(`/api/sterilizers/${sterilizerId}`).send({ requestId: anId(), version: 1, name: 'New name' }),
      ),
    ]);
    const row = await app
      .db('sterilizers')
      .where({ id: sterilizerId })
      .first<{ service_state: string; version: number }>('service_state', 'version');
    expect(row.service_state).toBe('out-of-service');
    expect(row.version).toBe(patched.status === 200 ? 3 : 2);
  });
});

describe('the list of air-removal tests', () => {
  it('shows the latest first, of one sterilizer or one day, and who may be a second reader', async () => {
    await record({ testedAt: '2026-03-02T12:00:00.000Z' });
    await record();
    const technician = await app.as('technician');
    const { body } = await answer<TestBody>(technician.get(path).query({ sterilizerId }).expect(200));
    expect(body.tests.map((test) => test.testDay)).toEqual(['2026-03-03', '2026-03-02']);
    expect(body.today).toBe('2026-03-03');
    expect(body.readers.map((reader) => reader.name).sort()).toEqual(
      ['engineer', 'lead', 'supervisor', 'technician'].map((role) => `Ada ${role}`),
    );
    const { body: ofDay } = await answer<TestBody>(technician.get(path).query({ day: '2026-03-02' }).expect(200));
    expect(ofDay.total).toBe(1);
    const stranger = await app.as('technician', 'B');
    const { body: none } = await answer<TestBody>(stranger.get(path).query({ sterilizerId }).expect(200));
    expect(none.tests).toEqual([]);
    await technician.get(path).query({ day: 'yesterday' }).expect(400);
  });
});
