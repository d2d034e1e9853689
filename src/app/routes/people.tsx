import { PageHead } from '../../components/ui/heading';
import { EmptyState } from '../../components/ui/states';

export function Component() {
  return (
    <div className="grid gap-5 p-6">
      <title>People · Paperside</title>
      <PageHead title="People" />
      <EmptyState title="Not here yet">The people of this place will stand here.</EmptyState>
    </div>
  );
}
