import type { PolicyOverview, PolicyVersion } from '#contract/policies';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Button } from '../../../components/ui/button';
import { PageHead } from '../../../components/ui/heading';
import { LinkButton } from '../../../components/ui/link-button';
import { EmptyState, WaitingState, WrongState } from '../../../components/ui/states';
import { TabLinks } from '../../../components/ui/tabs';
import { Day } from '../../../components/ui/time';
import { useMay } from '../../../lib/session';
import { policyQueries } from '../queries';
import { ProposalPanel } from './proposal-panel';
import { ProposeForm } from './propose-form';
import { SettingList } from './setting-list';
import { VersionList } from './version-list';

export type PolicyPart = 'settings' | 'versions' | 'propose';

/** How loads are judged here: the settings in force, what is proposed, and how it came about. */
export function PolicyScreen({ part }: { part: PolicyPart }) {
  const overview = useQuery(policyQueries.overview());
  if (overview.isPending) return <WaitingState title="Policy" waitsFor="The server has not answered yet." />;
  if (overview.isError) {
    return (
      <div className="p-6">
        <WrongState
          title="The policy could not be shown"
          error={overview.error}
          onTryAgain={() => void overview.refetch()}
        />
      </div>
    );
  }
  if (part === 'propose') return <Proposing overview={overview.data} />;
  return <Policy overview={overview.data} part={part} />;
}

function Policy({ overview, part }: { readonly overview: PolicyOverview; readonly part: 'settings' | 'versions' }) {
  const inForce = overview.versions.find((version) => version.standing === 'in-force');
  const planned = overview.versions.find((version) => version.standing === 'planned');
  return (
    <div className="grid content-start gap-5 px-6 py-5 max-tablet:px-4">
      <title>{`${part === 'settings' ? 'Policy' : 'Versions of the policy'} · Paperside`}</title>
      <PageHead
        title="Policy"
        {...(inForce
          ? {
              facts: (
                <span>
                  version {inForce.number}, in force since <Day day={inForce.effectiveOn} />
                </span>
              ),
            }
          : {})}
        aside={<ProposeButton isOpen={overview.proposal !== null} />}
      />
      {overview.proposal !== null && <ProposalPanel overview={overview} proposal={overview.proposal} />}
      <div>
        <TabLinks
          label="Policy"
          links={[
            { to: '/policy/settings', label: 'Settings' },
            { to: '/policy/versions', label: 'Versions', count: overview.versions.length },
          ]}
        />
        {part === 'settings' ? (
          <div className="grid gap-5 pt-4">
            {inForce && <HowItHolds inForce={inForce} planned={planned} />}
            {inForce ? (
              <SettingList overview={overview} version={inForce} />
            ) : (
              <EmptyState title="No policy is in force here yet">No load can be opened before one is.</EmptyState>
            )}
          </div>
        ) : (
          <div className="pt-4">
            <VersionList overview={overview} />
          </div>
        )}
      </div>
    </div>
  );
}

function ProposeButton({ isOpen }: { readonly isOpen: boolean }) {
  if (!useMay('policy.propose')) return null;
  return isOpen ? (
    <Button icon="edit" blockedBecause="A change is proposed already. It has to be settled before the next one.">
      Propose a change
    </Button>
  ) : (
    <LinkButton icon="edit" to="/policy/propose">
      Propose a change
    </LinkButton>
  );
}

type HowItHoldsProps = { readonly inForce: PolicyVersion; readonly planned: PolicyVersion | undefined };

function HowItHolds({ inForce, planned }: HowItHoldsProps) {
  return (
    <div className="max-w-[80ch] text-row">
      <p>
        The instructions for use of what is in a load come first. What they leave open is judged by these settings, in
        the version in force on the day the load is opened.
      </p>
      {inForce.author !== null && (
        <p className="mt-1 text-ink-2">
          Version {inForce.number}: proposed by <b className="font-label text-ink-1">{inForce.author}</b>, confirmed by{' '}
          <b className="font-label text-ink-1">{inForce.secondPerson}</b>. “{inForce.reason}”
        </p>
      )}
      {planned && (
        <p className="mt-2 bg-film-1 px-2.5 py-1.5 font-semibold text-film-5 shadow-[inset_3px_0_0_var(--color-film-4)]">
          Version {planned.number} is confirmed, in force from <Day day={planned.effectiveOn} />.
        </p>
      )}
    </div>
  );
}

function Proposing({ overview }: { readonly overview: PolicyOverview }) {
  const mayPropose = useMay('policy.propose');
  // Asked once: the form that has just become the open proposal leaves by itself.
  const [wasFree] = useState(overview.proposal === null);
  if (mayPropose && wasFree) return <ProposeForm overview={overview} />;
  return (
    <div className="max-w-130 p-6">
      <EmptyState
        level={1}
        title={mayPropose ? 'A change is proposed already' : 'A supervisor or an administrator proposes a change'}
        act={
          <LinkButton to="/policy/settings" size="small">
            Go to the policy
          </LinkButton>
        }
      >
        {mayPropose ? 'It has to be settled before the next one.' : 'You can look at the policy and how it came about.'}
      </EmptyState>
    </div>
  );
}
