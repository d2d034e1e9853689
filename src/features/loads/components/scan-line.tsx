import type { ScanPlace, ScanResponse } from '#contract/loads';
import { holderWords, paperWords, placeWords } from '#domain/load/describe-place';
import { findHolderKind } from '#domain/load/look-up';
import type { LoadView, PaperSide } from '#domain/load/model';
import { memo } from 'react';
import { Icon } from '../../../components/icon';
import { Button } from '../../../components/ui/button';
import { Code } from '../../../components/ui/code';
import { FilmPanel } from '../../../components/ui/film-panel';
import { ScanMark } from '../../../components/ui/scan-answer';
import { Time } from '../../../components/ui/time';
import { useFacility } from '../../../lib/facility';
import { formatSize } from '../../../lib/format';
import { lookOf } from '../answers';

/** What the person scanned last, as far as this station knows. */
export type LastScan =
  | { readonly kind: 'none' }
  | { readonly kind: 'answered'; readonly turn: number; readonly reply: ScanResponse }
  | { readonly kind: 'refused'; readonly turn: number; readonly sentence: string; readonly code: string };

function currentPlaceWords(view: LoadView, place: ScanPlace | null): string {
  if (place === null) return 'Scan a place, or a package to be told where';
  if (place.kind === 'shelf') return view.cart.shelves.find((shelf) => shelf.id === place.shelfId)?.name ?? '';
  const holder = view.holders.find((entry) => entry.holderId === place.holderId);
  return holder ? holderWords(holder, findHolderKind(view, holder)) : '';
}

function Said({ view, last, waiting }: { view: LoadView; last: LastScan; waiting: number }) {
  const { unitSystem } = useFacility();
  if (last.kind === 'none') {
    return (
      <div className="flex min-w-0 gap-4">
        <ScanMark look="place" word="Ready" isLarge />
        <div className="min-w-0 self-center">
          <p className="truncate text-scan max-tablet:text-say">Scan a package or a place</p>
          <p className="truncate text-[1.0625rem]/[1.4375rem] text-ink-2">The scanner of this station is listening.</p>
        </div>
      </div>
    );
  }
  if (last.kind === 'refused') {
    return (
      <div className="flex min-w-0 animate-flash-edge gap-4" key={last.turn}>
        <ScanMark look="not-ready" word="Not taken" isLarge />
        <div className="min-w-0">
          <p className="text-small text-ink-2">Last scan</p>
          <p className="truncate text-scan max-tablet:text-say">
            <Code>{last.code}</Code>
          </p>
          <p className="text-[1.0625rem]/[1.4375rem]">{last.sentence}</p>
        </div>
      </div>
    );
  }
  const { reply, turn } = last;
  const { look, word } = lookOf(reply);
  const isNo = look !== 'taken' && look !== 'look' && look !== 'place';
  const placed = reply.package ? view.packages.find((entry) => entry.packageId === reply.package?.id) : undefined;
  const item = placed ? view.items.find((entry) => entry.id === placed.itemId) : undefined;
  return (
    <div
      className={`flex min-w-0 gap-4 ${isNo ? 'animate-flash-edge' : ''}`}
      key={turn}
      data-answer={reply.answer}
      data-scan-turn={turn}
    >
      <ScanMark look={look} word={word} isLarge />
      <div className="min-w-0 animate-words-up">
        <p className="text-small text-ink-2">
          Last scan, <Time at={reply.at} withSeconds />
          {waiting > 0 && <span className="ml-3 font-semibold text-ink-1">{waiting} more under way</span>}
        </p>
        <p
          className="truncate text-scan max-tablet:line-clamp-2 max-tablet:text-say max-tablet:whitespace-normal"
          title={reply.package?.itemName}
        >
          {reply.package?.itemName ??
            (reply.answer === 'place-set' ? (
              currentPlaceWords(view, reply.place)
            ) : (
              <Code>{reply.code || 'Nothing readable'}</Code>
            ))}
        </p>
        <p className="line-clamp-2 text-[1.0625rem]/[1.25rem]">
          {reply.package && <Code className="mr-3 font-semibold">{reply.package.code}</Code>}
          {isNo || look === 'look' || reply.answer === 'place-set' ? (
            <span className={isNo ? 'font-semibold' : ''}>{reply.sentence}</span>
          ) : (
            item && (
              <span className="text-ink-2">
                <span className="max-tablet:hidden">
                  <Code>{item.code}</Code>
                  <span className="ml-4">{formatSize([item.widthMm, item.lengthMm], unitSystem)}</span>
                </span>
                {item.isImplant && <b className="ml-3 font-semibold text-ink-1">Implant</b>}
              </span>
            )
          )}
        </p>
      </div>
    </div>
  );
}

