import { act, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { api } from '../../../src/lib/api-client';
import { signedOutGate } from '../../../src/lib/signed-out-gate';
import { aSession, nobody, renderApp } from '../../support/render-app';
import { stubServer } from '../../support/server-stub';
import { wedge } from '../../support/scanner';
import { withPlainScreens } from './plain-screens';

const badge = 'N-48120937-96';
const dele = aSession('technician');
const ines = aSession('lead', {
  id: '0190f000-0000-7000-8000-000000000002',
  displayName: 'Ines Marchetti',
  initials: 'IM',
});
const elsewhere = {
  ...ines,
  facility: { ...ines.facility, id: '0190f000-0000-7000-8000-0000000000f2', name: 'Lakeside' },
};

async function atWork(path = '/loads') {
  const view = renderApp(path, withPlainScreens);
  const field = await screen.findByRole('textbox', { name: 'Not sent yet' });
  await view.user.type(field, 'half a word');
  field.blur();
  return view;
}

async function typePin(user: ReturnType<typeof renderApp>['user']) {
  await user.keyboard('805173');
  await user.keyboard('{Enter}');
}

async function sheetIsGone() {
  await waitFor(() => {
    expect(screen.queryByRole('dialog')).toBeNull();
  });
}

describe('change of person at a shared station', () => {
  it('starts with a badge scanned on any screen, and keeps the screen and all that is on it', async () => {
    const server = stubServer({
      'GET /api/session': () => ({ json: dele }),
      'POST /api/session/badge': () => ({ json: ines }),
    });
    const { user, router } = await atWork();
    wedge(badge);
    const sheet = await screen.findByRole('dialog', { name: 'Change person' });
    expect(within(sheet).getByRole('heading', { name: 'Badge read' })).toBeVisible();
    await typePin(user);
    await sheetIsGone();
    expect(server.callsTo('POST', '/api/session/badge')[0]?.body).toEqual({ badge, pin: '805173' });
    expect(screen.getByRole('button', { name: /Ines Marchetti is at this station/ })).toBeVisible();
    expect(screen.getByRole('textbox', { name: 'Not sent yet' })).toHaveValue('half a word');
    expect(router.state.location.pathname).toBe('/loads');
  });

  it('starts with the button as well, and the badge is scanned then', async () => {
    stubServer({ 'GET /api/session': () => ({ json: dele }), 'POST /api/session/badge': () => ({ json: ines }) });
    const { user } = await atWork();
    await user.click(screen.getByRole('button', { name: /Dele Oyelaran is at this station/ }));
    await user.click(await screen.findByRole('button', { name: 'Change person' }));
    await screen.findByRole('heading', { name: 'Scan your badge' });
    wedge(badge);
    await screen.findByRole('heading', { name: 'Badge read' });
    await typePin(user);
    await sheetIsGone();
    expect(screen.getByRole('button', { name: /Ines Marchetti/ })).toBeVisible();
  });

  it('can be given up: the first person stays', async () => {
    stubServer({ 'GET /api/session': () => ({ json: dele }) });
    const { user } = await atWork();
    wedge(badge);
    await screen.findByRole('dialog', { name: 'Change person' });
    await user.click(screen.getByRole('button', { name: 'Close' }));
    await sheetIsGone();
    expect(screen.getByRole('button', { name: /Dele Oyelaran/ })).toBeVisible();
  });

  it('shows the places of the new role', async () => {
    stubServer({
      'GET /api/session': () => ({ json: aSession('operating-room') }),
      'POST /api/session/badge': () => ({ json: ines }),
    });
    const { user } = await atWork('/');
    expect(screen.queryByRole('link', { name: 'Pack' })).toBeNull();
    wedge(badge);
    await screen.findByRole('dialog');
    await typePin(user);
    await sheetIsGone();
    expect(screen.getAllByRole('link', { name: 'Pack' })[0]).toBeVisible();
  });

  it('shows nothing of one place of work to somebody of another', async () => {
    stubServer({ 'GET /api/session': () => ({ json: dele }), 'POST /api/session/badge': () => ({ json: elsewhere }) });
    const { user, router, services } = await atWork();
    services.queryClient.setQueryData(['loads', 'list'], ['a load of Hillcrest']);
    wedge(badge);
    await screen.findByRole('dialog');
    await typePin(user);
    await sheetIsGone();
    await waitFor(() => {
      expect(router.state.location.pathname).toBe('/');
    });
    expect(services.queryClient.getQueryData(['loads', 'list'])).toBeUndefined();
  });
});

describe('a sign-in that ends in the middle of work', () => {
  it('brings up the sheet over the screen; the call that met it goes on in the same name', async () => {
    let isSignedIn = true;
    const server = stubServer({
      'GET /api/session': () => ({ json: dele }),
      'POST /api/loads/1/scans': () => (isSignedIn ? { json: { answer: 'taken' } } : nobody),
      'POST /api/session/badge': () => {
        isSignedIn = true;
        return { json: dele };
      },
    });
    const { user } = await atWork();
    isSignedIn = false;
    const scan = api.post('/api/loads/1/scans', { requestId: 'r1' }, z.object({ answer: z.string() }));
    const sheet = await screen.findByRole('dialog', { name: 'Sign in to go on' });
    expect(within(sheet).queryByRole('button', { name: 'Close' })).toBeNull();
    wedge(badge);
    await screen.findByRole('heading', { name: 'Badge read' });
    await typePin(user);
    await expect(scan).resolves.toEqual({ answer: 'taken' });
    await sheetIsGone();
    expect(server.callsTo('POST', '/api/loads/1/scans').map((call) => call.body)).toEqual([
      { requestId: 'r1' },
      { requestId: 'r1' },
    ]);
    expect(screen.getByRole('textbox', { name: 'Not sent yet' })).toHaveValue('half a word');
  });

  it('can be left for the sign-in screen', async () => {
    let isSignedIn = true;
    stubServer({ 'GET /api/session': () => (isSignedIn ? { json: dele } : nobody) });
    const { user, router, services } = await atWork();
    services.queryClient.setQueryData(['loads', 'list'], ['a load']);
    isSignedIn = false;
    act(() => {
      signedOutGate.close();
    });
    await user.click(await screen.findByRole('button', { name: 'Leave this screen' }));
    expect(await screen.findByRole('heading', { name: 'Scan your badge' })).toBeVisible();
    expect(router.state.location.pathname).toBe('/sign-in');
    expect(services.queryClient.getQueryData(['loads', 'list'])).toBeUndefined();
  });
});

describe('signing out', () => {
  async function stationSheet() {
    let isSignedIn = true;
    const leave = () => {
      isSignedIn = false;
      return { nothing: true } as const;
    };
    const server = stubServer({
      'GET /api/session': () => (isSignedIn ? { json: dele } : nobody),
      'DELETE /api/session': leave,
      'POST /api/session/sign-out-everywhere': leave,
    });
    const view = await atWork();
    await view.user.click(screen.getByRole('button', { name: /is at this station/ }));
    await screen.findByRole('dialog', { name: 'Dele Oyelaran' });
    return { ...view, server };
  }

  it('leads to the sign-in screen and forgets what was shown', async () => {
    const { user, services, server } = await stationSheet();
    services.queryClient.setQueryData(['loads', 'list'], ['a load']);
    await user.click(screen.getByRole('button', { name: 'Sign out' }));
    expect(await screen.findByRole('heading', { name: 'Scan your badge' })).toBeVisible();
    expect(server.callsTo('DELETE', '/api/session')).toHaveLength(1);
    expect(services.queryClient.getQueryData(['loads', 'list'])).toBeUndefined();
  });

  it('everywhere asks first', async () => {
    const { user, server } = await stationSheet();
    await user.click(screen.getByRole('button', { name: 'Sign out everywhere' }));
    const question = await screen.findByRole('alertdialog', { name: 'Sign out everywhere?' });
    expect(server.callsTo('POST', '/api/session/sign-out-everywhere')).toEqual([]);
    await user.click(within(question).getByRole('button', { name: 'Sign out everywhere' }));
    expect(await screen.findByRole('heading', { name: 'Scan your badge' })).toBeVisible();
  });

  it('says so when the server does not answer, and stays', async () => {
    const { user, server } = await stationSheet();
    server.handlers['DELETE /api/session'] = () => ({ silence: true });
    server.handlers['GET /api/health'] = () => ({ silence: true });
    await user.click(screen.getByRole('button', { name: 'Sign out' }));
    expect(await screen.findByText(/The server did not answer/)).toBeVisible();
    expect(screen.getByRole('dialog', { name: 'Dele Oyelaran' })).toBeVisible();
  });
});

describe('a PIN of one’s own', () => {
  it('is asked for with the password, and what is wrong stands at its field', async () => {
    const server = stubServer({
      'GET /api/session': () => ({ json: dele }),
      'POST /api/session/pin': () => ({
        problem: 'pin.guessable',
        status: 400,
        detail: 'This is one of the PINs that are tried first. Choose another.',
        fields: [{ pointer: '/body/pin', detail: 'This is one of the PINs that are tried first. Choose another.' }],
      }),
    });
    const { user } = await atWork();
    await user.click(screen.getByRole('button', { name: /is at this station/ }));
    await user.click(await screen.findByRole('button', { name: 'Change my PIN' }));
    await screen.findByRole('dialog', { name: 'PIN for your badge' });
    await user.type(screen.getByLabelText('Your password'), 'a lantern on the quay');
    await user.type(screen.getByLabelText('New PIN'), '123456');
    await user.click(screen.getByRole('button', { name: 'Keep this PIN' }));
    await waitFor(() => {
      expect(screen.getByLabelText('New PIN')).toHaveAccessibleDescription(/tried first/);
    });
    server.handlers['POST /api/session/pin'] = () => ({ json: dele });
    await user.clear(screen.getByLabelText('New PIN'));
    await user.type(screen.getByLabelText('New PIN'), '805173');
    await user.click(screen.getByRole('button', { name: 'Keep this PIN' }));
    await waitFor(() => {
      expect(screen.queryByRole('dialog', { name: 'PIN for your badge' })).toBeNull();
    });
    expect(server.callsTo('POST', '/api/session/pin').at(-1)?.body).toEqual({
      password: 'a lantern on the quay',
      pin: '805173',
    });
  });
});

describe('hands off for too long', () => {
  it('is told a minute before the end, ends then, and any touch before keeps the sign-in going', async () => {
    vi.useFakeTimers({ shouldAdvanceTime: true });
    const server = stubServer({
      'GET /api/session': () => ({ json: dele }),
      'DELETE /api/session': () => ({ nothing: true }),
    });
    renderApp('/loads', withPlainScreens);
    await screen.findByRole('textbox', { name: 'Not sent yet' });
    const seconds = (count: number) => act(() => vi.advanceTimersByTimeAsync(count * 1_000));

    await seconds(530);
    expect(screen.queryByText(/will be signed out/)).toBeNull();
    await seconds(15);
    expect(screen.getByText(/will be signed out/)).toBeVisible();
    act(() => {
      window.dispatchEvent(new Event('pointerdown'));
    });
    expect(screen.queryByText(/will be signed out/)).toBeNull();
    // The server only sees calls: it is told that somebody is still here.
    await waitFor(() => {
      expect(server.callsTo('GET', '/api/session')).toHaveLength(2);
    });
    expect(server.callsTo('GET', '/api/session')[1]?.headers.has('X-Background')).toBe(false);

    await seconds(610);
    expect(await screen.findByRole('dialog', { name: 'Sign in to go on' })).toBeVisible();
    expect(server.callsTo('DELETE', '/api/session')).toHaveLength(1);
    // What the screen holds is there still, only out of reach behind the sheet.
    expect(screen.getByRole('textbox', { name: 'Not sent yet', hidden: true })).toBeInTheDocument();
  });
});
