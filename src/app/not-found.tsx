import { EmptyState } from '../components/ui/states';
import { LinkButton } from '../components/ui/link-button';

/** An address with nothing behind it. */
export function NotFound({ sentence }: { sentence?: string | undefined }) {
  return (
    <div className="max-w-130 p-6">
      <title>Not here · Paperside</title>
      <EmptyState
        level={1}
        title="There is nothing at this address"
        act={
          <LinkButton to="/" size="small">
            Go to Today
          </LinkButton>
        }
      >
        {sentence ?? 'It may have been typed wrong, or belong to another place of work.'}
      </EmptyState>
    </div>
  );
}
