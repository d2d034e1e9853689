import {
  demonstrationHolderKinds,
  dynamicPrograms,
  gravityPrograms,
  hospitalCarts,
  largeChamber,
  smallChamber,
  type ProgramSeed,
} from '../../../seeds/demonstration-equipment-plan';
import type { Cart, CycleType, HolderKind, Program, Shelf, Sterilizer } from '../../../src/domain/load/model';
import { celsius, kg, mm, seconds } from '../../../src/domain/units/quantity';
import type { Random } from './random';

/* The demonstration's carts, holders and programs, and invented ones beside them. */

function programOf(type: CycleType, [code, name, temperatureC, exposureMin, dryMin]: ProgramSeed): Program {
  return {
    id: `program ${code}`,
    code,
    name,
    type,
    temperatureC: celsius(temperatureC),
    exposureS: seconds(exposureMin * 60),
    dryS: seconds(dryMin * 60),
    greatestLoadMassKg: null,
  };
}

export const programs: readonly Program[] = [
  ...dynamicPrograms.map((seed) => programOf('dynamic-air-removal', seed)),
  ...gravityPrograms.map((seed) => programOf('gravity', seed)),
];

function rack(
  code: string,
  [slots, pitch, height, length, thickness]: readonly [number, number, number, number, number],
  [across, along, mass]: readonly [number, number, number],
): HolderKind {
  return {
    id: `kind ${code}`,
    code,
    name: `Pouch rack ${code}`,
    form: 'rack',
    slots,
    pitchMm: mm(pitch),
    greatestHeightMm: mm(height),
    greatestLengthMm: mm(length),
    greatestThicknessMm: mm(thickness),
    acrossMm: mm(across),
    alongMm: mm(along),
    massKg: kg(mass),
  };
}

function basket(code: string, across: number, along: number): HolderKind {
  return {
    ...rack(code, [0, 0, 0, 0, 0], [across, along, 1]),
    name: `Basket ${code}`,
    form: 'basket',
    slots: null,
    pitchMm: null,
    greatestHeightMm: null,
    greatestLengthMm: null,
    greatestThicknessMm: null,
  };
}

/** The demonstration's six, and longer and narrower ones. */
export const holderKinds: readonly HolderKind[] = [
  ...demonstrationHolderKinds.map(({ owned: _owned, ...kind }): HolderKind => ({ id: `kind ${kind.code}`, ...kind })),
  rack('XS', [20, 29, 140, 340, 18], [600, 352, 1.9]),
  rack('XM', [12, 42, 210, 410, 30], [520, 424, 2.2]),
  rack('XL', [6, 70, 210, 420, 55], [440, 436, 2.1]),
  rack('NS', [4, 30, 130, 340, 18], [132, 352, 0.6]),
  basket('WB', 560, 290),
  basket('NB', 280, 260),
];

export type Room = { readonly sterilizer: Sterilizer; readonly cart: Cart };

function shelfOf(level: number, fields: Omit<Shelf, 'id' | 'level' | 'name' | 'placeCode'>): Shelf {
  const names = ['Lower shelf', 'Second shelf', 'Third shelf', 'Top shelf'];
  return {
    id: `shelf ${level}`,
    level,
    name: names[level - 1] ?? '',
    placeCode: `S-${level}`,

    ...fields,
  };
}

function demonstrationRoom(random: Random, isLarge: boolean): Room {
  const seed = hospitalCarts.find((cart) => cart.sizeClass === (isLarge ? 'large' : 'small'));
  if (!seed) throw new Error('the demonstration has no such cart');
  const chamber = isLarge ? largeChamber : smallChamber;
  return {
    cart: {
      id: 'cart',
      code: seed.code,
      name: seed.name,
      shelves: seed.shelves.map(({ level, name: _name, ...fields }) => shelfOf(level, fields)),
    },
    sterilizer: sterilizerOf(random, {
      width: chamber.widthMm,
      depth: chamber.depthMm,
      height: chamber.heightMm,
      drainX: chamber.drainXMm,
      drainY: chamber.drainYMm,
      mass: isLarge ? 100 : 15,
    }),
  };
}

