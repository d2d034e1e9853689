import { holderSpotWords, holderWords, paperWords, poseWords, spotWords } from './describe-place';
import type { Finding } from './finding';
import { findHolderKind, findItem, nameOf, shelfIdOf, shelvesUpward } from './look-up';
import type { LoadHolder, LoadPackage, LoadView } from './model';

/** One stretch of the cart in words: a heading and its lines. */
export type TwinPart = { readonly heading: string; readonly lines: readonly string[] };

/**
 * The cart as words, for those who cannot see the map: shelf by shelf from the lowest, holder by holder, slot by slot,
 * each thing with its facing and the letters of its findings; then what has no place, and what is not scanned yet.
 * @param findings in order of weight: the first is finding A, as on the map and in the list.
 */
export function textTwin(view: LoadView, findings: readonly Finding[]): readonly TwinPart[] {
  const notes = notesOf(findings);
  const parts: TwinPart[] = [];
  const wholeLoad = notes('load');
  if (wholeLoad.length > 0) parts.push({ heading: 'The whole load', lines: wholeLoad });
  for (const shelf of shelvesUpward(view)) {
    const lines = [...notes(`shelf ${shelf.id}`)];
    for (const holder of view.holders.filter((one) => one.shelfId === shelf.id)) {
      lines.push(...holderLines(view, holder, notes));
    }
    for (const one of view.packages) {
      if (one.placement?.at === 'shelf' && one.placement.shelfId === shelf.id) {
        lines.push(...stackLines(view, one, notes, new Set()));
      }
    }
    parts.push({ heading: shelf.name, lines: lines.length > 0 ? lines : ['Empty.'] });
  }
  const unplaced = view.packages.filter((one) => one.isScanned && shelfIdOf(view, one.placement) === undefined);
  if (unplaced.length > 0) {
    parts.push({ heading: 'Scanned, no place yet', lines: unplaced.map((one) => packageLine(view, one, notes)) });
  }
  const unscanned = view.packages.filter((one) => !one.isScanned);
  if (unscanned.length > 0) {
    parts.push({ heading: 'Not scanned yet', lines: unscanned.map((one) => packageLine(view, one, notes)) });
  }
  return parts;
}

/** A to Z, then AA, AB and so on: the same letter on the map, in the list and at the gate. */
export function findingLetter(index: number): string {
  const last = String.fromCharCode(65 + (index % 26));
  return index < 26 ? last : findingLetter(Math.floor(index / 26) - 1) + last;
}

type Notes = (place: string) => readonly string[];

function notesOf(findings: readonly Finding[]): Notes {
  const byPlace = new Map<string, string[]>();
  for (const [index, finding] of findings.entries()) {
    const note = `Finding ${findingLetter(index)}: ${finding.title}`;
    for (const place of finding.places.length > 0 ? finding.places : [{ on: 'load' as const }]) {
      const key =
        place.on === 'load'
          ? 'load'
          : place.on === 'shelf'
            ? `shelf ${place.shelfId}`
            : place.on === 'package'
              ? `package ${place.packageId}`
              : `holder ${place.holderId} ${place.slot ?? ''}`;
      byPlace.set(key, [...(byPlace.get(key) ?? []), asSentence(note)]);
    }
  }
  return (place) => byPlace.get(place) ?? [];
}

function holderLines(view: LoadView, holder: LoadHolder, notes: Notes): readonly string[] {
  const kind = findHolderKind(view, holder);
  const name = holderWords(holder, kind);
  const inside = view.packages.filter(
    (one) => one.placement && 'holderId' in one.placement && one.placement.holderId === holder.holderId,
  );
  const slots = kind?.slots ?? 0;
  const taken = slots > 0 ? `${inside.length} in ${slots} slots` : `${inside.length} inside`;
  const lines = [asLine([`${name}, ${holderSpotWords(view, holder)}, ${taken}`], notes(`holder ${holder.holderId} `))];
  const slotOf = (one: LoadPackage) => (one.placement?.at === 'slot' ? one.placement.slot : Infinity);
  const free: number[] = [];
  for (let slot = 1; slot <= slots; slot += 1) {
    if (!inside.some((one) => slotOf(one) === slot)) free.push(slot);
  }
  for (const one of [...inside].sort((a, b) => slotOf(a) - slotOf(b))) {
    const slot = slotOf(one);
    const slotNotes = Number.isFinite(slot) ? notes(`holder ${holder.holderId} ${slot}`) : [];
    const line = packageLine(view, one, notes, slotNotes);
    lines.push(Number.isFinite(slot) ? `Slot ${slot}: ${line}` : `Inside: ${line}`);
    lines.push(...aboveLines(view, one, notes, new Set([one.packageId])));
  }
  if (free.length > 0) lines.push(`Free ${free.length === 1 ? 'slot' : 'slots'}: ${free.join(', ')}.`);
  return lines;
}

function stackLines(view: LoadView, one: LoadPackage, notes: Notes, seen: Set<string>): readonly string[] {
  if (seen.has(one.packageId)) return [];
  seen.add(one.packageId);
  return [packageLine(view, one, notes), ...aboveLines(view, one, notes, seen)];
}

function aboveLines(view: LoadView, below: LoadPackage, notes: Notes, seen: Set<string>): readonly string[] {
  return view.packages
    .filter((one) => one.placement?.at === 'package' && one.placement.belowPackageId === below.packageId)
    .flatMap((one) => stackLines(view, one, notes, seen));
}

function packageLine(view: LoadView, one: LoadPackage, notes: Notes, more: readonly string[] = []): string {
  const { placement } = one;
  const words = [nameOf(view, one)];
  if (placement && placement.at !== 'slot') words.push(spotWords(view, placement, findItem(view, one.itemId)));
  if (placement) words.push(poseWords(placement.pose));
  if (placement?.paper) words.push(paperWords(placement.paper).toLowerCase());
  return asLine(words, [...new Set([...more, ...notes(`package ${one.packageId}`)])]);
}

function asLine(words: readonly string[], notes: readonly string[]): string {
  return [asSentence(words.join(', ')), ...notes].join(' ');
}

function asSentence(text: string): string {
  return /[.!?]$/.test(text) ? text : `${text}.`;
}
