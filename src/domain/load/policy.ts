import {
  celsius,
  degrees,
  kg,
  kilogramsPerMinute,
  mm,
  percent,
  type Celsius,
  type Degree,
  type Kilogram,
  type KilogramPerMinute,
  type Millimetre,
  type Percent,
} from '../units/quantity';
import type { Figure, Severity, Source } from './finding';
import type { CatalogueItem, PouchFacing } from './model';

/** Changes whenever a rule, a default or a severity changes: a closed load keeps the version it was judged by. */
export const ruleSetVersion = '2026-12-01.2';

export type FacingRule = PouchFacing | 'not-set';

export type ChallengeDeviceRule = 'not-asked' | 'implant-loads' | 'every-load';

/** Everything a facility may set about how its loads are judged. An item's own instructions for use come first. */
export type LoadPolicy = {
  readonly facing: FacingRule;
  readonly challengeDevice: ChallengeDeviceRule;
  readonly challengeDeviceMissing: Severity;
  readonly challengeDeviceReachMm: Millimetre;
  readonly pouchGapMm: Millimetre;
  readonly greatestLeanDeg: Degree;
  readonly labelReadingGapMm: Millimetre;
  readonly packageClearanceMm: Millimetre;
  readonly wallClearanceMm: Millimetre;
  readonly headroomMm: Millimetre;
  readonly greatestShelfCoverPercent: Percent;
  readonly greatestSetMassKg: Kilogram;
  readonly greatestTextilePackMassKg: Kilogram;
  readonly greatestPouchMassKg: Kilogram;
  readonly massMarginPercent: Percent;
  readonly metalOverTextileKg: Kilogram;
  readonly waterPerDryMinute: KilogramPerMinute;
  readonly startTemperatureC: Celsius;
};

type QuantityId = {
  [Id in keyof LoadPolicy]: LoadPolicy[Id] extends number ? Id : never;
}[keyof LoadPolicy];
type ChoiceId = Exclude<keyof LoadPolicy, QuantityId>;

export type QuantityParameter = {
  readonly form: 'quantity';
  readonly id: QuantityId;
  readonly label: string;
  readonly unit: 'mm' | 'kg' | 'deg' | '%' | 'degC' | 'kg/min';
  readonly default: number;
  readonly range: { readonly least: number; readonly greatest: number };
  readonly source: Source;
};

export type ChoiceParameter = {
  readonly form: 'choice';
  readonly id: ChoiceId;
  readonly label: string;
  readonly choices: readonly { readonly value: string; readonly label: string }[];
  readonly default: string;
  readonly source: Source;
};

export type PolicyParameter = QuantityParameter | ChoiceParameter;

const housesOwn = (text: string): Source => ({ text, provenance: 'house-rule' });

export const defaultPolicy: LoadPolicy = {
  facing: 'one-way',
  challengeDevice: 'implant-loads',
  challengeDeviceMissing: 'stop',
  challengeDeviceReachMm: mm(300),
  pouchGapMm: mm(10),
  greatestLeanDeg: degrees(30),
  labelReadingGapMm: mm(30),
  packageClearanceMm: mm(25),
  wallClearanceMm: mm(25),
  headroomMm: mm(0),
  greatestShelfCoverPercent: percent(95),
  greatestSetMassKg: kg(11.3),
  greatestTextilePackMassKg: kg(5.4),
  greatestPouchMassKg: kg(0.5),
  massMarginPercent: percent(0),
  metalOverTextileKg: kg(0.5),
  waterPerDryMinute: kilogramsPerMinute(0.1),
  startTemperatureC: celsius(20),
};

