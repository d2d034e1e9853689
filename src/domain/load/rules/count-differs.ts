/*
 * On each shelf as many pieces were counted as were scanned.
 * Source: our own rule; accountability for each package asks for nothing unscanned.
 */
import { onShelf } from './places';
import type { Draft, Rule } from './rule';
import type { Scene } from './scene';
import { talliesOf } from './shelf-tally';
import { accountability } from './sources';

export const countDiffers: Rule = {
  id: 'count-differs',
  about: 'load',
  name: 'Counted as many as scanned',
  reason: 'Where the numbers differ, something was never scanned or is not where the map says.',
  source: accountability,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene): readonly Draft[] {
  return talliesOf(scene).flatMap(({ shelf, scanned, counted }) => {
    if (counted === null || counted === scanned) return [];
    const missing = counted > scanned ? `${counted - scanned} not scanned` : `${scanned - counted} not there`;
    return {
      subjects: [shelf.id],
      title: `${shelf.name}: counted ${counted}, scanned ${scanned}, so ${missing}`,
      remedy:
        counted > scanned ? 'Find what was not scanned and scan it.' : 'Count again, then look for what is missing.',
      places: onShelf(shelf),
      figure: { measured: counted, limit: scanned, unit: 'count', want: 'exactly', limitFrom: 'default' },
    };
  });
}
