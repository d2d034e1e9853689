import type { CatalogueItem, HolderKind, Program, Shelf } from '../../../../src/domain/load/model';
import { celsius, kg, mm, seconds, type Kilogram, type Millimetre } from '../../../../src/domain/units/quantity';
import { changeHolderKind, changeItemOf, changePackage, changeShelf, pickPlaced } from '../change';
import { onHolder, onLoad, onPackage, onShelf, type Fault, type Host, type Planted } from '../fault';
import type { Random } from '../random';

/* Figures that cannot be: no number, nothing, less than nothing, a hundred metres. */

const absurdLengths = [NaN, 0, -10, 100_000, Infinity];
const absurdMasses = [NaN, -1, 100_000, Infinity];
const noNumbers = [NaN, Infinity, -Infinity];

function itemWith(changesFor: (random: Random) => Partial<CatalogueItem>, kinds?: readonly CatalogueItem['kind'][]) {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, (each) => kinds?.includes(each.item.kind) ?? true);
    if (!placed) return null;
    const view = changeItemOf(host.view, placed, changesFor(random));
    return { view, at: [onPackage(placed.one.packageId)] };
  };
}

function length(measure: 'lengthMm' | 'widthMm' | 'heightMm', random: Random): Partial<CatalogueItem> {
  return { [measure]: mm(random.pick(absurdLengths)) };
}

function position(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(host, random, (each) => each.one.placement?.at === 'shelf');
  if (placed?.one.placement?.at !== 'shelf') return null;
  const away = { [random.pick(['xMm', 'yMm'])]: mm(random.pick([...noNumbers, 1e9])) };
  const placement = { ...placed.one.placement, ...away };
  return { view: changePackage(host.view, placed.one.packageId, { placement }), at: [onPackage(placed.one.packageId)] };
}

function holderKindWith(changesFor: (random: Random) => Partial<HolderKind>, form: HolderKind['form'] | null) {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, (each) => each.holder !== null);
    const holder = placed?.holder;
    const kind = host.view.holderKinds.find((each) => each.id === holder?.kindId);
    if (!placed || !holder || !kind || (form !== null && kind.form !== form)) return null;
    const view = changeHolderKind(host.view, kind.id, changesFor(random));
    return { view, at: [onHolder(holder.holderId), onPackage(placed.one.packageId)] };
  };
}

function holderPosition(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(host, random, (each) => each.holder !== null);
  if (!placed?.holder) return null;
  const { holderId } = placed.holder;
  const away = { [random.pick(['xMm', 'yMm'])]: mm(random.pick([...noNumbers, 1e9])) };
  const holders = host.view.holders.map((each) => (each.holderId === holderId ? { ...each, ...away } : each));
  return { view: { ...host.view, holders }, at: [onHolder(holderId), onPackage(placed.one.packageId)] };
}

function shelfWith(changesFor: (random: Random) => Partial<Shelf>) {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, () => true);
    if (!placed) return null;
    return { view: changeShelf(host.view, placed.shelfId, changesFor(random)), at: [onShelf(placed.shelfId)] };
  };
}

const absurdLength = (random: Random): Millimetre => mm(random.pick(absurdLengths));
const absurdMass = (random: Random): Kilogram => kg(random.pick(absurdMasses));

function chamber(host: Host, random: Random): Planted {
  const measure = random.pick(['chamberWidthMm', 'chamberDepthMm']);
  const sterilizer = { ...host.view.sterilizer, [measure]: absurdLength(random) };
  return { view: { ...host.view, sterilizer }, at: [onLoad] };
}

function drain(host: Host, random: Random): Planted | null {
  const device = host.placed.find((each) => each.item.kind === 'challenge-device');
  if (!device) return null;
  const sterilizer = { ...host.view.sterilizer, drainXMm: mm(random.pick(noNumbers)) };
  return {
    view: { ...host.view, sterilizer },
    policy: { ...host.policy, challengeDevice: 'every-load' },
    at: [onLoad, onPackage(device.one.packageId)],
  };
}

function loadLimit(host: Host, random: Random): Planted {
  const sterilizer = { ...host.view.sterilizer, greatestLoadMassKg: kg(random.pick([NaN, -1])) };
  return { view: { ...host.view, sterilizer }, at: [onLoad] };
}

