import { beforeAll, describe, expect, it } from 'vitest';
import { anId, openTestApp } from '../../support/test-app';
import {
  addItem,
  addRun,
  eventsAbout,
  pack,
  packageRow,
  packOne,
  putInState,
  snapshot,
  stage,
  type TestItem,
} from './packing-room';

const app = openTestApp();
let scissors: TestItem;

beforeAll(async () => {
  scissors = await addItem(app);
});

async function post(path: string, body: object): Promise<{ status: number; body: Record<string, unknown> }> {
  const technician = await app.as('technician');
  const reply = await technician.post(path).send({ requestId: anId(), ...body });
  return { status: reply.status, body: reply.body as Record<string, unknown> };
}

async function runState(runId: string): Promise<string> {
  const row = await app.db('runs').where({ id: runId }).first<{ state: string } | undefined>('state');
  return row?.state ?? 'none';
}

async function addSterilizer(facilityId: string, code: string): Promise<string> {
  const id = anId();
  await app.db('sterilizers').insert({
    id,
    facility_id: facilityId,
    code,
    number: code.slice(-1),
    name: `Sterilizer ${code.slice(-1)}`,
    size_class: 'large',
    chamber_width_mm: 660,
    chamber_depth_mm: 1200,
    chamber_height_mm: 660,
    drain_x_mm: 280,
    drain_y_mm: 60,
    greatest_load_mass_kg: 100,
    service_state: 'in-service',
  });
  return id;
}

async function addProgram(facilityId: string, code: string, isRetired = false): Promise<string> {
  const id = anId();
  await app.db('programs').insert({
    id,
    facility_id: facilityId,
    code,
    name: code,
    cycle_type: 'dynamic-air-removal',
    temperature_c: 132,
    exposure_s: 240,
    dry_s: 1200,
    is_retired: isRetired,
  });
  return id;
}

describe('a new run', () => {
  it('waits under its name, with the sterilizer, program and hour it was given', async () => {
    const sterilizerId = await addSterilizer(app.facilities.A, 'ST-1');
    const programId = await addProgram(app.facilities.A, 'W4-20');
    await app
      .db('sterilizer_programs')
      .insert({ sterilizer_id: sterilizerId, program_id: programId, is_qualified: true });
    const wantedAt = '2026-03-03T18:00:00.000Z';
    const added = await post('/api/runs', { name: '  Orthopaedics  ', sterilizerId, programId, wantedAt });
    expect(added.status).toBe(201);
    const technician = await app.as('technician');
    const reply = await technician.get(`/api/runs/${String(added.body.runId)}`).expect(200);
    expect(reply.body).toMatchObject({
      run: {
        name: 'Orthopaedics',
        sterilizer: { code: 'ST-1' },
        program: { code: 'W4-20' },
        wantedAt,
        state: 'waiting',
        packages: 0,
        createdBy: app.person('technician').displayName,
        load: null,
      },
      packages: [],
    });
  });

  it('refuses a program its sterilizer is not qualified for, or that is retired', async () => {
    const sterilizerId = await addSterilizer(app.facilities.A, 'ST-3');
    const programId = await addProgram(app.facilities.A, 'W3-16');
    const retiredId = await addProgram(app.facilities.A, 'W9-99', true);
    await app
      .db('sterilizer_programs')
      .insert({ sterilizer_id: sterilizerId, program_id: programId, is_qualified: false });
    const before = await snapshot(app);
    const run = { name: 'Wrong', sterilizerId, programId, wantedAt: null };
    expect(await post('/api/runs', run)).toMatchObject({ status: 422, body: { code: 'run.program-not-qualified' } });
    expect(await post('/api/runs', { ...run, programId: retiredId })).toMatchObject({
      status: 422,
      body: { code: 'run.program-retired' },
    });
    expect(await snapshot(app)).toBe(before);
  });

  it('does not know another facility’s sterilizers and programs', async () => {
    const sterilizerId = await addSterilizer(app.facilities.B, 'ST-8');
    const programId = await addProgram(app.facilities.B, 'W4-20');
    const run = { name: 'Theirs', sterilizerId: null, programId: null, wantedAt: null };
    expect(await post('/api/runs', { ...run, sterilizerId })).toMatchObject({
      status: 404,
      body: { code: 'sterilizer.none' },
    });
    expect(await post('/api/runs', { ...run, programId })).toMatchObject({
      status: 404,
      body: { code: 'program.none' },
    });
  });
});

