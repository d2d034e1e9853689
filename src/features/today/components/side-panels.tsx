import type { RunSummary } from '#contract/runs';
import type { TodayCart } from '#contract/today';
import { Link } from 'react-router-dom';
import { Icon } from '../../../components/icon';
import { PanelHead } from '../../../components/ui/heading';
import { Moment } from '../../../components/ui/time';
import { countOf } from '../../../lib/format';

function standsOn({ load, isUsable, note }: TodayCart): string {
  if (!isUsable) return 'Not to be used';
  if (load === null) return note === '' ? 'Empty' : `Empty. ${note}`;
  switch (load.state) {
    case 'building':
      return `Loading, ${load.scanned} of ${load.listed} scanned`;
    case 'closed':
      return 'Closed, waits for its sterilizer';
    case 'cooling':
      return 'Cooling';
    default:
      return 'In the sterilizer';
  }
}

function isPlainlyEmpty({ load, isUsable, note }: TodayCart): boolean {
  return load === null && isUsable && note === '';
}

const rowLook =
  'grid min-h-11 grid-cols-[5.25rem_1fr_auto] items-baseline gap-x-3 border-t border-paper-3 py-2.5 first:border-t-0';

/** Where each cart is and what stands on it; the empty ones share a line. */
export function CartsPanel({ carts }: { carts: readonly TodayCart[] }) {
  const told = carts.filter((cart) => !isPlainlyEmpty(cart));
  const empty = carts.filter(isPlainlyEmpty);
  const busy = carts.filter((cart) => cart.load !== null).length;
  return (
    <section aria-label="Carts">
      <PanelHead title="Carts" aside={`${busy} of ${carts.length} in use`} />
      {carts.length === 0 ? (
        <p className="py-2">No cart is on file yet.</p>
      ) : (
        <ul>
          {told.map((cart) => (
            <li key={cart.id} className={rowLook}>
              <b className="truncate font-label">{cart.name}</b>
              <span className="min-w-0">
                {standsOn(cart)}
                {!cart.isUsable && cart.note !== '' && <span className="block text-small text-ink-2">{cart.note}</span>}
                {cart.load?.state === 'building' && (
                  <span className="block text-small text-ink-2">{cart.load.openedBy}</span>
                )}
              </span>
              {cart.load !== null && (
                <Link to={`/loads/${cart.load.id}`} className="code text-right">
                  {cart.load.number}
                </Link>
              )}
            </li>
          ))}
          {empty.length > 0 && (
            <li className={rowLook}>
              <b className="font-label">Empty</b>
              <span className="col-span-2">{empty.map((cart) => cart.name).join(', ')}</span>
            </li>
          )}
        </ul>
      )}
    </section>
  );
}

type RunsPanelProps = { readonly runs: readonly RunSummary[]; readonly isLinked: boolean };

/** Runs by the hour they are wanted for. */
export function AskedForNext({ runs, isLinked }: RunsPanelProps) {
  return (
    <section aria-label="Asked for next">
      <PanelHead title="Asked for next" aside={countOf(runs.length, 'run')} />
      {runs.length === 0 ? (
        <p className="py-2">No run waits.</p>
      ) : (
        <ul>
          {runs.map((run) => (
            <li key={run.id} className={rowLook}>
              <b className="font-label tabular-nums">
                {run.wantedAt === null ? 'no hour' : <Moment at={run.wantedAt} />}
              </b>
              <span className="min-w-0">
                {isLinked ? (
                  <Link to={`/pack/runs/${run.id}`} className="block truncate text-ink-1">
                    {run.name}
                  </Link>
                ) : (
                  <span className="block truncate">{run.name}</span>
                )}
                <span className="block truncate text-small text-ink-2">
                  {[run.sterilizer?.name ?? 'Any sterilizer', run.program?.code].filter(Boolean).join(', ')}
                </span>
              </span>
              <span className="text-right whitespace-nowrap">
                {countOf(run.packages, 'package')}
                {run.implants > 0 && (
                  <span className="flex items-center justify-end gap-1 text-small">
                    <Icon name="implant" size={14} />
                    {countOf(run.implants, 'implant')}
                  </span>
                )}
              </span>
            </li>
          ))}
        </ul>
      )}
    </section>
  );
}
