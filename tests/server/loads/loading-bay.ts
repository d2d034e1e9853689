import type { LoadChange, LoadDetail, ScanPlace, ScanResponse } from '../../../src/contract/loads';
import type { LoadEdit } from '../../../src/domain/load/finding';
import { defaultPolicy } from '../../../src/domain/load/policy';
import { formatPlaceCode } from '../../../src/domain/label/place-code';
import { anId, type FacilityLetter, type TestApp } from '../../support/test-app';
import { addItem, addRun, pack, stage, type TestItem, type TestPackage } from '../packages/packing-room';
import type TestAgent from 'supertest/lib/agent';

type Thing = { readonly id: string; readonly placeCode: string };

export type LoadingBay = {
  readonly sterilizerId: string;
  readonly programId: string;
  /** On the panel, and the sterilizer is not qualified for it. */
  readonly unqualifiedProgramId: string;
  readonly cartIds: readonly [string, string, string];
  /** Of the first cart. */
  readonly lower: Thing;
  readonly upper: Thing;
  readonly otherCartShelf: Thing;
  readonly racks: readonly [Thing, Thing];
  readonly pouch: TestItem;
  readonly container: TestItem;
};

let placeNumber = 100;

function placeCode(kind: 'holder' | 'shelf'): string {
  placeNumber += 1;
  return formatPlaceCode(kind, placeNumber);
}

const wrapped20 = JSON.stringify([
  { type: 'dynamic-air-removal', temperatureC: 132, leastExposureS: 240, greatestExposureS: 600, leastDryS: 1200 },
]);

/** A sterilizer with two carts, racks and a catalogue of two: put straight into the tables, since it is not what is tested. */
export async function openLoadingBay(app: TestApp, facility: FacilityLetter = 'A'): Promise<LoadingBay> {
  const { db } = app;
  const facilityId = app.facilities[facility];
  const now = app.clock.now();
  await db('policies').insert({
    id: anId(),
    facility_id: facilityId,
    number: 1,
    settings: JSON.stringify(defaultPolicy),
    reason: 'As delivered',
    effective_at: new Date(now.getTime() - 86_400_000),
    effective_on: '2026-03-02',
    created_at: now,
  });
  const program = (code: string) => ({
    id: anId(),
    facility_id: facilityId,
    code,
    name: code,
    cycle_type: 'dynamic-air-removal',
    temperature_c: 132,
    exposure_s: 240,
    dry_s: 1200,
  });
  const [fit, unfit] = [program('W4-20'), program('W3-16')];
  await db('programs').insert([fit, unfit]);
  const sterilizerId = anId();
  await db('sterilizers').insert({
    id: sterilizerId,
    facility_id: facilityId,
    code: 'ST-1',
    number: '1',
    name: 'Sterilizer 1',
    size_class: 'large',
    chamber_width_mm: 620,
    chamber_depth_mm: 1250,
    chamber_height_mm: 700,
    drain_x_mm: 280,
    drain_y_mm: 100,
    greatest_load_mass_kg: 100,
    service_state: 'in-service',
  });
  await db('sterilizer_programs').insert([
    { sterilizer_id: sterilizerId, program_id: fit.id, is_qualified: true },
    { sterilizer_id: sterilizerId, program_id: unfit.id, is_qualified: false },
  ]);
  const carts = ['C1', 'C2', 'C3'].map((code) => ({
    id: anId(),
    facility_id: facilityId,
    code,
    name: `Cart ${code}`,
    size_class: 'large',
  }));
  await db('carts').insert(carts);
  const shelf = (cart: number, level: number, clearHeight: number) => ({
    id: anId(),
    cart_id: carts[cart]?.id,
    level,
    name: level === 1 ? 'Lower shelf' : 'Upper shelf',
    place_code: placeCode('shelf'),
    width_mm: 560,
    depth_mm: 1150,
    clear_height_mm: clearHeight,
    surface: 'wire',
    greatest_mass_kg: 60,
  });
  const shelves = [0, 1, 2].flatMap((cart) => [shelf(cart, 1, 340), shelf(cart, 2, 270)]);
  await db('shelves').insert(shelves);
  const kind = {
    id: anId(),
    facility_id: facilityId,
    code: 'RS',
    name: 'Small upright pouch rack',
    form: 'rack',
    slots: 3,
    pitch_mm: 28,
    greatest_height_mm: 130,
    greatest_length_mm: 340,
    greatest_thickness_mm: 18,
    across_mm: 100,
    along_mm: 350,
    mass_kg: 0.9,
    owned: 2,
  };
  await db('holder_kinds').insert(kind);
  const racks = ['RS-1', 'RS-2'].map((name) => ({
    id: anId(),
    facility_id: facilityId,
    holder_kind_id: kind.id,
    name,
    place_code: placeCode('holder'),
  }));
  await db('holders').insert(racks);
  await db('air_removal_tests').insert({
    id: anId(),
    facility_id: facilityId,
    sterilizer_id: sterilizerId,
    tested_at: now,
    test_day: '2026-03-03',
    result: 'passed',
    pack_lot: 'AR-7',
    pack_expires_on: '2027-01-31',
    is_before_first_load: true,
    read_by: app.person('technician', facility).id,
    recorded_at: now,
  });
  const thing = (row: { id: string; place_code: string } | undefined): Thing => {
    if (!row) throw new Error('the loading bay is not complete');
    return { id: row.id, placeCode: row.place_code };
  };
  const [c1, c2, c3] = carts;
  if (!c1 || !c2 || !c3) throw new Error('the loading bay has no carts');
  const about = {
    length_mm: 330,
    width_mm: 90,
    height_mm: 12,
    preferred_holder: 'RS',
    clearance_mm: 10,
    cycle_needs: wrapped20,
    metal_mass_kg: 0.1,
  };
  const pouch = await addItem(app, { name: 'Mayo scissors curved', ...about }, facility);
  const container = await addItem(
    app,
    {
      name: 'General container set',
      kind: 'rigid-container',
      packaging: 'rigid-container',
      mass_kg: 8.9,
      pose: 'flat',
      length_mm: 580,
      width_mm: 280,
      height_mm: 150,
      clearance_mm: 25,
      cycle_needs: wrapped20,
      metal_mass_kg: 7,
    },
    facility,
  );
  return {
    sterilizerId,
    programId: fit.id,
    unqualifiedProgramId: unfit.id,
    cartIds: [c1.id, c2.id, c3.id],
    lower: thing(shelves[0]),
    upper: thing(shelves[1]),
    otherCartShelf: thing(shelves[2]),
    racks: [thing(racks[0]), thing(racks[1])],
    pouch,
    container,
  };
}

