import {
  basin,
  challengeDevice,
  container,
  exampleHibc,
  gravityCycle,
  longCycle,
  pouch,
  textilePack,
  wrappedCycle,
  wrappedTray,
} from './demonstration-items';
import { v7 } from 'uuid';
import type { Knex } from 'knex';
import { itemRowFrom } from '../server/features/items/item-row';
import type { ItemFields } from '../src/domain/catalogue/item-fields';
import { kg, mm, seconds } from '../src/domain/units/quantity';

/** The 52 items of the demonstration hospital. */
export const demonstrationItems: readonly ItemFields[] = [
  pouch('P-01', 'Adson forceps pair', [250, 75, 12], 0.08, { preferredHolder: 'RS', service: 'OR/ED' }),
  pouch('P-02', 'Metzenbaum scissors', [330, 90, 14], 0.12, { preferredHolder: 'RS' }),
  pouch('P-03', 'Mayo scissors curved', [330, 90, 14], 0.14, { preferredHolder: 'RS' }),
  pouch('P-04', 'Single curette set of 2', [330, 130, 17], 0.18, { preferredHolder: 'RS', service: 'OR/L&D' }),
  pouch('P-05', 'Speculum medium', [330, 200, 48], 0.31, {
    clearanceMm: mm(15),
    preferredHolder: 'RL',
    service: 'Clinic/ED',
    note: 'Tall pouch; falls over without a holder',
  }),
  pouch('P-06', 'Speculum large', [400, 200, 53], 0.38, {
    clearanceMm: mm(15),
    preferredHolder: 'RL',
    service: 'Clinic/ED',
    note: 'Tall pouch',
  }),
  pouch('P-07', 'Suction tip', [400, 130, 16], 0.15, {
    cycleNeeds: [wrappedCycle(30, null)],
    note: 'Lumen; longer dry',
  }),
  pouch('P-08', 'Laryngoscope blade 3', [250, 130, 43], 0.16, {
    clearanceMm: mm(15),
    preferredHolder: 'RL',
    service: 'OR/ED',
  }),
  pouch('P-09', 'Laryngoscope blade 4', [250, 130, 43], 0.18, {
    clearanceMm: mm(15),
    preferredHolder: 'RL',
    service: 'OR/ED',
  }),
  pouch('P-10', 'Bipolar cord', [330, 200, 22], 0.14, {
    cycleNeeds: [wrappedCycle(30, 8)],
    metalMassKg: kg(0.04),
    note: 'Coil loosely',
  }),
  pouch('P-11', 'Light cable', [400, 200, 27], 0.29, {
    cycleNeeds: [wrappedCycle(30, 8)],
    metalMassKg: kg(0.08),
    note: 'Use limit counted',
  }),
  pouch('P-12', 'Trocar 5 mm reusable', [330, 130, 24], 0.2, { cycleNeeds: [wrappedCycle(30)], note: 'Lumen' }),
  pouch('P-13', 'Bone rongeur single', [330, 130, 27], 0.42, {
    cycleNeeds: [wrappedCycle(30)],
    coolS: seconds(2_700),
    note: 'Near the pouch mass limit',
  }),
  pouch('P-14', 'Retractor Army-Navy pair', [330, 130, 22], 0.33, { service: 'OR/ED' }),
  pouch('P-15', 'Ring cutter', [250, 90, 22], 0.19, { service: 'ED' }),
  pouch('P-16', 'Suture removal scissors', [200, 75, 10], 0.05, { preferredHolder: 'RS', service: 'Clinic' }),
  pouch('P-17', 'Dental mirror and explorer', [250, 75, 10], 0.05, { preferredHolder: 'RS', service: 'Clinic' }),
  pouch('P-18', 'Osteotome 10 mm', [330, 90, 17], 0.24, { note: 'Tip guard' }),
  pouch('P-19', 'Screw rack single size', [200, 130, 30], 0.12, {
    isImplant: true,
    packaging: 'double-pouch',
    metal: 'titanium',
    note: 'Implant',
  }),
  pouch('P-20', 'K-wire tube', [330, 75, 17], 0.09, {
    isImplant: true,
    preferredHolder: 'RS',
    metal: 'stainless-steel',
    note: 'Implant',
  }),
  wrappedTray('W-01', 'Minor set', [560, 260, 110], 5.4, { cycleNeeds: [wrappedCycle(30)] }),
  wrappedTray('W-02', 'Major laparotomy set', [560, 270, 150], 9.6, {
    cycleNeeds: [wrappedCycle(30)],
    coolS: seconds(5_400),
  }),
  wrappedTray('W-03', 'D&C set', [500, 260, 90], 3.2, { service: 'L&D' }),
  wrappedTray('W-04', 'Vaginal delivery set', [400, 260, 90], 2.6, { service: 'L&D' }),
  wrappedTray('W-05', 'Caesarean set', [560, 260, 130], 7.8, {
    cycleNeeds: [wrappedCycle(30)],
    service: 'L&D',
    coolS: seconds(5_400),
  }),
  wrappedTray('W-06', 'Basic plastic set', [500, 260, 90], 3.4, {}),
  wrappedTray('W-07', 'Chest tube tray', [450, 260, 90], 2.2, { service: 'ED' }),
  wrappedTray('W-08', 'Laceration tray', [350, 230, 70], 1.1, { service: 'ED', coolS: seconds(2_700) }),
  wrappedTray('W-09', 'Hand set', [500, 260, 90], 4.1, { cycleNeeds: [wrappedCycle(30)] }),
  basin('W-10', 'Basin set nested', [380, 380, 120], 3.6, {
    coolS: seconds(3_600),
    metalMassKg: kg(3.3),
    textileMassKg: kg(0.2),
    note: 'Absorbent liner between basins; drain tilt',
  }),
  basin('W-11', 'Graduate and bowl', [260, 260, 160], 1, {
    service: 'L&D',
    coolS: seconds(2_700),
    metalMassKg: kg(0.9),
    textileMassKg: kg(0.05),
  }),
  textilePack('W-12', 'Drape pack reusable', [380, 240, 180], 4.6, {
    coolS: seconds(3_600),
    note: 'Never under metal',
  }),
  container('C-01', 'General container set A', [580, 280, 150], 8.9, {
    standsOn: ['C-17', 'C-18'],
    greatestStackHeightMm: mm(300),
    note: 'Lid filter must stay open',
  }),
  container('C-02', 'General container set B', [580, 280, 150], 9.3, {
    standsOn: ['C-17', 'C-18'],
    greatestStackHeightMm: mm(300),
    note: 'Lid filter must stay open',
  }),
  container('C-03', 'Laparoscopic instruments', [580, 280, 130], 7.2, {
    standsOn: ['C-17', 'C-18'],
    greatestStackHeightMm: mm(300),
  }),
  container('C-04', 'Laparoscope 10 mm 30 deg', [500, 120, 80], 1.6, {
    cycleNeeds: [wrappedCycle(30, 10)],
    coolS: seconds(3_600),
    massLimitKg: kg(3),
    note: 'Fragile',
  }),
  container('C-05', 'Ortho small fragment', [580, 280, 150], 10.2, {
    isImplant: true,
    note: 'Implant screws and plates',
  }),
  container('C-06', 'Ortho large fragment', [580, 280, 150], 11.1, {
    isImplant: true,
    note: 'Implant; near 11.3 kg limit',
  }),
  container('C-07', 'Power drill set', [580, 280, 150], 8.4, {
    cycleNeeds: [wrappedCycle(50, 10)],
    deviceIdentifier: exampleHibc('DRILL7'),
    note: 'Longest dry time in the catalogue',
  }),
  container('C-08', 'Total knee tray 1', [580, 280, 150], 10.6, {}),
  container('C-09', 'Total knee tray 2', [580, 280, 150], 10.9, {}),
  container('C-10', 'Femoral nail instruments (loaner)', [580, 280, 150], 10.8, {
    cycleNeeds: [wrappedCycle(40)],
    expiryRule: 'dated',
    expiryDays: 30,
    deviceIdentifier: exampleHibc('NAIL10'),
    note: 'Loaner',
  }),
  container('C-11', 'Femoral nail implants (loaner)', [580, 280, 130], 9.7, {
    cycleNeeds: [wrappedCycle(40)],
    isImplant: true,
    expiryRule: 'dated',
    expiryDays: 30,
    metal: 'titanium',
    deviceIdentifier: exampleHibc('NAIL11'),
    note: 'Loaner; implant; early release story',
  }),
  container('C-12', 'Spine tray (loaner)', [580, 280, 150], 12.1, {
    cycleNeeds: [wrappedCycle(40)],
    coolS: seconds(7_200),
    expiryRule: 'dated',
    expiryDays: 30,
    deviceIdentifier: exampleHibc('SPINE12'),
    note: 'Over 11.3 kg: intake rule must fire',
  }),
  container('C-13', 'Neuro craniotomy set', [580, 280, 150], 9.8, {
    cycleNeeds: [longCycle],
    note: '134 C 18 min only: may not share a 4 min load',
  }),
  container('C-14', 'Eye micro set', [300, 200, 60], 0.9, {
    cycleNeeds: [wrappedCycle(20, 10)],
    coolS: seconds(2_700),
    metal: 'titanium',
    massLimitKg: kg(2),
  }),
  container('C-15', 'Cystoscopy set', [500, 250, 100], 3.9, { service: 'Clinic', coolS: seconds(3_600) }),
  wrappedTray('W-13', 'Tracheostomy set', [450, 260, 90], 2.4, { service: 'ED/OR' }),
  container('C-17', 'Vascular set', [580, 280, 130], 8.1, {
    standsOn: ['C-18'],
    greatestStackHeightMm: mm(300),
    filters: ['base'],
  }),
  container('C-18', 'Thoracotomy emergency', [580, 280, 150], 9.9, {
    service: 'ED',
    standsOn: ['C-17'],
    greatestStackHeightMm: mm(300),
    filters: ['base'],
    note: 'Priority item',
  }),
  pouch('G-01', 'Rubber bite blocks', [250, 130, 30], 0.1, {
    cycleNeeds: [gravityCycle],
    service: 'Clinic',
    metalMassKg: kg(0),
    note: '121 C gravity only: mixed load conflict',
  }),
  pouch('G-02', 'Ring pessary fitting set', [330, 200, 43], 0.22, {
    cycleNeeds: [gravityCycle],
    clearanceMm: mm(15),
    preferredHolder: 'RL',
    service: 'Clinic',
    metalMassKg: kg(0.02),
    note: '121 C gravity only',
  }),
];

