import type { RuleId } from '../load/finding';
import type { LoadView } from '../load/model';
import type { LoadPolicy } from '../load/policy';

/** Families in the order in which lessons are listed. */
export const lessonFamilies = [
  'pouches',
  'poses',
  'stacks',
  'space',
  'mass-and-water',
  'cycle',
  'proof',
  'labels',
  'counting',
  'entries',
] as const;

export type LessonFamily = (typeof lessonFamilies)[number];

/** What no drawing of a cart shows, as a card made of the same data. */
export type LessonCard =
  | { readonly shows: 'label' | 'size'; readonly packageId: string }
  /** Of all packages: what is written on them, what is known of them, where they are said to be, what they weigh. */
  | { readonly shows: 'codes' | 'states' | 'places' | 'masses' }
  | { readonly shows: 'counts' | 'sterilizer' | 'program' };

/** How both carts of a lesson are drawn. */
export type LessonPicture =
  | { readonly of: 'cart' }
  | { readonly of: 'shelf'; readonly shelfId: string }
  | { readonly of: 'holder'; readonly holderId: string }
  | { readonly of: 'card'; readonly card: LessonCard };

export type LessonCart = {
  readonly view: LoadView;
  /** What to see on it, in one sentence. */
  readonly caption: string;
};

export const answerIds = ['a', 'b', 'c'] as const;

export type AnswerId = (typeof answerIds)[number];

export type LessonAnswer = {
  readonly text: string;
  /** Why it is right or wrong, in one sentence. */
  readonly because: string;
};

/** Ninety seconds about one rule. Its name and its source are the rule's own and stand nowhere else. */
export type Lesson = {
  readonly family: LessonFamily;
  /** Two or three short sentences. */
  readonly why: readonly string[];
  /** What to look for at the cart. */
  readonly lookFor: string;
  readonly bad: LessonCart;
  readonly good: LessonCart;
  readonly pictures: readonly LessonPicture[];
  /** Rules that find something on the bad cart as well, where its fault cannot be had without them. */
  readonly alongside?: readonly RuleId[];
  /** Where the carts are judged by other figures than the defaults. */
  readonly policy?: Partial<LoadPolicy>;
  readonly question: {
    readonly text: string;
    readonly answers: Readonly<Record<AnswerId, LessonAnswer>>;
    readonly right: AnswerId;
  };
};
