import { beforeAll, describe, expect, it } from 'vitest';
import type { Role } from '../../../src/domain/access/permissions';
import { roles } from '../../../src/domain/access/permissions';
import { routes } from '../../../server/app';
import { anId, openTestApp } from '../../support/test-app';
import { anItem, itemsOnFile } from '../items/items-support';
import {
  addPiece,
  aCart,
  aHolder,
  aHolderKind,
  answerOf,
  aProgram,
  aSterilizer,
  equipmentOnFile,
} from './equipment-support';

const app = openTestApp();
const ids = new Map<string, string>();

beforeAll(async () => {
  const supervisor = await app.as('supervisor');
  const item = await answerOf(
    supervisor
      .post('/api/items')
      .send({ ...anItem('W-01'), requestId: anId() })
      .expect(201),
  );
  ids.set(':itemId', item.body.id);
  ids.set(':programId', (await addPiece(app, '/api/programs', aProgram('W4-30'))).id);
  ids.set(':sterilizerId', (await addPiece(app, '/api/sterilizers', aSterilizer('1'))).id);
  ids.set(':cartId', (await addPiece(app, '/api/carts', aCart('C1'))).id);
  ids.set(':holderKindId', (await addPiece(app, '/api/holder-kinds', aHolderKind('RS'))).id);
  ids.set(':holderId', (await addPiece(app, '/api/holders', aHolder('RS-1', 'RS'))).id);
});

// Who may do what, written down here apart from the table the server asks.
const seeItems: Role[] = [
  'technician',
  'lead',
  'supervisor',
  'infection-prevention',
  'operating-room',
  'surveyor',
  'administrator',
];
const editItems: Role[] = ['lead', 'supervisor', 'administrator'];
const seeEquipment: Role[] = [
  'technician',
  'lead',
  'supervisor',
  'infection-prevention',
  'engineer',
  'surveyor',
  'administrator',
];
const editEquipment: Role[] = ['supervisor', 'engineer', 'administrator'];
const recordTests: Role[] = ['technician', 'lead', 'supervisor', 'engineer'];

const own = /^\/api\/(?:items|programs|sterilizers|carts|holder-kinds|holders|air-removal-tests|place-labels)(?:\/|$)/;
const ownRoutes = routes.filter((route) => own.test(route.path));

function allowed({ path, method }: (typeof ownRoutes)[number]): Role[] {
  if (path.startsWith('/api/items')) return method === 'get' ? seeItems : editItems;
  if (path.startsWith('/api/air-removal-tests') && method === 'post') return recordTests;
  return method === 'get' ? seeEquipment : editEquipment;
}

function addressOf(path: string): string {
  if (path === '/api/place-labels') return `${path}?cartId=${ids.get(':cartId') ?? ''}`;
  return path.replace(/:[A-Za-z]+/, (parameter) => ids.get(parameter) ?? parameter);
}

/** A request that would be carried out for somebody who may. */
const bodies: Readonly<Record<string, () => object>> = {
  'post /api/items': () => anItem('W-02'),
  'patch /api/items/:itemId': () => ({ version: 1, name: 'Changed' }),
  'post /api/programs': () => aProgram('NEW'),
  'patch /api/programs/:programId': () => ({ version: 1, name: 'Changed' }),
  'post /api/sterilizers': () => aSterilizer('7'),
  'patch /api/sterilizers/:sterilizerId': () => ({ version: 1, name: 'Changed' }),
  'post /api/carts': () => aCart('C7'),
  'patch /api/carts/:cartId': () => ({ version: 1, name: 'Changed' }),
  'post /api/holder-kinds': () => aHolderKind('NEW'),
  'patch /api/holder-kinds/:holderKindId': () => ({ version: 1, name: 'Changed' }),
  'post /api/holders': () => aHolder('RS-2', 'RS'),
  'patch /api/holders/:holderId': () => ({ version: 1, condition: 'missing' }),
  'post /api/air-removal-tests': () => ({
    sterilizerId: ids.get(':sterilizerId'),
    testedAt: '2026-03-03T11:40:00.000Z',
    result: 'passed',
    packLot: 'AR-1',
    packExpiresOn: '2027-06-30',
    isBeforeFirstLoad: true,
  }),
};

async function everythingOnFile(): Promise<unknown> {
  return { items: await itemsOnFile(app), equipment: await equipmentOnFile(app) };
}

type Agent = ReturnType<typeof app.anyone>;

function send(agent: Agent, { method, path, upload }: (typeof ownRoutes)[number]) {
  const sent = agent[method](addressOf(path));
  if (method === 'get') return answerOf(sent);
  if (upload) {
    return answerOf(
      sent
        .field(path.endsWith('preview') ? {} : { requestId: anId(), mode: 'good-rows', digest: '0'.repeat(64) })
        .attach('file', Buffer.from('code\nX'), 'file.csv'),
    );
  }
  return answerOf(sent.send({ ...bodies[`${method} ${path}`]?.(), requestId: anId() }));
}

describe('routes of items and equipment', () => {
  it('are all here, each with a request that makes sense', () => {
    expect(ownRoutes).toHaveLength(51);
    const writes = ownRoutes.filter((route) => route.method !== 'get' && !route.upload);
    expect(writes.map((route) => `${route.method} ${route.path}`).sort()).toEqual(Object.keys(bodies).sort());
  });

  it.each(ownRoutes.map((route) => [`${route.method} ${route.path}`, route] as const))(
    '%s refuses who may not, and changes nothing',
    async (_name, route) => {
      const before = await everythingOnFile();
      const stranger = await send(app.anyone(), route);
      expect([stranger.status, stranger.body.code]).toEqual([401, 'session.none']);
      for (const role of roles.filter((one) => !allowed(route).includes(one))) {
        const { status, body } = await send(await app.as(role), route);
        expect([role, status, body.code]).toEqual([role, 403, 'access.not-permitted']);
      }
      expect(await everythingOnFile()).toEqual(before);
    },
  );

  it.each(
    ownRoutes
      .filter((route) => route.method !== 'get')
      .map((route) => [`${route.method} ${route.path}`, route] as const),
  )('%s does not take orders from a foreign page', async (_name, route) => {
    const before = await everythingOnFile();
    const supervisor = await app.as('supervisor');
    const sent = supervisor[route.method](addressOf(route.path)).set('X-Requested-With', 'somebody else');
    const { status, body } = await answerOf(
      sent.send({ ...bodies[`${route.method} ${route.path}`]?.(), requestId: anId() }),
    );
    expect([status, body.code]).toEqual([403, 'request.foreign']);
    expect(await everythingOnFile()).toEqual(before);
  });

  it('let those read who may', async () => {
    for (const route of ownRoutes.filter((one) => one.method === 'get')) {
      for (const role of allowed(route)) {
        const { status } = await send(await app.as(role), route);
        expect([route.path, role, status]).toEqual([route.path, role, 200]);
      }
    }
  });

  it('let those write who may', async () => {
    for (const role of editItems) {
      const agent = await app.as(role);
      await agent
        .post('/api/items')
        .send({ ...anItem('W-03', { code: `I-${role}`, deviceIdentifier: null }), requestId: anId() })
        .expect(201);
    }
    for (const role of editEquipment) {
      const agent = await app.as(role);
      await agent
        .post('/api/programs')
        .send({ ...aProgram(`P-${role}`), requestId: anId() })
        .expect(201);
    }
    for (const role of recordTests) {
      const agent = await app.as(role);
      await agent
        .post('/api/air-removal-tests')
        .send({ ...bodies['post /api/air-removal-tests']?.(), requestId: anId() })
        .expect(201);
    }
  });
});
