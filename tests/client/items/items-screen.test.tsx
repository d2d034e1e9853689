import type { Item } from '#contract/items';
import type { ImportPreview } from '#contract/csv-import';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { demonstrationItems } from '../../../seeds/demonstration-catalogue';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer, type Call } from '../../support/server-stub';

type Answering = Parameters<typeof stubServer>[0];

function theItem(code: string, changes: Partial<Item> = {}): Item {
  const at = demonstrationItems.findIndex((one) => one.code === code);
  const fields = demonstrationItems[at];
  if (!fields) throw new Error(`The demonstration has no ${code}.`);
  return {
    ...fields,
    standsOn: [...fields.standsOn],
    filterZones: [...fields.filterZones],
    cycleNeeds: [...fields.cycleNeeds],
    id: `0190f000-0000-7000-8000-${String(at + 1000).padStart(12, '0')}`,
    version: 4,
    ...changes,
  };
}

const container = theItem('C-05');
const pouch = theItem('P-01');

function page(items: readonly Item[]) {
  return { json: { items, total: items.length, page: 1, pageSize: 100 } };
}

/** The server as the catalogue needs it, for somebody in this role. */
function stubCatalogue(role: Parameters<typeof aSession>[0], more: Answering = {}) {
  return stubServer({
    'GET /api/session': () => ({ json: aSession(role) }),
    'GET /api/items': ({ search }: Call) => {
      const words = new URLSearchParams(search).get('search') ?? '';
      return page([container, pouch].filter((item) => item.name.toLowerCase().includes(words.toLowerCase())));
    },
    [`GET /api/items/${container.id}`]: () => ({ json: container }),
    [`GET /api/items/${pouch.id}`]: () => ({ json: pouch }),
    'GET /api/holder-kinds': () => ({ json: { holderKinds: [], total: 0, page: 1, pageSize: 200 } }),
    ...more,
  });
}

describe('the catalogue', () => {
  it('lists items and narrows as one types', async () => {
    const server = stubCatalogue('technician');
    const { user } = renderApp('/stock/items');
    const table = await screen.findByRole('table', { name: 'Items' });
    expect(within(table).getByRole('button', { name: /Ortho small fragment/ })).toBeInTheDocument();
    expect(within(table).getByText('10.2 kg')).toBeInTheDocument();
    await user.type(screen.getByRole('searchbox', { name: 'Find an item' }), 'adson');
    await waitFor(() => {
      expect(screen.queryByRole('button', { name: /Ortho small fragment/ })).toBeNull();
    });
    expect(screen.getByRole('button', { name: /Adson forceps pair/ })).toBeInTheDocument();
    expect(server.callsTo('GET', '/api/items').at(-1)?.search).toContain('search=adson');
  });

  it('shows one beside the list, drawn to scale, and tells what is known of it', async () => {
    stubCatalogue('technician');
    const { user } = renderApp('/stock/items');
    await user.click(await screen.findByRole('button', { name: /Ortho small fragment/ }));
    const panel = await screen.findByRole('region', { name: 'Ortho small fragment' });
    expect(within(panel).getByRole('group', { name: 'Drawn to scale: 580 × 280 × 150 mm, flat' })).toBeInTheDocument();
    expect(within(panel).getByText('132 °C, 4 to 18 min, dry 30 min')).toBeInTheDocument();
    expect(within(panel).getByText('IFU-C-05 rev 3')).toBeInTheDocument();
    expect(within(panel).getByText('Implant')).toBeInTheDocument();
  });

  it('offers changes only to who may make them', async () => {
    stubCatalogue('technician');
    const { user } = renderApp('/stock/items');
    await user.click(await screen.findByRole('button', { name: /Ortho small fragment/ }));
    await screen.findByRole('region', { name: 'Ortho small fragment' });
    for (const name of ['Add an item', 'Import a CSV', 'Change it', 'Retire it']) {
      expect(screen.queryByRole('button', { name })).toBeNull();
    }
    expect(screen.getByRole('link', { name: 'Save as CSV' })).toHaveAttribute('href', '/api/items/export');
  });

  it('does not open the form for who may not, whatever the address says', async () => {
    stubCatalogue('technician');
    renderApp('/stock/items?form=new');
    await screen.findByRole('table', { name: 'Items' });
    expect(screen.queryByRole('heading', { name: 'Add an item' })).toBeNull();
  });

  it('says what was not found, and leads back to all', async () => {
    stubCatalogue('technician');
    const { user } = renderApp('/stock/items?search=nothing-like-it');
    await user.click(await screen.findByRole('button', { name: 'Show all items' }));
    expect(await screen.findByRole('button', { name: /Ortho small fragment/ })).toBeInTheDocument();
  });

  it('says what went wrong and tries again', async () => {
    const server = stubCatalogue('technician', {
      'GET /api/items': () => ({ problem: 'server.failed', status: 500, detail: 'Nothing was changed.' }),
    });
    const { user } = renderApp('/stock/items');
    await screen.findByRole('alert');
    server.handlers['GET /api/items'] = () => page([pouch]);
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByRole('button', { name: /Adson forceps pair/ })).toBeInTheDocument();
  });

  it('retires an item after asking', async () => {
    const server = stubCatalogue('lead', {
      [`PATCH /api/items/${pouch.id}`]: () => ({ json: { ...pouch, isRetired: true, version: 5 } }),
    });
    const { user } = renderApp(`/stock/items?open=${pouch.id}`);
    await user.click(await screen.findByRole('button', { name: 'Retire it' }));
    expect(server.callsTo('PATCH', `/api/items/${pouch.id}`)).toHaveLength(0);
    const question = await screen.findByRole('alertdialog', { name: 'Retire Adson forceps pair?' });
    await user.click(within(question).getByRole('button', { name: 'Retire it' }));
    await waitFor(() => {
      expect(screen.queryByRole('alertdialog')).toBeNull();
    });
    expect(server.callsTo('PATCH', `/api/items/${pouch.id}`)[0]?.body).toMatchObject({ version: 4, isRetired: true });
  });
});

