import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { routes } from '../../../server/app';
import type { FinishedLesson } from '../../../src/contract/lessons';
import type { ProblemDetails } from '../../../src/contract/problem';
import { roles, type Role } from '../../../src/domain/access/permissions';
import { ruleSetVersion } from '../../../src/domain/load/policy';
import { answer } from '../../support/answer';
import { anId, openTestApp } from '../../support/test-app';
import { loadSnapshot, openLoad, openLoadingBay } from '../loads/loading-bay';

const app = openTestApp();
let loadId = '';
let foreignLoadId = '';

type LessonBody = ProblemDetails & { readonly lesson: FinishedLesson; readonly finished: readonly FinishedLesson[] };

/** Written down apart from the lessons: which answer is right is part of what must not change unseen. */
const facingAnswers = { right: 'a', wrong: ['b', 'c'] } as const;
const lidAnswers = { right: 'b', wrong: ['a', 'c'] } as const;

beforeAll(async () => {
  loadId = await openLoad(await app.as('technician'), await openLoadingBay(app));
  foreignLoadId = await openLoad(await app.as('technician', 'B'), await openLoadingBay(app, 'B'));
});

beforeEach(async () => {
  app.clock.set('2026-03-03T13:30:00.000Z');
  await app.db('finished_lessons').delete();
});

const path = (ruleId: string) => `/api/lessons/${ruleId}/finish`;

function aFinish(changes: Readonly<Record<string, unknown>> = {}): Record<string, unknown> {
  return { requestId: anId(), ruleSet: ruleSetVersion, answers: [facingAnswers.right], loadId: null, ...changes };
}

async function finish(ruleId: string, changes: Readonly<Record<string, unknown>> = {}, role: Role = 'technician') {
  const agent = await app.as(role);
  return answer<LessonBody>(agent.post(path(ruleId)).send(aFinish(changes)));
}

async function listed(role: Role = 'technician', facility: 'A' | 'B' = 'A') {
  const agent = await app.as(role, facility);
  const { body } = await answer<LessonBody>(agent.get('/api/lessons').expect(200));
  return body.finished;
}

/** Everything a lesson could have changed. */
async function kept(): Promise<unknown> {
  return [
    await app.db('finished_lessons').orderBy('id'),
    await app.db('audit_events').where({ kind: 'lesson.finished' }).count(),
    await loadSnapshot(app),
  ];
}

