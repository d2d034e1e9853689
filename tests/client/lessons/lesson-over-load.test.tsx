import { loadDetailSchema, type LoadDetail } from '#contract/loads';
import type { FinishLessonRequest } from '#contract/lessons';
import { ruleSetVersion, defaultPolicy } from '#domain/load/policy';
import { lessonOf } from '#domain/lessons/all-lessons';
import { screen, waitFor, within } from '@testing-library/react';
import { beforeEach, describe, expect, it } from 'vitest';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer } from '../../support/server-stub';
import { measureNothing } from './unmeasured';

beforeEach(measureNothing);

const loadId = '0190f000-0000-7000-8000-0000000000aa';

/** A load as the server would send it, made from a cart whose ids are words: each word becomes a UUID. */
function asSent(view: LoadDetail['view']): unknown {
  const idOf = new Map<string, string>();
  const uuid = (word: string) => {
    const known = idOf.get(word) ?? `0190f000-0000-7000-8000-${String(1000 + idOf.size).padStart(12, '0')}`;
    idOf.set(word, known);
    return known;
  };
  const changed: unknown = JSON.parse(JSON.stringify(view), (key, value: unknown) =>
    typeof value === 'string' && (key === 'id' || key.endsWith('Id')) ? uuid(value) : value,
  );
  return { ...(changed as object), loadId };
}

function aDetail(): LoadDetail {
  return loadDetailSchema.parse({
    summary: {
      id: loadId,
      number: '1-26062-01',
      state: 'building',
      sterilizer: { id: loadId, code: 'S1', name: 'Sterilizer 1' },
      program: { id: loadId, code: 'V4-20', name: 'Wrapped goods' },
      cart: { id: loadId, code: 'C1', name: 'Cart' },
      openedAt: '2026-03-03T11:00:00.000Z',
      openedBy: 'Dele Oyelaran',
      closedAt: null,
      closedBy: null,
      listed: 6,
      scanned: 6,
      implants: 0,
      version: 7,
    },
    view: asSent(lessonOf('facing').bad.view),
    policy: defaultPolicy,
    policyNumber: 1,
    counts: [],
    acceptances: [],
    undoable: null,
    stickers: [],
    closing: null,
    version: 7,
  });
}

function open() {
  const server = stubServer({
    'GET /api/session': () => ({ json: aSession('technician') }),
    [`GET /api/loads/${loadId}`]: () => ({ json: aDetail() }),
    'GET /api/lessons': () => ({ json: { finished: [] } }),
    'POST /api/lessons/facing/finish': () => ({
      status: 201,
      json: {
        lesson: {
          ruleId: 'facing',
          ruleSet: ruleSetVersion,
          tries: 1,
          finishedAt: '2026-03-03T12:40:00.000Z',
          load: { id: loadId, number: '1-26062-01' },
        },
      },
    }),
  });
  return { server, ...renderApp(`/loads/${loadId}`) };
}

describe('a lesson over a load', () => {
  it('opens from its finding with one touch, is kept with the load, and gives the load back as it was', async () => {
    const { user, server } = open();
    await user.click(await screen.findByRole('button', { name: /faces the other way/ }));
    const why = screen.getByRole('button', { name: 'Why? 90 seconds' });
    await user.click(why);
    const sheet = await screen.findByRole('dialog', { name: 'Paper sides face as the house rule says' });
    const { answers, right } = lessonOf('facing').question;
    await user.click(within(sheet).getByRole('button', { name: new RegExp(`^${answers[right].text}`) }));
    expect(await within(sheet).findByText('Kept: you have finished this lesson.')).toBeInTheDocument();
    const [sent] = server.callsTo('POST', '/api/lessons/facing/finish');
    expect((sent?.body as FinishLessonRequest).loadId).toBe(loadId);
    await user.click(within(sheet).getByRole('button', { name: 'Back to the load' }));
    await waitFor(() => {
      expect(screen.queryByRole('dialog')).toBeNull();
    });
    await waitFor(() => {
      expect(screen.getByRole('button', { name: 'Why? 90 seconds' })).toHaveFocus();
    });
    expect(screen.getByRole('button', { name: /faces the other way/ })).toHaveAttribute('aria-expanded', 'true');
    expect(server.calls.filter(({ method }) => method !== 'GET')).toHaveLength(1);
  });

  it('closes with Escape before it is answered, and nothing is kept', async () => {
    const { user, server } = open();
    await user.click(await screen.findByRole('button', { name: /faces the other way/ }));
    await user.click(screen.getByRole('button', { name: 'Why? 90 seconds' }));
    await screen.findByRole('dialog');
    await user.keyboard('{Escape}');
    await waitFor(() => {
      expect(screen.queryByRole('dialog')).toBeNull();
    });
    expect(server.callsTo('POST', '/api/lessons/facing/finish')).toEqual([]);
  });
});
