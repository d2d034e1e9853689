import type { Role } from '../../../src/domain/access/permissions';
import type { PackRequest } from '../../../src/contract/packages';
import { anId, type FacilityLetter, type TestApp } from '../../support/test-app';

export type TestItem = { readonly id: string; readonly code: string };

export type ItemChanges = Partial<{
  code: string;
  name: string;
  kind: string;
  packaging: string;
  is_implant: boolean;
  is_retired: boolean;
  ifu_reference: string | null;
  expiry_rule: string;
  expiry_days: number | null;
  device_identifier: string | null;
  mass_kg: number;
  mass_limit_kg: number | null;
  cycle_needs: string;
  length_mm: number;
  width_mm: number;
  height_mm: number;
  metal_mass_kg: number;
  clearance_mm: number | null;
  pose: string;
  preferred_holder: string | null;
}>;

let counted = 0;

/** A catalogue item, a pouch unless told otherwise. */
export async function addItem(
  app: TestApp,
  changes: ItemChanges = {},
  facility: FacilityLetter = 'A',
): Promise<TestItem> {
  counted += 1;
  const row = {
    id: anId(),
    facility_id: app.facilities[facility],
    code: `P-${100 + counted}`,
    name: 'Mayo scissors curved',
    kind: 'pouch',
    packaging: 'paper-film-pouch',
    length_mm: 330,
    width_mm: 90,
    height_mm: 12,
    mass_kg: 0.14,
    pose: 'on-edge',
    cycle_needs: '[]',
    ifu_reference: 'IFU 4711',
    ...changes,
  };
  await app.db('items').insert(row);
  return { id: row.id, code: row.code };
}

export function packRequest(itemId: string, changes: Partial<PackRequest> = {}): PackRequest {
  return {
    requestId: anId(),
    itemId,
    quantity: 1,
    isContentsConfirmed: true,
    hasInternalIndicator: true,
    hasExternalIndicator: true,
    destination: '',
    ...changes,
  };
}

export type TestPackage = { readonly id: string; readonly code: string };

/** Packages made as people make them, over HTTP. */
export async function pack(
  app: TestApp,
  itemId: string,
  quantity = 1,
  facility: FacilityLetter = 'A',
): Promise<readonly TestPackage[]> {
  const agent = await app.as('technician', facility);
  const reply = await agent.post('/api/packages').send(packRequest(itemId, { quantity })).expect(201);
  return (reply.body as { packages: TestPackage[] }).packages;
}

/** One package, made as people make them. */
export async function packOne(app: TestApp, itemId: string, facility: FacilityLetter = 'A'): Promise<TestPackage> {
  const [one] = await pack(app, itemId, 1, facility);
  if (!one) throw new Error('nothing was packed');
  return one;
}

export async function addRun(app: TestApp, name = 'Mixed wraps', facility: FacilityLetter = 'A'): Promise<string> {
  const agent = await app.as('technician', facility);
  const reply = await agent
    .post('/api/runs')
    .send({ requestId: anId(), name, sterilizerId: null, programId: null, wantedAt: null })
    .expect(201);
  return (reply.body as { runId: string }).runId;
}

export async function stage(app: TestApp, runId: string, packageIds: readonly string[]): Promise<void> {
  const agent = await app.as('technician');
  await agent.post(`/api/runs/${runId}/packages`).send({ requestId: anId(), packageIds }).expect(200);
}

/** What a load does to a package: puts it into a state that only later acts lead to. */
export async function putInState(app: TestApp, packageId: string, changes: Record<string, unknown>): Promise<void> {
  await app.db('packages').where({ id: packageId }).update(changes);
}

export async function packageRow(app: TestApp, packageId: string): Promise<Record<string, unknown>> {
  const row = await app.db('packages').where({ id: packageId }).first<Record<string, unknown> | undefined>();
  if (!row) throw new Error('that package is not there');
  return row;
}

/** Everything that a refused act must leave as it was. */
export async function snapshot(app: TestApp): Promise<string> {
  const tables = ['packages', 'runs', 'label_prints', 'audit_events'] as const;
  const rows = await Promise.all(tables.map((table) => app.db(table).orderBy('id').select()));
  return JSON.stringify(rows);
}

export const everyRole: readonly Role[] = [
  'technician',
  'lead',
  'supervisor',
  'infection-prevention',
  'operating-room',
  'engineer',
  'surveyor',
  'administrator',
];

/** Events of a kind about one subject, oldest first. */
export async function eventsAbout(app: TestApp, subjectId: string): Promise<{ kind: string; payload: unknown }[]> {
  return app
    .db('audit_events')
    .where({ subject_id: subjectId })
    .orderBy('id')
    .select<{ kind: string; payload: unknown }[]>('kind', 'payload');
}
