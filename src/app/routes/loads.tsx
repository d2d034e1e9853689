import { PageHead } from '../../components/ui/heading';
import { EmptyState } from '../../components/ui/states';

export function Component() {
  return (
    <div className="grid gap-5 p-6">
      <title>Loads · Paperside</title>
      <PageHead title="Loads" />
      <EmptyState title="Not here yet">The loads of this place will stand here.</EmptyState>
    </div>
  );
}
