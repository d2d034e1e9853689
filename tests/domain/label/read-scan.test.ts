import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { groupSeparator } from '#domain/label/gs1';
import { hibcCheckCharacter } from '#domain/label/hibc';
import { formatLoadStickerCode } from '#domain/label/load-sticker-code';
import { formatOwnCode } from '#domain/label/own-code';
import { greatestScanLength, readScan } from '#domain/label/read-scan';
import { unreadableReasons } from '#domain/label/unreadable-scan';
import vectors from '../../support/vectors/codes.json';
import { oneCharacterOf } from '../../support/one-character-of';

const sticker = formatLoadStickerCode({ packageCode: 'P-20431784-52', loadNumber: '2-26076-03', copy: 2 });
const pouch = { kind: 'package', code: 'P-20431784-52', itemKind: 'pouch', number: 20_431_784, gtin: null };

function reasonOf(raw: string): string {
  const scan = readScan(raw);
  return scan.kind === 'unreadable' ? scan.reason : `read as ${scan.kind}`;
}

describe('a scan of a label of ours', () => {
  test.each(['P2043178452', 'P-20431784-52', ' p2043178452\r\n', ']C0P2043178452', ']d1P2043178452'])(
    '%j is the pouch',
    (raw) => {
      expect(readScan(raw)).toEqual(pouch);
    },
  );

  test('tells places, badges and load stickers apart', () => {
    expect(readScan('H-00012-31')).toEqual({ kind: 'place', place: 'holder', code: 'H-00012-31', number: 12 });
    expect(readScan(']C0S0000783')).toEqual({ kind: 'place', place: 'shelf', code: 'S-00007-83', number: 7 });
    expect(readScan('n4812093796')).toEqual({ kind: 'badge', code: 'N-48120937-96', number: 48_120_937 });
    expect(readScan(`]d1${sticker}\r`)).toEqual({
      kind: 'load-sticker',
      code: sticker,
      packageCode: 'P-20431784-52',
      loadNumber: '2-26076-03',
      copy: 2,
    });
  });

  test.each([
    ['(01) and (21), where the facility gave out the GTIN', `]d2010950110153000321P2043178452`],
    ['(01) and (91), where the maker did', `${groupSeparator}010950110153000391P2043178452`],
    ['the form printed for people', '(01)09501101530003(91)P2043178452'],
  ])('inside a GS1 symbol, %s, is the pouch and names the item', (_what, raw) => {
    expect(readScan(raw)).toEqual({ ...pouch, gtin: '09501101530003' });
  });

  test('is not seen in a maker’s serial number that only looks like it', () => {
    for (const serial of ['P2043178453', 'p2043178452', 'P-20431784-52', 'P2043178452X', 'H0001231']) {
      expect(readScan(`]d2010950110153000321${serial}`)).toMatchObject({ kind: 'device', serial });
    }
  });

  test.each([
    ['P2043178453', 'check-character'],
    ['P2043718452', 'check-character'],
    ['P204317845', 'truncated'],
    ['P-2043', 'truncated'],
    ['H-0001', 'truncated'],
    ['P2043178452P2043178452', 'two-codes'],
    ['H0001231P2043178452', 'two-codes'],
    [sticker.slice(0, -1), 'check-character'],
    ['P&éç"é', 'foreign'],
    ['Pé à', 'foreign'],
    ['Pàà', 'foreign'],
  ])('that went wrong, %j, is called %s', (raw, reason) => {
    expect(reasonOf(raw)).toBe(reason);
  });

  test('typed for an AZERTY keyboard is recognised, and nothing is guessed from it', () => {
    const azerty = (text: string) => text.replace(/[0-9]/g, (digit) => 'à&é"\'(-è_ç'.charAt(Number(digit)));
    expect(reasonOf(azerty('P2043178452'))).toBe('keyboard-layout');
    expect(reasonOf(azerty('0109501101530003'))).toBe('keyboard-layout');
    expect(reasonOf(azerty('P2043178453'))).toBe('foreign');
  });
});

