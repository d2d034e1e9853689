import type { Transaction } from '../../platform/db';
import { RuleRefused } from '../../platform/errors';
import type { Holder } from '../equipment/read-model';
import { openLoadOfHolder } from './open-load-read-model';

/**
 * Locks holders, always in the same order, so that two loads that want the same ones wait for each other instead of
 * blocking each other for good. To be called before packages are locked.
 */
export async function lockHolders(trx: Transaction, holderIds: readonly string[]): Promise<void> {
  await trx('holders')
    .whereIn('holders.id', [...holderIds])
    .orderBy('holders.id')
    .select('holders.id')
    .forUpdate();
}

/**
 * Why a holder cannot be put on a cart now, in words; null when it can. Two loads may want one holder at once: it is
 * locked first, so whoever comes first gets it and the other is told.
 */
export async function whyHolderIsNotFree(trx: Transaction, holder: Holder): Promise<string | null> {
  await lockHolders(trx, [holder.holderId]);
  const elsewhere = await openLoadOfHolder(trx, holder.holderId);
  if (elsewhere !== undefined) {
    return `${holder.name} is on load ${elsewhere}. Take it off there first, or take another.`;
  }
  switch (holder.condition) {
    case 'good':
      return null;
    case 'missing':
      return `${holder.name} is marked as missing. Take another holder, and tell your supervisor that it is here.`;
    case 'in-repair':
      return `${holder.name} is marked as in repair. Take another holder.`;
  }
}

/** @throws RuleRefused when the holder is on another load or not usable */
export async function requireHolderFree(trx: Transaction, holder: Holder): Promise<void> {
  const against = await whyHolderIsNotFree(trx, holder);
  if (against !== null) throw new RuleRefused('holder.not-free', against);
}
