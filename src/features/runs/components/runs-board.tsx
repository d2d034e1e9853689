import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { Button } from '../../../components/ui/button';
import { LinkButton } from '../../../components/ui/link-button';
import { EmptyState, WaitingState, WrongState } from '../../../components/ui/states';
import { useMay } from '../../../lib/session';
import { runQueries } from '../queries';
import { NewRunSheet } from './new-run-sheet';
import { RunList } from './run-list';

type RunsBoardProps = {
  readonly chosenId: string | null;
  readonly boardAddress: string;
  readonly addressOf: (runId: string) => string;
  readonly onChoose: (runId: string) => void;
  /** The chosen run. */
  readonly detailOf: (runId: string) => ReactNode;
};

/** Runs that wait for a sterilizer: choose one, scan into it. */
export function RunsBoard({ chosenId, boardAddress, addressOf, onChoose, detailOf }: RunsBoardProps) {
  const mayStage = useMay('package.stage');
  const runs = useQuery(runQueries.list());
  const [isAdding, setIsAdding] = useState(false);
  const shownId = chosenId ?? runs.data?.[0]?.id ?? null;

  const add = mayStage && (
    <Button
      kind="quiet"
      icon="plus"
      className="w-full"
      onPress={() => {
        setIsAdding(true);
      }}
    >
      New run
    </Button>
  );

  return (
    <div className="grid gap-x-8 gap-y-6 tablet:h-full tablet:min-h-0 tablet:grid-cols-[minmax(15rem,20rem)_minmax(0,1fr)]">
      <div
        className={`grid content-start gap-4 tablet:min-h-0 tablet:overflow-y-auto ${chosenId === null ? '' : 'max-tablet:hidden'}`}
      >
        {runs.data ? (
          runs.data.length === 0 ? (
            <EmptyState title="No run waits">Make one, then scan packages into it.</EmptyState>
          ) : (
            <RunList runs={runs.data} chosenId={shownId} addressOf={addressOf} />
          )
        ) : runs.isError ? (
          <WrongState
            title="The runs did not come"
            error={runs.error}
            onTryAgain={() => {
              void runs.refetch();
            }}
          />
        ) : (
          <WaitingState title="Fetching the runs" waitsFor="The server has not answered yet." lines={6} />
        )}
        {add}
      </div>
      {shownId !== null && (
        <div className={`min-h-0 ${chosenId === null ? 'max-tablet:hidden' : ''}`}>
          {chosenId !== null && (
            <LinkButton to={boardAddress} kind="plain" icon="left" className="mb-2 -ml-3 tablet:hidden">
              All runs
            </LinkButton>
          )}
          {detailOf(shownId)}
        </div>
      )}
      {isAdding && (
        <NewRunSheet
          onClose={() => {
            setIsAdding(false);
          }}
          onAdded={(runId) => {
            setIsAdding(false);
            onChoose(runId);
          }}
        />
      )}
    </div>
  );
}
