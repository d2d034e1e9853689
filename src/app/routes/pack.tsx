import { PageHead } from '../../components/ui/heading';
import { EmptyState } from '../../components/ui/states';

export function Component() {
  return (
    <div className="grid gap-5 p-6">
      <title>Pack · Paperside</title>
      <PageHead title="Pack" />
      <EmptyState title="Not here yet">The packing station will stand here.</EmptyState>
    </div>
  );
}
