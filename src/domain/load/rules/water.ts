/*
 * The water that steam leaves on the metal of the load can dry in the time the program gives it.
 * Source: condensate m c dT / L from data-handbook heats and IAPWS-IF97 latent heat; how much a minute of drying removes has no
 * published figure and is the facility's to learn from its own wet loads.
 */
import { limitOf } from '../policy';
import { massOrNothing } from '../sensible';
import { onLoad, onShelf } from './places';
import type { Draft, Rule } from './rule';
import type { Scene } from './scene';
import { waterOnMetal } from './water-on-metal';

export const water: Rule = {
  id: 'water',
  about: 'load',
  name: 'The load can dry',
  reason: 'Steam turns to water on cold metal, and what does not dry in time makes a wet load.',
  source: {
    text: 'Condensate = mass × specific heat × temperature rise ÷ latent heat (data handbooks; IAPWS-IF97). What a minute of drying removes: house rule, no published figure.',
    provenance: 'house-rule',
  },
  severity: 'advice',
  parameters: ['waterPerDryMinute', 'startTemperatureC'],
  find,
};

function find(scene: Scene): readonly Draft[] {
  const { program, loadId } = scene.view;
  const { kgOn, working } = waterOnMetal(scene);
  const perMinute = limitOf(null, scene.policy, 'waterPerDryMinute');
  const limit = (perMinute.limit * program.dryS) / 60;
  const items = scene.listed.map(({ item }) => item);
  const measured = kgOn(items);
  if (!(measured > limit)) return [];
  const metal = items.reduce((sum, item) => sum + massOrNothing(item?.metalMassKg ?? 0), 0);
  const wettest = scene.layout.shelves
    .map(({ shelf, bodies }) => ({ shelf, kg: kgOn(bodies.map((body) => body.item)) }))
    .sort((a, b) => b.kg - a.kg)[0];
  const figure = { measured, limit, unit: 'kg', want: 'at-most', limitFrom: perMinute.limitFrom } as const;
  const minutes = Math.round(program.dryS / 60);
  return [
    {
      subjects: [loadId],
      title: `${metal.toFixed(1)} kg of metal will leave about ${measured.toFixed(2)} kg of water, ${minutes} min of drying is reckoned to remove ${limit.toFixed(2)} kg`,
      remedy: 'Take a program that dries longer, or spread the metal over more loads.',
      reason: `Steam turns to water on cold metal${wettest && wettest.kg > 0 ? `, most of it here on ${wettest.shelf.name} (${wettest.kg.toFixed(2)} kg)` : ''}, and what does not dry in time makes a wet load. ${working(items)}; ${minutes} min × ${tidyPerMinute(perMinute.limit)} kg of water a minute = ${limit.toFixed(2)} kg.`,
      places: [...onLoad, ...(wettest && wettest.kg > 0 ? onShelf(wettest.shelf) : [])],
      figure,
      *fixes(scene) {
        const longer = scene.view.qualifiedPrograms
          .filter(
            (one) => one.type === program.type && one.temperatureC === program.temperatureC && one.dryS > program.dryS,
          )
          .sort((a, b) => a.dryS - b.dryS);
        for (const one of longer) {
          yield { label: `Change the program to ${one.code}`, edits: [{ edit: 'change-program', programId: one.id }] };
        }
      },
    },
  ];
}

function tidyPerMinute(kgPerMinute: number): string {
  return String(Number(kgPerMinute.toFixed(4)));
}
