import { ruleIds, type RuleId } from '../load/finding';
import { rules } from '../load/rules/all-rules';
import type { Rule } from '../load/rules/rule';
import { lessonFamilies, type Lesson, type LessonFamily } from './lesson';
import { airRemovalTestLesson } from './rules/air-removal-test';
import { baseFilterShutLesson } from './rules/base-filter-shut';
import { basinDrainsLesson } from './rules/basin-drains';
import { challengeDevicePlacedLesson } from './rules/challenge-device-placed';
import { countDiffersLesson } from './rules/count-differs';
import { countMissingLesson } from './rules/count-missing';
import { cycleConflictLesson } from './rules/cycle-conflict';
import { externalIndicatorLesson } from './rules/external-indicator';
import { facingLesson } from './rules/facing';
import { gapLesson } from './rules/gap';
import { headroomLesson } from './rules/headroom';
import { holderFitsLesson } from './rules/holder-fits';
import { holderUsableLesson } from './rules/holder-usable';
import { ifuOnFileLesson } from './rules/ifu-on-file';
import { internalIndicatorLesson } from './rules/internal-indicator';
import { labelHiddenLesson } from './rules/label-hidden';
import { labelKnownLesson } from './rules/label-known';
import { labelOnceLesson } from './rules/label-once';
import { lidFilterCoveredLesson } from './rules/lid-filter-covered';
import { loadMassLesson } from './rules/load-mass';
import { metalOverTextileLesson } from './rules/metal-over-textile';
import { overlapLesson } from './rules/overlap';
import { packageCalledBackLesson } from './rules/package-called-back';
import { packageClearanceLesson } from './rules/package-clearance';
import { packageExpiredLesson } from './rules/package-expired';
import { packageStateLesson } from './rules/package-state';
import { packagingSuitsSteamLesson } from './rules/packaging-suits-steam';
import { pouchInHolderLesson } from './rules/pouch-in-holder';
import { pouchMassLesson } from './rules/pouch-mass';
import { pouchOnEdgeLesson } from './rules/pouch-on-edge';
import { programQualifiedLesson } from './rules/program-qualified';
import { setMassLesson } from './rules/set-mass';
import { shelfEdgeLesson } from './rules/shelf-edge';
import { shelfMassLesson } from './rules/shelf-mass';
import { shelfUsableLesson } from './rules/shelf-usable';
import { sizeMakesNoSenseLesson } from './rules/size-makes-no-sense';
import { slotSharedLesson } from './rules/slot-shared';
import { slotUnknownLesson } from './rules/slot-unknown';
import { stackCircularLesson } from './rules/stack-circular';
import { stackNotPermittedLesson } from './rules/stack-not-permitted';
import { stackTooHighLesson } from './rules/stack-too-high';
import { steamPathLesson } from './rules/steam-path';
import { sterilizerInServiceLesson } from './rules/sterilizer-in-service';
import { textileOnEdgeLesson } from './rules/textile-on-edge';
import { trayFlatLesson } from './rules/tray-flat';
import { unplacedLesson } from './rules/unplaced';
import { unscannedLesson } from './rules/unscanned';
import { wallClearanceLesson } from './rules/wall-clearance';
import { waterLesson } from './rules/water';

/** Every rule has its lesson: a new rule does not compile without one. */
const lessons: Readonly<Record<RuleId, Lesson>> = {
  'pouch-on-edge': pouchOnEdgeLesson,
  'pouch-in-holder': pouchInHolderLesson,
  'holder-fits': holderFitsLesson,
  'slot-shared': slotSharedLesson,
  'slot-unknown': slotUnknownLesson,
  facing: facingLesson,
  gap: gapLesson,
  'label-hidden': labelHiddenLesson,
  'lid-filter-covered': lidFilterCoveredLesson,
  'base-filter-shut': baseFilterShutLesson,
  'stack-not-permitted': stackNotPermittedLesson,
  'stack-too-high': stackTooHighLesson,
  'stack-circular': stackCircularLesson,
  'tray-flat': trayFlatLesson,
  'basin-drains': basinDrainsLesson,
  'textile-on-edge': textileOnEdgeLesson,
  'shelf-edge': shelfEdgeLesson,
  'wall-clearance': wallClearanceLesson,
  overlap: overlapLesson,
  'package-clearance': packageClearanceLesson,
  headroom: headroomLesson,
  'steam-path': steamPathLesson,
  'set-mass': setMassLesson,
  'pouch-mass': pouchMassLesson,
  'shelf-mass': shelfMassLesson,
  'load-mass': loadMassLesson,
  'metal-over-textile': metalOverTextileLesson,
  water: waterLesson,
  'cycle-conflict': cycleConflictLesson,
  'packaging-suits-steam': packagingSuitsSteamLesson,
  'ifu-on-file': ifuOnFileLesson,
  'challenge-device-placed': challengeDevicePlacedLesson,
  'external-indicator': externalIndicatorLesson,
  'internal-indicator': internalIndicatorLesson,
  'air-removal-test': airRemovalTestLesson,
  'sterilizer-in-service': sterilizerInServiceLesson,
  'program-qualified': programQualifiedLesson,
  'label-known': labelKnownLesson,
  'label-once': labelOnceLesson,
  'package-expired': packageExpiredLesson,
  'package-called-back': packageCalledBackLesson,
  'package-state': packageStateLesson,
  unplaced: unplacedLesson,
  'shelf-usable': shelfUsableLesson,
  'holder-usable': holderUsableLesson,
  unscanned: unscannedLesson,
  'count-missing': countMissingLesson,
  'count-differs': countDiffersLesson,
  'size-makes-no-sense': sizeMakesNoSenseLesson,
};

export function lessonOf(ruleId: RuleId): Lesson {
  return lessons[ruleId];
}

/** The rule itself, for its name and its source. */
export function ruleOf(ruleId: RuleId): Rule {
  const rule = rules.find((one) => one.id === ruleId);
  if (!rule) throw new Error(`No rule judges ${ruleId}.`);
  return rule;
}

export type FamilyOfLessons = { readonly family: LessonFamily; readonly ruleIds: readonly RuleId[] };

/** Every lesson in the order in which they are listed. */
export const lessonsByFamily: readonly FamilyOfLessons[] = lessonFamilies.map((family) => ({
  family,
  ruleIds: ruleIds.filter((ruleId) => lessons[ruleId].family === family),
}));
