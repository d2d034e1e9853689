import { useEffect } from 'react';
import { isRouteErrorResponse, useLocation, useNavigate, useRouteError } from 'react-router-dom';
import { LinkButton } from '../components/ui/link-button';
import { WrongState } from '../components/ui/states';
import { isProblem, NoLineError, sentenceOf } from '../lib/errors';
import { NotFound } from './not-found';
import { useLineWatch } from './use-line-watch';

/** Whatever a screen threw: what it means, and two ways on. */
export function RouteError() {
  const error = useRouteError();
  if (error instanceof NoLineError) return <NoLine />;
  if ((isRouteErrorResponse(error) && error.status === 404) || (isProblem(error) && error.httpStatus === 404)) {
    return <NotFound sentence={isProblem(error) ? error.sentence : undefined} />;
  }
  return (
    <div className="max-w-150 p-6">
      <title>Something went wrong · Paperside</title>
      <WrongState
        level={1}
        title="This screen could not be shown"
        onTryAgain={() => {
          // The screen may be older than the server: fetch all of it anew.
          window.location.reload();
        }}
        other={<ToToday />}
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

/** The screen comes by itself once the line is up. */
function NoLine() {
  const line = useLineWatch();
  const location = useLocation();
  const navigate = useNavigate();
  useEffect(() => {
    if (line.isUp) void navigate(location, { replace: true });
  }, [line.isUp, location, navigate]);
  return (
    <div className="max-w-150 p-6">
      <title>No line to the server · Paperside</title>
      <WrongState
        level={1}
        title="The server did not answer"
        onTryAgain={() => {
          void navigate(location, { replace: true });
        }}
        other={<ToToday />}
      >
        This screen is fetched as soon as the line is up. Nothing is lost meanwhile.
      </WrongState>
    </div>
  );
}

function ToToday() {
  return (
    <LinkButton to="/" kind="quiet" size="small">
      Go to Today
    </LinkButton>
  );
}
