import type { Shelf } from '../model';
import type { Scene } from './scene';

export type ShelfTally = {
  readonly shelf: Shelf;
  readonly scanned: number;
  /** What a person counted without seeing the other number; null where nobody has. */
  readonly counted: number | null;
};

export function talliesOf(scene: Scene): readonly ShelfTally[] {
  const countedOn = new Map(scene.view.counts.map((count) => [count.shelfId, count.counted]));
  const scannedOn = new Map<string, number>();
  for (const listed of scene.listed) {
    const shelfId = listed.one.isScanned ? scene.shelfIdOf(listed) : undefined;
    if (shelfId !== undefined) scannedOn.set(shelfId, (scannedOn.get(shelfId) ?? 0) + 1);
  }
  return scene.layout.shelves.map(({ shelf }) => ({
    shelf,
    scanned: scannedOn.get(shelf.id) ?? 0,
    counted: countedOn.get(shelf.id) ?? null,
  }));
}
