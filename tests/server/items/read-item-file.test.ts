import type TestAgent from 'supertest/lib/agent';
import { beforeEach, describe, expect, it } from 'vitest';
import { openTestApp } from '../../support/test-app';
import { fileOf, header, itemFiles, row, type File } from './item-files';
import { answerOf } from './items-support';

const app = openTestApp();
const { preview, take } = itemFiles(app);

beforeEach(async () => {
  await app.db('items').delete();
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
