import { accept, refuse, type Result } from '../result';
import { isRun, repeatedPiece } from './guessable';

/*
 * The PIN goes with a badge and only with it. Six digits are fewer than the eight characters NIST SP 800-63B-4, 3.1.1.2
 * asks of a password beside another factor, and a printed badge can be copied: that is the price of a change of person
 * with gloves on in two seconds. So a badge and PIN open the work at a station, throttled and for ten idle minutes at
 * most, and no act upon other people's sign-ins.
 */

/** Digits. Six as for other short numeric secrets: NIST SP 800-63B-4, 3.1.2.1 and 3.2.10 (draft read). */
export const leastPinLength = 6;
export const greatestPinLength = 12;

export type PinRefusal = 'not-digits' | 'too-short' | 'too-long' | 'guessable' | 'own-number';

export type PinSurroundings = {
  /** Whether a list of common or leaked passwords holds these digits. */
  readonly isCommon: (text: string) => boolean;
  /** Staff number and badge code: whoever finds the badge reads them. */
  readonly numbers: readonly string[];
};

/** 112233 becomes 123, 123321 becomes 123. */
function undoubled(pin: string): string {
  const half = pin.slice(0, Math.ceil(pin.length / 2));
  if (
    pin ===
    half +
      Array.from(half)
        .reverse()
        .join('')
        .slice(pin.length % 2)
  )
    return half;
  return /^(?:(\d)\1)+$/.test(pin) ? pin.replace(/(\d)\1/g, '$1') : pin;
}

/** @returns the PIN as it is to be hashed, or why not */
export function judgePin(pin: string, { isCommon, numbers }: PinSurroundings): Result<string, PinRefusal> {
  if (!/^[0-9]*$/.test(pin)) return refuse('not-digits', 'A PIN has digits only.');
  if (pin.length < leastPinLength) return refuse('too-short', `Use at least ${leastPinLength} digits.`);
  if (pin.length > greatestPinLength) return refuse('too-long', `Use at most ${greatestPinLength} digits.`);
  const core = undoubled(pin);
  if (isRun(pin) || repeatedPiece(pin).length < pin.length || isRun(core) || isCommon(pin)) {
    return refuse('guessable', 'This is one of the PINs that are tried first. Choose another.');
  }
  const isInNumber = numbers.some((number) => {
    const digits = number.replace(/[^0-9]/g, '');
    return digits.length >= 4 && (digits.includes(pin) || pin.includes(digits));
  });
  if (isInNumber) return refuse('own-number', 'This is part of your badge or staff number. Choose another.');
  return accept(pin);
}
