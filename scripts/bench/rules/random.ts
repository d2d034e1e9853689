/** Choices that come out the same every time for the same seed. */
export type Random = {
  /** From 0 up to but not including 1. */
  readonly next: () => number;
  /** A whole number from least to greatest, both included. */
  readonly whole: (least: number, greatest: number) => number;
  readonly chance: (share: number) => boolean;
  readonly pick: <Value>(values: readonly Value[]) => Value;
  readonly shuffled: <Value>(values: readonly Value[]) => Value[];
};

/** Mulberry32, seeded with an FNV-1a hash of the parts; both from memory, and any other would do as well. */
export function randomFrom(...parts: readonly (number | string)[]): Random {
  let state = 0x811c9dc5;
  for (const character of parts.join('|')) {
    state = Math.imul(state ^ (character.codePointAt(0) ?? 0), 0x01000193);
  }

  function next(): number {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  }

  const whole = (least: number, greatest: number) => least + Math.floor(next() * (greatest - least + 1));

  function pick<Value>(values: readonly Value[]): Value {
    const index = whole(0, values.length - 1);
    if (index >= values.length || values.length === 0) throw new Error('nothing to pick from');
    return values[index] as Value;
  }

  function shuffled<Value>(values: readonly Value[]): Value[] {
    const left = [...values];
    const order: Value[] = [];
    while (left.length > 0) order.push(...left.splice(whole(0, left.length - 1), 1));
    return order;
  }

  return { next, whole, chance: (share) => next() < share, pick, shuffled };
}
