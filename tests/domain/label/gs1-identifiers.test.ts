import { describe, expect, test } from 'vitest';
import { elementFormOf, leadingIdentifier } from '#domain/label/gs1-identifiers';
import vectors from '../../support/vectors/codes.json';

const everyIdentifier = Array.from({ length: 10_100 }, (_, number) =>
  number < 100 ? String(number).padStart(2, '0') : String(number - 100).padStart(4, '0'),
)
  .concat(Array.from({ length: 1000 }, (_, number) => String(number).padStart(3, '0')))
  .filter((identifier) => elementFormOf(identifier) !== undefined);

describe('GS1 application identifiers', () => {
  test.each(vectors.gs1Identifier)('$input.ai is as given: $source', ({ input, expected }) => {
    const form = elementFormOf(input.ai);
    expect(form?.endsItself).toBe(!expected.separatorNeededWhenNotLast);
    // "N18", "X..20", "N6 YYMMDD, DD=00 allowed", "N1 zero + N13 with check digit + X..16 optional serial"
    const lengths = [...expected.format.matchAll(/[NX](\.\.)?(\d+)/g)].map((match) => Number(match[2]));
    expect(form?.parts.map((part) => part.greatest)).toEqual(lengths);
    expect(form?.parts.map((part) => part.least < part.greatest)).toEqual(
      [...expected.format.matchAll(/[NX](\.\.)?(\d+)/g)].map((match) => match[1] !== undefined),
    );
  });

  // GS1 General Specifications, figure 7.8.5-2: element strings with predefined length (from memory), as far as given out.
  test('end themselves only where the first two digits tell the length', () => {
    const predefined = [
      '00',
      '01',
      '02',
      '03',
      '11',
      '12',
      '13',
      '15',
      '16',
      '17',
      '20',
      '31',
      '32',
      '33',
      '34',
      '35',
      '36',
      '41',
    ];
    for (const identifier of everyIdentifier) {
      expect([identifier, elementFormOf(identifier)?.endsItself]).toEqual([
        identifier,
        predefined.includes(identifier.slice(0, 2)),
      ]);
    }
  });

  test('never begin one with another, so that they can be told apart in a row of digits', () => {
    for (const identifier of everyIdentifier) {
      expect(everyIdentifier.filter((other) => other !== identifier && other.startsWith(identifier))).toEqual([]);
      expect(leadingIdentifier(`${identifier}5555`)).toBe(identifier);
    }
    // Number of entries of the GS1 Barcode Syntax Dictionary, its ranges written out, and identifier 03 which it has since 2024.
    expect(everyIdentifier.length).toBeGreaterThan(480);
  });

  test.each(['04', '14', '18', '19', '23', '89', '3106', '7100', '8900'])('%s is not given out', (identifier) => {
    expect(elementFormOf(identifier)).toBeUndefined();
  });
});
