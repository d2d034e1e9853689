import { beforeAll, describe, expect, it } from 'vitest';
import { anId, openTestApp } from '../../support/test-app';
import { addItem, eventsAbout, pack, packOne, putInState, snapshot, type TestItem } from './packing-room';

const app = openTestApp();
let scissors: TestItem;

beforeAll(async () => {
  scissors = await addItem(app);
});

function printRequest(packageIds: readonly string[], changes: Record<string, unknown> = {}) {
  return { requestId: anId(), packageIds, layout: 'single', ...changes };
}

type Printed = { labels: { packageId: string; copy: number }[]; pdf: string };

async function print(request: object): Promise<{ status: number; body: Printed & { code?: string } }> {
  const technician = await app.as('technician');
  const reply = await technician.post('/api/packages/labels').send(request);
  return { status: reply.status, body: reply.body as Printed & { code?: string } };
}

/** A page object, not the list of pages: PDF 32000-1, 7.7.3.3. */
function pagesIn(pdf: Buffer): number {
  return pdf.toString('latin1').match(/\/Type \/Page\b(?!s)/g)?.length ?? 0;
}

describe('printing labels', () => {
  it('gives each package copy 1 and the address of a PDF with one page for each', async () => {
    const made = await pack(app, scissors.id, 3);
    const { status, body } = await print(printRequest(made.map((one) => one.id)));
    expect(status).toBe(201);
    expect(body.labels).toEqual(made.map((one) => ({ packageId: one.id, copy: 1 })));
    const technician = await app.as('technician');
    const pdf = await technician.get(body.pdf).buffer(true).expect(200);
    expect(pdf.headers['content-type']).toBe('application/pdf');
    const file = pdf.body as Buffer;
    expect(file.subarray(0, 5).toString()).toBe('%PDF-');
    expect(pagesIn(file)).toBe(3);
  });

  it('puts ten labels on one sheet', async () => {
    const made = await pack(app, scissors.id, 11);
    const { body } = await print(
      printRequest(
        made.map((one) => one.id),
        { layout: 'sheet' },
      ),
    );
    const technician = await app.as('technician');
    const pdf = await technician.get(body.pdf).buffer(true).expect(200);
    expect(pagesIn(pdf.body as Buffer)).toBe(2);
  });

  it('keeps who printed which copy and why', async () => {
    const one = await packOne(app, scissors.id);
    await print(printRequest([one.id]));
    await print(printRequest([one.id], { reason: 'Torn at the corner' }));
    const rows = await app
      .db('label_prints')
      .where({ package_id: one.id })
      .orderBy('copy')
      .select('copy', 'reason', 'printed_by');
    const printedBy = app.person('technician').id;
    expect(rows).toEqual([
      { copy: 1, reason: null, printed_by: printedBy },
      { copy: 2, reason: 'Torn at the corner', printed_by: printedBy },
    ]);
    expect((await eventsAbout(app, one.id)).slice(1)).toEqual([
      { kind: 'package.label-printed', payload: { copy: 1, reason: null } },
      { kind: 'package.label-printed', payload: { copy: 2, reason: 'Torn at the corner' } },
    ]);
  });

  it.each([undefined, null])(
    'refuses another copy when the reason is %s, and prints none of the others either',
    async (reason) => {
      const printed = await packOne(app, scissors.id);
      const fresh = await packOne(app, scissors.id);
      await print(printRequest([printed.id]));
      const before = await snapshot(app);
      const { status, body } = await print(printRequest([fresh.id, printed.id], { reason }));
      expect(status).toBe(422);
      expect(body.code).toBe('label.reason-missing');
      expect(await snapshot(app)).toBe(before);
    },
  );

  it('refuses a reason of blanks as unreadable input', async () => {
    const one = await packOne(app, scissors.id);
    await print(printRequest([one.id]));
    const { status, body } = await print(printRequest([one.id], { reason: '   ' }));
    expect(status).toBe(400);
    expect(body.code).toBe('request.not-understood');
  });

  it('answers a repeated request with the first answer and prints nothing more', async () => {
    const one = await packOne(app, scissors.id);
    const request = printRequest([one.id]);
    const first = await print(request);
    const before = await snapshot(app);
    expect(await print(request)).toEqual(first);
    expect(await snapshot(app)).toBe(before);
  });

  it('prints copy 1 once when two stations print at the same moment', async () => {
    const one = await packOne(app, scissors.id);
    const answers = await Promise.all([print(printRequest([one.id])), print(printRequest([one.id]))]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 422]);
    expect(await app.db('label_prints').where({ package_id: one.id })).toHaveLength(1);
  });

  it('does not bring an old copy back from its old address', async () => {
    const one = await packOne(app, scissors.id);
    const first = await print(printRequest([one.id]));
    await print(printRequest([one.id], { reason: 'Came off' }));
    const technician = await app.as('technician');
    const reply = await technician.get(first.body.pdf);
    expect(reply.status).toBe(404);
    expect(reply.body).toMatchObject({ code: 'label.none' });
  });

  it('prints no label for a package that is used up', async () => {
    const one = await packOne(app, scissors.id);
    await putInState(app, one.id, { state: 'used' });
    const { status, body } = await print(printRequest([one.id]));
    expect(status).toBe(422);
    expect(body.code).toBe('label.not-any-more');
  });

  it('refuses a package that is named twice', async () => {
    const one = await packOne(app, scissors.id);
    const { status, body } = await print(printRequest([one.id, one.id]));
    expect(status).toBe(400);
    expect(body.code).toBe('label.package-twice');
  });

  it('knows neither another facility’s packages nor its sheets', async () => {
    const theirItem = await addItem(app, {}, 'B');
    const theirs = await packOne(app, theirItem.id, 'B');
    const before = await snapshot(app);
    const { status, body } = await print(printRequest([theirs.id]));
    expect(status).toBe(404);
    expect(body.code).toBe('package.none');
    expect(await snapshot(app)).toBe(before);

    const ours = await packOne(app, scissors.id);
    const sheet = await print(printRequest([ours.id]));
    const stranger = await app.as('technician', 'B');
    expect((await stranger.get(sheet.body.pdf)).status).toBe(404);
  });

  it('draws a long name, an implant and a device identifier without stumbling', async () => {
    const item = await addItem(app, {
      name: `${'Femoral nail implants, titanium, left and right, '.repeat(4)}Ğ№Ω`,
      is_implant: true,
      kind: 'rigid-container',
      packaging: 'rigid-container',
      device_identifier: '09506000134352',
      expiry_rule: 'dated',
      expiry_days: 90,
    });
    const one = await packOne(app, item.id);
    const { body } = await print(printRequest([one.id]));
    const technician = await app.as('technician');
    await technician.get(body.pdf).expect(200);
  });

  it('draws a label whose item carries a device identifier with a wrong check digit', async () => {
    const item = await addItem(app, { device_identifier: '09506000134353' });
    const one = await packOne(app, item.id);
    const { body } = await print(printRequest([one.id]));
    const technician = await app.as('technician');
    await technician.get(body.pdf).expect(200);
  });
});
