import { policyParameters } from '#domain/load/policy';
import type { Role } from '#domain/access/permissions';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer } from '../../support/server-stub';
import { anOverview, proposal, proposerId } from './a-policy';

function openPolicy(
  role: Role,
  overview = anOverview(),
  { path = '/policy/settings', id = undefined as string | undefined } = {},
) {
  const server = stubServer({
    'GET /api/session': () => ({ json: aSession(role, id === undefined ? {} : { id }) }),
    'GET /api/policies': () => ({ json: overview }),
  });
  return { ...renderApp(path), server };
}

function rowOf(label: string): HTMLElement {
  const row = screen.getByRole('heading', { level: 3, name: label }).closest('li');
  if (!row) throw new Error(`${label} stands in no row`);
  return row;
}

describe('the settings', () => {
  it('all show their value, their default and where it comes from, also to who may only look', async () => {
    openPolicy('technician');
    await screen.findByRole('heading', { level: 1, name: 'Policy' });
    for (const parameter of policyParameters) {
      expect(within(rowOf(parameter.label)).getByText(parameter.source.text, { exact: false })).toBeInTheDocument();
    }
    const wall = rowOf('Least clearance to the chamber walls');
    expect(wall).toHaveTextContent('40 mm');
    expect(wall).toHaveTextContent('default: 25 mm');
    expect(wall).toHaveTextContent('Common practice.');
    expect(rowOf('When the challenge device is missing')).toHaveTextContent('Holds the load');
    expect(rowOf('Free height kept above packages')).toHaveTextContent('the default, not in this version');
    expect(rowOf('Which way pouches on edge face')).toHaveTextContent('Sterilizer 1:Paper to paper, film to film');
    expect(screen.getByText(/version 2, in force since/)).toHaveTextContent('20 February 2026');
    expect(screen.queryByText('Propose a change')).not.toBeInTheDocument();
  });

  it('lead to the lesson of each rule that reads them', async () => {
    openPolicy('technician');
    await screen.findByRole('heading', { level: 1, name: 'Policy' });
    const margin = within(rowOf('Share of a shelf’s or a load’s mass limit held back')).getAllByRole('link');
    expect(margin.map((link) => link.getAttribute('href')).toSorted()).toEqual([
      '/lessons/load-mass',
      '/lessons/shelf-mass',
    ]);
  });

  it('show makers who contradict each other in their own words', async () => {
    openPolicy('technician');
    await screen.findByRole('heading', { level: 1, name: 'Policy' });
    expect(rowOf('Which way pouches on edge face')).toHaveTextContent('Makers of pouches contradict each other');
    expect(rowOf('Greatest mass of a set, where its instructions are silent')).toHaveTextContent(
      /11\.3 kg.*Others: 7 kg/,
    );
  });

  it('say what is proposed for them', async () => {
    openPolicy('technician', anOverview({ proposal }));
    await screen.findByRole('heading', { level: 1, name: 'Policy' });
    expect(rowOf('Least clearance between packages, where their instructions are silent')).toHaveTextContent(
      'Proposed: 30 mm',
    );
    expect(rowOf('Least clearance to the chamber walls')).not.toHaveTextContent('Proposed');
  });

  it('are for other roles than the operating room', async () => {
    openPolicy('operating-room');
    expect(await screen.findByText('This screen is for another role')).toBeInTheDocument();
  });

  it('say that they could not be fetched, and try again', async () => {
    const { server, user } = openPolicy('technician');
    server.handlers['GET /api/policies'] = () => ({ problem: 'x', status: 500, detail: 'Something broke.' });
    const again = await screen.findByRole('button', { name: 'Try again' });
    server.handlers['GET /api/policies'] = () => ({ json: anOverview() });
    await user.click(again);
    expect(await screen.findByRole('heading', { level: 1, name: 'Policy' })).toBeInTheDocument();
  });
});

describe('the versions', () => {
  it('name both people, the reason, the day and what changed; and what came to nothing', async () => {
    const { user } = openPolicy('surveyor', anOverview(), { path: '/policy/versions' });
    const versions = within(await screen.findByRole('region', { name: 'Versions, 2' })).getAllByRole('listitem');
    const [newest] = versions;
    expect(newest).toHaveTextContent('Version 2');
    expect(newest).toHaveTextContent('in force');
    expect(newest).toHaveTextContent('Proposed by Ingrid Vale, confirmed by Tomas Reyes-Lund');
    expect(newest).toHaveTextContent('The new trays stand closer to the wall.');
    const changes = within(screen.getByRole('list', { name: 'What version 2 changed' })).getAllByRole('listitem');
    expect(changes.map((one) => one.textContent)).toEqual([
      'Least clearance to the chamber wallsfrom 25 mm→ to 40 mm',
      'Sterilizer 1: which way pouches on edge facefrom As the facility’s rule→ to Paper to paper, film to film',
    ]);
    const notMade = screen.getByRole('region', { name: 'Proposed and not made, 1' });
    expect(notMade).toHaveTextContent('Tomas Reyes-Lund: “Let us look at the dry times first.”');

    await user.click(screen.getByText(`All ${policyParameters.length} settings of version 2`));
    const [settings] = screen.getAllByRole('group');
    expect(settings).toHaveTextContent('Least clearance to the chamber walls40 mm');
    expect(settings).toHaveTextContent('Free height kept above packages0 mm (the default; not in this version)');
  });

  it('show a version to come, and one that never came into force', async () => {
    const [second, first] = anOverview().versions;
    if (!second || !first) throw new Error('two versions are needed');
    openPolicy(
      'technician',
      anOverview({
        versions: [
          { ...second, number: 4, standing: 'planned', effectiveOn: '2026-04-01' },
          { ...second, number: 3, standing: 'overtaken', effectiveOn: '2026-05-01' },
          { ...second, standing: 'in-force' },
          first,
        ],
      }),
      { path: '/policy/versions' },
    );
    const entry = async (name: string) => (await screen.findByRole('heading', { name })).closest('li');
    expect(await entry('Version 4')).toHaveTextContent('to come');
    expect(await entry('Version 3')).toHaveTextContent('never in force');
  });
});

