import type TestAgent from 'supertest/lib/agent';
import { beforeEach, describe, expect, it } from 'vitest';
import { anId, openTestApp } from '../../support/test-app';
import { addItem, anItem, answerOf, itemsOnFile } from './items-support';

const app = openTestApp();

const header = 'code,name,kind,packaging,length_mm,width_mm,height_mm,mass_kg,metal_mass_kg,pose,cycles,service';
const cycles = 'dynamic-air-removal 132 C 240 s dry 1800 s';

/** One good line of a file; `changes` are cells by place in the header. */
function row(code: string, changes: Readonly<Record<string, string>> = {}): string {
  const cells: Record<string, string> = {
    code,
    name: `Tray ${code}`,
    kind: 'wrapped-tray',
    packaging: 'wrap',
    length_mm: '500',
    width_mm: '260',
    height_mm: '90',
    mass_kg: '3.4',
    metal_mass_kg: '3',
    pose: 'flat',
    cycles,
    service: 'OR',
    ...changes,
  };
  return header
    .split(',')
    .map((column) => cells[column] ?? '')
    .join(',');
}

function fileOf(...rows: string[]): string {
  return [header, ...rows, ''].join('\r\n');
}

type File = string | Buffer;

function bytesOf(file: File): Buffer {
  return typeof file === 'string' ? Buffer.from(file) : file;
}

async function preview(file: File, agent?: TestAgent) {
  const lead = agent ?? (await app.as('lead'));
  return answerOf(lead.post('/api/items/import/preview').attach('file', bytesOf(file), 'items.csv'));
}

async function take(
  file: File,
  mode: string,
  { requestId = anId(), digest }: { requestId?: string; digest?: string } = {},
) {
  const lead = await app.as('lead');
  const seen = digest ?? (await preview(file)).body.digest;
  return answerOf(
    lead.post('/api/items/import').field({ requestId, mode, digest: seen }).attach('file', bytesOf(file), 'items.csv'),
  );
}

beforeEach(async () => {
  await app.db('items').delete();
});

describe('the preview of a file', () => {
  it('says what would be added, changed and left alone, and writes nothing', async () => {
    await addItem(app, anItem('W-01', { name: 'Minor set' }));
    await take(fileOf(row('T-1')), 'all-or-nothing');
    const before = await itemsOnFile(app);
    const { body, status } = await preview(
      fileOf(
        row('T-1'),
        row('t-2'),
        row('W-01', {
          name: 'Minor set plain',
          cycles: 'dynamic-air-removal 132 C 240-1080 s dry 1800 s',
          length_mm: '560',
          height_mm: '110',
          mass_kg: '5.4',
          metal_mass_kg: '4.97',
          service: 'OR',
        }),
      ),
    );
    expect(status).toBe(200);
    expect(body).toMatchObject({ rows: 3, added: 1, changed: 1, unchanged: 1, refused: 0, problems: [] });
    expect(body.changes).toEqual([
      { line: 3, name: 'T-2', what: 'added', changes: [] },
      {
        line: 4,
        name: 'W-01',
        what: 'changed',
        changes: [{ column: 'name', before: 'Minor set', after: 'Minor set plain' }],
      },
    ]);
    expect(await itemsOnFile(app)).toEqual(before);
  });

  it('says of each row and column what is wrong', async () => {
    const { body } = await preview(
      fileOf(
        row('T-1', { mass_kg: 'heavy', pose: 'upright' }),
        row('T-2', { metal_mass_kg: '3.5' }),
        row('T-3'),
        row('t-3'),
        row('T-4', { cycles: 'W4-30' }),
        row('T 5'),
        row('T-6', { mass_kg: '3400' }),
        `${row('T-7')},surplus`,
        'T-8,cut off',
        row('T-9', { kind: 'pouch', packaging: 'wrap' }),
        row('T-10', { name: '' }),
      ),
    );
    expect(body).toMatchObject({ rows: 11, added: 1, refused: 10 });
    expect(body.problems.map((one) => [one.line, one.column, one.sentence])).toEqual([
      [2, 'mass_kg', '“heavy” is not a number.'],
      [2, 'pose', '“upright” is none of flat, on-edge, tilted.'],
      [3, 'metal_mass_kg', 'Metal and textile together are heavier than the whole.'],
      [5, 'code', 'T-3 stands on line 4 already.'],
      [6, 'cycles', '“W4-30” is not a cycle. Write it like “dynamic-air-removal 132 C 240 s dry 1800 s”.'],
      [7, 'code', 'Letters A to Z, digits and - . _ / only, beginning with a letter or digit.'],
      [8, 'mass_kg', 'At most 500 kg.'],
      [9, null, 'This row has 13 cells, and 12 columns are named.'],
      [10, null, 'This row has 2 cells, and 12 columns are named.'],
      [11, 'packaging', 'Something of the kind pouch is packed in: paper-film-pouch, double-pouch.'],
      [12, 'name', 'Please fill this in.'],
    ]);
  });

  it('refuses a row that leans on a refused one', async () => {
    const withStack = `${header},stands_on`;
    const file = [
      withStack,
      `${row('T-1', { mass_kg: '0' })},`,
      `${row('T-2')},T-1`,
      `${row('T-3')},T-2`,
      `${row('T-4')},T-4`,
    ].join('\n');
    const { body } = await preview(file);
    expect(body).toMatchObject({ added: 1, refused: 3 });
    expect(body.problems.map((one) => [one.line, one.sentence])).toEqual([
      [2, 'At least 0.001 kg.'],
      [3, 'There is no item with the code T-1.'],
      [4, 'There is no item with the code T-2.'],
    ]);
  });

  it('lets the first of two lines have a device identifier', async () => {
    const file = [`${header},device_identifier`, `${row('T-1')},2012345678903`, `${row('T-2')},02012345678903`].join(
      '\n',
    );
    const { body } = await preview(file);
    expect(body.problems).toEqual([
      { line: 3, column: 'device_identifier', sentence: 'T-1 already carries this device identifier.' },
    ]);
  });

  it('lets two items swap their device identifiers', async () => {
    await addItem(app, anItem('P-01'));
    await addItem(app, anItem('P-02'));
    const lead = await app.as('lead');
    const { text } = await answerOf(lead.get('/api/items/export').expect(200));
    const [one, other] = [String(anItem('P-01').deviceIdentifier), String(anItem('P-02').deviceIdentifier)];
    const swapped = text.replace(one, 'X').replace(other, one).replace('X', other);
    const { body } = await take(swapped, 'all-or-nothing');
    expect(body).toMatchObject({ changed: 2, refused: 0 });
    expect(await app.db('items').orderBy('code').pluck('device_identifier')).toEqual([other, one]);
  });
});

