import type { LoadState } from '#contract/loads';

/** What a load is doing, in a word or two. */
export const stateWords: Readonly<Record<LoadState, string>> = {
  building: 'Loading',
  closed: 'Closed',
  'in-sterilizer': 'In the sterilizer',
  cooling: 'Cooling',
  'awaiting-proof': 'Waits for proof',
  'ready-to-sign': 'Ready to sign',
  released: 'Released',
  'released-implant-early': 'Released, implant early',
  held: 'Held',
  failed: 'Failed',
  'set-aside': 'Set aside',
  aborted: 'Cycle broken off',
  abandoned: 'Given up',
};
