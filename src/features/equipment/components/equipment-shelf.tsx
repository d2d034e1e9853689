import type { ReactNode } from 'react';
import { ImportSheet } from '../../../components/stock/import-sheet';
import { ShelfPage } from '../../../components/stock/shelf-page';
import type { ShelfAddress } from '../../../components/stock/use-shelf-address';
import { Button } from '../../../components/ui/button';
import { DataTable, type Column } from '../../../components/ui/data-table';
import { EmptyState } from '../../../components/ui/states';
import { useMay } from '../../../lib/session';
import { equipmentPageSize, equipmentQueries } from '../queries';

type Row = { readonly id: string };

type EquipmentShelfProps<Thing extends Row> = {
  address: ShelfAddress;
  query: {
    readonly isPending: boolean;
    readonly isError: boolean;
    readonly error: unknown;
    readonly refetch: () => unknown;
  };
  path: string;
  /** "sterilizers" */
  things: string;
  addWords: string;
  searchWords: string;
  retiredWords?: string;
  rows: readonly Thing[];
  total: number;
  columns: (isBesidePanel: boolean) => readonly Column<Thing>[];
  titleOf: (thing: Thing) => string;
  panelOf: (thing: Thing, onChange: () => void) => ReactNode;
  /** In place of the list: for what is open, or for a new one. */
  formOf: (thing: Thing | null, onLeave: (openId?: string) => void) => ReactNode;
};

/** One shelf of equipment: the list, what is open beside it, its form, and the way in and out by file. */
export function EquipmentShelf<Thing extends Row>({
  address,
  query,
  path,
  things,
  addWords,
  searchWords,
  retiredWords,
  rows,
  total,
  columns,
  titleOf,
  panelOf,
  formOf,
}: EquipmentShelfProps<Thing>) {
  const mayEdit = useMay('equipment.edit');
  const open = rows.find((row) => row.id === address.chosenId) ?? null;
  if (address.form === 'new' && mayEdit) return formOf(null, address.leaveForm);
  if (address.form === 'change' && mayEdit && open !== null) return formOf(open, address.leaveForm);
  return (
    <>
      <ShelfPage
        address={address}
        query={query}
        searchWords={searchWords}
        total={total}
        pageSize={equipmentPageSize}
        exportPath={`${path}/export`}
        mayEdit={mayEdit}
        {...(retiredWords === undefined ? {} : { retiredWords })}
        add={
          mayEdit
            ? {
                words: addWords,
                onPress: () => {
                  address.showForm('new');
                },
              }
            : undefined
        }
        list={
          <DataTable
            label={things}
            columns={columns(open !== null)}
            rows={rows}
            keyOf={(row) => row.id}
            onOpen={(row) => {
              address.open(row.id);
            }}
            chosenKey={address.chosenId}
            empty={
              <EmptyState
                title={address.search === '' ? `No ${things} yet` : `No ${things} like that`}
                {...(address.search === ''
                  ? {}
                  : {
                      act: (
                        <Button kind="quiet" size="small" onPress={address.showAll}>
                          Show all {things}
                        </Button>
                      ),
                    })}
              />
            }
          />
        }
        panel={
          open === null
            ? null
            : {
                id: open.id,
                title: titleOf(open),
                content: panelOf(open, () => {
                  address.showForm('change');
                }),
              }
        }
      />
      {address.isImporting && mayEdit && (
        <ImportSheet
          path={path}
          things={things}
          queryKey={equipmentQueries.all()}
          onClose={() => {
            address.leaveForm();
          }}
        />
      )}
    </>
  );
}
