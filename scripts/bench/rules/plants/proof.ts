import type { LoadPackage, LoadView, ServiceState } from '../../../../src/domain/load/model';
import type { LoadPolicy } from '../../../../src/domain/load/policy';
import { mm } from '../../../../src/domain/units/quantity';
import { changePackage, clearArea, deck, freeSpot, moved, pickPlaced, without } from '../change';
import { onLoad, onPackage, type Fault, type Host, type Planted } from '../fault';
import { sizeOf, type Placed, type Rect } from '../geometry';
import type { Random } from '../random';

/* What proves a load: challenge device, indicators, the day's air-removal test, a sterilizer and a program to be trusted. */

function isDevice(each: Placed): boolean {
  return each.item.kind === 'challenge-device';
}

function noDevice(rule: LoadPolicy['challengeDevice']) {
  return (host: Host): Planted | null => {
    if (rule === 'implant-loads' && !host.placed.some((each) => each.item.isImplant)) return null;
    const devices = host.placed.filter(isDevice).map((each) => each.one.packageId);
    return {
      view: without(host.view, devices),
      policy: { ...host.policy, challengeDevice: rule },
      at: [onLoad],
    };
  };
}

function distanceFromDrain(view: LoadView, rect: Rect): number {
  const { drainXMm, drainYMm } = view.sterilizer;
  return Math.hypot(
    Math.max(rect.left - drainXMm, 0, drainXMm - rect.right),
    Math.max(rect.front - drainYMm, 0, drainYMm - rect.back),
  );
}

function deviceElsewhere(isWrong: (host: Host, rect: Rect, level: number) => boolean) {
  return (host: Host, random: Random): Planted | null => {
    if (host.policy.challengeDevice === 'not-asked') return null;
    const device = pickPlaced(host, random, isDevice);
    if (
      !device ||
      (host.policy.challengeDevice === 'implant-loads' && !host.placed.some((each) => each.item.isImplant))
    ) {
      return null;
    }
    const spot = freeSpot(host, random, {
      ...sizeOf(device.item, 'flat', 0),
      clearanceMm: 25,
      isGood: (rect, shelf) => isWrong(host, rect, shelf.level),
    });
    if (!spot) return null;
    const placement = deck(spot.shelf.id, spot.x, spot.y, 0, 'flat');
    return { view: moved(host.view, device.one.packageId, placement), at: [onPackage(device.one.packageId)] };
  };
}

/** As far from the drain as the lowest shelf allows, whatever else stands there. */
function deviceAtFarEnd(host: Host, random: Random): Planted | null {
  const device = pickPlaced(host, random, isDevice);
  const lowest = host.view.cart.shelves.find((shelf) => shelf.level === 1);
  if (!device || !lowest) return null;
  const size = sizeOf(device.item, 'flat', 0);
  const area = clearArea(host.view, host.policy, lowest);
  const [x, y] = [area.left, Math.floor(area.back - size.dy)];
  const distance = distanceFromDrain(host.view, { left: x, right: x + size.dx, front: y, back: y + size.dy });
  if (distance < 100) return null;
  return {
    view: moved(host.view, device.one.packageId, deck(lowest.id, x, y, 0, 'flat')),
    policy: { ...host.policy, challengeDevice: 'every-load', challengeDeviceReachMm: mm(Math.floor(distance) - 5) },
    at: [onPackage(device.one.packageId)],
  };
}

type Indicators = Partial<Pick<LoadPackage, 'hasExternalIndicator' | 'hasInternalIndicator'>>;

function lacking(indicators: Indicators, fits: (each: Placed) => boolean) {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, (each) => !isDevice(each) && fits(each));
    if (!placed) return null;
    const { packageId } = placed.one;
    return { view: changePackage(host.view, packageId, indicators), at: [onPackage(packageId)] };
  };
}

/** Through the film of a pouch the indicator inside is seen, and none is asked for outside (CDC 2008, monitoring 2). */
const hasFilm = (each: Placed) => each.item.kind === 'pouch';
const hasNoFilm = (each: Placed) => !hasFilm(each);

function airRemoval(airRemoval: LoadView['airRemoval']) {
  return (host: Host): Planted | null => {
    if (!host.view.sterilizer.needsAirRemovalTest || host.view.program.type !== 'dynamic-air-removal') return null;
    return { view: { ...host.view, airRemoval }, at: [onLoad] };
  };
}

function service(serviceState: ServiceState) {
  return (host: Host): Planted => ({
    view: { ...host.view, sterilizer: { ...host.view.sterilizer, serviceState } },
    at: [onLoad],
  });
}

function notQualified(host: Host): Planted {
  const { view } = host;
  const qualifiedPrograms = view.qualifiedPrograms.filter((program) => program.id !== view.program.id);
  return { view: { ...view, qualifiedPrograms }, at: [onLoad] };
}

export const proofFaults: readonly Fault[] = [
  { name: 'implant-without-device', rule: 'challenge-device-placed', plant: noDevice('implant-loads') },
  { name: 'every-load-without-device', rule: 'challenge-device-placed', plant: noDevice('every-load') },
  {
    name: 'device-on-higher-shelf',
    rule: 'challenge-device-placed',
    plant: deviceElsewhere((_host, _rect, level) => level > 1),
  },
  {
    name: 'device-far-from-drain',
    rule: 'challenge-device-placed',
    plant: deviceElsewhere(
      (host, rect, level) =>
        level === 1 && distanceFromDrain(host.view, rect) > host.policy.challengeDeviceReachMm + 10,
    ),
  },
  { name: 'device-at-far-end', rule: 'challenge-device-placed', plant: deviceAtFarEnd },
  {
    name: 'no-external-indicator',
    rule: 'external-indicator',
    plant: lacking({ hasExternalIndicator: false }, hasNoFilm),
  },
  {
    name: 'pouch-without-any-indicator',
    rule: 'external-indicator',
    plant: lacking({ hasExternalIndicator: false, hasInternalIndicator: false }, hasFilm),
  },
  {
    name: 'no-internal-indicator',
    rule: 'internal-indicator',
    plant: lacking({ hasInternalIndicator: false }, () => true),
  },
  { name: 'air-removal-not-tested', rule: 'air-removal-test', plant: airRemoval(null) },
  {
    name: 'air-removal-failed',
    rule: 'air-removal-test',
    plant: airRemoval({ result: 'failed', testedAt: '2026-03-10T12:10:00Z' }),
  },
  {
    name: 'air-removal-of-another-day',
    rule: 'air-removal-test',
    plant: airRemoval({ result: 'passed', testedAt: '2026-03-07T12:10:00Z' }),
  },
  { name: 'sterilizer-out-of-service', rule: 'sterilizer-in-service', plant: service('out-of-service') },
  { name: 'sterilizer-to-be-requalified', rule: 'sterilizer-in-service', plant: service('awaiting-requalification') },
  { name: 'program-not-qualified', rule: 'program-qualified', plant: notQualified },
];
