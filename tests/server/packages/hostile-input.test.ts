import { beforeAll, describe, expect, it } from 'vitest';
import { anId, openTestApp } from '../../support/test-app';
import { addItem, addRun, packOne, packRequest, snapshot } from './packing-room';

const app = openTestApp();
let itemId: string;
let packageId: string;
let runId: string;

beforeAll(async () => {
  const item = await addItem(app);
  itemId = item.id;
  packageId = (await packOne(app, item.id)).id;
  runId = await addRun(app);
});

const nul = 'Room\u00004';
const long = 'x'.repeat(10_000);

type Body = Record<string, unknown>;

/** Writes with one thing wrong in each. */
function wrongBodies(): { path: string; body: unknown; status?: number }[] {
  const packing = () => packRequest(itemId) as Body;
  const without = (body: Body, name: string) =>
    Object.fromEntries(Object.entries(body).filter(([key]) => key !== name));
  const printing = (): Body => ({ requestId: anId(), packageIds: [packageId], layout: 'single' });
  const adding = (): Body => ({ requestId: anId(), name: 'Run', sterilizerId: null, programId: null, wantedAt: null });
  const staging = (): Body => ({ requestId: anId(), packageIds: [packageId] });
  return [
    { path: '/api/packages', body: [] },
    { path: '/api/packages', body: 'packing' },
    { path: '/api/packages', body: {} },
    ...Object.keys(packing()).map((name) => ({ path: '/api/packages', body: without(packing(), name) })),
    { path: '/api/packages', body: { ...packing(), facilityId: anId() } },
    { path: '/api/packages', body: { ...packing(), requestId: 'again' } },
    { path: '/api/packages', body: { ...packing(), itemId: "' or 1=1 --" } },
    ...[0, 51, -1, 1.5, '3', null, Number.MAX_SAFE_INTEGER].map((quantity) => ({
      path: '/api/packages',
      body: { ...packing(), quantity },
    })),
    { path: '/api/packages', body: { ...packing(), isContentsConfirmed: 'yes' } },
    { path: '/api/packages', body: { ...packing(), destination: nul } },
    { path: '/api/packages', body: { ...packing(), destination: long } },
    { path: '/api/packages/identify', body: {} },
    { path: '/api/packages/identify', body: { raw: 4 } },
    { path: '/api/packages/identify', body: { raw: 'x'.repeat(30_000) } },
    { path: '/api/packages/identify', body: { raw: 'P', more: true } },
    { path: '/api/packages/labels', body: { ...printing(), layout: 'roll' } },
    { path: '/api/packages/labels', body: { ...printing(), packageIds: [] } },
    { path: '/api/packages/labels', body: { ...printing(), packageIds: 'all' } },
    { path: '/api/packages/labels', body: { ...printing(), packageIds: Array.from({ length: 101 }, anId) } },
    { path: '/api/packages/labels', body: { ...printing(), packageIds: ['P-20431784-52'] } },
    { path: '/api/packages/labels', body: { ...printing(), reason: nul } },
    { path: '/api/packages/labels', body: { ...printing(), reason: long } },
    { path: '/api/packages/labels', body: { ...printing(), copies: 3 } },
    ...Object.keys(adding()).map((name) => ({ path: '/api/runs', body: without(adding(), name) })),
    { path: '/api/runs', body: { ...adding(), name: '   ' } },
    { path: '/api/runs', body: { ...adding(), name: nul } },
    { path: '/api/runs', body: { ...adding(), name: long } },
    { path: '/api/runs', body: { ...adding(), wantedAt: 'tomorrow' } },
    { path: '/api/runs', body: { ...adding(), wantedAt: '2026-03-03T18:00:00+01:00' } },
    { path: '/api/runs', body: { ...adding(), state: 'taken' } },
    { path: `/api/runs/${runId}/packages`, body: { ...staging(), packageIds: [] } },
    { path: `/api/runs/${runId}/packages`, body: { ...staging(), packageIds: Array.from({ length: 201 }, anId) } },
    { path: `/api/runs/${runId}/packages`, body: without(staging(), 'requestId') },
    { path: `/api/runs/${runId}/remove`, body: { ...staging(), runId } },
    { path: `/api/runs/${runId}/drop`, body: { requestId: anId(), sure: true } },
    { path: `/api/runs/${runId}/scan`, body: { requestId: anId(), raw: null } },
    { path: '/api/runs/not-an-id/scan', body: { requestId: anId(), raw: 'P' } },
    { path: `/api/runs/${runId}'%20or%20'1'='1/drop`, body: { requestId: anId() } },
  ];
}

const reads = [
  '/api/packages?state=lost',
  '/api/packages?page=0',
  '/api/packages?page=-1',
  '/api/packages?page=1e3',
  '/api/packages?page=99999999999',
  '/api/packages?itemId=1',
  '/api/packages?sort=code',
  '/api/packages?search=a&search=b',
  `/api/packages?search=${'x'.repeat(101)}`,
  '/api/packages?search=%00',
  `/api/packages/labels/${anId()}`,
  `/api/packages/labels/${anId()}?layout=roll`,
  '/api/packages/labels/all?layout=single',
  '/api/runs?state=lost',
  '/api/runs/first',
];

describe('input that nobody should send', () => {
  it('is answered with a plain sentence as problem details, and changes nothing', async () => {
    const technician = await app.as('technician');
    const before = await snapshot(app);
    for (const { path, body } of wrongBodies()) {
      const reply = await technician.post(path).set('content-type', 'application/json').send(JSON.stringify(body));
      const about = `${path} ${JSON.stringify(body).slice(0, 120)}`;
      expect(reply.status, about).toBe(400);
      expect(reply.headers['content-type'], about).toContain('application/problem+json');
      expect((reply.body as { detail: string }).detail, about).not.toMatch(/Error|at \/|undefined|stack|nvalid/);
    }
    expect(await snapshot(app)).toBe(before);
  });

  it.each(reads)('%s is answered in the same way', async (path) => {
    const technician = await app.as('technician');
    const reply = await technician.get(path);
    expect(reply.status).toBe(400);
    expect(reply.headers['content-type']).toContain('application/problem+json');
  });

  it.each([
    `/api/packages/${'P'.repeat(5_000)}`,
    '/api/packages/%00',
    '/api/packages/P-99999999-99',
    '/api/packages/..%2F..%2Fetc',
    `/api/packages/${anId()}`,
    `/api/runs/${anId()}`,
    `/api/packages/labels/${anId()}?layout=single`,
  ])('%s is simply not known', async (path) => {
    const technician = await app.as('technician');
    const reply = await technician.get(path);
    expect(reply.status).toBe(404);
    expect(reply.headers['content-type']).toContain('application/problem+json');
  });

  it('a broken percent sign is told, not stumbled over', async () => {
    const technician = await app.as('technician');
    const reply = await technician.get('/api/packages/%E0%A4%A');
    expect(reply.status).toBe(400);
    expect(reply.headers['content-type']).toContain('application/problem+json');
  });

  it('signs that mean something to the database are looked for as they stand', async () => {
    const technician = await app.as('technician');
    for (const search of ['%', '_', '\\', "'; drop table packages; --", '😀', 'ﬁ']) {
      const reply = await technician.get('/api/packages').query({ search });
      expect(reply.status, search).toBe(200);
      expect(reply.body, search).toMatchObject({ packages: [], total: 0 });
    }
  });
});
