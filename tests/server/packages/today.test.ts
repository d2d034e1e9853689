import { beforeAll, describe, expect, it } from 'vitest';
import type { Role } from '../../../src/domain/access/permissions';
import { todaySchema, type Today } from '../../../src/contract/today';
import { anId, openTestApp } from '../../support/test-app';
import { addItem, addRun, pack, putInState, stage } from './packing-room';

const app = openTestApp();
const sterilizerIds = { passed: anId(), missing: anId(), failed: anId() };
const cartId = anId();

async function addSterilizer(id: string, number: string): Promise<void> {
  await app.db('sterilizers').insert({
    id,
    facility_id: app.facilities.A,
    code: `ST-${number}`,
    number,
    name: `Sterilizer ${number}`,
    size_class: 'large',
    chamber_width_mm: 660,
    chamber_depth_mm: 1200,
    chamber_height_mm: 660,
    drain_x_mm: 280,
    drain_y_mm: 60,
    greatest_load_mass_kg: 100,
    service_state: 'in-service',
  });
}

async function addTest(
  sterilizerId: string,
  result: 'passed' | 'failed',
  testedAt: string,
  testDay: string,
): Promise<void> {
  await app.db('air_removal_tests').insert({
    id: anId(),
    facility_id: app.facilities.A,
    sterilizer_id: sterilizerId,
    tested_at: testedAt,
    test_day: testDay,
    result,
    pack_lot: 'L-1',
    pack_expires_on: '2027-01-01',
    is_before_first_load: true,
    read_by: app.person('technician').id,
    recorded_at: testedAt,
  });
}

async function addLoad(changes: {
  number: string;
  day: string;
  state: string;
  opened_at: string;
  sterilizer_id: string;
}): Promise<string> {
  const id = anId();
  const isOpen = changes.state === 'building' || changes.state === 'abandoned';
  await app.db('loads').insert({
    id,
    facility_id: app.facilities.A,
    count_of_day: Number(changes.number.slice(-2)),
    program_id: await programId(),
    cart_id: cartId,
    policy_id: await policyId(),
    opened_by: app.person('technician').id,
    ...(isOpen
      ? {}
      : {
          closed_by: app.person('lead').id,
          closed_at: changes.opened_at,
          rule_set: '1',
          verdict: '{}',
          contents_digest: 'digest',
        }),
    ...changes,
  });
  return id;
}

async function programId(): Promise<string> {
  const known = await app.db('programs').where({ code: 'W4-20' }).first<{ id: string } | undefined>('id');
  if (known) return known.id;
  const id = anId();
  await app.db('programs').insert({
    id,
    facility_id: app.facilities.A,
    code: 'W4-20',
    name: 'Wraps',
    cycle_type: 'dynamic-air-removal',
    temperature_c: 132,
    exposure_s: 240,
    dry_s: 1200,
  });
  return id;
}

async function policyId(): Promise<string> {
  const known = await app
    .db('policies')
    .where({ facility_id: app.facilities.A })
    .first<{ id: string } | undefined>('id');
  if (known) return known.id;
  const id = anId();
  await app.db('policies').insert({
    id,
    facility_id: app.facilities.A,
    number: 900,
    settings: '{}',
    reason: 'First',
    effective_at: '2026-01-01T00:00:00Z',
    effective_on: '2026-01-01',
    created_at: '2026-01-01T00:00:00Z',
  });
  return id;
}

let building: string;

