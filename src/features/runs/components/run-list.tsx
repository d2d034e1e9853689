import type { RunSummary } from '#contract/runs';
import { Link } from 'react-router-dom';
import { Icon } from '../../../components/icon';
import { Moment } from '../../../components/ui/time';
import { countOf } from '../../../lib/format';

type RunListProps = {
  readonly runs: readonly RunSummary[];
  readonly chosenId: string | null;
  readonly addressOf: (runId: string) => string;
};

/** The runs that wait, the soonest wanted first. The chosen one lies on film. */
export function RunList({ runs, chosenId, addressOf }: RunListProps) {
  return (
    <nav aria-label="Runs that wait">
      <ul className="border-t border-paper-3">
        {runs.map((run) => (
          <li key={run.id} className="border-b border-paper-3">
            <Link
              to={addressOf(run.id)}
              aria-current={run.id === chosenId ? 'page' : undefined}
              className={`grid min-h-17 grid-cols-[1fr_auto] items-center gap-x-3 py-2.5 pr-3 pl-3.5 text-ink-1 no-underline outline-offset-[-3px] ${run.id === chosenId ? 'bg-film-1 shadow-[inset_4px_0_0_var(--color-film-4)] max-tablet:bg-transparent max-tablet:shadow-none' : 'hover:bg-paper-0'}`}
            >
              <span className="min-w-0">
                <span className="block truncate text-head">{run.name}</span>
                <span className="block truncate text-small text-ink-2">
                  {[run.sterilizer?.name ?? 'Any sterilizer', run.program?.code].filter(Boolean).join(', ')}
                  {run.wantedAt !== null && (
                    <>
                      , for <Moment at={run.wantedAt} />
                    </>
                  )}
                </span>
              </span>
              <span className="text-right">
                <span className="block text-say tabular-nums">{run.packages}</span>
                {run.implants > 0 && (
                  <span className="flex items-center justify-end gap-1 text-least">
                    <Icon name="implant" size={14} />
                    {countOf(run.implants, 'implant')}
                  </span>
                )}
              </span>
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