/** Packed and staged into a run of its own. */
export async function stagedRun(
  app: TestApp,
  itemId: string,
  quantity: number,
): Promise<{ runId: string; packages: readonly TestPackage[] }> {
  const packages = await pack(app, itemId, quantity);
  const runId = await addRun(app);
  await stage(
    app,
    runId,
    packages.map((one) => one.id),
  );
  return { runId, packages };
}

export async function openLoad(
  agent: TestAgent,
  bay: LoadingBay,
  { cart = 0, runId = null }: { cart?: 0 | 1 | 2; runId?: string | null } = {},
): Promise<string> {
  const reply = await agent
    .post('/api/loads')
    .send({
      requestId: anId(),
      sterilizerId: bay.sterilizerId,
      programId: bay.programId,
      cartId: bay.cartIds[cart],
      runId,
    })
    .expect(201);
  return (reply.body as { loadId: string }).loadId;
}

export async function scan(
  agent: TestAgent,
  loadId: string,
  raw: string,
  place: ScanPlace | null = null,
  requestId = anId(),
): Promise<ScanResponse> {
  const reply = await agent
    .post(`/api/loads/${loadId}/scans`)
    .send({ requestId, raw, entry: 'wedge', place })
    .expect(200);
  return reply.body as ScanResponse;
}

export async function edit(agent: TestAgent, loadId: string, edits: readonly LoadEdit[]): Promise<LoadChange> {
  const reply = await agent.post(`/api/loads/${loadId}/edits`).send({ requestId: anId(), edits }).expect(200);
  return (reply.body as { change: LoadChange }).change;
}

export async function countShelf(agent: TestAgent, loadId: string, shelfId: string, counted: number): Promise<void> {
  await agent.post(`/api/loads/${loadId}/counts`).send({ requestId: anId(), shelfId, counted }).expect(200);
}

export async function detailOf(agent: TestAgent, loadId: string): Promise<LoadDetail> {
  const reply = await agent.get(`/api/loads/${loadId}`).expect(200);
  return reply.body as LoadDetail;
}

/** Everything of loads that a refused act must leave as it was; the history of refused scans and closes aside. */
export async function loadSnapshot(app: TestApp): Promise<string> {
  const rows = await Promise.all([
    app.db('loads').orderBy('id').select(),
    app.db('load_packages').orderBy(['load_id', 'package_id']).select(),
    app.db('load_holders').orderBy(['load_id', 'holder_id']).select(),
    app.db('load_counts').orderBy(['load_id', 'shelf_id']).select(),
    app.db('load_acceptances').orderBy('id').select(),
    app.db('load_stickers').orderBy('id').select(),
    app.db('packages').orderBy('id').select('id', 'state', 'version'),
    app.db('runs').orderBy('id').select(),
  ]);
  return JSON.stringify(rows);
}

/** Loads are given up at the end of each test, so that the three carts are enough. */
export async function giveUp(app: TestApp, loadId: string): Promise<void> {
  const technician = await app.as('technician');
  await technician.post(`/api/loads/${loadId}/abandon`).send({ requestId: anId(), reason: 'End of the test' });
}

export function problemOf(body: unknown): { code: string; detail: string; fields?: { detail: string }[] } {
  return body as { code: string; detail: string; fields?: { detail: string }[] };
}