/** What the hospital packs itself to challenge a load: it is no item of anybody's set. */
export const challengePack: ItemFields = challengeDevice('PCD-01', 'Challenge pack with BI', [230, 230, 150], 1.4, {
  textileMassKg: kg(1.3),
  deviceIdentifier: null,
  clearanceMm: mm(25),
  service: 'Central sterile',
  note: 'Goes to the coldest place of the load',
});

/** The small one that is bought: it finds room beside a full load. */
export const singleUseChallengeDevice: ItemFields = challengeDevice(
  'PCD-02',
  'Challenge device, single use',
  [140, 80, 25],
  0.08,
  {
    deviceIdentifier: null,
    clearanceMm: mm(25),
    service: 'Central sterile',
    note: 'Goes to the coldest place of the load',
  },
);

/** Lays out a facility's catalogue: all items and the challenge devices, or only those with these codes. */
export async function seedCatalogue(
  trx: Knex.Transaction,
  { facilityId, codes }: { readonly facilityId: string; readonly codes?: readonly string[] },
): Promise<void> {
  const items = [...demonstrationItems, challengePack, singleUseChallengeDevice].filter(
    (item) => codes?.includes(item.code) ?? true,
  );
  await trx('items').insert(items.map((item) => ({ id: v7(), facility_id: facilityId, ...itemRowFrom(item) })));
}
