/*
 * The load is not heavier than its program and its sterilizer were shown to cope with.
 * Source: RACGP section 10, loading: do not exceed the validated challenge load; the limits as entered by the facility.
 */
import { massOrNothing } from '../sensible';
import { overMassLimit } from './mass-limit';
import { onLoad } from './places';
import type { Draft, Rule } from './rule';
import type { Scene } from './scene';
import { racgpLoading } from './sources';

export const loadMass: Rule = {
  id: 'load-mass',
  about: 'load',
  name: 'The load is not too heavy',
  reason: 'A load heavier than the one that was validated heats and dries in a way nobody has shown.',
  source: racgpLoading,
  severity: 'stop',
  parameters: ['massMarginPercent'],
  find,
};

function find(scene: Scene): readonly Draft[] {
  const { program, sterilizer, loadId } = scene.view;
  const limits = [program.greatestLoadMassKg ?? Infinity, sterilizer.greatestLoadMassKg];
  const limit = Math.min(...limits.filter((one) => one > 0));
  if (!Number.isFinite(limit)) return [];
  const over = overMassLimit({
    what: 'the load',
    measured:
      scene.listed.reduce((sum, { item }) => sum + massOrNothing(item?.massKg ?? 0), 0) +
      scene.layout.holders.reduce((sum, holder) => sum + massOrNothing(holder.kind.massKg), 0),
    limit,
    marginPercent: scene.policy.massMarginPercent,
  });
  return over ? [{ subjects: [loadId], remedy: 'Take something off, for another load.', places: onLoad, ...over }] : [];
}
