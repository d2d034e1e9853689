import type { CatalogueItem, CycleNeed, Program } from '../../../../src/domain/load/model';
import { celsius, seconds } from '../../../../src/domain/units/quantity';
import { changeItemOf, pickPlaced } from '../change';
import { onLoad, onPackage, type Fault, type Host, type Planted } from '../fault';
import type { Random } from '../random';

/* One package among others that does not go with the load's program or whose packaging or papers do not allow it. */

function answered(program: Program): CycleNeed {
  return {
    type: program.type,
    temperatureC: program.temperatureC,
    leastExposureS: program.exposureS,
    greatestExposureS: program.exposureS,
    leastDryS: program.dryS,
  };
}

/** Everything else of the load goes with the program, so it is this package that the finding has to name. */
function needs(needsFor: (program: Program, random: Random) => readonly CycleNeed[]) {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, (each) => each.item.kind !== 'challenge-device');
    if (!placed || host.view.packages.length < 3) return null;
    return {
      view: changeItemOf(host.view, placed, { cycleNeeds: needsFor(host.view.program, random) }),
      at: [onPackage(placed.one.packageId)],
    };
  };
}

/** Two packages of a larger load with another need: both have to be named as those to be taken out. */
function twoDiffer(host: Host, random: Random): Planted | null {
  const [one, other] = random.shuffled(host.placed.filter((each) => each.item.kind !== 'challenge-device'));
  if (!one || !other || host.view.packages.length < 6) return null;
  const { program } = host.view;
  const cycleNeeds = [{ ...answered(program), temperatureC: celsius(program.temperatureC + 2) }];
  return {
    view: changeItemOf(changeItemOf(host.view, one, { cycleNeeds }), other, { cycleNeeds }),
    at: [onPackage(one.one.packageId), onPackage(other.one.packageId)],
    everyOne: true,
  };
}

function differing(change: (need: CycleNeed, random: Random) => Partial<CycleNeed>) {
  return needs((program, random) => {
    const need = answered(program);
    return [{ ...need, ...change(need, random) }];
  });
}

/** A program that none of the packages goes with. */
function nobodysProgram({ view }: Host): Planted {
  const program: Program = { ...view.program, id: 'planted program', code: 'X', temperatureC: celsius(127) };
  return {
    view: { ...view, program, qualifiedPrograms: [...view.qualifiedPrograms, program] },
    at: [onLoad, ...view.packages.map((one) => onPackage(one.packageId))],
  };
}

function changed(changes: Partial<CatalogueItem>, kinds: readonly CatalogueItem['kind'][]) {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, (each) => kinds.includes(each.item.kind));
    if (!placed) return null;
    return { view: changeItemOf(host.view, placed, changes), at: [onPackage(placed.one.packageId)] };
  };
}

const goods = ['pouch', 'wrapped-tray', 'rigid-container', 'basin', 'textile-pack'] as const;

export const cycleFaults: readonly Fault[] = [
  {
    name: 'other-cycle-type',
    rule: 'cycle-conflict',
    plant: differing(({ type }) => ({ type: type === 'gravity' ? 'dynamic-air-removal' : 'gravity' })),
  },
  {
    name: 'immediate-use-only',
    rule: 'cycle-conflict',
    plant: differing(() => ({ type: 'immediate-use' })),
  },
  { name: 'two-need-another-cycle', rule: 'cycle-conflict', plant: twoDiffer },
  {
    name: 'hotter-cycle',
    rule: 'cycle-conflict',
    plant: differing(({ temperatureC }, random) => ({ temperatureC: celsius(temperatureC + random.pick([1, 3, 13])) })),
  },
  {
    name: 'cooler-cycle',
    rule: 'cycle-conflict',
    plant: differing(({ temperatureC }, random) => ({ temperatureC: celsius(temperatureC - random.pick([1, 2, 11])) })),
  },
  {
    name: 'exposure-too-short',
    rule: 'cycle-conflict',
    plant: differing(({ leastExposureS }, random) => ({
      leastExposureS: seconds(leastExposureS + random.pick([1, 60, 840])),
      greatestExposureS: null,
    })),
  },
  {
    name: 'exposure-too-long',
    rule: 'cycle-conflict',
    plant: differing(({ leastExposureS }, random) => {
      const greatest = seconds(leastExposureS - random.pick([1, 30, 100]));
      return { leastExposureS: seconds(greatest - 60), greatestExposureS: greatest };
    }),
  },
  {
    name: 'drying-too-short',
    rule: 'cycle-conflict',
    plant: differing(({ leastDryS }, random) => ({ leastDryS: seconds(leastDryS + random.pick([1, 600, 1800])) })),
  },
  {
    name: 'between-two-permitted-exposures',
    rule: 'cycle-conflict',
    plant: needs((program) => {
      const need = answered(program);
      const [shorter, longer] = [seconds(program.exposureS - 30), seconds(program.exposureS + 30)];
      return [
        { ...need, leastExposureS: shorter, greatestExposureS: shorter },
        { ...need, leastExposureS: longer, greatestExposureS: longer },
      ];
    }),
  },
  {
    name: 'right-temperature-wrong-drying',
    rule: 'cycle-conflict',
    plant: needs((program) => {
      const need = answered(program);
      return [
        { ...need, leastDryS: seconds(need.leastDryS + 600) },
        { ...need, temperatureC: celsius(need.temperatureC + 2) },
      ];
    }),
  },
  { name: 'program-for-nobody', rule: 'cycle-conflict', plant: nobodysProgram },
  { name: 'no-cycle-permitted', rule: 'cycle-conflict', orRules: ['ifu-on-file'], plant: needs(() => []) },
  {
    name: 'unpacked',
    rule: 'packaging-suits-steam',
    plant: changed({ packaging: 'none' }, ['wrapped-tray', 'textile-pack', 'pouch', 'rigid-container']),
  },
  { name: 'no-instructions', rule: 'ifu-on-file', plant: changed({ ifuReference: null }, goods) },
  { name: 'blank-instructions', rule: 'ifu-on-file', plant: changed({ ifuReference: ' ' }, goods) },
];
