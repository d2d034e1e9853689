import { useQuery } from '@tanstack/react-query';
import { TextWithCodes } from '../../../components/ui/code';
import { Dialog } from '../../../components/ui/dialog';
import { EmptyState, WaitingState, WrongState } from '../../../components/ui/states';
import { DateText } from '../../../components/ui/time';
import { loadQueries } from '../queries';

/** Everything that happened to a load, the latest first: who, when, what, also what was refused. */
export function HistorySheet({ loadId, number, onClose }: { loadId: string; number: string; onClose: () => void }) {
  const history = useQuery(loadQueries.history(loadId));
  return (
    <Dialog isOpen onClose={onClose} title={`What happened to load ${number}`} size="wide">
      {history.data ? (
        history.data.length === 0 ? (
          <EmptyState title="Nothing yet" level={3} />
        ) : (
          // Reached by Tab, so that a keyboard can scroll it.
          <ol aria-label="What happened" tabIndex={0}>
            {history.data.map((event) => (
              <li
                key={event.id}
                className="grid gap-x-6 border-t border-paper-3 py-2 first:border-t-0 tablet:grid-cols-[minmax(0,1fr)_auto]"
              >
                <p className="[overflow-wrap:anywhere]">
                  <TextWithCodes>{event.sentence}</TextWithCodes>
                </p>
                <p className="text-small text-ink-2">
                  {event.who}, <DateText at={event.at} form="with-time" />
                </p>
              </li>
            ))}
          </ol>
        )
      ) : history.isError ? (
        <WrongState
          title="What happened did not come"
          error={history.error}
          level={3}
          onTryAgain={() => {
            void history.refetch();
          }}
        />
      ) : (
        <WaitingState title="Fetching what happened" waitsFor="The server has not answered yet." level={3} />
      )}
    </Dialog>
  );
}
