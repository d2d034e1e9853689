import { airRemovalTest } from './air-removal-test';
import { baseFilterShut } from './base-filter-shut';
import { basinDrains } from './basin-drains';
import { challengeDevicePlaced } from './challenge-device-placed';
import { countDiffers } from './count-differs';
import { countMissing } from './count-missing';
import { cycleConflict } from './cycle-conflict';
import { externalIndicator } from './external-indicator';
import { facing } from './facing';
import { gap } from './gap';
import { headroom } from './headroom';
import { holderFits } from './holder-fits';
import { holderUsable } from './holder-usable';
import { ifuOnFile } from './ifu-on-file';
import { internalIndicator } from './internal-indicator';
import { labelHidden } from './label-hidden';
import { labelKnown } from './label-known';
import { labelOnce } from './label-once';
import { lidFilterCovered } from './lid-filter-covered';
import { loadMass } from './load-mass';
import { metalOverTextile } from './metal-over-textile';
import { overlap } from './overlap';
import { packageCalledBack } from './package-called-back';
import { packageClearance } from './package-clearance';
import { packageExpired } from './package-expired';
import { packageState } from './package-state';
import { packagingSuitsSteam } from './packaging-suits-steam';
import { pouchInHolder } from './pouch-in-holder';
import { pouchMass } from './pouch-mass';
import { pouchOnEdge } from './pouch-on-edge';
import { programQualified } from './program-qualified';
import { setMass } from './set-mass';
import { shelfEdge } from './shelf-edge';
import { shelfMass } from './shelf-mass';
import { shelfUsable } from './shelf-usable';
import { sizeMakesNoSense } from './size-makes-no-sense';
import { slotShared } from './slot-shared';
import { slotUnknown } from './slot-unknown';
import { stackCircular } from './stack-circular';
import { stackNotPermitted } from './stack-not-permitted';
import { stackTooHigh } from './stack-too-high';
import { steamPath } from './steam-path';
import { sterilizerInService } from './sterilizer-in-service';
import { textileOnEdge } from './textile-on-edge';
import { trayFlat } from './tray-flat';
import { unplaced } from './unplaced';
import { unscanned } from './unscanned';
import { wallClearance } from './wall-clearance';
import { water } from './water';
import type { Rule } from './rule';

/** Every rule there is, in the order in which findings of equal weight are told. */
export const rules: readonly Rule[] = [
  pouchOnEdge,
  pouchInHolder,
  holderFits,
  slotShared,
  slotUnknown,
  facing,
  gap,
  labelHidden,
  lidFilterCovered,
  baseFilterShut,
  stackNotPermitted,
  stackTooHigh,
  stackCircular,
  trayFlat,
  basinDrains,
  textileOnEdge,
  shelfEdge,
  wallClearance,
  overlap,
  packageClearance,
  headroom,
  steamPath,
  setMass,
  pouchMass,
  shelfMass,
  loadMass,
  metalOverTextile,
  water,
  cycleConflict,
  packagingSuitsSteam,
  ifuOnFile,
  challengeDevicePlaced,
  externalIndicator,
  internalIndicator,
  airRemovalTest,
  sterilizerInService,
  programQualified,
  labelKnown,
  labelOnce,
  packageExpired,
  packageCalledBack,
  packageState,
  unplaced,
  shelfUsable,
  holderUsable,
  unscanned,
  countMissing,
  countDiffers,
  sizeMakesNoSense,
];
