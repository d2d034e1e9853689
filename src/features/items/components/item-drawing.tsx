import type { CatalogueItem } from '#domain/load/model';
import { BasinPlan, BasinSide } from '../../../components/cart-map/basin-glyph';
import {
  ContainerPlan,
  Leaf,
  LeafFace,
  MapText,
  Textile,
  Wrapped,
  type PixelBox,
} from '../../../components/cart-map/glyphs';
import { MapDrawing } from '../../../components/cart-map/map-patterns';
import { useFacility } from '../../../lib/facility';
import { formatLength, formatSize } from '../../../lib/format';

type DrawnZone = { readonly face: 'lid' | 'base' } & Readonly<Record<'xMm' | 'yMm' | 'lengthMm' | 'widthMm', number>>;

export type DrawnItem = Pick<CatalogueItem, 'kind' | 'pose'> & {
  readonly lengthMm: number;
  readonly widthMm: number;
  readonly heightMm: number;
  readonly filterZones: readonly DrawnZone[];
};

type ItemDrawingProps = {
  item: DrawnItem;
  /** Pixels. */
  width?: number;
};

const margin = { left: 2, right: 62, top: 18, between: 46, bottom: 20 };
const highestPx = 330;

/** How the item rests, from above and from the side, both to one scale, with its measures. */
export function ItemDrawing({ item, width = 304 }: ItemDrawingProps) {
  const { unitSystem } = useFacility();
  const sizes = [item.lengthMm, item.widthMm, item.heightMm];
  if (sizes.some((size) => !Number.isFinite(size) || size <= 0)) {
    return <p className="text-small text-ink-2">It is drawn here once its three measures are filled in.</p>;
  }
  const isOnEdge = item.pose === 'on-edge';
  // On edge, the long side lies along; the thickness is what is seen from above, the short side what stands up.
  const [depthMm, standsMm] = isOnEdge ? [item.heightMm, item.widthMm] : [item.widthMm, item.heightMm];
  const room = width - margin.left - margin.right;
  const tall = highestPx - margin.top - margin.between - margin.bottom;
  const scale = Math.min(room / item.lengthMm, tall / (depthMm + standsMm));
  const plan: PixelBox = {
    x: margin.left,
    y: margin.top,
    width: item.lengthMm * scale,
    height: depthMm * scale,
  };
  const side: PixelBox = {
    x: margin.left,
    y: plan.y + plan.height + margin.between,
    width: plan.width,
    height: standsMm * scale,
  };
  const height = side.y + side.height + margin.bottom;
  const inWords = `${formatSize(sizes, unitSystem)}, ${isOnEdge ? 'on edge' : item.pose}`;
  return (
    <figure className="m-0">
      <MapDrawing width={width} height={height} label={`Drawn to scale: ${inWords}`}>
        <MapText x={plan.x} y={plan.y - 6} className="fill-ink-2">
          From above
        </MapText>
        <PlanBody item={item} box={plan} scale={scale} />
        <Upright box={plan} words={formatLength(depthMm, unitSystem)} />
        <MapText x={side.x} y={side.y - 6} className="fill-ink-2">
          From the side
        </MapText>
        <SideBody item={item} box={side} scale={scale} />
        <path d={`M0 ${side.y + side.height + 1}h${room + margin.left}`} strokeWidth="1.6" className="stroke-ink-1" />
        <Upright box={side} words={formatLength(standsMm, unitSystem)} />
        <MapText x={side.x + side.width / 2} y={height - 4} anchor="middle">
          {formatLength(item.lengthMm, unitSystem)}
        </MapText>
      </MapDrawing>
      <figcaption className="mt-1 text-least text-ink-2">Drawn to scale</figcaption>
    </figure>
  );
}

/** A measure at the right of what it measures. */
function Upright({ box, words }: { box: PixelBox; words: string }) {
  const x = box.x + box.width + 6;
  return (
    <g>
      <path d={`M${x} ${box.y}v${box.height}`} strokeWidth="1" className="stroke-ink-3" />
      <MapText x={x + 4} y={box.y + box.height / 2 + 4}>
        {words}
      </MapText>
    </g>
  );
}

function PlanBody({ item, box, scale }: { item: DrawnItem; box: PixelBox; scale: number }) {
  const isOnEdge = item.pose === 'on-edge';
  switch (item.kind) {
    case 'pouch':
      return isOnEdge ? <Leaf box={box} isPaperFirst isAcross /> : <LeafFace box={box} isPaper />;
    case 'rigid-container':
      return (
        <g>
          <ContainerPlan box={box} filters={zonesOn('lid', item).map((zone) => zoneFromAbove(zone, box, scale))} />
          {zonesOn('base', item).map((zone, at) => (
            // The same zone may be filled in twice for a moment.
            <rect
              key={at}
              {...zoneFromAbove(zone, box, scale)}
              fill="none"
              strokeWidth="1"
              strokeDasharray="3 3"
              className="stroke-film-5"
            />
          ))}
        </g>
      );
    case 'wrapped-tray':
    case 'challenge-device':
      return <Wrapped box={box} />;
    case 'textile-pack':
      return <Textile box={box} isUpright={!isOnEdge} />;
    case 'basin':
      return <BasinPlan box={box} />;
  }
}

function SideBody({ item, box, scale }: { item: DrawnItem; box: PixelBox; scale: number }) {
  switch (item.kind) {
    case 'pouch':
      return item.pose === 'on-edge' ? (
        <LeafFace box={box} isPaper={false} />
      ) : (
        <Leaf box={box} isPaperFirst isAcross />
      );
    case 'rigid-container':
      return <ContainerSide item={item} box={box} scale={scale} />;
    case 'wrapped-tray':
    case 'challenge-device':
      return <Wrapped box={box} />;
    case 'textile-pack':
      return <Textile box={box} isUpright={item.pose === 'on-edge'} />;
    case 'basin':
      return <BasinSide box={box} pose={item.pose} />;
  }
}

function zonesOn(face: DrawnZone['face'], item: DrawnItem): readonly DrawnZone[] {
  return item.filterZones.filter((zone) => zone.face === face);
}

function zoneFromAbove(zone: DrawnZone, box: PixelBox, scale: number): PixelBox {
  return {
    x: box.x + zone.xMm * scale,
    y: box.y + zone.yMm * scale,
    width: Math.max(0, zone.lengthMm * scale),
    height: Math.max(0, zone.widthMm * scale),
  };
}

/** A rigid container along its long side: its filters as film bars where they are, on the lid and under the base. */
function ContainerSide({ item, box, scale }: { item: DrawnItem; box: PixelBox; scale: number }) {
  const { x, y, width, height } = box;
  const lid = Math.min(height * 0.26, 14);
  return (
    <g strokeWidth="1.5">
      <rect
        x={x + 2}
        y={y + lid}
        width={Math.max(0, width - 4)}
        height={height - lid}
        className="fill-paper-0 stroke-ink-1"
      />
      <rect x={x} y={y} width={width} height={lid} rx={3} className="fill-paper-2 stroke-ink-1" />
      {item.filterZones.map((zone, at) => (
        <rect
          key={at}
          x={x + zone.xMm * scale}
          y={zone.face === 'lid' ? y - 2 : y + height - 4}
          width={Math.max(0, zone.lengthMm * scale)}
          height={4}
          strokeWidth="1"
          className="fill-film-2 stroke-film-5"
        />
      ))}
    </g>
  );
}
