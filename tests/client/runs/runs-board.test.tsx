import type { PackageSummary } from '#contract/packages';
import type { RunSummary } from '#contract/runs';
import type { Role } from '#domain/access/permissions';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { aSession, renderApp } from '../../support/render-app';
import { wedge } from '../../support/scanner';
import { stubServer, type Answer } from '../../support/server-stub';

function aRun(changes: Partial<RunSummary> = {}): RunSummary {
  return {
    id: '0190f000-0000-7000-8000-000000000501',
    name: 'Mixed sets',
    sterilizer: { id: '0190f000-0000-7000-8000-000000000601', code: 'ST-1', name: 'Sterilizer 1' },
    program: { id: '0190f000-0000-7000-8000-000000000602', code: 'W4-20', name: 'Wrapped, dry 20 min' },
    wantedAt: null,
    state: 'waiting',
    packages: 2,
    implants: 1,
    createdBy: 'Dele Oyelaran',
    createdAt: '2026-03-17T07:00:00.000Z',
    load: null,
    version: 1,
    ...changes,
  };
}

const first = aRun();
const second = aRun({
  id: '0190f000-0000-7000-8000-000000000502',
  name: 'Orthopaedics',
  sterilizer: null,
  program: null,
  packages: 0,
  implants: 0,
});

function aPackage(id: string, code: string, isImplant: boolean): PackageSummary {
  return {
    id,
    code,
    item: { id: '0190f000-0000-7000-8000-000000000201', code: 'P-20', name: 'K-wire tube', kind: 'pouch', isImplant },
    state: 'staged',
    heldReason: null,
    expiresOn: null,
    isExpired: false,
    packedAt: '2026-03-17T08:00:00.000Z',
    packedBy: 'Dele Oyelaran',
    destination: '',
    run: { id: first.id, name: first.name },
    openLoad: null,
    labels: 1,
  };
}

const packages = [
  aPackage('0190f000-0000-7000-8000-000000000301', 'P-20431784-52', true),
  aPackage('0190f000-0000-7000-8000-000000000302', 'P-20431785-49', false),
];

function open(path: string, more: Record<string, () => Answer> = {}, role: Role = 'technician') {
  const server = stubServer({
    'GET /api/session': () => ({ json: aSession(role) }),
    'GET /api/runs': () => ({ json: { runs: [first, second] } }),
    [`GET /api/runs/${first.id}`]: () => ({ json: { run: first, packages } }),
    [`GET /api/runs/${second.id}`]: () => ({ json: { run: second, packages: [] } }),
    ...more,
  });
  return { server, ...renderApp(path) };
}

const scanPath = `/api/runs/${first.id}/scan`;

