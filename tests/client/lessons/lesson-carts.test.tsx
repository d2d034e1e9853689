import { letterFindings } from '#domain/load/evaluate-load';
import { ruleIds } from '#domain/load/finding';
import { lessonOf } from '#domain/lessons/all-lessons';
import { judgeLesson, lessonPolicy } from '#domain/lessons/judge-lesson';
import { render, screen, within } from '@testing-library/react';
import { beforeEach, describe, expect, it } from 'vitest';
import { LessonCart } from '../../../src/features/lessons/components/lesson-cart';
import { measureNothing } from './unmeasured';

beforeEach(measureNothing);

function show(ruleId: (typeof ruleIds)[number], side: 'bad' | 'good') {
  const lesson = lessonOf(ruleId);
  const found = letterFindings(judgeLesson(ruleId)[side].filter((finding) => finding.ruleId === ruleId));
  render(
    <LessonCart
      side={side}
      cart={lesson[side]}
      other={lesson[side === 'bad' ? 'good' : 'bad']}
      pictures={lesson.pictures}
      policy={lessonPolicy(ruleId)}
      findings={found}
    />,
  );
  return { cart: screen.getByRole('region', { name: `The ${side} cart` }), found };
}

/** Letters on the drawings and on the cards, without those of the list below them. */
function pinsIn(cart: HTMLElement): string[] {
  const onDrawings = [...cart.querySelectorAll('svg g text')].map((text) => text.textContent);
  const onCards = [...cart.querySelectorAll('[data-card] [data-pin]')].map((pin) => pin.getAttribute('data-pin') ?? '');
  return [...new Set([...onDrawings, ...onCards].filter((text) => /^[A-Z]$/.test(text)))].sort();
}

describe.each(ruleIds)('the drawings of %s', (ruleId) => {
  it('pin each wrong place of the bad cart, name it below, and say it in words', () => {
    const { cart, found } = show(ruleId, 'bad');
    expect(pinsIn(cart)).toEqual(found.map(({ letter }) => letter));
    const list = within(cart).getAllByText((_text, element) => element?.tagName === 'SPAN', { exact: true });
    for (const { finding } of found) {
      expect(list.some((span) => span.textContent === finding.title)).toBe(true);
      const words = within(cart).getByRole('region', { name: 'The bad cart in words' });
      const isOnTheMap = finding.places.some(({ on }) => on !== 'load');
      if (isOnTheMap) expect(words).toHaveTextContent(finding.title);
    }
  });

  it('pin nothing on the good cart', () => {
    const { cart } = show(ruleId, 'good');
    expect(pinsIn(cart)).toEqual([]);
    expect(within(cart).getByText('The rules find nothing to put right.')).toBeInTheDocument();
    expect(cart.querySelectorAll('svg').length).toBeGreaterThan(0);
  });
});

describe('a card beside the drawing', () => {
  const line = (cart: HTMLElement, label: string) =>
    within(cart)
      .getAllByRole('term')
      .find((term) => term.textContent.endsWith(label))?.parentElement ?? null;

  it('shows the one line that is not as it has to be', () => {
    const { cart } = show('package-expired', 'bad');
    expect(line(cart, 'Expires')).toHaveTextContent('1 March 2026');
    expect(within(cart).getByText('1 March 2026')).toHaveClass('text-madder-3');
    expect(within(cart).getByText('paper-film pouch')).not.toHaveClass('text-madder-3');
  });

  it('says what was scanned and counted, and what is missing', () => {
    const { cart } = show('count-differs', 'bad');
    expect(line(cart, 'Lower shelf')).toHaveTextContent('2 scanned, 3 counted');
  });

  it('says what no drawing can show: a test that was not made', () => {
    const { cart } = show('air-removal-test', 'bad');
    expect(line(cart, 'Air-removal test today')).toHaveTextContent('none');
  });

  it('adds up what stands on a shelf, with its rack', () => {
    const { cart } = show('pouch-mass', 'bad');
    // Two pouches of 0.12 kg, one of 0.9 kg, and the rack of 1 kg.
    expect(line(cart, 'Lower shelf')).toHaveTextContent('2.1 kg, made for 30 kg');
  });
});