describe('a file that is none', () => {
  const latin1 = Buffer.from(fileOf(row('T-1'), row('T-2', { name: 'Curé' })), 'latin1');
  it.each<[string, File, string, string | RegExp]>([
    ['nothing', '', 'file.empty', 'This file is empty.'],
    ['blank lines', '\r\n\r\n', 'file.empty', 'This file has no line that names its columns.'],
    ['only a header', `${header}\r\n`, 'file.no-rows', 'This file names its columns and has no rows under them.'],
    [
      'another header',
      'code,name,pack,len_mm,wid_mm,hgt_mm,mass_kg,cycle\nP-01,Forceps,pouch,250,75,10,0.08,W4-20',
      'file.header-wrong',
      'The first line does not name the columns as they are known here. Not known: pack, len_mm, wid_mm, hgt_mm, cycle. Missing: kind, packaging, length_mm, width_mm, height_mm, pose, cycles.',
    ],
    [
      'a NUL',
      fileOf(row('T-1'), row('T-2', { name: 'A\u0000B' })),
      'file.has-nul',
      /^Line 3 of this file has a character with no meaning in text \(NUL\)/,
    ],
    ['Latin-1', latin1, 'file.not-utf-8', /^Line 3 of this file is not UTF-8 text/],
    ['a spreadsheet', Buffer.from('504b0304140006000800', 'hex'), 'file.spreadsheet', /Save it as “CSV UTF-8”/],
    [
      'an open quotation mark',
      fileOf(row('T-1'), row('T-2', { name: '"Open' }), row('T-3')),
      'file.not-csv',
      'A quotation mark opens on line 3 and never closes.',
    ],
    [
      'a quotation mark in a cell',
      fileOf(row('T-1', { name: '5" tray' })),
      'file.not-csv',
      /^Line 2 has a quotation mark in the middle of a cell/,
    ],
    [
      'a cell that never ends',
      fileOf(row('T-1', { name: 'x'.repeat(30_000) })),
      'file.not-csv',
      /^Line \d+ is too long to be a row/,
    ],
    [
      'half of UTF-16',
      Buffer.concat([Buffer.from([0xff, 0xfe]), Buffer.from(fileOf(row('T-1')), 'utf16le').subarray(0, -1)]),
      'file.cut-off',
      /cut off/,
    ],
  ])('is refused: %s', async (_what, file, code, sentence) => {
    const { body, status } = await preview(file);
    expect({ status, code: body.code }).toEqual({ status: 400, code });
    if (typeof sentence === 'string') expect(body.detail).toBe(sentence);
    else expect(body.detail).toMatch(sentence);
    expect(await app.db('items')).toEqual([]);
  });

  it('is asked for when none is sent', async () => {
    const lead = await app.as('lead');
    const { body } = await answerOf(lead.post('/api/items/import/preview').send({}).expect(400));
    expect(body).toMatchObject({ code: 'file.missing', detail: 'Choose a CSV file first.' });
  });

  it('is refused as a whole when it is larger than 10 MB', async () => {
    const { body, status } = await preview(Buffer.alloc(10 * 1024 * 1024 + 1, 'x'));
    expect({ status, code: body.code }).toEqual({ status: 413, code: 'file.too-large' });
  });

  it('is refused when it has 100,000 rows, and quickly', async () => {
    const file = fileOf(
      ...Array.from({ length: 100_000 }, (_, at) => row(`T-${String(at)}`, { cycles: 'x', name: 'T' })),
    );
    expect(file.length).toBeLessThan(10 * 1024 * 1024);
    const startedMs = performance.now();
    const { body, status } = await preview(file);
    expect({ status, code: body.code }).toEqual({ status: 400, code: 'file.too-many-rows' });
    expect(body.detail).toBe(
      'This file has more than 10,000 rows. Split it, and import the parts one after the other.',
    );
    expect(performance.now() - startedMs).toBeLessThan(5_000);
  });

  it.each([
    [
      'two files',
      (agent: TestAgent) =>
        agent
          .post('/api/items/import/preview')
          .attach('file', Buffer.from('a'), 'a')
          .attach('file', Buffer.from('b'), 'b'),
    ],
    [
      'a file under another name',
      (agent: TestAgent) => agent.post('/api/items/import/preview').attach('data', Buffer.from('a'), 'a'),
    ],
    [
      'a field too many',
      (agent: TestAgent) =>
        agent
          .post('/api/items/import/preview')
          .field('mode', 'x')
          .attach('file', Buffer.from(fileOf(row('T-1'))), 'a'),
    ],
    [
      'a form that is cut off',
      (agent: TestAgent) =>
        agent
          .post('/api/items/import/preview')
          .set('Content-Type', 'multipart/form-data; boundary=x')
          .send('--x\r\nContent-Disposition: form-data; name="file"; filename="a"\r\n\r\nabc'),
    ],
    [
      'a form without a boundary',
      (agent: TestAgent) =>
        agent.post('/api/items/import/preview').set('Content-Type', 'multipart/form-data').send('abc'),
    ],
  ])('is refused in plain words: %s', async (_what, send) => {
    const reply = await answerOf(send(await app.as('lead')));
    expect(reply.status).toBe(400);
    expect(reply.body.detail).toBeTypeOf('string');
    expect(reply.body.code).not.toBe('server.failed');
  });
});

