import type { Today, Wait } from '#contract/today';
import type { Role } from '#domain/access/permissions';
import { screen, within } from '@testing-library/react';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer } from '../../support/server-stub';
import { aDay, aLoad, aRun, aSterilizer } from './a-day';

beforeEach(() => {
  // jsdom measures nothing: the screen then draws at the width of a tablet.
  vi.stubGlobal(
    'ResizeObserver',
    class {
      observe() {
        return undefined;
      }
      unobserve() {
        return undefined;
      }
      disconnect() {
        return undefined;
      }
    },
  );
});

function open(today: Today, role: Role = 'lead') {
  const server = stubServer({
    'GET /api/session': () => ({ json: aSession(role) }),
    'GET /api/today': () => ({ json: today }),
  });
  return { server, ...renderApp('/') };
}

const lanes = () => screen.findByRole('region', { name: 'Sterilizers today' });

describe('Today', () => {
  it('says the day, the shift and how many loads are being built', async () => {
    open(aDay({ sterilizers: [aSterilizer({ loads: [aLoad()] })] }));
    expect(await screen.findByText('Day shift to 15:00')).toBeVisible();
    expect(screen.getByText('1 load being built')).toBeVisible();
  });

  it('draws each load on its sterilizer as a way to it', async () => {
    open(aDay({ sterilizers: [aSterilizer({ loads: [aLoad()] })] }));
    const load = within(await lanes()).getByRole('link', { name: /Load 1-26076-01/ });
    expect(load).toHaveAttribute('href', '/loads/0190f000-0000-7000-8000-000000000701');
    expect(load).toHaveTextContent('12 of 29');
  });

  it('tells of each sterilizer whether its air removal passed, failed, or is not yet tested', async () => {
    const missing = aSterilizer({ id: '0190f000-0000-7000-8000-000000000602', name: 'Sterilizer 2', tests: [] });
    const failed = aSterilizer({
      id: '0190f000-0000-7000-8000-000000000603',
      name: 'Sterilizer 3',
      tests: [
        {
          id: '0190f000-0000-7000-8000-000000000803',
          result: 'failed',
          testedAt: '2026-03-17T05:48:00.000Z',
          readBy: 'Joanna Prusak',
        },
      ],
    });
    const small = aSterilizer({
      id: '0190f000-0000-7000-8000-000000000604',
      name: 'Sterilizer 4',
      needsAirRemovalTest: false,
      tests: [],
    });
    open(aDay({ sterilizers: [aSterilizer(), missing, failed, small] }));
    const rows = within(await lanes()).getAllByRole('listitem');
    expect(rows[0]).toHaveTextContent('Air removal passed 05:55');
    expect(rows[1]).toHaveTextContent('Air removal not yet tested');
    expect(rows[2]).toHaveTextContent('Air removal failed 05:48');
    expect(rows[3]).toHaveTextContent('No air removal test asked');
  });

  it('says that a sterilizer is out of service', async () => {
    open(aDay({ sterilizers: [aSterilizer({ serviceState: 'out-of-service' })] }));
    expect(within(await lanes()).getAllByText('Out of service')[0]).toBeVisible();
  });

  const waits: readonly Wait[] = [
    {
      kind: 'air-removal-missing',
      sterilizerId: '0190f000-0000-7000-8000-000000000602',
      title: 'Air removal of Sterilizer 2 not yet recorded',
      detail: 'No load closes on it before the test of the day has passed.',
    },
    {
      kind: 'load-building',
      loadId: '0190f000-0000-7000-8000-000000000701',
      title: 'Load 1-26076-01, 12 of 29 scanned',
      detail: 'Cart 3, opened by you.',
    },
    {
      kind: 'run-waiting',
      runId: '0190f000-0000-7000-8000-000000000501',
      wantedAt: '2026-03-17T12:00:00.000Z',
      title: 'Mixed sets, 30 packages',
      detail: 'For Sterilizer 1, 1 implant',
    },
  ];

  it('puts what waits in order, each with its act', async () => {
    open(aDay({ waits: [...waits] }));
    const panel = await screen.findByRole('region', { name: 'Waits for you, 3' });
    expect(within(panel).getByText('as lead')).toBeVisible();
    const rows = within(panel).getAllByRole('listitem');
    expect(within(rows[0] as HTMLElement).getByRole('link', { name: 'Record it' })).toHaveAttribute(
      'href',
      '/stock/air-removal?sterilizer=0190f000-0000-7000-8000-000000000602',
    );
    expect(within(rows[1] as HTMLElement).getByRole('link', { name: 'Open' })).toHaveAttribute(
      'href',
      '/loads/0190f000-0000-7000-8000-000000000701',
    );
    expect(within(rows[2] as HTMLElement).getByRole('button', { name: 'Open a load' })).toBeVisible();
  });

  it('opens the sheet for a load with the run that waits', async () => {
    const { user, server } = open(aDay({ waits: [...waits] }));
    server.handlers['GET /api/loads/opening-options'] = () => ({
      json: {
        sterilizers: [],
        runs: [
          {
            id: '0190f000-0000-7000-8000-000000000501',
            name: 'Mixed sets',
            packages: 30,
            implants: 1,
            sterilizerId: null,
            programId: null,
            wantedAt: null,
          },
        ],
      },
    });
    await user.click(await screen.findByRole('button', { name: 'Open a load' }));
    const sheet = await screen.findByRole('dialog', { name: 'Open a load' });
    expect(await within(sheet).findByRole('combobox', { name: /Packages/ })).toHaveValue(
      '0190f000-0000-7000-8000-000000000501',
    );
  });

  it('says that nothing waits', async () => {
    open(aDay());
    const panel = await screen.findByRole('region', { name: 'Waits for you' });
    expect(within(panel).getByText('Nothing waits for you now.')).toBeVisible();
  });

  it('tells of each cart what stands on it, and names the empty ones together', async () => {
    const cart = { code: 'C', isUsable: true, note: '', load: null };
    open(
      aDay({
        carts: [
          {
            ...cart,
            id: '0190f000-0000-7000-8000-000000000901',
            name: 'Cart 1',
            load: {
              id: '0190f000-0000-7000-8000-000000000701',
              number: '1-26076-01',
              state: 'building',
              openedBy: 'Ines Marchetti',
              listed: 29,
              scanned: 12,
            },
          },
          { ...cart, id: '0190f000-0000-7000-8000-000000000902', name: 'Cart 2' },
          { ...cart, id: '0190f000-0000-7000-8000-000000000903', name: 'Cart 3' },
          {
            ...cart,
            id: '0190f000-0000-7000-8000-000000000904',
            name: 'Cart 7',
            isUsable: false,
            note: 'Wheel broken',
          },
        ],
      }),
    );
    const panel = await screen.findByRole('region', { name: 'Carts' });
    const rows = within(panel)
      .getAllByRole('listitem')
      .map((row) => row.textContent);
    expect(rows).toEqual([
      'Cart 1Loading, 12 of 29 scannedInes Marchetti1-26076-01',
      'Cart 7Not to be usedWheel broken',
      'EmptyCart 2, Cart 3',
    ]);
  });

  it('leads to runs only whoever packs', async () => {
    const runs = [aRun()];
    const { unmount } = open(aDay({ runs }), 'technician');
    const panel = await screen.findByRole('region', { name: 'Asked for next' });
    expect(within(panel).getByRole('link', { name: 'Mixed sets' })).toBeVisible();
    unmount();
    open(aDay({ runs }), 'operating-room');
    const seen = await screen.findByRole('region', { name: 'Asked for next' });
    expect(within(seen).getByText('Mixed sets')).toBeVisible();
    expect(within(seen).queryByRole('link')).toBeNull();
  });
});