describe('the form of an item', () => {
  it('says at each field what is missing, counts it, and sends nothing', async () => {
    const server = stubCatalogue('lead');
    const { user } = renderApp('/stock/items?form=new');
    await user.click(await screen.findByRole('button', { name: 'Add the item' }));
    expect(await screen.findByText('6 things to put right.')).toBeInTheDocument();
    expect(screen.getByRole('textbox', { name: 'Code' })).toHaveAccessibleDescription('Please fill this in.');
    expect(screen.getByRole('textbox', { name: /Long side/ })).toHaveAccessibleDescription('Please write a number.');
    expect(server.callsTo('POST', '/api/items')).toHaveLength(0);
  });

  it('checks how the parts hold together before it sends', async () => {
    const server = stubCatalogue('lead');
    const { user } = renderApp(`/stock/items?open=${pouch.id}&form=change`);
    const metal = await screen.findByRole('textbox', { name: 'Of that, metal' });
    expect(metal).toHaveValue('0.07');
    await user.clear(metal);
    await user.type(metal, '0,09');
    await user.click(screen.getByRole('button', { name: 'Keep the changes' }));
    expect(await screen.findByText('Metal and textile together are heavier than the whole.')).toBeInTheDocument();
    expect(server.callsTo('PATCH', `/api/items/${pouch.id}`)).toHaveLength(0);
  });

  it('sends only what changed, with the version it was filled in against', async () => {
    const server = stubCatalogue('lead', {
      [`PATCH /api/items/${pouch.id}`]: () => ({ json: { ...pouch, name: 'Adson forceps, two', version: 5 } }),
    });
    const { user } = renderApp(`/stock/items?open=${pouch.id}&form=change`);
    const name = await screen.findByRole('textbox', { name: 'Name' });
    await user.clear(name);
    await user.type(name, 'Adson forceps, two');
    await user.click(screen.getByRole('button', { name: 'Keep the changes' }));
    expect(await screen.findByRole('table', { name: 'Items' })).toBeInTheDocument();
    const [call] = server.callsTo('PATCH', `/api/items/${pouch.id}`);
    expect(call?.body).toEqual({
      requestId: (call?.body as { requestId: string }).requestId,
      version: 4,
      name: 'Adson forceps, two',
    });
  });

  it('shows what the server refuses: at its field, or at the foot', async () => {
    const server = stubCatalogue('lead', {
      [`PATCH /api/items/${pouch.id}`]: () => ({
        problem: 'item.not-consistent',
        status: 400,
        detail: 'There is no item with the code C-99.',
        fields: [{ pointer: '/body/standsOn', detail: 'There is no item with the code C-99.' }],
      }),
    });
    const { user } = renderApp(`/stock/items?open=${pouch.id}&form=change`);
    const standsOn = await screen.findByRole('textbox', { name: /May stand on/ });
    await user.type(standsOn, 'c-99');
    await user.click(screen.getByRole('button', { name: 'Keep the changes' }));
    await waitFor(() => {
      expect(standsOn).toHaveAccessibleDescription('There is no item with the code C-99.');
    });
    server.handlers[`PATCH /api/items/${pouch.id}`] = () => ({
      problem: 'item.changed-meanwhile',
      status: 409,
      detail: 'Somebody else changed this while you were writing.',
    });
    await user.click(screen.getByRole('button', { name: 'Keep the changes' }));
    expect(await screen.findByText('Somebody else changed this while you were writing.')).toBeInTheDocument();
    expect(standsOn).toHaveValue('c-99');
  });

  it('repeats a write under the same id after silence, so that nothing is done twice', async () => {
    let tries = 0;
    const server = stubCatalogue('lead', {
      [`PATCH /api/items/${pouch.id}`]: () => {
        tries += 1;
        return tries === 1 ? { silence: true } : { json: { ...pouch, name: 'Other', version: 5 } };
      },
      'GET /api/health': () => ({ json: { status: 'ok' } }),
    });
    const { user } = renderApp(`/stock/items?open=${pouch.id}&form=change`);
    await user.type(await screen.findByRole('textbox', { name: 'Name' }), ' two');
    await user.click(screen.getByRole('button', { name: 'Keep the changes' }));
    await screen.findByText(/did not answer/);
    await user.click(screen.getByRole('button', { name: 'Keep the changes' }));
    await screen.findByRole('table', { name: 'Items' });
    const ids = server
      .callsTo('PATCH', `/api/items/${pouch.id}`)
      .map((call) => (call.body as { requestId: string }).requestId);
    expect(ids).toHaveLength(2);
    expect(new Set(ids).size).toBe(1);
  });

  it('asks for filters of a rigid container, and draws them', async () => {
    stubCatalogue('lead');
    const { user } = renderApp('/stock/items?form=new');
    await user.selectOptions(await screen.findByRole('combobox', { name: 'Kind' }), 'rigid-container');
    for (const [name, figure] of [
      [/Long side/, '600'],
      [/Short side/, '300'],
      [/Height/, '150'],
    ] as const) {
      await user.type(screen.getByRole('textbox', { name }), figure);
    }
    await user.click(screen.getByRole('button', { name: 'A filter in the lid' }));
    const filter = screen.getByRole('group', { name: 'Filter 1' });
    expect(within(filter).getByRole('textbox', { name: 'Length' })).toHaveValue('300');
    await user.clear(within(filter).getByRole('textbox', { name: 'From the end' }));
    await user.type(within(filter).getByRole('textbox', { name: 'From the end' }), '301');
    await user.click(screen.getByRole('button', { name: 'Add the item' }));
    await user.click(within(filter).getByRole('button', { name: 'Remove filter 1' }));
    expect(screen.queryByRole('group', { name: 'Filter 1' })).toBeNull();
  });

  it('is filled in and shown in inches and pounds where the facility measures so', async () => {
    const session = aSession('lead');
    const server = stubCatalogue('lead', {
      'GET /api/session': () => ({
        json: { ...session, facility: { ...session.facility, unitSystem: 'us-customary' } },
      }),
      [`PATCH /api/items/${pouch.id}`]: () => ({ json: { ...pouch, version: 5 } }),
    });
    const { user } = renderApp(`/stock/items?open=${pouch.id}&form=change`);
    const length = await screen.findByRole('textbox', { name: /Long side/ });
    // 250 mm / 25.4 = 9.8425 in
    expect(length).toHaveValue('9.84');
    await user.clear(length);
    await user.type(length, '10');
    await user.click(screen.getByRole('button', { name: 'Keep the changes' }));
    await screen.findByRole('table', { name: 'Items' });
    // Only what was touched is sent: the other figures keep their exact values.
    expect(server.callsTo('PATCH', `/api/items/${pouch.id}`)[0]?.body).toMatchObject({ lengthMm: 254 });
    expect(server.callsTo('PATCH', `/api/items/${pouch.id}`)[0]?.body).not.toHaveProperty('massKg');
  });
});

