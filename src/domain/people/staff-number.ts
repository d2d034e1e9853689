/** Characters of a staff number, at most. */
export const greatestStaffNumberLength = 20;

/** Letters, digits and the signs people put between them. */
export const staffNumberPattern = /^[0-9A-Z][0-9A-Z._/-]*$/;

/** As kept and compared: t1042 is T1042. */
export function normalizeStaffNumber(text: string): string {
  return text.normalize('NFKC').trim().toUpperCase();
}
