import type { FindingPlace } from '../finding';
import type { LoadPackage } from '../model';

export const onLoad: readonly FindingPlace[] = [{ on: 'load' }];

export function onPackage(...packages: readonly Pick<LoadPackage, 'packageId'>[]): readonly FindingPlace[] {
  return packages.map(({ packageId }) => ({ on: 'package', packageId }));
}

export function onShelf(shelf: { readonly id: string }): readonly FindingPlace[] {
  return [{ on: 'shelf', shelfId: shelf.id }];
}

export function onHolder(holder: { readonly holderId: string }, slot: number | null = null): FindingPlace {
  return { on: 'holder', holderId: holder.holderId, slot };
}