function program(changes: Partial<Program>) {
  return (host: Host): Planted => ({
    view: { ...host.view, program: { ...host.view.program, ...changes } },
    at: [onLoad, ...host.view.packages.map((one) => onPackage(one.packageId))],
  });
}

const rule = 'size-makes-no-sense';

export const sizeFaults: readonly Fault[] = [
  { name: 'absurd-length', rule, plant: itemWith((random) => length('lengthMm', random)) },
  { name: 'absurd-width', rule, plant: itemWith((random) => length('widthMm', random)) },
  { name: 'absurd-height', rule, plant: itemWith((random) => length('heightMm', random)) },
  { name: 'absurd-mass', rule, plant: itemWith((random) => ({ massKg: absurdMass(random) })) },
  { name: 'absurd-metal-mass', rule, plant: itemWith((random) => ({ metalMassKg: absurdMass(random) })) },
  {
    name: 'absurd-clearance',
    rule,
    orRules: ['package-clearance', 'gap'],
    plant: itemWith((random) => ({ clearanceMm: mm(random.pick([NaN, -5, Infinity])) })),
  },
  { name: 'absurd-mass-limit', rule, plant: itemWith((random) => ({ massLimitKg: kg(random.pick([NaN, -5])) })) },
  {
    name: 'absurd-filter',
    rule,
    plant: itemWith(
      (random) => ({
        filterZones: [{ face: 'lid', xMm: mm(random.pick(noNumbers)), yMm: mm(10), lengthMm: mm(50), widthMm: mm(50) }],
      }),
      ['rigid-container'],
    ),
  },
  { name: 'absurd-place', rule, orRules: ['shelf-edge', 'unplaced'], plant: position },
  {
    name: 'absurd-pitch',
    rule,
    orRules: ['slot-unknown', 'holder-usable'],
    plant: holderKindWith((random) => ({ pitchMm: absurdLength(random) }), 'rack'),
  },
  {
    name: 'rack-with-no-slots',
    rule,
    orRules: ['slot-unknown', 'holder-usable'],
    plant: holderKindWith((random) => ({ slots: random.pick([null, 0, -1, NaN]) }), 'rack'),
  },
  {
    name: 'absurd-frame',
    rule,
    orRules: ['holder-usable'],
    plant: holderKindWith((random) => ({ acrossMm: absurdLength(random) }), null),
  },
  {
    name: 'absurd-holder-mass',
    rule,
    orRules: ['holder-usable'],
    plant: holderKindWith((random) => ({ massKg: absurdMass(random) }), null),
  },
  { name: 'absurd-holder-place', rule, orRules: ['shelf-edge', 'holder-usable'], plant: holderPosition },
  { name: 'absurd-shelf-width', rule, plant: shelfWith((random) => ({ widthMm: absurdLength(random) })) },
  { name: 'absurd-shelf-depth', rule, plant: shelfWith((random) => ({ depthMm: absurdLength(random) })) },
  { name: 'absurd-clear-height', rule, plant: shelfWith((random) => ({ clearHeightMm: absurdLength(random) })) },
  { name: 'absurd-shelf-limit', rule, plant: shelfWith((random) => ({ greatestMassKg: kg(random.pick([NaN, -1])) })) },
  { name: 'absurd-chamber', rule, plant: chamber },
  { name: 'absurd-drain', rule, orRules: ['challenge-device-placed'], plant: drain },
  { name: 'absurd-load-limit', rule, orRules: ['load-mass'], plant: loadLimit },
  { name: 'absurd-temperature', rule, orRules: ['cycle-conflict'], plant: program({ temperatureC: celsius(NaN) }) },
  { name: 'absurd-exposure', rule, orRules: ['cycle-conflict'], plant: program({ exposureS: seconds(NaN) }) },
  { name: 'absurd-drying', rule, orRules: ['cycle-conflict'], plant: program({ dryS: seconds(NaN) }) },
  { name: 'absurd-program-limit', rule, orRules: ['load-mass'], plant: program({ greatestLoadMassKg: kg(NaN) }) },
];
