import { holderWords, packageWords, placementWords } from './describe-place';
import type { LoadEdit } from './finding';
import { findHolder, findHolderKind, findItem, findPackage, findShelf } from './look-up';
import type { LoadView } from './model';

type Tense = 'to-do' | 'done';

/**
 * One change of a load in words, as an act to do ("Take Suction tip off") or as one done ("Took Suction tip off").
 * @param view the load in which the things named can still be found: before a take-off, after a place-holder.
 */
export function editWords(view: LoadView, edit: LoadEdit, tense: Tense = 'to-do'): string {
  const verb = (toDo: string, done: string) => (tense === 'done' ? done : toDo);
  switch (edit.edit) {
    case 'place': {
      const one = findPackage(view, edit.packageId);
      const place = placementWords(view, edit.placement, one && findItem(view, one.itemId));
      return `${verb('Put', 'Put')} ${packageWords(view, edit.packageId)}: ${place}`;
    }
    case 'turn-paper':
      return `${verb('Turn', 'Turned')} ${packageWords(view, edit.packageId)} so that paper is ${edit.paper}`;
    case 'set-pose': {
      const name = packageWords(view, edit.packageId);
      if (edit.pose === 'on-edge') return `${verb('Stand', 'Stood')} ${name} on edge`;
      if (edit.pose === 'flat') return `${verb('Lay', 'Laid')} ${name} flat`;
      return `${verb('Tilt', 'Tilted')} ${name} to drain`;
    }
    case 'take-off':
      return `${verb('Take', 'Took')} ${packageWords(view, edit.packageId)} off the load`;
    case 'place-holder': {
      const shelf = findShelf(view, edit.shelfId)?.name ?? 'a shelf of another cart';
      return `${verb('Put', 'Put')} ${holderName(view, edit.holderId)}: ${shelf}`;
    }
    case 'take-holder-off':
      return `${verb('Take', 'Took')} ${holderName(view, edit.holderId)} off the cart`;
    case 'change-program': {
      const program = view.qualifiedPrograms.find((one) => one.id === edit.programId);
      return `${verb('Change', 'Changed')} the program to ${program?.name ?? 'another one'}`;
    }
  }
}

/** Several changes in one line: the first, and how many more. */
export function editsWords(view: LoadView, edits: readonly LoadEdit[], tense: Tense = 'to-do'): string {
  const [first] = edits;
  if (!first) return tense === 'done' ? 'Changed nothing' : 'Change nothing';
  const more = edits.length - 1;
  return more === 0 ? editWords(view, first, tense) : `${editWords(view, first, tense)}, and ${more} more`;
}

function holderName(view: LoadView, holderId: string): string {
  const holder = findHolder(view, holderId);
  return holder ? holderWords(holder, findHolderKind(view, holder)) : 'a holder';
}