/** A pouch in slanted view and an arrow to its paper side. */
function PaperPicture({ paper }: { paper: PaperSide }) {
  const isLeft = paper === 'left';
  return (
    <svg width="92" height="88" viewBox="0 0 92 96" aria-hidden="true" className="flex-none max-tablet:hidden">
      <path
        d="M30 90v-62l40 -20v62z"
        strokeWidth="1.5"
        className={isLeft ? 'fill-leaf-film stroke-film-4' : 'fill-leaf-paper stroke-paper-edge'}
      />
      <path d="M70 9l-40 20v10l40 -20z" className="fill-film-5/55" />
      <path d="M44 70q10 -22 18 -34M44 70l3 -7M63 35l3 2" fill="none" strokeWidth="2.2" className="stroke-ink-1/65" />
      <path
        d="M24 90v-63l5 -2v63z"
        strokeWidth="1.4"
        className={isLeft ? 'fill-leaf-paper stroke-paper-edge' : 'fill-leaf-film stroke-film-4'}
      />
      {isLeft ? (
        <path d="M4 60h14M4 60l6-5M4 60l6 5" strokeWidth="2" fill="none" className="stroke-ink-1" />
      ) : (
        <path d="M74 60h14M88 60l-6-5M88 60l-6 5" strokeWidth="2" fill="none" className="stroke-ink-1" />
      )}
    </svg>
  );
}

function PutItHere({
  view,
  last,
  place,
  onClearPlace,
}: {
  view: LoadView;
  last: LastScan;
  place: ScanPlace | null;
  onClearPlace: () => void;
}) {
  const reply = last.kind === 'answered' && last.reply.answer === 'taken' ? last.reply : null;
  // Where it is by now: it may have been moved since it was scanned.
  const placed = reply?.package ? view.packages.find((entry) => entry.packageId === reply.package?.id) : undefined;
  const item = placed ? view.items.find((entry) => entry.id === placed.itemId) : undefined;
  const placement = placed?.placement ?? null;
  return (
    <div className="seal-l flex min-w-0 justify-between gap-3 py-3 pr-4 pl-6.5 max-tablet:hidden">
      <div className="min-w-0">
        <p className="flex items-center gap-3 text-small text-ink-2">
          {placement ? 'Put it here' : 'Current place'}
          {place !== null && (
            <button
              type="button"
              onClick={onClearPlace}
              className="-my-2 min-h-8 font-semibold text-film-4 underline underline-offset-3"
            >
              Tell me where instead
            </button>
          )}
        </p>
        {placement ? (
          <>
            <p className="truncate text-place text-film-5 max-desk:text-[2.125rem]/[2.75rem]">
              {placeWords(view, placement, item)}
            </p>
            <p className="truncate text-[1.5rem]/[1.875rem] font-semibold">
              {placement.paper === null
                ? placement.pose === 'tilted'
                  ? 'Tilted to drain'
                  : placement.pose === 'on-edge'
                    ? 'On edge'
                    : 'Flat'
                : paperWords(placement.paper)}
            </p>
          </>
        ) : (
          <p className="text-say text-film-5">{reply ? reply.sentence : currentPlaceWords(view, place)}</p>
        )}
      </div>
      {placement?.paper === 'left' || placement?.paper === 'right' ? <PaperPicture paper={placement.paper} /> : null}
    </div>
  );
}

type ScanLineProps = {
  readonly view: LoadView;
  readonly last: LastScan;
  readonly place: ScanPlace | null;
  /** Scans sent and not answered yet. */
  readonly waiting: number;
  readonly onClearPlace: () => void;
  readonly onKeyIn: () => void;
  readonly onUndo: () => void;
  readonly undoable: string | null;
};

const ScanButtons = memo(function ScanButtons({
  onKeyIn,
  onUndo,
  undoable,
}: Pick<ScanLineProps, 'onKeyIn' | 'onUndo' | 'undoable'>) {
  return (
    <div className="flex flex-none flex-col gap-1">
      <Button kind="plain" size="small" icon="keys" onPress={onKeyIn}>
        Key in
      </Button>
      <Button
        kind="plain"
        size="small"
        icon="undo"
        onPress={onUndo}
        blockedBecause={undoable === null ? 'There is nothing to take back.' : undefined}
        aria-label={undoable === null ? 'Undo' : `Undo: ${undoable}`}
      >
        Undo
      </Button>
    </div>
  );
});

/** The one film surface of the screen: what was scanned, and where it goes. */
export function ScanLine(props: ScanLineProps) {
  const { view, last, place, waiting } = props;
  return (
    <FilmPanel label="Last scan" className="z-10 grid min-h-29 tablet:grid-cols-[1fr_minmax(22rem,33rem)]">
      <div className="flex min-w-0 items-start justify-between gap-3 px-4 pt-3.5 pb-2">
        <Said view={view} last={last} waiting={waiting} />
        <ScanButtons onKeyIn={props.onKeyIn} onUndo={props.onUndo} undoable={props.undoable} />
      </div>
      <PutItHere view={view} last={last} place={place} onClearPlace={props.onClearPlace} />
    </FilmPanel>
  );
}

/** On the phone the place has a line of its own. */
export function PhonePlace({ view, last }: { view: LoadView; last: LastScan }) {
  const reply = last.kind === 'answered' && last.reply.answer === 'taken' ? last.reply : null;
  const placed = reply?.package ? view.packages.find((entry) => entry.packageId === reply.package?.id) : undefined;
  const item = placed ? view.items.find((entry) => entry.id === placed.itemId) : undefined;
  if (!placed?.placement) return null;
  return (
    <p className="flex items-center gap-2.5 px-4 pt-3 text-say font-label text-film-5 tablet:hidden">
      <Icon name="right" size={22} />
      {placeWords(view, placed.placement, item)}
      {placed.placement.paper !== null && (
        <span className="text-body font-semibold text-ink-1">{paperWords(placed.placement.paper)}</span>
      )}
    </p>
  );
}
