import { useEffect, useRef, type ReactNode } from 'react';
import { Button } from '../ui/button';
import { CheckboxField } from '../ui/checkbox-field';
import { FileLink } from '../ui/file-link';
import { FilmPanel } from '../ui/film-panel';
import { SearchField } from '../ui/search-field';
import { WaitingState, WrongState } from '../ui/states';
import type { ShelfAddress } from './use-shelf-address';

type ListQuery = {
  readonly isPending: boolean;
  readonly isError: boolean;
  readonly error: unknown;
  readonly refetch: () => unknown;
};

type ShelfPageProps = {
  address: ShelfAddress;
  query: ListQuery;
  /** "Find an item" */
  searchWords: string;
  /** How many there are in all, under this search. */
  total: number;
  pageSize: number;
  /** Words for the box that shows what is no longer used; without them there is no such box. */
  retiredWords?: string;
  filter?: ReactNode;
  /** What can be added here: words and act. Left out for who may not. */
  add?: { readonly words: string; readonly onPress: () => void } | undefined;
  /** Address of the file that goes out. */
  exportPath: string;
  mayEdit: boolean;
  list: ReactNode;
  /** What is open, beside the list or, on the phone, in its place. */
  panel: { readonly id: string; readonly title: string; readonly content: ReactNode } | null;
};

/** A list of the stock: search, what can be done, rows, and what is open beside them. */
export function ShelfPage(props: ShelfPageProps) {
  const { address, query, total, pageSize, panel, list } = props;
  return (
    <div className="grid gap-4 px-6 py-5 max-tablet:px-4">
      <div className={panel === null ? '' : 'max-tablet:hidden'}>
        <ShelfBar {...props} />
      </div>
      <div className={panel === null ? '' : 'grid gap-9 tablet:grid-cols-[minmax(0,1fr)_22rem]'}>
        <div className={panel === null ? '' : 'max-tablet:hidden'}>
          {query.isPending ? (
            <WaitingState title="Fetching the list" waitsFor="The server has not answered yet." />
          ) : query.isError ? (
            <WrongState
              title="The list could not be shown"
              error={query.error}
              onTryAgain={() => {
                void query.refetch();
              }}
            />
          ) : (
            <>
              {list}
              <Pages page={address.page} pageSize={pageSize} total={total} onPage={address.setPage} />
            </>
          )}
        </div>
        {panel !== null && (
          <OpenPanel
            key={panel.id}
            title={panel.title}
            onClose={() => {
              address.open(null);
            }}
          >
            {panel.content}
          </OpenPanel>
        )}
      </div>
    </div>
  );
}

function ShelfBar({ address, searchWords, total, retiredWords, filter, add, exportPath, mayEdit }: ShelfPageProps) {
  return (
    <div className="flex flex-wrap items-end gap-x-3 gap-y-2">
      <SearchField
        label={searchWords}
        value={address.search}
        onChange={address.setSearch}
        result={String(total)}
        className="min-w-60 flex-1"
      />
      {filter}
      {retiredWords !== undefined && (
        <CheckboxField
          label={retiredWords}
          checked={address.isRetiredShown}
          onChange={(event) => {
            address.setRetiredShown(event.target.checked);
          }}
        />
      )}
      <span className="ml-auto flex flex-wrap items-center gap-1">
        <FileLink to={exportPath} how="save" kind="plain" className="max-tablet:hidden">
          Save as CSV
        </FileLink>
        {mayEdit && (
          <Button
            kind="plain"
            className="max-tablet:hidden"
            onPress={() => {
              address.showForm('import');
            }}
          >
            Import a CSV
          </Button>
        )}
        {add !== undefined && (
          <Button icon="plus" onPress={add.onPress}>
            {add.words}
          </Button>
        )}
      </span>
    </div>
  );
}

function Pages({
  page,
  pageSize,
  total,
  onPage,
}: {
  page: number;
  pageSize: number;
  total: number;
  onPage: (page: number) => void;
}) {
  const pages = Math.max(1, Math.ceil(total / pageSize));
  if (pages === 1 && page === 1) return null;
  return (
    <nav aria-label="Pages of the list" className="mt-3 flex items-center gap-3">
      <Button
        kind="quiet"
        size="small"
        icon="left"
        onPress={() => {
          onPage(page - 1);
        }}
        blockedBecause={page === 1 ? 'This is the first page.' : undefined}
      >
        Before
      </Button>
      <span aria-live="polite" className="text-row text-ink-2 tabular-nums">
        Page {page} of {pages}
      </span>
      <Button
        kind="quiet"
        size="small"
        iconAfter="right"
        onPress={() => {
          onPage(page + 1);
        }}
        blockedBecause={page >= pages ? 'This is the last page.' : undefined}
      >
        Next
      </Button>
    </nav>
  );
}

function OpenPanel({ title, onClose, children }: { title: string; onClose: () => void; children: ReactNode }) {
  const head = useRef<HTMLHeadingElement>(null);
  useEffect(() => {
    // Whoever pressed a row comes back to it when this closes.
    const before = document.activeElement;
    head.current?.focus();
    return () => {
      if (before instanceof HTMLElement) before.focus();
    };
  }, []);
  return (
    <FilmPanel
      seal="left"
      label={title}
      className="self-start px-6 py-5 max-tablet:-mx-4 tablet:sticky tablet:top-5 tablet:max-h-[calc(100dvh-2.5rem)] tablet:overflow-auto"
    >
      <div className="mb-3 flex items-start justify-between gap-3">
        <h2 ref={head} tabIndex={-1} className="text-say outline-none [overflow-wrap:anywhere]">
          {title}
        </h2>
        <Button kind="plain" size="small" className="-mt-1.5 -mr-3" onPress={onClose}>
          Close
        </Button>
      </div>
      {children}
    </FilmPanel>
  );
}
