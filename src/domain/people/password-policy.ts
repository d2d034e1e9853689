import { accept, refuse, type Result } from '../result';
import { isRun, repeatedPiece } from './guessable';

/*
 * A password is long, and not one that others would try first; nothing else is asked of it.
 * NIST SP 800-63B-4, 3.1.1.2 (draft read; 15 characters as the only factor: final edition, read second-hand) and OWASP
 * ASVS 5.0, 6.2.1, 6.2.4, 6.2.5, 6.2.9, 6.2.10: length counted in code points, no rules about kinds of characters, no
 * periodic change, the whole password compared with a list of common ones and with words of the place and derivatives
 * of them. Words within a longer phrase are nobody's business.
 */

/** Characters (Unicode code points, after normalization to NFKC). */
export const leastPasswordLength = 15;
/** Characters. NIST asks for 64 at least; beyond this only hashing gets slower. */
export const greatestPasswordLength = 128;

export type PasswordRefusal = 'too-short' | 'too-long' | 'not-typable' | 'common' | 'repetitive' | 'of-this-place';

export type PasswordSurroundings = {
  /** Whether a list of common or leaked passwords holds this very text, in small letters. */
  readonly isCommon: (text: string) => boolean;
  /** Names and numbers of the person, the facility and the like. */
  readonly words: readonly string[];
};

/** What anyone here would think of first. */
const wordsOfThePlace = [
  'paperside',
  'password',
  'passphrase',
  'passwort',
  'welcome',
  'letmein',
  'changeme',
  'login',
  'signin',
  'admin',
  'administrator',
  'technician',
  'supervisor',
  'surveyor',
  'hospital',
  'clinic',
  'central',
  'sterile',
  'sterilizer',
  'sterilization',
  'processing',
  'department',
  'steam',
  'autoclave',
  'badge',
  'scanner',
] as const;

/** Fewer letters and digits than this of one's own do not make a phrase. */
const leastOwnPart = 5;

const guidance = 'Three or four unrelated words are easy to keep in mind and hard to guess.';

function lettersAndDigits(text: string): string {
  return text.replace(/[^\p{L}\p{N}]/gu, '');
}

function withoutEnds(text: string): string {
  return text.replace(/^\P{L}+|\P{L}+$/gu, '');
}

/** What is left when the words of the place are taken out, and the digits people put beside such words. */
function ownPart(folded: string, words: readonly string[]): string {
  const known = [...wordsOfThePlace, ...words.flatMap((word) => word.toLowerCase().split(/[^\p{L}\p{N}]+/u))]
    .filter((word) => word.length >= 3)
    .sort((a, b) => b.length - a.length);
  const rest = known.reduce((text, word) => text.replaceAll(word, ''), folded);
  return rest === folded ? folded : rest.replace(/\p{N}/gu, '');
}

/** @returns the password as it is to be hashed, or why not */
export function judgePassword(
  password: string,
  { isCommon, words }: PasswordSurroundings,
): Result<string, PasswordRefusal> {
  const normal = password.normalize('NFKC');
  const length = Array.from(normal).length;
  if (length < leastPasswordLength) {
    return refuse('too-short', `Use at least ${leastPasswordLength} characters. ${guidance}`);
  }
  if (length > greatestPasswordLength) return refuse('too-long', `Use at most ${greatestPasswordLength} characters.`);
  if (/[\p{Cc}\p{Cs}]/u.test(normal)) {
    return refuse('not-typable', 'This has a character that cannot be typed on every keyboard.');
  }

  const small = normal.toLowerCase();
  const folded = lettersAndDigits(small);
  const piece = repeatedPiece(folded);
  if (new Set(folded).size < 5 || piece.length < leastOwnPart || isRun(folded)) {
    return refuse('repetitive', `This repeats itself or follows a row of keys. ${guidance}`);
  }
  if ([small, folded, piece, withoutEnds(folded), withoutEnds(piece)].some(isCommon)) {
    return refuse('common', `This is one of the passwords that are tried first. ${guidance}`);
  }
  if (Array.from(ownPart(folded, words)).length < leastOwnPart) {
    return refuse('of-this-place', `This is made of names and words that anyone here knows. ${guidance}`);
  }
  return accept(normal);
}
