import type { CartOnFile, HolderOnFile, ProgramOnFile, SterilizerOnFile } from '#contract/equipment';
import { cartSchema, holderKindSchema, holderSchema, programSchema, sterilizerSchema } from '#contract/equipment';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { demonstrationHolderKinds } from '../../../seeds/demonstration-equipment-plan';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer } from '../../support/server-stub';

function id(number: number): string {
  return `0190f000-0000-7000-8000-${String(number).padStart(12, '0')}`;
}

const sterilizers: readonly SterilizerOnFile[] = [
  { number: '1', airRemoval: { result: 'passed', testedAt: '2026-03-03T05:40:00.000Z' }, serviceState: 'in-service' },
  { number: '3', airRemoval: null, serviceState: 'in-service' },
  {
    number: '4',
    airRemoval: { result: 'failed', testedAt: '2026-03-03T06:10:00.000Z' },
    serviceState: 'out-of-service',
  },
].map((one) =>
  sterilizerSchema.parse({
    id: id(Number(one.number)),
    version: 2,
    code: `ST-${one.number}`,
    name: `Sterilizer ${one.number}`,
    sizeClass: 'large',
    chamberWidthMm: 620,
    chamberDepthMm: 1250,
    chamberHeightMm: 700,
    drainXMm: 280,
    drainYMm: 90,
    greatestLoadMassKg: 100,
    steamLine: 'A',
    hasAirDetector: false,
    needsAirRemovalTest: true,
    qualifiedPrograms: ['W4-20', 'W4-30'],
    otherPrograms: one.number === '3' ? ['W3-16'] : [],
    ...one,
  }),
);

const cart: CartOnFile = cartSchema.parse({
  id: id(70),
  version: 3,
  code: 'C7',
  name: 'Cart 7',
  sizeClass: 'large',
  isUsable: true,
  note: 'Upper shelf is bent',
  shelves: [
    { level: 1, name: 'Lower shelf', isUsable: true, clearHeightMm: 340, greatestMassKg: 60 },
    { level: 2, name: 'Upper shelf', isUsable: false, clearHeightMm: 270, greatestMassKg: 50 },
  ].map((shelf) => ({
    ...shelf,
    id: id(70 + shelf.level),
    placeCode: `S-0000${String(shelf.level)}-00`,
    widthMm: 560,
    depthMm: 1150,
    surface: 'wire',
  })),
});

const holder: HolderOnFile = holderSchema.parse({
  id: id(80),
  version: 1,
  name: 'RS-1',
  kind: 'RS',
  kindName: 'Small pouch rack',
  holderKindId: id(81),
  condition: 'good',
  placeCode: 'H-00016-19',
});

const kind = holderKindSchema.parse({
  ...demonstrationHolderKinds[0],
  id: id(81),
  version: 1,
  coded: 5,
  inGoodOrder: 4,
});

const program: ProgramOnFile = programSchema.parse({
  id: id(90),
  version: 1,
  code: 'W4-30',
  name: 'Wrapped',
  type: 'dynamic-air-removal',
  temperatureC: 132,
  exposureS: 240,
  dryS: 1800,
  greatestLoadMassKg: null,
  isRetired: false,
  qualifiedOn: [],
});

function listOf(name: string, rows: readonly unknown[]) {
  return () => ({ json: { [name]: rows, total: rows.length, page: 1, pageSize: 100 } });
}

function stubStock(role: Parameters<typeof aSession>[0], more: Parameters<typeof stubServer>[0] = {}) {
  return stubServer({
    'GET /api/session': () => ({ json: aSession(role) }),
    'GET /api/sterilizers': listOf('sterilizers', sterilizers),
    'GET /api/carts': listOf('carts', [cart]),
    'GET /api/holders': listOf('holders', [holder]),
    'GET /api/holder-kinds': listOf('holderKinds', [kind]),
    'GET /api/programs': listOf('programs', [program]),
    ...more,
  });
}

describe('the stock', () => {
  it('shows the shelves a role may see', async () => {
    stubStock('operating-room', { 'GET /api/items': listOf('items', []) });
    renderApp('/stock/items');
    const tabs = await screen.findByRole('navigation', { name: 'Stock' });
    expect(
      within(tabs)
        .getAllByRole('link')
        .map((link) => link.textContent),
    ).toEqual(['Items']);
  });

  it('says that there is no such shelf', async () => {
    stubStock('engineer');
    renderApp('/stock/chairs');
    expect(await screen.findByText('There is no such shelf in the stock.')).toBeInTheDocument();
  });
});

