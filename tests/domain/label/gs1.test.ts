import bwipjs from 'bwip-js/node';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { gs1CheckDigit } from '#domain/label/gs1-check-digit';
import { elementValue, groupSeparator, parseBracketedElements, parseElementString } from '#domain/label/gs1';
import vectors from '../../support/vectors/codes.json';
import { oneCharacterOf } from '../../support/one-character-of';

/** The vectors write "^" for FNC1, as the GS1 Barcode Syntax Engine does. */
const withSeparators = (text: string) => text.replaceAll('^', groupSeparator);

function refusalOf(text: string): string | null {
  const parsed = parseElementString(text);
  return parsed.ok ? null : parsed.refusal.code;
}

const gtin = fc
  .string({ unit: oneCharacterOf('0123456789'), minLength: 13, maxLength: 13 })
  .map((digits) => digits + gs1CheckDigit(digits));

describe('element strings', () => {
  // "991234" without its FNC1 is an element string only for a reader that is told so: see readScan.
  test.each(vectors.gs1ElementString.filter((row) => row.input.elementString !== '991234'))(
    '$input.elementString, readable $expected.valid: $source',
    ({ input, expected }) => {
      expect(parseElementString(withSeparators(input.elementString)).ok).toBe(expected.valid);
    },
  );

  test.each(vectors.deviceIdentification.filter((row) => row.id === 'fda-gs1'))('$input.bracketed: $source', (row) => {
    const scanned = (row.expected.scanned ?? '').replace('<GS>', groupSeparator);
    const parsed = parseElementString(scanned);
    expect(parsed.ok && parsed.value.elements).toEqual([
      { identifier: '01', value: row.expected.di },
      { identifier: '11', value: '141231' },
      { identifier: '17', value: '150707' },
      { identifier: '10', value: row.expected.lot },
      { identifier: '21', value: row.expected.serial },
    ]);
    expect(parseBracketedElements(row.input.bracketed ?? '')).toEqual(parsed);
  });

  test('may have separators that are not needed, in front, between and behind', () => {
    const plain = parseElementString('010950110153000317260930');
    const padded = parseElementString(withSeparators('^^0109501101530003^^17260930^'));
    expect(plain.ok).toBe(true);
    expect(padded).toEqual(plain);
  });

  test('keep what follows an identifier GS1 has not given out, unread, when the item is known', () => {
    const parsed = parseElementString(withSeparators('0109501101530003891234^10LOT'));
    expect(parsed).toMatchObject({ ok: true, value: { unread: ['891234'] } });
    expect(parsed.ok && elementValue(parsed.value, '10')).toBe('LOT');
    expect(refusalOf('891234')).toBe('foreign');
  });

  test('may say the same twice, but not two different things', () => {
    expect(refusalOf(withSeparators('010950110153000310A^10A'))).toBe(null);
    expect(refusalOf(withSeparators('010950110153000310A^10B'))).toBe('damaged');
  });

  test.each([
    ['a GTIN that is cut short', '01095011015300', 'damaged'],
    ['a GTIN with a wrong check digit', '0109501101530004', 'check-character'],
    ['a lot number without anything in it', withSeparators('010950110153000310^17260930'), 'damaged'],
    ['a lot number of 21 characters', `010950110153000310${'A'.repeat(21)}`, 'damaged'],
    ['a character outside the set', '010950110153000310LÖT', 'damaged'],
    ['a day that does not exist', '010950110153000317260230', 'damaged'],
    ['a month that does not exist', '010950110153000317261301', 'damaged'],
    ['an asset with a wrong check digit', '800302112345678901ABC', 'check-character'],
    ['nothing at all', '', 'foreign'],
  ])('refuse %s', (_what, text, reason) => {
    expect(refusalOf(text)).toBe(reason);
  });

  test('of reprocessed instruments are read: status, revision, assembly, asset', () => {
    const parsed = parseElementString(withSeparators('8004ASSET-1^7023SET-7^7021ready^7022B'));
    const value = (identifier: string) => (parsed.ok ? elementValue(parsed.value, identifier) : null);
    expect(['8004', '7023', '7021', '7022', '10'].map(value)).toEqual(['ASSET-1', 'SET-7', 'ready', 'B', null]);
  });

  test('read back the GTIN, dates, lot and serial number they are made from, in any order', () => {
    const text = fc.string({ unit: oneCharacterOf('ABCXYZabc0123456789-/.'), minLength: 1, maxLength: 20 });
    const elements = fc
      .record({ '01': gtin, '11': fc.constant('260317'), '17': fc.constant('310200'), '10': text, '21': text })
      .chain((record) => fc.shuffledSubarray(Object.entries(record), { minLength: 1 }));
    fc.assert(
      fc.property(elements, (entries) => {
        const written = entries.map(([identifier, value]) => `${identifier}${value}${groupSeparator}`).join('');
        const parsed = parseElementString(written);
        expect(parsed).toEqual({
          ok: true,
          value: { elements: entries.map(([identifier, value]) => ({ identifier, value })), unread: [] },
        });
      }),
    );
  });

  // The encoder of bwip-js checks what it is given by the same published rules, independently of this program.
  test('agree with an independent encoder on which days and check digits there are', () => {
    const encodes = (bracketed: string) => {
      try {
        bwipjs.raw({ bcid: 'gs1datamatrix', text: bracketed });
        return true;
      } catch {
        return false;
      }
    };
    const sixDigits = fc.tuple(fc.nat({ max: 99 }), fc.nat({ max: 13 }), fc.nat({ max: 32 }));
    fc.assert(
      fc.property(fc.nat({ max: 9 }), sixDigits, (check, parts) => {
        const day = parts.map((part) => String(part).padStart(2, '0')).join('');
        const bracketed = `(01)0950110153000${check}(17)${day}`;
        expect([bracketed, parseBracketedElements(bracketed).ok]).toEqual([bracketed, encodes(bracketed)]);
      }),
      {
        numRuns: 60,
        examples: [
          [3, [24, 2, 29]],
          [3, [23, 2, 29]],
          [3, [26, 4, 31]],
          [3, [26, 6, 0]],
          [3, [26, 0, 1]],
        ],
      },
    );
  });
});

describe('element strings as printed for people', () => {
  test.each(vectors.gs1Bracketed)('$input.bracketed: $source', ({ input, expected }) => {
    const parsed = parseBracketedElements(input.bracketed);
    expect(parsed.ok).toBe(true);
    expect(parsed).toEqual(parseElementString(withSeparators(expected.elementString)));
  });

  test.each(vectors.gs1BracketedRefused)('refuse $input.bracketed: $source', ({ input }) => {
    expect(parseBracketedElements(input.bracketed).ok).toBe(false);
  });
});
