import type { HolderKind } from '#domain/load/model';
import { Leaf, MapText } from '../../../components/cart-map/glyphs';
import { MapDrawing } from '../../../components/cart-map/map-patterns';
import { useFacility } from '../../../lib/facility';
import { formatLength } from '../../../lib/format';

export type DrawnKind = { readonly form: HolderKind['form'] } & {
  readonly [Name in 'slots' | 'pitchMm' | 'greatestHeightMm' | 'greatestThicknessMm']: number | null;
} & { readonly acrossMm: number };

const width = 304;

/** A rack from its end, to scale, with the greatest pouch it takes in every slot: what is left between them shows. */
export function RackDrawing({ kind }: { kind: DrawnKind }) {
  const { unitSystem } = useFacility();
  const { slots, pitchMm, greatestHeightMm, greatestThicknessMm, acrossMm } = kind;
  const isKnown =
    kind.form === 'rack' &&
    [slots, pitchMm, greatestHeightMm, greatestThicknessMm, acrossMm].every(
      (one) => one !== null && Number.isFinite(one) && one > 0,
    );
  if (!isKnown || slots === null || pitchMm === null || greatestHeightMm === null || greatestThicknessMm === null)
    return null;
  const scale = Math.min((width - 60) / acrossMm, 170 / greatestHeightMm);
  const high = greatestHeightMm * scale;
  const across = acrossMm * scale;
  const foot = high + 8;
  const firstX = 2 + (across - (slots - 1) * pitchMm * scale) / 2;
  const drawn = Array.from({ length: Math.min(slots, 60) }, (_, slot) => firstX + slot * pitchMm * scale);
  const thick = greatestThicknessMm * scale;
  return (
    <figure className="m-0">
      <MapDrawing
        width={width}
        height={foot + 24}
        label={`From its end, drawn to scale: ${slots} slots, pitch ${formatLength(pitchMm, unitSystem)}`}
      >
        {drawn.map((x) => (
          <Leaf key={x} box={{ x: x - thick / 2, y: foot - high, width: thick, height: high }} isPaperFirst />
        ))}
        <path
          d={`M2 ${foot}h${across}M2 ${foot}v-14M${2 + across} ${foot}v-14`}
          fill="none"
          strokeWidth="2"
          className="stroke-ink-1"
        />
        <path d={`M${across + 8} ${foot - high}V${foot}`} strokeWidth="1" className="stroke-ink-3" />
        <MapText x={across + 12} y={foot - high / 2 + 4}>
          {formatLength(greatestHeightMm, unitSystem)}
        </MapText>
        <MapText x={2 + across / 2} y={foot + 18} anchor="middle">
          {formatLength(acrossMm, unitSystem)}
        </MapText>
      </MapDrawing>
      <figcaption className="mt-1 text-least text-ink-2">From its end, with the greatest pouch in each slot</figcaption>
    </figure>
  );
}
