/*
 * A holder takes the pouch that is in it: not too tall, too long or too thick for it, and inside the basket.
 * Source: the greatest sizes of the holder, as entered by the facility.
 */
import type { Body, HolderBody } from '../layout';
import { misfitsOf, rackKindsFor } from './holder-fit';
import { elsewhere } from './moves';
import { clearanceOf } from './near-pairs';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import { slackMm } from './slack';
import type { OnShelf, Scene } from './scene';
import { equipment } from './sources';
import { figureWords } from './words';

export const holderFits: Rule = {
  id: 'holder-fits',
  about: 'shelf',
  name: 'The holder fits the pouch',
  reason: 'In a holder that is too small a pouch is squeezed, bent or not held at all.',
  source: equipment,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene, { bodies }: OnShelf): readonly Draft[] {
  return bodies.flatMap((body) => {
    if (!body.holder) return [];
    const draft = body.slot === null ? inBasket(body, body.holder) : inSlot(scene, body, body.holder);
    return draft ? [withSubject(scene, body, draft)] : [];
  });
}

type Case = Pick<Draft, 'remedy' | 'figure'> & { readonly says: string };

function withSubject(scene: Scene, body: Body, { says, ...rest }: Case): Draft {
  const known = { one: body.package, item: body.item, body };
  return {
    subjects: [body.packageId],
    title: `${scene.thing(body)} ${says}`,
    places: onPackage(body),
    ...rest,
    fixes: (scene) => elsewhere(scene, known),
  };
}

function inSlot(scene: Scene, body: Body, { kind }: HolderBody): Case | null {
  if (body.item.kind !== 'pouch') {
    return { says: 'stands in a slot meant for pouches', remedy: 'Put it on a shelf.' };
  }
  const [worst] = body.placement.pose === 'on-edge' ? misfitsOf(body.item, kind) : [];
  if (!worst) return null;
  const words = figureWords(worst.figure);
  const gap = clearanceOf(body, scene.policy).limit;
  const [right] = rackKindsFor(body.item, scene.view.holderKinds, gap);
  return {
    says: `is ${words.measured} ${worst.what}, the holder takes ${words.limit}`,
    remedy: right
      ? `Put it into a holder of kind ${right.code}, ${right.name}.`
      : 'No holder of this facility takes it.',
    figure: worst.figure,
  };
}

function inBasket(body: Body, { kind, box }: HolderBody): Case | null {
  const sticksOut = Math.max(
    box.left - body.box.left,
    body.box.right - box.right,
    box.front - body.box.front,
    body.box.back - box.back,
  );
  if (sticksOut > slackMm) {
    const figure = { measured: sticksOut, limit: 0, unit: 'mm', want: 'at-most', limitFrom: 'equipment' } as const;
    return {
      says: `sticks out by ${figureWords(figure).measured}`,
      remedy: 'Lay it wholly inside the basket, or use another holder.',
      figure,
    };
  }
  const [worst] = body.thinAxis === null ? [] : misfitsOf(body.item, kind);
  if (!worst) return null;
  const words = figureWords(worst.figure);
  return {
    says: `is ${words.measured} ${worst.what}, the basket takes ${words.limit}`,
    remedy: 'Use a holder that takes it.',
    figure: worst.figure,
  };
}
