import fc from 'fast-check';

/** Any one character of a text: the unit of random strings over an alphabet. */
export function oneCharacterOf(alphabet: string): fc.Arbitrary<string> {
  return fc.constantFrom(...Array.from(alphabet));
}
