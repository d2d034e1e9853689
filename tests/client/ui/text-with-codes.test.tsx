import { render } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { TextWithCodes } from '../../../src/components/ui/code';

function shown(text: string) {
  const { container } = render(
    <p>
      <TextWithCodes>{text}</TextWithCodes>
    </p>,
  );
  return {
    text: container.textContent,
    whole: Array.from(container.querySelectorAll('.whitespace-nowrap'), (one) => one.textContent),
  };
}

describe('codes in a sentence', () => {
  it.each([
    ['Minor set T-10000085-37 stands on Eye micro set K-10000082-02', ['T-10000085-37', 'K-10000082-02']],
    ['P-10000078-60 scanned', ['P-10000078-60']],
    ['On load 2-26076-03', ['2-26076-03']],
    ['Holder RS-2, slot 5 faces the other way', []],
    ['', []],
  ])('%j keeps them whole and every word as it was', (text, codes) => {
    expect(shown(text)).toEqual({ text, whole: codes });
  });
});
