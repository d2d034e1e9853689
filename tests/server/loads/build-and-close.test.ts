import { createHash } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { mm } from '../../../src/domain/units/quantity';
import { anId, openTestApp } from '../../support/test-app';
import { packageRow, packOne, putInState } from '../packages/packing-room';
import {
  countShelf,
  detailOf,
  edit,
  loadSnapshot,
  openLoad,
  openLoadingBay,
  scan,
  stagedRun,
  type LoadingBay,
} from './loading-bay';

const app = openTestApp();
let bay: LoadingBay;

beforeAll(async () => {
  bay = await openLoadingBay(app);
});

const problemOf = (body: unknown) => body as { code: string; detail: string; fields?: { detail: string }[] };

/** Loads are given up at the end of each test, so that the three carts are enough. */
async function giveUp(loadId: string): Promise<void> {
  await (
    await app.as('technician')
  )
    .post(`/api/loads/${loadId}/abandon`)
    .send({ requestId: anId(), reason: 'End of the test' });
}

describe('opening a load', () => {
  it('numbers it by sterilizer, day of the year and count of the day, and lists the run', async () => {
    const technician = await app.as('technician');
    const { runId, packages } = await stagedRun(app, bay.pouch.id, 3);
    const loadId = await openLoad(technician, bay, { runId });
    const detail = await detailOf(technician, loadId);
    // 3 March 2026 is day 62 of the year: 31 + 28 + 3.
    expect(detail.summary.number).toMatch(/^1-26062-\d\d$/);
    expect(detail.view.packages.map((entry) => entry.code).sort()).toEqual(packages.map((one) => one.code).sort());
    expect(detail.view.packages.every((entry) => !entry.isScanned && entry.state === 'staged')).toBe(true);
    await giveUp(loadId);
  });

  it('is refused on a program the sterilizer is not qualified for, by name', async () => {
    const before = await loadSnapshot(app);
    const reply = await (await app.as('technician')).post('/api/loads').send({
      requestId: anId(),
      sterilizerId: bay.sterilizerId,
      programId: bay.unqualifiedProgramId,
      cartId: bay.cartIds[0],
      runId: null,
    });
    expect(reply.status).toBe(422);
    expect(problemOf(reply.body)).toMatchObject({ code: 'load.program-not-qualified' });
    expect(problemOf(reply.body).detail).toContain('W3-16');
    expect(await loadSnapshot(app)).toBe(before);
  });

  it('is refused on a cart that carries another load, also when two ask at once', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    const ask = { sterilizerId: bay.sterilizerId, programId: bay.programId, cartId: bay.cartIds[0], runId: null };
    const replies = await Promise.all([
      technician.post('/api/loads').send({ requestId: anId(), ...ask }),
      lead.post('/api/loads').send({ requestId: anId(), ...ask }),
    ]);
    expect(replies.map((reply) => reply.status).sort()).toEqual([201, 409]);
    const won = replies.find((reply) => reply.status === 201)?.body as { loadId: string };
    await giveUp(won.loadId);
  });

  it('gives two loads opened at once on two carts two numbers', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    const loadIds = await Promise.all([openLoad(technician, bay, { cart: 0 }), openLoad(lead, bay, { cart: 1 })]);
    const numbers = await Promise.all(loadIds.map(async (id) => (await detailOf(technician, id)).summary.number));
    expect(new Set(numbers).size).toBe(2);
    for (const loadId of loadIds) await giveUp(loadId);
  });

  it('lets one of two take a run', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    const { runId } = await stagedRun(app, bay.pouch.id, 2);
    const ask = (cart: 0 | 1) => ({
      requestId: anId(),
      sterilizerId: bay.sterilizerId,
      programId: bay.programId,
      cartId: bay.cartIds[cart],
      runId,
    });
    const replies = await Promise.all([
      technician.post('/api/loads').send(ask(0)),
      lead.post('/api/loads').send(ask(1)),
    ]);
    expect(replies.map((reply) => reply.status).sort()).toEqual([201, 409]);
    const won = replies.find((reply) => reply.status === 201)?.body as { loadId: string };
    await giveUp(won.loadId);
  });

  it('knows nothing of the equipment of another facility', async () => {
    const reply = await (await app.as('technician', 'B')).post('/api/loads').send({
      requestId: anId(),
      sterilizerId: bay.sterilizerId,
      programId: bay.programId,
      cartId: bay.cartIds[0],
      runId: null,
    });
    expect(reply.status).toBe(404);
  });
});

