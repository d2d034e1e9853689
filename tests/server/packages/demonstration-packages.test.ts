import type TestAgent from 'supertest/lib/agent';
import { beforeAll, describe, expect, it } from 'vitest';
import type { LoadDetail, LoadOpeningOptions, ScanResponse } from '../../../src/contract/loads';
import type { PackageListResponse } from '../../../src/contract/packages';
import type { RunDetail } from '../../../src/contract/runs';
import { evaluateLoad } from '../../../src/domain/load/evaluate-load';
import { seedDemonstration } from '../../../seeds/demonstration';
import { hospitalId } from '../../../seeds/demonstration-facilities';
import { demonstrationRuns } from '../../../seeds/demonstration-packages';
import { allDemonstrationSignIns } from '../../../seeds/demonstration-people';
import { anId, openTestApp } from '../../support/test-app';

const app = openTestApp();

async function signIn(name: string): Promise<TestAgent> {
  const person = allDemonstrationSignIns.find((one) => one.name === name);
  if (!person) throw new Error(`Nobody in the demonstration is called ${name}.`);
  const agent = app.anyone();
  await agent.post('/api/session').send({ staffNumber: person.staffNumber, password: person.password }).expect(200);
  return agent;
}

let technician: TestAgent;
let options: LoadOpeningOptions;

beforeAll(async () => {
  await seedDemonstration(app.db, app.clock.now());
  technician = await signIn('Amabel Wyncote');
  options = (await technician.get('/api/loads/opening-options').expect(200)).body as LoadOpeningOptions;
}, 60_000);

/** Opens the load of a run, puts so many racks of each kind on the lower shelf and scans all that is staged. */
async function build(
  plan: (typeof demonstrationRuns)[keyof typeof demonstrationRuns],
  cartCode: string,
  racks: readonly string[],
): Promise<LoadDetail> {
  const run = options.runs.find((one) => one.name === plan.name);
  const on = options.sterilizers.find((one) => one.sterilizer.code === plan.sterilizer);
  const cart = on?.carts.find((one) => one.code === cartCode);
  const lower = cart?.shelves.find((shelf) => shelf.level === 1);
  if (!run || !cart || !lower) throw new Error(`The demonstration cannot open ${plan.name}.`);
  const opened = await technician
    .post('/api/loads')
    .send({
      requestId: anId(),
      sterilizerId: run.sterilizerId,
      programId: run.programId,
      cartId: cart.id,
      runId: run.id,
    })
    .expect(201);
  const { loadId } = opened.body as { loadId: string };
  const scan = async (raw: string, place: object | null) => {
    const reply = await technician
      .post(`/api/loads/${loadId}/scans`)
      .send({ requestId: anId(), raw, entry: 'wedge', place })
      .expect(200);
    return reply.body as ScanResponse;
  };
  for (const placeCode of racks) {
    expect(await scan(placeCode, { kind: 'shelf', shelfId: lower.id })).toMatchObject({ answer: 'place-set' });
  }
  const detail = (await technician.get(`/api/loads/${loadId}`).expect(200)).body as LoadDetail;
  for (const one of detail.view.packages) {
    expect(await scan(one.code, null)).toMatchObject({ answer: 'taken', look: null });
  }
  return (await technician.get(`/api/loads/${loadId}`).expect(200)).body as LoadDetail;
}

/** Codes of holders of a kind that are in good order. */
async function holders(kindCode: string, count: number): Promise<string[]> {
  const rows = await app
    .db('holders')
    .join('holder_kinds', 'holder_kinds.id', 'holders.holder_kind_id')
    .where({ 'holders.facility_id': hospitalId, 'holder_kinds.code': kindCode, 'holders.condition': 'good' })
    .orderBy('holders.name')
    .limit(count)
    .pluck<string[]>('holders.place_code');
  expect(rows).toHaveLength(count);
  return rows;
}

describe('the packages of the demonstration', () => {
  it('wait in three runs, dated around its today', async () => {
    for (const plan of Object.values(demonstrationRuns)) {
      const run = options.runs.find((one) => one.name === plan.name);
      const reply = await technician.get(`/api/runs/${run?.id ?? ''}`).expect(200);
      const { packages, run: shown } = reply.body as RunDetail;
      const wanted = plan.contents.flatMap(([code, quantity]) => Array.from({ length: quantity }, () => code)).sort();
      expect(packages.map((one) => one.item.code).sort()).toEqual(wanted);
      expect(shown).toMatchObject({ sterilizer: { code: plan.sterilizer }, program: { code: plan.program } });
      const waits = Date.parse(shown.wantedAt ?? '') - app.clock.now().getTime();
      expect(waits).toBeGreaterThan(0);
      expect(waits).toBeLessThan(5 * 3_600_000);
      for (const one of packages) expect(Date.parse(one.packedAt)).toBeLessThan(app.clock.now().getTime());
    }
  });

  it('include one of each that a scanner refuses', async () => {
    const list = async (query: Record<string, string>) =>
      ((await technician.get('/api/packages').query(query).expect(200)).body as PackageListResponse).packages;
    const packed = await list({ state: 'packed' });
    expect(packed.filter((one) => one.heldReason !== null)).toHaveLength(1);
    expect(packed.filter((one) => one.isExpired)).toHaveLength(1);
    expect(packed.filter((one) => one.heldReason === null && !one.isExpired).length).toBeGreaterThan(5);
    expect(await list({ state: 'recalled' })).toHaveLength(1);
    expect(await list({ state: 'sterile' })).toHaveLength(1);
    const stranger = await signIn('Winifred Lazarou');
    const theirs = (await stranger.get('/api/packages').expect(200)).body as PackageListResponse;
    expect(theirs.total).toBeGreaterThan(0);
    const [one] = theirs.packages;
    expect((await technician.get(`/api/packages/${one?.code ?? ''}`)).status).toBe(404);
  });

  it('each have a label and a history', async () => {
    const all = await app.db('packages').select('id').whereIn('facility_id', [hospitalId]);
    const labelled = await app
      .db('label_prints')
      .where({ copy: 1 })
      .countDistinct<{ count: number }[]>('package_id as count');
    expect(labelled[0]?.count).toBeGreaterThanOrEqual(all.length);
    const [{ code } = { code: '' }] = ((await technician.get('/api/packages').expect(200)).body as PackageListResponse)
      .packages;
    const detail = await technician.get(`/api/packages/${code}`).expect(200);
    expect((detail.body as { history: unknown[] }).history.length).toBeGreaterThanOrEqual(2);
  });

  it('make three loads side by side in which nothing is left but to count', async () => {
    const loads = [
      await build(demonstrationRuns.mixed, 'C1', await holders('RS', 2)),
      await build(demonstrationRuns.containers, 'C2', []),
      await build(demonstrationRuns.gravity, 'C3', [...(await holders('RM', 1)), ...(await holders('RL', 1))]),
    ];
    expect(loads.map((load) => load.summary.scanned)).toEqual([30, 6, 6]);
    const left = loads.map((load) =>
      evaluateLoad(load.view, load.policy)
        .filter((finding) => finding.severity !== 'advice' && finding.ruleId !== 'count-missing')
        .map((finding) => finding.ruleId),
    );
    // The air-removal test of Sterilizer 3 is left to the visitor to record.
    expect(left).toEqual([[], [], ['air-removal-test']]);
    expect(loads.map((load) => load.summary.implants)).toEqual([0, 1, 0]);
  }, 60_000);
});
