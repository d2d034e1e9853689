import type { PolicyOverview, PolicyProposal, PolicyVersion } from '#contract/policies';
import { policyParameters } from '#domain/load/policy';
import { PanelHead } from '../../../components/ui/heading';
import { Day, Moment } from '../../../components/ui/time';
import { useFacility } from '../../../lib/facility';
import { countOf } from '../../../lib/format';
import { facingWords, valueWords } from '../setting-words';
import { ChangeList } from './change-list';

const standings: Readonly<Record<PolicyVersion['standing'], string>> = {
  'in-force': 'in force',
  planned: 'to come',
  past: 'past',
  overtaken: 'never in force: a newer one came before its day',
};

/** Every version there was, with both people, and what was proposed and came to nothing. */
export function VersionList({ overview }: { overview: PolicyOverview }) {
  return (
    <div className="grid gap-9">
      <section aria-labelledby="policy-versions">
        <PanelHead id="policy-versions" title={`Versions, ${overview.versions.length}`} aside="newest first" />
        <ol className="mt-1.5">
          {overview.versions.map((version) => (
            <VersionEntry key={version.number} overview={overview} version={version} />
          ))}
        </ol>
      </section>
      {overview.notMade.length > 0 && (
        <section aria-labelledby="policy-not-made">
          <PanelHead id="policy-not-made" title={`Proposed and not made, ${overview.notMade.length}`} />
          <ul className="mt-1.5">
            {overview.notMade.map((proposal) => (
              <NotMade key={proposal.id} overview={overview} proposal={proposal} />
            ))}
          </ul>
        </section>
      )}
    </div>
  );
}

type VersionEntryProps = { readonly overview: PolicyOverview; readonly version: PolicyVersion };

function VersionEntry({ overview, version }: VersionEntryProps) {
  const isInForce = version.standing === 'in-force';
  return (
    <li className="grid gap-x-8 gap-y-2 border-t border-paper-3 py-4 tablet:grid-cols-[11rem_minmax(0,1fr)]">
      <div>
        <h3 className="text-head">Version {version.number}</h3>
        <p className="text-row">
          from <Day day={version.effectiveOn} />
        </p>
        {isInForce ? (
          <p className="weld mt-1.5 inline-block px-2.5 py-1 text-small font-label">in force</p>
        ) : (
          <p className="mt-0.5 text-small text-ink-2">{standings[version.standing]}</p>
        )}
      </div>
      <div className="max-w-180">
        <p className="text-row">“{version.reason}”</p>
        <p className="mt-0.5 text-small text-ink-2">
          {version.author === null ? (
            <>
              Laid out with the facility, <Moment at={version.confirmedAt} />
            </>
          ) : (
            <>
              Proposed by <b className="font-label text-ink-1">{version.author}</b>, confirmed by{' '}
              <b className="font-label text-ink-1">{version.secondPerson}</b>, <Moment at={version.confirmedAt} />
            </>
          )}
        </p>
        {version.changes.length > 0 && (
          <div className="mt-1">
            <ChangeList
              label={`What version ${version.number} changed`}
              changes={version.changes}
              sterilizers={overview.sterilizers}
            />
          </div>
        )}
        <details className="mt-1">
          <summary className="min-h-11 cursor-pointer py-2.5 text-row font-semibold text-film-4">
            All {countOf(policyParameters.length, 'setting')} of version {version.number}
          </summary>
          <AllSettings overview={overview} version={version} />
        </details>
      </div>
    </li>
  );
}

function AllSettings({ overview, version }: VersionEntryProps) {
  const { unitSystem } = useFacility();
  const apart = overview.sterilizers.flatMap(({ id, name }) => {
    const rule = version.settings.facingBySterilizer[id];
    return rule === undefined ? [] : [{ id, name, rule }];
  });
  return (
    <dl className="pb-2">
      {policyParameters.map((parameter) => (
        <div
          key={parameter.id}
          className="flex flex-wrap justify-between gap-x-6 border-t border-paper-3 py-1.5 text-small"
        >
          <dt className="min-w-0 flex-1 basis-56">{parameter.label}</dt>
          <dd className="font-label tabular-nums">
            {valueWords(parameter, version.settings.policy[parameter.id], unitSystem)}
            {version.defaulted.includes(parameter.id) && (
              <span className="font-normal text-ink-2"> (the default; not in this version)</span>
            )}
          </dd>
        </div>
      ))}
      {apart.map(({ id, name, rule }) => (
        <div key={id} className="flex flex-wrap justify-between gap-x-6 border-t border-paper-3 py-1.5 text-small">
          <dt className="min-w-0 flex-1 basis-56">{name}: which way pouches on edge face</dt>
          <dd className="font-label">{facingWords(rule)}</dd>
        </div>
      ))}
    </dl>
  );
}

function NotMade({ overview, proposal }: { readonly overview: PolicyOverview; readonly proposal: PolicyProposal }) {
  const act = proposal.state === 'withdrawn' ? 'Withdrawn' : 'Refused';
  return (
    <li className="grid gap-x-8 gap-y-2 border-t border-paper-3 py-4 tablet:grid-cols-[11rem_minmax(0,1fr)]">
      <div>
        <h3 className="text-head">{act}</h3>
        <p className="text-row">{proposal.settledAt !== null && <Moment at={proposal.settledAt} />}</p>
      </div>
      <div className="max-w-180">
        <p className="text-row">
          <b className="font-label">{proposal.proposedBy.name}</b>: “{proposal.reason}”
        </p>
        <p className="mt-0.5 text-row">
          <b className="font-label">{proposal.settledBy}</b>: “{proposal.settledReason}”
        </p>
        <ChangeList label="What was proposed" changes={proposal.changes} sterilizers={overview.sterilizers} />
      </div>
    </li>
  );
}