describe('sterilizers', () => {
  it('say whether each may be used today', async () => {
    stubStock('technician');
    renderApp('/stock/sterilizers');
    const rows = within(await screen.findByRole('table', { name: 'sterilizers' }))
      .getAllByRole('row')
      .slice(1);
    expect(rows.map((row) => row.textContent)).toEqual([
      expect.stringContaining('Passed 05:40'),
      expect.stringContaining('Not yet'),
      expect.stringContaining('Failed 06:10'),
    ]);
    expect(rows[2]).toHaveTextContent('Out of service');
  });

  it('lead to the form of the air-removal test, and draw the chamber', async () => {
    stubStock('technician');
    const { user } = renderApp('/stock/sterilizers');
    await user.click(await screen.findByRole('button', { name: 'Sterilizer 3' }));
    const panel = await screen.findByRole('region', { name: 'Sterilizer 3' });
    expect(within(panel).getByRole('link', { name: 'Write down an air-removal test' })).toHaveAttribute(
      'href',
      `/stock/air-removal?sterilizer=${id(3)}`,
    );
    expect(
      within(panel).getByRole('group', { name: 'Chamber, drawn to scale: 620 × 1250 × 700 mm' }),
    ).toBeInTheDocument();
    expect(within(panel).getByText('W3-16')).toBeInTheDocument();
    expect(within(panel).queryByRole('button', { name: 'Change it' })).toBeNull();
  });

  it('are changed by who may: only what differs is sent', async () => {
    const server = stubStock('engineer', {
      [`PATCH /api/sterilizers/${id(3)}`]: () => ({ json: { ...sterilizers[1], serviceState: 'out-of-service' } }),
    });
    const { user } = renderApp(`/stock/sterilizers?open=${id(3)}`);
    await user.click(await screen.findByRole('button', { name: 'Change it' }));
    await user.selectOptions(await screen.findByRole('combobox', { name: 'Service' }), 'out-of-service');
    const other = screen.getByRole('textbox', { name: /On its panel/ });
    await user.clear(other);
    await user.click(screen.getByRole('button', { name: 'Keep the changes' }));
    await screen.findByRole('table', { name: 'sterilizers' });
    const body = server.callsTo('PATCH', `/api/sterilizers/${id(3)}`)[0]?.body;
    expect(body).toEqual({
      requestId: (body as { requestId: string }).requestId,
      version: 2,
      serviceState: 'out-of-service',
      otherPrograms: [],
    });
  });
});

describe('carts', () => {
  it('show their shelves with place codes, and which is taken out', async () => {
    stubStock('technician');
    const { user } = renderApp('/stock/carts');
    await user.click(await screen.findByRole('button', { name: 'Cart 7' }));
    const panel = await screen.findByRole('region', { name: 'Cart 7' });
    expect(within(panel).getByText('S-00002-00')).toBeInTheDocument();
    expect(within(panel).getByRole('heading', { name: /Upper shelf/ })).toHaveTextContent('Taken out');
  });

  it('are added shelf by shelf; two on one level are refused before sending', async () => {
    const server = stubStock('engineer', { 'POST /api/carts': () => ({ json: cart, status: 201 }) });
    const { user } = renderApp('/stock/carts?form=new');
    await user.type(await screen.findByRole('textbox', { name: 'Code' }), 'c9');
    const [cartName] = screen.getAllByRole('textbox', { name: 'Name' });
    if (!cartName) throw new Error('no name');
    await user.type(cartName, 'Cart 9');
    const lower = screen.getByRole('group', { name: 'Shelf 1' });
    for (const [name, figure] of [
      ['Width', '560'],
      ['Depth', '1150'],
      ['Clear height', '340'],
      ['Carries at most', '60'],
    ] as const) {
      await user.type(within(lower).getByRole('textbox', { name }), figure);
    }
    await user.click(screen.getByRole('button', { name: 'Another shelf' }));
    const upper = screen.getByRole('group', { name: 'Shelf 2' });
    const level = within(upper).getByRole('textbox', { name: 'Level' });
    await user.clear(level);
    await user.type(level, '1');
    await user.click(screen.getByRole('button', { name: 'Add the cart' }));
    expect(await screen.findByText('There are two shelves on level 1.')).toBeInTheDocument();
    expect(server.callsTo('POST', '/api/carts')).toHaveLength(0);
    await user.clear(level);
    await user.type(level, '2');
    await user.click(screen.getByRole('button', { name: 'Add the cart' }));
    await screen.findByRole('table', { name: 'carts' });
    expect(server.callsTo('POST', '/api/carts')[0]?.body).toMatchObject({
      code: 'C9',
      shelves: [
        { level: 1, widthMm: 560 },
        { level: 2, widthMm: 560 },
      ],
    });
  });
});

