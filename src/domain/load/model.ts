import type { Celsius, Kilogram, Millimetre, Second } from '../units/quantity';

/*
 * Frames. Every length is in millimetres.
 *   shelf frame  x to the right, y away from the door, z up; origin at the shelf's left corner at the door end, on its deck.
 *   item frame   the item lying flat: x along its length, y along its width, z up; origin at one lower corner.
 *   holder frame the holder unturned: x across its slots (slot 1 is at the left), y along the slots.
 * "Left" and "right" are always as seen from the door end.
 */

export type ItemKind = 'pouch' | 'rigid-container' | 'wrapped-tray' | 'basin' | 'textile-pack' | 'challenge-device';
export type Packaging = 'paper-film-pouch' | 'double-pouch' | 'wrap' | 'rigid-container' | 'none';
export type Metal = 'stainless-steel' | 'aluminium' | 'titanium';

/** How a thing rests: flat as its catalogue height says, on its long edge, or tilted to drain. */
export type Pose = 'flat' | 'on-edge' | 'tilted';

/** Where a pouch's paper side looks. In a rack: left is towards slot 1. Lying flat: up or down. */
export type PaperSide = 'left' | 'right' | 'up' | 'down';

/** How pouches face their neighbours. One way: all paper sides look the same way. Alternating: paper faces paper and film faces film. */
export type PouchFacing = 'one-way' | 'alternating';

/** Quarter turn seen from above: 0 is length away from the door (along y), 90 is length across (along x). */
export type Turn = 0 | 90;

export type CycleType = 'dynamic-air-removal' | 'gravity' | 'immediate-use';

/** One discrete cycle an item's instructions for use permit; never a range to pick from. */
export type CycleNeed = {
  readonly type: CycleType;
  readonly temperatureC: Celsius;
  readonly leastExposureS: Second;
  readonly greatestExposureS: Second | null;
  readonly leastDryS: Second;
};

/** A rectangle of open filter in the item frame. */
export type FilterZone = {
  readonly face: 'lid' | 'base';
  readonly xMm: Millimetre;
  readonly yMm: Millimetre;
  readonly lengthMm: Millimetre;
  readonly widthMm: Millimetre;
};

export type CatalogueItem = {
  readonly id: string;
  readonly code: string;
  readonly name: string;
  readonly kind: ItemKind;
  readonly packaging: Packaging;
  /** Lying flat: long side, short side, height. For a pouch the height is its thickness when full. */
  readonly lengthMm: Millimetre;
  readonly widthMm: Millimetre;
  readonly heightMm: Millimetre;
  readonly massKg: Kilogram;
  readonly metalMassKg: Kilogram;
  readonly textileMassKg: Kilogram;
  readonly metal: Metal;
  readonly isImplant: boolean;
  readonly pose: Pose;
  readonly isPerforated: boolean;
  /** Free space its instructions for use ask for on every side; null where they are silent. */
  readonly clearanceMm: Millimetre | null;
  /** Codes of the items it may stand on. Empty: on nothing but a shelf. */
  readonly standsOn: readonly string[];
  readonly greatestStackHeightMm: Millimetre | null;
  readonly filterZones: readonly FilterZone[];
  readonly cycleNeeds: readonly CycleNeed[];
  /** Code of the holder kind its pouch belongs in. */
  readonly preferredHolder: string | null;
  /** What the instructions for use of its pouch ask for; null where they are silent, and for everything else. */
  readonly facing: PouchFacing | null;
  /** From its instructions for use; null where they are silent. */
  readonly massLimitKg: Kilogram | null;
  readonly ifuReference: string | null;
  readonly isRetired: boolean;
};

export type PackageState =
  | 'packed'
  | 'staged'
  | 'in-load'
  | 'processed'
  | 'sterile'
  | 'quarantined'
  | 'stored'
  | 'on-case-cart'
  | 'used'
  | 'returned'
  | 'recalled'
  | 'discarded';

export type Placement =
  | {
      readonly at: 'shelf';
      readonly shelfId: string;
      readonly xMm: Millimetre;
      readonly yMm: Millimetre;
      readonly turn: Turn;
      readonly pose: Pose;
      readonly paper: PaperSide | null;
    }
  /** On edge in a rack's slot, counted from 1. A slot may hold two by mistake: that is a finding, not an impossibility. */
  | {
      readonly at: 'slot';
      readonly holderId: string;
      readonly slot: number;
      readonly pose: Pose;
      readonly paper: PaperSide | null;
    }
  /** Loose in an open basket; x and y in the basket's frame. */
  | {
      readonly at: 'basket';
      readonly holderId: string;
      readonly xMm: Millimetre;
      readonly yMm: Millimetre;
      readonly turn: Turn;
      readonly pose: Pose;
      readonly paper: PaperSide | null;
    }
  /** Standing on another package; x and y in the shelf frame of the shelf the stack stands on. */
  | {
      readonly at: 'package';
      readonly belowPackageId: string;
      readonly xMm: Millimetre;
      readonly yMm: Millimetre;
      readonly turn: Turn;
      readonly pose: Pose;
      readonly paper: PaperSide | null;
    };