describe('files as people have them', () => {
  it.each<[string, File]>([
    ['with a byte order mark', `\uFEFF${fileOf(row('T-1', { name: 'Curé µ' }))}`],
    ['in UTF-16, little end first', Buffer.from(`\uFEFF${fileOf(row('T-1', { name: 'Curé µ' }))}`, 'utf16le')],
    ['in UTF-16, big end first', Buffer.from(`\uFEFF${fileOf(row('T-1', { name: 'Curé µ' }))}`, 'utf16le').swap16()],
    ['with line feeds only', fileOf(row('T-1', { name: 'Curé µ' })).replaceAll('\r\n', '\n')],
    ['with carriage returns only', fileOf(row('T-1', { name: 'Curé µ' })).replaceAll('\r\n', '\r')],
    ['with tabs', fileOf(row('T-1', { name: 'Curé µ' })).replaceAll(',', '\t')],
    [
      'with blank lines and remarks on top',
      `# ours,,,\r\n"# theirs, too"\r\n\r\n${fileOf(row('T-1', { name: 'Curé µ' }))}\r\n,,,,,,,,,,,\r\n`,
    ],
    [
      'with semicolons and decimal commas',
      fileOf(row('T-1', { name: 'Curé µ' }))
        .replaceAll(',', ';')
        .replace('3.4', '3,4'),
    ],
    ['with everything in quotation marks', fileOf(row('T-1', { name: 'Curé µ' })).replace(/[^,\r\n]+/g, '"$&"')],
  ])('are read: %s', async (_what, file) => {
    const { body } = await take(file, 'all-or-nothing');
    expect(body).toEqual({ rows: 1, added: 1, changed: 0, unchanged: 0, refused: 0 });
    expect(await app.db('items').first('code', 'name', 'mass_kg')).toEqual({
      code: 'T-1',
      name: 'Curé µ',
      mass_kg: 3.4,
    });
  });

  it('ask back where a figure can be read in two ways', async () => {
    const { body } = await preview(fileOf(row('T-1', { mass_kg: '"3,400"' })));
    expect(body.problems).toEqual([
      {
        line: 2,
        column: 'mass_kg',
        sentence: '“3,400” can be read in two ways. Write 3400, or 3.4000 for the smaller.',
      },
    ]);
  });

  it('count lines as an editor does, also past a cell of several lines', async () => {
    const { body } = await preview(fileOf(row('T-1', { service: '"OR\r\nED"' }), row('T-2', { mass_kg: 'x' })));
    expect(body.problems).toEqual([
      { line: 2, column: 'service', sentence: 'This has a character that cannot be kept.' },
      { line: 4, column: 'mass_kg', sentence: '“x” is not a number.' },
    ]);
  });
});

