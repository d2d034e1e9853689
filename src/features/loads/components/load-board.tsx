import type { LoadDetail } from '#contract/loads';
import type { Block } from '#domain/load/decide-close';
import type { Finding, LoadEdit } from '#domain/load/finding';
import type { Layout } from '#domain/load/layout';
import { shelfIdOf } from '#domain/load/look-up';
import { memo, useCallback, useState } from 'react';
import { CartInWords } from '../../../components/cart-map/cart-in-words';
import { anchorOf } from '../../../components/cart-map/map-model';
import { useAnnounce } from '../../../components/ui/announcer';
import { Button } from '../../../components/ui/button';
import { sentenceOf } from '../../../lib/errors';
import { useMay } from '../../../lib/session';
import { useSounds } from '../../../lib/sounds';
import { useSize } from '../../../lib/use-size';
import type { LoadJudgement } from '../hooks/use-load-judgement';
import { useCloseLoad } from '../mutations';
import { ArrangeButton } from './arrange-button';
import { FindingsPanel } from './findings-panel';
import { Gate } from './gate';
import { LoadMap, type MapFocus } from './load-map';
import type { Sheet } from './load-sheets';
import type { LastScan } from './scan-line';
import { StillOnTheTable } from './still-on-the-table';

const phoneWidthPx = 700;

type LoadBoardProps = {
  readonly detail: LoadDetail;
  readonly last: LastScan;
  readonly judgement: LoadJudgement;
  readonly mayBuild: boolean;
  readonly pickedPackageId: string | null;
  readonly onEdits: (edits: readonly LoadEdit[]) => void;
  readonly onSheet: (sheet: Sheet) => void;
};

