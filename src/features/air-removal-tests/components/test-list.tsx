import type { AirRemovalTest } from '#contract/air-removal-tests';
import { Icon } from '../../../components/icon';
import { Code } from '../../../components/ui/code';
import { EmptyState } from '../../../components/ui/states';
import { DateText } from '../../../components/ui/time';

/** Tests that were written down, the latest first. */
export function TestList({ tests }: { tests: readonly AirRemovalTest[] }) {
  if (tests.length === 0) return <EmptyState title="None yet" level={3} />;
  return (
    <ul className="divide-y divide-paper-3">
      {tests.map((test) => (
        <li key={test.id} className="grid grid-cols-[1.75rem_minmax(0,1fr)_auto] gap-x-2 py-2.5 text-row">
          <span className={test.result === 'passed' ? 'text-film-4' : 'text-madder-3'}>
            <Icon name={test.result === 'passed' ? 'tick' : 'cross'} />
          </span>
          <span>
            <span className="font-semibold">
              <Code>{test.sterilizer.code}</Code>
              <span className={test.result === 'failed' ? 'text-madder-3' : ''}>
                {test.result === 'passed' ? ' passed' : ' failed'}
              </span>
              {!test.isBeforeFirstLoad && <span className="text-straw-3">, after a load had run</span>}
            </span>
            <span className="block text-small text-ink-2">
              {test.readBy}
              {test.secondReader !== null && ` and ${test.secondReader}`}. Pack <Code>{test.packLot}</Code>
            </span>
            {test.note !== '' && <span className="block text-small [overflow-wrap:anywhere]">{test.note}</span>}
          </span>
          <span className="text-ink-2">
            <DateText at={test.testedAt} form="with-time" />
          </span>
        </li>
      ))}
    </ul>
  );
}
