import type { PolicyOverview, PolicyVersion } from '#contract/policies';
import { policyParameters, type PolicyParameter } from '#domain/load/policy';
import { rules } from '#domain/load/rules/all-rules';
import type { SettingChange } from '#domain/policy/setting-change';
import type { SettingValue } from '#domain/policy/settings';
import { Fragment, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { PanelHead } from '../../../components/ui/heading';
import { useFacility } from '../../../lib/facility';
import { facingWords, provenanceWords, valueWords } from '../setting-words';
import { RangeLegend, RangeLine } from './range-line';

type SettingListProps = {
  readonly overview: PolicyOverview;
  readonly version: PolicyVersion;
};

/** Everything that can be set: what holds, what is proposed, and where the default comes from. */
export function SettingList({ overview, version }: SettingListProps) {
  const proposed = overview.proposal?.changes ?? [];
  return (
    <section aria-labelledby="policy-settings">
      <PanelHead
        id="policy-settings"
        title={`What can be set, ${policyParameters.length}`}
        aside={<RangeLegend hasProposal={proposed.length > 0} />}
      />
      <ul className="mt-1.5">
        {policyParameters.map((parameter) => (
          <SettingRow
            key={parameter.id}
            parameter={parameter}
            value={version.settings.policy[parameter.id]}
            isDefaulted={version.defaulted.includes(parameter.id)}
            proposed={proposedValue(proposed, parameter.id)}
          >
            {parameter.id === 'facing' && <FacingOfSterilizers overview={overview} version={version} />}
          </SettingRow>
        ))}
      </ul>
    </section>
  );
}

function proposedValue(changes: readonly SettingChange[], id: string): SettingValue | null {
  const change = changes.find((one) => one.of === 'parameter' && one.id === id);
  return change?.of === 'parameter' ? change.after : null;
}

/** The value stands below its name on the phone, and beside it where there is room; the source comes after both. */
const rowLook = [
  "grid content-start gap-x-8 gap-y-1 border-t border-paper-3 py-3.5 [grid-template-areas:'name''value''range''source']",
  "tablet:grid-cols-[minmax(0,1fr)_15rem] tablet:grid-rows-[auto_1fr] tablet:[grid-template-areas:'name_value''source_value''source_range']",
  "min-[1100px]:grid-cols-[minmax(0,1fr)_13.5rem_15rem] min-[1100px]:[grid-template-areas:'name_value_range''source_value_range']",
].join(' ');

type SettingRowProps = {
  readonly parameter: PolicyParameter;
  readonly value: SettingValue;
  readonly isDefaulted: boolean;
  readonly proposed: SettingValue | null;
  readonly children: ReactNode;
};

function SettingRow({ parameter, value, isDefaulted, proposed, children }: SettingRowProps) {
  const { unitSystem } = useFacility();
  const words = (one: SettingValue) => valueWords(parameter, one, unitSystem);
  return (
    <li className={rowLook}>
      <h3 className="text-body font-semibold [grid-area:name]">{parameter.label}</h3>
      <div className={`[grid-area:value] ${parameter.form === 'choice' ? 'min-[1100px]:col-end-4' : ''}`}>
        <p className={parameter.form === 'choice' ? 'text-head' : 'text-say tabular-nums'}>{words(value)}</p>
        <p className="text-small text-ink-2">
          {value === parameter.default ? 'the default' : `default: ${words(parameter.default)}`}
          {isDefaulted && ', not in this version'}
        </p>
        {proposed !== null && (
          <p className="mt-1.5 w-fit bg-film-1 px-2.5 py-1 text-row font-semibold text-film-5 shadow-[inset_3px_0_0_var(--color-film-4)]">
            Proposed: {words(proposed)}
          </p>
        )}
        {children}
      </div>
      {parameter.form === 'quantity' && typeof value === 'number' && (
        <div className="[grid-area:range] min-[1100px]:pt-0.5">
          <RangeLine parameter={parameter} inForce={value} proposed={typeof proposed === 'number' ? proposed : null} />
        </div>
      )}
      <div className="[grid-area:source]">
        <p className="max-w-[68ch] text-small text-ink-2">
          <span className="font-label text-ink-1">{provenanceWords(parameter)}.</span> {parameter.source.text}
        </p>
        <RulesOf parameter={parameter} />
      </div>
    </li>
  );
}

/** The rules that read this setting, each with its lesson: what a change of it does. */
function RulesOf({ parameter }: { readonly parameter: PolicyParameter }) {
  const own = rules.filter((rule) => rule.parameters.includes(parameter.id));
  if (own.length === 0) return null;
  return (
    <p className="mt-0.5 text-small text-ink-2">
      {own.length === 1 ? 'Rule: ' : 'Rules: '}
      {own.map(({ id, name }, index) => (
        <Fragment key={id}>
          {index > 0 && '; '}
          <Link to={`/lessons/${id}`} className="text-film-4">
            {name}
          </Link>
        </Fragment>
      ))}
    </p>
  );
}

/** Sterilizers whose loads face otherwise than the facility's rule says. */
function FacingOfSterilizers({ overview, version }: SettingListProps) {
  const proposed = new Map(
    (overview.proposal?.changes ?? []).flatMap((change) =>
      change.of === 'facing-at-sterilizer' ? [[change.sterilizerId, change.after] as const] : [],
    ),
  );
  const apart = overview.sterilizers.filter(
    ({ id }) => version.settings.facingBySterilizer[id] !== undefined || proposed.has(id),
  );
  if (apart.length === 0) return <p className="text-small text-ink-2">The same at every sterilizer.</p>;
  return (
    <dl className="mt-1.5 grid gap-y-1 text-row">
      {apart.map(({ id, name }) => (
        <div key={id} className="flex flex-wrap gap-x-2">
          <dt className="text-ink-2">{name}:</dt>
          <dd className="font-label">
            {facingWords(version.settings.facingBySterilizer[id] ?? null)}
            {proposed.has(id) && (
              <span className="ml-2 bg-film-1 px-1.5 font-semibold text-film-5">
                Proposed: {facingWords(proposed.get(id) ?? null)}
              </span>
            )}
          </dd>
        </div>
      ))}
    </dl>
  );
}
