import { beforeAll, describe, expect, it } from 'vitest';
import { anId, openTestApp } from '../../support/test-app';
import { addItem, packOne, packageRow, putInState, snapshot, type TestItem } from './packing-room';

const app = openTestApp();
let tray: TestItem;
let retired: TestItem;

beforeAll(async () => {
  tray = await addItem(app, { kind: 'wrapped-tray', packaging: 'wrap', name: 'Minor set' });
  retired = await addItem(app, { is_retired: true });
});

const header = 'code,item,contents_confirmed,internal_ci,external_ci,goes_to';
const fileOf = (...rows: string[]) => Buffer.from([header, ...rows, ''].join('\r\n'));

type Preview = {
  readonly digest: string;
  readonly added: number;
  readonly changed: number;
  readonly unchanged: number;
  readonly refused: number;
  readonly problems: readonly { line: number; column: string | null; sentence: string }[];
};

async function preview(file: Buffer): Promise<Preview> {
  const technician = await app.as('technician');
  const reply = await technician.post('/api/packages/import/preview').attach('file', file, 'packages.csv').expect(200);
  return reply.body as Preview;
}

async function take(file: Buffer, mode: 'all-or-nothing' | 'good-rows', requestId = anId()) {
  const { digest } = await preview(file);
  const technician = await app.as('technician');
  return technician
    .post('/api/packages/import')
    .field({ requestId, mode, digest })
    .attach('file', file, 'packages.csv');
}

describe('packages by file', () => {
  it('packs a package for each good line, with codes of their own, and says what is wrong with the others', async () => {
    const file = fileOf(
      `,${tray.code},yes,yes,yes,OR 4`,
      `,${tray.code.toLowerCase()},yes,yes,no,`,
      `,${tray.code},no,yes,yes,`,
      `,${tray.code},yes,no,yes,`,
      `,NO-SUCH,yes,yes,yes,`,
      `,${retired.code},yes,yes,yes,`,
      `P-00000001-00,${tray.code},yes,yes,yes,`,
    );
    await app.as('technician');
    const before = await snapshot(app);
    const seen = await preview(file);
    expect(seen).toMatchObject({ added: 2, changed: 0, refused: 5 });
    expect(seen.problems.map(({ line, column }) => [line, column])).toEqual([
      [4, 'contents_confirmed'],
      [5, 'internal_ci'],
      [6, 'item'],
      [7, 'item'],
      [8, 'code'],
    ]);
    for (const { sentence } of seen.problems) expect(sentence).toMatch(/^[A-Z].*\.$/);
    expect(await snapshot(app)).toBe(before);

    const whole = await take(file, 'all-or-nothing');
    expect(whole.status).toBe(422);
    expect(await snapshot(app)).toBe(before);

    expect((await take(file, 'good-rows')).body).toMatchObject({ added: 2, refused: 5 });
    const rows = await app
      .db('packages')
      .where({ item_id: tray.id })
      .orderBy('code')
      .select<{ code: string; state: string; destination: string; has_external_indicator: boolean }[]>();
    expect(rows).toHaveLength(2);
    expect(new Set(rows.map((row) => row.code)).size).toBe(2);
    for (const row of rows) expect(row).toMatchObject({ state: 'packed' });
    expect(rows.map((row) => [row.destination, row.has_external_indicator])).toEqual([
      ['OR 4', true],
      ['', false],
    ]);
  });

  it('goes out to a file that comes back as no change', async () => {
    await packOne(app, tray.id);
    const technician = await app.as('technician');
    const out = await technician
      .get('/api/packages/export')
      .expect(200)
      .expect('content-type', /text\/csv/);
    const seen = await preview(Buffer.from(out.text));
    expect(seen).toMatchObject({ added: 0, changed: 0, refused: 0 });
    expect(seen.unchanged).toBeGreaterThan(0);
  });

  it('changes where a waiting package goes, and nothing that was settled when it was sealed', async () => {
    const one = await packOne(app, tray.id);
    await take(fileOf(`${one.code},${tray.code},yes,yes,yes,Clinic`), 'all-or-nothing');
    expect(await packageRow(app, one.id)).toMatchObject({ destination: 'Clinic', version: 2 });
    const sealed = await preview(fileOf(`${one.code},${tray.code},yes,no,yes,Clinic`));
    expect(sealed.problems).toEqual([
      { line: 2, column: 'internal_ci', sentence: expect.stringContaining('sealed') as string },
    ]);
  });

  it('does not touch a package that is past packing', async () => {
    const one = await packOne(app, tray.id);
    await putInState(app, one.id, { state: 'sterile' });
    const seen = await preview(fileOf(`${one.code},${tray.code},yes,yes,yes,Elsewhere`));
    expect(seen.problems.map(({ column }) => column)).toEqual(['code']);
  });

  it('makes nothing twice when the request is repeated', async () => {
    const requestId = anId();
    const file = fileOf(`,${tray.code},yes,yes,yes,Once`);
    const { digest } = await preview(file);
    const technician = await app.as('technician');
    for (let turn = 0; turn < 2; turn += 1) {
      await technician
        .post('/api/packages/import')
        .field({ requestId, mode: 'all-or-nothing', digest })
        .attach('file', file, 'packages.csv')
        .expect(200);
    }
    expect(await app.db('packages').where({ destination: 'Once' })).toHaveLength(1);
  });
});
