import { isRouteErrorResponse, useRouteError } from 'react-router-dom';
import { LinkButton } from '../components/ui/link-button';
import { WrongState } from '../components/ui/states';
import { isProblem, NoLineError, sentenceOf } from '../lib/errors';
import { NotFound } from './not-found';

/** Whatever a screen threw: what it means, and two ways on. */
export function RouteError() {
  const error = useRouteError();
  if ((isRouteErrorResponse(error) && error.status === 404) || (isProblem(error) && error.httpStatus === 404)) {
    return <NotFound sentence={isProblem(error) ? error.sentence : undefined} />;
  }
  return (
    <div className="max-w-150 p-6">
      <title>Something went wrong · Paperside</title>
      <WrongState
        title={error instanceof NoLineError ? 'The server did not answer' : 'This screen could not be shown'}
        onTryAgain={() => {
          // The screen may be older than the server: fetch all of it anew.
          window.location.reload();
        }}
        other={
          <LinkButton to="/" kind="quiet" size="small">
            Go to Today
          </LinkButton>
        }
      >
        <p>{sentenceOf(error)}</p>
        {isProblem(error) && error.reference !== null && (
          <p className="mt-1 text-small text-ink-2">
            If you report it, say <span className="code">{error.reference}</span>.
          </p>
        )}
      </WrongState>
    </div>
  );
}
