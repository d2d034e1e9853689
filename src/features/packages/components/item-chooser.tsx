import type { Item } from '#contract/items';
import { useQuery } from '@tanstack/react-query';
import { useDeferredValue, useState } from 'react';
import { Icon } from '../../../components/icon';
import { KindIcon } from '../../../components/item-kind';
import { Code } from '../../../components/ui/code';
import { DataTable, type Column } from '../../../components/ui/data-table';
import { SearchField } from '../../../components/ui/search-field';
import { EmptyState, WaitingState, WrongState } from '../../../components/ui/states';
import { packageQueries } from '../queries';

const columns: readonly Column<Item>[] = [
  {
    key: 'name',
    header: 'Item',
    sortBy: (item) => item.name,
    cell: (item) => (
      <span className="flex items-center gap-2.5 font-semibold">
        <KindIcon kind={item.kind} className="text-ink-2" />
        <span className="min-w-0">
          {item.name}
          {item.isImplant && <Icon name="implant" size={15} className="ml-1.5 text-ink-1" />}
          {item.isImplant && <span className="sr-only">, implant</span>}
        </span>
      </span>
    ),
  },
  {
    key: 'code',
    header: 'Code',
    width: '5rem',
    sortBy: (item) => item.code,
    cell: (item) => <Code>{item.code}</Code>,
  },
];

type ItemChooserProps = {
  readonly chosenId: string | null;
  readonly onChoose: (item: Item) => void;
};

/** The catalogue as a list to choose from, narrowed by typing. A scan goes past the field, to the station. */
export function ItemChooser({ chosenId, onChoose }: ItemChooserProps) {
  const [search, setSearch] = useState('');
  const looked = useDeferredValue(search.trim());
  const items = useQuery(packageQueries.items(looked));

  return (
    <section aria-label="Choose an item" className="flex min-h-0 flex-col gap-2">
      <SearchField
        label="Find an item"
        value={search}
        onChange={setSearch}
        {...(items.data ? { result: `${items.data.total}` } : {})}
      />
      <div className="min-h-0 flex-1 tablet:overflow-y-auto">
        {items.data ? (
          <DataTable
            label="Items that can be packed"
            columns={columns}
            rows={items.data.items}
            keyOf={(item) => item.id}
            chosenKey={chosenId}
            onOpen={onChoose}
            sortedBy={{ key: 'code', isDown: false }}
            empty={
              looked === '' ? (
                <EmptyState title="The catalogue is empty">Add the first item under Stock.</EmptyState>
              ) : (
                <EmptyState title="No item is called that">Look for a part of its name, or for its code.</EmptyState>
              )
            }
          />
        ) : items.isError ? (
          <WrongState
            title="The catalogue did not come"
            error={items.error}
            onTryAgain={() => {
              void items.refetch();
            }}
          />
        ) : (
          <WaitingState title="Fetching the catalogue" waitsFor="The server has not answered yet." lines={6} />
        )}
      </div>
    </section>
  );
}
