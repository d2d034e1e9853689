import type { HolderCondition, SizeClass } from '#domain/catalogue/equipment-fields';
import type { HolderKind, Shelf } from '#domain/load/model';

export const sizeClassWords: Readonly<Record<SizeClass, string>> = { large: 'Large', small: 'Small' };

export const surfaceWords: Readonly<Record<Shelf['surface'], string>> = { wire: 'Wire', solid: 'Solid' };

export const formWords: Readonly<Record<HolderKind['form'], string>> = {
  rack: 'Rack',
  basket: 'Basket',
  wedge: 'Wedge',
  spacer: 'Spacer',
};

export const conditionWords: Readonly<Record<HolderCondition, string>> = {
  good: 'Good',
  'in-repair': 'In repair',
  missing: 'Missing',
};

/** Choices of a list, in the words people see. */
export function optionsOf<Value extends string>(
  values: readonly Value[],
  words: Readonly<Record<Value, string>>,
): { value: Value; label: string }[] {
  return values.map((value) => ({ value, label: words[value] }));
}

/** Only what differs from what is kept. */
export function changesBetween<Fields extends object>(before: object, after: Fields): Partial<Fields> {
  const known = before as Readonly<Record<string, unknown>>;
  const changed = Object.entries(after).filter(
    ([name, value]) => JSON.stringify(known[name]) !== JSON.stringify(value),
  );
  return Object.fromEntries(changed) as Partial<Fields>;
}