/** What a facility can set, in the order it is shown, with the default and where the default comes from. */
export const policyParameters: readonly PolicyParameter[] = [
  {
    form: 'choice',
    id: 'facing',
    label: 'Which way pouches on edge face',
    choices: [
      { value: 'one-way', label: 'All paper sides one way' },
      { value: 'alternating', label: 'Paper to paper, film to film' },
      { value: 'not-set', label: 'Not set: no finding' },
    ],
    default: defaultPolicy.facing,
    source: {
      text: 'Makers of pouches contradict each other: some ask for paper to film all one way, others for paper to paper and film to film. No default is right everywhere; follow the instructions for use of your pouches.',
      provenance: 'restated',
    },
  },
  {
    form: 'choice',
    id: 'challengeDevice',
    label: 'When a challenge device has to be in the load',
    choices: [
      { value: 'implant-loads', label: 'In every load with an implant' },
      { value: 'every-load', label: 'In every load' },
      { value: 'not-asked', label: 'Not asked for by this rule' },
    ],
    default: defaultPolicy.challengeDevice,
    source: {
      text: 'CDC guideline for disinfection and sterilization in healthcare facilities (2008), monitoring recommendation 7: a biological indicator in every load with implants (read in a copy).',
      provenance: 'published',
    },
  },
  {
    form: 'choice',
    id: 'challengeDeviceMissing',
    label: 'When the challenge device is missing',
    choices: [
      { value: 'stop', label: 'Holds the load' },
      { value: 'accept', label: 'A lead may accept it with a reason' },
      { value: 'advice', label: 'A note' },
    ],
    default: defaultPolicy.challengeDeviceMissing,
    source: {
      text: 'New Jersey Administrative Code 8:43G-8.8(d): implants shall not be used until the biological indicator is negative, so the load needs one.',
      provenance: 'published',
    },
  },
  {
    form: 'quantity',
    id: 'challengeDeviceReachMm',
    label: 'How far from the drain the challenge device may stand',
    unit: 'mm',
    default: defaultPolicy.challengeDeviceReachMm,
    range: { least: 50, greatest: 1000 },
    source: housesOwn(
      'The place comes from the qualification of the sterilizer; common practice is over the drain, no published distance.',
    ),
  },
  {
    form: 'quantity',
    id: 'pouchGapMm',
    label: 'Least gap between pouches on edge, where their instructions are silent',
    unit: 'mm',
    default: defaultPolicy.pouchGapMm,
    range: { least: 0, greatest: 100 },
    source: housesOwn('Pouches stand apart by common practice; no published distance.'),
  },
  {
    form: 'quantity',
    id: 'greatestLeanDeg',
    label: 'How far a pouch on edge may lean',
    unit: 'deg',
    default: defaultPolicy.greatestLeanDeg,
    range: { least: 5, greatest: 85 },
    source: housesOwn('Pouches stand on edge by common practice; no published angle.'),
  },
  {
    form: 'quantity',
    id: 'labelReadingGapMm',
    label: 'Free space in front of a label so that it can be read',
    unit: 'mm',
    default: defaultPolicy.labelReadingGapMm,
    range: { least: 0, greatest: 200 },
    source: housesOwn('Common practice, no source.'),
  },
  {
    form: 'quantity',
    id: 'packageClearanceMm',
    label: 'Least clearance between packages, where their instructions are silent',
    unit: 'mm',
    default: defaultPolicy.packageClearanceMm,
    range: { least: 0, greatest: 200 },
    source: {
      text: 'About 2.5 cm between trays: several operator manuals and guides agree; general practice, no single standard.',
      provenance: 'common-practice',
    },
  },
  {
    form: 'quantity',
    id: 'wallClearanceMm',
    label: 'Least clearance to the chamber walls',
    unit: 'mm',
    default: defaultPolicy.wallClearanceMm,
    range: { least: 0, greatest: 200 },
    source: {
      text: 'Nothing touches the chamber walls: several operator manuals and guides agree. They give no distance; 25 mm is ours to start from.',
      provenance: 'common-practice',
    },
  },
  {
    form: 'quantity',
    id: 'headroomMm',
    label: 'Free height kept above packages',
    unit: 'mm',
    default: defaultPolicy.headroomMm,
    range: { least: 0, greatest: 200 },
    source: housesOwn('No published distance; 0 only asks that things fit under the shelf above.'),
  },
  {
    form: 'quantity',
    id: 'greatestShelfCoverPercent',
    label: 'Share of a shelf that may be covered',
    unit: '%',
    default: defaultPolicy.greatestShelfCoverPercent,
    range: { least: 10, greatest: 100 },
    source: {
      text: 'WS 310 fills a gravity chamber to at most 80 % and a prevacuum chamber to at most 90 %, from memory. That is volume; for the area of a shelf there is no source.',
      provenance: 'from-memory',
    },
  },
  {
    form: 'quantity',
    id: 'greatestSetMassKg',
    label: 'Greatest mass of a set, where its instructions are silent',
    unit: 'kg',
    default: defaultPolicy.greatestSetMassKg,
    range: { least: 0.5, greatest: 30 },
    source: {
      text: '25 lb (11.3 kg), as a published hospital loaner policy and secondary texts give it; its origin in AAMI documents is from memory. Others: 7 kg (WS 310, restated), 8.5 kg without wrap (Dutch guideline, 2001), 10 kg rigid container (Swiss reply, 2001).',
      provenance: 'restated',
    },
  },
  {
    form: 'quantity',
    id: 'greatestTextilePackMassKg',
    label: 'Greatest mass of a textile pack, where its instructions are silent',
    unit: 'kg',
    default: defaultPolicy.greatestTextilePackMassKg,
    range: { least: 0.5, greatest: 15 },
    source: {
      text: '12 lb (5.4 kg) on a technician examination page. Others: 5 kg (WS 310, restated), 6 kg (Dutch guideline, 2001).',
      provenance: 'restated',
    },
  },
  {
    form: 'quantity',
    id: 'greatestPouchMassKg',
    label: 'Greatest mass in a pouch, where its instructions are silent',
    unit: 'kg',
    default: defaultPolicy.greatestPouchMassKg,
    range: { least: 0.05, greatest: 5 },
    source: housesOwn(
      'Perioperative packaging guideline 2019 (summary): pouches are for small, light, low-profile items. It gives no mass; set your own.',
    ),
  },
  {
    form: 'quantity',
    id: 'massMarginPercent',
    label: 'Share of a shelf’s or a load’s mass limit held back',
    unit: '%',
    default: defaultPolicy.massMarginPercent,
    range: { least: 0, greatest: 50 },
    source: housesOwn('No source; 0 uses the whole limit of the equipment.'),
  },
  {
    form: 'quantity',
    id: 'metalOverTextileKg',
    label: 'Metal in a package from which it may not be above textiles',
    unit: 'kg',
    default: defaultPolicy.metalOverTextileKg,
    range: { least: 0, greatest: 10 },
    source: housesOwn('Textiles above metal is general practice; no published mass below which it does not matter.'),
  },
  {
    form: 'quantity',
    id: 'waterPerDryMinute',
    label: 'Water one minute of drying is expected to remove',
    unit: 'kg/min',
    default: defaultPolicy.waterPerDryMinute,
    range: { least: 0.005, greatest: 1 },
    source: housesOwn('No published figure; learn it from your own wet loads.'),
  },
  {
    form: 'quantity',
    id: 'startTemperatureC',
    label: 'Temperature of the load when it goes in',
    unit: 'degC',
    default: defaultPolicy.startTemperatureC,
    range: { least: 5, greatest: 60 },
    source: { text: 'Room temperature, as in the worked figures for condensate.', provenance: 'common-practice' },
  },
];

/** How a pouch has to face: as its instructions for use say, else as the facility does. */
export function facingRuleOf(item: Pick<CatalogueItem, 'facing'>, policy: LoadPolicy): FacingRule {
  return item.facing ?? policy.facing;
}

export type Limit = { readonly limit: number; readonly limitFrom: Figure['limitFrom'] };

/**
 * The limit that holds: of the item's instructions for use where they say something, else of the facility, else the default.
 * Instructions that say something that cannot be (no number, less than nothing) say nothing.
 */
export function limitOf(ifu: number | null, policy: LoadPolicy, id: QuantityId): Limit {
  if (ifu !== null && ifu >= 0) return { limit: ifu, limitFrom: 'ifu' };
  return { limit: policy[id], limitFrom: policy[id] === defaultPolicy[id] ? 'default' : 'house-rule' };
}
