import type { CycleNeed, Metal, Packaging, Pose, PouchFacing } from '#domain/load/model';
import type { UnitSystem } from '../../lib/facility';
import { formatDuration, formatTemperature } from '../../lib/format';

export const packagingWords: Readonly<Record<Packaging, string>> = {
  'paper-film-pouch': 'Paper-film pouch',
  'double-pouch': 'Double pouch',
  wrap: 'Wrap',
  'rigid-container': 'Rigid container',
  none: 'None',
};

export const poseWords: Readonly<Record<Pose, string>> = {
  flat: 'Flat',
  'on-edge': 'On edge',
  tilted: 'Tilted to drain',
};

export const facingWords: Readonly<Record<PouchFacing, string>> = {
  'one-way': 'All paper sides one way',
  alternating: 'Paper to paper, film to film',
};

export const metalWords: Readonly<Record<Metal, string>> = {
  'stainless-steel': 'Stainless steel',
  aluminium: 'Aluminium',
  titanium: 'Titanium',
};

/** "132 °C, 4 to 18 min, dry 30 min" */
export function cycleInWords(need: CycleNeed, unitSystem: UnitSystem): string {
  const least = formatDuration(need.leastExposureS);
  const exposure =
    need.greatestExposureS === null
      ? `${least} or more`
      : need.greatestExposureS === need.leastExposureS
        ? least
        : `${least.replace(/ min$/, '')} to ${formatDuration(need.greatestExposureS)}`;
  const dry = need.leastDryS === 0 ? 'no drying' : `dry ${formatDuration(need.leastDryS)}`;
  return `${formatTemperature(need.temperatureC, unitSystem)}, ${exposure}, ${dry}`;
}

/** The cycle of a list row: the first one, and how many more there are. */
export function cyclesInShort(needs: readonly CycleNeed[], unitSystem: UnitSystem): string {
  const [first, ...more] = needs;
  if (first === undefined) return 'None named';
  return more.length === 0
    ? cycleInWords(first, unitSystem)
    : `${cycleInWords(first, unitSystem)} · ${more.length} more`;
}

export function capital(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