describe('importing a file', () => {
  const preview: ImportPreview = {
    rows: 3,
    added: 1,
    changed: 1,
    unchanged: 0,
    refused: 1,
    digest: 'd'.repeat(64),
    problems: [{ line: 4, column: 'mass_kg', sentence: '“heavy” is not a number.' }],
    problemsLeftOut: 0,
    changes: [
      {
        line: 2,
        name: 'W-01',
        what: 'changed',
        changes: [{ column: 'name', before: 'Minor set', after: 'Minor set A' }],
      },
      { line: 3, name: 'W-60', what: 'added', changes: [] },
    ],
    changesLeftOut: 0,
  };
  const file = () => new File(['code,name'], 'items.csv', { type: 'text/csv' });

  it('is looked at first: what would change, and what is wrong where', async () => {
    const server = stubCatalogue('lead', { 'POST /api/items/import/preview': () => ({ json: preview }) });
    const { user } = renderApp('/stock/items?form=import');
    await user.upload(await screen.findByLabelText('CSV file'), file());
    const row = (await screen.findByText('“heavy” is not a number.')).closest('tr');
    expect(row).toHaveTextContent('Line 4');
    expect(row).toHaveTextContent('mass_kg');
    expect(screen.getByText('W-60').closest('tr')).toHaveTextContent('New');
    expect(server.callsTo('POST', '/api/items/import')).toHaveLength(0);
  });

  it('takes the good rows without the bad, going by the preview', async () => {
    const server = stubCatalogue('lead', {
      'POST /api/items/import/preview': () => ({ json: preview }),
      'POST /api/items/import': () => ({ json: { rows: 3, added: 1, changed: 1, unchanged: 0, refused: 1 } }),
    });
    const { user } = renderApp('/stock/items?form=import');
    await user.upload(await screen.findByLabelText('CSV file'), file());
    await user.click(await screen.findByRole('button', { name: 'Import the 2 good rows, leave the other 1' }));
    await waitFor(() => {
      expect(screen.queryByRole('dialog')).toBeNull();
    });
    const body = server.callsTo('POST', '/api/items/import')[0]?.body as FormData;
    expect(body.get('mode')).toBe('good-rows');
    expect(body.get('digest')).toBe(preview.digest);
  });

  it('that cannot be read says why, and another can be chosen', async () => {
    const server = stubCatalogue('lead', {
      'POST /api/items/import/preview': () => ({
        problem: 'file.not-utf-8',
        status: 400,
        detail: 'Line 3 of this file is not UTF-8 text.',
      }),
    });
    const { user } = renderApp('/stock/items?form=import');
    await user.upload(await screen.findByLabelText('CSV file'), file());
    expect(await screen.findByText('Line 3 of this file is not UTF-8 text.')).toBeInTheDocument();
    server.handlers['POST /api/items/import/preview'] = () => ({ json: { ...preview, refused: 0, problems: [] } });
    await user.upload(screen.getByLabelText('CSV file'), file());
    expect(await screen.findByRole('button', { name: 'Import 2 rows' })).toBeInTheDocument();
  });

  it('that went stale says so and stays open', async () => {
    stubCatalogue('lead', {
      'POST /api/items/import/preview': () => ({ json: preview }),
      'POST /api/items/import': () => ({
        problem: 'import.changed-meanwhile',
        status: 409,
        detail: 'What is here, or the file, changed since you looked at the preview.',
      }),
    });
    const { user } = renderApp('/stock/items?form=import');
    await user.upload(await screen.findByLabelText('CSV file'), file());
    await user.click(await screen.findByRole('button', { name: /Import the 2 good rows/ }));
    expect(await screen.findByText(/changed since you looked/)).toBeInTheDocument();
    expect(screen.getByRole('dialog', { name: 'Import items from a CSV' })).toBeInTheDocument();
  });
});
