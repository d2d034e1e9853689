import { arrangeRest } from '#domain/load/arrange-rest';
import type { LoadEdit } from '#domain/load/finding';
import type { LoadView } from '#domain/load/model';
import type { LoadPolicy } from '#domain/load/policy';
import { useAnnounce } from '../../../components/ui/announcer';
import { Button } from '../../../components/ui/button';
import { countOf } from '../../../lib/format';

type ArrangeButtonProps = {
  readonly view: LoadView;
  readonly policy: LoadPolicy;
  readonly onEdits: (edits: readonly LoadEdit[]) => void;
};

/** Finds legal places for whatever was scanned and has none yet; says what cannot be placed. Nothing moves unasked. */
export function ArrangeButton({ view, policy, onEdits }: ArrangeButtonProps) {
  const announce = useAnnounce();
  const unplaced = view.packages.filter((entry) => entry.isScanned && entry.placement === null).length;
  if (unplaced === 0) return null;
  return (
    <Button
      kind="plain"
      size="small"
      icon="turn"
      onPress={() => {
        const { edits, couldNotPlace } = arrangeRest(view, policy);
        if (edits.length > 0) onEdits(edits);
        if (couldNotPlace.length > 0) {
          announce(
            `${countOf(couldNotPlace.length, 'package')} cannot be placed: ${couldNotPlace[0]?.why ?? ''}`,
            'assertive',
          );
        }
      }}
    >
      {`Find places for ${unplaced}`}
    </Button>
  );
}
