import type { Permission } from '../access/permissions';
import { accept, refuse, type Result } from '../result';
import type { PackageState } from './model';

export const loadStates = [
  'building',
  'closed',
  'in-sterilizer',
  'cooling',
  'awaiting-proof',
  'ready-to-sign',
  'released',
  'released-implant-early',
  'held',
  'failed',
  'set-aside',
  'aborted',
  'abandoned',
] as const;

export type LoadState = (typeof loadStates)[number];

/** What people may do to a load as a whole. Acts after the close join the table with the proof they need. */
export const loadActs = ['open', 'build', 'accept-finding', 'print-stickers', 'close', 'abandon'] as const;

export type LoadAct = (typeof loadActs)[number];

/**
 * What an act does to the packages of the load: nothing, go onto its list, stay in it for good, or go back to where they
 * were before (see `stateOffLoad`).
 */
export type PackageEffect = 'none' | 'listed' | 'stay' | 'go-back';

export type Transition = {
  /** States it may start from; null stands for a load that does not exist yet. */
  readonly from: readonly (LoadState | null)[];
  /** null: the state stays as it is. */
  readonly to: LoadState | null;
  readonly permission: Permission;
  /** What must hold besides the state, for people; the use case checks it. */
  readonly needs: string;
  readonly packages: PackageEffect;
};

/** The one table of a load's life. Server and screens read it; the server is the authority. */
export const transitions: Readonly<Record<LoadAct, Transition>> = {
  open: {
    from: [null],
    to: 'building',
    permission: 'load.open',
    needs: 'The sterilizer is qualified for the program, and no other open load is on the cart.',
    packages: 'listed',
  },
  build: {
    from: ['building'],
    to: null,
    permission: 'load.build',
    needs: 'Nothing more: scanning, placing, counting and taking back are always possible.',
    packages: 'none',
  },
  'accept-finding': {
    from: ['building'],
    to: null,
    permission: 'load.accept-finding',
    needs: 'The finding is one that may stay, and the reason is written down.',
    packages: 'none',
  },
  'print-stickers': {
    from: ['building', 'closed'],
    to: null,
    permission: 'load.print-stickers',
    needs: 'The package has been scanned into the load; a second copy needs a reason.',
    packages: 'none',
  },
  close: {
    from: ['building'],
    to: 'closed',
    permission: 'load.close',
    needs: 'Nothing holds the load open.',
    packages: 'stay',
  },
  abandon: {
    from: ['building'],
    to: 'abandoned',
    permission: 'load.abandon',
    needs: 'A reason is written down.',
    packages: 'go-back',
  },
};

export const loadStateWords: Readonly<Record<LoadState, string>> = {
  building: 'Loading',
  closed: 'Closed',
  'in-sterilizer': 'In the sterilizer',
  cooling: 'Cooling',
  'awaiting-proof': 'Awaiting proof',
  'ready-to-sign': 'Ready to sign',
  released: 'Released',
  'released-implant-early': 'Released with implant early',
  held: 'Held',
  failed: 'Failed',
  'set-aside': 'Set aside',
  aborted: 'Aborted',
  abandoned: 'Abandoned',
};

export type DecidedAct = { readonly to: LoadState; readonly packages: PackageEffect };

/** Whether an act is possible in a state, and what comes of it. `null`: there is no such load yet. */
export function decideAct(state: LoadState | null, act: LoadAct): Result<DecidedAct, 'load.not-in-that-state'> {
  const { from, to, packages } = transitions[act];
  if (!from.includes(state)) return refuse('load.not-in-that-state', whyNot(state));
  const after = to ?? state;
  // No row of the table has neither a state to start from nor one to go to.
  if (after === null) return refuse('load.not-in-that-state', whyNot(state));
  return accept({ to: after, packages });
}

function whyNot(state: LoadState | null): string {
  switch (state) {
    case null:
      return 'There is no such load.';
    case 'building':
      return 'This load is open already.';
    case 'closed':
      return 'This load is closed. Its contents stay as they were signed.';
    case 'abandoned':
      return 'This load was abandoned. Its packages went back.';
    default:
      return `This load cannot be changed any more: ${loadStateWords[state].toLowerCase()}.`;
  }
}

/** What a package is again once it is taken off a load or the load is abandoned. */
export function stateOffLoad(wasStaged: boolean): PackageState {
  return wasStaged ? 'staged' : 'packed';
}
