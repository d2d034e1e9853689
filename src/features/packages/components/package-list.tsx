import type { PackageSummary } from '#contract/packages';
import { packagesPerPage } from '#contract/packages';
import { paths } from '#contract/paths';
import { useQuery } from '@tanstack/react-query';
import { useDeferredValue, useState } from 'react';
import { Icon } from '../../../components/icon';
import { KindIcon } from '../../../components/item-kind';
import { ImportSheet } from '../../../components/stock/import-sheet';
import { Button } from '../../../components/ui/button';
import { Code } from '../../../components/ui/code';
import { DataTable, type Column } from '../../../components/ui/data-table';
import { SearchField } from '../../../components/ui/search-field';
import { SelectField } from '../../../components/ui/select-field';
import { EmptyState, WaitingState, WrongState } from '../../../components/ui/states';
import { Moment } from '../../../components/ui/time';
import { useMay } from '../../../lib/session';
import { packageStateWords, troubleWith } from '../package-words';
import { packageQueries } from '../queries';

/** The state and what speaks against the package, never by colour alone. */
export function StateWords({ one }: { one: PackageSummary }) {
  const trouble = troubleWith(one);
  if (trouble === null) return <>{packageStateWords[one.state]}</>;
  return (
    <span className="inline-flex items-center gap-1.5 font-label text-madder-3">
      <Icon name="warn" size={16} />
      {trouble}
    </span>
  );
}

function WhereIs({ one }: { one: PackageSummary }) {
  if (one.openLoad !== null) return <>Load {one.openLoad.number}</>;
  return <>{one.state === 'staged' ? (one.run?.name ?? '') : ''}</>;
}

const columns: readonly Column<PackageSummary>[] = [
  {
    key: 'item',
    header: 'Package',
    cell: (one) => (
      <span className="flex items-center gap-2.5">
        <KindIcon kind={one.item.kind} className="text-ink-2" />
        <span className="min-w-0">
          <span className="font-semibold">{one.item.name}</span>
          {one.item.isImplant && (
            <>
              <Icon name="implant" size={15} className="ml-1.5 text-ink-1" />
              <span className="sr-only">, implant</span>
            </>
          )}
          <Code className="block text-small text-ink-2 tablet:hidden">{one.code}</Code>
        </span>
      </span>
    ),
  },
  { key: 'code', header: 'Code', isWideOnly: true, width: '9.5rem', cell: (one) => <Code>{one.code}</Code> },
  { key: 'state', header: 'Now', width: '11rem', cell: (one) => <StateWords one={one} /> },
  { key: 'where', header: 'Waits in', isWideOnly: true, cell: (one) => <WhereIs one={one} /> },
  { key: 'goes', header: 'Goes to', isWideOnly: true, width: '8rem', cell: (one) => one.destination },
  {
    key: 'packed',
    header: 'Packed',
    isWideOnly: true,
    width: '18rem',
    cell: (one) => (
      <>
        <span className="mr-2 whitespace-nowrap">
          <Moment at={one.packedAt} />
        </span>
        <span className="whitespace-nowrap text-ink-2">{one.packedBy}</span>
      </>
    ),
  },
];

const stateChoices = [
  { value: '', label: 'Everything' },
  ...(['packed', 'staged', 'in-load', 'sterile', 'recalled'] as const).map((state) => ({
    value: state,
    label: packageStateWords[state],
  })),
];

type StateChoice = '' | 'packed' | 'staged' | 'in-load' | 'sterile' | 'recalled';

type PackageListProps = { readonly onOpen: (one: PackageSummary) => void };

/** Every package of this place, the latest packed first. */
export function PackageList({ onOpen }: PackageListProps) {
  const [search, setSearch] = useState('');
  const [state, setState] = useState<StateChoice>('packed');
  const [page, setPage] = useState(1);
  const looked = useDeferredValue(search.trim());
  const packages = useQuery(packageQueries.list({ search: looked, state: state === '' ? null : state, page }));
  const [isImporting, setIsImporting] = useState(false);
  const mayPack = useMay('package.pack');
  const pages = Math.max(1, Math.ceil((packages.data?.total ?? 0) / packagesPerPage));

  return (
    <section aria-label="Packages" className="grid gap-4">
      <div className="grid items-end gap-3 tablet:grid-cols-[minmax(0,26rem)_12rem_auto]">
        <SearchField
          label="Find by code, item or room"
          value={search}
          onChange={(text) => {
            setSearch(text);
            setPage(1);
          }}
          {...(packages.data ? { result: `${packages.data.total}` } : {})}
        />
        <SelectField
          label="State"
          isLabelHidden
          options={stateChoices}
          value={state}
          onChange={(event) => {
            const chosen = stateChoices.find((choice) => choice.value === event.target.value);
            setState((chosen?.value ?? '') as StateChoice);
            setPage(1);
          }}
        />
        {mayPack && (
          <Button
            kind="plain"
            icon="file"
            className="justify-self-start"
            onPress={() => {
              setIsImporting(true);
            }}
          >
            From a file
          </Button>
        )}
      </div>
      {isImporting && (
        <ImportSheet
          path={paths.packages}
          things="packages"
          queryKey={packageQueries.all()}
          onClose={() => {
            setIsImporting(false);
          }}
        />
      )}
      {packages.data ? (
        <DataTable
          label="Packages"
          columns={columns}
          rows={packages.data.packages}
          keyOf={(one) => one.id}
          onOpen={onOpen}
          empty={
            looked === '' && state === 'packed' ? (
              <EmptyState title="Nothing is packed and free">What is packed next will stand here.</EmptyState>
            ) : (
              <EmptyState title="No package answers to that">Look for a part of the code or the name.</EmptyState>
            )
          }
        />
      ) : packages.isError ? (
        <WrongState
          title="The packages did not come"
          error={packages.error}
          onTryAgain={() => {
            void packages.refetch();
          }}
        />
      ) : (
        <WaitingState title="Fetching the packages" waitsFor="The server has not answered yet." lines={6} />
      )}
      {pages > 1 && (
        <nav aria-label="Pages" className="flex items-center gap-3">
          <Button
            kind="quiet"
            icon="left"
            blockedBecause={page === 1 ? 'This is the first page.' : undefined}
            onPress={() => {
              setPage(page - 1);
            }}
          >
            Later
          </Button>
          <span aria-current="page">
            Page {page} of {pages}
          </span>
          <Button
            kind="quiet"
            iconAfter="right"
            blockedBecause={page >= pages ? 'This is the last page.' : undefined}
            onPress={() => {
              setPage(page + 1);
            }}
          >
            Earlier
          </Button>
        </nav>
      )}
    </section>
  );
}
