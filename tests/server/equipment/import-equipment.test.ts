import { beforeEach, describe, expect, it } from 'vitest';
import { anId, openTestApp } from '../../support/test-app';
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

async function preview(path: string, file: string) {
  const engineer = await app.as('engineer');
  return answerOf(engineer.post(`${path}/import/preview`).attach('file', Buffer.from(file), 'file.csv'));
}

async function take(path: string, file: string, mode = 'all-or-nothing') {
  const engineer = await app.as('engineer');
  const { body } = await preview(path, file);
  return answerOf(
    engineer
      .post(`${path}/import`)
      .field({ requestId: anId(), mode, digest: body.digest })
      .attach('file', Buffer.from(file), 'file.csv'),
  );
}

beforeEach(async () => {
  for (const table of [
    'sterilizer_programs',
    'sterilizers',
    'programs',
    'shelves',
    'carts',
    'holders',
    'holder_kinds',
  ]) {
    await app.db(table).delete();
  }
  await addPiece(app, '/api/programs', aProgram('W4-30'));
  await addPiece(app, '/api/programs', aProgram('W3-16', { isRetired: true }));
  await addPiece(app, '/api/sterilizers', aSterilizer('1', { qualifiedPrograms: ['W4-30'], otherPrograms: ['W3-16'] }));
  await addPiece(app, '/api/carts', aCart('C1', { note: 'Wheel squeaks' }));
  await addPiece(app, '/api/holder-kinds', aHolderKind('RS'));
  await addPiece(app, '/api/holders', aHolder('RS-1', 'RS', { condition: 'in-repair' }));
});

const registers = [
  ['/api/programs', 2],
  ['/api/sterilizers', 1],
  ['/api/carts', 2],
  ['/api/holder-kinds', 1],
  ['/api/holders', 1],
] as const;

describe.each(registers)('the file of %s', (path, rows) => {
  it('reads back to the same', async () => {
    const technician = await app.as('technician');
    const { text } = await answerOf(technician.get(`${path}/export`).expect(200));
    const before = await equipmentOnFile(app);
    const { body } = await preview(path, text);
    expect(body).toMatchObject({ rows, unchanged: rows, added: 0, changed: 0, problems: [] });
    const { body: taken } = await take(path, text);
    expect(taken).toMatchObject({ unchanged: rows, added: 0, changed: 0 });
    // Only the note of the import itself has joined the history.
    expect(await equipmentOnFile(app)).toMatchObject({ rows: (before as { rows: unknown }).rows });
  });

  it('has a template without rows', async () => {
    const technician = await app.as('technician');
    const { text } = await answerOf(technician.get(`${path}/import/template`).expect(200));
    const { body } = await preview(path, text);
    expect(body.code).toBe('file.no-rows');
  });

  it('does not take the place of another', async () => {
    const { status, body } = await preview(path, 'a,b\n1,2');
    expect([status, body.code]).toEqual([400, 'file.header-wrong']);
  });
});

describe('programs by file', () => {
  const header = 'code,name,cycle_type,temperature_c,exposure_s,dry_s';

  it('are added and changed, whole or in part', async () => {
    const file = [
      header,
      'W4-30,Wrapped,dynamic-air-removal,132,240,2400',
      'G121,Gravity,gravity,121,30 min,1800',
      'T4,Textiles,dynamic-air-removal,132,240,1200',
    ].join('\n');
    const { body } = await preview('/api/programs', file);
    expect(body).toMatchObject({
      added: 1,
      changed: 1,
      refused: 1,
      problems: [{ line: 3, column: 'exposure_s', sentence: '“30 min” is not a number.' }],
    });
    const refused = await take('/api/programs', file);
    expect([refused.status, refused.body.code]).toEqual([422, 'import.rows-refused']);
    expect(await app.db('programs').count({ count: '*' }).first()).toEqual({ count: 2 });
    await take('/api/programs', file, 'good-rows');
    expect(await app.db('programs').orderBy('code').select('code', 'dry_s', 'version')).toEqual([
      { code: 'T4', dry_s: 1200, version: 1 },
      { code: 'W3-16', dry_s: 1800, version: 1 },
      { code: 'W4-30', dry_s: 2400, version: 2 },
    ]);
  });

  it('have a temperature that steam has', async () => {
    const { body } = await preview('/api/programs', `${header}\nX,Hot,gravity,270,240,0\nY,Cold,gravity,60,240,0`);
    expect(body.problems.map((problem) => problem.sentence)).toEqual(['At most 150 °C.', 'At least 100 °C.']);
  });
});