describe('the runs board', () => {
  it('shows the run that is wanted first, with what waits in it by kind', async () => {
    open('/pack/runs');
    const run = await screen.findByRole('region', { name: 'Mixed sets' });
    expect(within(run).getByText('2 pouches')).toBeVisible();
    expect(within(run).getByText('1 implant')).toBeVisible();
    expect(within(within(run).getByRole('table')).getAllByRole('row')).toHaveLength(3);
    const list = screen.getByRole('navigation', { name: 'Runs that wait' });
    expect(within(list).getByRole('link', { name: /Mixed sets/ })).toHaveAttribute('aria-current', 'page');
  });

  it('leads to another run by its address', async () => {
    const { user, router } = open('/pack/runs');
    await user.click(await screen.findByRole('link', { name: /Orthopaedics/ }));
    expect(await screen.findByRole('region', { name: 'Orthopaedics' })).toBeVisible();
    expect(router.state.location.pathname).toBe(`/pack/runs/${second.id}`);
  });

  it('says why the load of an empty run cannot be opened', async () => {
    const { user } = open(`/pack/runs/${second.id}`);
    await user.click(await screen.findByRole('button', { name: 'Open its load' }));
    expect(screen.getAllByText('Nothing waits in this run yet. Scan packages into it.')[0]).toBeInTheDocument();
  });

  const answers = [
    { answer: 'taken', look: null, word: 'Taken', sentence: 'K-wire tube waits in “Mixed sets”.' },
    {
      answer: 'taken',
      look: 'program-not-permitted',
      word: 'Taken',
      sentence: 'Its instructions for use do not permit W4-20. In that load it will be in the way.',
    },
    { answer: 'already-here', look: null, word: 'In it', sentence: 'P-20431786-46 waits in “Mixed sets” already.' },
    {
      answer: 'not-ready',
      look: null,
      word: 'Not taken',
      sentence: 'P-20431786-46 waits in “Late”. Take it out there first.',
    },
    { answer: 'held', look: null, word: 'Held', sentence: 'P-20431786-46 is held: Seal open. Ask your lead.' },
    { answer: 'called-back', look: null, word: 'Call back', sentence: 'P-20431786-46 is called back. Set it apart.' },
  ] as const;

  it.each(answers)(
    'answers a scan with $word ($answer, $look) and its sentence',
    async ({ answer, look, word, sentence }) => {
      const { server } = open('/pack/runs', {
        [`POST ${scanPath}`]: () => ({
          json: {
            answer,
            look,
            sentence,
            code: 'P-20431786-46',
            package: { id: '0190f000-0000-7000-8000-000000000303', code: 'P-20431786-46', itemName: 'K-wire tube' },
          },
        }),
      });
      await screen.findByText('Scan packages into this run');
      wedge('P2043178646');
      const line = await screen.findByRole('region', { name: 'Last scan' });
      expect(await within(line).findByText(word)).toBeVisible();
      expect(screen.getAllByText(sentence)[0]).toBeInTheDocument();
      expect(server.callsTo('POST', scanPath)[0]?.body).toMatchObject({ raw: 'P2043178646' });
    },
  );

  it('sends a scan again with the same id when the server is silent, and counts it once', async () => {
    let turns = 0;
    const { server } = open('/pack/runs', {
      [`POST ${scanPath}`]: () => {
        turns += 1;
        return turns === 1
          ? { silence: true }
          : {
              json: {
                answer: 'not-known',
                look: null,
                sentence: 'No package here has this code.',
                code: 'P-20431786-46',
                package: null,
              },
            };
      },
    });
    await screen.findByText('Scan packages into this run');
    wedge('P2043178646');
    expect(await screen.findAllByText('No package here has this code.')).not.toEqual([]);
    const ids = server.callsTo('POST', scanPath).map((call) => (call.body as { requestId: string }).requestId);
    expect(ids).toHaveLength(2);
    expect(ids[1]).toBe(ids[0]);
  });

  it('says what the server refused, such as a run that a load has taken', async () => {
    open('/pack/runs', {
      [`POST ${scanPath}`]: () => ({ problem: 'run.taken', status: 409, detail: 'A load has taken “Mixed sets”.' }),
    });
    await screen.findByText('Scan packages into this run');
    wedge('P2043178646');
    expect(await screen.findAllByText('A load has taken “Mixed sets”.')).not.toEqual([]);
  });

  it('asks before it drops a run', async () => {
    const { user, server, router } = open(`/pack/runs/${first.id}`, {
      [`POST /api/runs/${first.id}/drop`]: () => ({ json: { returned: 2 } }),
    });
    await user.click(await screen.findByRole('button', { name: 'Drop this run' }));
    const ask = await screen.findByRole('alertdialog');
    expect(ask).toHaveTextContent('2 packages will be packed and free again.');
    await user.click(within(ask).getByRole('button', { name: 'Leave it' }));
    expect(server.callsTo('POST', `/api/runs/${first.id}/drop`)).toEqual([]);
    await user.click(screen.getByRole('button', { name: 'Drop this run' }));
    await user.click(within(await screen.findByRole('alertdialog')).getByRole('button', { name: 'Drop the run' }));
    await waitFor(() => {
      expect(router.state.location.pathname).toBe('/pack/runs');
    });
    expect(server.callsTo('POST', `/api/runs/${first.id}/drop`)).toHaveLength(1);
  });

  it('makes a run with no more than a name', async () => {
    const { user, server, router } = open('/pack/runs', {
      'GET /api/sterilizers': () => ({ json: { sterilizers: [], total: 0, page: 1, pageSize: 200 } }),
      'GET /api/programs': () => ({ json: { programs: [], total: 0, page: 1, pageSize: 200 } }),
      'POST /api/runs': () => ({ json: { runId: second.id }, status: 201 }),
    });
    await user.click(await screen.findByRole('button', { name: 'New run' }));
    const sheet = await screen.findByRole('dialog', { name: 'New run' });
    const make = await within(sheet).findByRole('button', { name: 'Make the run' });
    await user.click(make);
    expect(await within(sheet).findByText(/Give it a name/)).toBeVisible();
    await user.type(within(sheet).getByRole('textbox', { name: 'Name' }), 'Orthopaedics');
    await user.type(within(sheet).getByRole('textbox', { name: /Wanted for/ }), '25:00');
    await user.click(make);
    expect(await within(sheet).findByText('A time such as 14:30.')).toBeVisible();
    await user.clear(within(sheet).getByRole('textbox', { name: /Wanted for/ }));
    await user.click(make);
    await waitFor(() => {
      expect(router.state.location.pathname).toBe(`/pack/runs/${second.id}`);
    });
    expect(server.callsTo('POST', '/api/runs')[0]?.body).toMatchObject({
      name: 'Orthopaedics',
      sterilizerId: null,
      programId: null,
      wantedAt: null,
    });
  });
});
