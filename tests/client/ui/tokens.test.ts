import { describe, expect, it } from 'vitest';
import { colors } from '../../../tailwind.config';

/** Relative luminance and contrast ratio: WCAG 2.2, definitions of "relative luminance" and "contrast ratio". */
function luminance(hex: string): number {
  const channel = (from: number) => {
    const value = Number.parseInt(hex.slice(from, from + 2), 16) / 255;
    return value <= 0.03928 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  };
  return 0.2126 * channel(1) + 0.7152 * channel(3) + 0.0722 * channel(5);
}

function contrast(one: string, other: string): number {
  const [low = 0, high = 0] = [luminance(one), luminance(other)].toSorted((left, right) => left - right);
  return (high + 0.05) / (low + 0.05);
}

const { paper, ink, film, straw, madder, leaf } = colors;

/** The darkest point of the film ground, from src/styles/materials.css. */
const darkestFilm = '#CFE4E1';

const grounds = {
  'paper 0': paper[0],
  'paper 1': paper[1],
  'paper 2': paper[2],
  'film 0': film[0],
  'film 1': film[1],
  'straw 1': straw[1],
  'madder 1': madder[1],
  'the darkest film': darkestFilm,
};

const texts = {
  'ink 1': ink[1],
  'ink 2': ink[2],
  'film 4': film[4],
  'film 5': film[5],
  'straw 3': straw[3],
  'madder 3': madder[3],
  'madder 4': madder[4],
};

describe('text can be read (WCAG 2.2, 1.4.3: 4.5 to 1)', () => {
  it.each(
    Object.entries(texts).flatMap(([text, colour]) =>
      Object.entries(grounds).map(([ground, behind]) => [text, ground, colour, behind] as const),
    ),
  )('%s on %s', (_text, _ground, colour, behind) => {
    expect(contrast(colour, behind)).toBeGreaterThanOrEqual(4.5);
  });

  it.each([
    ['film 3', film[3]],
    ['film 4', film[4]],
    ['film 5', film[5]],
    ['straw 3', straw[3]],
    ['madder 3', madder[3]],
    ['madder 4', madder[4]],
    ['ink 1', ink[1]],
  ])('paper 0 on %s', (_name, ground) => {
    expect(contrast(paper[0], ground)).toBeGreaterThanOrEqual(4.5);
  });

  it.each([
    ['leaf paper', leaf.paper],
    ['leaf film', leaf.film],
    ['straw 2', straw[2]],
  ])('ink 1 on %s', (_name, ground) => {
    expect(contrast(ink[1], ground)).toBeGreaterThanOrEqual(4.5);
  });
});

describe('lines that carry meaning can be seen (WCAG 2.2, 1.4.11: 3 to 1)', () => {
  it.each(
    Object.entries(grounds).flatMap(([ground, behind]) => [
      ['film 3', ground, film[3], behind] as const,
      ['the edge of paper', ground, paper.edge, behind] as const,
    ]),
  )('%s on %s', (_line, _ground, colour, behind) => {
    expect(contrast(colour, behind)).toBeGreaterThanOrEqual(3);
  });

  it('straw 2 on film 5, the mark of an exception', () => {
    expect(contrast(straw[2], film[5])).toBeGreaterThanOrEqual(3);
  });
});