describe('holders', () => {
  it('change their condition with a touch', async () => {
    const server = stubStock('supervisor', {
      [`PATCH /api/holders/${id(80)}`]: () => ({ json: { ...holder, condition: 'in-repair', version: 2 } }),
    });
    const { user } = renderApp('/stock/holders');
    await user.click(await screen.findByRole('button', { name: 'RS-1' }));
    await user.click(await screen.findByRole('radio', { name: 'In repair' }));
    await waitFor(() => {
      expect(server.callsTo('PATCH', `/api/holders/${id(80)}`)[0]?.body).toMatchObject({
        version: 1,
        condition: 'in-repair',
      });
    });
  });

  it('say why a change was refused', async () => {
    stubStock('supervisor', {
      [`PATCH /api/holders/${id(80)}`]: () => ({
        problem: 'holder.changed-meanwhile',
        status: 409,
        detail: 'Somebody else changed this while you were writing.',
      }),
    });
    const { user } = renderApp(`/stock/holders?open=${id(80)}`);
    await user.click(await screen.findByRole('radio', { name: 'Missing' }));
    expect(await screen.findByText('Somebody else changed this while you were writing.')).toBeInTheDocument();
    expect(screen.getByRole('radio', { name: 'Good' })).toBeChecked();
  });

  it('are added to a kind that is there', async () => {
    const server = stubStock('supervisor', { 'POST /api/holders': () => ({ json: holder, status: 201 }) });
    const { user } = renderApp('/stock/holders?form=new');
    await user.click(await screen.findByRole('button', { name: 'Add the holder' }));
    expect(await screen.findByText('2 things to put right.')).toBeInTheDocument();
    await user.selectOptions(screen.getByRole('combobox', { name: 'Kind' }), 'RS');
    await user.type(screen.getByRole('textbox', { name: /Name/ }), 'rs-6');
    await user.click(screen.getByRole('button', { name: 'Add the holder' }));
    await screen.findByRole('table', { name: 'holders' });
    expect(server.callsTo('POST', '/api/holders')[0]?.body).toMatchObject({
      name: 'RS-6',
      kind: 'RS',
      condition: 'good',
    });
  });

  it('of a kind are drawn from the end with the greatest pouch in each slot', async () => {
    stubStock('technician');
    const { user } = renderApp('/stock/holder-kinds');
    await user.click(await screen.findByRole('button', { name: 'Small pouch rack' }));
    expect(await screen.findByRole('group', { name: /8 slots, pitch 28 mm/ })).toBeInTheDocument();
    expect(screen.getByRole('link', { name: 'Its holders, one by one' })).toHaveAttribute(
      'href',
      '/stock/holders?search=RS',
    );
  });

  it('kinds whose slots do not fit the rack are refused before sending', async () => {
    stubStock('supervisor');
    const { user } = renderApp(`/stock/holder-kinds?open=${id(81)}&form=change`);
    const pitch = await screen.findByRole('textbox', { name: /From slot to slot/ });
    await user.clear(pitch);
    await user.type(pitch, '40');
    await user.click(screen.getByRole('button', { name: 'Keep the changes' }));
    expect(await screen.findByText('8 slots of 40 mm are wider than the rack itself.')).toBeInTheDocument();
  });
});

describe('programs', () => {
  it('say on which sterilizers they are qualified, and that there is none', async () => {
    stubStock('technician');
    renderApp('/stock/programs');
    const table = await screen.findByRole('table', { name: 'programs' });
    expect(within(table).getByRole('row', { name: /W4-30/ })).toHaveTextContent('No sterilizer');
  });

  it('are written in minutes and kept in seconds', async () => {
    const server = stubStock('engineer', { [`PATCH /api/programs/${id(90)}`]: () => ({ json: program }) });
    const { user } = renderApp(`/stock/programs?open=${id(90)}&form=change`);
    const exposure = await screen.findByRole('textbox', { name: 'Exposure' });
    expect(exposure).toHaveValue('4');
    await user.clear(exposure);
    await user.type(exposure, '3.5');
    await user.click(screen.getByRole('button', { name: 'Keep the changes' }));
    await screen.findByRole('table', { name: 'programs' });
    expect(server.callsTo('PATCH', `/api/programs/${id(90)}`)[0]?.body).toMatchObject({ exposureS: 210 });
  });
});
