import type { HolderKind, Program, ServiceState, Shelf, Sterilizer } from '../load/model';

/* Everything a person states about a piece of equipment. */

export type SizeClass = 'large' | 'small';
export type HolderCondition = 'good' | 'in-repair' | 'missing';

export type ProgramFields = Omit<Program, 'id'> & { readonly isRetired: boolean };

export type SterilizerFields = Omit<Sterilizer, 'id'> & {
  /** Carts of the same class fit it. */
  readonly sizeClass: SizeClass;
  readonly steamLine: string;
  readonly hasAirDetector: boolean;
  /** Codes of the programs it is qualified for. */
  readonly qualifiedPrograms: readonly string[];
  /** Codes of programs its panel offers although it is not qualified for them. */
  readonly otherPrograms: readonly string[];
};

export type ShelfFields = Omit<Shelf, 'id' | 'placeCode'>;

export type CartFields = {
  readonly code: string;
  readonly name: string;
  readonly sizeClass: SizeClass;
  readonly isUsable: boolean;
  readonly note: string;
  readonly shelves: readonly ShelfFields[];
};

/** A cart's shelf as one line of a file: what is the cart's own stands on each of its lines. */
export type ShelfLine = ShelfFields & {
  readonly cartCode: string;
  readonly cartName: string;
  readonly sizeClass: SizeClass;
  readonly isCartUsable: boolean;
  readonly cartNote: string;
  /** Given by us, never typed; null for a shelf that is new. */
  readonly placeCode: string | null;
};

export type HolderKindFields = Omit<HolderKind, 'id'> & { readonly owned: number };

export type HolderFields = {
  readonly name: string;
  /** Code of its kind. */
  readonly kind: string;
  readonly condition: HolderCondition;
  /** Given by us, never typed; null for a holder that is new. */
  readonly placeCode: string | null;
};

export const sizeClasses = ['large', 'small'] as const satisfies readonly SizeClass[];
export const surfaces = ['wire', 'solid'] as const satisfies readonly Shelf['surface'][];
export const holderForms = ['rack', 'basket', 'wedge', 'spacer'] as const satisfies readonly HolderKind['form'][];
export const holderConditions = ['good', 'in-repair', 'missing'] as const satisfies readonly HolderCondition[];
export const serviceStates = [
  'in-service',
  'out-of-service',
  'awaiting-requalification',
] as const satisfies readonly ServiceState[];
