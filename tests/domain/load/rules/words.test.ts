import { countWords, figureWords, listWords, sentence, sourceOf } from '#domain/load/rules/words';
import { describe, expect, it } from 'vitest';
import { demonstrationItems } from '../../../support/demonstration-items';

describe('figures in words', () => {
  it.each([
    [12, 25, 'mm', '12 mm', '25 mm'],
    [24.7, 25, 'mm', '24.7 mm', '25 mm'],
    [24.996, 25, 'mm', '24.996 mm', '25 mm'],
    [-7, 10, 'mm', '-7 mm', '10 mm'],
    [12.1, 11.3, 'kg', '12.1 kg', '11.3 kg'],
    [11.34, 11.3, 'kg', '11.34 kg', '11.3 kg'],
    [60.1, 30, 'deg', '60 degrees', '30 degrees'],
    [50, 0, '%', '50 %', '0 %'],
    [4, 3, 'count', '4', '3'],
  ] as const)('%d against %d %s', (measured, limit, unit, first, second) => {
    expect(figureWords({ measured, limit, unit })).toEqual({ measured: first, limit: second });
  });
});

describe('lists in words', () => {
  it.each([
    [[], ''],
    [['A'], 'A'],
    [['A', 'B'], 'A and B'],
    [['A', 'B', 'C'], 'A, B and C'],
    [['A', 'B', 'C', 'D', 'E'], 'A, B, C and 2 more'],
  ])('%j', (names, words) => {
    expect(listWords(names)).toBe(words);
  });

  it('count, and start like a sentence', () => {
    expect([countWords(1, 'pouch', 'pouches'), countWords(2, 'pouch', 'pouches')]).toEqual(['1 pouch', '2 pouches']);
    expect(sentence('the load')).toBe('The load');
  });
});

describe('whose word a limit is', () => {
  it('is the instructions’, the house’s or the rule’s own', () => {
    const own = { text: 'The rule’s own.', provenance: 'published' } as const;
    const [item] = demonstrationItems;
    if (!item) throw new Error('The demonstration has no items');
    expect(sourceOf('ifu', item, own)).toEqual({
      text: 'Instructions for use of Adson forceps pair: IFU P-01.',
      provenance: 'ifu',
    });
    expect(sourceOf('ifu', { ...item, ifuReference: null }, own).text).toContain('reference not on file');
    expect(sourceOf('house-rule', item, own).provenance).toBe('house-rule');
    expect(sourceOf('default', item, own)).toBe(own);
    expect(sourceOf('equipment', item, own)).toBe(own);
  });
});
