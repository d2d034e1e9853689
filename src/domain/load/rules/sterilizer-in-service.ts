/*
 * The sterilizer is in service and not waiting to be qualified again.
 * Source: CDC guideline (2008), cycle verification: three consecutive cycles with indicators after major repair or failure, before use.
 */
import { onLoad } from './places';
import type { Draft, Rule } from './rule';
import type { Scene } from './scene';

export const sterilizerInService: Rule = {
  id: 'sterilizer-in-service',
  about: 'load',
  name: 'The sterilizer is in service',
  reason: 'A sterilizer that failed or was repaired has to show that it works before anything from it may be used.',
  source: {
    text: 'CDC guideline for disinfection and sterilization in healthcare facilities (2008), cycle verification (opening text and fragments).',
    provenance: 'published',
  },
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene): readonly Draft[] {
  const { sterilizer } = scene.view;
  if (sterilizer.serviceState === 'in-service') return [];
  const why = sterilizer.serviceState === 'out-of-service' ? 'is out of service' : 'waits to be qualified again';
  return [
    {
      subjects: [sterilizer.id],
      title: `${sterilizer.name} ${why}`,
      remedy: 'Build this load for another sterilizer.',
      places: onLoad,
    },
  ];
}
