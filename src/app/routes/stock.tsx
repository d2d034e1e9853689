import { PageHead } from '../../components/ui/heading';
import { EmptyState } from '../../components/ui/states';

export function Component() {
  return (
    <div className="grid gap-5 p-6">
      <title>Stock · Paperside</title>
      <PageHead title="Stock" />
      <EmptyState title="Not here yet">Catalogue and equipment will stand here.</EmptyState>
    </div>
  );
}
