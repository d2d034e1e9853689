import type { LoadDetail } from '#contract/loads';
import { useState } from 'react';
import { Button } from '../../../components/ui/button';
import { Dialog } from '../../../components/ui/dialog';
import { FileLink } from '../../../components/ui/file-link';
import { TextAreaField } from '../../../components/ui/text-field';
import { countOf } from '../../../lib/format';
import { sentenceOf } from '../../../lib/errors';
import { usePrintStickers } from '../mutations';

type StickerSheetProps = {
  readonly detail: LoadDetail;
  /** One package, or null for every scanned package that has no sticker yet. */
  readonly packageId: string | null;
  readonly onClose: () => void;
};

/** Prints load stickers: the lot identifier each package carries. A second one for a package needs a reason. */
export function StickerSheet({ detail, packageId, onClose }: StickerSheetProps) {
  const print = usePrintStickers(detail.summary.id);
  const [reason, setReason] = useState('');
  const [isMissing, setIsMissing] = useState(false);
  const withSticker = new Set(detail.stickers.map((sticker) => sticker.packageId));
  const waiting = detail.view.packages.filter((entry) => entry.isScanned && !withSticker.has(entry.packageId));
  const isReprint = packageId !== null && withSticker.has(packageId);

  function send() {
    if (isReprint && reason.trim() === '') {
      setIsMissing(true);
      return;
    }
    print.mutate({ packageIds: packageId === null ? null : [packageId], reason: isReprint ? reason.trim() : null });
  }

  const what =
    packageId === null ? countOf(waiting.length, 'sticker') : isReprint ? 'this sticker again' : 'the sticker';
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={`Load stickers, ${detail.summary.number}`}
      actions={
        print.data ? (
          <>
            <FileLink to={print.data.pdf} how="open" icon="print">
              Open the sheet to print
            </FileLink>
            <Button kind="plain" onPress={onClose}>
              Done
            </Button>
          </>
        ) : (
          <Button
            icon="print"
            onPress={send}
            waitingWords={print.isPending ? 'Making the sheet' : undefined}
            blockedBecause={
              packageId === null && waiting.length === 0 ? 'Every scanned package has its sticker.' : undefined
            }
          >
            {`Print ${what}`}
          </Button>
        )
      }
    >
      <p className="text-body">
        {print.data
          ? `${countOf(print.data.stickerIds.length, 'sticker')} made. Put each on its package, on the film side, next to the label.`
          : packageId === null
            ? `${countOf(waiting.length, 'scanned package')} without a sticker. ${countOf(withSticker.size, 'package')} have one already.`
            : isReprint
              ? 'This package has a sticker. Printing another makes the first one void: take it off and throw it away.'
              : 'The sticker names the sterilizer, the day and the load this package is in.'}
      </p>
      {isReprint && !print.data && (
        <TextAreaField
          className="mt-4"
          label="Why is it printed again?"
          value={reason}
          maxLength={500}
          error={isMissing && reason.trim() === '' ? 'Write the reason in a few words.' : undefined}
          onChange={(event) => {
            setReason(event.target.value);
          }}
        />
      )}
      {print.isError && (
        <p role="alert" className="mt-3 text-row font-semibold text-madder-3">
          {sentenceOf(print.error)}
        </p>
      )}
    </Dialog>
  );
}
