import { levelOf, Pin } from '../../../components/ui/pin';
import type { Emphasis } from '../emphasis';
import type { FactCard } from '../fact-card';

type LessonFactCardProps = {
  readonly card: FactCard;
  readonly emphasis: Emphasis;
  readonly isBad: boolean;
};

/** What no drawing shows: a slip of paper with a ribbed edge, its lines filled from the load beside it. */
export function LessonFactCard({ card, emphasis, isBad }: LessonFactCardProps) {
  const strong = isBad ? 'font-semibold text-madder-3' : 'font-semibold text-film-5';
  return (
    <div
      data-card=""
      className="seal-l w-full max-w-92 bg-paper-0 py-2 pr-3 pl-5 shadow-[inset_0_0_0_1px_var(--color-paper-3)]"
    >
      <p className="flex min-h-7 items-center gap-2 text-row font-semibold">
        {emphasis.ofCard && <CardPin lettered={emphasis.ofCard} />}
        {card.heading}
      </p>
      <dl className="mt-0.5 text-small">
        {card.facts.map((fact, index) => {
          const isStrong = emphasis.ofFact.has(fact.key);
          const pinned = emphasis.ofFact.get(fact.key);
          return (
            <div
              key={`${fact.key} ${index}`}
              className="flex min-h-7.5 items-center justify-between gap-3 border-t border-paper-3 first:border-t-0"
            >
              <dt className={`flex items-center gap-2 ${isStrong ? 'font-semibold text-ink-1' : 'text-ink-2'}`}>
                {pinned && <CardPin lettered={pinned} />}
                {fact.label}
              </dt>
              <dd className={`code text-right whitespace-normal ${isStrong ? strong : ''}`}>{fact.value}</dd>
            </div>
          );
        })}
      </dl>
    </div>
  );
}

function CardPin({ lettered: { letter, finding } }: { lettered: NonNullable<Emphasis['ofCard']> }) {
  return (
    <span data-pin={letter} className="contents">
      <Pin letter={letter} level={levelOf[finding.severity]} />
    </span>
  );
}
