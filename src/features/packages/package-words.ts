import type { PackageSummary } from '#contract/packages';

/** The state of a package, as a heading says it. */
export const packageStateWords: Readonly<Record<PackageSummary['state'], string>> = {
  packed: 'Packed',
  staged: 'Staged',
  'in-load': 'In a load',
  processed: 'Processed',
  sterile: 'Sterile',
  quarantined: 'Quarantined',
  stored: 'Stored',
  'on-case-cart': 'On a case cart',
  used: 'Used',
  returned: 'For reprocessing',
  recalled: 'Called back',
  discarded: 'Discarded',
};

/** What speaks against using it, before its state is even asked; null when nothing does. */
export function troubleWith(one: Pick<PackageSummary, 'state' | 'heldReason' | 'isExpired'>): string | null {
  if (one.state === 'recalled') return 'Called back';
  if (one.heldReason !== null) return 'Held';
  return one.isExpired ? 'Past its last day' : null;
}
