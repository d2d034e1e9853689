/*
 * A challenge device with its biological indicator is in the load when the facility or an implant asks for one, at the coldest
 * place: on the lowest shelf over the drain.
 * Source: CDC guideline (2008), monitoring 7: a biological indicator in every load with implants. The place: secondary sources
 * agree on the bottom front over the drain; the sterilizer's qualification decides.
 */
import { mm } from '../../units/quantity';
import { footprintOf } from '../../geometry/footprint';
import type { Fix } from '../finding';
import type { Body, ShelfLayout } from '../layout';
import type { CatalogueItem } from '../model';
import { limitOf } from '../policy';
import { elsewhere } from './moves';
import { onLoad, onPackage } from './places';
import type { Draft, Rule } from './rule';
import { slackMm } from './slack';
import type { Listed, Scene } from './scene';
import { cdcMonitoring, commonPractice } from './sources';
import { countWords, figureWords, sourceOf } from './words';

export const challengeDevicePlaced: Rule = {
  id: 'challenge-device-placed',
  about: 'load',
  name: 'The challenge device is at the coldest place',
  reason: 'Only an indicator at the place that is hardest to sterilize says something about the whole load.',
  source: cdcMonitoring,
  severity: 'stop',
  parameters: ['challengeDevice', 'challengeDeviceMissing', 'challengeDeviceReachMm'],
  find,
};

type Known = Listed & { readonly item: CatalogueItem };

function find(scene: Scene): readonly Draft[] {
  const implants = scene.listed.filter(({ item }) => item?.isImplant);
  const { challengeDevice, challengeDeviceMissing } = scene.policy;
  if (challengeDevice === 'not-asked') return [];
  if (challengeDevice === 'implant-loads' && implants.length === 0) return [];
  if (scene.listed.length === 0) return [];

  const devices = scene.listed.filter((listed): listed is Known => listed.item?.kind === 'challenge-device');
  const lowest = scene.layout.shelves.find(({ shelf }) => shelf.isUsable);
  const placed = devices.flatMap((device) => (device.body ? [{ device, body: device.body }] : []));
  const [first] = placed;
  if (!first) {
    const holds =
      implants.length > 0
        ? `The load holds ${countWords(implants.length, 'implant', 'implants')}`
        : 'This load is asked for one';
    const [waiting] = devices;
    return [
      {
        subjects: [scene.view.loadId],
        title: `${holds} and no challenge device is placed`,
        remedy: 'Put a challenge device with a biological indicator on the lowest shelf, over the drain.',
        places: waiting ? onPackage(waiting.one) : onLoad,
        severity: challengeDeviceMissing,
        fixes: (scene) => (waiting ? overDrain(scene, waiting, lowest) : []),
      },
    ];
  }

  const limit = limitOf(null, scene.policy, 'challengeDeviceReachMm');
  const ways = placed.map(({ device, body }) => ({
    device,
    body,
    measured: wayToDrain(scene, body),
    isLow: body.shelf === lowest?.shelf,
  }));
  if (ways.some((way) => way.isLow && way.measured <= limit.limit + slackMm)) return [];
  const nearest = ways.filter((way) => way.isLow).sort((a, b) => a.measured - b.measured)[0];
  const { device } = nearest ?? first;
  const figure = nearest && ({ measured: nearest.measured, unit: 'mm', want: 'at-most', ...limit } as const);
  const words = figure && figureWords(figure);
  return [
    {
      subjects: [device.one.packageId],
      title: words
        ? `${scene.nameOf(device.one)} is ${words.measured} from the drain, want at most ${words.limit}`
        : `${scene.nameOf(device.one)} is not on the lowest shelf`,
      remedy: 'Move it to the lowest shelf, over the drain.',
      places: onPackage(device.one),
      ...(figure ? { figure } : {}),
      severity: 'accept',
      source: sourceOf(limit.limitFrom, device.item, commonPractice),
      fixes: (scene) => overDrain(scene, device, lowest),
    },
  ];
}

/** From the drain to the nearest point under the device, in mm. */
function wayToDrain(scene: Scene, { box }: Body): number {
  const { drainXMm, drainYMm } = scene.view.sterilizer;
  const outside = (at: number, from: number, to: number) => Math.max(from - at, at - to, 0);
  return Math.hypot(outside(drainXMm, box.left, box.right), outside(drainYMm, box.front, box.back));
}

function* overDrain(scene: Scene, { one, item, body }: Known, lowest: ShelfLayout | undefined): Iterable<Fix> {
  if (!lowest) return;
  const { drainXMm, drainYMm } = scene.view.sterilizer;
  const { shelf } = lowest;
  const { widthMm, depthMm } = footprintOf(item, item.pose, 0);
  const centred = (drain: number, size: number, whole: number) =>
    mm(Math.max(Math.min(drain - size / 2, whole - size), 0));
  const placement = {
    at: 'shelf',
    shelfId: shelf.id,
    xMm: centred(drainXMm, widthMm, shelf.widthMm),
    yMm: centred(drainYMm, depthMm, shelf.depthMm),
    turn: 0,
    pose: item.pose,
    paper: null,
  } as const;
  const label = `Put it on ${shelf.name}, over the drain`;
  yield { label, edits: [{ edit: 'place', packageId: one.packageId, placement }] };
  yield* elsewhere(scene, { one, item, body });
}
