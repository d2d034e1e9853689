import type { Item } from '#contract/items';
import type { PackageSummary } from '#contract/packages';
import { celsius, kg, mm, seconds } from '#domain/units/quantity';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { aSession, renderApp } from '../../support/render-app';
import { wedge } from '../../support/scanner';
import { stubServer, type Answer } from '../../support/server-stub';

function anItem(changes: Partial<Item> = {}): Item {
  return {
    id: '0190f000-0000-7000-8000-000000000201',
    code: 'P-03',
    name: 'Mayo scissors curved',
    kind: 'pouch',
    packaging: 'paper-film-pouch',
    lengthMm: mm(330),
    widthMm: mm(90),
    heightMm: mm(14),
    massKg: kg(0.14),
    metalMassKg: kg(0.13),
    textileMassKg: kg(0),
    metal: 'stainless-steel',
    isImplant: false,
    pose: 'on-edge',
    isPerforated: true,
    clearanceMm: mm(10),
    standsOn: [],
    greatestStackHeightMm: null,
    filterZones: [],
    cycleNeeds: [
      {
        type: 'dynamic-air-removal',
        temperatureC: celsius(132),
        leastExposureS: seconds(240),
        greatestExposureS: null,
        leastDryS: seconds(1200),
      },
    ],
    preferredHolder: 'RS',
    facing: null,
    massLimitKg: null,
    coolS: seconds(1800),
    expiryRule: 'event-related',
    expiryDays: null,
    deviceIdentifier: null,
    ifuReference: 'IFU 4711',
    ifuRevision: null,
    service: '',
    note: '',
    isRetired: false,
    version: 1,
    ...changes,
  };
}

const scissors = anItem();
const plates = anItem({
  id: '0190f000-0000-7000-8000-000000000202',
  code: 'C-05',
  name: 'Ortho small fragment',
  kind: 'rigid-container',
  isImplant: true,
  ifuReference: null,
});

const made = [
  { id: '0190f000-0000-7000-8000-000000000301', code: 'P-20431784-52' },
  { id: '0190f000-0000-7000-8000-000000000302', code: 'P-20431785-49' },
];

const pdf = '/api/packages/labels/0190f000-0000-7000-8000-000000000401?layout=single';
const runId = '0190f000-0000-7000-8000-000000000501';

const run = {
  id: runId,
  name: 'Mixed sets',
  sterilizer: null,
  program: null,
  wantedAt: null,
  state: 'waiting',
  packages: 4,
  implants: 0,
  createdBy: 'Dele Oyelaran',
  createdAt: '2026-03-17T07:00:00.000Z',
  load: null,
  version: 1,
} as const;

const aPackage: PackageSummary = {
  id: made[0]?.id ?? '',
  code: 'P-20431784-52',
  item: { id: scissors.id, code: scissors.code, name: scissors.name, kind: 'pouch', isImplant: false },
  state: 'packed',
  heldReason: null,
  expiresOn: null,
  isExpired: false,
  packedAt: '2026-03-17T08:00:00.000Z',
  packedBy: 'Dele Oyelaran',
  destination: '',
  run: null,
  openLoad: null,
  labels: 1,
};

type Handlers = Record<string, () => Answer>;

function open(handlers: Handlers = {}) {
  const tab = { location: { replace: vi.fn() }, close: vi.fn() };
  vi.spyOn(window, 'open').mockReturnValue(tab as unknown as Window);
  const server = stubServer({
    'GET /api/session': () => ({ json: aSession('technician') }),
    'GET /api/items': () => ({ json: { items: [scissors, plates], total: 2, page: 1, pageSize: 200 } }),
    'GET /api/runs': () => ({ json: { runs: [run] } }),
    'POST /api/packages': () => ({ json: { packages: made, warnings: [] }, status: 201 }),
    'POST /api/packages/labels': () => ({
      json: { labels: made.map(({ id }) => ({ packageId: id, copy: 1 })), pdf },
      status: 201,
    }),
    ...handlers,
  });
  return { server, tab, ...renderApp('/pack/station') };
}

const contents = () => screen.getByRole('checkbox', { name: /Contents complete/ });
const internal = () => screen.getByRole('checkbox', { name: /Internal CI/ });
const external = () => screen.getByRole('checkbox', { name: /External CI/ });
const printButton = () => screen.getByRole('button', { name: /^Print \d+ label/ });

