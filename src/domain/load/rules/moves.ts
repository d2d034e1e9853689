import type { Millimetre } from '../../units/quantity';
import { placementWords, placeWords, poseWords } from '../describe-place';
import { applyEdit } from '../apply-edit';
import type { Fix, LoadEdit } from '../finding';
import { layOut, type Body } from '../layout';
import type { CatalogueItem, LoadHolder, LoadPackage, PaperSide, Placement, Pose } from '../model';
import { placeCandidates } from '../place-candidates';
import { otherPaper } from './facing-groups';
import { sceneOf, type Listed, type Scene } from './scene';

/** More tries than this are not worth the wait: whoever needs a better plan moves the thing by hand. */
const mostTries = 8;
const mostTogether = 12;

/** A package that has its catalogue entry. */
export type Known = Pick<Listed, 'one' | 'body'> & { readonly item: CatalogueItem };

export function takeOff(one: LoadPackage): Fix {
  return { label: 'Take it off the load', edits: [{ edit: 'take-off', packageId: one.packageId }] };
}

export function turnPaper(one: LoadPackage, paper: PaperSide): Fix {
  return { label: `Turn it so paper is ${paper}`, edits: [{ edit: 'turn-paper', packageId: one.packageId, paper }] };
}

export function moveHolder(
  label: string,
  holder: LoadHolder,
  to: { readonly xMm: Millimetre; readonly yMm: Millimetre },
): Fix {
  const { holderId, shelfId, turn } = holder;
  return { label, edits: [{ edit: 'place-holder', holderId, shelfId, turn, ...to }] };
}

/** In its place, and where it does not fit there any more in that pose, in another. */
export function* setPose(scene: Scene, known: Known, pose: Pose): Iterable<Fix> {
  const verb = pose === 'flat' ? 'Lay it' : pose === 'on-edge' ? 'Stand it' : 'Set it';
  const label = `${verb} ${poseWords(pose)}`;
  yield { label, edits: [{ edit: 'set-pose', packageId: known.one.packageId, pose }] };
  yield* moves(scene, { ...known, item: { ...known.item, pose } }, (words) => `${label}: ${words}`);
}

/**
 * Wherever a thing of its kind belongs: a pouch into a free slot of a holder that takes it, anything else to a free spot.
 * @param name where the finding is about several things, which of them the move is for.
 */
export function elsewhere(scene: Scene, known: Known, name = 'it'): Iterable<Fix> {
  const verb = known.item.kind === 'pouch' ? `Stand ${name} in` : `Move ${name} to`;
  return moves(scene, known, (words) => `${verb} ${words}`);
}

/** The same for something that has its place already, by its name. */
export function moveNamed(scene: Scene, body: Body): Iterable<Fix> {
  return elsewhere(scene, { one: body.package, item: body.item, body }, scene.nameOf(body.package));
}

/** Several things, one after the other, each to the first place that is left. One alone has more places tried. */
export function* moveAll(scene: Scene, bodies: readonly Body[]): Iterable<Fix> {
  const [first] = bodies;
  if (!first || bodies.length > mostTogether) return;
  if (bodies.length === 1) {
    yield* moveNamed(scene, first);
    return;
  }
  const edits: LoadEdit[] = [];
  let { view } = scene;
  for (const body of bodies) {
    const { package: one, item } = body;
    const [placement] = placesFor(sceneOf(view, scene.policy), { one, item, body });
    if (!placement) return;
    const edit = { edit: 'place', packageId: one.packageId, placement } as const;
    const changed = applyEdit(view, edit);
    if (!changed.ok) return;
    edits.push(edit);
    view = changed.value;
  }
  yield { label: `Give all ${bodies.length} a place of their own`, edits };
}

function* moves(scene: Scene, { one, item, body }: Known, label: (words: string) => string): Iterable<Fix> {
  for (const placement of placesFor(scene, { one, item, body })) {
    const words =
      placement.at === 'slot' ? placementWords(scene.view, placement, item) : placeWords(scene.view, placement, item);
    yield { label: label(words), edits: [{ edit: 'place', packageId: one.packageId, placement }] };
  }
}

function placesFor(scene: Scene, { one, item, body }: Known): readonly Placement[] {
  const { view, policy } = scene;
  const moving = new Set([one.packageId, ...idsOn(scene, one.packageId)]);
  const layout = layOut({ ...view, packages: view.packages.filter((other) => !moving.has(other.packageId)) });
  const placements: Placement[] = [];
  for (const { placement } of placeCandidates({ view, layout, policy, item, within: null })) {
    placements.push(placement);
    // The side asked for by the house rule first; where the neighbours disagree, the other.
    if (placement.paper !== null) placements.push({ ...placement, paper: otherPaper(placement.paper) });
    if (placements.length >= mostTries) break;
  }
  return placements.sort((a, b) => Number(isOnShelfOf(b, body)) - Number(isOnShelfOf(a, body)));
}

/** The less it has to be carried about, the better. */
function isOnShelfOf(placement: Placement, body: Body | undefined): boolean {
  return placement.at === 'shelf' && placement.shelfId === body?.shelf.id;
}

function idsOn(scene: Scene, packageId: string): readonly string[] {
  return scene.layout.bodies.filter((body) => standsOn(body, packageId)).map((body) => body.packageId);
}

function standsOn(body: Body, packageId: string): boolean {
  for (let lower = body.below; lower; lower = lower.below) if (lower.packageId === packageId) return true;
  return false;
}