describe('a proposed change', () => {
  it('is confirmed by another person, once it was asked whether to', async () => {
    const { server, user } = openPolicy('infection-prevention', anOverview({ proposal }));
    const panel = await screen.findByRole('region', { name: '2 changes proposed' });
    expect(panel).toHaveTextContent('In force from 10 March 2026');
    expect(panel).toHaveTextContent('Ingrid Vale');
    const path = `/api/policy-proposals/${proposal.id}/confirm`;
    server.handlers[`POST ${path}`] = () => ({ json: { number: 3, effectiveOn: '2026-03-10' } });
    await user.click(within(panel).getByRole('button', { name: 'Confirm version 3' }));
    const sheet = await screen.findByRole('alertdialog', { name: 'Confirm version 3 of the policy?' });
    expect(sheet).toHaveTextContent('your name beside Ingrid Vale’s');
    expect(server.callsTo('POST', path)).toEqual([]);
    server.handlers['GET /api/policies'] = () => ({ json: anOverview() });
    await user.click(within(sheet).getByRole('button', { name: 'Confirm version 3' }));
    await screen.findByText('Version 3 is confirmed, in force from 10 March 2026.');
    expect(server.callsTo('POST', path).map((call) => call.body)).toEqual([
      { requestId: expect.stringMatching(/^[0-9a-f-]{36}$/) as unknown },
    ]);
    await waitFor(() => {
      expect(screen.queryByRole('region', { name: '2 changes proposed' })).not.toBeInTheDocument();
    });
  });

  it('says that its day has passed, and from when it then is', async () => {
    openPolicy('supervisor', anOverview({ proposal: { ...proposal, effectiveOn: '2026-03-01' } }));
    const panel = await screen.findByRole('region', { name: '2 changes proposed' });
    expect(panel).toHaveTextContent('In force from 3 March 2026, since 1 March 2026 has passed');
  });

  it('cannot be confirmed by who proposed it: the button says why, and nothing is sent', async () => {
    const { server, user } = openPolicy('supervisor', anOverview({ proposal }), { id: proposerId });
    const panel = await screen.findByRole('region', { name: '2 changes proposed' });
    const confirm = within(panel).getByRole('button', { name: 'Confirm version 3' });
    expect(confirm).toHaveAccessibleDescription('You proposed this change. Another person has to confirm it.');
    await user.click(confirm);
    expect(screen.queryByRole('alertdialog')).not.toBeInTheDocument();
    expect(within(panel).queryByRole('button', { name: 'Refuse it' })).not.toBeInTheDocument();
    expect(server.calls.filter((call) => call.method === 'POST')).toEqual([]);
    expect(screen.getByRole('button', { name: 'Propose a change' })).toHaveAttribute('aria-disabled', 'true');
  });

  it('is withdrawn by who proposed it, with a reason', async () => {
    const { server, user } = openPolicy('supervisor', anOverview({ proposal }), { id: proposerId });
    await user.click(await screen.findByRole('button', { name: 'Withdraw it' }));
    const sheet = await screen.findByRole('alertdialog');
    await user.click(within(sheet).getByRole('button', { name: 'Withdraw it' }));
    expect(within(sheet).getByLabelText('Why')).toHaveAccessibleDescription(/Write the reason/);
    const path = `/api/policy-proposals/${proposal.id}/withdraw`;
    expect(server.callsTo('POST', path)).toEqual([]);
    server.handlers[`POST ${path}`] = () => ({ nothing: true });
    await user.type(within(sheet).getByLabelText('Why'), 'I was wrong.');
    await user.click(within(sheet).getByRole('button', { name: 'Withdraw it' }));
    await screen.findByText('The change is withdrawn.');
    expect(server.callsTo('POST', path)[0]?.body).toMatchObject({ reason: 'I was wrong.' });
  });

  it('is refused by another person; when somebody was first, that is said and looked at again', async () => {
    const { server, user } = openPolicy('administrator', anOverview({ proposal }));
    await user.click(await screen.findByRole('button', { name: 'Refuse it' }));
    const sheet = await screen.findByRole('alertdialog');
    server.handlers[`POST /api/policy-proposals/${proposal.id}/refuse`] = () => ({
      problem: 'policy.proposal-settled',
      status: 409,
      detail: 'This change is confirmed already.',
    });
    const looked = server.callsTo('GET', '/api/policies').length;
    await user.type(within(sheet).getByLabelText('Why'), 'Too soon.');
    await user.click(within(sheet).getByRole('button', { name: 'Refuse it' }));
    expect(await within(sheet).findByText('This change is confirmed already.')).toBeInTheDocument();
    await waitFor(() => {
      expect(server.callsTo('GET', '/api/policies').length).toBeGreaterThan(looked);
    });
  });

  it('offers nothing to do to who may only look', async () => {
    openPolicy('technician', anOverview({ proposal }));
    const panel = await screen.findByRole('region', { name: '2 changes proposed' });
    expect(within(panel).queryAllByRole('button')).toEqual([]);
    expect(panel).toHaveTextContent('never who proposed it');
  });
});
