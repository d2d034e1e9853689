/*
 * Each package has an internal chemical indicator.
 * Source: New Jersey Administrative Code 8:43G-8.8: a chemical indicator in each package; CDC guideline (2008), monitoring 2.
 */
import { takeOff } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { Listed, Scene } from './scene';
import { njMonitoring } from './sources';

export const internalIndicator: Rule = {
  id: 'internal-indicator',
  about: 'package',
  name: 'Internal CI in each package',
  reason: 'Only an indicator inside shows that steam came into the package.',
  source: njMonitoring,
  severity: 'accept',
  parameters: [],
  find,
};

function find(scene: Scene, { one, item }: Listed): Draft | null {
  if (one.hasInternalIndicator || item?.kind === 'challenge-device') return null;
  return {
    subjects: [one.packageId],
    title: `${scene.nameOf(one)} was packed without an internal CI`,
    remedy: 'Take it off the load and have it packed again.',
    places: onPackage(one),
    fixes: () => [takeOff(one)],
  };
}
