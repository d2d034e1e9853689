import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { signedOutGate } from '../../../src/lib/signed-out-gate';
import { aSession, nobody, renderApp } from '../../support/render-app';
import { stubServer } from '../../support/server-stub';
import { wedge } from '../../support/scanner';
import { withPlainScreens } from './plain-screens';

/** Number 48120937 with its two check digits, as `formatBadgeCode` makes them; ISO/IEC 7064, MOD 97-10. */
const badge = 'N-48120937-96';

const wrong = {
  problem: 'session.refused',
  status: 401,
  detail: 'Number and password do not belong together.',
} as const;

async function signInScreen(path = '/sign-in') {
  const view = renderApp(path, withPlainScreens);
  await screen.findByRole('heading', { name: 'Scan your badge' });
  return view;
}

async function fillIn(user: ReturnType<typeof renderApp>['user'], staffNumber: string, password: string) {
  await user.type(screen.getByRole('textbox', { name: 'Staff number' }), staffNumber);
  await user.type(screen.getByLabelText('Password'), password);
  await user.click(screen.getByRole('button', { name: 'Sign in' }));
}

describe('signing in by hand', () => {
  it('leads to Today, with the person at the station', async () => {
    const server = stubServer({
      'GET /api/session': () => nobody,
      'POST /api/session': () => ({ json: aSession() }),
    });
    const { user, router } = await signInScreen();
    await fillIn(user, '4471', 'a lantern on the quay');
    expect(await screen.findByText('The screen of Today')).toBeVisible();
    expect(router.state.location.pathname).toBe('/');
    expect(server.callsTo('POST', '/api/session')[0]?.body).toEqual({
      staffNumber: '4471',
      password: 'a lantern on the quay',
    });
    expect(screen.getByRole('button', { name: /Dele Oyelaran is at this station/ })).toBeVisible();
  });

  it('leads to where the person wanted to go, and never out of the application', async () => {
    stubServer({ 'GET /api/session': () => nobody, 'POST /api/session': () => ({ json: aSession() }) });
    const { user, router } = await signInScreen('/sign-in?next=%2Floads%3Fstate%3Dopen');
    await fillIn(user, '4471', 'a lantern on the quay');
    await screen.findByText('The screen of loads');
    expect(router.state.location).toMatchObject({ pathname: '/loads', search: '?state=open' });
  });

  it('says what was wrong, empties the password and keeps the number', async () => {
    stubServer({ 'GET /api/session': () => nobody, 'POST /api/session': () => wrong });
    const { user } = await signInScreen();
    await fillIn(user, '4471', 'wrong');
    expect(await screen.findByText(wrong.detail)).toBeVisible();
    expect(screen.getByLabelText('Password')).toHaveValue('');
    expect(screen.getByLabelText('Password')).toHaveFocus();
    expect(screen.getByRole('textbox', { name: 'Staff number' })).toHaveValue('4471');
    expect(signedOutGate.isClosed.get()).toBe(false);
  });

  it('asks for what is missing without asking the server', async () => {
    const server = stubServer({ 'GET /api/session': () => nobody });
    const { user } = await signInScreen();
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(await screen.findAllByText('Please fill this in.')).toHaveLength(2);
    expect(server.callsTo('POST', '/api/session')).toEqual([]);
  });

  it('says how long to wait after too many tries, in the words of the server', async () => {
    stubServer({
      'GET /api/session': () => nobody,
      'POST /api/session': () => ({
        problem: 'session.too-many',
        status: 429,
        detail: 'Wait 2 minutes, then try again.',
      }),
    });
    const { user } = await signInScreen();
    await fillIn(user, '4471', 'wrong');
    expect(await screen.findByText('Wait 2 minutes, then try again.')).toBeVisible();
  });

  it('says so when the server does not answer', async () => {
    stubServer({ 'GET /api/session': () => nobody, 'POST /api/session': () => ({ silence: true }) });
    const { user } = await signInScreen();
    await fillIn(user, '4471', 'a lantern on the quay');
    expect(await screen.findByText(/The server did not answer/)).toBeVisible();
  });
});

