import { beforeAll, describe, expect, it } from 'vitest';
import { routes } from '../../../server/app';
import { roles, type Role } from '../../../src/domain/access/permissions';
import { anId, openTestApp } from '../../support/test-app';
import { loadSnapshot, openLoad, openLoadingBay, type LoadingBay } from './loading-bay';

const app = openTestApp();
let bay: LoadingBay;
let loadId: string;

beforeAll(async () => {
  bay = await openLoadingBay(app);
  loadId = await openLoad(await app.as('technician'), bay);
});

const builders: readonly Role[] = ['technician', 'lead', 'supervisor'];
const leads: readonly Role[] = ['lead', 'supervisor'];
const onlookers: readonly Role[] = [
  ...builders,
  'infection-prevention',
  'operating-room',
  'engineer',
  'surveyor',
  'administrator',
];

/** Who may, written down apart from the matrix that the server asks. */
const acts: readonly {
  method: 'get' | 'post';
  path: (id: string) => string;
  body?: () => object;
  may: readonly Role[];
}[] = [
  { method: 'get', path: () => '/api/loads', may: onlookers },
  { method: 'get', path: () => '/api/loads/opening-options', may: builders },
  {
    method: 'post',
    path: () => '/api/loads',
    body: () => ({
      requestId: anId(),
      sterilizerId: bay.sterilizerId,
      programId: bay.programId,
      cartId: bay.cartIds[1],
      runId: null,
    }),
    may: builders,
  },
  { method: 'get', path: (id) => `/api/loads/${id}`, may: onlookers },
  { method: 'get', path: (id) => `/api/loads/${id}/history`, may: onlookers },
  { method: 'get', path: () => `/api/loads/${anId()}/judged-again`, may: onlookers },
  {
    method: 'post',
    path: (id) => `/api/loads/${id}/scans`,
    body: () => ({ requestId: anId(), raw: 'x', entry: 'keyed', place: null }),
    may: builders,
  },
  {
    method: 'post',
    path: (id) => `/api/loads/${id}/edits`,
    body: () => ({ requestId: anId(), edits: [{ edit: 'take-off', packageId: anId() }] }),
    may: builders,
  },
  {
    method: 'post',
    path: (id) => `/api/loads/${id}/undo`,
    body: () => ({ requestId: anId(), undoing: 'x' }),
    may: builders,
  },
  {
    method: 'post',
    path: (id) => `/api/loads/${id}/counts`,
    body: () => ({ requestId: anId(), shelfId: bay.lower.id, counted: 0 }),
    may: builders,
  },
  {
    method: 'post',
    path: (id) => `/api/loads/${id}/acceptances`,
    body: () => ({ requestId: anId(), findingKey: 'k', reason: 'because' }),
    may: leads,
  },
  { method: 'post', path: (id) => `/api/loads/${id}/close`, body: () => ({ requestId: anId() }), may: builders },
  {
    method: 'post',
    path: (id) => `/api/loads/${id}/abandon`,
    body: () => ({ requestId: anId(), reason: 'because' }),
    may: builders,
  },
  {
    method: 'post',
    path: (id) => `/api/loads/${id}/stickers`,
    body: () => ({ requestId: anId(), packageIds: null, reason: null }),
    may: builders,
  },
  { method: 'get', path: (id) => `/api/loads/${id}/stickers/${anId()}`, may: builders },
];

describe('who may do what with loads', () => {
  it('leaves no route of loads out of this table', () => {
    const own = routes.filter((route) => route.path.startsWith('/api/loads'));
    expect(acts).toHaveLength(own.length);
  });

  it.each(roles)('refuses the role %s exactly what it may not do, and nothing changes', async (role) => {
    const agent = await app.as(role);
    const before = await loadSnapshot(app);
    for (const act of acts.filter((one) => !one.may.includes(role))) {
      const path = act.path(loadId);
      const reply = await (act.method === 'get' ? agent.get(path) : agent.post(path).send(act.body?.() ?? {}));
      expect({ path, status: reply.status }).toEqual({ path, status: 403 });
      expect(reply.body).toMatchObject({ code: 'access.not-permitted' });
    }
    expect(await loadSnapshot(app)).toBe(before);
    for (const act of acts.filter((one) => one.may.includes(role) && one.method === 'get')) {
      const reply = await agent.get(act.path(loadId));
      expect([200, 404]).toContain(reply.status);
    }
  });

  it('answers nobody without a session, and no write without our own header', async () => {
    for (const act of acts) {
      const path = act.path(loadId);
      const reply = await (act.method === 'get'
        ? app.anyone().get(path)
        : app
            .anyone()
            .post(path)
            .send(act.body?.() ?? {}));
      expect({ path, status: reply.status }).toEqual({ path, status: 401 });
    }
    const technician = await app.as('technician');
    const foreign = await technician
      .post('/api/loads')
      .set('X-Requested-With', 'something else')
      .send(acts[2]?.body?.());
    expect(foreign.status).toBe(403);
    expect(foreign.body).toMatchObject({ code: 'request.foreign' });
  });
});