describe('changing a load', () => {
  it('moves, turns, stands up and takes off, and takes each back', async () => {
    const technician = await app.as('technician');
    const loadId = await openLoad(technician, bay);
    await scan(technician, loadId, bay.racks[0].placeCode);
    const one = await packOne(app, bay.pouch.id);
    await scan(technician, loadId, one.code, { kind: 'holder', holderId: bay.racks[0].id });
    const scanned = await detailOf(technician, loadId);

    await edit(technician, loadId, [{ edit: 'turn-paper', packageId: one.id, paper: 'right' }]);
    await edit(technician, loadId, [
      {
        edit: 'place',
        packageId: one.id,
        placement: {
          at: 'shelf',
          shelfId: bay.upper.id,
          xMm: mm(100),
          yMm: mm(200),
          turn: 90,
          pose: 'flat',
          paper: 'down',
        },
      },
    ]);
    const moved = (await detailOf(technician, loadId)).view.packages.find((entry) => entry.packageId === one.id);
    expect(moved?.placement).toEqual({
      at: 'shelf',
      shelfId: bay.upper.id,
      xMm: 100,
      yMm: 200,
      turn: 90,
      pose: 'flat',
      paper: 'down',
    });

    await edit(technician, loadId, [{ edit: 'take-off', packageId: one.id }]);
    expect(await packageRow(app, one.id)).toMatchObject({ state: 'packed' });

    for (let act = 0; act < 3; act += 1) {
      const { undoable } = await detailOf(technician, loadId);
      await technician.post(`/api/loads/${loadId}/undo`).send({ requestId: anId(), undoing: undoable }).expect(200);
    }
    const back = await detailOf(technician, loadId);
    expect(back.view.packages).toEqual(scanned.view.packages);
    expect(back.undoable).toBe(`Scan of ${one.code}`);
    await giveUp(loadId);
  });

  it('does not take back what somebody has used elsewhere since', async () => {
    const technician = await app.as('technician');
    const [first, second] = [
      await openLoad(technician, bay, { cart: 0 }),
      await openLoad(technician, bay, { cart: 1 }),
    ];
    const one = await packOne(app, bay.pouch.id);
    await scan(technician, first, one.code);
    await edit(technician, first, [{ edit: 'take-off', packageId: one.id }]);
    expect(await scan(technician, second, one.code)).toMatchObject({ answer: 'taken' });
    const before = await loadSnapshot(app);
    const { undoable } = await detailOf(technician, first);
    const reply = await technician.post(`/api/loads/${first}/undo`).send({ requestId: anId(), undoing: undoable });
    expect(reply.status).toBe(409);
    expect(problemOf(reply.body).code).toBe('load.changed-since');
    expect(await loadSnapshot(app)).toBe(before);
    await giveUp(first);
    await giveUp(second);
  });

  it('does not take back an act that the person has not seen', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    const loadId = await openLoad(technician, bay);
    const one = await packOne(app, bay.pouch.id);
    const other = await packOne(app, bay.pouch.id);
    await scan(technician, loadId, one.code);
    const { undoable } = await detailOf(technician, loadId);
    await scan(lead, loadId, other.code);
    const before = await loadSnapshot(app);
    const reply = await technician.post(`/api/loads/${loadId}/undo`).send({ requestId: anId(), undoing: undoable });
    expect(reply.status).toBe(409);
    expect(problemOf(reply.body).detail).toContain(other.code);
    expect(await loadSnapshot(app)).toBe(before);
    await giveUp(loadId);
  });

  it('does all of several edits or none', async () => {
    const technician = await app.as('technician');
    const loadId = await openLoad(technician, bay);
    const one = await packOne(app, bay.pouch.id);
    await scan(technician, loadId, one.code);
    const before = await loadSnapshot(app);
    const reply = await technician.post(`/api/loads/${loadId}/edits`).send({
      requestId: anId(),
      edits: [
        { edit: 'take-off', packageId: one.id },
        { edit: 'take-off', packageId: anId() },
      ],
    });
    expect(reply.status).toBe(422);
    expect(problemOf(reply.body).detail).toMatch(/^[A-Z].*\.$/);
    expect(await loadSnapshot(app)).toBe(before);
    await giveUp(loadId);
  });

  it('voids the count of a shelf when its contents change, and of no other', async () => {
    const technician = await app.as('technician');
    const loadId = await openLoad(technician, bay);
    await countShelf(technician, loadId, bay.lower.id, 0);
    await countShelf(technician, loadId, bay.upper.id, 0);
    const box = await packOne(app, bay.container.id);
    const reply = await scan(technician, loadId, box.code, { kind: 'shelf', shelfId: bay.lower.id });
    expect(reply.change?.counts.map((count) => count.shelfId)).toEqual([bay.upper.id]);
    await giveUp(loadId);
  });
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
    await giveUp(loadId);
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
    await giveUp(loadId);
    // Giving a load up never makes a package loadable again that was called back.
    expect(await packageRow(app, packages[0]?.id ?? '')).toMatchObject({ state: 'recalled' });
  });
});

