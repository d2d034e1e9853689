import type { Person } from '#contract/people';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer } from '../../support/server-stub';

const cressida: Person = {
  id: '0190f000-0000-7000-8000-000000000102',
  staffNumber: 'T9018',
  displayName: 'Cressida Holmqvist',
  initials: 'CH',
  role: 'surveyor',
  usualShift: null,
  expiresAt: '2030-07-14T21:00:17.000Z',
  isDisabled: false,
  hasBadge: false,
  badgeCode: null,
  hasPin: false,
  mustChangePassword: false,
  oneTimePasswordExpiresAt: null,
  worksElsewhere: false,
  version: 5,
};

async function openForm(act: 'Add a person' | 'Change name, role or shift') {
  const server = stubServer({
    'GET /api/session': () => ({ json: aSession('administrator') }),
    'GET /api/people': () => ({ json: { people: [cressida] } }),
  });
  const view = renderApp(`/people?person=${cressida.id}`);
  await view.user.click(await screen.findByRole('button', { name: act }));
  return { ...view, server, form: await screen.findByRole('dialog') };
}

describe('adding a person', () => {
  it('makes the initials, sends what was written, and shows the one-time password', async () => {
    const { user, server, form } = await openForm('Add a person');
    const added = { ...cressida, id: '0190f000-0000-7000-8000-000000000109', displayName: 'Ottoline Marsh-Ferreira' };
    server.handlers['POST /api/people'] = () => ({
      json: {
        person: added,
        oneTimePassword: 'g2sn-hf6f-h228-8s39',
        oneTimePasswordExpiresAt: '2030-01-02T09:17:00.000Z',
      },
      status: 201,
    });
    await user.type(within(form).getByLabelText('Staff number'), 'n4001');
    await user.type(within(form).getByLabelText('Name'), 'Ottoline Marsh-Ferreira');
    await user.tab();
    expect(within(form).getByLabelText('Initials')).toHaveValue('OMF');
    await user.selectOptions(within(form).getByLabelText('Role'), 'Technician');
    await user.type(within(form).getByLabelText(/Usual shift/), 'Night{Enter}');

    const sheet = await screen.findByRole('dialog', { name: 'One-time password for Ottoline Marsh-Ferreira' });
    expect(within(sheet).getByText('g2sn-hf6f-h228-8s39')).toBeVisible();
    const [call] = server.callsTo('POST', '/api/people');
    expect(call?.body).toEqual({
      requestId: expect.stringMatching(/^[0-9a-f-]{36}$/) as unknown,
      staffNumber: 'N4001',
      displayName: 'Ottoline Marsh-Ferreira',
      initials: 'OMF',
      role: 'technician',
      usualShift: 'Night',
      expiresAt: null,
    });
  });

  it('says at each field what is missing, takes the focus to the first, and sends nothing', async () => {
    const { user, server, form } = await openForm('Add a person');
    await user.click(within(form).getByRole('button', { name: 'Add and give a one-time password' }));
    const number = within(form).getByLabelText('Staff number');
    await waitFor(() => {
      expect(number).toHaveFocus();
    });
    expect(number).toHaveAccessibleDescription('Please fill this in.');
    expect(within(form).getByLabelText('Name')).toBeInvalid();
    expect(within(form).getByLabelText('Initials')).toBeInvalid();
    expect(within(form).getByLabelText('Role')).toHaveAccessibleDescription('Choose a role.');
    expect(server.callsTo('POST', '/api/people')).toEqual([]);
  });

  it('asks when a surveyor’s time ends', async () => {
    const { user, server, form } = await openForm('Add a person');
    await user.type(within(form).getByLabelText('Staff number'), 'N1');
    await user.type(within(form).getByLabelText('Name'), 'A Surveyor');
    await user.selectOptions(within(form).getByLabelText('Role'), 'Surveyor');
    await user.click(within(form).getByRole('button', { name: 'Add and give a one-time password' }));
    const end = within(form).getByLabelText(/Ends on/);
    await waitFor(() => {
      expect(end).toHaveAccessibleDescription(/Write when it ends/);
    });
    expect(server.callsTo('POST', '/api/people')).toEqual([]);
  });

  it('shows what the server says about a field at that field, and keeps what was written', async () => {
    const { user, server, form } = await openForm('Add a person');
    server.handlers['POST /api/people'] = () => ({
      problem: 'request.not-understood',
      status: 400,
      detail: 'staffNumber: not like this',
      fields: [{ pointer: '/body/staffNumber', detail: 'Not like this.' }],
    });
    await user.type(within(form).getByLabelText('Staff number'), 'N1');
    await user.type(within(form).getByLabelText('Name'), 'Somebody New');
    await user.selectOptions(within(form).getByLabelText('Role'), 'Lead');
    await user.click(within(form).getByRole('button', { name: 'Add and give a one-time password' }));
    await waitFor(() => {
      expect(within(form).getByLabelText('Staff number')).toHaveAccessibleDescription('Not like this.');
    });
    expect(within(form).getByLabelText('Name')).toHaveValue('Somebody New');
  });

  it('says that a staff number is taken, and goes on under the same id', async () => {
    const { user, server, form } = await openForm('Add a person');
    server.handlers['POST /api/people'] = () => ({
      problem: 'people.staff-number-taken',
      status: 409,
      detail: 'This staff number is already in use.',
    });
    await user.type(within(form).getByLabelText('Staff number'), 'N1');
    await user.type(within(form).getByLabelText('Name'), 'Somebody New');
    await user.selectOptions(within(form).getByLabelText('Role'), 'Lead');
    const send = within(form).getByRole('button', { name: 'Add and give a one-time password' });
    await user.click(send);
    expect(await within(form).findByText('This staff number is already in use.')).toBeVisible();
    await user.click(send);
    const ids = server.callsTo('POST', '/api/people').map(({ body }) => (body as { requestId: string }).requestId);
    expect(ids).toHaveLength(2);
    expect(ids[0]).toBe(ids[1]);
  });

  it('lets somebody of another facility join without a name or a password', async () => {
    const { user, server, form } = await openForm('Add a person');
    server.handlers['POST /api/people/join'] = () => ({ json: { person: cressida }, status: 201 });
    await user.click(within(form).getByRole('radio', { name: 'From another facility' }));
    expect(within(form).queryByLabelText('Name')).not.toBeInTheDocument();
    await user.type(within(form).getByLabelText('Staff number'), 'q114');
    await user.selectOptions(within(form).getByLabelText('Role'), 'Lead');
    await user.click(within(form).getByRole('button', { name: 'Let them work here' }));
    await waitFor(() => {
      expect(screen.queryByRole('dialog')).not.toBeInTheDocument();
    });
    expect(server.callsTo('POST', '/api/people/join')[0]?.body).toMatchObject({ staffNumber: 'Q114', role: 'lead' });
  });
});

