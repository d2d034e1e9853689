import type { FinishedLesson, FinishLessonRequest } from '#contract/lessons';
import type { Role } from '#domain/access/permissions';
import { ruleIds } from '#domain/load/finding';
import { ruleSetVersion } from '#domain/load/policy';
import { lessonOf } from '#domain/lessons/all-lessons';
import { screen, waitFor, within } from '@testing-library/react';
import { beforeEach, describe, expect, it } from 'vitest';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer, type Answer, type Call } from '../../support/server-stub';
import { measureNothing } from './unmeasured';

beforeEach(measureNothing);

const ruleId = 'lid-filter-covered';
const { question } = lessonOf(ruleId);
const right = question.answers[question.right];
const wrong = question.answers.a;

function aFinished(changes: Partial<FinishedLesson> = {}): FinishedLesson {
  return {
    ruleId,
    ruleSet: ruleSetVersion,
    tries: 1,
    finishedAt: '2026-03-03T12:40:00.000Z',
    load: null,
    ...changes,
  };
}

type Options = {
  readonly role?: Role;
  readonly finished?: readonly FinishedLesson[];
  readonly onFinish?: (call: Call) => Answer;
};

function open(path: string, { role = 'technician', finished = [], onFinish }: Options = {}) {
  const server = stubServer({
    'GET /api/session': () => ({ json: aSession(role) }),
    'GET /api/lessons': () => ({ json: { finished } }),
    [`POST /api/lessons/${ruleId}/finish`]: onFinish ?? (() => ({ status: 201, json: { lesson: aFinished() } })),
  });
  const sent = () =>
    server.callsTo('POST', `/api/lessons/${ruleId}/finish`).map(({ body }) => body as FinishLessonRequest);
  return { server, sent, ...renderApp(path) };
}

const answerButton = (text: string) => screen.findByRole('button', { name: new RegExp(`^${text}`) });

describe('a lesson', () => {
  it('says why, shows both carts, what to look for, the source, and that it is no competency', async () => {
    open(`/lessons/${ruleId}`);
    expect(await screen.findByRole('heading', { level: 1, name: 'Lid filters stay open' })).toBeVisible();
    expect(
      screen.getByText('A rigid container breathes through its filters: steam in, air and water out.'),
    ).toBeVisible();
    expect(screen.getByRole('region', { name: 'The bad cart' })).toBeInTheDocument();
    expect(screen.getByRole('region', { name: 'The good cart' })).toBeInTheDocument();
    expect(screen.getByText(/Look down on each lid/)).toBeVisible();
    expect(screen.getByText(/^Source: Common practice, no source\./)).toBeVisible();
    expect(screen.getByText(/A finished lesson is no competency/)).toBeVisible();
  });

  it('says why a wrong answer is wrong, keeps nothing, and lets another be tried', async () => {
    const { user, sent } = open(`/lessons/${ruleId}`);
    await user.click(await answerButton(wrong.text));
    expect(screen.getByRole('button', { name: new RegExp(`Not this one. ${wrong.because}`) })).toHaveAttribute(
      'aria-disabled',
      'true',
    );
    expect(screen.queryByText(right.because)).toBeNull();
    expect(sent()).toEqual([]);
    await user.click(await answerButton(right.text));
    expect(screen.getByRole('button', { name: new RegExp(`Right. ${right.because}`) })).toBeInTheDocument();
    expect(await screen.findByText('Kept: you have finished this lesson.')).toBeVisible();
    expect(sent()).toMatchObject([{ answers: ['a', question.right], ruleSet: ruleSetVersion, loadId: null }]);
  });

  it('takes each answer once, and none after the right one', async () => {
    const { user, sent } = open(`/lessons/${ruleId}`);
    const first = await answerButton(wrong.text);
    await user.dblClick(first);
    await user.click(await answerButton(right.text));
    await screen.findByText('Kept: you have finished this lesson.');
    await user.click(screen.getByRole('button', { name: new RegExp(`^${question.answers.c.text}`) }));
    expect(screen.queryByText(question.answers.c.because)).toBeNull();
    expect(sent().map(({ answers }) => answers)).toEqual([['a', question.right]]);
  });

  it('is answered with the keyboard alone, and read out', async () => {
    const { user, sent } = open(`/lessons/${ruleId}`);
    const first = await answerButton(wrong.text);
    first.focus();
    await user.keyboard('{Enter}');
    await waitFor(() => {
      expect(document.querySelector('[data-live-announcer] [aria-live="assertive"]')).toHaveTextContent(
        `Not this one. ${wrong.because} Try another.`,
      );
    });
    await user.tab();
    await user.keyboard(' ');
    await waitFor(() => {
      expect(document.querySelector('[data-live-announcer] [aria-live="assertive"]')).toHaveTextContent(
        `Right. ${right.because}`,
      );
    });
    await waitFor(() => {
      expect(sent()).toHaveLength(1);
    });
  });

  it('says that it is not kept yet when the server is away, and repeats the very same request', async () => {
    let isAway = true;
    const { user, sent } = open(`/lessons/${ruleId}`, {
      onFinish: () => (isAway ? { silence: true } : { status: 201, json: { lesson: aFinished() } }),
    });
    await user.click(await answerButton(right.text));
    expect(await screen.findByText(/^Not kept yet\. The server did not answer\./)).toBeVisible();
    isAway = false;
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByText('Kept: you have finished this lesson.')).toBeVisible();
    const [before, after] = sent();
    expect(after).toEqual(before);
    expect(screen.queryByText(/^Not kept yet/)).toBeNull();
  });

  it('says what the server refuses', async () => {
    const { user } = open(`/lessons/${ruleId}`, {
      onFinish: () => ({
        problem: 'lesson.rules-changed',
        status: 409,
        detail: 'The rules have changed since this page was opened. Please reload it.',
      }),
    });
    await user.click(await answerButton(right.text));
    expect(await screen.findByRole('alert')).toHaveTextContent('Not kept yet. The rules have changed');
  });

  it('can be read and answered by who does not load carts, and says that nothing is kept', async () => {
    const { user, sent, server } = open(`/lessons/${ruleId}`, { role: 'surveyor' });
    await user.click(await answerButton(right.text));
    expect(screen.getByText('Answered. For your role nothing is kept of it.')).toBeVisible();
    expect(sent()).toEqual([]);
    expect(server.callsTo('GET', '/api/lessons')).toEqual([]);
  });

  it('leads to the next one, which begins anew', async () => {
    const { user } = open(`/lessons/${ruleId}`);
    await user.click(await answerButton(right.text));
    await user.click(await screen.findByRole('link', { name: /^Next: / }));
    await waitFor(() => {
      expect(screen.queryByRole('heading', { level: 1, name: 'Lid filters stay open' })).toBeNull();
    });
    expect(screen.queryByText(/^Kept/)).toBeNull();
    expect(screen.queryByText('Right.')).toBeNull();
  });

  it('is not there for a rule that is none', async () => {
    open('/lessons/no-such-rule');
    expect(await screen.findByText('There is no such lesson.')).toBeVisible();
  });
});

