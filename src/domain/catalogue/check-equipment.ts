import type { FieldProblem } from './csv-column';
import type { CartFields, HolderKindFields, ShelfLine, SterilizerFields } from './equipment-fields';

/** What does not hold together in one sterilizer by itself. */
export function checkSterilizer(sterilizer: SterilizerFields): FieldProblem[] {
  const problems: FieldProblem[] = [];
  const both = sterilizer.qualifiedPrograms.filter((code) => sterilizer.otherPrograms.includes(code));
  if (both.length > 0) {
    problems.push({
      field: 'otherPrograms',
      sentence: `${both.join(', ')} cannot be both qualified and not qualified.`,
    });
  }
  if (Math.abs(sterilizer.drainXMm) > sterilizer.chamberWidthMm) {
    problems.push({ field: 'drainXMm', sentence: 'The drain lies outside of the chamber.' });
  }
  if (Math.abs(sterilizer.drainYMm) > sterilizer.chamberDepthMm) {
    problems.push({ field: 'drainYMm', sentence: 'The drain lies outside of the chamber.' });
  }
  return problems;
}

/** Programs a sterilizer names that are not there. */
export function checkSterilizerReferences(
  sterilizer: SterilizerFields,
  programCodes: ReadonlySet<string>,
): FieldProblem[] {
  return (['qualifiedPrograms', 'otherPrograms'] as const).flatMap((field) => {
    const unknown = sterilizer[field].filter((code) => !programCodes.has(code));
    return unknown.length === 0
      ? []
      : [{ field, sentence: `There is no program with the code ${unknown.join(', ')}.` }];
  });
}

/** What does not hold together in one cart. */
export function checkCart(cart: CartFields): FieldProblem[] {
  const levels = cart.shelves.map((shelf) => shelf.level);
  const doubled = levels.find((level, at) => levels.indexOf(level) !== at);
  if (doubled === undefined) return [];
  return [{ field: 'shelves', sentence: `There are two shelves on level ${doubled}.` }];
}

/** Values that belong to the cart and so must be the same on each of its lines. */
const cartOwn = ['cartName', 'sizeClass', 'isCartUsable', 'cartNote'] as const satisfies (keyof ShelfLine)[];

/** What a cart's line says of the cart otherwise than the first line of the same cart. */
export function checkShelfAgainstFirst(line: ShelfLine, first: ShelfLine): FieldProblem[] {
  return cartOwn
    .filter((field) => line[field] !== first[field])
    .map((field) => ({ field, sentence: `Another line of cart ${line.cartCode} says something else here.` }));
}

const rackOwn = {
  slots: 'how many slots it has',
  pitchMm: 'how far it is from slot to slot',
  greatestHeightMm: 'how high a pouch may be',
  greatestLengthMm: 'how long a pouch may be',
  greatestThicknessMm: 'how thick a pouch may be',
} as const;

/** What does not hold together in one kind of holder. */
export function checkHolderKind(kind: HolderKindFields): FieldProblem[] {
  if (kind.form !== 'rack') {
    return kind.slots === null ? [] : [{ field: 'slots', sentence: 'Only a rack has slots.' }];
  }
  const missing = (Object.keys(rackOwn) as (keyof typeof rackOwn)[])
    .filter((field) => kind[field] === null)
    .map((field) => ({ field, sentence: `Of a rack, say ${rackOwn[field]}.` }));
  if (missing.length > 0) return missing;
  const problems: FieldProblem[] = [];
  const { slots, pitchMm, greatestThicknessMm } = kind;
  if (slots !== null && pitchMm !== null && (slots - 1) * pitchMm > kind.acrossMm) {
    problems.push({
      field: 'acrossMm',
      sentence: `${slots} slots of ${pitchMm} mm are wider than the rack itself.`,
    });
  }
  if (greatestThicknessMm !== null && pitchMm !== null && greatestThicknessMm > pitchMm) {
    problems.push({
      field: 'greatestThicknessMm',
      sentence: 'A pouch thicker than the pitch reaches into the next slot.',
    });
  }
  return problems;
}

type Placed = { readonly placeCode: string | null };

/** A place code is given by us and printed on the thing: nobody types a new one, or another for what has one. */
export function checkPlaceCode(stated: Placed, kept: Placed | undefined): FieldProblem[] {
  if (stated.placeCode === (kept?.placeCode ?? null)) return [];
  const sentence =
    kept === undefined
      ? 'Place codes are given by Paperside. Leave this empty for what is new.'
      : `Its place code is ${kept.placeCode ?? ''}, and stays that.`;
  return [{ field: 'placeCode', sentence }];
}
