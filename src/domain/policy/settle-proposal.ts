import { accept, refuse, type Result } from '../result';

export const proposalStates = ['open', 'confirmed', 'withdrawn', 'refused'] as const;

export type ProposalState = (typeof proposalStates)[number];

export type SettlingAct = 'confirm' | 'withdraw' | 'refuse';

export type SettlingRefusal =
  'policy.proposal-settled' | 'policy.same-person' | 'policy.own-proposal' | 'policy.not-the-proposer';

type Settling = {
  readonly act: SettlingAct;
  readonly state: ProposalState;
  readonly proposedBy: string;
  readonly personId: string;
};

const settledSentences: Readonly<Record<Exclude<ProposalState, 'open'>, string>> = {
  confirmed: 'This change is confirmed already.',
  withdrawn: 'This change was withdrawn meanwhile.',
  refused: 'This change was refused meanwhile.',
};

/** Whether a person may settle a proposal in a way: two persons make a version, and only who proposed it may withdraw it. */
export function decideSettling({ act, state, proposedBy, personId }: Settling): Result<ProposalState, SettlingRefusal> {
  if (state !== 'open') return refuse('policy.proposal-settled', settledSentences[state]);
  const isOwn = proposedBy === personId;
  switch (act) {
    case 'confirm':
      return isOwn
        ? refuse('policy.same-person', 'You proposed this change. Another person has to confirm it.')
        : accept('confirmed');
    case 'refuse':
      return isOwn
        ? refuse('policy.own-proposal', 'You proposed this change. Withdraw it if it should not be made.')
        : accept('refused');
    case 'withdraw':
      return isOwn
        ? accept('withdrawn')
        : refuse('policy.not-the-proposer', 'Only who proposed this change may withdraw it. You can refuse it.');
  }
}

/** The day from which a confirmed change holds: as proposed, and never from before it was confirmed. */
export function dayOfEffect(proposedDay: string, today: string): string {
  return proposedDay < today ? today : proposedDay;
}
