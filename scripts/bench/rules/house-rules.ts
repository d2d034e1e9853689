import { defaultPolicy, type LoadPolicy } from '../../../src/domain/load/policy';
import { celsius, degrees, kg, kilogramsPerMinute, mm, percent } from '../../../src/domain/units/quantity';
import type { Random } from './random';

/** House rules of one hospital; one in five keeps the defaults. All of them within what the trade would set. */
export function houseRules(random: Random): LoadPolicy {
  if (random.chance(0.2)) return defaultPolicy;
  return {
    facing: random.pick(['one-way', 'one-way', 'alternating', 'not-set']),
    challengeDevice: random.pick(['implant-loads', 'implant-loads', 'every-load', 'not-asked']),
    challengeDeviceMissing: random.pick(['stop', 'accept', 'advice']),
    challengeDeviceReachMm: mm(random.whole(20, 60) * 10),
    pouchGapMm: mm(random.whole(0, 12)),
    greatestLeanDeg: degrees(random.whole(20, 45)),
    labelReadingGapMm: mm(random.whole(0, 35)),
    packageClearanceMm: mm(random.whole(0, 40)),
    wallClearanceMm: mm(random.whole(0, 50)),
    headroomMm: mm(random.pick([0, 0, 10, 25])),
    greatestShelfCoverPercent: percent(random.whole(60, 100)),
    greatestSetMassKg: kg(random.pick([8.5, 10, 11.3, 11.3, 13])),
    greatestTextilePackMassKg: kg(random.pick([5, 5.4, 6])),
    greatestPouchMassKg: kg(random.pick([0.35, 0.5, 0.5, 1])),
    massMarginPercent: percent(random.pick([0, 0, 5, 20])),
    metalOverTextileKg: kg(random.pick([0.1, 0.5, 0.5, 1, 2])),
    waterPerDryMinute: kilogramsPerMinute(random.pick([0.02, 0.05, 0.1, 0.3])),
    startTemperatureC: celsius(random.whole(15, 30)),
  };
}
