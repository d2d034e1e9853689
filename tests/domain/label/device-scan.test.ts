import { describe, expect, test } from 'vitest';
import { readGs1Scan, readHibcScan } from '#domain/label/device-scan';

const gs1 = (data: string, content: 'gs1' | 'retail' | 'plain' | 'unknown' = 'unknown') =>
  readGs1Scan({ content, data }, 2026);

describe('what a maker’s label says', () => {
  test('is an element string when the scanner says so, or when it begins with a whole key', () => {
    const device = { kind: 'device', deviceIdentifier: '09501101530003', lot: 'A1' };
    expect(gs1('010950110153000310A1')).toMatchObject(device);
    expect(gs1('10A1\u001d0109501101530003', 'gs1')).toMatchObject(device);
    expect(gs1('10A1\u001d0109501101530003')).toBe(null);
    expect(gs1('01095011015300', 'plain')).toBe(null);
  });

  test('is a retail number only in full length and with its check digit', () => {
    expect(gs1('4006381333931')).toMatchObject({ deviceIdentifier: '04006381333931' });
    expect(gs1('4006381333931', 'plain')).toBe(null);
    expect(gs1('96385074')).toBe(null);
    expect(gs1('96385074', 'retail')).toMatchObject({ deviceIdentifier: '00000096385074' });
    expect(gs1('9638507A', 'retail')).toMatchObject({ kind: 'unreadable', reason: 'check-character' });
  });

  test('gives the whole key of an asset, with its serial part', () => {
    expect(gs1('8004ASSET-7')).toMatchObject({ identifierKind: 'giai', deviceIdentifier: 'ASSET-7' });
    expect(gs1('800302112345678900ABC')).toMatchObject({ identifierKind: 'grai' });
  });

  test('can hold a package of ours, as serial number or as company internal information', () => {
    const own = { own: { code: 'P-20431784-52' }, gtin: '09501101530003' };
    expect(gs1('010950110153000321P2043178452')).toMatchObject(own);
    expect(gs1('010950110153000399P2043178452')).toMatchObject(own);
    expect(gs1('91P2043178452', 'gs1')).toMatchObject({ own: { code: 'P-20431784-52' }, gtin: null });
    expect(gs1('010950110153000310P2043178452')).toMatchObject({ kind: 'device', lot: 'P2043178452' });
  });

  test('is in no health industry code unless it begins as one', () => {
    expect(readHibcScan('+A123BJC5D6E71G', 2026)).toMatchObject({ deviceIdentifier: 'A123BJC5D6E71' });
    expect(readHibcScan('+A123BJC5D6E71H', 2026)).toMatchObject({ kind: 'unreadable', reason: 'check-character' });
    expect(readHibcScan('b123BJC5D6E71G', 2026)).toBe(null);
    expect(readHibcScan('A123BJC5D6E71G', 2026)).toBe(null);
  });
});
