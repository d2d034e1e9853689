import { screen, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { DataTable, type Column } from '../../../src/components/ui/data-table';
import { renderPart } from '../../support/render-app';

type Row = { readonly code: string; readonly name: string; readonly massKg: number };

const rows: readonly Row[] = [
  { code: 'K-9', name: 'Basin', massKg: 10 },
  { code: 'K-14', name: 'Abdominal set', massKg: 8.4 },
  { code: 'K-2', name: 'Curette', massKg: 0.2 },
];

const columns: readonly Column<Row>[] = [
  { key: 'name', header: 'Item', cell: (row) => row.name, sortBy: (row) => row.name },
  { key: 'code', header: 'Code', cell: (row) => row.code, sortBy: (row) => row.code },
  { key: 'mass', header: 'Mass', cell: (row) => `${row.massKg} kg`, sortBy: (row) => row.massKg },
];

const common = { label: 'Catalogue', columns, rows, keyOf: (row: Row) => row.code, empty: <p>Nothing yet.</p> };

function names(): string[] {
  return screen
    .getAllByRole('row')
    .slice(1)
    .map((row) => within(row).getAllByRole('cell')[0]?.textContent ?? '');
}

describe('a table', () => {
  it('names itself, its heads and its rows', () => {
    renderPart(<DataTable {...common} />);
    expect(screen.getByRole('table', { name: 'Catalogue' })).toBeVisible();
    expect(screen.getAllByRole('columnheader').map((head) => head.textContent)).toEqual(['Item', 'Code', 'Mass']);
    expect(names()).toEqual(['Basin', 'Abdominal set', 'Curette']);
  });

  it('sorts by a head, both ways, and says which', async () => {
    const { user } = renderPart(<DataTable {...common} />);
    await user.click(screen.getByRole('button', { name: 'Item' }));
    expect(names()).toEqual(['Abdominal set', 'Basin', 'Curette']);
    expect(screen.getByRole('columnheader', { name: 'Item' })).toHaveAttribute('aria-sort', 'ascending');
    await user.click(screen.getByRole('button', { name: 'Item' }));
    expect(names()).toEqual(['Curette', 'Basin', 'Abdominal set']);
    expect(screen.getByRole('columnheader', { name: 'Item' })).toHaveAttribute('aria-sort', 'descending');
    expect(screen.getByRole('columnheader', { name: 'Mass' })).toHaveAttribute('aria-sort', 'none');
  });

  it('sorts figures by size, also those inside a code', async () => {
    const { user } = renderPart(<DataTable {...common} />);
    await user.click(screen.getByRole('button', { name: 'Mass' }));
    expect(names()).toEqual(['Curette', 'Abdominal set', 'Basin']);
    await user.click(screen.getByRole('button', { name: 'Code' }));
    expect(names()).toEqual(['Curette', 'Basin', 'Abdominal set']);
  });

  it('leads on from each row, and its rows are gone through with the arrow keys', async () => {
    const opened = vi.fn<(row: Row) => void>();
    const { user } = renderPart(<DataTable {...common} onOpen={opened} chosenKey="K-14" />);
    const first = screen.getByRole('button', { name: 'Basin' });
    first.focus();
    await user.keyboard('{ArrowDown}');
    expect(screen.getByRole('button', { name: 'Abdominal set', pressed: true })).toHaveFocus();
    await user.keyboard('{End}');
    expect(screen.getByRole('button', { name: 'Curette' })).toHaveFocus();
    await user.keyboard('{ArrowDown}');
    expect(screen.getByRole('button', { name: 'Curette' })).toHaveFocus();
    await user.keyboard('{Home}{Enter}');
    expect(opened.mock.calls.map(([row]) => row.code)).toEqual(['K-9']);
  });

  it('leads to an address where it has one', () => {
    renderPart(<DataTable {...common} linkOf={(row) => `/stock/items/${row.code}`} />);
    expect(screen.getByRole('link', { name: 'Curette' })).toHaveAttribute('href', '/stock/items/K-2');
  });

  it('says what is missing when there are no rows', () => {
    renderPart(<DataTable {...common} rows={[]} />);
    expect(screen.getByText('Nothing yet.')).toBeVisible();
    expect(screen.queryByRole('table')).toBeNull();
  });

  it('that is cut can be scrolled by keyboard', () => {
    renderPart(<DataTable {...common} visibleRows={2} />);
    expect(screen.getByRole('region', { name: 'Catalogue' })).toHaveAttribute('tabindex', '0');
  });
});
