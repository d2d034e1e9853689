import type { LoadDetail } from '#contract/loads';
import type { Reckoning, ShelfReckoning } from '#domain/load/reckoning';
import { Icon } from '../../../components/icon';

/** Beside the drawing there is little room: the figures say the rest. */
function shortly({ missing, counted, difference }: ShelfReckoning): string {
  return missing.length > 0 && counted === null ? `${missing.length} not scanned` : difference;
}

function Figure({ value, isOff, word }: { value: number | null; isOff: boolean; word: string }) {
  return (
    <td className={`pl-1 text-right text-[1.125rem] tabular-nums ${isOff ? 'font-bold text-madder-3' : 'font-medium'}`}>
      {value ?? <span className="text-least font-normal text-ink-2">{word}</span>}
    </td>
  );
}

function Row({
  row,
  isActive,
  onChoose,
  onCount,
}: {
  row: ShelfReckoning;
  isActive: boolean;
  onChoose: () => void;
  onCount: (() => void) | null;
}) {
  const isOff = row.counted !== null && row.counted !== row.scanned;
  return (
    <tr className={`h-15 border-t border-paper-3 ${isActive ? 'bg-film-1/70' : ''}`}>
      <th scope="row" className="p-0 text-left font-normal">
        <button
          type="button"
          onClick={onChoose}
          aria-pressed={isActive}
          className="flex min-h-14 w-full flex-col justify-center pl-2.5 text-left"
        >
          <b className="text-row font-semibold">{row.shelfName}</b>
          <span className={`text-least ${isOff ? 'font-label text-madder-3' : 'text-ink-2'}`}>{shortly(row)}</span>
        </button>
      </th>
      <Figure value={row.listed} isOff={false} word="" />
      <Figure value={row.scanned} isOff={isOff} word="" />
      <td className="p-0 text-right">
        {onCount === null ? (
          <span className={`px-2 text-[1.125rem] tabular-nums ${isOff ? 'font-bold text-madder-3' : 'font-medium'}`}>
            {row.counted ?? '–'}
          </span>
        ) : (
          <button
            type="button"
            onClick={onCount}
            aria-label={
              row.counted === null
                ? `Count ${row.shelfName.toLowerCase()}`
                : `${row.shelfName}: counted ${row.counted}. Count again`
            }
            className={`min-h-12 min-w-14 px-2 text-right tabular-nums ${row.counted === null ? 'text-row font-semibold text-film-4 underline underline-offset-3' : isOff ? 'text-[1.125rem] font-bold text-madder-3' : 'text-[1.125rem] font-medium'}`}
          >
            {row.counted ?? 'count'}
          </button>
        )}
      </td>
    </tr>
  );
}

type ReckoningPanelProps = {
  readonly detail: LoadDetail;
  readonly reckoning: Reckoning;
  readonly activeShelfId: string | null;
  readonly onShelf: (shelfId: string) => void;
  /** null where nobody may count any more. */
  readonly onCount: ((shelfId: string) => void) | null;
};

/** The three numbers that must agree: listed, scanned, counted; for every shelf and for the load. */
export function ReckoningPanel({ reckoning, activeShelfId, onShelf, onCount }: ReckoningPanelProps) {
  // As on the drawing beside it: the top shelf first.
  const rows = [...reckoning.shelves].reverse();
  return (
    <table aria-label="Listed, scanned and counted" className="w-full text-row">
      <thead>
        <tr className="h-6 text-least text-ink-2">
          <th scope="col" className="sr-only">
            Shelf
          </th>
          {['listed', 'scanned', 'counted'].map((word) => (
            <th key={word} scope="col" className="w-12 pl-1 text-right text-least font-medium last:w-14 last:pr-2">
              {word}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <Row
            key={row.shelfId}
            row={row}
            isActive={row.shelfId === activeShelfId}
            onChoose={() => {
              onShelf(row.shelfId);
            }}
            onCount={
              onCount &&
              (() => {
                onCount(row.shelfId);
              })
            }
          />
        ))}
        <tr className="h-12 border-t-2 border-ink-1">
          <th scope="row" className="px-2.5 text-left">
            <span className="flex items-center gap-1.5 text-row font-semibold">
              Load
              {reckoning.isEven && <Icon name="tick" size={16} className="text-film-4" />}
            </span>
            <span className="block text-least font-normal text-ink-2">
              {reckoning.missing.length > 0 ? `${reckoning.missing.length} not scanned` : reckoning.difference}
            </span>
          </th>
          <Figure value={reckoning.listed} isOff={reckoning.missing.length > 0} word="" />
          <Figure value={reckoning.scanned} isOff={reckoning.missing.length > 0} word="" />
          <td className="pr-2 text-right text-[1.125rem] font-medium tabular-nums">{reckoning.counted ?? '–'}</td>
        </tr>
      </tbody>
    </table>
  );
}
