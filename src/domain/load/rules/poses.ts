import type { Body } from '../layout';
import type { Pose } from '../model';
import { setPose } from './moves';
import { onPackage } from './places';
import type { Draft } from './rule';
import type { Scene } from './scene';

type WrongPose = {
  /** "Minor set" + this: what is wrong. */
  readonly says: (body: Body) => string;
  readonly remedy: string;
  readonly want: Pose;
};

export function wrongPose(
  scene: Scene,
  bodies: readonly Body[],
  isWrong: (body: Body) => boolean,
  { says, remedy, want }: WrongPose,
): readonly Draft[] {
  return bodies.filter(isWrong).map((body) => ({
    subjects: [body.packageId],
    title: `${scene.thing(body)} ${says(body)}`,
    remedy,
    places: onPackage(body),
    fixes: (scene) => setPose(scene, { one: body.package, item: body.item, body }, want),
  }));
}

/** Basins, and trays without holes: water stays in them unless they are tilted or on edge. */
export function hasToDrain(body: Body): boolean {
  const { kind, pose, isPerforated } = body.item;
  return kind === 'basin' || (kind === 'wrapped-tray' && (pose === 'tilted' || !isPerforated));
}
