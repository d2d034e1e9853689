import { roles, type Role } from '#domain/access/permissions';
import { act, screen, waitFor, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { addressWithin } from '../../../src/app/address-within';
import { placesFor } from '../../../src/app/places';
import { permissionsOf } from '#domain/access/role-matrix';
import { lineStore, noteLineDown, noteLineUp } from '../../../src/lib/line';
import { aSession, nobody, renderApp } from '../../support/render-app';
import { stubServer } from '../../support/server-stub';
import { withPlainScreens } from '../session/plain-screens';

function signedInAs(role: Role) {
  return stubServer({ 'GET /api/session': () => ({ json: aSession(role) }) });
}

function railWords(): (string | null)[] {
  const [rail] = screen.getAllByRole('navigation', { name: 'Main' });
  if (!rail) throw new Error('no rail');
  return within(rail)
    .getAllByRole('link')
    .map((link) => link.textContent);
}

afterEach(() => {
  noteLineUp();
});

describe('the places of a role', () => {
  const expected: Readonly<Record<Role, readonly string[]>> = {
    technician: ['Today', 'Load', 'Pack', 'Lessons', 'Stock', 'Policy'],
    lead: ['Today', 'Load', 'Pack', 'Lessons', 'Stock', 'Policy'],
    supervisor: ['Today', 'Load', 'Pack', 'Lessons', 'Stock', 'Policy', 'People'],
    'infection-prevention': ['Today', 'Load', 'Lessons', 'Stock', 'Policy'],
    'operating-room': ['Today', 'Load', 'Lessons', 'Stock'],
    engineer: ['Today', 'Load', 'Lessons', 'Stock', 'Policy'],
    surveyor: ['Today', 'Load', 'Lessons', 'Stock', 'Policy', 'People'],
    administrator: ['Today', 'Load', 'Lessons', 'Stock', 'Policy', 'People'],
  };

  it.each(roles)('of %s are those it may go to, and no dead word', (role) => {
    expect(placesFor(permissionsOf(role)).map((place) => place.label)).toEqual(expected[role]);
  });
});

describe('the frame', () => {
  it('leads to the screens and says which one is open', async () => {
    signedInAs('supervisor');
    const { user } = renderApp('/', withPlainScreens);
    await screen.findByText('The screen of Today');
    expect(railWords()).toEqual(['Today', 'Load', 'Pack', 'Lessons', 'Stock', 'Policy', 'People']);
    const link = (name: string) => {
      const [first] = screen.getAllByRole('link', { name });
      if (!first) throw new Error(`no link to ${name}`);
      return first;
    };
    expect(link('Today')).toHaveAttribute('aria-current', 'page');
    await user.click(link('Pack'));
    await screen.findByText('The screen of pack');
    expect(link('Pack')).toHaveAttribute('aria-current', 'page');
    expect(link('Today')).not.toHaveAttribute('aria-current');
    // Readers start at the top of what is new.
    expect(screen.getByRole('main')).toHaveFocus();
  });

  it('has three places and More at the foot of the phone; the rest is under More', async () => {
    signedInAs('supervisor');
    const { user } = renderApp('/', withPlainScreens);
    await screen.findByText('The screen of Today');
    const bar = screen.getAllByRole('navigation', { name: 'Main' })[1];
    if (!bar) throw new Error('no bar');
    expect(
      within(bar)
        .getAllByRole('link')
        .map((link) => link.textContent),
    ).toEqual(['Today', 'Load', 'Pack']);
    await user.click(within(bar).getByRole('button', { name: 'More' }));
    const sheet = await screen.findByRole('dialog', { name: 'Dele Oyelaran' });
    await user.click(within(sheet).getByRole('link', { name: 'People' }));
    await screen.findByText('The screen of people');
    await waitFor(() => {
      expect(screen.queryByRole('dialog')).toBeNull();
    });
  });

  it('turns the sound off and on', async () => {
    signedInAs('technician');
    const { user, services } = renderApp('/', withPlainScreens);
    const sound = await screen.findByRole('button', { name: 'Sound', pressed: true });
    await user.click(sound);
    expect(screen.getByRole('button', { name: 'Sound', pressed: false })).toHaveTextContent('Sound off');
    expect(services.sounds.isOn.get()).toBe(false);
  });

  it('says since when the line is down, and takes it back when it is up', async () => {
    const server = signedInAs('technician');
    server.handlers['GET /api/health'] = () => ({ silence: true });
    renderApp('/', withPlainScreens);
    await screen.findByText('The screen of Today');
    vi.useFakeTimers({ shouldAdvanceTime: true });
    act(() => {
      noteLineDown(new Date('2026-03-17T09:38:00Z'));
    });
    expect(screen.getByText(/No line to the server since/)).toHaveTextContent('09:38');
    await act(() => vi.advanceTimersByTimeAsync(4_100));
    expect(lineStore.get().isUp).toBe(false);
    server.handlers['GET /api/health'] = () => ({ json: { status: 'ok' } });
    await act(() => vi.advanceTimersByTimeAsync(4_100));
    await waitFor(() => {
      expect(screen.queryByText(/No line to the server/)).toBeNull();
    });
  });
});

describe('an address', () => {
  it('asks for a sign-in first and is remembered', async () => {
    stubServer({ 'GET /api/session': () => nobody });
    const { router } = renderApp('/loads?state=all', withPlainScreens);
    await screen.findByRole('heading', { name: 'Scan your badge' });
    expect(router.state.location).toMatchObject({ pathname: '/sign-in', search: '?next=%2Floads%3Fstate%3Dall' });
  });

  it('of another role says whose it is not, and leads on', async () => {
    signedInAs('technician');
    const { user } = renderApp('/people', withPlainScreens);
    expect(await screen.findByRole('heading', { name: 'This screen is for another role' })).toBeVisible();
    expect(screen.queryByText('The screen of people')).toBeNull();
    await user.click(screen.getByRole('link', { name: 'Go to Today' }));
    expect(await screen.findByText('The screen of Today')).toBeVisible();
  });

  it('with nothing behind it says so inside the frame', async () => {
    signedInAs('technician');
    renderApp('/no/such/place', withPlainScreens);
    expect(await screen.findByRole('heading', { name: 'There is nothing at this address' })).toBeVisible();
    expect(railWords()).toContain('Load');
  });

  it('of stock opens at its first shelf', async () => {
    signedInAs('technician');
    const { router } = renderApp('/stock', withPlainScreens);
    await screen.findByText('The screen of stock');
    expect(router.state.location.pathname).toBe('/stock/items');
  });

  it('that cannot be shown says why in plain words, with two ways on', async () => {
    stubServer({
      'GET /api/session': () => ({ problem: 'server.fault', status: 500, detail: 'Something failed at the server.' }),
    });
    // The router reports what a loader throws; here it is thrown on purpose.
    vi.spyOn(console, 'error').mockImplementation(() => undefined);
    renderApp('/loads', withPlainScreens);
    const panel = await screen.findByRole('alert');
    expect(panel).toHaveTextContent('Something failed at the server.');
    expect(panel).toHaveTextContent('ref-1');
    expect(within(panel).getByRole('button', { name: 'Try again' })).toBeVisible();
    expect(within(panel).getByRole('link', { name: 'Go to Today' })).toBeVisible();
  });

  it('comes by itself once a server that did not answer does', async () => {
    let isUp = false;
    stubServer({
      'GET /api/session': () => (isUp ? { json: aSession() } : { silence: true }),
      'GET /api/health': () => (isUp ? { json: { status: 'ok' } } : { silence: true }),
    });
    vi.spyOn(console, 'error').mockImplementation(() => undefined);
    vi.useFakeTimers({ shouldAdvanceTime: true });
    renderApp('/loads', withPlainScreens);
    expect(await screen.findByRole('heading', { name: 'The server did not answer' })).toBeVisible();
    await act(() => vi.advanceTimersByTimeAsync(4_100));
    expect(screen.getByRole('heading', { name: 'The server did not answer' })).toBeVisible();
    isUp = true;
    await act(() => vi.advanceTimersByTimeAsync(4_100));
    expect(await screen.findByText('The screen of loads')).toBeVisible();
  });
});

describe('where a sign-in leads', () => {
  it.each([
    ['/loads?state=open', '/loads?state=open'],
    [null, '/'],
    ['', '/'],
    ['https://elsewhere.example/loads', '/'],
    ['//elsewhere.example/loads', '/'],
    ['/\\elsewhere.example', '/'],
    ['javascript:alert(1)', '/'],
    ['/sign-in?next=/loads', '/'],
  ])('%j leads to %s', (wanted, address) => {
    expect(addressWithin(wanted)).toBe(address);
  });
});
