/**
 * The GS1 check digit of a row of digits that stands before it: weights 3, 1, 3, 1 from the right, up to the next ten
 * (GS1, "How to calculate a check digit manually"). One digit; `digits` must be digits only.
 */
export function gs1CheckDigit(digits: string): string {
  let sum = 0;
  for (let fromRight = 0; fromRight < digits.length; fromRight += 1) {
    sum += Number(digits.charAt(digits.length - 1 - fromRight)) * (fromRight % 2 === 0 ? 3 : 1);
  }
  return String((10 - (sum % 10)) % 10);
}

/** Whether the last of a row of digits is the check digit of the others. */
export function hasGs1CheckDigit(digits: string): boolean {
  return /^\d{2,}$/.test(digits) && gs1CheckDigit(digits.slice(0, -1)) === digits.slice(-1);
}
