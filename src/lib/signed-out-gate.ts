import { createStore } from './store';

/** A call that met the end of a sign-in and waits for the next one. */
type HeldCall = {
  readonly kind: 'read' | 'write';
  readonly personId: string;
  readonly settle: (verdict: Verdict) => void;
};

/** again: send it once more. other-person: somebody else signed in, so this write is not theirs. gave-up: nobody did. */
export type Verdict = 'again' | 'other-person' | 'gave-up';

/**
 * What happens when a sign-in ends in the middle of work: the screen stays, a sheet asks who is there, and the calls
 * that failed wait. They go on only in the name they were made in: each act carries its own name.
 */
export function createSignedOutGate() {
  const held = new Set<HeldCall>();
  const listeners = new Set<() => void>();
  const isClosed = createStore(false);
  let personId: string | null = null;

  function settleAll(verdictOf: (call: HeldCall) => Verdict) {
    const calls = [...held];
    held.clear();
    for (const call of calls) call.settle(verdictOf(call));
  }

  return {
    /** True while nobody is signed in and the sheet has to be open. */
    isClosed,

    /** Who is signed in, or null on the sign-in screen. Opens the gate and lets the held calls go on. */
    signedIn(id: string) {
      personId = id;
      isClosed.set(false);
      settleAll((call) => (call.kind === 'read' || call.personId === id ? 'again' : 'other-person'));
    },

    /** Nobody is here any more, on purpose: the held calls are given up. */
    leave() {
      personId = null;
      isClosed.set(false);
      settleAll(() => 'gave-up');
    },

    /** The sign-in has ended under the person's hands. */
    close() {
      if (personId === null || isClosed.get()) return;
      isClosed.set(true);
      for (const listener of [...listeners]) listener();
    },

    /** Hold a call that was answered 401 until somebody signs in. */
    hold(kind: HeldCall['kind'], signal?: AbortSignal): Promise<Verdict> {
      const owner = personId;
      if (owner === null) return Promise.resolve('gave-up');
      this.close();
      return new Promise((resolve, reject) => {
        const call: HeldCall = { kind, personId: owner, settle: resolve };
        held.add(call);
        signal?.addEventListener('abort', () => {
          if (held.delete(call)) reject(signal.reason instanceof Error ? signal.reason : new Error('aborted'));
        });
      });
    },

    /** Called once each time a sign-in ends under the person's hands. Returns the way to stop listening. */
    onSignedOut(listener: () => void) {
      listeners.add(listener);
      return () => {
        listeners.delete(listener);
      };
    },

    get heldCalls() {
      return held.size;
    },
  };
}

export const signedOutGate = createSignedOutGate();
