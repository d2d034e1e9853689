export type PinSpot = { readonly x: number; readonly y: number };

const pinWidth = 26;
const pinHeight = 27;

function isCrowded(one: PinSpot, other: PinSpot): boolean {
  return Math.abs(one.x - other.x) < pinWidth && Math.abs(one.y - other.y) < pinHeight;
}

/**
 * Moves pins that would cover each other aside, keeping each as near to its place as it can be and inside the drawing.
 * Pins come in order of weight: the heaviest keeps its place.
 * @param pins tips of the pins, px
 */
export function spreadPins<Pin extends PinSpot>(
  pins: readonly Pin[],
  bounds: { readonly width: number; readonly height: number },
): Pin[] {
  const placed: Pin[] = [];
  for (const pin of pins) {
    const spot = nearestFree(pin, placed, bounds);
    placed.push({ ...pin, ...spot });
  }
  return placed;
}

function nearestFree(
  pin: PinSpot,
  placed: readonly PinSpot[],
  bounds: { readonly width: number; readonly height: number },
): PinSpot {
  const inside = (spot: PinSpot): PinSpot => ({
    x: Math.min(Math.max(spot.x, pinWidth / 2), bounds.width - pinWidth / 2),
    y: Math.min(Math.max(spot.y, pinHeight), bounds.height),
  });
  const first = inside(pin);
  if (!placed.some((other) => isCrowded(first, other))) return first;
  for (let ring = 1; ring <= 40; ring += 1) {
    const candidates = [
      { x: pin.x + ring * pinWidth, y: pin.y },
      { x: pin.x - ring * pinWidth, y: pin.y },
      { x: pin.x, y: pin.y - ring * pinHeight },
      { x: pin.x, y: pin.y + ring * pinHeight },
      { x: pin.x + ring * pinWidth, y: pin.y - ring * pinHeight },
      { x: pin.x - ring * pinWidth, y: pin.y - ring * pinHeight },
    ].map(inside);
    const free = candidates.find((spot) => !placed.some((other) => isCrowded(spot, other)));
    if (free) return free;
  }
  return first;
}
