/*
 * No package that has been called back is in the load.
 * Source: New Jersey Administrative Code 8:43G-8.8(f): have a recall system; CDC guideline (2008), Table 12.
 */
import { takeOff } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { Listed, Scene } from './scene';
import { njMonitoring } from './sources';

export const packageCalledBack: Rule = {
  id: 'package-called-back',
  about: 'package',
  name: 'Nothing called back',
  reason: 'A package that was called back is accounted for first; in another load it would be lost from the recall.',
  source: njMonitoring,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene, { one }: Listed): Draft | null {
  if (one.state !== 'recalled') return null;
  return {
    subjects: [one.packageId],
    title: `${scene.nameOf(one)} has been called back`,
    remedy: 'Take it off the load and bring it to the lead.',
    places: onPackage(one),
    fixes: () => [takeOff(one)],
  };
}