describe('a scan of a maker’s label', () => {
  test.each(vectors.deviceIdentification.filter((row) => row.id === 'fda-gs1'))('$input.bracketed: $source', (row) => {
    const scanned = (row.expected.scanned ?? '').replace('<GS>', groupSeparator);
    for (const raw of [
      scanned,
      `]C1${scanned}`,
      `]d2${scanned}`,
      `]Q3${scanned}`,
      groupSeparator + scanned,
      `]C1${groupSeparator}${scanned}${groupSeparator}\r`,
      row.input.bracketed ?? '',
    ]) {
      expect(readScan(raw)).toEqual({
        kind: 'device',
        scheme: 'gs1',
        identifierKind: 'gtin',
        deviceIdentifier: row.expected.di,
        lot: row.expected.lot,
        serial: row.expected.serial,
        expires: row.expected.expires,
        made: row.expected.manufactured,
      });
    }
  });

  // GTIN of GS1's own examples, as an open-source test asserts it; 4006381333931 from memory, its check digit holds.
  test.each([
    ['4006381333931', '04006381333931'],
    [']E04006381333931', '04006381333931'],
    ['036000291452', '00036000291452'],
    ['09501101530003', '09501101530003'],
    [']E496385074', '00000096385074'],
  ])('of retail form, %j, is GTIN %s', (raw, deviceIdentifier) => {
    expect(readScan(raw)).toMatchObject({ kind: 'device', scheme: 'gs1', identifierKind: 'gtin', deviceIdentifier });
  });

  test('of an asset has its own kind of identifier', () => {
    expect(readScan(']C18004ASSET-7')).toMatchObject({ identifierKind: 'giai', deviceIdentifier: 'ASSET-7' });
    expect(readScan(']C1800302112345678900SN7')).toMatchObject({
      identifierKind: 'grai',
      deviceIdentifier: '02112345678900SN7',
    });
  });

  test('dates itself by the year it is now', () => {
    const expires = (currentYear: number) => {
      const scan = readScan('01095011015300031776093010A', { currentYear });
      return scan.kind === 'device' ? scan.expires : null;
    };
    expect(expires(2026)).toBe('2076-09-30');
    expect(expires(2021)).toBe('1976-09-30');
    expect(readScan('01095011015300031726020010A')).toMatchObject({ expires: '2026-02-28' });
  });

  test('of the health industry is read, with or without what stands around it', () => {
    const device = { kind: 'device', scheme: 'hibc', identifierKind: 'hibc', deviceIdentifier: 'A123BJC5D6E71' };
    for (const raw of ['+A123BJC5D6E71G', ']C0+A123BJC5D6E71G\r\n', '*+A123BJC5D6E71G*', ']A0a123BJC5D6E71G']) {
      expect(readScan(raw)).toMatchObject(device);
    }
    // Check character 3: test of an open-source encoder, in the vectors.
    expect(readScan('+A99912345/$$52001510X33')).toMatchObject({
      deviceIdentifier: 'A99912345',
      expires: '2020-01-15',
      lot: '10X3',
    });
  });

  test.each([
    [']C117260930', 'second-half'],
    ['1726093010LOT7', 'second-half'],
    ['+$LOT7G3', 'check-character'],
    [`+$$3260930LOT7K${hibcCheckCharacter('+$$3260930LOT7K') ?? ''}`, 'second-half'],
    ['00376104250021234569', 'shipping'],
    [']C10209501101530003375', 'shipping'],
    ['0109501101530004', 'check-character'],
    [']E04006381333930', 'check-character'],
    [']E0400638133393', 'check-character'],
    ['(01)09501101530003(17)260230', 'damaged'],
    [']d20109501101530003', 'read as device'],
    [']d2891234', 'foreign'],
    ['991234', 'foreign'],
    ['4006381333930', 'foreign'],
    ['+A123BJC5D6E71H', 'check-character'],
    ['https://example.org/01/09501101530003', 'foreign'],
  ])('%j is called %s', (raw, reason) => {
    expect(reasonOf(raw)).toBe(reason);
  });
});

