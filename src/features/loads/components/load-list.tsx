import type { LoadSummary } from '#contract/loads';
import { loadStateWords } from '#domain/load/state-machine';
import { useSuspenseInfiniteQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Button } from '../../../components/ui/button';
import { Code } from '../../../components/ui/code';
import { DataTable, type Column } from '../../../components/ui/data-table';
import { PageHead } from '../../../components/ui/heading';
import { EmptyState } from '../../../components/ui/states';
import { SegmentedChoice } from '../../../components/ui/segmented-choice';
import { Moment } from '../../../components/ui/time';
import { sentenceOf } from '../../../lib/errors';
import { useMay } from '../../../lib/session';
import { loadQueries } from '../queries';
import { OpenLoadSheet } from './open-load-sheet';

const columns: readonly Column<LoadSummary>[] = [
  {
    key: 'number',
    header: 'Load',
    cell: (load) => <Code className="font-semibold">{load.number}</Code>,
    sortBy: (load) => load.number,
  },
  { key: 'state', header: 'Now', cell: (load) => loadStateWords[load.state], sortBy: (load) => load.state },
  {
    key: 'sterilizer',
    header: 'Sterilizer',
    cell: (load) => load.sterilizer.name,
    sortBy: (load) => load.sterilizer.name,
    isWideOnly: true,
  },
  { key: 'program', header: 'Program', cell: (load) => load.program.code, isWideOnly: true },
  { key: 'cart', header: 'Cart', cell: (load) => load.cart.name, isWideOnly: true },
  {
    key: 'scanned',
    header: 'Scanned',
    cell: (load) => `${load.scanned} of ${load.listed}`,
    align: 'end',
    sortBy: (load) => load.scanned,
  },
  {
    key: 'opened',
    header: 'Opened',
    cell: (load) => <Moment at={load.openedAt} />,
    sortBy: (load) => load.openedAt,
    isWideOnly: true,
  },
  { key: 'by', header: 'By', cell: (load) => load.openedBy, isWideOnly: true },
];

/** Every load of this place, the open ones first; and the way to open another. */
export function LoadList() {
  const [state, setState] = useState<'open' | 'closed' | 'all'>('open');
  const [isOpening, setIsOpening] = useState(false);
  const { data, hasNextPage, isFetchingNextPage, isFetchNextPageError, error, fetchNextPage } =
    useSuspenseInfiniteQuery(loadQueries.list(state));
  const loads = data.pages.flatMap((page) => page.loads);
  const mayOpen = useMay('load.open');
  const open = mayOpen && (
    <Button
      icon="plus"
      onPress={() => {
        setIsOpening(true);
      }}
    >
      Open a load
    </Button>
  );
  return (
    <div className="grid gap-5 px-6 py-5 max-tablet:px-4">
      <title>Loads · Paperside</title>
      <PageHead title="Loads" facts="What is on a cart now, and what went before" aside={open} />
      <SegmentedChoice
        label="Which loads"
        value={state}
        onChange={setState}
        options={[
          { value: 'open', label: 'Being built' },
          { value: 'closed', label: 'Closed' },
          { value: 'all', label: 'All' },
        ]}
      />
      <DataTable
        label="Loads"
        columns={columns}
        rows={loads}
        keyOf={(load) => load.id}
        linkOf={(load) => `/loads/${load.id}`}
        empty={
          <EmptyState title={state === 'open' ? 'No cart is being loaded' : 'No loads yet'} act={open || undefined}>
            {state === 'open'
              ? 'Open a load on a sterilizer, a cart and a program; then scan.'
              : 'Loads appear here once they are closed.'}
          </EmptyState>
        }
      />
      {hasNextPage && (
        <div className="flex flex-wrap items-center gap-4">
          <Button
            kind="quiet"
            onPress={() => {
              void fetchNextPage();
            }}
            waitingWords={isFetchingNextPage ? 'Fetching them' : undefined}
          >
            Show older loads
          </Button>
          <p role="alert" className="text-row font-semibold text-madder-3">
            {isFetchNextPageError ? sentenceOf(error) : ''}
          </p>
        </div>
      )}
      {isOpening && (
        <OpenLoadSheet
          onClose={() => {
            setIsOpening(false);
          }}
        />
      )}
    </div>
  );
}
