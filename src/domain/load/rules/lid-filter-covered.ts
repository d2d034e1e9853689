/*
 * Nothing is over an open lid filter of a rigid container, neither wholly nor partly, standing on it or hanging over it.
 * Source: common practice; the container's instructions for use where they are on file.
 */
import { areaOf, commonRect, coveredArea } from '../../geometry/box';
import { filterRects, type Body } from '../layout';
import { moveAll } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import { slackMm } from './slack';
import type { OnShelf, Scene } from './scene';
import { commonPractice } from './sources';
import { figureWords, listWords, sourceOf } from './words';

export const lidFilterCovered: Rule = {
  id: 'lid-filter-covered',
  about: 'shelf',
  name: 'Lid filters stay open',
  reason:
    'Steam enters and air and water leave a rigid container through its filters; covered, it is not sterile or stays wet.',
  source: commonPractice,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene, { bodies }: OnShelf): readonly Draft[] {
  return bodies.flatMap((container) => {
    if (container.item.filterZones.length === 0) return [];
    const filters = filterRects(container, 'lid');
    const whole = coveredArea(filters);
    if (whole <= 0) return [];
    const above = bodies.filter((body) => body !== container && body.box.bottom >= container.box.top - slackMm);
    const covering = above.filter((body) => sharedWith(body, filters).some((rect) => areaOf(rect) > 1));
    if (covering.length === 0) return [];
    const share = coveredArea(covering.flatMap((body) => sharedWith(body, filters))) / whole;
    return [draftOf(scene, container, covering, share)];
  });
}

function sharedWith(body: Body, filters: ReturnType<typeof filterRects>) {
  return filters.flatMap((filter) => commonRect(body.box, filter) ?? []);
}

function draftOf(scene: Scene, container: Body, covering: readonly Body[], share: number): Draft {
  const figure = {
    measured: Math.min(share, 1) * 100,
    limit: 0,
    unit: '%',
    want: 'at-most',
    limitFrom: 'ifu',
  } as const;
  const verb = covering.length === 1 ? 'covers' : 'cover';
  const names = listWords(covering.map((body) => scene.nameOf(body.package)));
  return {
    subjects: [container.packageId, ...covering.map((body) => body.packageId)],
    title: `${names} ${verb} ${figureWords(figure).measured} of the lid filter of ${scene.nameOf(container.package)}`,
    remedy: `Take ${covering.length === 1 ? 'it' : 'them'} off the lid.`,
    places: onPackage(container, ...covering),
    figure,
    ...(container.item.ifuReference === null ? {} : { source: sourceOf('ifu', container.item, commonPractice) }),
    fixes: (scene) => moveAll(scene, covering),
  };
}
