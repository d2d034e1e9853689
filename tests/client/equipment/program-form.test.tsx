import { programSchema, type ProgramOnFile } from '#contract/equipment';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer } from '../../support/server-stub';

const id = '0190f000-0000-7000-8000-000000000090';
const path = `/api/programs/${id}`;

function aProgram(qualifiedOn: readonly string[]): ProgramOnFile {
  return programSchema.parse({
    id,
    version: 3,
    code: 'W4-30',
    name: 'Wrapped',
    type: 'dynamic-air-removal',
    temperatureC: 132,
    exposureS: 240,
    dryS: 1800,
    greatestLoadMassKg: null,
    isRetired: false,
    qualifiedOn,
  });
}

async function openForm(qualifiedOn: readonly string[], unitSystem: 'metric' | 'us-customary' = 'metric') {
  const program = aProgram(qualifiedOn);
  const session = aSession('engineer');
  const server = stubServer({
    'GET /api/session': () => ({ json: { ...session, facility: { ...session.facility, unitSystem } } }),
    'GET /api/programs': () => ({ json: { programs: [program], total: 1, page: 1, pageSize: 100 } }),
    [`PATCH ${path}`]: () => ({ json: program }),
  });
  const view = renderApp(`/stock/programs?open=${id}&form=change`);
  await screen.findByRole('form', { name: 'Change W4-30' });
  const retype = async (name: string, text: string) => {
    await view.user.clear(screen.getByRole('textbox', { name }));
    await view.user.type(screen.getByRole('textbox', { name }), text);
  };
  const keep = () => view.user.click(screen.getByRole('button', { name: 'Keep the changes' }));
  return { server, retype, keep, ...view };
}

describe('changing a program that sterilizers are qualified for', () => {
  it('says beforehand what takes the qualification away, and asks before it does', async () => {
    const { server, retype, keep, user } = await openForm(['ST-1', 'ST-2']);
    expect(screen.getByText(/ST-1 and ST-2 are qualified for this cycle/)).toBeVisible();
    await retype('Dry', '20');
    await keep();
    const ask = await screen.findByRole('alertdialog', { name: 'Take the qualification for W4-30 away?' });
    expect(ask).toHaveTextContent('No load can be opened with it on ST-1 and ST-2');
    await user.click(within(ask).getByRole('button', { name: 'Leave it' }));
    expect(server.callsTo('PATCH', path)).toEqual([]);

    await keep();
    await user.click(within(await screen.findByRole('alertdialog')).getByRole('button', { name: 'Change the cycle' }));
    await waitFor(() => {
      expect(server.callsTo('PATCH', path)[0]?.body).toMatchObject({ dryS: 1200, version: 3 });
    });
    expect(await screen.findByRole('table', { name: 'programs' })).toBeVisible();
  });

  it.each(['metric', 'us-customary'] as const)('asks nothing for another name (%s)', async (unitSystem) => {
    const { server, retype, keep } = await openForm(['ST-1'], unitSystem);
    await retype('Name', 'Wrapped, dry 30 min');
    await keep();
    await screen.findByRole('table', { name: 'programs' });
    const body = server.callsTo('PATCH', path)[0]?.body;
    expect(body).toMatchObject({ name: 'Wrapped, dry 30 min' });
    expect(body).not.toHaveProperty('temperatureC');
  });

  it('asks nothing while no sterilizer is qualified for it', async () => {
    const { server, retype, keep } = await openForm([]);
    expect(screen.queryByText(/takes the qualification away/)).toBeNull();
    await retype('Dry', '20');
    await keep();
    await waitFor(() => {
      expect(server.callsTo('PATCH', path)[0]?.body).toMatchObject({ dryS: 1200 });
    });
  });

  it('says in the question what the server refused, and keeps what was filled in', async () => {
    const { server, retype, keep, user } = await openForm(['ST-1']);
    server.handlers[`PATCH ${path}`] = () => ({
      problem: 'program.changed-meanwhile',
      status: 409,
      detail: 'Somebody else changed this while you were writing. Look at it again, then repeat your change.',
    });
    await retype('Dry', '20');
    await keep();
    const ask = within(await screen.findByRole('alertdialog'));
    await user.click(ask.getByRole('button', { name: 'Change the cycle' }));
    expect(await ask.findByText(/Somebody else changed this/)).toBeVisible();
    await user.click(ask.getByRole('button', { name: 'Leave it' }));
    expect(screen.getByRole('textbox', { name: 'Dry' })).toHaveValue('20');
  });
});