export type LoadPackage = {
  readonly packageId: string;
  readonly code: string;
  readonly itemId: string;
  readonly isScanned: boolean;
  readonly placement: Placement | null;
  readonly state: PackageState;
  readonly heldReason: string | null;
  /** Calendar day, YYYY-MM-DD; null where expiry is event-related. */
  readonly expiresOn: string | null;
  readonly hasExternalIndicator: boolean;
  readonly hasInternalIndicator: boolean;
};

export type HolderKind = {
  readonly id: string;
  readonly code: string;
  readonly name: string;
  readonly form: 'rack' | 'basket' | 'wedge' | 'spacer';
  readonly slots: number | null;
  readonly pitchMm: Millimetre | null;
  /** Greatest pouch it takes, standing: height, length along the slot, thickness. */
  readonly greatestHeightMm: Millimetre | null;
  readonly greatestLengthMm: Millimetre | null;
  readonly greatestThicknessMm: Millimetre | null;
  readonly acrossMm: Millimetre;
  readonly alongMm: Millimetre;
  readonly massKg: Kilogram;
};

export type LoadHolder = {
  readonly holderId: string;
  readonly name: string;
  readonly placeCode: string;
  readonly kindId: string;
  readonly shelfId: string;
  readonly xMm: Millimetre;
  readonly yMm: Millimetre;
  /** 0: across is along x. 90: across is along y, slot 1 nearest the door. */
  readonly turn: Turn;
};

export type Shelf = {
  readonly id: string;
  /** 1 is the lowest. */
  readonly level: number;
  readonly name: string;
  readonly placeCode: string;
  readonly widthMm: Millimetre;
  readonly depthMm: Millimetre;
  readonly clearHeightMm: Millimetre;
  readonly surface: 'wire' | 'solid';
  readonly greatestMassKg: Kilogram;
  readonly isUsable: boolean;
};

export type Cart = {
  readonly id: string;
  readonly code: string;
  readonly name: string;
  readonly shelves: readonly Shelf[];
};

export type ServiceState = 'in-service' | 'out-of-service' | 'awaiting-requalification';

export type Sterilizer = {
  readonly id: string;
  readonly code: string;
  readonly number: string;
  readonly name: string;
  readonly chamberWidthMm: Millimetre;
  readonly chamberDepthMm: Millimetre;
  readonly chamberHeightMm: Millimetre;
  /** Drain in the frame of the cart's lowest shelf. */
  readonly drainXMm: Millimetre;
  readonly drainYMm: Millimetre;
  readonly greatestLoadMassKg: Kilogram;
  readonly needsAirRemovalTest: boolean;
  readonly serviceState: ServiceState;
};

export type Program = {
  readonly id: string;
  readonly code: string;
  readonly name: string;
  readonly type: CycleType;
  readonly temperatureC: Celsius;
  readonly exposureS: Second;
  readonly dryS: Second;
  readonly greatestLoadMassKg: Kilogram | null;
};

/** The day's air-removal test of the load's sterilizer, as far as it is known. */
export type AirRemovalState = { readonly result: 'passed' | 'failed'; readonly testedAt: string } | null;

export type ShelfCount = { readonly shelfId: string; readonly counted: number };

export type Acceptance = { readonly findingKey: string; readonly ruleId: string; readonly reason: string };

/** Everything the rules look at: one load being built, with the catalogue entries and equipment it refers to. */
export type LoadView = {
  readonly loadId: string;
  readonly sterilizer: Sterilizer;
  readonly program: Program;
  /** Programs this sterilizer is qualified for, the chosen one among them. */
  readonly qualifiedPrograms: readonly Program[];
  readonly cart: Cart;
  readonly holders: readonly LoadHolder[];
  readonly holderKinds: readonly HolderKind[];
  readonly items: readonly CatalogueItem[];
  readonly packages: readonly LoadPackage[];
  readonly counts: readonly ShelfCount[];
  readonly acceptances: readonly Acceptance[];
  readonly airRemoval: AirRemovalState;
  /** The facility's calendar day, YYYY-MM-DD: what "expired" and "of the day" are measured against. */
  readonly today: string;
};
