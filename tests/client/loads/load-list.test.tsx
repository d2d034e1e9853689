import type { LoadSummary } from '#contract/loads';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer, type Call } from '../../support/server-stub';

function aLoad(number: number): LoadSummary {
  const idOf = (part: string) => `0190f000-0000-7000-8000-00000000${part}${String(number).padStart(2, '0')}`;
  return {
    id: idOf('07'),
    number: `1-26062-${String(number).padStart(2, '0')}`,
    state: 'building',
    sterilizer: { id: idOf('06'), code: 'ST-1', name: 'Sterilizer 1' },
    program: { id: idOf('09'), code: 'W4-20', name: 'Wrapped' },
    cart: { id: idOf('08'), code: 'C1', name: 'Cart 1' },
    openedBy: 'Dele Oyelaran',
    openedAt: '2026-03-03T09:00:00.000Z',
    closedBy: null,
    closedAt: null,
    listed: 3,
    scanned: 1,
    implants: 0,
    version: 1,
  };
}

function stubLoads() {
  return stubServer({
    'GET /api/session': () => ({ json: aSession('technician') }),
    'GET /api/loads': ({ search }: Call) => {
      const olderThan = new URLSearchParams(search).get('olderThan');
      return {
        json:
          olderThan === null
            ? { loads: [aLoad(4), aLoad(3)], hasOlder: true }
            : { loads: [aLoad(2), aLoad(1)], hasOlder: false },
      };
    },
  });
}

describe('the list of loads', () => {
  it('shows older ones below when asked, until there are none', async () => {
    const server = stubLoads();
    const { user } = renderApp('/loads');
    const table = await screen.findByRole('table', { name: 'Loads' });
    expect(within(table).getAllByRole('row')).toHaveLength(3);
    await user.click(screen.getByRole('button', { name: 'Show older loads' }));
    await waitFor(() => {
      expect(within(table).getAllByRole('row')).toHaveLength(5);
    });
    expect(server.callsTo('GET', '/api/loads').at(-1)?.search).toContain(`olderThan=${aLoad(3).id}`);
    expect(screen.queryByRole('button', { name: 'Show older loads' })).toBeNull();
  });

  it('says why older ones did not come, keeps those that are there, and tries again', async () => {
    const server = stubLoads();
    const { user } = renderApp('/loads');
    await screen.findByRole('table', { name: 'Loads' });
    const answer = server.handlers['GET /api/loads'];
    server.handlers['GET /api/loads'] = () => ({ problem: 'server.failed', status: 500, detail: 'Try again later.' });
    await user.click(screen.getByRole('button', { name: 'Show older loads' }));
    expect(await screen.findByText('Try again later.')).toBeVisible();
    expect(screen.getAllByRole('row')).toHaveLength(3);
    if (answer) server.handlers['GET /api/loads'] = answer;
    await user.click(screen.getByRole('button', { name: 'Show older loads' }));
    await waitFor(() => {
      expect(screen.getAllByRole('row')).toHaveLength(5);
    });
  });
});
