import { randomInt } from 'node:crypto';
import { formatBadgeCode, greatestBadgeNumber } from '#domain/label/badge-code';
import { judgePin, leastPinLength } from '#domain/people/pin-policy';
import { isCommonPassword } from '../../platform/common-passwords';

/** Hours a one-time password can be signed in with. */
export const oneTimePasswordHours = 24;

/** No letter or digit that is read for another: it is read out or copied from a slip of paper, once. */
const alphabet = 'abcdefghjkmnpqrstuvwxyz23456789';

/** Sixteen characters of 31: 79 bits. */
export function drawOneTimePassword(): string {
  const group = () => Array.from({ length: 4 }, () => alphabet.charAt(randomInt(alphabet.length))).join('');
  return [group(), group(), group(), group()].join('-');
}

/** A PIN that passes the policy for this badge. */
export function drawPin(numbers: readonly string[]): string {
  for (;;) {
    const pin = String(randomInt(10 ** leastPinLength)).padStart(leastPinLength, '0');
    if (judgePin(pin, { isCommon: isCommonPassword, numbers }).ok) return pin;
  }
}

export function drawBadgeCode(): string {
  return formatBadgeCode(randomInt(greatestBadgeNumber + 1));
}