describe('signing in with a badge', () => {
  it('takes the badge from anywhere, then its PIN', async () => {
    const server = stubServer({
      'GET /api/session': () => nobody,
      'POST /api/session/badge': () => ({ json: aSession() }),
    });
    const { user } = await signInScreen();
    wedge(badge);
    expect(await screen.findByRole('heading', { name: 'Badge read' })).toBeVisible();
    await user.keyboard('805173');
    await user.keyboard('{Enter}');
    expect(await screen.findByText('The screen of Today')).toBeVisible();
    expect(server.callsTo('POST', '/api/session/badge')[0]?.body).toEqual({ badge, pin: '805173' });
  });

  it('takes the badge also while the staff number has the focus, and leaves the field empty', async () => {
    stubServer({ 'GET /api/session': () => nobody });
    const { user } = await signInScreen();
    const field = screen.getByRole('textbox', { name: 'Staff number' });
    await user.click(field);
    wedge('P-20431784-42');
    expect(field).toHaveValue('');
    wedge(badge);
    expect(await screen.findByRole('heading', { name: 'Badge read' })).toBeVisible();
  });

  it('says of another code what it is, and asks on', async () => {
    stubServer({ 'GET /api/session': () => nobody });
    await signInScreen();
    wedge('N-48120937-95');
    expect(await screen.findByText(/check digits do not fit/)).toBeVisible();
    expect(screen.getByRole('heading', { name: 'Scan your badge' })).toBeVisible();
  });

  it('empties the PIN after a wrong one and lets another badge in', async () => {
    stubServer({
      'GET /api/session': () => nobody,
      'POST /api/session/badge': () => ({
        problem: 'session.refused',
        status: 401,
        detail: 'Badge and PIN do not belong together.',
      }),
    });
    const { user } = await signInScreen();
    wedge(badge);
    await screen.findByRole('heading', { name: 'Badge read' });
    await user.keyboard('111111');
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(await screen.findByText('Badge and PIN do not belong together.')).toBeVisible();
    expect(screen.getByLabelText('PIN')).toHaveValue('');
    await user.click(screen.getByRole('button', { name: 'Not mine' }));
    expect(screen.getByRole('heading', { name: 'Scan your badge' })).toBeVisible();
  });
});

describe('a one-time password', () => {
  it('has to be changed before anything else', async () => {
    let session = aSession('technician', { mustChangePassword: true });
    const server = stubServer({
      'GET /api/session': () => ({ json: session }),
      'POST /api/session/password': () => {
        session = aSession();
        return { json: session };
      },
    });
    const { user, router } = renderApp('/loads', withPlainScreens);
    expect(await screen.findByRole('heading', { name: 'Choose your own password' })).toBeVisible();
    expect(router.state.location.pathname).toBe('/new-password');
    await user.type(screen.getByLabelText('One-time password'), 'grey-harbour-17');
    await user.type(screen.getByLabelText('New password'), 'a lantern on the quay');
    await user.click(screen.getByRole('button', { name: 'Keep this password' }));
    expect(await screen.findByText('The screen of Today')).toBeVisible();
    expect(server.callsTo('POST', '/api/session/password')[0]?.body).toEqual({
      current: 'grey-harbour-17',
      next: 'a lantern on the quay',
    });
  });

  it('that may not be the next one is told at its field', async () => {
    stubServer({
      'GET /api/session': () => ({ json: aSession('technician', { mustChangePassword: true }) }),
      'POST /api/session/password': () => ({
        problem: 'password.common',
        status: 400,
        detail: 'This is a password that is tried first.',
        fields: [{ pointer: '/body/next', detail: 'This is a password that is tried first.' }],
      }),
    });
    const { user } = renderApp('/new-password', withPlainScreens);
    await user.type(await screen.findByLabelText('One-time password'), 'grey-harbour-17');
    await user.type(screen.getByLabelText('New password'), 'passwordpassword');
    await user.click(screen.getByRole('button', { name: 'Keep this password' }));
    const field = screen.getByLabelText('New password');
    await waitFor(() => {
      expect(field).toHaveAccessibleDescription(/tried first/);
    });
    expect(field).toHaveFocus();
  });

  it('can be left by signing out', async () => {
    let isSignedIn = true;
    stubServer({
      'GET /api/session': () => (isSignedIn ? { json: aSession('technician', { mustChangePassword: true }) } : nobody),
      'DELETE /api/session': () => {
        isSignedIn = false;
        return { nothing: true };
      },
    });
    const { user } = renderApp('/new-password', withPlainScreens);
    await user.click(await screen.findByRole('button', { name: 'Sign out' }));
    expect(await screen.findByRole('heading', { name: 'Scan your badge' })).toBeVisible();
  });
});

describe('somebody who is signed in already', () => {
  it('is not asked again', async () => {
    stubServer({ 'GET /api/session': () => ({ json: aSession() }) });
    const { router } = renderApp('/sign-in?next=https%3A%2F%2Felsewhere.example%2F', withPlainScreens);
    expect(await screen.findByText('The screen of Today')).toBeVisible();
    expect(router.state.location.pathname).toBe('/');
    await vi.waitFor(() => {
      expect(router.state.navigation.state).toBe('idle');
    });
  });
});
