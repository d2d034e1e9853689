import { describe, expect, test } from 'vitest';
import { splitSymbology } from '#domain/label/symbology';
import vectors from '../../support/vectors/codes.json';

const contents = ['gs1', 'gs1', 'gs1', 'plain', 'plain', 'retail'];

describe('symbology identifiers', () => {
  test.each(vectors.symbologyIdentifier)('say what the content is: $source', ({ expected }) => {
    expect(expected.map((prefix) => splitSymbology(`${prefix}DATA`))).toEqual(
      contents.map((content) => ({ content, data: 'DATA' })),
    );
  });

  test('are taken off once, and only from the front', () => {
    expect(splitSymbology(']C0]C1DATA')).toEqual({ content: 'plain', data: ']C1DATA' });
    expect(splitSymbology('DATA]C1')).toEqual({ content: 'unknown', data: 'DATA]C1' });
    expect(splitSymbology(']C')).toEqual({ content: 'unknown', data: ']C' });
    expect(splitSymbology('')).toEqual({ content: 'unknown', data: '' });
  });
});
