/*
 * No package is past the day its label names.
 * Source: the label; packages whose expiry is event-related carry no day.
 */
import { takeOff } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { Listed, Scene } from './scene';
import { commonPractice } from './sources';

export const packageExpired: Rule = {
  id: 'package-expired',
  about: 'package',
  name: 'No package has expired',
  reason: 'Past its day its packaging is not warranted to let steam in and keep germs out.',
  source: commonPractice,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene, { one }: Listed): Draft | null {
  // Calendar days written YYYY-MM-DD sort as text.
  if (one.expiresOn === null || one.expiresOn >= scene.view.today) return null;
  return {
    subjects: [one.packageId],
    title: `${scene.nameOf(one)} expired on ${one.expiresOn}`,
    remedy: 'Take it off the load and have it packed again.',
    places: onPackage(one),
    fixes: () => [takeOff(one)],
  };
}
