import type { Finding, FindingPlace } from '#domain/load/finding';
import type { LetteredFinding } from '../../components/cart-map/map-model';
import type { Fact, FactCard } from './fact-card';

/** What a card points at: the finding of each line, and the one of the whole card. */
export type Emphasis = {
  readonly ofCard: LetteredFinding | null;
  readonly ofFact: ReadonlyMap<string, LetteredFinding | null>;
};

function isAbout(place: FindingPlace, subject: string): boolean {
  switch (place.on) {
    case 'load':
      return subject === 'load';
    case 'package':
      return place.packageId === subject;
    case 'shelf':
      return place.shelfId === subject;
    case 'holder':
      return false;
  }
}

function findingAbout(findings: readonly LetteredFinding[], subject: string | null): LetteredFinding | null {
  if (subject === null) return null;
  const isHere = ({ places }: Finding) => places.some((place) => isAbout(place, subject));
  return findings.find(({ finding }) => isHere(finding)) ?? null;
}

/**
 * Which lines of a card matter: those a finding is about; and where they say what the card as a whole is about, those that
 * read otherwise on the other cart.
 */
export function emphasisOf(card: FactCard, other: FactCard, findings: readonly LetteredFinding[]): Emphasis {
  const otherValue = new Map(other.facts.map(({ key, value }) => [key, value]));
  const differs = ({ key, value }: Fact) => otherValue.has(key) && otherValue.get(key) !== value;
  const ofFact = new Map<string, LetteredFinding | null>();
  for (const fact of card.facts) {
    const own = findingAbout(findings, fact.subject ?? null);
    if (own || (fact.subject === undefined && differs(fact))) ofFact.set(fact.key, own);
  }
  return { ofCard: findingAbout(findings, card.subject), ofFact };
}
