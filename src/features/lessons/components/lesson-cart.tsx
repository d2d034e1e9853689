import type { LoadPolicy } from '#domain/load/policy';
import type { LessonCart as Cart, LessonPicture } from '#domain/lessons/lesson';
import { useMemo } from 'react';
import { CartInWords } from '../../../components/cart-map/cart-in-words';
import type { LetteredFinding } from '../../../components/cart-map/map-model';
import { Icon } from '../../../components/icon';
import { levelOf, Pin } from '../../../components/ui/pin';
import { useFacility } from '../../../lib/facility';
import { useSize } from '../../../lib/use-size';
import { emphasisOf } from '../emphasis';
import { factCardOf } from '../fact-card';
import { LessonFactCard } from './lesson-fact-card';
import { LessonCartPicture } from './lesson-picture';

/** Until the room is known. */
const firstWidthPx = 340;
/** How high a drawing may be with a card below it, and by itself: then the more, the wider it may be. */
const heightsPx = { withCard: 290, leastAlone: 390, greatestAlone: 450 } as const;

type LessonCartProps = {
  readonly side: 'bad' | 'good';
  readonly cart: Cart;
  /** The other one: what reads otherwise there is what matters here. */
  readonly other: Cart;
  readonly pictures: readonly LessonPicture[];
  readonly policy: LoadPolicy;
  /** What the lesson's rule finds on it. */
  readonly findings: readonly LetteredFinding[];
};

const words = {
  bad: { title: 'Not like this', name: 'The bad cart' },
  good: { title: 'Like this', name: 'The good cart' },
} as const;

/** One of a lesson's two carts: drawn, its wrong place pinned, and what the rule says to it. */
export function LessonCart({ side, cart, other, pictures, policy, findings }: LessonCartProps) {
  const [sizeRef, size] = useSize();
  const isBad = side === 'bad';
  const { title, name } = words[side];
  const width = size?.width ?? firstWidthPx;
  const hasCard = pictures.some(({ of }) => of === 'card');
  const height = hasCard
    ? heightsPx.withCard
    : Math.min(Math.max(width, heightsPx.leastAlone), heightsPx.greatestAlone);
  // Both are read out, so each is called by its own name.
  const view = useMemo(() => ({ ...cart.view, cart: { ...cart.view.cart, name } }), [cart, name]);
  return (
    <section aria-label={name} className="min-w-0">
      <h2 className={`flex items-center gap-2 text-head ${isBad ? 'text-madder-3' : 'text-film-5'}`}>
        <Icon name={isBad ? 'cross' : 'tick'} size={20} />
        {title}
      </h2>
      <p className="mt-0.5 text-body text-balance @min-[42rem]:min-h-10">{cart.caption}</p>
      <div ref={sizeRef} className="mt-2 grid gap-3">
        {pictures.map((picture, index) =>
          picture.of === 'card' ? (
            <Card key={index} {...{ picture, cart, other, findings, isBad }} />
          ) : (
            <LessonCartPicture
              key={index}
              picture={picture}
              view={view}
              policy={policy}
              findings={findings}
              width={width}
              height={height}
            />
          ),
        )}
      </div>
      <CartInWords view={view} findings={findings.map(({ finding }) => finding)} />
      {isBad ? (
        <ul className="mt-2.5 grid gap-1.5">
          {findings.map(({ letter, finding }) => (
            <li key={finding.key} className="grid grid-cols-[1.625rem_1fr] items-start gap-x-2.5 text-small">
              <Pin letter={letter} level={levelOf[finding.severity]} />
              <span className="pt-1 font-semibold">{finding.title}</span>
            </li>
          ))}
        </ul>
      ) : (
        <p className="mt-2.5 pt-1 text-small font-semibold">The rules find nothing to put right.</p>
      )}
    </section>
  );
}

function Card({
  picture,
  cart,
  other,
  findings,
  isBad,
}: Pick<LessonCartProps, 'cart' | 'other' | 'findings'> & {
  readonly picture: Extract<LessonPicture, { of: 'card' }>;
  readonly isBad: boolean;
}) {
  const { unitSystem } = useFacility();
  const card = factCardOf(cart.view, picture.card, unitSystem);
  const otherCard = factCardOf(other.view, picture.card, unitSystem);
  return <LessonFactCard card={card} emphasis={emphasisOf(card, otherCard, findings)} isBad={isBad} />;
}
