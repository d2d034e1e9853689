import { expect, test } from 'vitest';
import { normalizeStaffNumber, staffNumberPattern } from '../../../src/domain/people/staff-number';

test('takes small letters, spaces at the ends and wide letters for the same number', () => {
  expect([' t1042 ', 'T1042', 'Ｔ１０４２'].map(normalizeStaffNumber)).toEqual(['T1042', 'T1042', 'T1042']);
});

test('is made of letters, digits and what stands between them', () => {
  for (const number of ['1042', 'T1042', 'CSD-1042', '10.42', 'N/7_1']) expect(number).toMatch(staffNumberPattern);
  for (const number of ['', '-1042', 'T 1042', 'É1042', 'T1042\n9']) expect(number).not.toMatch(staffNumberPattern);
});