describe('sterilizers by file', () => {
  it('keep their number, and do not share one', async () => {
    const engineer = await app.as('engineer');
    const { text } = await answerOf(engineer.get('/api/sterilizers/export').expect(200));
    const [header = '', line = ''] = text.split('\r\n');
    const renumbered = line.replace('ST-1,1,', 'ST-1,2,');
    const twin = line.replace('ST-1,1,', 'ST-2,1,').replace('Sterilizer 1', 'Sterilizer 2');
    const { body } = await preview('/api/sterilizers', [header, renumbered, twin].join('\n'));
    expect(body.problems).toEqual([
      { line: 2, column: 'number', sentence: 'It is number 1 in every load number so far, and stays that.' },
      { line: 3, column: 'number', sentence: 'ST-1 already has the number 1.' },
    ]);
  });

  it('change their programs', async () => {
    const engineer = await app.as('engineer');
    const { text } = await answerOf(engineer.get('/api/sterilizers/export').expect(200));
    await take('/api/sterilizers', text.replace('W4-30,W3-16', 'W3-16 W4-30,'));
    const { body } = await answerOf(engineer.get('/api/sterilizers').expect(200));
    expect(body.sterilizers[0]).toMatchObject({ qualifiedPrograms: ['W3-16', 'W4-30'], otherPrograms: [], version: 2 });
  });
});

describe('carts by file', () => {
  const header =
    'cart,cart_name,size_class,level,shelf_name,width_mm,depth_mm,clear_height_mm,surface,greatest_mass_kg';

  it('come one shelf to a line, and each new shelf gets a place code', async () => {
    const file = [
      header,
      'C2,Cart 2,large,1,Lower,560,1150,340,wire,60',
      'C2,Cart 2,large,2,Upper,560,1150,270,wire,50',
    ].join('\n');
    const { body } = await take('/api/carts', file);
    expect(body).toMatchObject({ added: 2 });
    const engineer = await app.as('engineer');
    const { body: page } = await answerOf(engineer.get('/api/carts?search=C2').expect(200));
    expect(page.carts[0]?.shelves.map((shelf) => shelf.placeCode.slice(0, 2))).toEqual(['S-', 'S-']);
  });

  it('say the same of a cart on each of its lines, once a level, and leave place codes alone', async () => {
    const file = [
      `${header},place_code`,
      'C2,Cart 2,large,1,Lower,560,1150,340,wire,60,',
      'C2,Cart two,large,2,Upper,560,1150,270,wire,50,',
      'C2,Cart 2,large,1,Lower,560,1150,340,wire,60,',
      'C1,Cart C1,large,1,Lower shelf,560,1150,340,wire,60,S-00001-00',
      'C3,Cart 3,large,1,Lower,560,1150,340,wire,60,S-00001-00',
    ].join('\n');
    const { body } = await preview('/api/carts', file);
    expect(body).toMatchObject({ added: 1, refused: 4 });
    expect(body.problems.map((problem) => [problem.line, problem.column])).toEqual([
      [3, 'cart_name'],
      [4, 'level'],
      [5, 'place_code'],
      [6, 'place_code'],
    ]);
  });

  it('leave shelves the file does not name as they are', async () => {
    await take('/api/carts', `${header}\nC1,Cart C1,large,1,Lower shelf,500,1150,340,wire,60`);
    const engineer = await app.as('engineer');
    const { body } = await answerOf(engineer.get('/api/carts?search=C1').expect(200));
    expect(body.carts[0]).toMatchObject({
      version: 2,
      note: 'Wheel squeaks',
      shelves: [
        { level: 1, widthMm: 500 },
        { level: 2, widthMm: 560 },
      ],
    });
  });
});

describe('holders by file', () => {
  it('get place codes when new, and keep them when there', async () => {
    const { placeCode: before } =
      (await answerOf((await app.as('engineer')).get('/api/holders'))).body.holders[0] ?? {};
    const { body } = await take('/api/holders', 'name,kind,condition\nRS-1,RS,good\nRS-2,RS,\nRS-3,rs,good');
    expect(body).toMatchObject({ added: 2, changed: 1, refused: 0 });
    const rows = await app
      .db('holders')
      .orderBy('name')
      .select<{ name: string; place_code: string; condition: string }[]>('name', 'place_code', 'condition');
    expect(rows.map((row) => [row.name, row.condition])).toEqual([
      ['RS-1', 'good'],
      ['RS-2', 'good'],
      ['RS-3', 'good'],
    ]);
    expect(rows[0]?.place_code).toBe(before);
    expect(new Set(rows.map((row) => row.place_code)).size).toBe(3);
  });

  it('are of a kind that is there, and stay of it', async () => {
    await addPiece(app, '/api/holder-kinds', aHolderKind('RM'));
    const { body } = await preview('/api/holders', 'name,kind\nRS-1,RM\nQQ-1,QQ');
    expect(body.problems).toEqual([
      { line: 2, column: 'kind', sentence: 'RS-1 is of the kind RS, and stays that.' },
      { line: 3, column: 'kind', sentence: 'There is no kind of holder with the code QQ.' },
    ]);
  });
});