describe('the packing station', () => {
  it('asks for an item first', async () => {
    open();
    expect(await screen.findByText('Scan the maker’s code, or choose an item')).toBeVisible();
    expect(screen.queryByRole('checkbox')).toBeNull();
  });

  it('prints nothing until contents and internal CI are each confirmed, and says what is missing', async () => {
    const { user, server } = open();
    await user.click(await screen.findByRole('button', { name: /Mayo scissors/ }));
    await user.click(printButton());
    expect(screen.getAllByText('Confirm first that the contents are complete and in order.')[0]).toBeInTheDocument();
    await user.click(contents());
    await user.click(printButton());
    expect(screen.getAllByText('Place the internal CI first, then say so here.')[0]).toBeInTheDocument();
    expect(server.callsTo('POST', '/api/packages')).toEqual([]);
  });

  it('reminds of the inner pouch where an item goes into two', async () => {
    const twice = { ...scissors, packaging: 'double-pouch' as const };
    const { user } = open({
      'GET /api/items': () => ({ json: { items: [twice, plates], total: 2, page: 1, pageSize: 200 } }),
    });
    await user.click(await screen.findByRole('button', { name: /Mayo scissors curved/ }));
    expect(contents()).toHaveAccessibleDescription(/inner pouch is not folded/);
  });

  it('makes the packages, then their labels, shows the codes and opens the labels', async () => {
    const { user, server, tab } = open();
    await user.click(await screen.findByRole('button', { name: /Mayo scissors/ }));
    await user.click(contents());
    await user.click(internal());
    await user.click(external());
    await user.click(screen.getByRole('button', { name: 'One more' }));
    await user.type(screen.getByRole('textbox', { name: /Goes to/ }), 'Room 4');
    await user.click(screen.getByRole('button', { name: 'Print 2 labels' }));

    expect(await screen.findByRole('heading', { name: '2 × Mayo scissors curved' })).toBeVisible();
    const [packed] = server.callsTo('POST', '/api/packages');
    expect(packed?.body).toMatchObject({
      itemId: scissors.id,
      quantity: 2,
      isContentsConfirmed: true,
      hasInternalIndicator: true,
      hasExternalIndicator: true,
      destination: 'Room 4',
    });
    const codes = within(screen.getByRole('list', { name: 'Codes' })).getAllByRole('listitem');
    expect(codes.map((code) => code.textContent)).toEqual(made.map((one) => one.code));
    const link = await screen.findByRole('link', { name: 'Open the labels' });
    expect(link).toHaveAttribute('href', pdf);
    expect(server.callsTo('POST', '/api/packages/labels')[0]?.body).toMatchObject({
      packageIds: made.map((one) => one.id),
      layout: 'single',
    });
    expect(tab.location.replace).toHaveBeenCalledWith(new URL(pdf, window.location.href).href);
  });

  it('sends the same request id when silence is answered with another press, and another one for another statement', async () => {
    let isSilent = true;
    const { user, server, tab } = open({
      'POST /api/packages': () =>
        isSilent ? { silence: true } : { json: { packages: made.slice(0, 1), warnings: [] }, status: 201 },
    });
    await user.click(await screen.findByRole('button', { name: /Mayo scissors/ }));
    await user.click(contents());
    await user.click(internal());
    await user.click(printButton());
    expect(await screen.findByText(/The server did not answer/)).toBeVisible();
    expect(tab.close).toHaveBeenCalled();
    await user.click(printButton());
    await waitFor(() => {
      expect(server.callsTo('POST', '/api/packages')).toHaveLength(2);
    });
    await user.click(external());
    isSilent = false;
    await user.click(printButton());
    await screen.findByRole('link', { name: 'Open the labels' });
    const ids = server.callsTo('POST', '/api/packages').map((call) => (call.body as { requestId: string }).requestId);
    expect(ids[1]).toBe(ids[0]);
    expect(ids[2]).not.toBe(ids[0]);
  });

  it('keeps the packages when only the labels fail, and prints them with the same request id', async () => {
    let fails = true;
    const { user, server } = open({
      'POST /api/packages/labels': () =>
        fails
          ? { problem: 'server.failed', status: 500, detail: 'Nothing was changed.' }
          : { json: { labels: [{ packageId: made[0]?.id, copy: 1 }], pdf }, status: 201 },
    });
    await user.click(await screen.findByRole('button', { name: /Mayo scissors/ }));
    await user.click(contents());
    await user.click(internal());
    await user.click(printButton());
    expect(await screen.findByText(/The packages are made, the labels are not/)).toBeVisible();
    fails = false;
    await user.click(screen.getByRole('button', { name: 'Print the labels' }));
    await screen.findByRole('link', { name: 'Open the labels' });
    expect(server.callsTo('POST', '/api/packages')).toHaveLength(1);
    const ids = server
      .callsTo('POST', '/api/packages/labels')
      .map((call) => (call.body as { requestId: string }).requestId);
    expect(ids[1]).toBe(ids[0]);
  });

  it('forgets what was said when another item is chosen', async () => {
    const { user } = open();
    await user.click(await screen.findByRole('button', { name: /Mayo scissors/ }));
    await user.click(contents());
    await user.click(internal());
    await user.click(screen.getByRole('button', { name: /Ortho small fragment/ }));
    expect(contents()).not.toBeChecked();
    expect(internal()).not.toBeChecked();
  });

  it('warns when no instructions for use are on file, and prints all the same', async () => {
    const { user } = open();
    await user.click(await screen.findByRole('button', { name: /Ortho small fragment/ }));
    await user.click(contents());
    await user.click(internal());
    await user.click(external());
    expect(screen.getByText(/No instructions for use are on file for C-05/)).toBeVisible();
    await user.click(printButton());
    expect(await screen.findByRole('link', { name: 'Open the labels' })).toBeVisible();
  });

  it('takes 1 to 50 packages', async () => {
    const { user } = open();
    await user.click(await screen.findByRole('button', { name: /Mayo scissors/ }));
    await user.click(contents());
    await user.click(internal());
    const field = screen.getByRole('textbox', { name: 'How many' });
    for (const wrong of ['0', '51', '1.5', 'two']) {
      await user.clear(field);
      await user.type(field, wrong);
      await user.click(screen.getByRole('button', { name: 'Print labels' }));
      expect(screen.getAllByText('Say first how many packages.')[0]).toBeInTheDocument();
    }
    await user.clear(field);
    await user.type(field, '50');
    expect(screen.getByRole('button', { name: 'Print 50 labels' })).toBeVisible();
  });

  it('chooses the item whose maker’s code is scanned', async () => {
    const { server } = open({
      'POST /api/packages/identify': () => ({
        json: {
          found: 'item',
          item: {
            id: plates.id,
            code: plates.code,
            name: plates.name,
            kind: plates.kind,
            isImplant: true,
            isRetired: false,
          },
          sentence: 'C-05 Ortho small fragment.',
        },
      }),
    });
    await screen.findByText('Scan the maker’s code, or choose an item');
    wedge('0109506000134352');
    expect(await screen.findByRole('heading', { name: 'Ortho small fragment' })).toBeVisible();
    expect(server.callsTo('POST', '/api/packages/identify')[0]?.body).toEqual({ raw: '0109506000134352' });
    expect(contents()).not.toBeChecked();
  });

  it('says in words that a scan is not known, and changes nothing', async () => {
    open({
      'POST /api/packages/identify': () => ({
        json: { found: 'nothing', sentence: 'No item in this catalogue has this device identifier.' },
      }),
    });
    await screen.findByText('Scan the maker’s code, or choose an item');
    wedge('0109506000134369');
    expect(await screen.findAllByText('No item in this catalogue has this device identifier.')).not.toEqual([]);
    expect(screen.queryByRole('checkbox')).toBeNull();
  });

  it('shows a package when its own label is scanned', async () => {
    open({
      'POST /api/packages/identify': () => ({
        json: { found: 'package', package: aPackage, sentence: 'P-20431784-52 is a package of Mayo scissors curved.' },
      }),
      [`GET /api/packages/${aPackage.id}`]: () => ({
        json: {
          package: aPackage,
          isContentsConfirmed: true,
          hasInternalIndicator: true,
          hasExternalIndicator: true,
          labelPrints: [],
          history: [{ id: '1', at: '2026-03-17T08:00:00.000Z', who: 'Dele Oyelaran', sentence: 'Packed' }],
        },
      }),
    });
    await screen.findByText('Scan the maker’s code, or choose an item');
    wedge('P2043178452');
    const sheet = await screen.findByRole('dialog', { name: 'Mayo scissors curved' });
    expect(await within(sheet).findByText('P-20431784-52')).toBeVisible();
  });

  it('stages what was packed into a run', async () => {
    const { user, server } = open({
      [`POST /api/runs/${runId}/packages`]: () => ({ json: { staged: 2 } }),
    });
    await user.click(await screen.findByRole('button', { name: /Mayo scissors/ }));
    await user.click(contents());
    await user.click(internal());
    await user.click(printButton());
    await user.selectOptions(await screen.findByRole('combobox', { name: 'Stage into a run' }), runId);
    await user.click(screen.getByRole('button', { name: 'Stage 2' }));
    expect(await screen.findByText('2 packages staged into “Mixed sets”')).toBeVisible();
    expect(server.callsTo('POST', `/api/runs/${runId}/packages`)[0]?.body).toMatchObject({
      packageIds: made.map((one) => one.id),
    });
  });
});
