import type { Draft } from './rule';
import { slackKg } from './slack';
import { figureWords, sentence } from './words';
import { houseRule } from './sources';

type Weighed = {
  readonly what: string;
  readonly measured: number;
  readonly limit: number;
  readonly marginPercent: number;
};

/** Over the limit of the equipment it holds the load; over the part the facility keeps back a lead may accept it. */
export function overMassLimit(weighed: Weighed): Pick<Draft, 'title' | 'figure' | 'severity' | 'source'> | null {
  const { what, measured, limit, marginPercent } = weighed;
  const kept = limit * (1 - marginPercent / 100);
  if (measured > limit + slackKg) {
    const figure = { measured, limit, unit: 'kg', want: 'at-most', limitFrom: 'equipment' } as const;
    const words = figureWords(figure);
    return { title: `${sentence(what)} weighs ${words.measured}, want at most ${words.limit}`, figure };
  }
  if (!(measured > kept + slackKg)) return null;
  const figure = { measured, limit: kept, unit: 'kg', want: 'at-most', limitFrom: 'house-rule' } as const;
  const words = figureWords(figure);
  return {
    title: `${sentence(what)} weighs ${words.measured}, close to its limit: want at most ${words.limit}`,
    figure,
    severity: 'accept',
    source: houseRule,
  };
}