describe('finishing a lesson', () => {
  it('keeps who, which rule, by which rules, when, after how many tries and from which load, with an event', async () => {
    const reply = await finish('facing', { answers: [...facingAnswers.wrong, facingAnswers.right], loadId });
    expect(reply.status).toBe(201);
    const number = (await app.db('loads').where({ id: loadId }).first<{ number: string }>('number')).number;
    expect(reply.body.lesson).toEqual({
      ruleId: 'facing',
      ruleSet: ruleSetVersion,
      tries: 3,
      finishedAt: '2026-03-03T13:30:00.000Z',
      load: { id: loadId, number },
    });
    expect(await app.db('finished_lessons')).toMatchObject([
      {
        facility_id: app.facilities.A,
        person_id: app.person('technician').id,
        rule_id: 'facing',
        rule_set: ruleSetVersion,
        tries: 3,
        load_id: loadId,
      },
    ]);
    const events = await app
      .db('audit_events')
      .where({ kind: 'lesson.finished', subject_id: 'facing' })
      .orderBy('id', 'desc');
    expect(events[0]).toMatchObject({
      actor_id: app.person('technician').id,
      facility_id: app.facilities.A,
      payload: { ruleId: 'facing', ruleSet: ruleSetVersion, tries: 3, loadId },
    });
  });

  it('is no act upon the load: its history and what can be undone stay as they were', async () => {
    const technician = await app.as('technician');
    const history = () => answer<unknown>(technician.get(`/api/loads/${loadId}/history`).expect(200));
    const before = [(await history()).text, await loadSnapshot(app)];
    await finish('facing', { loadId });
    expect([(await history()).text, await loadSnapshot(app)]).toEqual(before);
  });

  it('counts for a load that is closed to changes as well, and without any load', async () => {
    expect((await finish('facing')).body.lesson.load).toBeNull();
    await app.db('loads').where({ id: loadId }).update({ state: 'abandoned' });
    try {
      expect((await finish('facing', { loadId })).status).toBe(201);
    } finally {
      await app.db('loads').where({ id: loadId }).update({ state: 'building' });
    }
  });

  it('is done once for a request that is sent three times at one moment', async () => {
    const technician = await app.as('technician');
    const request = aFinish();
    const replies = await Promise.all(
      [1, 2, 3].map(() => answer<LessonBody>(technician.post(path('facing')).send(request))),
    );
    expect(replies.map(({ status }) => status)).toEqual([201, 201, 201]);
    expect(new Set(replies.map(({ text }) => text)).size).toBe(1);
    expect(await app.db('finished_lessons')).toHaveLength(1);
  });

  it('refuses a request id that was used for another lesson', async () => {
    const requestId = anId();
    await finish('facing', { requestId });
    const before = await kept();
    const reply = await finish('lid-filter-covered', { requestId, answers: [lidAnswers.right] });
    expect([reply.status, reply.body.code]).toEqual([409, 'request.reused']);
    expect(await kept()).toEqual(before);
  });

  it.each<[string, string, () => Readonly<Record<string, unknown>>, number, string]>([
    ['a rule there is not', 'no-such-rule', () => ({}), 404, 'lesson.none'],
    ['the name of something every object has', 'constructor', () => ({}), 404, 'lesson.none'],
    ['a wrong answer', 'facing', () => ({ answers: ['b'] }), 422, 'lesson.not-answered-right'],
    ['a wrong answer last', 'facing', () => ({ answers: ['a', 'b'] }), 422, 'lesson.not-answered-right'],
    ['an answer given twice', 'facing', () => ({ answers: ['b', 'b', 'a'] }), 422, 'lesson.tries-do-not-fit'],
    ['rules of another day', 'facing', () => ({ ruleSet: '2001-01-01.1' }), 409, 'lesson.rules-changed'],
    ['a load there is not', 'facing', () => ({ loadId: anId() }), 404, 'load.none'],
    ['a load of another facility', 'facing', () => ({ loadId: foreignLoadId }), 404, 'load.none'],
    ['a load id that is none', 'facing', () => ({ loadId: 'the last one' }), 400, 'request.not-understood'],
    ['no answer', 'facing', () => ({ answers: [] }), 400, 'request.not-understood'],
    ['more answers than there are', 'facing', () => ({ answers: ['b', 'c', 'b', 'a'] }), 400, 'request.not-understood'],
    ['an answer that is none of the three', 'facing', () => ({ answers: ['d'] }), 400, 'request.not-understood'],
    ['no request id', 'facing', () => ({ requestId: undefined }), 400, 'request.not-understood'],
    ['no rule set', 'facing', () => ({ ruleSet: undefined }), 400, 'request.not-understood'],
    ['somebody else’s name', 'facing', () => ({ personId: app.person('lead').id }), 400, 'request.not-understood'],
    ['tries counted by oneself', 'facing', () => ({ tries: 1 }), 400, 'request.not-understood'],
  ])('is refused with %s, and nothing is kept', async (_what, ruleId, changes, status, code) => {
    const before = await kept();
    const reply = await finish(ruleId, changes());
    expect([reply.status, reply.body.code]).toEqual([status, code]);
    expect(reply.headers['content-type']).toContain('application/problem+json');
    expect(reply.body.detail).toMatch(/\.$/);
    expect(await kept()).toEqual(before);
  });

  it('answers a rule’s name of any length and kind with a refusal', async () => {
    for (const odd of ['x'.repeat(61), '%00', '%F0%9F%A7%BA', '..%2F..', "' or 1=1"]) {
      const { status } = await finish(odd);
      expect({ odd, status: [400, 404].includes(status) }).toEqual({ odd, status: true });
    }
    expect(await app.db('finished_lessons')).toEqual([]);
  });
});

describe('the list of finished lessons', () => {
  it('shows of each lesson the last time, the latest first', async () => {
    await finish('facing', { answers: ['b', 'a'] });
    app.clock.advance({ minutes: 5 });
    await finish('lid-filter-covered', { answers: [lidAnswers.right], loadId });
    app.clock.advance({ minutes: 5 });
    await finish('facing');
    expect(await listed()).toMatchObject([
      { ruleId: 'facing', tries: 1, finishedAt: '2026-03-03T13:40:00.000Z', load: null },
      { ruleId: 'lid-filter-covered', tries: 1, finishedAt: '2026-03-03T13:35:00.000Z', load: { id: loadId } },
    ]);
  });

  it('shows a person their own and nobody else’s, in this facility only', async () => {
    await finish('facing');
    expect(await listed('lead')).toEqual([]);
    expect(await listed('supervisor')).toEqual([]);
    expect(await listed('technician', 'B')).toEqual([]);
    expect(await listed()).toHaveLength(1);
  });
});

describe('who may finish lessons', () => {
  const atTheCart: readonly Role[] = ['technician', 'lead', 'supervisor'];

  it('has every route of lessons in this file', () => {
    const own = routes.filter((route) => route.path.startsWith('/api/lessons'));
    expect(own.map(({ method, path: at }) => `${method} ${at}`)).toEqual([
      'get /api/lessons',
      'post /api/lessons/:ruleId/finish',
    ]);
  });

  it.each(roles)('is settled for the role %s', async (role) => {
    const agent = await app.as(role);
    const isIn = atTheCart.includes(role);
    await agent.get('/api/lessons').expect(isIn ? 200 : 403);
    const reply = await finish('facing', {}, role);
    expect(reply.status).toBe(isIn ? 201 : 403);
    if (!isIn) expect(reply.body.code).toBe('access.not-permitted');
    expect(await app.db('finished_lessons')).toHaveLength(isIn ? 1 : 0);
  });

  it('is nobody without a session, and no page but our own', async () => {
    await app.anyone().get('/api/lessons').expect(401);
    await app.anyone().post(path('facing')).send(aFinish()).expect(401);
    const technician = await app.as('technician');
    await technician.post(path('facing')).set('X-Requested-With', 'another').send(aFinish()).expect(403);
    expect(await app.db('finished_lessons')).toEqual([]);
  });
});
