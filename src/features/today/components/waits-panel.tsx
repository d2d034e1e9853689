import type { Wait } from '#contract/today';
import type { ReactNode } from 'react';
import { Button } from '../../../components/ui/button';
import { FilmPanel } from '../../../components/ui/film-panel';
import { PanelHead } from '../../../components/ui/heading';
import { LinkButton } from '../../../components/ui/link-button';
import { Moment } from '../../../components/ui/time';
import { useMay } from '../../../lib/session';

type WaitsPanelProps = {
  readonly waits: readonly Wait[];
  /** "as lead" */
  readonly as: string;
  readonly onOpenLoad: (runId: string) => void;
};

/** What waits for the person who looks: one act for each, the first one on top. */
export function WaitsPanel({ waits, as, onOpenLoad }: WaitsPanelProps) {
  const mayPack = useMay('package.pack');

  function act(wait: Wait, isFirst: boolean): ReactNode {
    const kind = isFirst ? 'film' : 'quiet';
    switch (wait.kind) {
      case 'air-removal-missing':
      case 'air-removal-failed':
        return (
          <LinkButton to={`/stock/air-removal?sterilizer=${wait.sterilizerId}`} kind={kind} size="small">
            Record it
          </LinkButton>
        );
      case 'load-building':
      case 'load-closed':
        return (
          <LinkButton to={`/loads/${wait.loadId}`} kind={kind} size="small">
            Open
          </LinkButton>
        );
      case 'run-waiting':
        return (
          <Button
            kind={kind}
            size="small"
            onPress={() => {
              onOpenLoad(wait.runId);
            }}
          >
            Open a load
          </Button>
        );
      case 'packed-not-staged':
        return mayPack ? (
          <LinkButton to="/pack/packages" kind={kind} size="small">
            See them
          </LinkButton>
        ) : null;
    }
  }

  return (
    <FilmPanel labelledBy="waits-for-you" className="px-6 pt-5 pb-4 max-tablet:px-4 tablet:min-h-full">
      <PanelHead
        id="waits-for-you"
        title={waits.length === 0 ? 'Waits for you' : `Waits for you, ${waits.length}`}
        aside={as}
      />
      {waits.length === 0 ? (
        <p className="py-3">Nothing waits for you now.</p>
      ) : (
        <ol>
          {waits.map((wait, index) => (
            <li
              key={`${wait.kind} ${'loadId' in wait ? wait.loadId : 'runId' in wait ? wait.runId : 'sterilizerId' in wait ? wait.sterilizerId : ''}`}
              className="grid min-h-17 grid-cols-[3.75rem_1fr_auto] items-center gap-x-3 max-tablet:grid-cols-[2.75rem_1fr_auto] max-tablet:gap-x-2.5 border-t border-film-2 py-2.5 first:border-t-0"
            >
              <span className="font-label tabular-nums">
                {wait.kind === 'run-waiting' && wait.wantedAt !== null ? <Moment at={wait.wantedAt} /> : 'now'}
              </span>
              <span className="min-w-0">
                <span className="block font-semibold">{wait.title}</span>
                <span className="block text-small text-ink-2">{wait.detail}</span>
              </span>
              {act(wait, index === 0)}
            </li>
          ))}
        </ol>
      )}
    </FilmPanel>
  );
}
