import type { Person } from '#contract/people';
import type { Role } from '#domain/access/permissions';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer, type Answer } from '../../support/server-stub';

const self = aSession('administrator').person;

function aPerson(changes: Partial<Person> = {}): Person {
  return {
    id: '0190f000-0000-7000-8000-000000000101',
    staffNumber: 'T2063',
    displayName: 'Hana Strudwick',
    initials: 'HS',
    role: 'technician',
    usualShift: 'Day',
    expiresAt: null,
    isDisabled: false,
    hasBadge: true,
    badgeCode: 'N-54371098-04',
    hasPin: true,
    mustChangePassword: false,
    oneTimePasswordExpiresAt: null,
    worksElsewhere: false,
    version: 3,
    ...changes,
  };
}

const people: readonly Person[] = [
  aPerson(),
  aPerson({
    id: self.id,
    displayName: self.displayName,
    initials: 'DO',
    staffNumber: self.staffNumber,
    role: 'administrator',
  }),
  aPerson({
    id: '0190f000-0000-7000-8000-000000000102',
    displayName: 'Cressida Holmqvist',
    initials: 'CH',
    staffNumber: 'T9018',
    role: 'surveyor',
    usualShift: null,
    expiresAt: '2030-03-14T22:00:00.000Z',
    hasBadge: false,
    badgeCode: null,
    hasPin: false,
  }),
  aPerson({
    id: '0190f000-0000-7000-8000-000000000103',
    displayName: 'Rutger Mwangi-Sloane',
    initials: 'RU',
    staffNumber: 'T2117',
    isDisabled: true,
    hasPin: false,
  }),
];

let server: ReturnType<typeof stubServer>;

function open(path = '/people', role: Role = 'administrator', listed: readonly Person[] = people) {
  server = stubServer({
    'GET /api/session': () => ({ json: aSession(role) }),
    'GET /api/people': () => ({ json: { people: listed } }),
  });
  return renderApp(path);
}

async function table(): Promise<HTMLElement> {
  return screen.findByRole('table', { name: 'People' });
}

const hana = `/api/people/${aPerson().id}`;

/** Opens the person, presses an act and confirms it. */
async function doAct(user: ReturnType<typeof renderApp>['user'], act: string, confirm: string) {
  await user.click(await screen.findByRole('button', { name: 'Hana Strudwick' }));
  await user.click(await screen.findByRole('button', { name: act }));
  const question = await screen.findByRole('alertdialog');
  await user.click(within(question).getByRole('button', { name: confirm }));
}

describe('the list', () => {
  it('tells name, number, role, shift, badge and sign-in of each', async () => {
    open();
    const rows = within(await table())
      .getAllByRole('row')
      .slice(1);
    const words = rows.map((row) =>
      within(row)
        .getAllByRole('cell')
        .map((cell) => cell.textContent),
    );
    expect(words).toEqual([
      ['Cressida Holmqvist', 'T9018', 'Surveyor', '', 'None', 'Open until 14 March 2030, 22:00'],
      ['Dele Oyelaran', '4471', 'Administrator', 'Day', 'Badge and PIN', 'Open'],
      ['Hana Strudwick', 'T2063', 'Technician', 'Day', 'Badge and PIN', 'Open'],
      ['Rutger Mwangi-Sloane', 'T2117', 'Technician', 'Day', 'Badge, no PIN yet', 'Switched off'],
    ]);
    expect(screen.getByText('4 people, 3 with an open sign-in')).toBeVisible();
  });

  it('narrows while one types, by name, initials or number, and by role; the address keeps it', async () => {
    const { user, router } = open();
    await table();
    await user.type(screen.getByRole('searchbox'), 't21');
    expect(within(await table()).getAllByRole('row')).toHaveLength(2);
    expect(within(await table()).getByRole('button', { name: 'Rutger Mwangi-Sloane' })).toBeVisible();
    await waitFor(() => {
      expect(router.state.location.search).toBe('?search=t21');
    });
    await user.clear(screen.getByRole('searchbox'));
    await user.selectOptions(screen.getByRole('combobox', { name: 'Role' }), 'Surveyor');
    await waitFor(() => {
      expect(screen.getAllByRole('row')).toHaveLength(2);
    });
    expect(within(await table()).getByRole('button', { name: 'Cressida Holmqvist' })).toBeVisible();
  });

  it('says when nobody is meant, and shows everybody again', async () => {
    const { user, router } = open('/people?search=nobody&role=lead');
    await user.click(await screen.findByRole('button', { name: 'Show everybody' }));
    expect(within(await table()).getAllByRole('row')).toHaveLength(5);
    expect(screen.getByRole('searchbox')).toHaveValue('');
    expect(screen.getByLabelText('Role')).toHaveValue('');
    await waitFor(() => {
      expect(router.state.location.search).toBe('');
    });
  });

  it('goes by the address again when a link leads here without a search', async () => {
    const { user } = open('/people?search=nobody');
    expect(await screen.findByRole('searchbox')).toHaveValue('nobody');
    await user.click(screen.getAllByRole('link', { name: 'People' })[0] ?? document.body);
    await waitFor(() => {
      expect(screen.getByRole('searchbox')).toHaveValue('');
    });
    expect(within(await table()).getAllByRole('row')).toHaveLength(5);
  });

  it('says what went wrong and tries again', async () => {
    const { user } = open();
    server.handlers['GET /api/people'] = () => ({
      problem: 'server.failed',
      status: 500,
      detail: 'Nothing was changed.',
    });
    const alert = await screen.findByText('The people could not be shown');
    expect(alert).toBeVisible();
    server.handlers['GET /api/people'] = () => ({ json: { people } });
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await table()).toBeVisible();
  });
});

