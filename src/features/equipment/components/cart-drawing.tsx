import { MapText } from '../../../components/cart-map/glyphs';
import { MapDrawing } from '../../../components/cart-map/map-patterns';
import { useFacility } from '../../../lib/facility';
import { formatLength } from '../../../lib/format';

type DrawnShelf = {
  readonly level: number;
  readonly name: string;
  readonly widthMm: number;
  readonly clearHeightMm: number;
  readonly isUsable: boolean;
};

const width = 304;
const labelRoom = 66;

/** The cart from the door end, to scale: each shelf with the free height above it. */
export function CartDrawing({ cart }: { cart: { readonly name: string; readonly shelves: readonly DrawnShelf[] } }) {
  const { unitSystem } = useFacility();
  const shelves = cart.shelves
    .filter((shelf) => shelf.widthMm > 0 && shelf.clearHeightMm > 0)
    .toSorted((one, other) => one.level - other.level);
  if (shelves.length === 0)
    return <p className="text-small text-ink-2">It is drawn here once a shelf has its measures.</p>;
  const widest = Math.max(...shelves.map((shelf) => shelf.widthMm));
  const highest = shelves.reduce((sum, shelf) => sum + shelf.clearHeightMm, 0);
  const scale = Math.min((width - labelRoom - 4) / widest, 240 / highest);
  const foot = highest * scale + 6;
  const decks = shelves.map((shelf, at) => ({
    shelf,
    y: foot - shelves.slice(0, at).reduce((sum, below) => sum + below.clearHeightMm, 0) * scale,
  }));
  return (
    <MapDrawing width={width} height={foot + 24} label={`${cart.name} from the door end, drawn to scale`}>
      <path d={`M3 6V${foot + 8}M${3 + widest * scale} 6V${foot + 8}`} strokeWidth="2.4" className="stroke-ink-1" />
      {decks.map(({ shelf, y }, at) => {
        const high = shelf.clearHeightMm * scale;
        return (
          // While it is filled in, two shelves may be on one level.
          <g key={at}>
            <path
              d={`M3 ${y}h${shelf.widthMm * scale}`}
              strokeWidth="3"
              strokeDasharray={shelf.isUsable ? undefined : '6 5'}
              className={shelf.isUsable ? 'stroke-ink-1' : 'stroke-straw-3'}
            />
            <MapText
              x={12}
              y={y - high / 2 + 4}
              className={shelf.isUsable ? 'fill-ink-1' : 'fill-straw-3'}
              weight={560}
            >
              {shelf.isUsable ? shelf.name : `${shelf.name}, taken out`}
            </MapText>
            <path d={`M${widest * scale + 14} ${y - high + 4}V${y - 4}`} strokeWidth="1" className="stroke-ink-3" />
            <MapText x={widest * scale + 19} y={y - high / 2 + 4}>
              {formatLength(shelf.clearHeightMm, unitSystem)}
            </MapText>
          </g>
        );
      })}
      <MapText x={3 + (widest * scale) / 2} y={foot + 20} anchor="middle">
        {formatLength(widest, unitSystem)}
      </MapText>
    </MapDrawing>
  );
}