/** The cart as it stands: drawn, reckoned, judged, and what holds it open. Drawn anew only when something of it changed. */
export const LoadBoard = memo(function LoadBoard({
  detail,
  last,
  judgement,
  mayBuild,
  pickedPackageId,
  onEdits,
  onSheet,
}: LoadBoardProps) {
  const { view, policy, summary } = detail;
  const isBuilding = summary.state === 'building';
  const mayAccept = useMay('load.accept-finding');
  const mayClose = useMay('load.close');
  const announce = useAnnounce();
  const sounds = useSounds();
  const close = useCloseLoad(summary.id);
  const [openKey, setOpenKey] = useState<string | null>(null);
  const [chosen, setChosenAt] = useState<MapFocus & { readonly turn: number }>({
    shelfId: null,
    holderId: null,
    turn: -1,
  });
  const [sizeRef, size] = useSize();

  // What a person chose to look at holds until the next scan: then the map follows the hand again.
  const turn = last.kind === 'none' ? 0 : last.turn;
  const setChosen = useCallback(
    (focus: MapFocus) => {
      setChosenAt({ ...focus, turn });
    },
    [turn],
  );
  const focus = focusOf(detail, last, chosen.turn === turn ? chosen : null);
  const openPackage = useCallback(
    (packageId: string) => {
      onSheet({ is: 'package', packageId });
    },
    [onSheet],
  );
  const countShelf = useCallback(
    (shelfId: string) => {
      onSheet({ is: 'count', shelfId });
    },
    [onSheet],
  );
  const chooseShelf = useCallback(
    (shelfId: string) => {
      setChosen({ shelfId, holderId: view.holders.find((holder) => holder.shelfId === shelfId)?.holderId ?? null });
    },
    [setChosen, view.holders],
  );
  const chooseHolder = useCallback(
    (holderId: string) => {
      setChosen({ shelfId: view.holders.find((holder) => holder.holderId === holderId)?.shelfId ?? null, holderId });
    },
    [setChosen, view.holders],
  );

  function showFinding(finding: Finding) {
    setOpenKey(finding.key);
    const anchor = anchorOf(judgement.layout, finding);
    if (!anchor) return;
    setChosen({ shelfId: anchor.shelfId, holderId: holderOf(judgement.layout, finding) });
  }

  function goToBlock(block: Block) {
    switch (block.kind) {
      case 'finding': {
        showFinding(block.finding);
        const letter = judgement.open.find(({ finding }) => finding.key === block.finding.key)?.letter;
        requestAnimationFrame(() => document.getElementById(`finding-${letter ?? ''}`)?.focus());
        return;
      }
      case 'count-missing':
      case 'count-differs':
        if (mayBuild) countShelf(block.shelfId);
        return;
      case 'unscanned':
      case 'empty':
        announce(block.label, 'assertive');
    }
  }

  const isPhone = size !== null && size.width < phoneWidthPx;

  return (
    <>
      <div className="grid min-h-0 flex-1 gap-5 px-4 pt-2.5 pb-2 tablet:grid-cols-[minmax(0,1fr)_21.5rem] desk:grid-cols-[minmax(0,1fr)_24rem]">
        <div ref={sizeRef} className="min-h-0 min-w-0">
          {size && (
            <LoadMap
              detail={detail}
              layout={judgement.layout}
              open={judgement.open}
              reckoning={judgement.reckoning}
              last={last}
              focus={focus}
              openKey={openKey}
              pickedPackageId={pickedPackageId}
              size={size}
              isPhone={isPhone}
              onShelf={chooseShelf}
              onHolder={chooseHolder}
              onPackage={openPackage}
              onCount={mayBuild ? countShelf : null}
            />
          )}
          <CartInWords view={view} findings={judgement.findings} />
        </div>
        <div
          className="flex min-h-0 flex-col gap-3 overflow-y-auto pb-3 pl-3 *:flex-none max-tablet:pl-0"
          tabIndex={0}
          role="region"
          aria-label="Table and findings"
        >
          <StillOnTheTable view={view} onPackage={openPackage} />
          <FindingsPanel
            detail={detail}
            open={judgement.open}
            settled={judgement.settled}
            openKey={openKey}
            mayAccept={mayAccept}
            isBuilding={mayBuild}
            onOpen={(key) => {
              const entry = judgement.open.find(({ finding }) => finding.key === key);
              if (entry) showFinding(entry.finding);
              else setOpenKey(null);
            }}
            onFix={(_finding, fix) => {
              onEdits(fix.edits);
            }}
            onAccept={(finding) => {
              onSheet({ is: 'accept', finding });
            }}
          />
          <div className="mt-auto flex flex-wrap gap-x-1 border-t border-paper-3 pt-1">
            {mayBuild && <ArrangeButton view={view} policy={policy} onEdits={onEdits} />}
            <Button
              kind="plain"
              size="small"
              icon="print"
              onPress={() => {
                onSheet({ is: 'sticker', packageId: null });
              }}
            >
              Load stickers
            </Button>
            <Button
              kind="plain"
              size="small"
              icon="file"
              onPress={() => {
                onSheet({ is: 'history' });
              }}
            >
              What happened
            </Button>
            {mayBuild && (
              <Button
                kind="plain"
                size="small"
                icon="out"
                onPress={() => {
                  onSheet({ is: 'abandon' });
                }}
              >
                Give the load up
              </Button>
            )}
          </div>
        </div>
      </div>
      {isBuilding && (
        <Gate
          decision={judgement.decision}
          open={judgement.open}
          isClosing={close.isPending}
          mayClose={mayClose}
          onBlock={goToBlock}
          onClose={() => {
            close.mutate(undefined, {
              onSuccess: () => {
                sounds.play('released');
                announce('The load is closed.');
              },
              onError: (error) => {
                announce(sentenceOf(error), 'assertive');
              },
            });
          }}
        />
      )}
      {close.isError && isBuilding && (
        <p role="alert" className="bg-madder-1 px-4 py-2 text-row font-semibold text-madder-3">
          {sentenceOf(close.error)}
        </p>
      )}
    </>
  );
});

/** The holder a finding is about, where it is about one. */
function holderOf(layout: Layout, finding: Finding): string | null {
  for (const place of finding.places) {
    if (place.on === 'holder') return place.holderId;
    const body = place.on === 'package' ? layout.bodyOf.get(place.packageId) : undefined;
    if (body?.holder) return body.holder.holder.holderId;
  }
  return null;
}

/** What the map shows: the place of the last package taken, unless a person chose another. */
function focusOf(detail: LoadDetail, last: LastScan, chosen: MapFocus | null): MapFocus {
  if (chosen) return chosen;
  const { view } = detail;
  const reply = last.kind === 'answered' ? last.reply : null;
  if (reply?.place?.kind === 'shelf') return { shelfId: reply.place.shelfId, holderId: null };
  const placement = reply?.package
    ? (view.packages.find((entry) => entry.packageId === reply.package?.id)?.placement ?? null)
    : null;
  const holderId =
    reply?.place?.kind === 'holder'
      ? reply.place.holderId
      : placement?.at === 'slot' || placement?.at === 'basket'
        ? placement.holderId
        : (view.holders[0]?.holderId ?? null);
  const holderShelf = view.holders.find((holder) => holder.holderId === holderId)?.shelfId ?? null;
  return { shelfId: shelfIdOf(view, placement) ?? holderShelf ?? view.cart.shelves[0]?.id ?? null, holderId };
}