describe('one person', () => {
  it('opens beside the list, takes the focus, and gives it back', async () => {
    const { user, router } = open();
    const row = await screen.findByRole('button', { name: 'Hana Strudwick' });
    await user.click(row);
    const head = await screen.findByRole('heading', { name: 'Hana Strudwick' });
    expect(head).toHaveFocus();
    expect(router.state.location.search).toContain(aPerson().id);
    await user.click(screen.getByRole('button', { name: 'Close' }));
    await waitFor(() => {
      expect(screen.getByRole('button', { name: 'Hana Strudwick' })).toHaveFocus();
    });
    expect(screen.queryByRole('heading', { name: 'Hana Strudwick' })).not.toBeInTheDocument();
  });

  it('shows no acts to who may only look', async () => {
    open(`/people?person=${aPerson().id}`, 'supervisor', [aPerson({ badgeCode: null })]);
    const panel = await screen.findByRole('region', { name: 'Hana Strudwick' });
    expect(
      within(panel)
        .getAllByRole('button')
        .map((button) => button.textContent),
    ).toEqual(['Close']);
    expect(screen.queryByRole('button', { name: 'Add a person' })).not.toBeInTheDocument();
  });

  it('keeps an administrator from their own access, and says why', async () => {
    const { user } = open(`/people?person=${self.id}`);
    const panel = await screen.findByRole('region', { name: self.displayName });
    for (const [act, why] of [
      ['Give a one-time password', 'Change your own password under your name.'],
      ['Switch the sign-in off', 'Another administrator has to do this for you.'],
    ] as const) {
      const button = within(panel).getByRole('button', { name: act });
      expect(button).toHaveAttribute('aria-disabled', 'true');
      expect(button).toHaveAccessibleDescription(why);
      await user.click(button);
    }
    expect(screen.queryByRole('alertdialog')).not.toBeInTheDocument();
  });
});

describe('a one-time password', () => {
  it('is shown once, until the administrator has passed it on', async () => {
    const { user } = open();
    await table();
    server.handlers[`POST ${hana}/one-time-password`] = () => ({
      json: { oneTimePassword: 'g2sn-hf6f-h228-8s39', expiresAt: '2030-01-02T09:17:00.000Z' },
    });
    await doAct(user, 'Give a one-time password', 'Give it out');
    const sheet = await screen.findByRole('dialog', { name: 'One-time password for Hana Strudwick' });
    expect(within(sheet).getByText('g2sn-hf6f-h228-8s39')).toBeVisible();
    expect(sheet).toHaveTextContent('Opens until Wed 2 Jan, 09:17.');
    await user.keyboard('{Escape}');
    expect(within(sheet).getByText('g2sn-hf6f-h228-8s39')).toBeVisible();
    await user.click(within(sheet).getByRole('button', { name: 'I have passed it on' }));
    await waitFor(() => {
      expect(document.body).not.toHaveTextContent('g2sn-hf6f-h228-8s39');
    });
  });

  it('can be copied, and says so where it cannot', async () => {
    const { user } = open();
    await table();
    server.handlers[`POST ${hana}/one-time-password`] = () => ({
      json: { oneTimePassword: 'g2sn-hf6f-h228-8s39', expiresAt: '2030-01-02T09:17:00.000Z' },
    });
    await doAct(user, 'Give a one-time password', 'Give it out');
    const copy = await screen.findByRole('button', { name: 'Copy' });
    await user.click(copy);
    expect(await screen.findByText(/^Copied/)).toBeVisible();
    expect(await navigator.clipboard.readText()).toBe('g2sn-hf6f-h228-8s39');
    vi.spyOn(navigator.clipboard, 'writeText').mockRejectedValue(new Error('not here'));
    await user.click(copy);
    expect(await screen.findByText(/Write it down/)).toBeVisible();
  });

  it('whose answer was lost is repeated under the same id, and said to be shown no more', async () => {
    const { user } = open();
    await table();
    const answers: Answer[] = [
      { silence: true },
      { json: { oneTimePassword: null, expiresAt: '2030-01-02T09:17:00.000Z' } },
    ];
    server.handlers[`POST ${hana}/one-time-password`] = () => answers.shift() ?? { silence: true };
    await doAct(user, 'Give a one-time password', 'Give it out');
    const question = screen.getByRole('alertdialog');
    expect(await within(question).findByText(/did not answer/)).toBeVisible();
    await user.click(within(question).getByRole('button', { name: 'Give it out' }));
    expect(await screen.findByRole('dialog', { name: 'Given out, but not shown' })).toBeVisible();
    const bodies = server.callsTo('POST', `${hana}/one-time-password`).map(({ body }) => body);
    expect(bodies).toHaveLength(2);
    expect(bodies[0]).toEqual(bodies[1]);
  });

  it('that is refused says why, and nothing closes', async () => {
    const { user } = open();
    await table();
    server.handlers[`POST ${hana}/one-time-password`] = () => ({
      problem: 'session.password-needed',
      status: 403,
      detail: 'This needs a sign-in with your password. Sign in with it and come back.',
    });
    await doAct(user, 'Give a one-time password', 'Give it out');
    expect(
      await within(screen.getByRole('alertdialog')).findByText(/needs a sign-in with your password/),
    ).toBeVisible();
  });
});

