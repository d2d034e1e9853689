import type { ScanPlace, ScanRequest, ScanResponse } from '#contract/loads';
import { readScan, type Scan } from '#domain/label/read-scan';
import { decideScan, type KnownLabel } from '#domain/load/decide-scan';
import type { CatalogueItem, LoadHolder, LoadPackage, LoadView } from '#domain/load/model';
import { suggestHolderSpot } from '#domain/load/suggest-place';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import type { Transaction } from '../../platform/db';
import { once } from '../../platform/once';
import { shownScan } from '../../platform/shown-scan';
import { holderByPlaceCode, shelfByPlaceCode } from '../equipment/read-model';
import { catalogueItems, findItemByDeviceIdentifier } from '../items/read-model';
import { findPackageByCode, lockPackageByCode } from '../packages/read-model';
import { recordAct, requireAct, type ActContext } from './load-change';
import { lockLoad } from './load-store';
import { readLoadView, type LoadAsKnown } from './load-view-read-model';
import { whyHolderIsNotFree } from './require-holder-free';

type Answer = Omit<ScanResponse, 'at' | 'code'>;

const nothing: Pick<Answer, 'look' | 'package' | 'place' | 'placement' | 'change'> = {
  look: null,
  package: null,
  place: null,
  placement: null,
  change: null,
};

/** A badge is half of a key: it is named, and never kept or shown. */
function shownOf(scan: Scan, raw: string): string {
  if (scan.kind === 'badge') return 'a badge';
  return 'code' in scan ? scan.code : shownScan(raw);
}

/** Takes one scan at an open load: a place, or a package. Only the answer `taken` changes the load. */
export async function scanIntoLoad(
  services: Services,
  actor: Actor,
  loadId: string,
  request: ScanRequest,
): Promise<ScanResponse> {
  const { db, clock } = services;
  return once(
    { db, clock, actor },
    { requestId: request.requestId, act: 'load.scan', body: { loadId, ...request } },
    async (trx) => {
      const at = clock.now();
      const load = await lockLoad(trx, actor.facilityId, loadId);
      requireAct(load, 'build');
      const known = await readLoadView(trx, load, at);
      const act: ActContext = { actor, at, requestId: request.requestId, entry: request.entry };
      const scan = readScan(request.raw);
      const answer = await answerScan(trx, known, scan, request.place, act);
      if (answer.change === null && answer.answer !== 'place-set') {
        await appendEvent(trx, {
          kind: 'load.scan-refused',
          at,
          facilityId: load.facility_id,
          actorId: actor.personId,
          subjectKind: 'load',
          subjectId: load.id,
          loadId: load.id,
          requestId: request.requestId,
          payload: { answer: answer.answer, read: shownOf(scan, request.raw), entry: request.entry },
        });
      }
      return { ...answer, at: at.toISOString(), code: shownOf(scan, request.raw) };
    },
  );
}

async function answerScan(
  trx: Transaction,
  known: LoadAsKnown,
  scan: Scan,
  place: ScanPlace | null,
  act: ActContext,
): Promise<Answer> {
  switch (scan.kind) {
    case 'package':
      return (await isOfAnotherItem(trx, known, scan))
        ? refused('The two codes in this symbol do not belong together. Keep it off the cart and show it to a lead.')
        : scanPackage(trx, known, scan.code, place, act);
    case 'place':
      return scan.place === 'shelf' ? scanShelf(trx, known, scan.code) : scanHolder(trx, known, scan.code, place, act);
    case 'badge':
      return refused('That is a badge. Open “Change person” to use it.');
    case 'load-sticker':
      return refused(`That is a load sticker of load ${scan.loadNumber}. Scan the package’s own label.`);
    case 'device':
      return refused('That is the maker’s code. Scan the package’s own label.');
    case 'unreadable':
      return refused(scan.sentence);
  }
}

function refused(sentence: string): Answer {
  return { ...nothing, answer: 'not-known', sentence };
}

/** A symbol may hold the item's GTIN beside the package's code: then both have to mean the same item. */
async function isOfAnotherItem(
  trx: Transaction,
  known: LoadAsKnown,
  scan: Extract<Scan, { kind: 'package' }>,
): Promise<boolean> {
  if (scan.gtin === null) return false;
  const item = await findItemByDeviceIdentifier(trx, known.load.facility_id, scan.gtin);
  if (!item) return false;
  const facts = await findPackageByCode(trx, scan.code);
  return facts !== undefined && facts.itemId !== item.id;
}

async function scanPackage(
  trx: Transaction,
  known: LoadAsKnown,
  code: string,
  place: ScanPlace | null,
  act: ActContext,
): Promise<Answer> {
  const { label, item } = await lockLabel(trx, known, code);
  const view =
    item && !known.view.items.some((entry) => entry.id === item.id) ? withItem(known.view, item) : known.view;
  const reply = decideScan({ view, known: label, place, policy: known.policy });
  const about =
    label.kind === 'package'
      ? { package: { id: label.package.packageId, code: label.package.code, itemName: label.item.name } }
      : {};
  if (reply.answer.answer !== 'taken' || label.kind !== 'package') {
    return { ...nothing, ...about, answer: reply.answer.answer, sentence: reply.sentence, placement: reply.placement };
  }
  const taken: LoadPackage = { ...label.package, isScanned: true, state: 'in-load', placement: reply.placement };
  const after: LoadView = {
    ...view,
    packages: [...view.packages.filter((entry) => entry.packageId !== taken.packageId), taken],
  };
  const change = await recordAct(trx, known, after, act, (difference) => ({
    kind: 'load.package-scanned',
    payload: { packageCode: taken.code, entry: act.entry ?? 'keyed', difference },
  }));
  return {
    ...nothing,
    ...about,
    answer: 'taken',
    look: reply.answer.look,
    sentence: reply.sentence,
    placement: reply.placement,
    change,
  };
}

