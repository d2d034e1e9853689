import type { CatalogueItem } from '../load/model';
import type { Second } from '../units/quantity';

/** Everything a person states about an item, once for all its packages. */
export type ItemFields = Omit<CatalogueItem, 'id'> & {
  /** Time to cool after the cycle before it is touched. */
  readonly coolS: Second;
  readonly expiryRule: 'event-related' | 'dated';
  readonly expiryDays: number | null;
  /** A GTIN of 14 digits, or a HIBC identifier without its "+" and check character. */
  readonly deviceIdentifier: string | null;
  readonly ifuRevision: string | null;
  /** Where it is used, in the facility's own words. */
  readonly service: string;
  readonly note: string;
};

export const itemKinds = [
  'pouch',
  'rigid-container',
  'wrapped-tray',
  'basin',
  'textile-pack',
  'challenge-device',
] as const satisfies readonly CatalogueItem['kind'][];

export const packagings = [
  'paper-film-pouch',
  'double-pouch',
  'wrap',
  'rigid-container',
  'none',
] as const satisfies readonly CatalogueItem['packaging'][];

export const poses = ['flat', 'on-edge', 'tilted'] as const satisfies readonly CatalogueItem['pose'][];

export const pouchFacings = ['one-way', 'alternating'] as const satisfies readonly CatalogueItem['facing'][];

export const metals = ['stainless-steel', 'aluminium', 'titanium'] as const satisfies readonly CatalogueItem['metal'][];

export const expiryRules = ['event-related', 'dated'] as const satisfies readonly ItemFields['expiryRule'][];
