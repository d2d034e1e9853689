import { condensatePerKg, specificHeat, type Heating } from '../../steam/condensate';
import { latentHeat } from '../../steam/latent-heat';
import type { CatalogueItem, Metal } from '../model';
import { massOrNothing } from '../sensible';
import type { Scene } from './scene';

export type WaterOnMetal = {
  /** Water in kg that condenses on the metal of these items. */
  readonly kgOn: (items: Iterable<CatalogueItem | undefined>) => number;
  /** How it was worked out: "15.0 kg steel × 0.50 kJ/kgK × 112 K ÷ 2168 kJ/kg = 0.39 kg". */
  readonly working: (items: Iterable<CatalogueItem | undefined>) => string;
};

const metalWords: Readonly<Record<Metal, string>> = {
  'stainless-steel': 'steel',
  aluminium: 'aluminium',
  titanium: 'titanium',
};

/** The water that the steam of the load's program leaves on cold metal: m c dT / L. */
export function waterOnMetal(scene: Scene): WaterOnMetal {
  const heating: Heating = { startC: scene.policy.startTemperatureC, cycleC: scene.view.program.temperatureC };
  const perKg = condensatePerKg(heating);

  function kgOn(items: Iterable<CatalogueItem | undefined>): number {
    let sum = 0;
    for (const item of items) if (item) sum += massOrNothing(item.metalMassKg) * perKg[item.metal];
    return sum;
  }

  function working(items: Iterable<CatalogueItem | undefined>): string {
    const massOf = new Map<Metal, number>();
    const known = [...items].filter((item) => item !== undefined);
    for (const { metal, metalMassKg } of known) {
      massOf.set(metal, (massOf.get(metal) ?? 0) + massOrNothing(metalMassKg));
    }
    const heats = [...massOf]
      .filter(([, mass]) => mass > 0)
      .sort(([, a], [, b]) => b - a)
      .map(
        ([metal, mass]) =>
          `${mass.toFixed(1)} kg ${metalWords[metal]} × ${specificHeat[metal].toFixed(3).replace(/0$/, '')} kJ/kgK`,
      );
    const heat = heats.length > 1 ? `(${heats.join(' + ')})` : (heats[0] ?? '0 kg');
    const rise = Math.max(heating.cycleC - heating.startC, 0).toFixed(0);
    const latent = latentHeat(heating.cycleC).toFixed(0);
    return `${heat} × ${rise} K ÷ ${latent} kJ/kg = ${kgOn(known).toFixed(2)} kg`;
  }

  return { kgOn, working };
}
