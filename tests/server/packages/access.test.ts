import { beforeAll, describe, expect, it } from 'vitest';
import { isPermitted } from '../../../src/domain/access/role-matrix';
import { routes } from '../../../server/app';
import { anId, openTestApp } from '../../support/test-app';
import { addItem, addRun, everyRole, packOne, packRequest, snapshot } from './packing-room';

const app = openTestApp();

type Target = {
  readonly packageId: string;
  readonly packageCode: string;
  readonly itemId: string;
  readonly runId: string;
};
let target: Target;

beforeAll(async () => {
  const item = await addItem(app);
  const one = await packOne(app, item.id);
  target = { packageId: one.id, packageCode: one.code, itemId: item.id, runId: await addRun(app) };
});

const packageIds = () => ({ requestId: anId(), packageIds: [target.packageId] });

/** Every route of packages, runs and today, with a request that would be carried out for somebody who may. */
const calls = [
  { method: 'get', path: () => '/api/packages' },
  { method: 'get', path: () => '/api/packages/export' },
  { method: 'get', path: () => '/api/packages/import/template' },
  { method: 'post', path: () => '/api/packages/import/preview', body: () => ({}) },
  { method: 'post', path: () => '/api/packages/import', body: () => ({ requestId: anId(), mode: 'good-rows' }) },
  { method: 'get', path: () => `/api/packages/${target.packageCode}` },
  { method: 'post', path: () => '/api/packages', body: () => packRequest(target.itemId) },
  { method: 'post', path: () => '/api/packages/identify', body: () => ({ raw: target.packageCode }) },
  { method: 'post', path: () => '/api/packages/labels', body: () => ({ ...packageIds(), layout: 'single' }) },
  { method: 'get', path: () => `/api/packages/labels/${anId()}?layout=single` },
  { method: 'get', path: () => '/api/runs' },
  {
    method: 'post',
    path: () => '/api/runs',
    body: () => ({ requestId: anId(), name: 'Run', sterilizerId: null, programId: null, wantedAt: null }),
  },
  { method: 'get', path: () => `/api/runs/${target.runId}` },
  {
    method: 'patch',
    path: () => `/api/runs/${target.runId}`,
    body: () => ({ requestId: anId(), version: 1, name: 'Another name' }),
  },
  { method: 'post', path: () => `/api/runs/${target.runId}/packages`, body: packageIds },
  { method: 'post', path: () => `/api/runs/${target.runId}/remove`, body: packageIds },
  {
    method: 'post',
    path: () => `/api/runs/${target.runId}/scan`,
    body: () => ({ requestId: anId(), raw: target.packageCode }),
  },
  { method: 'post', path: () => `/api/runs/${target.runId}/drop`, body: () => ({ requestId: anId() }) },
  { method: 'get', path: () => '/api/today' },
] as const;

type Call = (typeof calls)[number];

function routeOf(call: Call) {
  const pathname = call.path().split('?')[0] ?? '';
  const isOfPath = (template: string) => new RegExp(`^${template.replace(/:[A-Za-z]+/g, '[^/]+')}$`).test(pathname);
  const found = routes.find((route) => route.method === call.method && isOfPath(route.path));
  if (!found) throw new Error(`there is no route for ${call.method} ${pathname}`);
  return found;
}

async function send(agent: Awaited<ReturnType<typeof app.as>>, call: Call) {
  return call.method === 'get' ? agent.get(call.path()) : agent[call.method](call.path()).send(call.body());
}

const own = /^\/api\/(?:packages|runs|today)/;

describe('who may do what with packages and runs', () => {
  it('leaves no route of packages, runs and today out of this table', () => {
    const listed = new Set(calls.map((call) => routeOf(call)));
    const all = routes.filter((route) => own.test(route.path));
    expect(all.filter((route) => !listed.has(route)).map((route) => `${route.method} ${route.path}`)).toEqual([]);
    expect(all).toHaveLength(calls.length);
  });

  // What each role may not do, written down apart from the matrix that the server asks.
  const maySee = new Set([
    'technician',
    'lead',
    'supervisor',
    'infection-prevention',
    'operating-room',
    'surveyor',
    'administrator',
  ]);
  const mayWork = new Set(['technician', 'lead', 'supervisor']);

  it.each(everyRole)('%s is refused everything the role does not carry, and nothing changes', async (role) => {
    const agent = await app.as(role);
    const before = await snapshot(app);
    for (const call of calls) {
      const route = routeOf(call);
      if (route.path === '/api/today') continue;
      const isWork = call.method !== 'get' || route.path.includes('/labels/');
      const isAllowed = isWork ? mayWork.has(role) : maySee.has(role);
      expect(isPermitted(role, route.access as 'package.view'), `${role} ${route.method} ${route.path}`).toBe(
        isAllowed,
      );
      if (isAllowed) continue;
      const reply = await send(agent, call);
      expect(reply.status, `${route.method} ${route.path}`).toBe(403);
      expect(reply.headers['content-type']).toContain('application/problem+json');
      expect(reply.body).toMatchObject({ code: 'access.not-permitted' });
    }
    expect(await snapshot(app)).toBe(before);
  });

  it('refuses everything to nobody', async () => {
    const before = await snapshot(app);
    for (const call of calls) {
      const reply = await send(app.anyone(), call);
      expect(reply.status, `${call.method} ${call.path()}`).toBe(401);
      expect(reply.body).toMatchObject({ code: 'session.none' });
    }
    expect(await snapshot(app)).toBe(before);
  });

  it('shows today to every role', async () => {
    for (const role of everyRole) {
      const agent = await app.as(role);
      await agent.get('/api/today').expect(200);
    }
  });

  it('does not know another facility’s package and run by their ids', async () => {
    const stranger = await app.as('supervisor', 'B');
    const before = await snapshot(app);
    for (const call of calls) {
      if (!call.path().includes(target.runId) && !call.path().includes(target.packageCode)) continue;
      const reply = await send(stranger, call);
      expect(reply.status, `${call.method} ${call.path()}`).toBe(404);
    }
    const listed = await stranger.get('/api/packages').expect(200);
    expect(listed.body).toMatchObject({ packages: [], total: 0 });
    expect((await stranger.get('/api/runs').expect(200)).body).toEqual({ runs: [] });
    expect(await snapshot(app)).toBe(before);
  });
});
