import type { LoadDetail } from '#contract/loads';
import type { Block } from '#domain/load/decide-close';
import type { Finding } from '#domain/load/finding';
import type { Layout } from '#domain/load/layout';
import { shelfIdOf } from '#domain/load/look-up';
import { useCallback, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { CartInWords } from '../../../components/cart-map/cart-in-words';
import { anchorOf } from '../../../components/cart-map/map-model';
import { useAnnounce } from '../../../components/ui/announcer';
import { Button } from '../../../components/ui/button';
import { ConfirmDialog } from '../../../components/ui/confirm-dialog';
import { sentenceOf } from '../../../lib/errors';
import { useScanner } from '../../../lib/scanner-input';
import { useMay } from '../../../lib/session';
import { useSounds } from '../../../lib/sounds';
import { useSize } from '../../../lib/use-size';
import { useLoadActs } from '../hooks/use-load-acts';
import { useLoadJudgement } from '../hooks/use-load-judgement';
import { useAbandonLoad, useAcceptFinding, useCloseLoad, useCountShelf } from '../mutations';
import { ArrangeButton } from './arrange-button';
import { ClosedLoad } from './closed-load';
import { CountSheet } from './count-sheet';
import { FindingsPanel } from './findings-panel';
import { Gate } from './gate';
import { KeyInSheet } from './key-in-sheet';
import { LoadHead } from './load-head';
import { LoadMap, type MapFocus } from './load-map';
import { PackageSheet } from './package-sheet';
import { PhonePlace, ScanLine } from './scan-line';
import { StickerSheet } from './sticker-sheet';
import { StillOnTheTable } from './still-on-the-table';

const phoneWidthPx = 700;

type Sheet =
  | { readonly is: 'none' | 'key-in' | 'abandon' }
  | { readonly is: 'package'; readonly packageId: string }
  | { readonly is: 'count'; readonly shelfId: string }
  | { readonly is: 'accept'; readonly finding: Finding }
  | { readonly is: 'sticker'; readonly packageId: string | null };

const noSheet: Sheet = { is: 'none' };

/** Building one load: scan, place, put right, count, close. */
export function LoadStation({ detail }: { detail: LoadDetail }) {
  const { view, policy, summary } = detail;
  const loadId = summary.id;
  const isBuilding = summary.state === 'building';
  const mayBuild = useMay('load.build') && isBuilding;
  const mayAccept = useMay('load.accept-finding');
  const mayClose = useMay('load.close');
  const announce = useAnnounce();
  const navigate = useNavigate();
  const sounds = useSounds();
  const judgement = useLoadJudgement(detail);
  const acts = useLoadActs(loadId);
  const count = useCountShelf(loadId);
  const accept = useAcceptFinding(loadId);
  const close = useCloseLoad(loadId);
  const abandon = useAbandonLoad(loadId);
  const [sheet, setSheet] = useState<Sheet>(noSheet);
  const [openKey, setOpenKey] = useState<string | null>(null);
  const [chosen, setChosenAt] = useState<MapFocus & { readonly turn: number }>({
    shelfId: null,
    holderId: null,
    turn: -1,
  });
  const [sizeRef, size] = useSize();

  useScanner(
    (scan) => {
      acts.scan(scan.text, scan.entry);
    },
    { isOn: mayBuild },
  );

  const closeSheet = () => {
    acts.forgetProblem();
    count.reset();
    setSheet(noSheet);
  };

  // What a person chose to look at holds until the next scan: then the map follows the hand again.
  const turn = acts.last.kind === 'none' ? 0 : acts.last.turn;
  const setChosen = useCallback(
    (focus: MapFocus) => {
      setChosenAt({ ...focus, turn });
    },
    [turn],
  );
  const focus = focusOf(detail, acts.last, chosen.turn === turn ? chosen : null);
  const openPackage = useCallback((packageId: string) => {
    setSheet({ is: 'package', packageId });
  }, []);
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
        if (mayBuild) setSheet({ is: 'count', shelfId: block.shelfId });
        return;
      case 'unscanned':
      case 'empty':
        announce(block.label, 'assertive');
    }
  }

  const counted = sheet.is === 'count' ? view.cart.shelves.find((shelf) => shelf.id === sheet.shelfId) : undefined;
  const isPhone = size !== null && size.width < phoneWidthPx;

  return (
    <div className="flex min-h-full flex-col tablet:h-full tablet:overflow-hidden">
      <title>{`Load ${summary.number} · Paperside`}</title>
      <LoadHead detail={detail} judgement={judgement} />
      {isBuilding ? (
        <ScanLine
          view={view}
          last={acts.last}
          place={acts.place}
          waiting={acts.waiting}
          undoable={mayBuild ? detail.undoable : null}
          onClearPlace={() => {
            acts.choosePlace(null);
          }}
          onKeyIn={() => {
            setSheet({ is: 'key-in' });
          }}
          onUndo={acts.undo}
        />
      ) : (
        <ClosedLoad detail={detail} />
      )}
      {isPhone && <PhonePlace view={view} last={acts.last} />}
      {acts.problem !== null && sheet.is === 'none' && (
        <p role="alert" className="bg-madder-1 px-4 py-2 text-row font-semibold text-madder-3">
          {acts.problem}
        </p>
      )}
      <div className="grid min-h-0 flex-1 gap-5 px-4 pt-2.5 tablet:grid-cols-[minmax(0,1fr)_21.5rem] desk:grid-cols-[minmax(0,1fr)_24rem]">
        <div ref={sizeRef} className="min-h-0 min-w-0">
          {size && (
            <LoadMap
              detail={detail}
              layout={judgement.layout}
              open={judgement.open}
              reckoning={judgement.reckoning}
              last={acts.last}
              focus={focus}
              openKey={openKey}
              pickedPackageId={sheet.is === 'package' ? sheet.packageId : null}
              size={size}
              isPhone={isPhone}
              onShelf={chooseShelf}
              onHolder={chooseHolder}
              onPackage={openPackage}
              onCount={
                mayBuild
                  ? (shelfId) => {
                      setSheet({ is: 'count', shelfId });
                    }
                  : null
              }
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
              acts.applyEdits(fix.edits);
            }}
            onAccept={(finding) => {
              setSheet({ is: 'accept', finding });
            }}
          />
          <div className="mt-auto flex flex-wrap gap-x-1 border-t border-paper-3 pt-1">
            {mayBuild && <ArrangeButton view={view} policy={policy} onEdits={acts.applyEdits} />}
            <Button
              kind="plain"
              size="small"
              icon="print"
              onPress={() => {
                setSheet({ is: 'sticker', packageId: null });
              }}
            >
              Load stickers
            </Button>
            {mayBuild && (
              <Button
                kind="plain"
                size="small"
                icon="out"
                onPress={() => {
                  setSheet({ is: 'abandon' });
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
      {sheet.is === 'package' && (
        <PackageSheet
          view={view}
          policy={policy}
          layout={judgement.layout}
          packageId={sheet.packageId}
          mayBuild={mayBuild}
          problem={acts.problem}
          isWaiting={acts.isEditing}
          onEdit={(edits) => {
            acts.applyEdits(edits, edits.some((edit) => edit.edit === 'take-off') ? closeSheet : undefined);
          }}
          onClose={closeSheet}
          onSticker={() => {
            setSheet({ is: 'sticker', packageId: sheet.packageId });
          }}
        />
      )}
      {counted && (
        <CountSheet
          shelf={counted}
          problem={count.isError ? sentenceOf(count.error) : null}
          isWaiting={count.isPending}
          onCounted={(value) => {
            count.mutate(
              { shelfId: counted.id, counted: value },
              {
                onSuccess: closeSheet,
              },
            );
          }}
          onClose={closeSheet}
        />
      )}
      {sheet.is === 'key-in' && (
        <KeyInSheet
          onCode={(code, entry) => {
            acts.scan(code, entry);
            if (entry === 'keyed') closeSheet();
          }}
          onClose={closeSheet}
        />
      )}
      {sheet.is === 'sticker' && <StickerSheet detail={detail} packageId={sheet.packageId} onClose={closeSheet} />}
      <ConfirmDialog
        isOpen={sheet.is === 'accept'}
        onClose={closeSheet}
        title="Let this finding stay?"
        confirmWords="Let it stay"
        waitingWords="Writing it down"
        reason={{
          label: 'Why may it stay?',
          hint: 'One sentence. It stays with the load, with your name.',
          isNeeded: true,
        }}
        onConfirm={async (reason) => {
          if (sheet.is === 'accept') await accept.mutateAsync({ findingKey: sheet.finding.key, reason });
        }}
      >
        {sheet.is === 'accept' ? sheet.finding.title : ''}
      </ConfirmDialog>
      <ConfirmDialog
        isOpen={sheet.is === 'abandon'}
        onClose={closeSheet}
        title="Give this load up?"
        confirmWords="Give it up"
        waitingWords="Giving it up"
        kind="stop"
        reason={{ label: 'Why is it given up?', isNeeded: true }}
        onConfirm={async (reason) => {
          await abandon.mutateAsync(reason);
          await navigate('/loads');
        }}
      >
        Its packages wait again where they waited before, and its load stickers are void. Take them off the packages.
      </ConfirmDialog>
    </div>
  );
}

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
function focusOf(detail: LoadDetail, last: ReturnType<typeof useLoadActs>['last'], chosen: MapFocus | null): MapFocus {
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