describe('changing a person', () => {
  it('sends only what differs, and leaves an untouched end to the second', async () => {
    const { user, server, form } = await openForm('Change name, role or shift');
    server.handlers[`PATCH /api/people/${cressida.id}`] = () => ({ json: { person: cressida } });
    // London is an hour ahead of UTC in July.
    expect(within(form).getByLabelText(/Ends on/)).toHaveValue('2030-07-14T22:00');
    await user.type(within(form).getByLabelText(/Usual shift/), 'Day');
    await user.click(within(form).getByRole('button', { name: 'Keep the changes' }));
    await waitFor(() => {
      expect(screen.queryByRole('dialog')).not.toBeInTheDocument();
    });
    expect(server.callsTo('PATCH', `/api/people/${cressida.id}`)[0]?.body).toEqual({
      requestId: expect.any(String) as unknown,
      version: 5,
      usualShift: 'Day',
    });
  });

  it('takes the end as the wall clock of the facility shows it', async () => {
    const { user, server, form } = await openForm('Change name, role or shift');
    server.handlers[`PATCH /api/people/${cressida.id}`] = () => ({ json: { person: cressida } });
    const end = within(form).getByLabelText(/Ends on/);
    await user.clear(end);
    await user.type(end, '2030-07-15T06:30');
    await user.click(within(form).getByRole('button', { name: 'Keep the changes' }));
    await waitFor(() => {
      expect(server.callsTo('PATCH', `/api/people/${cressida.id}`)[0]?.body).toMatchObject({
        expiresAt: '2030-07-15T05:30:00.000Z',
      });
    });
  });

  it('does not undo what somebody else changed while the form was open', async () => {
    const { user, server, form } = await openForm('Change name, role or shift');
    server.handlers['GET /api/people'] = () => ({ json: { people: [{ ...cressida, initials: 'CX', version: 6 }] } });
    server.handlers[`PATCH /api/people/${cressida.id}`] = () => ({
      problem: 'people.changed-meanwhile',
      status: 409,
      detail: 'Somebody else changed this person meanwhile. Look again.',
    });
    await user.type(within(form).getByLabelText(/Usual shift/), 'Day');
    const keep = within(form).getByRole('button', { name: 'Keep the changes' });
    await user.click(keep);
    expect(await within(form).findByText(/meanwhile/)).toBeVisible();
    await waitFor(() => {
      expect(server.callsTo('GET', '/api/people')).toHaveLength(2);
    });
    await user.click(keep);
    await waitFor(() => {
      expect(server.callsTo('PATCH', `/api/people/${cressida.id}`)).toHaveLength(2);
    });
    for (const { body } of server.callsTo('PATCH', `/api/people/${cressida.id}`)) {
      expect(body).toMatchObject({ version: 5, usualShift: 'Day' });
      expect(body).not.toHaveProperty('initials');
    }
  });

  it('without a change closes and sends nothing', async () => {
    const { user, server, form } = await openForm('Change name, role or shift');
    await user.click(within(form).getByRole('button', { name: 'Keep the changes' }));
    await waitFor(() => {
      expect(screen.queryByRole('dialog')).not.toBeInTheDocument();
    });
    expect(server.calls.filter(({ method }) => method !== 'GET')).toEqual([]);
  });

  it('says what the rules do not allow, and stays open', async () => {
    const { user, server, form } = await openForm('Change name, role or shift');
    server.handlers[`PATCH /api/people/${cressida.id}`] = () => ({
      problem: 'people.last-administrator',
      status: 422,
      detail: 'This is the last administrator. Make somebody else administrator first.',
    });
    await user.selectOptions(within(form).getByLabelText('Role'), 'Lead');
    await user.click(within(form).getByRole('button', { name: 'Keep the changes' }));
    expect(await within(form).findByText(/last administrator/)).toBeVisible();
  });
});
