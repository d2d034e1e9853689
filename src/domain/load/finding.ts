import type { Millimetre } from '../units/quantity';
import type { PaperSide, Placement, Pose, Turn } from './model';

/** stop: holds the load. accept: may stay with a lead's written reason. advice: a note. */
export type Severity = 'stop' | 'accept' | 'advice';

export type Source = {
  /** A published source with its section, "common practice, no source", or the value's own provenance. */
  readonly text: string;
  readonly provenance: 'published' | 'restated' | 'common-practice' | 'from-memory' | 'house-rule' | 'ifu';
};

/** Where on the map a finding points. */
export type FindingPlace =
  | { readonly on: 'load' }
  | { readonly on: 'shelf'; readonly shelfId: string }
  | { readonly on: 'holder'; readonly holderId: string; readonly slot: number | null }
  | { readonly on: 'package'; readonly packageId: string };

/** A figure that was measured against a limit, in SI with its unit: shown as "12 mm, want 25 mm". */
export type Figure = {
  readonly measured: number;
  readonly limit: number;
  readonly unit: 'mm' | 'kg' | 'deg' | '%' | 's' | 'degC' | 'count';
  readonly want: 'at-least' | 'at-most' | 'exactly';
  /** Where the limit came from. */
  readonly limitFrom: 'ifu' | 'house-rule' | 'default' | 'equipment';
};

/** One concrete change of a load. The same vocabulary serves the acts of people and the fixes of rules. */
export type LoadEdit =
  | { readonly edit: 'place'; readonly packageId: string; readonly placement: Placement }
  | { readonly edit: 'turn-paper'; readonly packageId: string; readonly paper: PaperSide }
  | { readonly edit: 'set-pose'; readonly packageId: string; readonly pose: Pose }
  | { readonly edit: 'take-off'; readonly packageId: string }
  | {
      readonly edit: 'place-holder';
      readonly holderId: string;
      readonly shelfId: string;
      readonly xMm: Millimetre;
      readonly yMm: Millimetre;
      readonly turn: Turn;
    }
  | { readonly edit: 'take-holder-off'; readonly holderId: string }
  | { readonly edit: 'change-program'; readonly programId: string };

export type Fix = {
  /** An act in the imperative: "Turn it so paper is left". */
  readonly label: string;
  readonly edits: readonly LoadEdit[];
};

export type Finding = {
  /** Rule, subjects and measured figure: an acceptance holds for exactly this. */
  readonly key: string;
  readonly ruleId: RuleId;
  readonly severity: Severity;
  /** What is wrong, naming the thing and the figure. */
  readonly title: string;
  /** Why it matters, in one sentence. */
  readonly reason: string;
  /** What to do, in words, whether or not a fix can be applied by touch. */
  readonly remedy: string;
  readonly source: Source;
  readonly places: readonly FindingPlace[];
  readonly figure: Figure | null;
  readonly fix: Fix | null;
};

export const ruleIds = [
  'pouch-on-edge',
  'pouch-in-holder',
  'holder-fits',
  'slot-shared',
  'slot-unknown',
  'facing',
  'gap',
  'label-hidden',
  'lid-filter-covered',
  'base-filter-shut',
  'stack-not-permitted',
  'stack-too-high',
  'stack-circular',
  'tray-flat',
  'basin-drains',
  'textile-on-edge',
  'shelf-edge',
  'wall-clearance',
  'overlap',
  'package-clearance',
  'headroom',
  'steam-path',
  'set-mass',
  'pouch-mass',
  'shelf-mass',
  'load-mass',
  'metal-over-textile',
  'water',
  'cycle-conflict',
  'packaging-suits-steam',
  'ifu-on-file',
  'challenge-device-placed',
  'external-indicator',
  'internal-indicator',
  'air-removal-test',
  'sterilizer-in-service',
  'program-qualified',
  'label-known',
  'label-once',
  'package-expired',
  'package-called-back',
  'package-state',
  'unplaced',
  'shelf-usable',
  'holder-usable',
  'unscanned',
  'count-missing',
  'count-differs',
  'size-makes-no-sense',
] as const;

export type RuleId = (typeof ruleIds)[number];
