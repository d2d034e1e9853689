import { loadDetailSchema, type LoadDetail } from '#contract/loads';
import { lessonOf } from '#domain/lessons/all-lessons';
import { evaluateLoad } from '#domain/load/evaluate-load';
import { defaultPolicy } from '#domain/load/policy';
import { screen, within } from '@testing-library/react';
import { beforeEach, describe, expect, it } from 'vitest';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer } from '../../support/server-stub';
import { measureNothing } from '../lessons/unmeasured';

beforeEach(measureNothing);

const loadId = '0190f000-0000-7000-8000-0000000000aa';

/** A cart of the lessons names things by words; on the wire they are UUIDs. */
function asSent(view: LoadDetail['view']): unknown {
  const ids = new Map<string, string>();
  const idOf = (word: string) => {
    const id = ids.get(word) ?? `0190f000-0000-7000-8000-${String(1000 + ids.size).padStart(12, '0')}`;
    ids.set(word, id);
    return id;
  };
  return JSON.parse(JSON.stringify(view), (key, value: unknown) =>
    typeof value === 'string' && (key === 'id' || key.endsWith('Id')) ? idOf(value) : value,
  );
}

/** Closed under rules that found one thing, which those of today do not know, and nothing of what they find. */
function aClosedLoad(): LoadDetail {
  const view = asSent(lessonOf('facing').bad.view);
  return loadDetailSchema.parse({
    summary: {
      id: loadId,
      number: '1-26062-01',
      state: 'closed',
      sterilizer: { id: loadId, code: 'S1', name: 'Sterilizer 1' },
      program: { id: loadId, code: 'V4-20', name: 'Wrapped goods' },
      cart: { id: loadId, code: 'C1', name: 'Cart' },
      openedAt: '2026-03-03T11:00:00.000Z',
      openedBy: 'Dele Oyelaran',
      closedAt: '2026-03-03T11:30:00.000Z',
      closedBy: 'Dele Oyelaran',
      listed: 6,
      scanned: 6,
      implants: 0,
      version: 7,
    },
    view,
    policy: defaultPolicy,
    policyNumber: 4,
    counts: [],
    acceptances: [],
    undoable: null,
    stickers: [],
    closing: {
      digest: 'ab'.repeat(32),
      ruleSet: '2024-01-01.1',
      findings: [
        {
          key: 'a-rule-of-long-ago|load',
          ruleId: 'a-rule-of-long-ago',
          severity: 'advice',
          title: 'Something of long ago',
          reason: 'It mattered then.',
          remedy: 'It was done otherwise then.',
          source: { text: 'Common practice, no source.', provenance: 'common-practice' },
          places: [{ on: 'load' }],
          figure: null,
        },
      ],
    },
    version: 7,
  });
}

describe('a closed load', () => {
  it('shows what was found when it was closed, and not what today’s rules find', async () => {
    const load = aClosedLoad();
    const today = evaluateLoad(load.view, load.policy).map(({ title }) => title);
    expect(today.length).toBeGreaterThan(0);
    stubServer({
      'GET /api/session': () => ({ json: aSession('technician') }),
      [`GET /api/loads/${loadId}`]: () => ({ json: load }),
    });
    const { user } = renderApp(`/loads/${loadId}`);
    const findings = within(await screen.findByRole('region', { name: 'Findings' }));
    expect(findings.getByRole('heading')).toHaveTextContent('Findings, 1');
    for (const title of today) expect(screen.queryByRole('button', { name: new RegExp(title) })).toBeNull();
    await user.click(findings.getByRole('button', { name: /Something of long ago/ }));
    expect(findings.getByText('It mattered then.')).toBeVisible();
    // Of a rule that there is no more there is no lesson.
    expect(screen.queryByRole('button', { name: 'Why? 90 seconds' })).toBeNull();
  });

  it('names its policy version and rule set, and leads to the judgement by today’s', async () => {
    stubServer({
      'GET /api/session': () => ({ json: aSession('technician') }),
      [`GET /api/loads/${loadId}`]: () => ({ json: aClosedLoad() }),
    });
    renderApp(`/loads/${loadId}`);
    const closed = await screen.findByRole('region', { name: 'Closed' });
    expect(closed).toHaveTextContent('Policy version 4');
    expect(closed).toHaveTextContent('Rule set 2024-01-01.1');
    expect(within(closed).getByRole('link', { name: 'Judge it again' })).toHaveAttribute(
      'href',
      `/loads/${loadId}/judged-again`,
    );
  });
});
