import type { LoadDetail } from '#contract/loads';
import { useCallback, useDeferredValue, useMemo, useState } from 'react';
import { useScanner } from '../../../lib/scanner-input';
import { useMay } from '../../../lib/session';
import { useLoadActs } from '../hooks/use-load-acts';
import { useLoadJudgement } from '../hooks/use-load-judgement';
import { ClosedLoad } from './closed-load';
import { LoadBoard } from './load-board';
import { LoadHead } from './load-head';
import { LoadSheets, noSheet, type Sheet } from './load-sheets';
import { PhonePlace, ScanLine } from './scan-line';

/** Building one load: scan, place, put right, count, close. */
export function LoadStation({ detail }: { detail: LoadDetail }) {
  const { summary } = detail;
  const isBuilding = summary.state === 'building';
  const mayBuild = useMay('load.build') && isBuilding;
  const acts = useLoadActs(summary.id);
  const { last, choosePlace } = acts;
  const [sheet, setSheet] = useState<Sheet>(noSheet);

  // The answer to a scan is drawn at once. The cart, and what the rules make of it, follow in the frames after: they take
  // longer, and the next scan must not wait for them.
  const shown = useDeferredValue(useMemo(() => ({ detail, last }), [detail, last]));
  const judgement = useLoadJudgement(shown.detail);

  useScanner(
    (scan) => {
      acts.scan(scan.text, scan.entry);
    },
    { isOn: mayBuild },
  );

  const clearPlace = useCallback(() => {
    choosePlace(null);
  }, [choosePlace]);
  const keyIn = useCallback(() => {
    setSheet({ is: 'key-in' });
  }, []);

  return (
    <div className="flex min-h-full flex-col tablet:h-full tablet:overflow-hidden">
      <title>{`Load ${summary.number} · Paperside`}</title>
      <LoadHead detail={shown.detail} judgement={judgement} />
      {isBuilding ? (
        <ScanLine
          view={detail.view}
          last={last}
          place={acts.place}
          waiting={acts.waiting}
          undoable={mayBuild ? detail.undoable : null}
          onClearPlace={clearPlace}
          onKeyIn={keyIn}
          onUndo={() => {
            if (detail.undoable !== null) acts.undo(detail.undoable);
          }}
        />
      ) : (
        <ClosedLoad detail={detail} />
      )}
      <PhonePlace view={detail.view} last={last} />
      {acts.problem !== null && sheet.is === 'none' && (
        <p role="alert" className="bg-madder-1 px-4 py-2 text-row font-semibold text-madder-3">
          {acts.problem}
        </p>
      )}
      <LoadBoard
        detail={shown.detail}
        last={shown.last}
        judgement={judgement}
        mayBuild={mayBuild}
        pickedPackageId={sheet.is === 'package' ? sheet.packageId : null}
        onEdits={acts.applyEdits}
        onSheet={setSheet}
      />
      <LoadSheets
        sheet={sheet}
        detail={shown.detail}
        judgement={judgement}
        acts={acts}
        mayBuild={mayBuild}
        onSheet={setSheet}
      />
    </div>
  );
}
