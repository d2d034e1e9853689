import type { PolicyOverview } from '#contract/policies';
import type { SettingChange } from '#domain/policy/setting-change';
import { useFacility } from '../../../lib/facility';
import { changeWords } from '../setting-words';

type ChangeListProps = {
  readonly label: string;
  readonly changes: readonly SettingChange[];
  readonly sterilizers: PolicyOverview['sterilizers'];
};

/** What changes, from what to what. */
export function ChangeList({ label, changes, sterilizers }: ChangeListProps) {
  const { unitSystem } = useFacility();
  return (
    <ul aria-label={label} className="divide-y divide-paper-3">
      {changes.map((change) => {
        const { key, what, before, after } = changeWords(change, sterilizers, unitSystem);
        return (
          <li key={key} className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-0.5 py-2 text-row">
            <span className="min-w-0 flex-1 basis-56">{what}</span>
            <span className="flex flex-wrap items-baseline gap-x-2 tabular-nums">
              <span className="sr-only">from </span>
              <span className="text-ink-2">{before}</span>
              <span aria-hidden="true" className="text-film-4">
                →
              </span>
              <span className="sr-only"> to </span>
              <b className="font-label">{after}</b>
            </span>
          </li>
        );
      })}
    </ul>
  );
}
