import type { Figure, FindingPlace, Fix, RuleId, Severity, Source } from '../finding';
import type { LoadPolicy } from '../policy';
import type { Listed, OnShelf, Scene } from './scene';

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
  /**
   * Fixes worth trying, the best first. Each is verified before anyone sees it. They are told the load as it is then: a
   * draft outlives changes elsewhere on the cart.
   */
  readonly fixes?: (scene: Scene) => Iterable<Fix>;
};

type Head = {
  readonly id: RuleId;
  /** What has to hold, in a few words. */
  readonly name: string;
  /** Why it matters, in one sentence. */
  readonly reason: string;
  readonly source: Source;
  readonly severity: Severity;
  /** What a facility can set about it. */
  readonly parameters: readonly (keyof LoadPolicy)[];
};

/** Looks at one package on the list and at nothing else of the load but what all of it has in common. */
type PackageRule = Head & {
  readonly about: 'package';
  readonly find: (scene: Scene, listed: Listed) => Draft | null;
};

/** Looks at what stands on one shelf. */
type ShelfRule = Head & {
  readonly about: 'shelf';
  readonly find: (scene: Scene, on: OnShelf) => readonly Draft[];
};

type LoadRule = Head & {
  readonly about: 'load';
  readonly find: (scene: Scene) => readonly Draft[];
};

/** What a rule is about says what it may look at: as long as that stays the same, so do its findings. */
export type Rule = PackageRule | ShelfRule | LoadRule;

/** All that one rule has to say of a load. */
export function draftsOf(rule: Rule, scene: Scene): readonly Draft[] {
  switch (rule.about) {
    case 'package':
      return scene.listed.flatMap((listed) => rule.find(scene, listed) ?? []);
    case 'shelf':
      return scene.shelves.flatMap((on) => rule.find(scene, on));
    case 'load':
      return rule.find(scene);
  }
}
