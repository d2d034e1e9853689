import { paths } from '#contract/paths';
import type { Item } from '#contract/items';
import { itemKinds } from '#domain/catalogue/item-fields';
import { useQuery } from '@tanstack/react-query';
import { ImplantMark, KindIcon, kindInWords } from '../../../components/item-kind';
import { ImportSheet } from '../../../components/stock/import-sheet';
import { ShelfPage } from '../../../components/stock/shelf-page';
import { useShelfAddress } from '../../../components/stock/use-shelf-address';
import { Button } from '../../../components/ui/button';
import { Code } from '../../../components/ui/code';
import { DataTable, type Column } from '../../../components/ui/data-table';
import { SelectField } from '../../../components/ui/select-field';
import { EmptyState } from '../../../components/ui/states';
import { useFacility, type UnitSystem } from '../../../lib/facility';
import { formatMass, formatSize } from '../../../lib/format';
import { useMay } from '../../../lib/session';
import { capital, cyclesInShort } from '../item-words';
import { itemPageSize, itemQueries } from '../queries';
import { ItemForm } from './item-form';
import { ItemPanel } from './item-panel';

const kindOptions = [
  { value: '', label: 'Every kind' },
  ...itemKinds.map((kind) => ({ value: kind, label: capital(kindInWords(kind)) })),
];

function columnsOf(unitSystem: UnitSystem, isBesidePanel: boolean): readonly Column<Item>[] {
  const first: readonly Column<Item>[] = [
    {
      key: 'name',
      header: 'Item',
      sortBy: (item) => item.name,
      cell: (item) => (
        <span className="relative block pl-7.5">
          <KindIcon kind={item.kind} className="absolute top-0.5 left-0 text-ink-2" />
          <span className={item.isRetired ? 'text-ink-2 line-through' : ''}>{item.name}</span>
          {item.isImplant && (
            <span className="inline-block tablet:ml-3">
              <ImplantMark />
            </span>
          )}
        </span>
      ),
    },
    {
      key: 'code',
      header: 'Code',
      sortBy: (item) => item.code,
      cell: (item) => <Code>{item.code}</Code>,
      width: '6.5rem',
    },
  ];
  if (isBesidePanel) return first;
  return [
    ...first,
    {
      key: 'size',
      header: 'Size',
      isWideOnly: true,
      align: 'end',
      sortBy: (item) => item.lengthMm * item.widthMm * item.heightMm,
      cell: (item) => formatSize([item.lengthMm, item.widthMm, item.heightMm], unitSystem),
    },
    {
      key: 'mass',
      header: 'Mass',
      align: 'end',
      sortBy: (item) => item.massKg,
      cell: (item) => formatMass(item.massKg, unitSystem),
    },
    {
      key: 'cycle',
      header: 'Cycle',
      isWideOnly: true,
      sortBy: (item) => cyclesInShort(item.cycleNeeds, unitSystem),
      cell: (item) => cyclesInShort(item.cycleNeeds, unitSystem),
    },
    {
      key: 'service',
      header: 'Used in',
      isWideOnly: true,
      sortBy: (item) => item.service,
      cell: (item) => item.service,
    },
  ];
}

/** The catalogue: what is packed here, each item once for all its packages. */
export function ItemsShelf() {
  const address = useShelfAddress();
  const { unitSystem } = useFacility();
  const mayEdit = useMay('item.edit');
  const list = useQuery(
    itemQueries.list({
      search: address.search,
      kind: address.kind,
      retired: address.isRetiredShown ? 'shown' : 'hidden',
      page: address.page,
    }),
  );
  const items = list.data?.items ?? [];
  const chosen = useQuery({
    ...itemQueries.detail(address.chosenId ?? ''),
    enabled: address.chosenId !== null,
    placeholderData: () => items.find((item) => item.id === address.chosenId),
  });
  const open = address.chosenId === null ? null : (chosen.data ?? null);

  if (address.form === 'new' && mayEdit) return <ItemForm item={null} onLeave={address.leaveForm} />;
  if (address.form === 'change' && mayEdit && chosen.isSuccess && !chosen.isPlaceholderData) {
    return <ItemForm key={chosen.data.id} item={chosen.data} onLeave={address.leaveForm} />;
  }
  return (
    <>
      <ShelfPage
        address={address}
        query={list}
        searchWords="Find an item"
        total={list.data?.total ?? 0}
        pageSize={itemPageSize}
        retiredWords="Retired too"
        exportPath={`${paths.items}/export`}
        mayEdit={mayEdit}
        add={
          mayEdit
            ? {
                words: 'Add an item',
                onPress: () => {
                  address.showForm('new');
                },
              }
            : undefined
        }
        filter={
          <SelectField
            label="Kind"
            isLabelHidden
            options={kindOptions}
            value={address.kind ?? ''}
            onChange={(event) => {
              address.setKind(event.target.value);
            }}
            className="w-48 max-tablet:w-full"
          />
        }
        list={
          <DataTable
            label="Items"
            columns={columnsOf(unitSystem, open !== null)}
            rows={items}
            keyOf={(item) => item.id}
            onOpen={(item) => {
              address.open(item.id);
            }}
            chosenKey={address.chosenId}
            sortedBy={{ key: 'code', isDown: false }}
            empty={
              <EmptyState
                title="No item like that"
                act={
                  <Button kind="quiet" size="small" onPress={address.showAll}>
                    Show all items
                  </Button>
                }
              />
            }
          />
        }
        panel={
          open === null
            ? null
            : {
                id: open.id,
                title: open.name,
                content: (
                  <ItemPanel
                    item={open}
                    onChange={() => {
                      address.showForm('change');
                    }}
                  />
                ),
              }
        }
      />
      {address.isImporting && mayEdit && (
        <ImportSheet
          path={paths.items}
          things="items"
          queryKey={itemQueries.all()}
          onClose={() => {
            address.leaveForm();
          }}
        />
      )}
    </>
  );
}