beforeAll(async () => {
  await addSterilizer(sterilizerIds.passed, '1');
  await addSterilizer(sterilizerIds.missing, '2');
  await addSterilizer(sterilizerIds.failed, '3');
  await app.db('carts').insert([
    { id: cartId, facility_id: app.facilities.A, code: 'C1', name: 'Cart 1', size_class: 'large' },
    {
      id: anId(),
      facility_id: app.facilities.A,
      code: 'C7',
      name: 'Cart 7',
      size_class: 'large',
      is_usable: false,
      note: 'Bent',
    },
  ]);
  await addTest(sterilizerIds.passed, 'failed', '2026-03-03T11:00:00Z', '2026-03-03');
  await addTest(sterilizerIds.passed, 'passed', '2026-03-03T11:40:00Z', '2026-03-03');
  await addTest(sterilizerIds.failed, 'failed', '2026-03-03T11:30:00Z', '2026-03-03');
  await addTest(sterilizerIds.missing, 'passed', '2026-03-02T11:30:00Z', '2026-03-02');

  const one = { sterilizer_id: sterilizerIds.passed, day: '2026-03-03' };
  building = await addLoad({ ...one, number: '1-26062-02', state: 'building', opened_at: '2026-03-03T13:00:00Z' });
  await addLoad({ ...one, number: '1-26062-01', state: 'closed', opened_at: '2026-03-03T12:00:00Z' });
  await addLoad({ ...one, number: '1-26062-03', state: 'abandoned', opened_at: '2026-03-03T12:30:00Z' });
  await addLoad({
    ...one,
    number: '1-26061-09',
    day: '2026-03-02',
    state: 'awaiting-proof',
    opened_at: '2026-03-02T22:00:00Z',
  });
  await addLoad({
    ...one,
    number: '1-26061-08',
    day: '2026-03-02',
    state: 'released',
    opened_at: '2026-03-02T20:00:00Z',
  });

  const tray = await addItem(app, { kind: 'wrapped-tray', is_implant: true });
  const [staged, listed, scanned, held, expired] = await pack(app, tray.id, 7);
  if (!staged || !listed || !scanned || !held || !expired) throw new Error('nothing was packed');
  await stage(app, await addRun(app, 'Morning'), [staged.id]);
  for (const entry of [listed, scanned]) {
    await app.db('load_packages').insert({
      load_id: building,
      package_id: entry.id,
      was_staged: false,
      listed_at: '2026-03-03T13:00:00Z',
      scanned_at: entry === scanned ? '2026-03-03T13:05:00Z' : null,
      scanned_by: entry === scanned ? app.person('technician').id : null,
      entry: entry === scanned ? 'wedge' : null,
    });
    await putInState(app, entry.id, { state: 'in-load' });
  }
  await putInState(app, held.id, { held_reason: 'Torn' });
  await putInState(app, expired.id, { expires_on: '2026-03-02' });
});

async function today(role: Role, facility: 'A' | 'B' = 'A'): Promise<Today> {
  const agent = await app.as(role, facility);
  const reply = await agent.get('/api/today').expect(200);
  return todaySchema.parse(reply.body);
}

describe('today', () => {
  it('shows each sterilizer with the day’s tests, and not yesterday’s', async () => {
    const { sterilizers, day } = await today('technician');
    expect(day).toBe('2026-03-03');
    expect(sterilizers.map((one) => [one.code, one.tests.map((test) => test.result)])).toEqual([
      ['ST-1', ['failed', 'passed']],
      ['ST-2', []],
      ['ST-3', ['failed']],
    ]);
  });

  it('shows the loads of the day and those not over yet; no abandoned ones, none that ended yesterday', async () => {
    const { sterilizers } = await today('technician');
    expect(sterilizers[0]?.loads.map((load) => load.number)).toEqual(['1-26061-09', '1-26062-01', '1-26062-02']);
    expect(sterilizers[0]?.loads.at(-1)).toMatchObject({
      state: 'building',
      programCode: 'W4-20',
      cartName: 'Cart 1',
      openedBy: app.person('technician').displayName,
      listed: 2,
      scanned: 1,
      implants: 2,
    });
  });

  it('shows which load stands on which cart', async () => {
    const { carts } = await today('technician');
    expect(carts).toMatchObject([
      { code: 'C1', load: { number: '1-26062-02', scanned: 1, listed: 2 } },
      { code: 'C7', isUsable: false, note: 'Bent', load: null },
    ]);
  });

  it('counts packed packages that nothing speaks against', async () => {
    expect((await today('technician')).packed).toBe(2);
  });

  it('tells each role what waits for it', async () => {
    const kinds = async (role: Role) => (await today(role)).waits.map((wait) => wait.kind);
    expect(await kinds('technician')).toEqual([
      'air-removal-failed',
      'air-removal-missing',
      'load-building',
      'run-waiting',
      'load-closed',
      'packed-not-staged',
    ]);
    expect(await kinds('engineer')).toEqual(['air-removal-failed', 'air-removal-missing']);
    expect(await kinds('surveyor')).toEqual([]);
  });

  it('says of the own load that it is one’s own', async () => {
    const detail = async (role: Role) =>
      (await today(role)).waits.find((wait) => wait.kind === 'load-building')?.detail;
    expect(await detail('technician')).toBe('Cart 1, opened by you.');
    expect(await detail('lead')).toBe(`Cart 1, opened by ${app.person('technician').displayName}.`);
  });

  it('shows nothing of another facility', async () => {
    expect(await today('technician', 'B')).toMatchObject({
      sterilizers: [],
      carts: [],
      runs: [],
      packed: 0,
      waits: [],
    });
  });

  it('names the shift that is on', async () => {
    expect((await today('technician')).shift).toBeNull();
    const shifts = [
      { name: 'Day', startsAt: '06:30', endsAt: '15:00' },
      { name: 'Night', startsAt: '22:30', endsAt: '07:00' },
    ];
    await app
      .db('facilities')
      .where({ id: app.facilities.A })
      .update({ shifts: JSON.stringify(shifts) });
    // 07:30 at the hospital.
    expect((await today('technician')).shift).toEqual({ name: 'Day', endsAt: '15:00' });
  });
});
