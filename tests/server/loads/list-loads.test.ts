import { beforeAll, describe, expect, it } from 'vitest';
import type { LoadSummary } from '../../../src/contract/loads';
import { addItem } from '../packages/packing-room';
import { anId, openTestApp } from '../../support/test-app';
import { giveUp, openLoad, openLoadingBay, problemOf, scan, stagedRun, type LoadingBay } from './loading-bay';

const app = openTestApp();
let bay: LoadingBay;
/** Oldest first. The second and third were opened at the same moment. */
const loadIds: string[] = [];

beforeAll(async () => {
  bay = await openLoadingBay(app);
  await openLoadingBay(app, 'B');
  const technician = await app.as('technician');
  for (let load = 0; load < 5; load += 1) {
    const loadId = await openLoad(technician, bay);
    await giveUp(app, loadId);
    loadIds.push(loadId);
    if (load !== 1) app.clock.advance({ seconds: 10 });
  }
});

async function list(query: string, facility: 'A' | 'B' = 'A'): Promise<{ loads: LoadSummary[]; hasOlder: boolean }> {
  const reply = await (await app.as('technician', facility)).get(`/api/loads${query}`).expect(200);
  return reply.body as { loads: LoadSummary[]; hasOlder: boolean };
}

describe('the list of loads', () => {
  it('shows the newest first, a page at a time, each load once', async () => {
    const seen: string[] = [];
    let page = await list('?state=all&limit=2');
    for (let turn = 0; turn < 5; turn += 1) {
      seen.push(...page.loads.map(({ id }) => id));
      if (!page.hasOlder) break;
      expect(page.loads).toHaveLength(2);
      page = await list(`?state=all&limit=2&olderThan=${seen.at(-1) ?? ''}`);
    }
    expect(page.loads).toHaveLength(1);
    // What was opened at one moment comes in the order of the ids, which sort by the time they were made.
    expect(seen).toEqual([...loadIds].reverse());
  });

  it('counts what is listed, scanned and an implant for each load, and for one of nothing', async () => {
    const technician = await app.as('technician');
    const implant = await addItem(app, { name: 'Plate set', is_implant: true });
    const { runId, packages } = await stagedRun(app, bay.pouch.id, 3);
    const { packages: implants } = await stagedRun(app, implant.id, 1);
    const loadId = await openLoad(technician, bay, { runId });
    await scan(technician, loadId, packages[0]?.code ?? '');
    await scan(technician, loadId, implants[0]?.code ?? '');
    const other = await openLoad(technician, bay, { cart: 1 });
    const { loads, hasOlder } = await list('');
    expect(hasOlder).toBe(false);
    expect(loads.map(({ id, listed, scanned, implants: of }) => ({ id, listed, scanned, of }))).toEqual(
      [
        { id: loadId, listed: 4, scanned: 2, of: 1 },
        { id: other, listed: 0, scanned: 0, of: 0 },
      ].sort((a, b) => (a.id < b.id ? 1 : -1)),
    );
    await giveUp(app, loadId);
    await giveUp(app, other);
  });

  it('shows nothing of another facility, and knows its loads not even as a page mark', async () => {
    expect(await list('?state=all', 'B')).toEqual({ loads: [], hasOlder: false });
    const stranger = await app.as('technician', 'B');
    const reply = await stranger.get(`/api/loads?state=all&olderThan=${loadIds[2] ?? ''}`).expect(404);
    expect(problemOf(reply.body).code).toBe('load.none');
  });

  it.each(['?limit=0', '?limit=201', '?limit=many', '?olderThan=yesterday', '?state=lost', '?page=2'])(
    'refuses %s',
    async (query) => {
      const reply = await (await app.as('technician')).get(`/api/loads${query}`);
      expect(reply.status).toBe(400);
      expect(reply.type).toBe('application/problem+json');
    },
  );

  it('says that there is no such load to go on from', async () => {
    await (await app.as('technician')).get(`/api/loads?olderThan=${anId()}`).expect(404);
  });
});
