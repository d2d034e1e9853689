import type { Figure, FindingPlace, Fix, RuleId, Severity, Source } from '../finding';
import type { LoadPolicy } from '../policy';
import type { Scene } from './scene';

/** What a rule says about one place of a load, before it is given its key, its letter and a verified fix. */
export type Draft = {
  /** Ids of what it is about, in any order: with the rule and the figure they make the finding's key. */
  readonly subjects: readonly string[];
  readonly title: string;
  readonly remedy: string;
  /** The first is where the pin goes. */
  readonly places: readonly FindingPlace[];
  readonly figure?: Figure;
  /** Where this case differs from the rule's own. */
  readonly severity?: Severity;
  readonly reason?: string;
  readonly source?: Source;
  /** Fixes worth trying, the best first. Each is verified before anyone sees it. */
  readonly fixes?: () => Iterable<Fix>;
};

export type Rule = {
  readonly id: RuleId;
  /** What has to hold, in a few words. */
  readonly name: string;
  /** Why it matters, in one sentence. */
  readonly reason: string;
  readonly source: Source;
  readonly severity: Severity;
  /** What a facility can set about it. */
  readonly parameters: readonly (keyof LoadPolicy)[];
  readonly find: (scene: Scene) => readonly Draft[];
};
