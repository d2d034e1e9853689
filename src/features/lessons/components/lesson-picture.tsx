import { layOut } from '#domain/load/layout';
import type { LoadView } from '#domain/load/model';
import type { LoadPolicy } from '#domain/load/policy';
import type { LessonPicture } from '#domain/lessons/lesson';
import { useMemo } from 'react';
import { CartElevation, elevationHeight, elevationWidth } from '../../../components/cart-map/cart-elevation';
import { HolderCloseUp } from '../../../components/cart-map/holder-close-up';
import type { LetteredFinding } from '../../../components/cart-map/map-model';
import { ShelfPlan } from '../../../components/cart-map/shelf-plan';

/** px per mm: beyond it a drawing only grows, and says no more. */
const greatestScale = 0.72;
/** A rack is never drawn larger than pouches are. */
const greatestCloseUp = { width: 440, height: 300 } as const;

type LessonPictureProps = {
  readonly picture: Exclude<LessonPicture, { readonly of: 'card' }>;
  readonly view: LoadView;
  readonly policy: LoadPolicy;
  readonly findings: readonly LetteredFinding[];
  /** Of the room there is, px. */
  readonly width: number;
  readonly height: number;
};

/** One drawing of a lesson's cart, by the same cart map that draws the loads. */
export function LessonCartPicture({ picture, view, policy, findings, width, height }: LessonPictureProps) {
  const layout = useMemo(() => layOut(view), [view]);
  switch (picture.of) {
    case 'cart': {
      const perMm = elevationHeight(view, 1) - elevationHeight(view, 0);
      const byHeight = (height - elevationHeight(view, 0)) / perMm;
      const byWidth = width / elevationWidth(view, 1);
      return (
        <CartElevation
          view={view}
          layout={layout}
          findings={findings}
          scale={Math.min(byHeight, byWidth, greatestScale)}
          activeShelfId={null}
          openFindingKey={null}
          next={null}
        />
      );
    }
    case 'shelf': {
      const shelf = view.cart.shelves.find(({ id }) => id === picture.shelfId);
      if (!shelf) return null;
      return (
        // The plan keeps a margin for what hangs over the edge; the shelf itself lines up with the words.
        <div className="-ml-2.5">
          <ShelfPlan
            view={view}
            layout={layout}
            shelf={shelf}
            findings={findings}
            scale={Math.min((height - 36) / shelf.depthMm, (width - 20) / shelf.widthMm, greatestScale)}
            keepClearMm={Math.max(0, policy.wallClearanceMm - (view.sterilizer.chamberWidthMm - shelf.widthMm) / 2)}
            openFindingKey={null}
            next={null}
            activeHolderId={null}
            pickedPackageId={null}
          />
        </div>
      );
    }
    case 'holder': {
      const holder = layout.holderOf.get(picture.holderId);
      if (!holder) return null;
      return (
        <HolderCloseUp
          holder={holder}
          bodies={layout.bodies.filter((body) => body.holder === holder)}
          findings={findings}
          width={Math.min(width, greatestCloseUp.width)}
          height={Math.min(height, greatestCloseUp.height)}
          nextSlot={null}
          nextName={null}
          nextPaper={null}
          openFindingKey={null}
        />
      );
    }
  }
}
