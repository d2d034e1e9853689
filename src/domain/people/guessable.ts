/* Patterns that guessers try first, whatever the list of common passwords says. Shared by passwords and PINs. */

/** Rows of the three keyboard layouts in use on our stations, the alphabet and the digits; each is read both ways. */
const runs = [
  'abcdefghijklmnopqrstuvwxyz',
  '0123456789',
  '1234567890',
  'qwertyuiopasdfghjklzxcvbnm',
  'qwertzuiopasdfghjklyxcvbnm',
  'azertyuiopqsdfghjklmwxcvbn',
  '1qaz2wsx3edc4rfv5tgb6yhn7ujm8ik9ol0p',
] as const;

function reversed(text: string): string {
  return Array.from(text).reverse().join('');
}

/** Whether the whole text runs along the alphabet, the digits or a keyboard, round the end too: "890123", "poiuyt". */
export function isRun(text: string): boolean {
  return runs.some((run) => {
    const turns = Math.ceil(text.length / run.length) + 1;
    return run.repeat(turns).includes(text) || reversed(run).repeat(turns).includes(text);
  });
}

/** The shortest piece whose repetition makes the text; its last repetition may be cut off. The text itself if none is. */
export function repeatedPiece(text: string): string {
  for (let length = 1; length * 2 <= text.length; length += 1) {
    const piece = text.slice(0, length);
    if (piece.repeat(Math.ceil(text.length / length)).startsWith(text)) return piece;
  }
  return text;
}
