import { createHash } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { mm } from '../../../src/domain/units/quantity';
import { anId, openTestApp } from '../../support/test-app';
import { packageRow, putInState } from '../packages/packing-room';
import {
  countShelf,
  detailOf,
  edit,
  giveUp,
  loadSnapshot,
  openLoad,
  openLoadingBay,
  problemOf,
  scan,
  stagedRun,
  type LoadingBay,
} from './loading-bay';

const app = openTestApp();
let bay: LoadingBay;

beforeAll(async () => {
  bay = await openLoadingBay(app);
});

describe('closing a load', () => {
  async function readyLoad() {
    const technician = await app.as('technician');
    const { runId, packages } = await stagedRun(app, bay.pouch.id, 2);
    const loadId = await openLoad(technician, bay, { runId });
    await scan(technician, loadId, bay.racks[0].placeCode);
    const place = { kind: 'holder', holderId: bay.racks[0].id } as const;
    for (const one of packages) await scan(technician, loadId, one.code, place);
    return { technician, loadId, packages, place };
  }

  const close = async (loadId: string) =>
    (await app.as('technician')).post(`/api/loads/${loadId}/close`).send({ requestId: anId() });

  async function shelfOfRack(loadId: string): Promise<{ full: string; empty: string }> {
    const { view } = await detailOf(await app.as('technician'), loadId);
    const full = view.holders[0]?.shelfId ?? '';
    return { full, empty: full === bay.lower.id ? bay.upper.id : bay.lower.id };
  }

  it('is refused at the server until everything is scanned and counted, naming what is missing, and told in the history', async () => {
    const { technician, loadId, packages } = await readyLoad();
    const [one] = packages;
    const uncounted = await close(loadId);
    expect(uncounted.status).toBe(422);
    expect(problemOf(uncounted.body)).toMatchObject({ code: 'load.close-refused' });
    expect(
      problemOf(uncounted.body)
        .fields?.map((field) => field.detail)
        .join(),
    ).toMatch(/Lower shelf.*Upper shelf/);
    expect((await detailOf(technician, loadId)).summary.state).toBe('building');

    const { full, empty } = await shelfOfRack(loadId);
    await countShelf(technician, loadId, empty, 0);
    await countShelf(technician, loadId, full, 3);
    const differs = await close(loadId);
    expect(problemOf(differs.body).fields?.map((field) => field.detail)).toEqual([
      expect.stringMatching(/counted 3, scanned 2/),
    ]);

    await countShelf(technician, loadId, full, 2);
    await edit(technician, loadId, [
      {
        edit: 'place',
        packageId: one?.id ?? '',
        placement: { at: 'shelf', shelfId: full, xMm: mm(300), yMm: mm(500), turn: 0, pose: 'flat', paper: 'down' },
      },
    ]);
    const flat = await close(loadId);
    expect(flat.status).toBe(422);
    const history = await technician.get(`/api/loads/${loadId}/history`);
    expect((history.body as { events: { kind: string }[] }).events[0]?.kind).toBe('load.close-refused');
    await giveUp(app, loadId);
  });

  it('tells a refusal once in the history, however often the same request is repeated, also at one moment', async () => {
    const { technician, loadId } = await readyLoad();
    const requestId = anId();
    const ask = () => technician.post(`/api/loads/${loadId}/close`).send({ requestId });
    const replies = [await ask(), ...(await Promise.all([ask(), ask(), ask()]))];
    expect(replies.map((reply) => problemOf(reply.body).code)).toEqual(Array(4).fill('load.close-refused'));
    const told = () => app.db('audit_events').where({ load_id: loadId, kind: 'load.close-refused' });
    expect(await told()).toHaveLength(1);
    await technician.post(`/api/loads/${loadId}/close`).send({ requestId: anId() });
    expect(await told()).toHaveLength(2);
    await giveUp(app, loadId);
  });

  it('keeps who, when, rule set, findings, counts and a digest that anybody can compute again', async () => {
    const { technician, loadId, packages } = await readyLoad();
    const { full, empty } = await shelfOfRack(loadId);
    await countShelf(technician, loadId, empty, 0);
    await countShelf(technician, loadId, full, 2);
    const reply = await close(loadId);
    expect(reply.status).toBe(200);
    const closing = reply.body as { digest: string; ruleSet: string };
    const row = await app.db('loads').where({ id: loadId }).first<Record<string, unknown>>();
    expect(row).toMatchObject({
      state: 'closed',
      rule_set: closing.ruleSet,
      closed_by: app.person('technician').id,
      contents_digest: closing.digest,
    });
    // RFC 8785 orders the members of an object by name; done here apart from the code under test.
    const sorted = (value: unknown): unknown =>
      Array.isArray(value)
        ? value.map(sorted)
        : typeof value === 'object' && value !== null
          ? Object.fromEntries(
              Object.entries(value)
                .sort(([a], [b]) => (a < b ? -1 : 1))
                .map(([key, inner]) => [key, sorted(inner)]),
            )
          : value;
    const again = createHash('sha256')
      .update(JSON.stringify(sorted(row.contents)))
      .digest('hex');
    expect(again).toBe(closing.digest);
    expect(row.verdict).toMatchObject({ counts: expect.any(Array) as unknown, policyNumber: 1 });
    for (const one of packages) expect(await packageRow(app, one.id)).toMatchObject({ state: 'in-load' });

    const before = await loadSnapshot(app);
    for (const [path, body] of [
      ['scans', { raw: packages[0]?.code, entry: 'wedge', place: null }],
      ['edits', { edits: [{ edit: 'take-off', packageId: packages[0]?.id }] }],
      ['undo', { undoing: 'Scan' }],
      ['counts', { shelfId: full, counted: 9 }],
      ['close', {}],
      ['abandon', { reason: 'Changed my mind' }],
    ] as const) {
      const late = await technician.post(`/api/loads/${loadId}/${path}`).send({ requestId: anId(), ...body });
      expect({ path, status: late.status, code: problemOf(late.body).code }).toEqual({
        path,
        status: 422,
        code: 'load.not-in-that-state',
      });
    }
    expect(await loadSnapshot(app)).toBe(before);
  });

  it('happens once when two press at once', async () => {
    const { technician, loadId } = await readyLoad();
    const { full, empty } = await shelfOfRack(loadId);
    await countShelf(technician, loadId, empty, 0);
    await countShelf(technician, loadId, full, 2);
    const lead = await app.as('lead');
    const replies = await Promise.all([
      technician.post(`/api/loads/${loadId}/close`).send({ requestId: anId() }),
      lead.post(`/api/loads/${loadId}/close`).send({ requestId: anId() }),
    ]);
    expect(replies.map((reply) => reply.status).sort()).toEqual([200, 422]);
    expect(await app.db('audit_events').where({ load_id: loadId, kind: 'load.closed' })).toHaveLength(1);
  });

  it('is refused while a package on it has been called back since it was scanned', async () => {
    const { technician, loadId, packages } = await readyLoad();
    const { full, empty } = await shelfOfRack(loadId);
    await countShelf(technician, loadId, empty, 0);
    await countShelf(technician, loadId, full, 2);
    await putInState(app, packages[0]?.id ?? '', { state: 'recalled' });
    const reply = await close(loadId);
    expect(reply.status).toBe(422);
    await giveUp(app, loadId);
    // Giving a load up never makes a package loadable again that was called back.
    expect(await packageRow(app, packages[0]?.id ?? '')).toMatchObject({ state: 'recalled' });
  });
});
