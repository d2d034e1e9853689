import type { PackageDetail, PackageSummary } from '#contract/packages';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer, type Answer } from '../../support/server-stub';

const runId = '0190f000-0000-7000-8000-000000000501';

function aPackage(changes: Partial<PackageSummary> = {}): PackageSummary {
  return {
    id: '0190f000-0000-7000-8000-000000000301',
    code: 'P-20431784-52',
    item: {
      id: '0190f000-0000-7000-8000-000000000201',
      code: 'P-03',
      name: 'Mayo scissors curved',
      kind: 'pouch',
      isImplant: false,
    },
    state: 'packed',
    heldReason: null,
    expiresOn: null,
    isExpired: false,
    packedAt: '2026-03-17T08:00:00.000Z',
    packedBy: 'Dele Oyelaran',
    destination: 'Room 4',
    run: null,
    openLoad: null,
    labels: 1,
    ...changes,
  };
}

const held = aPackage({
  id: '0190f000-0000-7000-8000-000000000302',
  code: 'P-20431785-49',
  heldReason: 'Seal open at one corner',
});
const staged = aPackage({
  id: '0190f000-0000-7000-8000-000000000303',
  code: 'P-20431786-46',
  state: 'staged',
  run: { id: runId, name: 'Mixed sets' },
});

function detailOf(one: PackageSummary): PackageDetail {
  return {
    package: one,
    isContentsConfirmed: true,
    hasInternalIndicator: true,
    hasExternalIndicator: false,
    labelPrints: [{ copy: 1, reason: null, printedBy: 'Dele Oyelaran', printedAt: '2026-03-17T08:01:00.000Z' }],
    history: [
      { id: '1', at: '2026-03-17T08:00:00.000Z', who: 'Dele Oyelaran', sentence: 'Packed' },
      { id: '2', at: '2026-03-17T08:01:00.000Z', who: 'Dele Oyelaran', sentence: 'Label printed' },
    ],
  };
}

function open(packages: readonly PackageSummary[], more: Record<string, () => Answer> = {}, total = packages.length) {
  vi.spyOn(window, 'open').mockReturnValue(null);
  const server = stubServer({
    'GET /api/session': () => ({ json: aSession('technician') }),
    'GET /api/packages': (call) => ({
      json: { packages, total, page: Number(new URLSearchParams(call.search).get('page') ?? 1) },
    }),
    'GET /api/runs': () => ({ json: { runs: [] } }),
    ...Object.fromEntries(
      packages.map((one) => [`GET /api/packages/${one.id}`, () => ({ json: detailOf(one) })] as const),
    ),
    ...more,
  });
  return { server, ...renderApp('/pack/packages') };
}

describe('the list of packages', () => {
  it('says of each what it is and what speaks against it, in words', async () => {
    open([aPackage(), held, staged, aPackage({ id: '0190f000-0000-7000-8000-000000000304', isExpired: true })]);
    const table = await screen.findByRole('table', { name: 'Packages' });
    const rows = within(table).getAllByRole('row').slice(1);
    expect(rows.map((row) => within(row).getAllByRole('cell')[2]?.textContent)).toEqual([
      'Packed',
      'Held',
      'Staged',
      'Past its last day',
    ]);
  });

  it('asks the server for what is searched, and begins at the first page again', async () => {
    const { user, server } = open([aPackage()], {}, 120);
    await user.click(await screen.findByRole('button', { name: 'Earlier' }));
    await waitFor(() => {
      expect(server.callsTo('GET', '/api/packages').at(-1)?.search).toContain('page=2');
    });
    await user.type(screen.getByRole('searchbox', { name: 'Find by code, item or room' }), 'mayo');
    await waitFor(() => {
      const last = new URLSearchParams(server.callsTo('GET', '/api/packages').at(-1)?.search);
      expect([last.get('search'), last.get('page'), last.get('state')]).toEqual(['mayo', '1', 'packed']);
    });
  });

  it('says so when nothing answers', async () => {
    const { user } = open([]);
    expect(await screen.findByText('Nothing is packed and free')).toBeVisible();
    await user.selectOptions(screen.getByRole('combobox', { name: 'State' }), '');
    expect(await screen.findByText('No package answers to that')).toBeVisible();
  });
});

describe('one package', () => {
  it('tells what was said of it and what happened to it', async () => {
    const { user } = open([aPackage()]);
    await user.click(await screen.findByRole('button', { name: /Mayo scissors/ }));
    const sheet = await screen.findByRole('dialog', { name: 'Mayo scissors curved' });
    expect(await within(sheet).findByText('Confirmed complete')).toBeVisible();
    expect(within(sheet).getByText('None said')).toBeVisible();
    const happened = within(sheet).getByRole('region', { name: 'What happened' });
    expect(within(happened).getAllByRole('listitem')).toHaveLength(2);
  });

  it('gets another label only with a reason', async () => {
    const one = aPackage();
    const pdf = '/api/packages/labels/0190f000-0000-7000-8000-000000000401?layout=single';
    const { user, server } = open([one], {
      'POST /api/packages/labels': () => ({ json: { labels: [{ packageId: one.id, copy: 2 }], pdf }, status: 201 }),
    });
    await user.click(await screen.findByRole('button', { name: /Mayo scissors/ }));
    await user.click(await screen.findByRole('button', { name: 'Print its label again' }));
    const ask = await screen.findByRole('alertdialog', { name: 'Print its label again?' });
    await user.click(within(ask).getByRole('button', { name: 'Print another' }));
    expect(within(ask).getByText('Write the reason in a few words.')).toBeVisible();
    expect(server.callsTo('POST', '/api/packages/labels')).toEqual([]);
    await user.type(within(ask).getByRole('textbox', { name: /Why does it need another/ }), 'Torn');
    await user.click(within(ask).getByRole('button', { name: 'Print another' }));
    expect(await screen.findByRole('link', { name: 'Open the label' })).toHaveAttribute('href', pdf);
    expect(server.callsTo('POST', '/api/packages/labels')[0]?.body).toMatchObject({
      packageIds: [one.id],
      layout: 'single',
      reason: 'Torn',
    });
  });

  it('is taken out of its run', async () => {
    const { user, server } = open([staged], {
      [`POST /api/runs/${runId}/remove`]: () => ({ json: { removed: 1 } }),
    });
    await user.click(await screen.findByRole('button', { name: /Mayo scissors/ }));
    await user.click(await screen.findByRole('button', { name: 'Take it out of “Mixed sets”' }));
    await waitFor(() => {
      expect(server.callsTo('POST', `/api/runs/${runId}/remove`)[0]?.body).toMatchObject({ packageIds: [staged.id] });
    });
  });
});
