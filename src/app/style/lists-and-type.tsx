import { useState } from 'react';
import { DataTable, type Column } from '../../components/ui/data-table';
import { EmptyState } from '../../components/ui/states';
import { PanelHead } from '../../components/ui/heading';
import { SearchField } from '../../components/ui/search-field';
import { Tabs } from '../../components/ui/tabs';
import { iconDrawings } from '../../components/icon-drawings';
import { Icon, type IconName } from '../../components/icon';

type Row = { readonly code: string; readonly name: string; readonly kind: string; readonly massKg: number };

const rows: readonly Row[] = [
  { code: 'P-20433', name: 'Needle holder, 18 cm', kind: 'pouch', massKg: 0.12 },
  { code: 'K-14', name: 'Abdominal set, large', kind: 'rigid container', massKg: 8.4 },
  { code: 'T-205', name: 'Laparotomy set', kind: 'wrapped tray', massKg: 6.9 },
  { code: 'B-09', name: 'Basins, nested', kind: 'basin', massKg: 2.1 },
  { code: 'X-31', name: 'Gowns, surgical', kind: 'textile pack', massKg: 3.2 },
  { code: 'P-20440', name: 'Osteotome, 12 mm', kind: 'pouch', massKg: 0.2 },
];

const columns: readonly Column<Row>[] = [
  { key: 'name', header: 'Item', cell: (row) => row.name, sortBy: (row) => row.name },
  { key: 'code', header: 'Code', cell: (row) => <span className="code">{row.code}</span>, sortBy: (row) => row.code },
  { key: 'kind', header: 'Kind', cell: (row) => row.kind, isWideOnly: true },
  { key: 'mass', header: 'Mass', align: 'end', cell: (row) => `${row.massKg} kg`, sortBy: (row) => row.massKg },
];

export function Lists() {
  const [text, setText] = useState('');
  const [open, setOpen] = useState<string | null>(null);
  const found = rows.filter((row) => `${row.name} ${row.code}`.toLowerCase().includes(text.toLowerCase()));
  return (
    <section className="grid gap-x-10 gap-y-6 desk:grid-cols-2">
      <div>
        <div className="mt-7">
          <PanelHead title={`Catalogue, ${rows.length}`} aside="sorted by any head" />
        </div>
        <SearchField
          label="Find an item"
          value={text}
          onChange={setText}
          result={`${found.length} of ${rows.length}`}
          className="my-2"
        />
        <DataTable
          label="Catalogue"
          columns={columns}
          rows={found}
          keyOf={(row) => row.code}
          onOpen={(row) => {
            setOpen(row.code);
          }}
          chosenKey={open}
          sortedBy={{ key: 'name', isDown: false }}
          visibleRows={4}
          empty={<EmptyState title="Nothing is called that">Write less of the name, or a part of the code.</EmptyState>}
        />
      </div>
      <div>
        <h2 className="mt-7 mb-2.5 text-head">Panels that share a place</h2>
        <Tabs
          label="Shelf or findings"
          tabs={[
            { id: 'shelf', label: 'Shelf 2', panel: <p>26 listed, 17 scanned.</p> },
            { id: 'findings', label: 'Findings, 4', panel: <p>Letters match the pins.</p> },
          ]}
        />
      </div>
    </section>
  );
}

const steps = [
  ['text-place', 'Holder 2, slot 5'],
  ['text-scan', 'Suction tip, 4 mm, bent'],
  ['text-clock tabular-nums', '12:34'],
  ['text-title', 'Tuesday 17 March'],
  ['text-say', 'Paper side left'],
  ['text-head', 'Still on the table, 9'],
  ['text-body', 'Body: its film lies against the film of slot 6.'],
  ['text-row', 'Row: Needle holder, 18 cm'],
  ['text-small', 'Small: listed, not scanned'],
  ['text-least', 'Least: drawn to scale, 580 mm wide'],
] as const;

const swatches = [
  'bg-paper-0',
  'bg-paper-1',
  'bg-paper-2',
  'bg-paper-3',
  'bg-paper-edge',
  'bg-ink-1',
  'bg-ink-2',
  'bg-ink-3',
  'bg-film-0',
  'bg-film-1',
  'bg-film-2',
  'bg-film-3',
  'bg-film-4',
  'bg-film-5',
  'bg-straw-1',
  'bg-straw-2',
  'bg-straw-3',
  'bg-madder-1',
  'bg-madder-3',
  'bg-madder-4',
  'bg-leaf-paper',
  'bg-leaf-film',
] as const;

export function TypeAndColour() {
  return (
    <section>
      <h2 className="mt-7 mb-2.5 text-head">Type, colour, material</h2>
      <div className="grid gap-10 tablet:grid-cols-2">
        <ul className="grid gap-1.5">
          {steps.map(([look, words]) => (
            <li key={look} className={`${look} truncate`}>
              {words}
            </li>
          ))}
        </ul>
        <div>
          <ul className="grid grid-cols-6 gap-1.5 text-least">
            {swatches.map((swatch) => (
              <li key={swatch}>
                <span className={`block h-8 ${swatch} shadow-[inset_0_0_0_1px_var(--color-paper-3)]`} />
                {swatch.slice(3)}
              </li>
            ))}
          </ul>
          <div className="mt-4 grid grid-cols-5 gap-2 text-least">
            <span className="bg-film seal-t shadow-film grid h-20 place-items-center">film</span>
            <span className="bg-film seal-l shadow-film grid h-20 place-items-center">sealed left</span>
            <span className="weld grid h-20 place-items-center">weld</span>
            <span className="hatch-straw h-20" />
            <span className="torn h-20 bg-madder-3" />
          </div>
        </div>
      </div>
      <ul className="mt-6 flex flex-wrap gap-x-5 gap-y-3 text-least text-ink-2">
        {(Object.keys(iconDrawings) as IconName[]).map((name) => (
          <li key={name} className="grid w-13 justify-items-center gap-1">
            <Icon name={name} size={24} className="text-ink-1" />
            {name}
          </li>
        ))}
      </ul>
    </section>
  );
}