describe('badge, PIN and sign-in', () => {
  it('a new badge, no badge, switching off: each sends only that, with the version that was seen', async () => {
    const { user } = open();
    await table();
    server.handlers[`PATCH ${hana}`] = () => ({ json: { person: aPerson() } });
    for (const [act, confirm] of [
      ['Replace the badge', 'Give a new badge'],
      ['Take the badge away', 'Take it away'],
      ['Switch the sign-in off', 'Switch it off'],
    ] as const) {
      await doAct(user, act, confirm);
      await waitFor(() => {
        expect(screen.queryByRole('alertdialog')).not.toBeInTheDocument();
      });
    }
    const bodies = server.callsTo('PATCH', hana).map(({ body }) => body as Record<string, unknown>);
    expect(bodies.map(({ requestId: _id, ...rest }) => rest)).toEqual([
      { version: 3, badge: 'new' },
      { version: 3, badge: null },
      { version: 3, isDisabled: true },
    ]);
    expect(new Set(bodies.map(({ requestId }) => requestId)).size).toBe(3);
  });

  it('a PIN is shown once', async () => {
    const { user } = open();
    await table();
    server.handlers[`POST ${hana}/pin`] = () => ({ json: { pin: '730418' } });
    await doAct(user, 'Give a new PIN', 'Give it out');
    expect(await screen.findByText('730418')).toBeVisible();
  });

  it('who has no badge is offered one, and no PIN', async () => {
    open(`/people?person=${people[2]?.id ?? ''}`);
    const panel = await screen.findByRole('region', { name: 'Cressida Holmqvist' });
    expect(within(panel).getByRole('button', { name: 'Give a badge' })).toBeVisible();
    expect(within(panel).queryByRole('button', { name: /PIN/ })).not.toBeInTheDocument();
    expect(within(panel).queryByRole('link', { name: 'Print the badge' })).not.toBeInTheDocument();
  });

  it('a badge is printed from the server’s own sheet', async () => {
    open(`/people?person=${aPerson().id}`);
    const link = await screen.findByRole('link', { name: 'Print the badge' });
    expect(link).toHaveAttribute('href', `${hana}/badge`);
  });

  it('says why the code of a badge is not shown after a sign-in by badge', async () => {
    open(`/people?person=${aPerson().id}`, 'administrator', [aPerson({ badgeCode: null })]);
    const panel = await screen.findByRole('region', { name: 'Hana Strudwick' });
    expect(within(panel).getByText(/to who signed in with a password/)).toBeVisible();
  });

  it('a clash with somebody else’s change is told, and asks for another look', async () => {
    const { user } = open();
    await table();
    server.handlers[`PATCH ${hana}`] = () => ({
      problem: 'people.changed-meanwhile',
      status: 409,
      detail: 'Somebody else changed this person meanwhile. Look again.',
    });
    server.handlers['GET /api/people'] = () => ({ json: { people: [aPerson({ usualShift: 'Night', version: 4 })] } });
    await doAct(user, 'Switch the sign-in off', 'Switch it off');
    const question = screen.getByRole('alertdialog');
    expect(await within(question).findByText(/changed this person meanwhile/)).toBeVisible();
    await user.click(within(question).getByRole('button', { name: 'Leave it' }));
    const panel = screen.getByRole('region', { name: 'Hana Strudwick' });
    expect(await within(panel).findByText('Night')).toBeVisible();
  });
});