describe('staging packages into a run', () => {
  it('takes packed ones, shows them in the run, and tells it in their history', async () => {
    const runId = await addRun(app);
    const made = await pack(app, scissors.id, 3);
    const ids = made.map((one) => one.id);
    expect(await post(`/api/runs/${runId}/packages`, { packageIds: ids })).toEqual({
      status: 200,
      body: { staged: 3 },
    });
    for (const id of ids)
      expect(await packageRow(app, id)).toMatchObject({ state: 'staged', run_id: runId, version: 2 });
    const technician = await app.as('technician');
    const reply = await technician.get(`/api/runs/${runId}`).expect(200);
    expect((reply.body as { packages: { id: string }[] }).packages.map((one) => one.id).sort()).toEqual(
      [...ids].sort(),
    );
    expect((await eventsAbout(app, ids[0] ?? '')).at(-1)).toEqual({ kind: 'package.staged', payload: { runId } });
  });

  it('changes nothing for those that wait in it already', async () => {
    const runId = await addRun(app);
    const one = await packOne(app, scissors.id);
    await stage(app, runId, [one.id]);
    const before = await snapshot(app);
    expect(await post(`/api/runs/${runId}/packages`, { packageIds: [one.id] })).toMatchObject({ body: { staged: 0 } });
    expect(await snapshot(app)).toBe(before);
  });

  it('answers a repeated request with the first answer', async () => {
    const runId = await addRun(app);
    const one = await packOne(app, scissors.id);
    const request = { requestId: anId(), packageIds: [one.id] };
    const first = await post(`/api/runs/${runId}/packages`, request);
    const before = await snapshot(app);
    expect(await post(`/api/runs/${runId}/packages`, request)).toEqual(first);
    expect(await snapshot(app)).toBe(before);
  });

  it('stages all or none, and points at each that cannot go', async () => {
    const runId = await addRun(app);
    const [good, held] = await pack(app, scissors.id, 2);
    if (!good || !held) throw new Error('nothing was packed');
    await putInState(app, held.id, { held_reason: 'Filter cracked' });
    const before = await snapshot(app);
    const answer = await post(`/api/runs/${runId}/packages`, { packageIds: [good.id, held.id] });
    expect(answer).toMatchObject({
      status: 422,
      body: { code: 'package.held', fields: [{ pointer: '/body/packageIds/1' }] },
    });
    expect(await snapshot(app)).toBe(before);
  });

  it('refuses to take a package out of another run that waits', async () => {
    const first = await addRun(app, 'First');
    const second = await addRun(app, 'Second');
    const one = await packOne(app, scissors.id);
    await stage(app, first, [one.id]);
    const answer = await post(`/api/runs/${second}/packages`, { packageIds: [one.id] });
    expect(answer).toMatchObject({ status: 409, body: { code: 'package.in-another-run' } });
    expect(await packageRow(app, one.id)).toMatchObject({ run_id: first });
  });

  it.each(['taken', 'dropped'])('refuses when the run is %s', async (state) => {
    const runId = await addRun(app);
    const one = await packOne(app, scissors.id);
    await app.db('runs').where({ id: runId }).update({ state });
    const before = await snapshot(app);
    expect(await post(`/api/runs/${runId}/packages`, { packageIds: [one.id] })).toMatchObject({
      status: 409,
      body: { code: `run.${state}` },
    });
    expect(await snapshot(app)).toBe(before);
  });

  it('knows neither another facility’s run nor its packages', async () => {
    const theirItem = await addItem(app, {}, 'B');
    const theirs = await packOne(app, theirItem.id, 'B');
    const theirRun = await addRun(app, 'Theirs', 'B');
    const runId = await addRun(app);
    const ours = await packOne(app, scissors.id);
    const before = await snapshot(app);
    expect(await post(`/api/runs/${runId}/packages`, { packageIds: [ours.id, theirs.id] })).toMatchObject({
      status: 404,
      body: { code: 'package.none' },
    });
    for (const act of ['packages', 'remove']) {
      expect(await post(`/api/runs/${theirRun}/${act}`, { packageIds: [ours.id] })).toMatchObject({
        status: 404,
        body: { code: 'run.none' },
      });
    }
    expect(await post(`/api/runs/${theirRun}/scan`, { raw: ours.code })).toMatchObject({ status: 404 });
    expect(await post(`/api/runs/${theirRun}/drop`, {})).toMatchObject({ status: 404 });
    const technician = await app.as('technician');
    expect((await technician.get(`/api/runs/${theirRun}`)).status).toBe(404);
    expect(await snapshot(app)).toBe(before);
  });
});

describe('taking packages out of a run and dropping it', () => {
  it('frees a package again', async () => {
    const runId = await addRun(app);
    const one = await packOne(app, scissors.id);
    await stage(app, runId, [one.id]);
    expect(await post(`/api/runs/${runId}/remove`, { packageIds: [one.id] })).toEqual({
      status: 200,
      body: { removed: 1 },
    });
    expect(await packageRow(app, one.id)).toMatchObject({ state: 'packed', run_id: null });
    expect((await eventsAbout(app, one.id)).at(-1)).toEqual({ kind: 'package.unstaged', payload: { runId } });
  });

  it('refuses for a package that does not wait there', async () => {
    const runId = await addRun(app);
    const one = await packOne(app, scissors.id);
    expect(await post(`/api/runs/${runId}/remove`, { packageIds: [one.id] })).toMatchObject({
      status: 409,
      body: { code: 'package.not-in-run' },
    });
  });

  it('drops a run and frees all that waited in it, once', async () => {
    const runId = await addRun(app, 'Given up');
    const made = await pack(app, scissors.id, 2);
    await stage(
      app,
      runId,
      made.map((one) => one.id),
    );
    const request = { requestId: anId() };
    expect(await post(`/api/runs/${runId}/drop`, request)).toEqual({ status: 200, body: { returned: 2 } });
    expect(await runState(runId)).toBe('dropped');
    for (const one of made) expect(await packageRow(app, one.id)).toMatchObject({ state: 'packed', run_id: null });
    const before = await snapshot(app);
    expect(await post(`/api/runs/${runId}/drop`, request)).toEqual({ status: 200, body: { returned: 2 } });
    expect(await post(`/api/runs/${runId}/drop`, {})).toMatchObject({ status: 409, body: { code: 'run.dropped' } });
    expect(await snapshot(app)).toBe(before);
  });

  it('does not drop a run that a load has taken', async () => {
    const runId = await addRun(app);
    await app.db('runs').where({ id: runId }).update({ state: 'taken' });
    expect(await post(`/api/runs/${runId}/drop`, {})).toMatchObject({ status: 409, body: { code: 'run.taken' } });
    expect(await runState(runId)).toBe('taken');
  });
});