describe('the list of lessons', () => {
  it('has every rule once', async () => {
    open('/lessons');
    await screen.findByText(/done by you/);
    const links = screen.getAllByRole('link').map((link) => link.getAttribute('href') ?? '');
    const lessons = links.filter((href) => href.startsWith('/lessons/'));
    expect([...lessons].sort()).toEqual(ruleIds.map((id) => `/lessons/${id}`).sort());
  });

  it('says which ones the person has done, and when', async () => {
    open('/lessons', { finished: [aFinished(), aFinished({ ruleId: 'facing', ruleSet: '2026-01-01.1' })] });
    expect(await screen.findByText(`${ruleIds.length} rules, 90 seconds each, 2 done by you`)).toBeVisible();
    const row = (name: string) => screen.getByRole('link', { name: new RegExp(`^${name}`) });
    expect(row('Lid filters stay open')).toHaveTextContent('done on 3 March');
    expect(row('Lid filters stay open')).not.toHaveTextContent('earlier');
    expect(row('Paper sides face')).toHaveTextContent('by earlier rules');
    expect(row('Basins drain')).toHaveTextContent('not yet');
  });

  it('counts nothing for a rule that is gone', async () => {
    open('/lessons', { finished: [aFinished({ ruleId: 'a-rule-of-long-ago' })] });
    expect(await screen.findByText(`${ruleIds.length} rules, 90 seconds each, 0 done by you`)).toBeVisible();
  });

  it('shows the lessons also when what was done cannot be fetched', async () => {
    const { server } = open('/lessons');
    server.handlers['GET /api/lessons'] = () => ({ problem: 'x', status: 500, detail: 'Something went wrong here.' });
    expect(await screen.findByRole('alert')).toHaveTextContent('What you have done could not be fetched');
    expect(within(screen.getByRole('region', { name: 'Pouches' })).getAllByRole('link').length).toBeGreaterThan(5);
  });

  it('asks nothing of the server for who does not load carts, and names no figure', async () => {
    const { server } = open('/lessons', { role: 'infection-prevention' });
    expect(await screen.findByText(`${ruleIds.length} rules, 90 seconds each`)).toBeVisible();
    expect(server.callsTo('GET', '/api/lessons')).toEqual([]);
  });
});
