import type { LoadDetail } from '#contract/loads';
import type { Finding } from '#domain/load/finding';
import { useNavigate } from 'react-router-dom';
import { ConfirmDialog } from '../../../components/ui/confirm-dialog';
import { sentenceOf } from '../../../lib/errors';
import type { LoadActs } from '../hooks/use-load-acts';
import type { LoadJudgement } from '../hooks/use-load-judgement';
import { useAbandonLoad, useAcceptFinding, useCountShelf } from '../mutations';
import { CountSheet } from './count-sheet';
import { HistorySheet } from './history-sheet';
import { KeyInSheet } from './key-in-sheet';
import { PackageSheet } from './package-sheet';
import { StickerSheet } from './sticker-sheet';

/** What lies over the station. */
export type Sheet =
  | { readonly is: 'none' | 'key-in' | 'abandon' | 'history' }
  | { readonly is: 'package'; readonly packageId: string }
  | { readonly is: 'count'; readonly shelfId: string }
  | { readonly is: 'accept'; readonly finding: Finding }
  | { readonly is: 'sticker'; readonly packageId: string | null };

export const noSheet: Sheet = { is: 'none' };

type LoadSheetsProps = {
  readonly sheet: Sheet;
  readonly detail: LoadDetail;
  readonly judgement: LoadJudgement;
  readonly acts: LoadActs;
  readonly mayBuild: boolean;
  readonly onSheet: (sheet: Sheet) => void;
};

export function LoadSheets({ sheet, detail, judgement, acts, mayBuild, onSheet }: LoadSheetsProps) {
  const { view, policy, summary } = detail;
  const navigate = useNavigate();
  const count = useCountShelf(summary.id);
  const accept = useAcceptFinding(summary.id);
  const abandon = useAbandonLoad(summary.id);
  const counted = sheet.is === 'count' ? view.cart.shelves.find((shelf) => shelf.id === sheet.shelfId) : undefined;

  function close() {
    acts.forgetProblem();
    count.reset();
    onSheet(noSheet);
  }

  return (
    <>
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
            acts.applyEdits(edits, edits.some((edit) => edit.edit === 'take-off') ? close : undefined);
          }}
          onClose={close}
          onSticker={() => {
            onSheet({ is: 'sticker', packageId: sheet.packageId });
          }}
        />
      )}
      {counted && (
        <CountSheet
          shelf={counted}
          problem={count.isError ? sentenceOf(count.error) : null}
          isWaiting={count.isPending}
          onCounted={(value) => {
            count.mutate({ shelfId: counted.id, counted: value }, { onSuccess: close });
          }}
          onClose={close}
        />
      )}
      {sheet.is === 'key-in' && (
        <KeyInSheet
          onCode={(code, entry) => {
            acts.scan(code, entry);
            if (entry === 'keyed') close();
          }}
          onClose={close}
        />
      )}
      {sheet.is === 'history' && <HistorySheet loadId={summary.id} number={summary.number} onClose={close} />}
      {sheet.is === 'sticker' && <StickerSheet detail={detail} packageId={sheet.packageId} onClose={close} />}
      <ConfirmDialog
        isOpen={sheet.is === 'accept'}
        onClose={close}
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
        onClose={close}
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
    </>
  );
}
