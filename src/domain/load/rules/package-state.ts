/*
 * Only packages that are packed and wait to be sterilized are in the load, and none that somebody holds.
 * Source: our own table of the states of a package.
 */
import type { PackageState } from '../model';
import { takeOff } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { Listed, Scene } from './scene';
import { drawing } from './sources';

export const packageState: Rule = {
  id: 'package-state',
  about: 'package',
  name: 'Packages are ready for the sterilizer',
  reason: 'A package that was processed, used or set aside has to be cleaned and packed again first.',
  source: drawing,
  severity: 'stop',
  parameters: [],
  find,
};

const isReady: ReadonlySet<PackageState> = new Set<PackageState>(['packed', 'staged', 'in-load']);

const stateWords: Readonly<Record<PackageState, string>> = {
  packed: 'is packed',
  staged: 'is staged',
  'in-load': 'is in a load',
  processed: 'has already been through a sterilizer',
  sterile: 'is already sterile',
  quarantined: 'is held',
  stored: 'is in storage',
  'on-case-cart': 'is on a case cart',
  used: 'has been used',
  returned: 'has come back and was not packed again',
  recalled: 'has been called back',
  discarded: 'was thrown away',
};

function find(scene: Scene, { one }: Listed): Draft | null {
  const { heldReason } = one;
  // Called back is told by its own rule.
  if (one.state === 'recalled' || (isReady.has(one.state) && heldReason === null)) return null;
  const name = scene.nameOf(one);
  return {
    subjects: [one.packageId],
    title: heldReason === null ? `${name} ${stateWords[one.state]}` : `${name} is held: ${heldReason}`,
    remedy: 'Take it off the load.',
    places: onPackage(one),
    fixes: () => [takeOff(one)],
  };
}
