import type { CatalogueItem, CycleNeed } from '#domain/load/model';
import { celsius, kg, mm, seconds } from '#domain/units/quantity';

/*
 * The items of the demonstration hospital that the carts in the tests are built from, with its sizes, masses, gaps and cycles.
 * Filter zones and metal masses are invented, as they are in the demonstration itself.
 */

function dynamic(dryMin: number, temperatureC = 132, exposureS = 240): CycleNeed {
  return {
    type: 'dynamic-air-removal',
    temperatureC: celsius(temperatureC),
    leastExposureS: seconds(exposureS),
    greatestExposureS: seconds(exposureS * 4),
    leastDryS: seconds(dryMin * 60),
  };
}

const gravity121: CycleNeed = {
  type: 'gravity',
  temperatureC: celsius(121),
  leastExposureS: seconds(1800),
  greatestExposureS: seconds(3600),
  leastDryS: seconds(1800),
};

export function anItem(
  code: string,
  name: string,
  [lengthMm, widthMm, heightMm]: readonly [number, number, number],
  massKg: number,
  own: Partial<CatalogueItem> = {},
): CatalogueItem {
  return {
    id: `item ${code}`,
    code,
    name,
    kind: 'pouch',
    packaging: 'paper-film-pouch',
    lengthMm: mm(lengthMm),
    widthMm: mm(widthMm),
    heightMm: mm(heightMm),
    massKg: kg(massKg),
    metalMassKg: kg(massKg * 0.9),
    textileMassKg: kg(0),
    metal: 'stainless-steel',
    isImplant: false,
    pose: 'on-edge',
    isPerforated: true,
    clearanceMm: mm(10),
    standsOn: [],
    greatestStackHeightMm: null,
    filterZones: [],
    cycleNeeds: [dynamic(20)],
    preferredHolder: null,
    facing: null,
    massLimitKg: null,
    ifuReference: `IFU ${code}`,
    isRetired: false,
    ...own,
  };
}

const set = {
  kind: 'wrapped-tray',
  packaging: 'wrap',
  pose: 'flat',
  clearanceMm: mm(25),
  cycleNeeds: [dynamic(30)],
} as const satisfies Partial<CatalogueItem>;

/** Two round filters in the lid, drawn as squares in the middle of each half. */
const container = {
  ...set,
  kind: 'rigid-container',
  packaging: 'rigid-container',
  filterZones: [
    { face: 'lid', xMm: mm(70), yMm: mm(65), lengthMm: mm(150), widthMm: mm(150) },
    { face: 'lid', xMm: mm(360), yMm: mm(65), lengthMm: mm(150), widthMm: mm(150) },
  ],
} as const satisfies Partial<CatalogueItem>;

const basin = { ...set, kind: 'basin', pose: 'tilted', isPerforated: false } as const satisfies Partial<CatalogueItem>;
const small = { preferredHolder: 'RS' } as const;
const medium = { preferredHolder: 'RM' } as const;
const large = { preferredHolder: 'RL', clearanceMm: mm(15) } as const;
const full = [580, 280, 150] as const;

export const demonstrationItems: readonly CatalogueItem[] = [
  anItem('P-01', 'Adson forceps pair', [250, 75, 10], 0.08, small),
  anItem('P-02', 'Metzenbaum scissors', [330, 90, 12], 0.12, small),
  anItem('P-03', 'Mayo scissors curved', [330, 90, 12], 0.14, small),
  anItem('P-04', 'Single curette set of 2', [330, 130, 15], 0.18, small),
  anItem('P-05', 'Speculum medium', [330, 200, 45], 0.31, large),
  anItem('P-06', 'Speculum large', [400, 200, 50], 0.38, large),
  anItem('P-07', 'Suction tip', [400, 130, 14], 0.15, { ...medium, cycleNeeds: [dynamic(30)] }),
  anItem('P-13', 'Bone rongeur single', [330, 130, 25], 0.42, { ...medium, cycleNeeds: [dynamic(30)] }),
  anItem('P-14', 'Retractor Army-Navy pair', [330, 130, 20], 0.33, medium),
  anItem('P-15', 'Ring cutter', [250, 90, 20], 0.19, medium),
  anItem('P-16', 'Suture removal scissors', [200, 75, 8], 0.05, small),
  anItem('P-19', 'Screw rack single size', [200, 130, 30], 0.12, { ...medium, isImplant: true }),
  anItem('W-01', 'Minor set', [560, 260, 110], 5.4, set),
  anItem('W-02', 'Major laparotomy set', [560, 270, 150], 9.6, set),
  anItem('W-03', 'D&C set', [500, 260, 90], 3.2, { ...set, cycleNeeds: [dynamic(20)] }),
  anItem('W-04', 'Vaginal delivery set', [400, 260, 90], 2.6, { ...set, cycleNeeds: [dynamic(20)] }),
  anItem('W-06', 'Basic plastic set', [500, 260, 90], 3.4, { ...set, cycleNeeds: [dynamic(20)] }),
  anItem('W-07', 'Chest tube tray', [450, 260, 90], 2.2, { ...set, cycleNeeds: [dynamic(20)] }),
  anItem('W-08', 'Laceration tray', [350, 230, 70], 1.1, { ...set, cycleNeeds: [dynamic(20)] }),
  anItem('W-09', 'Hand set', [500, 260, 90], 4.1, set),
  anItem('W-10', 'Basin set nested', [380, 380, 120], 3.6, basin),
  anItem('W-11', 'Graduate and bowl', [260, 260, 160], 1, basin),
  anItem('W-12', 'Drape pack reusable', [380, 240, 180], 4.6, {
    ...set,
    kind: 'textile-pack',
    pose: 'on-edge',
    metalMassKg: kg(0),
    textileMassKg: kg(4.6),
    cycleNeeds: [dynamic(20)],
  }),
  anItem('C-01', 'General container set A', full, 8.9, container),
  anItem('C-02', 'General container set B', full, 9.3, { ...container, standsOn: ['C-01'] }),
  anItem('C-03', 'Laparoscopic instruments', [580, 280, 130], 7.2, container),
  anItem('C-04', 'Laparoscope 10 mm 30 deg', [500, 120, 80], 1.6, { ...container, filterZones: [] }),
  anItem('C-05', 'Ortho small fragment', full, 10.2, { ...container, isImplant: true }),
  anItem('C-07', 'Power drill set', full, 8.4, { ...container, cycleNeeds: [dynamic(50)] }),
  anItem('C-08', 'Total knee tray 1', full, 10.6, container),
  anItem('C-12', 'Spine tray (loaner)', full, 12.1, { ...container, cycleNeeds: [dynamic(40)] }),
  anItem('C-13', 'Neuro craniotomy set', full, 9.8, { ...container, cycleNeeds: [dynamic(30, 134, 1080)] }),
  anItem('C-14', 'Eye micro set', [300, 200, 60], 0.9, { ...container, filterZones: [], cycleNeeds: [dynamic(20)] }),
  anItem('C-15', 'Cystoscopy set', [500, 250, 100], 3.9, { ...container, filterZones: [] }),
  anItem('G-01', 'Rubber bite blocks', [250, 130, 30], 0.1, {
    ...medium,
    metalMassKg: kg(0),
    cycleNeeds: [gravity121],
  }),
  anItem('PCD', 'Challenge pack', [130, 130, 60], 0.5, {
    ...set,
    kind: 'challenge-device',
    metalMassKg: kg(0),
    cycleNeeds: [],
  }),
];
