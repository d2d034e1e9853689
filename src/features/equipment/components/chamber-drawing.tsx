import { MapText } from '../../../components/cart-map/glyphs';
import { MapDrawing } from '../../../components/cart-map/map-patterns';
import { useFacility } from '../../../lib/facility';
import { formatLength, formatSize } from '../../../lib/format';

export type DrawnChamber = {
  readonly chamberWidthMm: number;
  readonly chamberDepthMm: number;
  readonly chamberHeightMm: number;
  readonly drainXMm: number;
  readonly drainYMm: number;
};

const fullWidth = 304;
const gap = 28;
const top = 18;
const tallest = 230;

/** The chamber from the door end and from above, to one scale, with its drain. The door is at the foot of the plan. */
export function ChamberDrawing({ sterilizer }: { sterilizer: DrawnChamber }) {
  const { unitSystem } = useFacility();
  const { chamberWidthMm, chamberDepthMm, chamberHeightMm, drainXMm, drainYMm } = sterilizer;
  if ([chamberWidthMm, chamberDepthMm, chamberHeightMm].some((size) => !Number.isFinite(size) || size <= 0)) {
    return <p className="text-small text-ink-2">It is drawn here once its three measures are filled in.</p>;
  }
  const scale = Math.min(
    (fullWidth - gap - 4) / (2 * chamberWidthMm),
    tallest / Math.max(chamberDepthMm, chamberHeightMm),
  );
  const width = chamberWidthMm * scale;
  const depth = chamberDepthMm * scale;
  const high = chamberHeightMm * scale;
  const foot = top + Math.max(depth, high);
  const planX = 2 + width + gap;
  // The drain is measured from the corner of a shelf, which stands in the middle of the chamber's width.
  const drain =
    Number.isFinite(drainXMm) && Number.isFinite(drainYMm) ? { x: drainXMm * scale, y: drainYMm * scale } : null;
  const size = formatSize([chamberWidthMm, chamberDepthMm, chamberHeightMm], unitSystem);
  return (
    <figure className="m-0">
      <MapDrawing width={fullWidth} height={foot + 22} label={`Chamber, drawn to scale: ${size}`}>
        <MapText x={2} y={foot - high - 6} className="fill-ink-2">
          From the door end
        </MapText>
        <rect
          x={2}
          y={foot - high}
          width={width}
          height={high}
          rx={6}
          fill="none"
          strokeWidth="1.6"
          className="stroke-ink-1"
        />
        <MapText x={2 + width / 2} y={foot + 16} anchor="middle">
          {formatLength(chamberWidthMm, unitSystem)}
        </MapText>
        <MapText x={planX} y={foot - depth - 6} className="fill-ink-2">
          From above
        </MapText>
        <rect
          x={planX}
          y={foot - depth}
          width={width}
          height={depth}
          fill="none"
          strokeWidth="1.6"
          className="stroke-ink-1"
        />
        <path d={`M${planX} ${foot}h${width}`} strokeWidth="4" className="stroke-paper-edge" />
        <MapText x={planX + width / 2} y={foot + 16} anchor="middle">
          Door
        </MapText>
        {drain !== null && (
          <g>
            {[9, 6, 3].map((half, line) => (
              <path
                key={half}
                d={`M${planX + drain.x - half} ${foot - drain.y + line * 4}h${half * 2}`}
                strokeWidth="1.6"
                className="stroke-film-5"
              />
            ))}
            <MapText x={planX + drain.x + 13} y={foot - drain.y + 8}>
              Drain
            </MapText>
          </g>
        )}
      </MapDrawing>
    </figure>
  );
}
