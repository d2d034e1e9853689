/*
 * Every label on the list is one this facility knows: it has a code, and the catalogue has the item it names.
 * Source: accountability for each package; New Jersey Administrative Code 8:43G-8.11(f), specific contents of each load.
 */
import { takeOff } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { Listed, Scene } from './scene';
import { accountability } from './sources';

export const labelKnown: Rule = {
  id: 'label-known',
  about: 'package',
  name: 'Labels are known',
  reason: 'A package that nobody can name cannot be checked against its instructions, nor be found again.',
  source: accountability,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene, { one, item }: Listed): Draft | null {
  if (item && one.code.trim() !== '') return null;
  return {
    subjects: [one.packageId],
    title: item
      ? `${scene.nameOf(one)} has no label code`
      : `${one.code || 'A package'} is of an item that is not in the catalogue`,
    remedy: item ? 'Take it off the load and print it a label.' : 'Take it off the load and have its item entered.',
    places: onPackage(one),
    fixes: () => [takeOff(one)],
  };
}
