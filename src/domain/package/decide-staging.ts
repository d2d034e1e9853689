import type { PackageState } from '../load/model';
import { accept, refuse, type Result } from '../result';
import { isExpired } from './expiry';
import { stateInWords } from './state-words';

/* Only what is packed and nothing is against may wait for a sterilizer run, and only in one run at a time. */

export type StagingPackage = {
  readonly id: string;
  readonly code: string;
  readonly state: PackageState;
  readonly heldReason: string | null;
  /** YYYY-MM-DD; null where expiry is event-related. */
  readonly expiresOn: string | null;
  /** The run it waits in or waited in last. */
  readonly run: StagingRun | null;
  readonly openLoad: { readonly number: string } | null;
};

export type RunState = 'waiting' | 'taken' | 'dropped';

export type StagingRun = { readonly id: string; readonly name: string; readonly state: RunState };

export type StagingRefusal =
  | 'package.called-back'
  | 'package.held'
  | 'package.expired'
  | 'package.in-another-load'
  | 'package.in-another-run'
  | 'package.not-ready';

/** `stage`: it goes into the run. `already-here`: nothing to do. */
export type Staging = 'stage' | 'already-here';

/**
 * Whether the package may wait in this run.
 * @param today the facility's calendar day, YYYY-MM-DD
 */
export function decideStaging(
  candidate: StagingPackage,
  run: StagingRun,
  today: string,
): Result<Staging, StagingRefusal> {
  const { code } = candidate;
  if (candidate.state === 'recalled') {
    return refuse('package.called-back', `${code} is called back. Set it apart and tell your lead.`);
  }
  if (candidate.heldReason !== null || candidate.state === 'quarantined') {
    return refuse('package.held', `${code} is held: ${candidate.heldReason ?? 'in quarantine'}. Ask your lead.`);
  }
  if (candidate.openLoad !== null) {
    return refuse(
      'package.in-another-load',
      `${code} is in load ${candidate.openLoad.number}. Take it off there first.`,
    );
  }
  if (candidate.state !== 'packed' && candidate.state !== 'staged') {
    return refuse('package.not-ready', `${code} is ${stateInWords(candidate.state)}. It cannot wait for a run.`);
  }
  if (isExpired(candidate.expiresOn, today)) {
    return refuse('package.expired', `${code} is past its last day. Send it back to be packed anew.`);
  }
  if (candidate.state === 'packed') return accept<Staging>('stage');
  if (candidate.run?.id === run.id) return accept<Staging>('already-here');
  // Taken off a load again, it is staged still, and its run is over: it may go into a new one.
  if (candidate.run?.state !== 'waiting') return accept<Staging>('stage');
  return refuse('package.in-another-run', `${code} waits in “${candidate.run.name}”. Take it out there first.`);
}

/** Whether anything may go into the run, or it may be dropped. */
export function decideRunOpen(run: StagingRun): Result<null, 'run.taken' | 'run.dropped'> {
  switch (run.state) {
    case 'waiting':
      return accept(null);
    case 'taken':
      return refuse('run.taken', `A load has taken “${run.name}”. Scan into the load, or choose another run.`);
    case 'dropped':
      return refuse('run.dropped', `“${run.name}” was dropped. Choose another run.`);
  }
}

/** Whether the package may be taken out of the run, back among the packed ones. */
export function decideRemoval(
  candidate: StagingPackage,
  run: StagingRun,
): Result<null, 'package.not-in-run' | 'package.in-another-load'> {
  const { code } = candidate;
  if (candidate.openLoad !== null) {
    return refuse(
      'package.in-another-load',
      `${code} is in load ${candidate.openLoad.number}. Take it off there first.`,
    );
  }
  if (candidate.state !== 'staged' || candidate.run?.id !== run.id) {
    return refuse('package.not-in-run', `${code} does not wait in “${run.name}”.`);
  }
  return accept(null);
}
