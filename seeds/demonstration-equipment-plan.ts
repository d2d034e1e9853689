import type { HolderKindFields, ShelfFields } from '../src/domain/catalogue/equipment-fields';
import { kg, mm } from '../src/domain/units/quantity';

/* Invented equipment for the demonstration and for tests; plausible, and nobody's. */

export type ProgramSeed = readonly [
  code: string,
  name: string,
  temperatureC: number,
  exposureMin: number,
  dryMin: number,
];

export const dynamicPrograms: readonly ProgramSeed[] = [
  ['W4-20', 'Wrapped, 4 min at 132 °C, dry 20 min', 132, 4, 20],
  ['W4-30', 'Wrapped, 4 min at 132 °C, dry 30 min', 132, 4, 30],
  ['W4-40', 'Wrapped, 4 min at 132 °C, dry 40 min', 132, 4, 40],
  ['W4-50', 'Wrapped, 4 min at 132 °C, dry 50 min', 132, 4, 50],
  ['T4-20', 'Textiles, 4 min at 132 °C, dry 20 min', 132, 4, 20],
  ['P18-30', 'Prolonged, 18 min at 134 °C, dry 30 min', 134, 18, 30],
  ['W3-16', 'Wrapped, 3 min at 135 °C, dry 16 min', 135, 3, 16],
];
export const gravityPrograms: readonly ProgramSeed[] = [
  ['G121-30', 'Gravity, 30 min at 121 °C, dry 30 min', 121, 30, 30],
];
export const immediatePrograms: readonly ProgramSeed[] = [
  ['U4-1', 'Immediate use, 4 min at 132 °C, dry 1 min', 132, 4, 1],
];

export const largeChamber = { widthMm: 620, depthMm: 1_250, heightMm: 700, drainXMm: 280, drainYMm: 90 };
export const smallChamber = { widthMm: 340, depthMm: 540, heightMm: 340, drainXMm: 150, drainYMm: 40 };

export type SterilizerSeed = {
  readonly number: string;
  readonly isLarge: boolean;
  readonly name: string;
  readonly steamLine: string;
  readonly hasAirDetector: boolean;
  readonly qualified: readonly string[];
  readonly other: readonly string[];
};

const daily = ['W4-20', 'W4-30', 'W4-40'];

export const hospitalSterilizers: readonly SterilizerSeed[] = [
  {
    number: '1',
    isLarge: true,
    name: 'Sterilizer 1',
    steamLine: 'A',
    hasAirDetector: false,
    qualified: [...daily, 'W4-50', 'T4-20'],
    other: [],
  },
  {
    number: '2',
    isLarge: true,
    name: 'Sterilizer 2',
    steamLine: 'A',
    hasAirDetector: false,
    qualified: [...daily, 'W4-50', 'T4-20', 'P18-30'],
    other: [],
  },
  {
    number: '3',
    isLarge: true,
    name: 'Sterilizer 3',
    steamLine: 'B',
    hasAirDetector: true,
    qualified: [...daily, 'G121-30'],
    other: ['W3-16'],
  },
  {
    number: '4',
    isLarge: false,
    name: 'Sterilizer 4, sterile core',
    steamLine: 'B',
    hasAirDetector: false,
    qualified: ['U4-1'],
    other: [],
  },
];

export const surgeryCenterSterilizers: readonly SterilizerSeed[] = [
  {
    number: '1',
    isLarge: true,
    name: 'Sterilizer 1',
    steamLine: 'A',
    hasAirDetector: false,
    qualified: daily,
    other: [],
  },
];

const lowerShelf: ShelfFields = {
  level: 1,
  name: 'Lower shelf',
  widthMm: mm(560),
  depthMm: mm(1_150),
  clearHeightMm: mm(340),
  surface: 'wire',
  greatestMassKg: kg(60),
  isUsable: true,
};
const upperShelf: ShelfFields = {
  ...lowerShelf,
  level: 2,
  name: 'Upper shelf',
  clearHeightMm: mm(270),
  greatestMassKg: kg(50),
};
const smallShelf: ShelfFields = {
  ...lowerShelf,
  name: 'Shelf',
  widthMm: mm(300),
  depthMm: mm(480),
  clearHeightMm: mm(250),
  greatestMassKg: kg(15),
};

export type CartSeed = {
  readonly code: string;
  readonly name: string;
  readonly sizeClass: 'large' | 'small';
  readonly note: string;
  readonly shelves: readonly ShelfFields[];
};

export function largeCart(number: number): CartSeed {
  return {
    code: `C${number}`,
    name: `Cart ${number}`,
    sizeClass: 'large',
    note: '',
    shelves: [lowerShelf, upperShelf],
  };
}

export const hospitalCarts: readonly CartSeed[] = [
  ...[1, 2, 3, 4, 5, 6].map(largeCart),
  { ...largeCart(7), note: 'Upper shelf is bent', shelves: [lowerShelf, { ...upperShelf, isUsable: false }] },
  { code: 'S1', name: 'Small cart', sizeClass: 'small', note: '', shelves: [smallShelf] },
];

function rack(
  code: string,
  name: string,
  [slots, pitch, height, length, thickness]: readonly [number, number, number, number, number],
  [across, along, mass, owned]: readonly [number, number, number, number],
): HolderKindFields {
  return {
    code,
    name,
    form: 'rack',
    slots,
    pitchMm: mm(pitch),
    greatestHeightMm: mm(height),
    greatestLengthMm: mm(length),
    greatestThicknessMm: mm(thickness),
    acrossMm: mm(across),
    alongMm: mm(along),
    massKg: kg(mass),
    owned,
  };
}

function withoutSlots(
  code: string,
  name: string,
  form: 'basket' | 'spacer' | 'wedge',
  [across, along, mass, owned]: readonly [number, number, number, number],
): HolderKindFields {
  return {
    code,
    name,
    form,
    slots: null,
    pitchMm: form === 'spacer' ? mm(25) : null,
    greatestHeightMm: null,
    greatestLengthMm: null,
    greatestThicknessMm: null,
    acrossMm: mm(across),
    alongMm: mm(along),
    massKg: kg(mass),
    owned,
  };
}

export const demonstrationHolderKinds: readonly HolderKindFields[] = [
  rack('RS', 'Small pouch rack', [8, 28, 130, 340, 18], [240, 350, 0.9, 5]),
  rack('RM', 'Medium pouch rack', [5, 40, 210, 410, 30], [220, 420, 1.1, 4]),
  rack('RL', 'Large pouch rack, wide pitch', [3, 70, 210, 460, 55], [230, 470, 1.3, 2]),
  withoutSlots('TB', 'Tray basket', 'basket', [480, 250, 0.8, 6]),
  withoutSlots('SP', 'Tray spacer', 'spacer', [25, 400, 0.1, 12]),
  withoutSlots('TI', 'Tilt wedge, 15 degrees', 'wedge', [300, 100, 0.3, 4]),
];
