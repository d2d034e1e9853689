/*
 * A thing stands on another only where its instructions for use name that one, and so that it does not tip.
 * Source: instructions for use; where they are silent nothing is stacked (RACGP section 10, general practice).
 */
import { commonRect } from '../../geometry/box';
import type { Body } from '../layout';
import { elsewhere } from './moves';
import { isMetalOver } from './metal';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { OnShelf, Scene } from './scene';
import { instructions } from './sources';

export const stackNotPermitted: Rule = {
  id: 'stack-not-permitted',
  about: 'shelf',
  name: 'Stacks only where instructions permit them',
  reason: 'A thing on top keeps steam from what is below it and drips on it while it dries.',
  source: instructions,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene, { bodies }: OnShelf): readonly Draft[] {
  return bodies.flatMap((body) => {
    const { below, item } = body;
    // A pouch on something is out of its holder or lies flat; metal on a textile is told as that.
    if (!below || item.kind === 'pouch' || isMetalOver(body, below, scene.policy)) return [];
    const isListed = item.standsOn.includes(below.item.code);
    if (isListed && isSteady(body, below)) return [];
    const [upper, lower] = [scene.nameOf(body.package), scene.nameOf(below.package)];
    return {
      subjects: [body.packageId, below.packageId],
      title: isListed
        ? `${upper} hangs so far over ${lower} that it would tip`
        : `${upper} stands on ${lower}, which its instructions do not permit`,
      remedy: isListed ? 'Put it square on top, or on a shelf.' : 'Put it on a shelf.',
      places: onPackage(body, below),
      fixes: (scene) => elsewhere(scene, { one: body.package, item, body }),
    };
  });
}

function isSteady(body: Body, below: Body): boolean {
  const under = commonRect(body.box, below.box);
  if (!under) return false;
  const x = (body.box.left + body.box.right) / 2;
  const y = (body.box.front + body.box.back) / 2;
  return x > under.left && x < under.right && y > under.front && y < under.back;
}
