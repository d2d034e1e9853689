import { beforeAll, describe, expect, it } from 'vitest';
import { mm } from '../../../src/domain/units/quantity';
import { anId, openTestApp } from '../../support/test-app';
import { packageRow, packOne } from '../packages/packing-room';
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
    await giveUp(app, loadId);
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
    await giveUp(app, first);
    await giveUp(app, second);
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
    await giveUp(app, loadId);
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
    await giveUp(app, loadId);
  });

  it('tells each act in words in the history, one of several as the first and how many more', async () => {
    const technician = await app.as('technician');
    const { runId, packages } = await stagedRun(app, bay.pouch.id, 1);
    const [first] = packages;
    const loadId = await openLoad(technician, bay, { runId });
    await scan(technician, loadId, bay.racks[0].placeCode);
    await scan(technician, loadId, first?.code ?? '', { kind: 'holder', holderId: bay.racks[0].id });
    const packageId = first?.id ?? '';
    await edit(technician, loadId, [{ edit: 'turn-paper', packageId, paper: 'right' }]);
    await edit(technician, loadId, [
      { edit: 'place-holder', holderId: bay.racks[1].id, shelfId: bay.upper.id, xMm: mm(20), yMm: mm(20), turn: 0 },
      { edit: 'turn-paper', packageId, paper: 'left' },
      { edit: 'take-off', packageId },
    ]);
    const history = await technician.get(`/api/loads/${loadId}/history`).expect(200);
    const { events } = history.body as { events: { sentence: string; who: string }[] };
    expect(events.map(({ sentence }) => sentence)).toEqual([
      'Put Holder RS-2: Upper shelf, and 2 more',
      `${first?.code ?? ''}: Turned Mayo scissors curved so that paper is right`,
      `${first?.code ?? ''} scanned`,
      'RS-1 put on the cart',
      'Opened, 1 package listed',
    ]);
    expect(new Set(events.map(({ who }) => who))).toEqual(new Set([app.person('technician').displayName]));
    await giveUp(app, loadId);
  });

  it('voids the count of a shelf when its contents change, and of no other', async () => {
    const technician = await app.as('technician');
    const loadId = await openLoad(technician, bay);
    await countShelf(technician, loadId, bay.lower.id, 0);
    await countShelf(technician, loadId, bay.upper.id, 0);
    const box = await packOne(app, bay.container.id);
    const reply = await scan(technician, loadId, box.code, { kind: 'shelf', shelfId: bay.lower.id });
    expect(reply.change?.counts.map((count) => count.shelfId)).toEqual([bay.upper.id]);
    await giveUp(app, loadId);
  });
});
