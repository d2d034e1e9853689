import type { FindingPlace, Severity } from '../load/finding';

/** A figure as it was kept: its unit may be one that the rules of today do not use any more. */
export type KeptFigure = {
  readonly measured: number;
  readonly limit: number;
  readonly unit: string;
  readonly want: 'at-least' | 'at-most' | 'exactly';
  readonly limitFrom: string;
};

/** A finding as a closed load keeps it. Its rule may be one that there is no more. */
export type KeptFinding = {
  readonly key: string;
  readonly ruleId: string;
  readonly severity: Severity;
  readonly title: string;
  readonly reason: string;
  readonly remedy: string;
  readonly source: { readonly text: string; readonly provenance: string };
  readonly places: readonly FindingPlace[];
  readonly figure: KeptFigure | null;
};

export type FindingPair = { readonly then: KeptFinding; readonly now: KeptFinding };

export type FindingComparison = {
  /** The same thing, judged otherwise: another figure, another limit, another weight. */
  readonly changed: readonly FindingPair[];
  readonly onlyNow: readonly KeptFinding[];
  readonly onlyThen: readonly KeptFinding[];
  readonly both: readonly FindingPair[];
};

/** What two judgements of the same load have in common, and what not. Each finding stands in exactly one of the four. */
export function compareFindings(then: readonly KeptFinding[], now: readonly KeptFinding[]): FindingComparison {
  const byKey = pairUp(then, now, (finding) => finding.key);
  const byPlace = pairUp(byKey.onlyThen, byKey.onlyNow, aboutOf);
  return {
    changed: [...byKey.pairs.filter((pair) => !isJudgedAlike(pair)), ...byPlace.pairs],
    onlyNow: byPlace.onlyNow,
    onlyThen: byPlace.onlyThen,
    both: byKey.pairs.filter(isJudgedAlike),
  };
}

function pairUp(
  then: readonly KeptFinding[],
  now: readonly KeptFinding[],
  nameOf: (finding: KeptFinding) => string,
): {
  readonly pairs: readonly FindingPair[];
  readonly onlyThen: readonly KeptFinding[];
  readonly onlyNow: readonly KeptFinding[];
} {
  const waiting = new Map<string, KeptFinding[]>();
  for (const finding of now) waiting.set(nameOf(finding), [...(waiting.get(nameOf(finding)) ?? []), finding]);
  const pairs: FindingPair[] = [];
  const onlyThen: KeptFinding[] = [];
  for (const finding of then) {
    const match = waiting.get(nameOf(finding))?.shift();
    if (match === undefined) onlyThen.push(finding);
    else pairs.push({ then: finding, now: match });
  }
  const matched = new Set(pairs.map((pair) => pair.now));
  return { pairs, onlyThen, onlyNow: now.filter((finding) => !matched.has(finding)) };
}

/** The rule and the places, whatever was measured there and in whatever order they are named. */
function aboutOf({ ruleId, places }: KeptFinding): string {
  return [ruleId, ...places.map(placeName).sort()].join('|');
}

function placeName(place: FindingPlace): string {
  switch (place.on) {
    case 'load':
      return 'load';
    case 'shelf':
      return `shelf ${place.shelfId}`;
    case 'holder':
      return `holder ${place.holderId} ${place.slot ?? ''}`;
    case 'package':
      return `package ${place.packageId}`;
  }
}

function isJudgedAlike({ then, now }: FindingPair): boolean {
  if (then.severity !== now.severity) return false;
  const [was, is] = [then.figure, now.figure];
  if (was === null || is === null) return was === is;
  return (
    isSameFigure(was.measured, is.measured) &&
    isSameFigure(was.limit, is.limit) &&
    was.unit === is.unit &&
    was.want === is.want
  );
}

/** The last digits of a sum depend on the order of adding up, which is no difference to anybody. */
function isSameFigure(one: number, other: number): boolean {
  return Math.abs(one - other) < 1e-6;
}