describe('taking a file over', () => {
  const mixed = fileOf(row('T-1'), row('T-2', { mass_kg: 'x' }), row('T-3'));

  it('writes all of it, with each item in the history', async () => {
    const requestId = anId();
    const { body } = await take(fileOf(row('T-1'), row('T-2')), 'all-or-nothing', { requestId });
    expect(body).toEqual({ rows: 2, added: 2, changed: 0, unchanged: 0, refused: 0 });
    const events = await app
      .db('audit_events')
      .where({ request_id: requestId })
      .orderBy('id')
      .select<{ kind: string; payload: unknown }[]>('kind', 'payload');
    expect(events.map((event) => [event.kind, event.payload])).toEqual([
      ['item.added', { code: 'T-1' }],
      ['item.added', { code: 'T-2' }],
      ['items.imported', { added: 2, changed: 0, refused: 0 }],
    ]);
  });

  it('writes nothing when one row is bad and all were asked for', async () => {
    const before = await itemsOnFile(app);
    const { body, status } = await take(mixed, 'all-or-nothing');
    expect(status).toBe(422);
    expect(body).toMatchObject({
      code: 'import.rows-refused',
      detail: 'One row has something to put right, so nothing was imported.',
    });
    expect(await itemsOnFile(app)).toEqual(before);
  });

  it('writes the good rows without the bad when that was asked for', async () => {
    const { body } = await take(mixed, 'good-rows');
    expect(body).toEqual({ rows: 3, added: 2, changed: 0, unchanged: 0, refused: 1 });
    expect(await app.db('items').orderBy('code').pluck('code')).toEqual(['T-1', 'T-3']);
  });

  it('does once what is asked twice', async () => {
    const requestId = anId();
    const file = fileOf(row('T-1'));
    const digest = (await preview(file)).body.digest;
    const first = await take(file, 'all-or-nothing', { requestId, digest });
    await app.db('items').where({ code: 'T-1' }).update({ name: 'Changed since' });
    const second = await take(file, 'all-or-nothing', { requestId, digest });
    expect(second.body).toEqual(first.body);
    expect(await app.db('items').first('name')).toEqual({ name: 'Changed since' });
    const other = await take(fileOf(row('T-2')), 'all-or-nothing', { requestId });
    expect([other.status, other.body.code]).toEqual([409, 'request.reused']);
  });

  it('goes by the preview: what changed since stops it', async () => {
    await addItem(app, { ...anItem('W-03'), code: 'T-1' });
    const file = fileOf(row('T-1'));
    const digest = (await preview(file)).body.digest;
    await app.db('items').update({ version: 2 });
    const { body, status } = await take(file, 'all-or-nothing', { digest });
    expect([status, body.code]).toEqual([409, 'import.changed-meanwhile']);
    const swapped = await take(fileOf(row('T-9')), 'all-or-nothing', { digest });
    expect([swapped.status, swapped.body.code]).toEqual([409, 'import.changed-meanwhile']);
    expect(await app.db('items').pluck('name')).toEqual([anItem('W-03').name]);
  });

  it('keeps what the file has no column for', async () => {
    await addItem(app, anItem('W-03', { note: 'Keep me', ifuReference: 'IFU-9' }));
    await take(fileOf(row('W-03')), 'all-or-nothing');
    expect(await app.db('items').first('note', 'ifu_reference', 'name', 'version')).toEqual({
      note: 'Keep me',
      ifu_reference: 'IFU-9',
      name: 'Tray W-03',
      version: 2,
    });
  });

  it('does not reach into another facility', async () => {
    await addItem(app, anItem('W-03'), 'B');
    const { body } = await take(fileOf(row('W-03')), 'all-or-nothing');
    expect(body).toMatchObject({ added: 1, changed: 0 });
    expect(await app.db('items').where({ facility_id: app.facilities.B }).first('name', 'version')).toEqual({
      name: 'D&C set',
      version: 1,
    });
  });

  it('takes 10,000 rows within seconds', async () => {
    const file = fileOf(...Array.from({ length: 10_000 }, (_, at) => row(`T-${String(at)}`)));
    const startedMs = performance.now();
    const { body } = await take(file, 'all-or-nothing');
    expect(body).toMatchObject({ added: 10_000 });
    expect(performance.now() - startedMs).toBeLessThan(20_000);
    const again = await preview(file);
    expect(again.body).toMatchObject({ unchanged: 10_000, added: 0, changed: 0 });
  }, 60_000);

  it.each([
    ['a mode of its own', { mode: 'some' }],
    ['no mode', { mode: '' }],
    ['a digest that is none', { digest: 'abc' }],
    ['no request id', { requestId: '' }],
    ['a field too many', { force: 'yes' }],
  ])('is refused with %s', async (_what, changes) => {
    const file = fileOf(row('T-1'));
    const digest = (await preview(file)).body.digest;
    const lead = await app.as('lead');
    const reply = await answerOf(
      lead
        .post('/api/items/import')
        .field({ requestId: anId(), mode: 'good-rows', digest, ...changes })
        .attach('file', Buffer.from(file), 'items.csv'),
    );
    expect(reply.status).toBe(400);
    expect(await app.db('items')).toEqual([]);
  });
});

