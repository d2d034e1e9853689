import { beforeAll, describe, expect, it } from 'vitest';
import type { LoadOpeningOptions } from '../../../src/contract/loads';
import { anId, openTestApp } from '../../support/test-app';
import { giveUp, openLoad, openLoadingBay, type LoadingBay } from './loading-bay';

const app = openTestApp();
let bay: LoadingBay;

beforeAll(async () => {
  bay = await openLoadingBay(app);
});

async function options(facility: 'A' | 'B' = 'A'): Promise<LoadOpeningOptions> {
  const reply = await (await app.as('technician', facility)).get('/api/loads/opening-options').expect(200);
  return reply.body as LoadOpeningOptions;
}

async function addSterilizer(number: number): Promise<string> {
  const first = await app.db('sterilizers').where({ id: bay.sterilizerId }).first<Record<string, unknown>>();
  const id = anId();
  await app.db('sterilizers').insert({
    ...first,
    id,
    code: `ST-${number}`,
    number: String(number),
    name: `Sterilizer ${number}`,
    size_class: 'small',
  });
  await app.db('sterilizer_programs').insert([
    { sterilizer_id: id, program_id: bay.programId, is_qualified: false },
    { sterilizer_id: id, program_id: bay.unqualifiedProgramId, is_qualified: true },
  ]);
  return id;
}

async function addTest(sterilizerId: string, result: 'passed' | 'failed', at: string, day = '2026-03-03') {
  await app.db('air_removal_tests').insert({
    id: anId(),
    facility_id: app.facilities.A,
    sterilizer_id: sterilizerId,
    tested_at: at,
    test_day: day,
    result,
    pack_lot: 'AR-7',
    pack_expires_on: '2027-01-31',
    is_before_first_load: true,
    read_by: app.person('technician').id,
    recorded_at: at,
  });
}

describe('what a load can be opened on', () => {
  it('gives each sterilizer its own programs, carts and test of the day', async () => {
    const second = await addSterilizer(2);
    const third = await addSterilizer(3);
    await addTest(second, 'passed', '2026-03-03T12:00:00Z');
    await addTest(second, 'failed', '2026-03-03T12:30:00Z');
    await addTest(third, 'passed', '2026-03-02T12:00:00Z', '2026-03-02');
    const loadId = await openLoad(await app.as('technician'), bay);
    const { sterilizers } = await options();
    expect(
      sterilizers.map(({ sterilizer, programs, unqualified, airRemoval, carts }) => ({
        code: sterilizer.code,
        programs: programs.map(({ code }) => code),
        unqualified: unqualified.map(({ code }) => code),
        airRemoval: airRemoval?.result ?? null,
        carts: carts.map(({ code, isFree }) => `${code} ${isFree ? 'free' : 'in use'}`),
      })),
    ).toEqual([
      {
        code: 'ST-1',
        programs: ['W4-20'],
        unqualified: ['W3-16'],
        airRemoval: 'passed',
        carts: ['C1 in use', 'C2 free', 'C3 free'],
      },
      { code: 'ST-2', programs: ['W3-16'], unqualified: ['W4-20'], airRemoval: 'failed', carts: [] },
      { code: 'ST-3', programs: ['W3-16'], unqualified: ['W4-20'], airRemoval: null, carts: [] },
    ]);
    const number = (await app.db('loads').where({ id: loadId }).first<{ number: string }>('number')).number;
    expect(sterilizers[0]?.carts.find(({ code }) => code === 'C1')?.usedBy).toBe(`load ${number}`);
    expect(await options('B')).toEqual({ sterilizers: [], runs: [] });
    await giveUp(app, loadId);
  });

  it('is read in as many questions for six sterilizers and ten carts as for three and three', async () => {
    const countQuestions = async () => {
      let questions = 0;
      const count = () => {
        questions += 1;
      };
      app.db.on('query', count);
      await options();
      app.db.removeListener('query', count);
      return questions;
    };
    const few = await countQuestions();
    for (const number of [4, 5, 6]) await addSterilizer(number);
    const cart = await app.db('carts').where({ id: bay.cartIds[0] }).first<Record<string, unknown>>();
    await app
      .db('carts')
      .insert(
        Array.from({ length: 7 }, (_, more) => ({ ...cart, id: anId(), code: `D${more}`, name: `Cart D${more}` })),
      );
    expect(await countQuestions()).toBe(few);
    expect(few).toBeGreaterThan(0);
  });
});