type Chamber = {
  readonly width: number;
  readonly depth: number;
  readonly height: number;
  readonly drainX: number;
  readonly drainY: number;
  readonly mass: number;
};

function sterilizerOf(random: Random, chamber: Chamber): Sterilizer {
  return {
    id: 'sterilizer',
    code: 'ST-1',
    number: '1',
    name: 'Sterilizer 1',
    chamberWidthMm: mm(chamber.width),
    chamberDepthMm: mm(chamber.depth),
    chamberHeightMm: mm(chamber.height),
    drainXMm: mm(chamber.drainX),
    drainYMm: mm(chamber.drainY),
    greatestLoadMassKg: kg(chamber.mass),
    needsAirRemovalTest: random.chance(0.85),
    serviceState: 'in-service',
  };
}

type Scale = {
  readonly shelves: readonly [least: number, greatest: number];
  readonly widthCm: readonly [least: number, greatest: number];
  readonly depthCm: readonly [least: number, greatest: number];
  readonly clearCm: readonly [least: number, greatest: number];
  readonly shelfKg: readonly number[];
  readonly loadKg: readonly number[];
};

const common: Scale = {
  shelves: [1, 4],
  widthCm: [36, 90],
  depthCm: [55, 150],
  clearCm: [17, 50],
  shelfKg: [25, 40, 60, 80],
  loadKg: [60, 100, 150],
};
const big: Scale = {
  shelves: [3, 4],
  widthCm: [80, 110],
  depthCm: [150, 200],
  clearCm: [24, 36],
  shelfKg: [90],
  loadKg: [300],
};
const huge: Scale = {
  ...big,
  shelves: [4, 4],
  widthCm: [130, 150],
  depthCm: [240, 280],
  shelfKg: [200],
  loadKg: [700],
};

function inventedRoom(random: Random, scale: Scale): Room {
  const width = random.whole(...scale.widthCm) * 10;
  const depth = random.whole(...scale.depthCm) * 10;
  const shelves = Array.from({ length: random.whole(...scale.shelves) }, (_, index) => {
    const isNarrower = index > 0 && random.chance(0.15);
    return shelfOf(index + 1, {
      widthMm: mm(isNarrower ? width - 60 : width),
      depthMm: mm(depth),
      clearHeightMm: mm(random.whole(...scale.clearCm) * 10),
      surface: random.chance(0.7) ? 'wire' : 'solid',
      greatestMassKg: kg(random.pick(scale.shelfKg)),
      // A bent shelf that nothing is put on, as long as it is not the one over the drain.
      isUsable: index === 0 || !random.chance(0.06),
    });
  });
  const room = random.pick([10, 20, 30, 50]) * 2;
  const height = shelves.reduce((sum, shelf) => sum + shelf.clearHeightMm + 30, 60);
  return {
    cart: { id: 'cart', code: 'C-9', name: 'Cart 9', shelves: random.chance(0.2) ? random.shuffled(shelves) : shelves },
    sterilizer: sterilizerOf(random, {
      width: width + room,
      depth: depth + room,
      height,
      drainX: Math.round(width * random.pick([0.35, 0.5, 0.6])),
      drainY: random.whole(20, 200),
      mass: random.pick(scale.loadKg),
    }),
  };
}

/** A sterilizer and a cart that goes into it, roomy enough for so many packages if it is well loaded. */
export function roomFor(random: Random, packages: number): Room {
  if (packages > 250) return inventedRoom(random, huge);
  if (packages > 45) return inventedRoom(random, big);
  if (packages <= 6 && random.chance(0.3)) return demonstrationRoom(random, false);
  return random.chance(0.45) ? demonstrationRoom(random, true) : inventedRoom(random, common);
}
