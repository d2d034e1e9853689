import { PageHead } from '../../components/ui/heading';
import { EmptyState } from '../../components/ui/states';

export function Component() {
  return (
    <div className="grid gap-5 p-6">
      <title>Load · Paperside</title>
      <PageHead title="Load" />
      <EmptyState title="Not here yet">The load will stand here.</EmptyState>
    </div>
  );
}