describe('a scan of nothing that can be used', () => {
  test.each([
    ['', 'empty'],
    [' \r\n\t', 'empty'],
    [groupSeparator, 'empty'],
    ['A'.repeat(10_000), 'too-long'],
    ['\u0000', 'control-characters'],
    ['P2043178452\u0007', 'control-characters'],
    ['P204317\n8452', 'control-characters'],
    ['P2043178452\u009b', 'control-characters'],
    ['P2043178452\ud800', 'control-characters'],
    ['\udc00P2043178452', 'control-characters'],
    ['Schere, gebogen', 'foreign'],
    ['P-01', 'foreign'],
    ['🙂', 'foreign'],
    ['٠١٠٩٥٠١١٠١٥٣٠٠٠٣', 'foreign'],
    [']C1', 'foreign'],
    ['(', 'foreign'],
    ['(01)', 'damaged'],
    ['+', 'foreign'],
    ['L', 'foreign'],
  ])('%j is %s', (raw, reason) => {
    expect(reasonOf(raw)).toBe(reason);
  });

  test('always comes with one plain sentence and a reason from the closed list', () => {
    const anything = fc.oneof(
      fc.string({ unit: 'binary', maxLength: 300 }),
      fc.array(fc.integer({ min: 0, max: 0xffff }), { maxLength: 300 }).map((units) => String.fromCharCode(...units)),
      fc.string({ unit: oneCharacterOf('PHSNL+]C1d2()0109\u001d-$/ %\\é&"'), maxLength: 300 }),
      fc.constant(']C1').chain((prefix) => fc.string({ unit: 'binary-ascii' }).map((text) => prefix + text)),
    );
    fc.assert(
      fc.property(anything, (raw) => {
        const scan = readScan(raw);
        if (scan.kind !== 'unreadable') return;
        expect(unreadableReasons).toContain(scan.reason);
        expect(scan.sentence).toMatch(/^[A-Z][^.]+\./);
        expect(scan.sentence).not.toMatch(/invalid|error|undefined|entity|status/i);
      }),
      { numRuns: 3000 },
    );
  });

  test('comes of every readable scan that lost its end, unless what is left is whole in itself', () => {
    const readable = [
      'P2043178452',
      'H0001231',
      'N4812093796',
      sticker,
      '+A123BJC5D6E71G',
      '010950110153000391P2043178452',
    ];
    for (const raw of readable) {
      for (let length = 1; length < raw.length; length += 1) {
        const scan = readScan(raw.slice(0, length));
        const isGtinAlone = raw.startsWith('0109501101530003') && length >= 16;
        if (!isGtinAlone) expect([raw.slice(0, length), scan.kind]).toEqual([raw.slice(0, length), 'unreadable']);
        else expect(scan.kind).not.toBe('package');
      }
    }
  });

  test('comes of every code of ours with one character changed or a pair swapped, through the same door', () => {
    const letter = fc.constantFrom('P', 'T', 'K', 'X', 'B', 'C', 'H', 'S', 'N');
    const edit = fc.tuple(fc.nat(), oneCharacterOf('0123456789ABCDEFGHJKMNPQRSTUVWXYZ+*/$'), fc.boolean());
    fc.assert(
      fc.property(letter, fc.nat({ max: 99_999 }), edit, (kind, number, [at, character, isSwap]) => {
        const code = formatOwnCode(kind, number).replaceAll('-', '');
        const place = at % (code.length - 1);
        const wrong = isSwap
          ? code.slice(0, place) + code.charAt(place + 1) + code.charAt(place) + code.slice(place + 2)
          : code.slice(0, place) + character + code.slice(place + 1);
        fc.pre(wrong !== code);
        expect([wrong, readScan(wrong).kind]).toEqual([wrong, 'unreadable']);
      }),
      { numRuns: 1000 },
    );
  });

  test('takes no longer for the worst texts than for a label', () => {
    const worst = ['(', '\\(', '(01', '-', '+', '01', groupSeparator, '$', '/', ' ', 'P2043178452', '*', '(90)'].map(
      (piece) => piece.repeat(greatestScanLength).slice(0, greatestScanLength),
    );
    const started = performance.now();
    for (let round = 0; round < 100; round += 1) for (const raw of worst) readScan(raw);
    // 1,300 scans of the greatest length: a tenth of a second each would take over two minutes.
    expect(performance.now() - started).toBeLessThan(2000);
  });
});