describe('the file that goes out', () => {
  it('reads back to the same', async () => {
    for (const code of ['P-19', 'W-10', 'W-12', 'C-05', 'C-12', 'G-01']) await addItem(app, anItem(code));
    await addItem(
      app,
      anItem('C-17', { standsOn: ['C-05', 'C-12'], note: '=SUM(A1:A9), "quoted"; and; more', service: '-x' }),
    );
    const lead = await app.as('lead');
    const out = await answerOf(lead.get('/api/items/export').expect(200));
    expect(out.headers['content-type']).toBe('text/csv; charset=utf-8');
    expect(out.headers['content-disposition']).toContain('items.csv');
    const { body } = await preview(out.text);
    expect(body).toMatchObject({ rows: 7, unchanged: 7, added: 0, changed: 0, problems: [] });
    const before = await app.db('items').orderBy('code').select('*');
    await app.db('items').delete();
    expect((await take(out.text, 'all-or-nothing')).body).toMatchObject({ added: 7, refused: 0 });
    const after = await app.db('items').orderBy('code').select('*');
    const apart = ({ id: _id, ...rest }: Record<string, unknown>) => rest;
    expect(after.map(apart)).toEqual(before.map(apart));
  });

  it('has nothing that a spreadsheet would run', async () => {
    await addItem(app, anItem('W-03', { note: "=cmd|' /C calc'!A0", service: '@SUM(1)' }));
    const lead = await app.as('lead');
    const { text } = await answerOf(lead.get('/api/items/export').expect(200));
    expect(text).toContain(`'=cmd|' /C calc'!A0`);
    expect(text).toContain(",'@SUM(1),");
    expect(text).not.toMatch(/[,\n"][=+@]/);
  });

  it('has a template that explains its columns and is a file of no rows', async () => {
    const technician = await app.as('technician');
    const { text } = await answerOf(technician.get('/api/items/import/template').expect(200));
    expect(text).toContain('# length_mm: Long side, lying flat. Must be filled in. Example: 560');
    const { body } = await preview(text);
    expect(body.code).toBe('file.no-rows');
    const filled = await preview(
      `${text}W-50,Set,wrapped-tray,wrap,500,260,90,3,2.8,,,,flat,,,,,,${cycles},,,,60,,,,,,,,\r\n`,
    );
    expect(filled.body).toMatchObject({ added: 1, refused: 0 });
  });
});
