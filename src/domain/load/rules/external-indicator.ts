/*
 * Each package carries an external chemical indicator, unless the one inside can be seen through the package.
 * Source: CDC guideline (2008), monitoring 2: inside and outside each package; outside not needed where inside is visible (read in a copy).
 */
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { Listed, Scene } from './scene';
import { cdcMonitoring } from './sources';

export const externalIndicator: Rule = {
  id: 'external-indicator',
  about: 'package',
  name: 'External CI on each package',
  reason: 'Without it nobody can tell by sight a package that has been through the sterilizer from one that has not.',
  source: cdcMonitoring,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene, { one, item }: Listed): Draft | null {
  if (one.hasExternalIndicator || item?.kind === 'challenge-device') return null;
  if (item?.kind === 'pouch' && one.hasInternalIndicator) return null;
  return {
    subjects: [one.packageId],
    title: `${scene.nameOf(one)} has no external CI`,
    remedy: 'Put an external CI on it and say so at packing.',
    places: onPackage(one),
  };
}
