import type { JudgedAgain } from '#contract/judged-again';
import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer } from '../../support/server-stub';
import { aFinding, aJudgement, loadId } from './a-policy';

const path = `/api/loads/${loadId}/judged-again`;

function openScreen(judged: JudgedAgain = aJudgement()) {
  const server = stubServer({
    'GET /api/session': () => ({ json: aSession('technician') }),
    [`GET ${path}`]: () => ({ json: judged }),
  });
  return { ...renderApp(`/loads/${loadId}/judged-again`), server };
}

describe('a closed load judged again', () => {
  it('says that the verdict of then stands, and names both versions and rule sets', async () => {
    openScreen();
    expect(await screen.findByText('The verdict of then stands.')).toBeInTheDocument();
    const then = screen.getByRole('region', { name: 'As closed' });
    expect(then).toHaveTextContent('Policy version 1, from 1 February 2026');
    expect(then).toHaveTextContent('rule set 2026-01-01.1');
    expect(then).toHaveTextContent('by Dele Oyelaran');
    expect(then).toHaveTextContent('3 findings');
    const now = screen.getByRole('region', { name: 'By today’s rules' });
    expect(now).toHaveTextContent('Policy version 2, from 20 February 2026');
    expect(now).toHaveTextContent('rule set 2026-03-01.1');
    expect(now).toHaveTextContent('2 things would hold it open');
    expect(screen.getByRole('link', { name: 'Back to the load' })).toHaveAttribute('href', `/loads/${loadId}`);
  });

  it('shows side by side what is judged otherwise, what only now, what only then, and what both say', async () => {
    openScreen();
    const sides = async (name: string) => {
      const [row] = within(await screen.findByRole('region', { name })).getAllByRole('listitem');
      return [...(row?.children ?? [])].map((side) => side.textContent);
    };
    const figure = '12 mm, want at least 25 mm (default)';
    const source = 'Common practice, no source.';
    expect(await sides('Judged otherwise today, 1')).toEqual([
      `As closedFinding ALook again${figure}${source}`,
      `By today’s rulesFinding AHolds the load${figure}${source}`,
    ]);
    expect(await sides('Found only today, 1')).toEqual([
      'As closedNo such finding.',
      `By today’s rulesFinding CLook again${figure}${source}`,
    ]);
    expect(await sides('Found only then, 1')).toEqual([
      `As closedFinding BLook again${figure}${source}Left as it is by Lucasta Mburu: “It was dry before.”`,
      'By today’s rulesNo such finding any more.',
    ]);
    expect((await sides('The same then and today, 1'))[1]).toContain('Finding D');
  });

  it('says so where neither finds anything', async () => {
    openScreen(aJudgement({ comparison: { changed: [], onlyNow: [], onlyThen: [], both: [] } }));
    expect(await screen.findByText(/Neither the rules of then nor those of today/)).toBeInTheDocument();
  });

  it('shows what it was closed with, and why no more, where it cannot be judged again', async () => {
    openScreen(aJudgement({ now: null, comparison: null, whyNot: 'It was closed long ago.' }));
    expect(await screen.findByText('It was closed long ago.')).toBeInTheDocument();
    expect(screen.queryByRole('region', { name: 'By today’s rules' })).not.toBeInTheDocument();
    const found = screen.getByRole('region', { name: 'What was found then, 3' });
    expect(within(found).getAllByRole('listitem')).toHaveLength(3);
  });

  it('shows figures in units that nobody uses any more as they were kept', async () => {
    const old = aFinding('E', {
      figure: { measured: 3.14159, limit: 4, unit: 'fathom', want: 'exactly', limitFrom: 'a custom' },
    });
    openScreen(aJudgement({ comparison: { changed: [], onlyNow: [], onlyThen: [old], both: [] } }));
    expect(await screen.findByText('3.1 fathom, want 4 fathom (a custom)')).toBeInTheDocument();
  });

  it('says why, where the load is not closed', async () => {
    const { server } = openScreen();
    server.handlers[`GET ${path}`] = () => ({
      problem: 'load.not-closed',
      status: 422,
      detail: 'Only a closed load can be judged again.',
    });
    expect(await screen.findByText('Only a closed load can be judged again.')).toBeInTheDocument();
    expect(screen.getByRole('link', { name: 'Go to the load' })).toHaveAttribute('href', `/loads/${loadId}`);
  });
});
