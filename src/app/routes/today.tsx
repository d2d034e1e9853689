import { PageHead } from '../../components/ui/heading';
import { EmptyState } from '../../components/ui/states';

export function Component() {
  return (
    <div className="grid gap-5 p-6">
      <title>Today · Paperside</title>
      <PageHead title="Today" />
      <EmptyState title="Not here yet">What is open and what waits for you will stand here.</EmptyState>
    </div>
  );
}
