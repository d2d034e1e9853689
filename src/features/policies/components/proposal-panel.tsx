import type { PolicyOverview, PolicyProposal } from '#contract/policies';
import { dayOfEffect } from '#domain/policy/settle-proposal';
import { useState } from 'react';
import { useWrite } from '../../../components/stock/use-write';
import { useAnnounce } from '../../../components/ui/announcer';
import { Button } from '../../../components/ui/button';
import { ConfirmDialog } from '../../../components/ui/confirm-dialog';
import { FilmPanel } from '../../../components/ui/film-panel';
import { Day, Moment } from '../../../components/ui/time';
import { countOf, formatDay } from '../../../lib/format';
import { useMay, useSession } from '../../../lib/session';
import { useConfirmChange, useTurnDownChange } from '../mutations';
import { ChangeList } from './change-list';

type ProposalPanelProps = {
  readonly overview: PolicyOverview;
  readonly proposal: PolicyProposal;
};

/** A change that waits for a second person, and what the person at the station may do with it. */
export function ProposalPanel({ overview, proposal }: ProposalPanelProps) {
  const { person } = useSession();
  const mayConfirm = useMay('policy.confirm');
  const isOwn = proposal.proposedBy.id === person.id;
  const holdsFrom = dayOfEffect(proposal.effectiveOn, overview.today);
  return (
    <FilmPanel labelledBy="policy-proposed" className="px-4 pt-4 pb-4">
      <h2 id="policy-proposed" className="text-say">
        {countOf(proposal.changes.length, 'change')} proposed
      </h2>
      <div className="grid gap-x-10 gap-y-2 min-[1100px]:grid-cols-[minmax(0,45rem)_minmax(0,1fr)]">
        <div className="order-last border-b border-film-2 min-[1100px]:order-none">
          <ChangeList label="What changes" changes={proposal.changes} sterilizers={overview.sterilizers} />
        </div>
        <div className="text-row min-[1100px]:py-2">
          <p>
            In force from{' '}
            <b className="font-label">
              <Day day={holdsFrom} />
            </b>
            {holdsFrom !== proposal.effectiveOn && (
              <>
                , since <Day day={proposal.effectiveOn} /> has passed
              </>
            )}
          </p>
          <p className="mt-1">“{proposal.reason}”</p>
          <p className="text-small text-ink-2">
            <b className="font-label text-ink-1">{proposal.proposedBy.name}</b>, <Moment at={proposal.proposedAt} />
          </p>
        </div>
      </div>
      <div className="mt-3 flex flex-wrap items-center gap-2.5">
        {mayConfirm && <ConfirmAct overview={overview} proposal={proposal} holdsFrom={holdsFrom} isOwn={isOwn} />}
        {isOwn ? (
          <TurnDownAct proposal={proposal} act="withdraw" />
        ) : (
          mayConfirm && <TurnDownAct proposal={proposal} act="refuse" />
        )}
        <p className="text-small text-ink-2">{whoDecides({ isOwn, mayConfirm })}</p>
      </div>
    </FilmPanel>
  );
}

function whoDecides({ isOwn, mayConfirm }: { readonly isOwn: boolean; readonly mayConfirm: boolean }): string {
  if (isOwn) return 'You proposed it: another supervisor, an administrator or infection prevention confirms it.';
  if (mayConfirm) return 'You can be the second person: nothing changes before you confirm it.';
  return 'A supervisor, an administrator or infection prevention confirms it, and never who proposed it.';
}

type ConfirmActProps = ProposalPanelProps & { readonly holdsFrom: string; readonly isOwn: boolean };

function ConfirmAct({ overview, proposal, holdsFrom, isOwn }: ConfirmActProps) {
  const [isAsking, setIsAsking] = useState(false);
  const confirm = useConfirmChange(proposal.id);
  const write = useWrite();
  const announce = useAnnounce();
  const number = (overview.versions[0]?.number ?? 0) + 1;
  return (
    <>
      <Button
        blockedBecause={isOwn ? 'You proposed this change. Another person has to confirm it.' : undefined}
        onPress={() => {
          setIsAsking(true);
        }}
      >
        Confirm version {number}
      </Button>
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => {
          setIsAsking(false);
        }}
        title={`Confirm version ${number} of the policy?`}
        confirmWords={`Confirm version ${number}`}
        waitingWords="Confirming it"
        onConfirm={async () => {
          const made = await write((requestId) => confirm.mutateAsync(requestId));
          announce(`Version ${made.number} is confirmed, in force from ${formatDay(made.effectiveOn)}.`);
        }}
      >
        <p>
          From {formatDay(holdsFrom)} loads are opened under it, with your name beside {proposal.proposedBy.name}’s.
          Loads that are open keep the version they were opened under, and closed ones their verdict.
        </p>
        <p className="mt-2">A version is never changed afterwards; a later one can take its place.</p>
      </ConfirmDialog>
    </>
  );
}

const turningDown = {
  withdraw: {
    button: 'Withdraw it',
    title: 'Withdraw what you proposed?',
    waiting: 'Withdrawing it',
    done: 'The change is withdrawn.',
  },
  refuse: {
    button: 'Refuse it',
    title: 'Refuse this change?',
    waiting: 'Refusing it',
    done: 'The change is refused.',
  },
} as const;

function TurnDownAct({ proposal, act }: { readonly proposal: PolicyProposal; readonly act: keyof typeof turningDown }) {
  const [isAsking, setIsAsking] = useState(false);
  const turnDown = useTurnDownChange(proposal.id, act);
  const write = useWrite();
  const announce = useAnnounce();
  const words = turningDown[act];
  return (
    <>
      <Button
        kind="quiet"
        onPress={() => {
          setIsAsking(true);
        }}
      >
        {words.button}
      </Button>
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => {
          setIsAsking(false);
        }}
        title={words.title}
        confirmWords={words.button}
        waitingWords={words.waiting}
        reason={{
          label: 'Why',
          hint: 'It stays in the history, beside the reason it was proposed for.',
          isNeeded: true,
        }}
        onConfirm={async (reason) => {
          await write((requestId) => turnDown.mutateAsync({ requestId, reason }));
          announce(words.done);
        }}
      >
        <p>Nothing changes, and another change can be proposed.</p>
      </ConfirmDialog>
    </>
  );
}
