import type { ItemKind } from '#domain/load/model';
import { Icon, type IconName } from './icon';

const icons: Readonly<Record<ItemKind, IconName>> = {
  pouch: 'pouch',
  'rigid-container': 'box',
  'wrapped-tray': 'tray',
  'textile-pack': 'textile',
  basin: 'basin',
  'challenge-device': 'challenge',
};

const words: Readonly<Record<ItemKind, readonly [one: string, many: string]>> = {
  pouch: ['pouch', 'pouches'],
  'rigid-container': ['rigid container', 'rigid containers'],
  'wrapped-tray': ['wrapped tray', 'wrapped trays'],
  'textile-pack': ['textile pack', 'textile packs'],
  basin: ['basin', 'basins'],
  'challenge-device': ['challenge device', 'challenge devices'],
};

/** "1 pouch", "16 pouches" */
export function countOfKind(kind: ItemKind, count: number): string {
  const [one, many] = words[kind];
  return `${count} ${count === 1 ? one : many}`;
}

/** "rigid container" */
export function kindInWords(kind: ItemKind): string {
  return words[kind][0];
}

/** What kind of package it is, as a small drawing beside its name. */
export function KindIcon({ kind, size = 18, className = '' }: { kind: ItemKind; size?: number; className?: string }) {
  return <Icon name={icons[kind]} size={size} className={className} />;
}

/** Beside the name of an implant: the mark and the word. */
export function ImplantMark() {
  return (
    <span className="inline-flex items-center gap-1 text-small font-label whitespace-nowrap text-ink-1">
      <Icon name="implant" size={16} />
      Implant
    </span>
  );
}
