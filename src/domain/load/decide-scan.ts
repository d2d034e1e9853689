import { holderWords, placementWords } from './describe-place';
import { findHolder, findHolderKind, findItem, findPackage, findShelf } from './look-up';
import type { CatalogueItem, LoadPackage, LoadView, Placement } from './model';
import type { LoadPolicy } from './policy';
import type { NotReadyReason, ScanLook, ScanReply } from './scan-answer';
import { fitsHolder } from './free-slots';
import type { WithinPlace } from './place-candidates';
import { suggestPlace } from './suggest-place';

/** What is known about the label that was scanned. Another facility's label is not known here. */
export type KnownLabel =
  | { readonly kind: 'not-known' }
  | {
      readonly kind: 'package';
      readonly package: LoadPackage;
      readonly item: CatalogueItem;
      /** The load that has it listed and is not finished with it, this one or another. */
      readonly openLoad: { readonly number: string } | null;
    };

export type ScanQuestion = {
  readonly view: LoadView;
  readonly known: KnownLabel;
  /** Where packages go until another place is scanned; null: be told where. */
  readonly place: WithinPlace | null;
  readonly policy: LoadPolicy;
};

/**
 * The answer to the scan of a package label: one of six, with the sentence for the person who holds the package. Only
 * `taken` changes the load, and `placement` is then where the package goes; for `already-here` it is where it is.
 *
 * What is dangerous comes first: a package that is called back or held is named so even when it is on this load already.
 */
export function decideScan({ view, known, place, policy }: ScanQuestion): ScanReply {
  if (known.kind === 'not-known') {
    return notTaken(
      { answer: 'not-known' },
      'Nobody here knows this label. Keep it off the cart and show it to a lead.',
    );
  }
  const { item } = known;
  const listed = findPackage(view, known.package.packageId);
  const facts = listed ?? known.package;
  if (facts.state === 'recalled') {
    return notTaken(
      { answer: 'called-back' },
      `${item.name} is called back. Do not load it: put it on the hold shelf.`,
    );
  }
  if (facts.heldReason !== null || facts.state === 'quarantined') {
    const why = facts.heldReason === null ? '' : `: ${withoutStop(facts.heldReason)}`;
    return notTaken({ answer: 'held' }, `${item.name} is held${why}. Put it on the hold shelf.`);
  }
  if (listed?.isScanned) return alreadyHere(view, listed, item, policy);
  if (!listed && known.openLoad) {
    return notReady('in-another-load', `${item.name} is on load ${known.openLoad.number}. Put it with that load.`);
  }
  const notYet = whyNotReady(facts, item, view.today, listed !== undefined);
  if (notYet) return notYet;
  return taken({ view, facts, item, isListed: listed !== undefined, place, policy });
}

function alreadyHere(view: LoadView, one: LoadPackage, item: CatalogueItem, policy: LoadPolicy): ScanReply {
  if (one.placement) {
    const sentence = `${item.name} is already on this cart: ${placementWords(view, one.placement, item)}.`;
    return { answer: { answer: 'already-here' }, sentence, placement: one.placement };
  }
  const suggestion = suggestPlace(view, one.packageId, policy);
  const where = suggestion
    ? `There is room: ${placementWords(view, suggestion.placement, item)}.`
    : 'Give it a place on the map.';
  return notTaken({ answer: 'already-here' }, `${item.name} is already scanned and has no place yet. ${where}`);
}

/** Why a package cannot go into a load now, in words that say where it goes instead; null when it can. */
function whyNotReady(one: LoadPackage, item: CatalogueItem, today: string, isListed: boolean): ScanReply | null {
  switch (one.state) {
    case 'processed':
    case 'sterile':
    case 'stored':
    case 'on-case-cart':
      return notReady(
        'already-processed',
        `${item.name} has been through a cycle already. Put it back with the processed goods.`,
      );
    case 'used':
      return notReady('used', `${item.name} has been used. Send it to be washed.`);
    case 'returned':
      return notReady('not-packed', `${item.name} came back and is not packed again. Send it to be washed and packed.`);
    case 'discarded':
      return notReady('discarded', `${item.name} was discarded. Keep it off the cart and show it to a lead.`);
    case 'in-load':
      if (isListed) break;
      return notReady(
        'in-another-load',
        `${item.name} is on another load. Keep it off this cart and show it to a lead.`,
      );
    case 'packed':
    case 'staged':
    case 'quarantined':
    case 'recalled':
      break;
  }
  // The day it expires on is its last good one; days compare as text because they are written YYYY-MM-DD.
  if (one.expiresOn !== null && one.expiresOn < today) {
    return notReady('expired', `${item.name} expired on ${dayWords(one.expiresOn)}. Send it to be packed again.`);
  }
  return null;
}

