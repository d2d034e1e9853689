import type { Permission } from '#domain/access/permissions';
import { Outlet } from 'react-router-dom';
import { EmptyState } from '../components/ui/states';
import { LinkButton } from '../components/ui/link-button';
import { useSession } from '../lib/session';
import { roleWords } from '#domain/access/role-words';

/** For an address that somebody typed or was sent: says that it is another role's. The server refuses in any case. */
export function RequirePermission({ any }: { any: readonly Permission[] }) {
  const { permissions, person } = useSession();
  if (any.some((permission) => permissions.includes(permission))) return <Outlet />;
  return (
    <div className="max-w-130 p-6">
      <EmptyState
        level={1}
        title="This screen is for another role"
        act={
          <LinkButton to="/" size="small">
            Go to Today
          </LinkButton>
        }
      >
        You are here as {roleWords[person.role].toLowerCase()}. Change person, or ask a supervisor.
      </EmptyState>
    </div>
  );
}
