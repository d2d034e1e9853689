/*
 * A perforated tray and a rigid container lie flat, parallel to the shelf.
 * Source: CDC guideline (2008), loading: perforated trays parallel to the shelf, as restated; a container by its instructions for use.
 */
import { hasToDrain, wrongPose } from './poses';
import type { Draft, Rule } from './rule';
import type { OnShelf, Scene } from './scene';
import { cdcLoading } from './sources';

export const trayFlat: Rule = {
  id: 'tray-flat',
  about: 'shelf',
  name: 'Trays and containers lie flat',
  reason:
    'On its side a set slides together into one heap that steam does not get through, and a container’s filters look the wrong way.',
  source: cdcLoading,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene, { bodies }: OnShelf): readonly Draft[] {
  return wrongPose(
    scene,
    bodies,
    (body) => {
      const { kind, pose } = body.item;
      const isTray = kind === 'rigid-container' || kind === 'wrapped-tray';
      return isTray && pose === 'flat' && !hasToDrain(body) && body.placement.pose !== 'flat';
    },
    {
      says: (body) => (body.placement.pose === 'on-edge' ? 'stands on edge, want it flat' : 'is tilted, want it flat'),
      remedy: 'Lay it flat on the shelf.',
      want: 'flat',
    },
  );
}
