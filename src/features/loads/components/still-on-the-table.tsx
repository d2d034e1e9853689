import type { LoadView } from '#domain/load/model';
import { useState } from 'react';
import { KindIcon } from '../../../components/item-kind';
import { Button } from '../../../components/ui/button';
import { Code } from '../../../components/ui/code';
import { PanelHead } from '../../../components/ui/heading';

const shownAtFirst = 5;

type StillOnTheTableProps = {
  readonly view: LoadView;
  readonly onPackage: (packageId: string) => void;
};

/** Listed and not scanned; and what was scanned and has no place yet, which comes first. */
export function StillOnTheTable({ view, onPackage }: StillOnTheTableProps) {
  const [isAll, setIsAll] = useState(false);
  const itemById = new Map(view.items.map((item) => [item.id, item]));
  const unplaced = view.packages.filter((entry) => entry.isScanned && entry.placement === null);
  const unscanned = view.packages.filter((entry) => !entry.isScanned);
  const rows = [...unplaced, ...unscanned];
  const shown = isAll ? rows : rows.slice(0, shownAtFirst);
  if (rows.length === 0) {
    return (
      <section aria-label="Still on the table">
        <PanelHead title="Still on the table" aside="nothing listed is left" />
        <p className="py-1 text-row text-ink-2">
          {view.packages.length === 0
            ? 'Nothing is listed. Scan what goes on the cart.'
            : 'Everything listed is on the cart.'}
        </p>
      </section>
    );
  }
  return (
    <section aria-label="Still on the table">
      <PanelHead
        title={`Still on the table, ${rows.length}`}
        aside={unplaced.length > 0 ? `${unplaced.length} scanned, without a place` : 'listed, not scanned'}
      />
      <ul>
        {shown.map((entry) => {
          const item = itemById.get(entry.itemId);
          return (
            <li key={entry.packageId}>
              <button
                type="button"
                onClick={() => {
                  onPackage(entry.packageId);
                }}
                className="grid min-h-6 w-full grid-cols-[1.25rem_1fr_auto] items-center gap-1.5 py-0.5 text-left text-small hover:bg-paper-0 max-tablet:min-h-11"
              >
                <KindIcon kind={item?.kind ?? 'pouch'} size={15} />
                <span className="truncate">
                  {item?.name}
                  {entry.isScanned && <b className="ml-2 font-label text-straw-3">no place yet</b>}
                </span>
                <Code className="text-ink-2">{entry.code}</Code>
              </button>
            </li>
          );
        })}
      </ul>
      {rows.length > shownAtFirst && (
        <Button
          kind="plain"
          size="small"
          className="-ml-3"
          onPress={() => {
            setIsAll(!isAll);
          }}
        >
          {isAll ? 'Show fewer' : `Show ${rows.length - shownAtFirst} more`}
        </Button>
      )}
    </section>
  );
}
