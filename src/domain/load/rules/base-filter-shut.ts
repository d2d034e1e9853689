/*
 * The filters in the base of a rigid container are over an open shelf, not over a solid one or another package.
 * Source: common practice, no source. Many containers stand on feet that keep the filter clear; whether this one does is in its
 * instructions for use, so it is worth a note and no more.
 */
import { areaOf, commonRect, coveredArea } from '../../geometry/box';
import { filterRects, type Body } from '../layout';
import { elsewhere } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { OnShelf, Scene } from './scene';
import { commonPractice } from './sources';
import { figureWords } from './words';

export const baseFilterShut: Rule = {
  id: 'base-filter-shut',
  about: 'shelf',
  name: 'Base filters stay open',
  reason:
    'Air leaves a container downwards and water drains out of it; a base filter that lies on something lets neither through, unless the container stands on feet.',
  source: commonPractice,
  severity: 'advice',
  parameters: [],
  find,
};

function find(scene: Scene, { shelf, bodies }: OnShelf): readonly Draft[] {
  return bodies.flatMap((container) => {
    if (container.item.filterZones.length === 0) return [];
    const filters = filterRects(container, 'base');
    const whole = coveredArea(filters);
    if (whole <= 0) return [];
    const { below } = container;
    const isOnSolid = below === null && container.holder === null && shelf.surface === 'solid';
    const shut = isOnSolid ? filters : filters.flatMap((filter) => (below && commonRect(filter, below.box)) ?? []);
    if (!shut.some((rect) => areaOf(rect) > 1)) return [];
    return [
      draftOf(scene, container, {
        below,
        onto: below ? scene.nameOf(below.package) : shelf.name,
        share: coveredArea(shut) / whole,
      }),
    ];
  });
}

type Shut = { readonly below: Body | null; readonly onto: string; readonly share: number };

function draftOf(scene: Scene, container: Body, { below, onto, share }: Shut): Draft {
  const figure = {
    measured: Math.min(share, 1) * 100,
    limit: 0,
    unit: '%',
    want: 'at-most',
    limitFrom: 'default',
  } as const;
  return {
    subjects: [container.packageId, ...(below ? [below.packageId] : [])],
    title: `${figureWords(figure).measured} of the base filter of ${scene.nameOf(container.package)} lies on ${onto}`,
    remedy: 'See in its instructions for use whether its feet keep the filter clear; else put it on a wire shelf.',
    places: onPackage(container, ...(below ? [below] : [])),
    figure,
    fixes: (now) => elsewhere(now, { one: container.package, item: container.item, body: container }),
  };
}
