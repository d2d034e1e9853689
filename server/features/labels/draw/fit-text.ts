/* Text that never runs out of its box: it shrinks, then breaks, then is cut with an ellipsis. */

/** Width of a text at a size, both in mm. */
export type Measure = (text: string, size: number) => number;

export type TextFit = { readonly size: number; readonly lines: readonly string[] };

export type TextBox = {
  readonly width: number;
  /** Sizes to try for each number of lines, in order: [1, 5.4, 4.4] is one line from 5.4 mm down to 4.4 mm. */
  readonly steps: readonly (readonly [lines: number, greatestSize: number, leastSize: number])[];
};

const sizeStep = 0.1;
const ellipsis = '…';

/** Characters as people see them, so that none is cut through its accent. */
const characters = new Intl.Segmenter('en', { granularity: 'grapheme' });

/** As much of a text as fits the width, and the rest. At least one character is taken. */
function takeWidth(text: string, width: number, measure: (text: string) => number): [string, string] {
  let taken = '';
  for (const { segment } of characters.segment(text)) {
    if (taken !== '' && measure(taken + segment) > width) break;
    taken += segment;
  }
  return [taken, text.slice(taken.length)];
}

/** Breaks a text at spaces, and inside a word only where the word alone is too wide. */
function wrap(text: string, width: number, measure: (text: string) => number): string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(' ')) {
    const longer = line === '' ? word : `${line} ${word}`;
    if (measure(longer) <= width) {
      line = longer;
      continue;
    }
    if (line !== '') lines.push(line);
    let rest = word;
    while (measure(rest) > width) {
      const [taken, left] = takeWidth(rest, width, measure);
      if (left === '') break;
      lines.push(taken);
      rest = left;
    }
    line = rest;
  }
  return [...lines, line];
}

/** Cuts the last line so that it says there is more. */
function cut(lines: readonly string[], count: number, width: number, measure: (text: string) => number): string[] {
  const kept = lines.slice(0, count);
  const last = kept.pop() ?? '';
  const room = width - measure(ellipsis);
  const [taken] = takeWidth(last, room, measure);
  return [...kept, `${taken.trimEnd()}${ellipsis}`];
}

/** The greatest size, of the steps in order, at which a text fits its box; at the last and least it is cut to fit. */
export function fitText(text: string, box: TextBox, measure: Measure): TextFit {
  let least: { lines: number; size: number } = { lines: 1, size: 1 };
  for (const [lines, greatestSize, leastSize] of box.steps) {
    const sizes = Math.round((greatestSize - leastSize) / sizeStep);
    for (let step = 0; step <= sizes; step += 1) {
      const size = greatestSize - step * sizeStep;
      const wrapped = wrap(text, box.width, (piece) => measure(piece, size));
      if (wrapped.length <= lines) return { size, lines: wrapped };
    }
    least = { lines, size: leastSize };
  }
  const measureLeast = (piece: string) => measure(piece, least.size);
  return { size: least.size, lines: cut(wrap(text, box.width, measureLeast), least.lines, box.width, measureLeast) };
}
