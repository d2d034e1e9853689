/*
 * The last two digits of every code of ours are check characters: ISO/IEC 7064, MOD 97-10.
 *
 * Why this system of the standard's eight. Its scope (1.3) promises that every system catches all single substitutions,
 * and only "all or nearly all" swaps of neighbours; which of them catch all swaps has to be worked out:
 *   MOD 37,36 and the other hybrid systems miss some swaps of neighbours (the test beside this file lists them).
 *   MOD 37-2 catches all, at the price of "*" as a 37th check character, and of O, I and other look-alikes in the code.
 *   MOD 97-10 catches all, needs digits only, and lets 1 in 97 other errors through instead of 1 in 37.
 * Digits are also what a keypad types, what is read aloud without spelling, and what Code 128 packs two to a character:
 * with two check digits the symbol is shorter (112 modules) than with one check letter (123).
 *
 * The proof. With c(k) for the value of the character at place k from the right, a code holds when the sum of c(k) * 10^k
 * leaves 1 modulo 97. One wrong character changes the sum by d * 10^k, two swapped neighbours by 9 * d * 10^k, where d is
 * the difference of two values and less than 97; 97 is prime and divides neither 10, nor 9, nor d, so the remainder moves.
 *
 * Characters other than digits: A is 10 to Z is 35, as ISO 17442 and ISO 13616 write letters for MOD 97-10, and the hyphen
 * is 36. For a code of one letter followed by digits, which all of ours but the load sticker's are, that is the standard's
 * own calculation on the number that is written when the letter is replaced by its two digits.
 */
const modulus = 97;
const radix = 10;

/** Digits, letters, hyphen: the place in this string is the value. */
export const checkedAlphabet = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ-';

/** The remainder modulo 97 of a string whose characters are digits of base 10, whatever their value; null for a character outside the alphabet. */
function remainder(text: string): number | null {
  let sum = 0;
  for (const character of text) {
    const value = checkedAlphabet.indexOf(character);
    if (value < 0) return null;
    sum = (sum * radix + value) % modulus;
  }
  return sum;
}

/**
 * The two check digits to write after `body`, "02" to "98" (ISO/IEC 7064, MOD 97-10).
 * Throws a RangeError for a character outside digits, capital letters and hyphen: only our own codes are written with it.
 */
export function checkCharactersOf(body: string): string {
  const rest = remainder(`${body}00`);
  if (rest === null) throw new RangeError('Check characters are defined for digits, capital letters and hyphens.');
  return String(modulus + 1 - rest).padStart(2, '0');
}

/** Whether the last two characters of `text` are the check digits of what stands before them. */
export function hasItsCheckCharacters(text: string): boolean {
  const body = text.slice(0, -2);
  return body.length > 0 && remainder(body) !== null && checkCharactersOf(body) === text.slice(-2);
}