describe('accepting a finding', () => {
  /** One pouch turned against the others: the facing rule says so, and a lead may let it stay. */
  async function loadWithOddFacing() {
    const technician = await app.as('technician');
    const { runId, packages } = await stagedRun(app, bay.pouch.id, 3);
    const loadId = await openLoad(technician, bay, { runId });
    await scan(technician, loadId, bay.racks[0].placeCode);
    for (const one of packages) await scan(technician, loadId, one.code, { kind: 'holder', holderId: bay.racks[0].id });
    await edit(technician, loadId, [{ edit: 'turn-paper', packageId: packages[1]?.id ?? '', paper: 'right' }]);
    const { findings } = await judged(loadId);
    const finding = findings.find((one) => one.ruleId === 'facing');
    if (!finding) throw new Error('the facing rule found nothing');
    return { technician, loadId, packages, finding };
  }

  async function judged(loadId: string) {
    const { evaluateLoad } = await import('../../../src/domain/load/evaluate-load');
    const { loadDetailSchema } = await import('../../../src/contract/loads');
    const detail = loadDetailSchema.parse(await detailOf(await app.as('technician'), loadId));
    return { findings: evaluateLoad(detail.view, detail.policy) };
  }

  it('needs a lead and a reason, and holds for exactly that finding', async () => {
    const { technician, loadId, finding, packages } = await loadWithOddFacing();
    const ask = { requestId: anId(), findingKey: finding.key, reason: 'Its maker asks for it this way round' };
    expect((await technician.post(`/api/loads/${loadId}/acceptances`).send(ask)).status).toBe(403);
    const lead = await app.as('lead');
    expect(
      (await lead.post(`/api/loads/${loadId}/acceptances`).send({ ...ask, requestId: anId(), reason: '  ' })).status,
    ).toBe(400);
    await lead.post(`/api/loads/${loadId}/acceptances`).send(ask).expect(200);
    const twice = await lead.post(`/api/loads/${loadId}/acceptances`).send({ ...ask, requestId: anId() });
    expect(twice.status).toBe(409);

    // The same pouch somewhere else, still turned: another finding, which nobody has accepted.
    await edit(technician, loadId, [{ edit: 'turn-paper', packageId: packages[1]?.id ?? '', paper: 'left' }]);
    await edit(technician, loadId, [{ edit: 'turn-paper', packageId: packages[0]?.id ?? '', paper: 'right' }]);
    const { decideClose } = await import('../../../src/domain/load/decide-close');
    const { loadDetailSchema } = await import('../../../src/contract/loads');
    const detail = loadDetailSchema.parse(await detailOf(technician, loadId));
    expect(
      decideClose(detail.view, detail.policy).blocks.some(
        (block) => block.kind === 'finding' && block.finding.ruleId === 'facing',
      ),
    ).toBe(true);
    await giveUp(loadId);
  });

  it('is refused for a finding that holds the load, and for one that is not there', async () => {
    const technician = await app.as('technician');
    const loadId = await openLoad(technician, bay);
    const one = await packOne(app, bay.pouch.id);
    await scan(technician, loadId, one.code);
    await edit(technician, loadId, [
      {
        edit: 'place',
        packageId: one.id,
        placement: {
          at: 'shelf',
          shelfId: bay.lower.id,
          xMm: mm(100),
          yMm: mm(100),
          turn: 0,
          pose: 'flat',
          paper: 'down',
        },
      },
    ]);
    const stop = (await judged(loadId)).findings.find((finding) => finding.severity === 'stop');
    const lead = await app.as('lead');
    const reason = 'We have always done it so';
    const held = await lead
      .post(`/api/loads/${loadId}/acceptances`)
      .send({ requestId: anId(), findingKey: stop?.key, reason });
    expect(problemOf(held.body).code).toBe('load.finding-not-acceptable');
    const gone = await lead
      .post(`/api/loads/${loadId}/acceptances`)
      .send({ requestId: anId(), findingKey: 'facing:nothing', reason });
    expect(problemOf(gone.body).code).toBe('load.finding-gone');
    await giveUp(loadId);
  });
});

