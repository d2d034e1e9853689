/*
 * A basin, or a tray without holes, is tilted or on edge so that water runs off.
 * Source: CDC guideline (2008), loading: solid containers and basins on edge, as restated; tilted to drain or mouth down is
 * general practice.
 */
import { hasToDrain, wrongPose } from './poses';
import type { Draft, Rule } from './rule';
import type { OnShelf, Scene } from './scene';
import { cdcLoading } from './sources';

export const basinDrains: Rule = {
  id: 'basin-drains',
  about: 'shelf',
  name: 'Basins drain',
  reason: 'Water collects in a basin that stands level, and air below it cannot get out.',
  source: cdcLoading,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene, { bodies }: OnShelf): readonly Draft[] {
  return wrongPose(scene, bodies, (body) => hasToDrain(body) && body.placement.pose === 'flat', {
    says: () => 'stands level, want it tilted to drain',
    remedy: 'Tilt it on a wedge, or stand it on edge.',
    want: 'tilted',
  });
}
