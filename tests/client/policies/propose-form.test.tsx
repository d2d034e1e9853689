import type { PolicyOverview } from '#contract/policies';
import { policyParameters } from '#domain/load/policy';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { UnitSystem } from '../../../src/lib/facility';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer } from '../../support/server-stub';
import { anOverview, proposal, sterilizerId } from './a-policy';

const clearance = 'Least clearance between packages, where their instructions are silent';

async function openForm({
  unitSystem = 'metric',
  overview = anOverview(),
}: { readonly unitSystem?: UnitSystem; readonly overview?: PolicyOverview } = {}) {
  const session = aSession('supervisor');
  const server = stubServer({
    'GET /api/session': () => ({ json: { ...session, facility: { ...session.facility, unitSystem } } }),
    'GET /api/policies': () => ({ json: overview }),
  });
  const view = renderApp('/policy/propose');
  const form = await screen.findByRole('form', { name: 'Propose a change of policy' });
  server.handlers['POST /api/policy-proposals'] = () => ({ json: { proposal }, status: 201 });
  const sent = () => server.callsTo('POST', '/api/policy-proposals').map((call) => call.body);
  const fill = async (label: string | RegExp, text: string) => {
    const field = within(form).getByLabelText(label);
    await view.user.clear(field);
    if (text !== '') await view.user.type(field, text);
    return field;
  };
  const send = () => view.user.click(within(form).getByRole('button', { name: /^Propose/ }));
  return { ...view, server, form, sent, fill, send };
}

describe('proposing a change', () => {
  it('has a field for every setting, with its range and default', async () => {
    const { form } = await openForm();
    for (const parameter of policyParameters) expect(within(form).getByLabelText(parameter.label)).toBeInTheDocument();
    expect(within(form).getByLabelText(clearance)).toHaveAccessibleDescription('0 to 200 mm, default 25 mm.');
    expect(within(form).getByLabelText(clearance)).toHaveValue('25');
    expect(within(form).getByLabelText('Least clearance to the chamber walls')).toHaveValue('40');
    expect(within(form).getByLabelText('In force from')).toHaveValue('2026-03-03');
  });

  it('sends only what differs, with the reason, the day and the version it rests on', async () => {
    const { user, form, sent, fill } = await openForm();
    await fill(clearance, '30');
    await user.selectOptions(within(form).getByLabelText('When the challenge device is missing'), 'A note');
    await user.selectOptions(within(form).getByLabelText('Sterilizer 2'), 'Not set: no finding');
    await fill('Reason', 'The makers ask for 30 mm.');
    await fill('In force from', '2026-03-10');
    expect(within(form).getByLabelText(clearance)).toHaveAccessibleDescription(/^Now 25 mm\./);
    const [changes] = within(form).getAllByRole('list', { name: 'What changes' });
    expect(changes).toHaveTextContent('25 mm→ to 30 mm');
    expect(changes).toHaveTextContent('Holds the load→ to A note');
    await user.click(within(form).getByRole('button', { name: 'Propose 3 changes' }));
    await screen.findByText('The change is proposed. Another person confirms it.');
    expect(sent()).toEqual([
      {
        requestId: expect.stringMatching(/^[0-9a-f-]{36}$/) as unknown,
        baseNumber: 2,
        changes: { packageClearanceMm: 30, challengeDeviceMissing: 'advice' },
        facingBySterilizer: { [sterilizerId]: 'alternating', '0190f000-0000-7000-8000-000000000602': 'not-set' },
        reason: 'The makers ask for 30 mm.',
        effectiveOn: '2026-03-10',
      },
    ]);
    expect(await screen.findByRole('heading', { level: 1, name: 'Policy' })).toBeInTheDocument();
  });

  it('says at each field at once what is wrong, takes the focus to the first, and sends nothing', async () => {
    const { form, sent, fill, send } = await openForm();
    const tooMuch = await fill(clearance, '201');
    const noNumber = await fill('How far a pouch on edge may lean', 'much');
    await fill('In force from', '2026-03-02');
    await send();
    await waitFor(() => {
      expect(tooMuch).toHaveAccessibleDescription(/At most 200 mm\./);
    });
    expect(noNumber).toHaveAccessibleDescription(/Please write a number\./);
    expect(noNumber).toHaveFocus();
    expect(within(form).getByLabelText('Reason')).toHaveAccessibleDescription(/Please fill this in\./);
    expect(within(form).getByLabelText('In force from')).toHaveAccessibleDescription(/Today at the earliest\./);
    expect(within(form).getByText('4 things to put right.')).toBeInTheDocument();
    expect(sent()).toEqual([]);
  });

  it('shows what the server says at its field, and keeps what was written', async () => {
    const { server, form, fill, send } = await openForm();
    server.handlers['POST /api/policy-proposals'] = () => ({
      problem: 'request.not-understood',
      status: 400,
      detail: 'No.',
      fields: [
        { pointer: '/body/changes/packageClearanceMm', detail: 'Not like this.' },
        { pointer: `/body/facingBySterilizer/${sterilizerId}`, detail: 'Gone.' },
        { pointer: '/body/effectiveOn', detail: 'Another day.' },
      ],
    });
    await fill(clearance, '31');
    await fill('Reason', 'Because.');
    await send();
    await waitFor(() => {
      expect(within(form).getByLabelText(clearance)).toHaveAccessibleDescription(/Not like this\./);
    });
    expect(within(form).getByLabelText('Sterilizer 1')).toHaveAccessibleDescription(/Gone\./);
    expect(within(form).getByLabelText('In force from')).toHaveAccessibleDescription(/Another day\./);
    expect(within(form).getByLabelText(clearance)).toHaveValue('31');
  });

  it('says that a newer version was confirmed meanwhile', async () => {
    const { server, form, fill, send } = await openForm();
    server.handlers['POST /api/policy-proposals'] = () => ({
      problem: 'policy.changed-meanwhile',
      status: 409,
      detail: 'Version 3 was confirmed meanwhile. Look at it before you propose a change.',
    });
    await fill(clearance, '31');
    await fill('Reason', 'Because.');
    await send();
    expect(await within(form).findByText(/Version 3 was confirmed meanwhile/)).toBeInTheDocument();
  });

  it('goes on under the same id when no answer came', async () => {
    const { server, sent, fill, send } = await openForm();
    server.handlers['POST /api/policy-proposals'] = () => ({ silence: true });
    await fill(clearance, '31');
    await fill('Reason', 'Because.');
    await send();
    await screen.findByText(/The server did not answer/);
    server.handlers['POST /api/policy-proposals'] = () => ({ json: { proposal }, status: 201 });
    await send();
    await screen.findByText('The change is proposed. Another person confirms it.');
    const ids = sent().map((body) => (body as { requestId: string }).requestId);
    expect(ids).toHaveLength(2);
    expect(new Set(ids).size).toBe(1);
  });

  it('says that it rests on a version to come', async () => {
    const [second, first] = anOverview().versions;
    if (!second || !first) throw new Error('two versions are needed');
    const planned = { ...second, number: 3, standing: 'planned', effectiveOn: '2026-04-01' } as const;
    const { form } = await openForm({ overview: anOverview({ versions: [planned, second, first] }) });
    expect(form).toHaveTextContent('This rests on version 3, in force from 1 April 2026');
  });
});

