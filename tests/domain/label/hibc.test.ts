import bwipjs from 'bwip-js/node';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { hibcCheckCharacter, parseHibc } from '#domain/label/hibc';
import vectors from '../../support/vectors/codes.json';
import { oneCharacterOf } from '../../support/one-character-of';

const withCheck = (data: string) => data + (hibcCheckCharacter(data) ?? '');

function read(text: string) {
  const parsed = parseHibc(text, 2026);
  return parsed.ok ? parsed.value : parsed.refusal.code;
}

describe('health industry bar codes', () => {
  test.each(vectors.hibcCheckCharacter)(
    '$input.data has check character $expected.check: $source',
    ({ input, expected }) => {
      expect(hibcCheckCharacter(input.data)).toBe(expected.check);
    },
  );

  test('have a check character that an independent encoder writes too', () => {
    const product = fc.string({
      unit: oneCharacterOf('ABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789'),
      minLength: 1,
      maxLength: 18,
    });
    fc.assert(
      fc.property(product, fc.nat({ max: 9 }), (text, unit) => {
        const data = `A123${text}${unit}`;
        const symbol: unknown = bwipjs.raw({ bcid: 'hibccode128', text: data });
        expect(JSON.stringify(symbol)).toContain(JSON.stringify(`*${withCheck(`+${data}`).replace(/ $/, '_')}*`));
        expect(read(withCheck(`+${data}`))).toMatchObject({ part: 'primary', deviceIdentifier: data, product: text });
      }),
      { numRuns: 40 },
    );
  });

  test('identify a device by labeler, product and unit of measure', () => {
    expect(read('+A123BJC5D6E71G')).toEqual({
      part: 'primary',
      deviceIdentifier: 'A123BJC5D6E71',
      labeler: 'A123',
      product: 'BJC5D6E7',
      unitOfMeasure: '1',
      link: null,
      lot: null,
      serial: null,
      expires: null,
      made: null,
      quantity: null,
    });
  });

  test.each(vectors.deviceIdentification.filter((row) => row.id === 'fda-hibc-di-size'))(
    'have an identifier of 6 to 23 characters: $source',
    ({ expected }) => {
      const [least = 0, greatest = 0] = expected.diDatabase ?? [];
      const identifierOf = (length: number) => `A123${'7'.repeat(length - 5)}1`;
      for (const length of [least, greatest]) {
        expect(read(withCheck(`+${identifierOf(length)}`))).toMatchObject({ deviceIdentifier: identifierOf(length) });
      }
      expect(read(withCheck(`+${identifierOf(greatest + 1)}`))).toBe('damaged');
      expect(read(withCheck('+A1231'))).toBe('damaged');
    },
  );

  test.each(vectors.hibcDate)('$input.prefix means $expected.value: $source', ({ input, expected }) => {
    const field = input.prefix.startsWith('16D') ? 'made' : 'expires';
    expect(read(withCheck(`+A99912345/${input.prefix}`))).toMatchObject({ [field]: expected.value.slice(0, 10) });
  });

  // The three long strings are examples of a public page on identification patterns; what they mean is read off by eye.
  test.each([
    ['+X999123ABC0/$$05191234AB/S5678EDFG/16D20151001', '2019-05-31'],
    ['+X999123ABC0/$$31905151234AB/S5678EDFG/16D20151001', '2019-05-15'],
    ['+X999123ABC0/$$4190515211234AB/S5678EDFG/16D20151001', '2019-05-15'],
  ])('%s has lot, serial number and both dates', (data, expires) => {
    expect(read(withCheck(data))).toMatchObject({
      part: 'both',
      deviceIdentifier: 'X999123ABC0',
      lot: '1234AB',
      serial: '5678EDFG',
      made: '2015-10-01',
      expires,
    });
  });

  // Forms of the secondary data as the BWIPP documentation describes them.
  test.each([
    ['23060LOT9', { expires: '2023-03-01', lot: 'LOT9' }],
    ['$LOT9', { lot: 'LOT9', expires: null }],
    ['$+SER9', { serial: 'SER9', lot: null }],
    ['$$7LOT9', { lot: 'LOT9', expires: null }],
    ['$$+3260930SER9', { serial: 'SER9', expires: '2026-09-30' }],
    ['$$6240602312', { expires: '2024-02-29', lot: '12' }],
    ['$$624060231L2', { expires: '2024-02-29', lot: '1L2' }],
    ['$$8020423286539', { quantity: 2, expires: '2023-04-30', lot: '286539' }],
    ['$$900250LOT9', { quantity: 250, expires: null, lot: 'LOT9' }],
    ['$$9002507LOT9', { quantity: 250, expires: null, lot: 'LOT9' }],
    ['$LOT9/Q12', { lot: 'LOT9', quantity: 12 }],
  ])('secondary data %s means the same behind the primary data and on its own', (secondary, expected) => {
    expect(read(withCheck(`+A99912345/${secondary}`))).toMatchObject({ part: 'both', link: null, ...expected });
    expect(read(withCheck(`+${secondary}K`))).toMatchObject({
      part: 'secondary',
      link: 'K',
      deviceIdentifier: null,
      ...expected,
    });
  });

  test('may have serial number and dates behind the primary data without any secondary data', () => {
    expect(read(withCheck('+A99912345/S777/14D20260930'))).toMatchObject({ serial: '777', expires: '2026-09-30' });
  });

  test('may have a check character of any kind: a slash, a plus, a space, also printed as an underscore', () => {
    for (const check of ['/', '+', ' ', '%', '$', '.', '-']) {
      const data = Array.from({ length: 2000 }, (_, number) => `+A999Z${String(number).padStart(4, '0')}5`);
      const one = data.find((text) => hibcCheckCharacter(text) === check) ?? '';
      expect(one).not.toBe('');
      expect(read(one + check)).toMatchObject({ part: 'primary', deviceIdentifier: one.slice(1) });
      if (check === ' ') expect(read(`*${one}_*`)).toMatchObject({ deviceIdentifier: one.slice(1) });
    }
  });

  test('are set right when a full-ASCII reader turned "+A" into "a"', () => {
    expect(read('a123BJC5D6E71G')).toMatchObject({ deviceIdentifier: 'A123BJC5D6E71' });
    expect(read('b123BJC5D6E71G')).toBe('check-character');
  });

  test.each([
    ['+A123BJC5D6E71H', 'check-character'],
    [withCheck('+A999123/5/$$9'), 'damaged'],
    [withCheck('+A99912345/$$2131345'), 'damaged'],
    [withCheck('+A99912345/$$3260230LOT'), 'damaged'],
    [withCheck('+A99912345/$$419051525LOT'), 'damaged'],
    [withCheck('+A99912345/16D20261301'), 'damaged'],
    [withCheck('+A99912345/$LOT/XX'), 'damaged'],
    [withCheck(`+A99912345/$${'L'.repeat(19)}`), 'damaged'],
    ['+a123BJC5D6E71G', 'foreign'],
    ['A123BJC5D6E71G', 'foreign'],
    ['+/EXYZ', 'foreign'],
    ['+', 'foreign'],
    ['', 'foreign'],
  ])('%j is refused as %s', (text, reason) => {
    expect(read(text)).toBe(reason);
  });

  test('have a check character that lets swaps of neighbours pass, unlike ours', () => {
    expect(hibcCheckCharacter('+A123BJC5D6E71')).toBe(hibcCheckCharacter('+A123BJCD56E71'));
  });
});
