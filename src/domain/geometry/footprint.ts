import type { CatalogueItem, Pose, Turn } from '../load/model';
import { mm, type Millimetre } from '../units/quantity';

/** How far a basin is tilted to drain. Common practice, no source; it is the angle of the demonstration's wedges. */
const tiltDegrees = 15;

export type Footprint = {
  /** Along x of the shelf. */
  readonly widthMm: Millimetre;
  /** Along y of the shelf. */
  readonly depthMm: Millimetre;
  readonly heightMm: Millimetre;
};

/**
 * The room a thing takes, in millimetres, seen from the door: on edge it stands on its long side, so that its short side
 * is the height and its thickness lies across; tilted it is raised along its short side, which keeps it lowest.
 */
export function footprintOf(
  item: Pick<CatalogueItem, 'lengthMm' | 'widthMm' | 'heightMm'>,
  pose: Pose,
  turn: Turn,
): Footprint {
  const { across, height } = crossSection(item, pose);
  return turn === 0
    ? { widthMm: mm(across), depthMm: item.lengthMm, heightMm: mm(height) }
    : { widthMm: item.lengthMm, depthMm: mm(across), heightMm: mm(height) };
}

function crossSection(
  item: Pick<CatalogueItem, 'widthMm' | 'heightMm'>,
  pose: Pose,
): { across: number; height: number } {
  switch (pose) {
    case 'flat':
      return { across: item.widthMm, height: item.heightMm };
    case 'on-edge':
      return { across: item.heightMm, height: item.widthMm };
    case 'tilted': {
      const tilt = (tiltDegrees * Math.PI) / 180;
      return {
        across: item.widthMm * Math.cos(tilt) + item.heightMm * Math.sin(tilt),
        height: item.widthMm * Math.sin(tilt) + item.heightMm * Math.cos(tilt),
      };
    }
  }
}
