import { useId, useRef, useState, type KeyboardEvent, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { Icon } from '../icon';

export type Column<Row> = {
  readonly key: string;
  readonly header: string;
  readonly cell: (row: Row) => ReactNode;
  /** Makes the column sortable; numbers sort by size, text by the alphabet with its numbers by size. */
  readonly sortBy?: (row: Row) => string | number;
  readonly align?: 'start' | 'end';
  /** Left out where the screen is narrow. */
  readonly isWideOnly?: boolean;
  /** Any CSS width. */
  readonly width?: string;
};

type Sort = { readonly key: string; readonly isDown: boolean };

export type DataTableProps<Row> = {
  /** Says what the table lists; read by screen readers. */
  label: string;
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  keyOf: (row: Row) => string;
  /** Where a row leads: the whole row is the target, the first cell holds the link. */
  linkOf?: (row: Row) => string;
  /** Or what a row does. */
  onOpen?: (row: Row) => void;
  /** Marks the row that is open beside the table. */
  chosenKey?: string | null;
  /** In place of the rows when there are none. */
  empty: ReactNode;
  sortedBy?: Sort;
  /** Scrolls inside this many rows and keeps most of another showing, so that nobody takes the cut for the end. */
  visibleRows?: number;
};

const collator = new Intl.Collator('en', { numeric: true, sensitivity: 'base' });

function compare(left: string | number, right: string | number): number {
  return typeof left === 'number' && typeof right === 'number'
    ? left - right
    : collator.compare(String(left), String(right));
}

function sorted<Row>(rows: readonly Row[], columns: readonly Column<Row>[], sort: Sort | null): readonly Row[] {
  const sortBy = columns.find((column) => column.key === sort?.key)?.sortBy;
  if (sort === null || sortBy === undefined) return rows;
  const direction = sort.isDown ? -1 : 1;
  return rows.toSorted((left, right) => direction * compare(sortBy(left), sortBy(right)));
}

const rowHeightRem = 3;

/** Arrow keys go from row to row; Home and End to the ends. */
function moveFocus(event: KeyboardEvent<HTMLElement>) {
  if (!['ArrowDown', 'ArrowUp', 'Home', 'End'].includes(event.key)) return;
  const targets = [...event.currentTarget.querySelectorAll<HTMLElement>('[data-row-target]')];
  const at = targets.findIndex((target) => target === document.activeElement);
  if (at === -1) return;
  const next = { ArrowDown: at + 1, ArrowUp: at - 1, Home: 0, End: targets.length - 1 }[event.key] ?? at;
  event.preventDefault();
  targets[next]?.focus();
}

/** A list with columns. Hairlines between rows, no box; the whole row leads on. */
export function DataTable<Row>({
  label,
  columns,
  rows,
  keyOf,
  linkOf,
  onOpen,
  chosenKey,
  empty,
  sortedBy,
  visibleRows,
}: DataTableProps<Row>) {
  const [sort, setSort] = useState<Sort | null>(sortedBy ?? null);
  const headId = useId();
  const body = useRef<HTMLTableSectionElement>(null);
  if (rows.length === 0) return <>{empty}</>;
  const isCut = visibleRows !== undefined && rows.length > visibleRows;
  const isTarget = linkOf !== undefined || onOpen !== undefined;

  function first(row: Row, content: ReactNode): ReactNode {
    // The after-element stretches the one link or button over the whole row.
    const look =
      'text-left text-inherit no-underline font-semibold after:absolute after:inset-0 focus-visible:outline-none focus-visible:after:outline-3 focus-visible:after:-outline-offset-3 focus-visible:after:outline-ink-1';
    if (linkOf)
      return (
        <Link to={linkOf(row)} data-row-target="" className={look}>
          {content}
        </Link>
      );
    if (onOpen)
      return (
        <button
          type="button"
          data-row-target=""
          className={look}
          aria-pressed={chosenKey === undefined ? undefined : keyOf(row) === chosenKey}
          onClick={() => {
            onOpen(row);
          }}
        >
          {content}
        </button>
      );
    return <span className="font-semibold">{content}</span>;
  }

  return (
    <div
      className="overflow-auto"
      {...(isCut
        ? {
            // A region that scrolls has to be within reach of the keyboard.
            tabIndex: 0,
            role: 'region',
            'aria-label': label,
            style: { maxHeight: `${(visibleRows + 0.66) * rowHeightRem + 2.25}rem` },
          }
        : {})}
    >
      <table aria-label={label} className="text-row">
        <thead className="sticky top-0 z-10 bg-paper-1">
          <tr>
            {columns.map((column) => (
              <HeaderCell
                key={column.key}
                id={`${headId}-${column.key}`}
                column={column}
                sort={sort}
                onSort={() => {
                  setSort({ key: column.key, isDown: sort?.key === column.key && !sort.isDown });
                }}
              />
            ))}
          </tr>
        </thead>
        <tbody ref={body} onKeyDown={moveFocus}>
          {sorted(rows, columns, sort).map((row) => {
            const key = keyOf(row);
            const isChosen = key === chosenKey;
            return (
              <tr
                key={key}
                className={`relative h-12 border-t border-paper-3 ${isTarget ? 'hover:bg-paper-0' : ''} ${isChosen ? 'bg-film-0 shadow-[inset_4px_0_0_var(--color-film-4)]' : ''}`}
              >
                {columns.map((column, index) => (
                  <td key={column.key} className={cellLook(column, index === 0)}>
                    {index === 0 ? first(row, column.cell(row)) : column.cell(row)}
                  </td>
                ))}
              </tr>
            );
          })}
        </tbody>
      </table>
    </div>
  );
}

function cellLook<Row>(column: Column<Row>, isFirst: boolean): string {
  return [
    'py-1.5 pr-4 last:pr-0 align-middle',
    isFirst ? 'pl-2.5' : '',
    column.align === 'end' ? 'text-right tabular-nums' : '',
    column.isWideOnly === true ? 'max-tablet:hidden' : '',
  ].join(' ');
}

function HeaderCell<Row>({
  id,
  column,
  sort,
  onSort,
}: {
  id: string;
  column: Column<Row>;
  sort: Sort | null;
  onSort: () => void;
}) {
  const isSorted = sort?.key === column.key;
  const look = `h-9 text-small text-ink-2 font-medium ${cellLook(column, false)} first:pl-2.5`;
  if (column.sortBy === undefined)
    return (
      <th id={id} scope="col" className={look} style={{ width: column.width }}>
        {column.header}
      </th>
    );
  return (
    <th
      id={id}
      scope="col"
      className={look}
      style={{ width: column.width }}
      aria-sort={isSorted ? (sort.isDown ? 'descending' : 'ascending') : 'none'}
    >
      <button
        type="button"
        onClick={onSort}
        className={`-my-1 inline-flex min-h-11 items-center gap-1 font-medium hover:text-ink-1 ${column.align === 'end' ? 'flex-row-reverse' : ''} ${isSorted ? 'font-label text-ink-1' : ''}`}
      >
        {column.header}
        <Icon name={isSorted && sort.isDown ? 'down' : 'up'} size={14} className={isSorted ? '' : 'opacity-0'} />
      </button>
    </th>
  );
}
