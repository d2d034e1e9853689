import type { FindingPlace, RuleId } from '../../../src/domain/load/finding';
import type { LoadView } from '../../../src/domain/load/model';
import type { LoadPolicy } from '../../../src/domain/load/policy';
import type { Placed } from './geometry';
import type { LegalCart } from './legal-cart';
import type { Random } from './random';

/** A legal cart that a fault is to be planted in, with where its packages stand. */
export type Host = LegalCart & { readonly placed: readonly Placed[] };

export type Planted = {
  readonly view: LoadView;
  /** Where the fault needs other house rules than the cart's. */
  readonly policy?: LoadPolicy;
  /** It counts as found when a finding names one of these. */
  readonly at: readonly Place[];
  /** Where findings have to name every one of these. */
  readonly everyOne?: boolean;
  /** What the rule has to have measured, in the unit it tells it in, where this says it. */
  readonly measured?: number;
};

export type Place = string & { readonly of: 'place' };

/** One kind of fault, planted once in a copy of a cart. */
export type Fault = {
  readonly name: string;
  /** The rule that has to find it. */
  readonly rule: RuleId;
  /** Rules the trade would call as well for this very thing. */
  readonly orRules?: readonly RuleId[];
  /** null where the cart has nothing that could be spoilt in this way. */
  readonly plant: (host: Host, random: Random) => Planted | null;
};

export function placeKey(place: FindingPlace): Place {
  switch (place.on) {
    case 'load':
      return 'load' as Place;
    case 'shelf':
      return onShelf(place.shelfId);
    case 'holder':
      return onHolder(place.holderId);
    case 'package':
      return onPackage(place.packageId);
  }
}

export const onLoad = 'load' as Place;

export function onPackage(packageId: string): Place {
  return `package ${packageId}` as Place;
}

export function onHolder(holderId: string): Place {
  return `holder ${holderId}` as Place;
}

export function onShelf(shelfId: string): Place {
  return `shelf ${shelfId}` as Place;
}
