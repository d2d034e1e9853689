import type { LoadDetail } from '#contract/loads';
import { Icon } from '../../../components/icon';
import { Code } from '../../../components/ui/code';
import { FilmPanel } from '../../../components/ui/film-panel';
import { LinkButton } from '../../../components/ui/link-button';
import { Moment } from '../../../components/ui/time';
import { countOf } from '../../../lib/format';

/** In place of the scan line, once a load is closed or given up. */
export function ClosedLoad({ detail }: { detail: LoadDetail }) {
  const { summary, closing } = detail;
  if (summary.state === 'abandoned') {
    return (
      <section className="flex min-h-29 items-center gap-4 bg-paper-2 px-4">
        <Icon name="out" size={34} />
        <p className="text-say">This load was given up. Its packages wait again where they waited before.</p>
      </section>
    );
  }
  return (
    <FilmPanel
      label="Closed"
      className="flex min-h-29 items-center gap-4 px-4 max-tablet:grid max-tablet:grid-cols-[auto_minmax(0,1fr)] max-tablet:py-3"
    >
      <div className="weld grid h-22 w-16 flex-none place-items-center content-center gap-1.5 text-small font-label">
        <Icon name="tick" size={34} />
        Closed
      </div>
      <div className="min-w-0">
        <p className="text-small text-ink-2">
          {summary.closedAt !== null && <Moment at={summary.closedAt} />} by {summary.closedBy}
        </p>
        <p className="text-scan max-tablet:text-say">
          {countOf(summary.scanned, 'package')}, all listed, scanned and counted
        </p>
        {closing && (
          <p className="truncate text-small text-ink-2">
            Policy version {detail.policyNumber}
            <span className="mx-2" />
            Rule set {closing.ruleSet}
            <span className="mx-2" />
            Contents <Code>{closing.digest.slice(0, 16)}</Code>
          </p>
        )}
      </div>
      <LinkButton
        kind="quiet"
        to={`/loads/${summary.id}/judged-again`}
        className="ml-auto flex-none max-tablet:col-span-2 max-tablet:ml-0"
      >
        Judge it again
      </LinkButton>
    </FilmPanel>
  );
}
