/* The closed list of what a scan can be that nobody can use, each with its sentence for the person holding the scanner. */

const sentences = {
  empty: 'Nothing was read. Scan again.',
  'too-long': 'That is far more than a label holds. Scan one label at a time.',
  'control-characters':
    'The scan holds characters that no label has. Scan again; if it stays so, check how the scanner is set.',
  'keyboard-layout': 'The scanner types for another keyboard. Set its keyboard language to the one of this station.',
  truncated: 'This looks like a code of ours with a part missing. Scan again, or type it as printed.',
  'check-character':
    'The code does not add up: one character is wrong, or two are swapped. Scan again, or type it as printed.',
  damaged: 'Part of the label can be read and part cannot. Scan again, or scan its other symbol.',
  'two-codes': 'Two labels ran together. Scan them one after the other.',
  'second-half': 'This symbol tells the lot or the date, not the item. Scan the other symbol beside it.',
  shipping: 'This is a shipping label. Scan the label of the item itself.',
  foreign: 'This is no label of ours, and no device label that can be read here.',
} as const;

export type UnreadableReason = keyof typeof sentences;

export const unreadableReasons = Object.keys(sentences) as readonly UnreadableReason[];

export type UnreadableScan = {
  readonly kind: 'unreadable';
  readonly reason: UnreadableReason;
  readonly sentence: string;
};

export function unreadable(reason: UnreadableReason): UnreadableScan {
  return { kind: 'unreadable', reason, sentence: sentences[reason] };
}