describe('scanning into a run', () => {
  async function scan(runId: string, raw: string) {
    return post(`/api/runs/${runId}/scan`, { raw });
  }

  it('takes a packed package, and says it is here already the second time', async () => {
    const runId = await addRun(app, 'Scanned');
    const one = await packOne(app, scissors.id);
    expect(await scan(runId, one.code.replaceAll('-', ''))).toMatchObject({
      status: 200,
      body: { answer: 'taken', code: one.code, package: { id: one.id } },
    });
    const before = await snapshot(app);
    expect(await scan(runId, one.code)).toMatchObject({ status: 200, body: { answer: 'already-here' } });
    expect(await snapshot(app)).toBe(before);
  });

  it('takes a package whose instructions for use do not permit the run’s program, and says to look', async () => {
    const programId = await addProgram(app.facilities.A, 'W4-30');
    const needs = (temperatureC: number) =>
      JSON.stringify([
        {
          type: 'dynamic-air-removal',
          temperatureC,
          leastExposureS: 240,
          greatestExposureS: null,
          leastDryS: 1200,
        },
      ]);
    const fitting = await addItem(app, { cycle_needs: needs(132) });
    const other = await addItem(app, { cycle_needs: needs(134) });
    const silent = await addItem(app);
    const added = await post('/api/runs', { name: 'At 132', sterilizerId: null, programId, wantedAt: null });
    const runId = String(added.body.runId);
    const lookAt = async (itemId: string) => {
      const reply = await scan(runId, (await packOne(app, itemId)).code);
      expect(reply.body.answer).toBe('taken');
      return reply.body.look;
    };
    expect(await lookAt(fitting.id)).toBeNull();
    expect(await lookAt(other.id)).toBe('program-not-permitted');
    expect(await lookAt(silent.id)).toBeNull();
  });

  it.each([
    { what: 'held', changes: { held_reason: 'Seal open' }, answer: 'held' },
    { what: 'called back', changes: { state: 'recalled' }, answer: 'called-back' },
    { what: 'sterile already', changes: { state: 'sterile' }, answer: 'not-ready' },
    { what: 'past its last day', changes: { expires_on: '2026-03-02' }, answer: 'not-ready' },
  ])('says that a package is $what, and changes nothing', async ({ changes, answer }) => {
    const runId = await addRun(app);
    const one = await packOne(app, scissors.id);
    await putInState(app, one.id, changes);
    const before = await snapshot(app);
    const reply = await scan(runId, one.code);
    expect(reply).toMatchObject({ status: 200, body: { answer, package: { id: one.id } } });
    expect(reply.body.sentence).toContain(one.code);
    expect(await snapshot(app)).toBe(before);
  });

  it('does not know another facility’s label, and does not say that it exists', async () => {
    const theirItem = await addItem(app, { name: 'Secret of theirs' }, 'B');
    const theirs = await packOne(app, theirItem.id, 'B');
    const runId = await addRun(app);
    const reply = await scan(runId, theirs.code);
    expect(reply).toMatchObject({ status: 200, body: { answer: 'not-known', package: null } });
    expect(JSON.stringify(reply.body)).not.toContain('Secret');
  });

  it.each([
    { what: 'nothing', raw: '' },
    { what: '10,000 characters', raw: 'x'.repeat(10_000) },
    { what: 'control characters', raw: '\u0000\u0001P\u001b[31m' },
    { what: 'a maker’s code', raw: '0109506000134352' },
    { what: 'a label that never was', raw: 'P-99999999-00' },
    { what: 'a holder’s code', raw: 'H-00012-31' },
  ])('answers $what in one sentence and shows nothing that cannot be seen', async ({ raw }) => {
    const runId = await addRun(app);
    const before = await snapshot(app);
    const reply = await scan(runId, raw);
    expect(reply).toMatchObject({ status: 200, body: { answer: 'not-known', package: null } });
    expect(reply.body.sentence).toMatch(/^[A-Z].*\.$/);
    expect(String(reply.body.code).length).toBeLessThanOrEqual(41);
    expect(String(reply.body.code)).not.toMatch(/\p{Cc}/u);
    expect(await snapshot(app)).toBe(before);
  });
});
