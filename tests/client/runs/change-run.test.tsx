import type { RunSummary } from '#contract/runs';
import { screen, waitFor, within } from '@testing-library/react';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer, type Answer } from '../../support/server-stub';

const run: RunSummary = {
  id: '0190f000-0000-7000-8000-000000000501',
  name: 'Room 4',
  sterilizer: null,
  program: null,
  wantedAt: '2026-03-05T12:00:00.000Z',
  state: 'waiting',
  packages: 0,
  implants: 0,
  createdBy: 'Dele Oyelaran',
  createdAt: '2026-03-03T07:00:00.000Z',
  load: null,
  version: 4,
};

const path = `/api/runs/${run.id}`;

beforeEach(() => {
  // Only the date: what waits for an answer still waits for real. London keeps Greenwich time in March.
  vi.useFakeTimers({ toFake: ['Date'], now: new Date('2026-03-03T09:00:00Z') });
});

async function openForm(answer: () => Answer = () => ({ json: { run } })) {
  const server = stubServer({
    'GET /api/session': () => ({ json: aSession('technician') }),
    'GET /api/runs': () => ({ json: { runs: [run] } }),
    [`GET ${path}`]: () => ({ json: { run, packages: [] } }),
    [`PATCH ${path}`]: answer,
  });
  const view = renderApp(`/pack/runs/${run.id}`);
  await view.user.click(await screen.findByRole('button', { name: 'Change this run' }));
  const form = within(await screen.findByRole('dialog', { name: 'Change this run' }));
  const keep = () => view.user.click(form.getByRole('button', { name: 'Keep the changes' }));
  return { server, form, keep, ...view };
}

describe('changing a run', () => {
  it('begins with what it is, and sends another day and hour', async () => {
    const { server, form, keep, user } = await openForm();
    expect(form.getByLabelText('Name')).toHaveValue('Room 4');
    expect(form.getByLabelText('Wanted on')).toHaveDisplayValue('Thursday 5 March');
    expect(form.getByLabelText(/Wanted for/)).toHaveValue('12:00');
    await user.selectOptions(form.getByLabelText('Wanted on'), 'Tomorrow');
    await user.clear(form.getByLabelText(/Wanted for/));
    await user.type(form.getByLabelText(/Wanted for/), '0715');
    await keep();
    await waitFor(() => {
      expect(screen.queryByRole('dialog')).toBeNull();
    });
    expect(server.callsTo('PATCH', path)[0]?.body).toMatchObject({
      version: 4,
      name: 'Room 4',
      wantedAt: '2026-03-04T07:15:00.000Z',
    });
  });

  it('leaves the hour alone when only the name changes, and takes it away when it is emptied', async () => {
    const { server, form, keep, user } = await openForm();
    await user.type(form.getByLabelText('Name'), ', late');
    await keep();
    await waitFor(() => {
      expect(server.callsTo('PATCH', path)[0]?.body).toMatchObject({ name: 'Room 4, late' });
    });
    expect(server.callsTo('PATCH', path)[0]?.body).not.toHaveProperty('wantedAt');
    await user.click(await screen.findByRole('button', { name: 'Change this run' }));
    const again = within(await screen.findByRole('dialog', { name: 'Change this run' }));
    await user.clear(again.getByLabelText(/Wanted for/));
    await user.click(again.getByRole('button', { name: 'Keep the changes' }));
    await waitFor(() => {
      expect(server.callsTo('PATCH', path)[1]?.body).toMatchObject({ wantedAt: null });
    });
  });

  it('says beside the field what is no time, what is past, and that a name is missing', async () => {
    const { server, form, keep, user } = await openForm();
    await user.clear(form.getByLabelText('Name'));
    await user.clear(form.getByLabelText(/Wanted for/));
    await user.type(form.getByLabelText(/Wanted for/), '25:00');
    await keep();
    expect(await form.findByText('A time such as 14:30.')).toBeVisible();
    expect(form.getByText(/Give it a name/)).toBeVisible();
    await user.type(form.getByLabelText('Name'), 'Room 4');
    await user.selectOptions(form.getByLabelText('Wanted on'), 'Today');
    await user.clear(form.getByLabelText(/Wanted for/));
    await user.type(form.getByLabelText(/Wanted for/), '08:30');
    await keep();
    expect(await form.findByText('This is past already. Write a later time, or choose another day.')).toBeVisible();
    expect(server.callsTo('PATCH', path)).toEqual([]);
  });

  it('says that somebody else changed it meanwhile, and asks for another look', async () => {
    const { server, form, keep, user } = await openForm(() => ({
      problem: 'run.changed-meanwhile',
      status: 409,
      detail: 'Somebody else changed this run meanwhile. Look again.',
    }));
    const before = server.callsTo('GET', path).length;
    await user.type(form.getByLabelText('Name'), ' b');
    await keep();
    expect(await form.findByText('Somebody else changed this run meanwhile. Look again.')).toBeVisible();
    await waitFor(() => {
      expect(server.callsTo('GET', path).length).toBeGreaterThan(before);
    });
  });
});
