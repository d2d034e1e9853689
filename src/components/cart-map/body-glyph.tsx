import { filterRects, type Body } from '#domain/load/layout';
import { BasinPlan, BasinSide, leanFromRoom } from './basin-glyph';
import {
  ChallengeDevice,
  ContainerFront,
  ContainerPlan,
  Leaf,
  LeafFace,
  Textile,
  Wrapped,
  type PixelBox,
} from './glyphs';

/** Below this a leaf cannot be told from a line. */
const thinnestLeafPx = 3;

function thickened(box: PixelBox, along: 'width' | 'height'): PixelBox {
  const missing = Math.max(0, thinnestLeafPx - box[along]) / 2;
  return along === 'width'
    ? { ...box, x: box.x - missing, width: box.width + 2 * missing }
    : { ...box, y: box.y - missing, height: box.height + 2 * missing };
}

function PouchFront({ body, box, label }: { body: Body; box: PixelBox; label: string | undefined }) {
  if (body.thinAxis === 'x') return <Leaf box={thickened(box, 'width')} isPaperFirst={body.paperLooks !== 'right'} />;
  if (body.thinAxis === 'y') return <LeafFace box={box} isPaper={body.paperLooks === 'front'} label={label} />;
  return <Leaf box={thickened(box, 'height')} isAcross isPaperFirst={body.paperLooks !== 'up'} />;
}

function PouchPlan({ body, box, label }: { body: Body; box: PixelBox; label: string | undefined }) {
  if (body.thinAxis === 'x') return <Leaf box={thickened(box, 'width')} isPaperFirst={body.paperLooks !== 'right'} />;
  if (body.thinAxis === 'y') {
    return <Leaf box={thickened(box, 'height')} isAcross isPaperFirst={body.paperLooks !== 'back'} />;
  }
  return <LeafFace box={box} isPaper={body.paperLooks === 'up'} label={label} />;
}

/** How far a basin leans to the side, seen from the door end: not at all where it leans toward the door or away from it. */
function leanSeen({ item, box, placement, lengthAxis }: Body): number {
  if (placement.pose !== 'tilted' || lengthAxis === 'x') return 0;
  return leanFromRoom({ across: item.widthMm, thick: item.heightMm }, box.top - box.bottom);
}

/** A package as it looks from the door end. */
export function BodyFront({ body, box, label }: { body: Body; box: PixelBox; label: string | undefined }) {
  switch (body.item.kind) {
    case 'pouch':
      return <PouchFront body={body} box={box} label={label} />;
    case 'rigid-container':
      return <ContainerFront box={box} label={label} />;
    case 'wrapped-tray':
      return <Wrapped box={box} label={label} />;
    case 'textile-pack':
      return <Textile box={box} label={label} isUpright={body.placement.pose === 'on-edge'} />;
    case 'basin':
      return <BasinSide box={box} label={label} pose={body.placement.pose} lean={leanSeen(body)} />;
    case 'challenge-device':
      return <ChallengeDevice box={box} />;
  }
}

/** A package as it looks from above. */
export function BodyPlan({
  body,
  box,
  label,
  toPixels,
}: {
  body: Body;
  box: PixelBox;
  label: string | undefined;
  toPixels: (rect: PlanRect) => PixelBox;
}) {
  switch (body.item.kind) {
    case 'pouch':
      return <PouchPlan body={body} box={box} label={label} />;
    case 'rigid-container':
      return <ContainerPlan box={box} label={label} filters={filterRects(body, 'lid').map(toPixels)} />;
    case 'wrapped-tray':
      return <Wrapped box={box} label={label} />;
    case 'textile-pack':
      return <Textile box={box} label={label} isUpright={body.placement.pose === 'on-edge'} />;
    case 'basin':
      return <BasinPlan box={box} label={label} />;
    case 'challenge-device':
      return <ChallengeDevice box={box} />;
  }
}

/** In shelf millimetres. */
export type PlanRect = { readonly left: number; readonly right: number; readonly front: number; readonly back: number };
