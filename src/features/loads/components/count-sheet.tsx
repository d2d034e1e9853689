import type { Shelf } from '#domain/load/model';
import { CountPad } from '../../../components/ui/key-pad';
import { Dialog } from '../../../components/ui/dialog';

type CountSheetProps = {
  readonly shelf: Shelf;
  readonly problem: string | null;
  readonly isWaiting: boolean;
  readonly onCounted: (count: number) => void;
  readonly onClose: () => void;
};

/** A blind count: the sheet covers the scanned figure while a person counts what stands on the shelf. */
export function CountSheet({ shelf, problem, isWaiting, onCounted, onClose }: CountSheetProps) {
  return (
    <Dialog
      isOpen
      onClose={isWaiting ? undefined : onClose}
      title={`Count ${shelf.name.toLowerCase()}`}
      material="film"
    >
      <CountPad
        label={`Packages on ${shelf.name.toLowerCase()}`}
        hint="Count every package you see on it: in holders, in baskets, and on top of others. Holders themselves do not count."
        error={problem ?? undefined}
        doneWords="That is what I count"
        waitingWords={isWaiting ? 'Keeping the count' : undefined}
        onDone={onCounted}
      />
    </Dialog>
  );
}
