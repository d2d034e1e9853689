import type { Placement } from './model';

/** The six answers a scan of a package can give. Only `taken` changes anything. */
export type ScanAnswer =
  | { readonly answer: 'taken'; readonly look: ScanLook | null }
  | { readonly answer: 'already-here' }
  | { readonly answer: 'not-ready'; readonly because: NotReadyReason }
  | { readonly answer: 'not-known' }
  | { readonly answer: 'held' }
  | { readonly answer: 'called-back' };

/** Taken, but look: it is on the load, and something wants a second glance. */
export type ScanLook = 'no-slot-left' | 'no-place-found' | 'not-on-the-list';

export type NotReadyReason = 'in-another-load' | 'already-processed' | 'not-packed' | 'expired' | 'used' | 'discarded';

export type ScanReply = {
  readonly answer: ScanAnswer;
  /** What happened, for the person holding the package. */
  readonly sentence: string;
  readonly placement: Placement | null;
};