describe('load stickers', () => {
  it('are printed one live per package; a reprint needs a reason and voids the one before', async () => {
    const technician = await app.as('technician');
    const loadId = await openLoad(technician, bay);
    const one = await packOne(app, bay.container.id);
    await scan(technician, loadId, one.code);
    const print = (packageIds: string[] | null, reason: string | null) =>
      technician.post(`/api/loads/${loadId}/stickers`).send({ requestId: anId(), packageIds, reason });

    const first = await print(null, null);
    expect(first.status).toBe(200);
    const pdf = (first.body as { pdf: string }).pdf;
    const sheet = await technician
      .get(pdf)
      .expect(200)
      .expect('content-type', /application\/pdf/);
    expect((sheet.body as Buffer).subarray(0, 5).toString()).toBe('%PDF-');

    expect(problemOf((await print(null, null)).body).code).toBe('load.no-stickers-needed');
    expect(problemOf((await print([one.id], null)).body).code).toBe('load.sticker-reprint-needs-reason');
    expect((await print([one.id], 'The first one tore')).status).toBe(200);
    const rows = await app
      .db('load_stickers')
      .where({ package_id: one.id })
      .orderBy('copy')
      .select<{ copy: number; voided_at: Date | null }[]>();
    expect(rows.map((row) => [row.copy, row.voided_at !== null])).toEqual([
      [1, true],
      [2, false],
    ]);
    // The old sheet would bring a void sticker back.
    expect((await technician.get(pdf)).status).toBe(404);

    await edit(technician, loadId, [{ edit: 'take-off', packageId: one.id }]);
    expect(await app.db('load_stickers').where({ package_id: one.id }).whereNull('voided_at')).toHaveLength(0);
    await giveUp(loadId);
  });

  it('cannot be live twice for one package, whatever the code above the table does', async () => {
    const technician = await app.as('technician');
    const loadId = await openLoad(technician, bay);
    const one = await packOne(app, bay.container.id);
    await scan(technician, loadId, one.code);
    const row = (copy: number) => ({
      id: anId(),
      batch_id: anId(),
      load_id: loadId,
      package_id: one.id,
      copy,
      reason: copy > 1 ? 'Again' : null,
      printed_by: app.person('technician').id,
      printed_at: app.clock.now(),
    });
    await app.db('load_stickers').insert(row(1));
    await expect(app.db('load_stickers').insert(row(2))).rejects.toMatchObject({
      constraint: 'load_stickers_package_id_live_key',
    });
    await giveUp(loadId);
  });

  it('are not printed for what was not scanned', async () => {
    const technician = await app.as('technician');
    const { runId, packages } = await stagedRun(app, bay.pouch.id, 1);
    const loadId = await openLoad(technician, bay, { runId });
    const reply = await technician
      .post(`/api/loads/${loadId}/stickers`)
      .send({ requestId: anId(), packageIds: [packages[0]?.id], reason: null });
    expect(problemOf(reply.body).code).toBe('load.sticker-not-scanned');
    await giveUp(loadId);
  });
});

describe('giving a load up', () => {
  it('needs a reason, and lets its packages, run, holders and cart wait again', async () => {
    const technician = await app.as('technician');
    const { runId, packages } = await stagedRun(app, bay.pouch.id, 2);
    const loadId = await openLoad(technician, bay, { runId });
    await scan(technician, loadId, bay.racks[0].placeCode);
    await scan(technician, loadId, packages[0]?.code ?? '', { kind: 'holder', holderId: bay.racks[0].id });
    expect((await technician.post(`/api/loads/${loadId}/abandon`).send({ requestId: anId(), reason: '' })).status).toBe(
      400,
    );
    await technician
      .post(`/api/loads/${loadId}/abandon`)
      .send({ requestId: anId(), reason: 'Sterilizer needed for a test' })
      .expect(204);
    for (const one of packages) expect(await packageRow(app, one.id)).toMatchObject({ state: 'staged', run_id: runId });
    const again = await openLoad(technician, bay, { runId });
    expect((await detailOf(technician, again)).view.packages).toHaveLength(2);
    expect(await scan(technician, again, bay.racks[0].placeCode)).toMatchObject({ answer: 'place-set' });
    await giveUp(again);
  });
});