type Taking = {
  readonly view: LoadView;
  readonly facts: LoadPackage;
  readonly item: CatalogueItem;
  readonly isListed: boolean;
  readonly place: WithinPlace | null;
  readonly policy: LoadPolicy;
};

function taken({ view, facts, item, isListed, place, policy }: Taking): ScanReply {
  const withIt = withScanned(view, facts, item);
  const here = isOnCart(view, place) ? place : null;
  const suggestion = suggestPlace(withIt, facts.packageId, policy, here);
  const news = isListed ? '' : ' It was not on the list and is now.';
  if (suggestion) {
    const { placement } = suggestion;
    return {
      answer: { answer: 'taken', look: isListed ? null : 'not-on-the-list' },
      sentence: `${item.name}: ${placementWords(withIt, placement, item)}.${news}`,
      placement,
    };
  }
  const { look, sentence } = whyNoPlace(withIt, facts.packageId, item, here, policy);
  return { answer: { answer: 'taken', look }, sentence: `${sentence}${news}`, placement: null };
}

function whyNoPlace(
  view: LoadView,
  packageId: string,
  item: CatalogueItem,
  place: WithinPlace | null,
  policy: LoadPolicy,
): { readonly look: ScanLook; readonly sentence: string } {
  if (place === null) {
    const what = item.kind === 'pouch' ? 'no free slot that fits' : 'no free place';
    return { look: 'no-place-found', sentence: `${item.name}: ${what} on this cart. Leave it on the table.` };
  }
  const elsewhere = suggestPlace(view, packageId, policy);
  const where = elsewhere
    ? `There is room: ${placementWords(view, elsewhere.placement, item)}.`
    : 'Leave it on the table.';
  if (place.kind === 'shelf') {
    const shelf = findShelf(view, place.shelfId)?.name ?? 'this shelf';
    return { look: 'no-place-found', sentence: `No free place for ${item.name} on ${inSentence(shelf)}. ${where}` };
  }
  const holder = findHolder(view, place.holderId);
  const kind = holder && findHolderKind(view, holder);
  const name = holder ? holderWords(holder, kind) : 'This holder';
  if (!kind || !fitsHolder(item, kind)) {
    return { look: 'no-place-found', sentence: `${item.name} does not fit ${name}. ${where}` };
  }
  return { look: 'no-slot-left', sentence: `${name} has no slot left for ${item.name}. ${where}` };
}

/** The load with the package scanned into it and without a place, its catalogue entry among the items. */
export function withScanned(
  view: LoadView,
  facts: LoadPackage,
  item: CatalogueItem,
  placement: Placement | null = null,
): LoadView {
  const one: LoadPackage = { ...facts, isScanned: true, state: 'in-load', placement };
  const isListed = findPackage(view, one.packageId) !== undefined;
  return {
    ...view,
    items: findItem(view, item.id) ? view.items : [...view.items, item],
    packages: isListed
      ? view.packages.map((each) => (each.packageId === one.packageId ? one : each))
      : [...view.packages, one],
  };
}

function isOnCart(view: LoadView, place: WithinPlace | null): boolean {
  if (place === null) return false;
  return (place.kind === 'shelf' ? findShelf(view, place.shelfId) : findHolder(view, place.holderId)) !== undefined;
}

function notTaken(answer: Exclude<ScanReply['answer'], { answer: 'taken' }>, sentence: string): ScanReply {
  return { answer, sentence, placement: null };
}

function notReady(because: NotReadyReason, sentence: string): ScanReply {
  return notTaken({ answer: 'not-ready', because }, sentence);
}

const months = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
] as const;

function dayWords(day: string): string {
  const [year = '', month = '', date = ''] = day.split('-');
  return `${Number(date)} ${months[Number(month) - 1] ?? month} ${year}`;
}

function withoutStop(text: string): string {
  return text.trim().replace(/\.$/, '');
}

/** "Lower shelf" within a sentence; a name such as "A shelf" or "C3" keeps its capital. */
function inSentence(name: string): string {
  return /^[A-Z][a-z]/.test(name) ? name.charAt(0).toLowerCase() + name.slice(1) : name;
}