function withItem(view: LoadView, item: CatalogueItem): LoadView {
  return { ...view, items: [...view.items, item] };
}

/** Finds the package and holds it until the end: another load that scans it at the same moment waits and is then told. */
async function lockLabel(
  trx: Transaction,
  known: LoadAsKnown,
  code: string,
): Promise<{ readonly label: KnownLabel; readonly item: CatalogueItem | null }> {
  const facilityId = known.load.facility_id;
  const none = { label: { kind: 'not-known' }, item: null } as const;
  // Another facility's label is not known here: not even that it exists.
  if (!(await lockPackageByCode(trx, facilityId, code))) return none;
  // Read only now: whoever held it before may have moved it.
  const facts = await findPackageByCode(trx, code);
  if (!facts) return none;
  const item =
    known.view.items.find((entry) => entry.id === facts.itemId) ??
    (await catalogueItems(trx, facilityId, [facts.itemId]))[0];
  if (!item) return none;
  const asListed = known.view.packages.find((entry) => entry.packageId === facts.id);
  // Held or called back since the list was read: what counts is what is true while nobody else can change it.
  const { state, heldReason, expiresOn } = facts;
  const listed = asListed && { ...asListed, state, heldReason, expiresOn };
  return {
    item,
    label: {
      kind: 'package',
      item,
      openLoad: facts.openLoad,
      package: listed ?? {
        packageId: facts.id,
        code: facts.code,
        itemId: facts.itemId,
        isScanned: false,
        placement: null,
        state: facts.state,
        heldReason: facts.heldReason,
        expiresOn: facts.expiresOn,
        hasExternalIndicator: facts.hasExternalIndicator,
        hasInternalIndicator: facts.hasInternalIndicator,
      },
    },
  };
}

async function scanShelf(trx: Transaction, known: LoadAsKnown, code: string): Promise<Answer> {
  const own = known.view.cart.shelves.find((shelf) => shelf.placeCode === code);
  if (own) {
    return {
      ...nothing,
      answer: 'place-set',
      sentence: `${own.name}. Scan what goes on it.`,
      place: { kind: 'shelf', shelfId: own.id },
    };
  }
  const other = await shelfByPlaceCode(trx, known.load.facility_id, code);
  return other
    ? {
        ...nothing,
        answer: 'place-refused',
        sentence: `That shelf belongs to cart ${other.cartCode}. This load is on ${known.view.cart.name}.`,
      }
    : refused('No shelf here has this code.');
}

async function scanHolder(
  trx: Transaction,
  known: LoadAsKnown,
  code: string,
  place: ScanPlace | null,
  act: ActContext,
): Promise<Answer> {
  const holder = await holderByPlaceCode(trx, known.load.facility_id, code);
  if (!holder) return refused('No holder here has this code.');
  const here: ScanPlace = { kind: 'holder', holderId: holder.holderId };
  if (known.view.holders.some((entry) => entry.holderId === holder.holderId)) {
    return { ...nothing, answer: 'place-set', sentence: `${holder.name}. Scan what goes in it.`, place: here };
  }
  const against = await whyHolderIsNotFree(trx, holder);
  if (against !== null) return { ...nothing, answer: 'place-refused', sentence: against };
  const spot = suggestHolderSpot(known.view, holder.kind, shelfWanted(known.view, place), known.policy);
  if (!spot) {
    return {
      ...nothing,
      answer: 'place-refused',
      sentence: `There is no free room for ${holder.name} on ${known.view.cart.name}.`,
    };
  }
  const placed: LoadHolder = {
    holderId: holder.holderId,
    name: holder.name,
    placeCode: holder.placeCode,
    kindId: holder.kind.id,
    ...spot,
  };
  const after: LoadView = { ...known.view, holders: [...known.view.holders, placed] };
  const change = await recordAct(trx, known, after, act, (difference) => ({
    kind: 'load.holder-placed',
    payload: { holder: holder.name, difference },
  }));
  const shelf = known.view.cart.shelves.find((entry) => entry.id === spot.shelfId);
  return {
    ...nothing,
    answer: 'place-set',
    sentence: `${holder.name} goes on ${shelf?.name.toLowerCase() ?? 'the cart'}. Scan what goes in it.`,
    place: here,
    change,
  };
}

function shelfWanted(view: LoadView, place: ScanPlace | null): string | null {
  if (place === null) return null;
  if (place.kind === 'shelf') return place.shelfId;
  return view.holders.find((holder) => holder.holderId === place.holderId)?.shelfId ?? null;
}