describe('in US customary units', () => {
  it('figures are shown and taken in inches, pounds and degrees Fahrenheit, and kept in SI', async () => {
    const { form, sent, fill, send } = await openForm({ unitSystem: 'us-customary' });
    // 25 mm / 25.4 = 0.984 in; 200 mm = 7.874 in, shown so that it is still taken.
    expect(within(form).getByLabelText(clearance)).toHaveValue('0.98');
    expect(within(form).getByLabelText(clearance)).toHaveAccessibleDescription('0 to 7.87 in, default 0.98 in.');
    // 11.3 kg / 0.45359237 = 24.91 lb; 20 °C = 68 °F; 0.1 kg/min = 0.220 lb/min.
    expect(within(form).getByLabelText(/Greatest mass of a set/)).toHaveValue('24.91');
    expect(within(form).getByLabelText('Temperature of the load when it goes in')).toHaveValue('68');
    expect(within(form).getByLabelText(/Water one minute of drying/)).toHaveValue('0.22');
    await fill(clearance, '1.5');
    await fill(/Greatest mass of a set/, '20');
    await fill('Temperature of the load when it goes in', '77');
    await fill(/Water one minute of drying/, '0.3');
    await fill('Reason', 'Because.');
    await send();
    await waitFor(() => {
      expect(sent()).toHaveLength(1);
    });
    // 1.5 × 25.4 = 38.1; 20 × 0.45359237 = 9.072; (77 − 32) / 1.8 = 25; 0.3 × 0.45359237 = 0.1361.
    expect(sent()[0]).toMatchObject({
      changes: { packageClearanceMm: 38.1, greatestSetMassKg: 9.072, startTemperatureC: 25, waterPerDryMinute: 0.1361 },
    });
  });

  it('the figure that is shown means the value it stands for, and changes nothing', async () => {
    const { form, fill } = await openForm({ unitSystem: 'us-customary' });
    await fill(clearance, '0.98');
    await fill('Least clearance to the chamber walls', '1.57');
    expect(within(form).getAllByText('Nothing changes yet').length).toBeGreaterThan(0);
  });

  it('what is out of range is said in those units', async () => {
    const { fill, send, sent } = await openForm({ unitSystem: 'us-customary' });
    const far = await fill('How far from the drain the challenge device may stand', '1');
    await fill('Reason', 'Because.');
    await send();
    await waitFor(() => {
      // 50 mm = 1.969 in, rounded inwards.
      expect(far).toHaveAccessibleDescription(/At least 1\.97 in\./);
    });
    expect(sent()).toEqual([]);
    await fill('How far from the drain the challenge device may stand', '1.97');
    await send();
    await waitFor(() => {
      expect(sent()[0]).toMatchObject({ changes: { challengeDeviceReachMm: 50 } });
    });
  });
});

describe('who may not propose', () => {
  it('or cannot because a change is open, is told so', async () => {
    stubServer({
      'GET /api/session': () => ({ json: aSession('technician') }),
      'GET /api/policies': () => ({ json: anOverview() }),
    });
    const { unmount } = renderApp('/policy/propose');
    expect(
      await screen.findByRole('heading', { name: 'A supervisor or an administrator proposes a change' }),
    ).toBeInTheDocument();
    unmount();
    stubServer({
      'GET /api/session': () => ({ json: aSession('administrator') }),
      'GET /api/policies': () => ({ json: anOverview({ proposal }) }),
    });
    renderApp('/policy/propose');
    expect(await screen.findByRole('heading', { name: 'A change is proposed already' })).toBeInTheDocument();
  });
});
