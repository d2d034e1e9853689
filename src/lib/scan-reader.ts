/** A pause that scanners make and hands do not: they leave 0 to 20 ms, hands 80 ms and more (common practice, no source). */
export const greatestGapMs = 60;

/**
 * A scan may stutter: radio scanners and a busy tablet hold single characters back. A pause up to this one does not break a
 * scan in two, as long as most of its other pauses are those of a scanner.
 */
export const greatestStutterMs = 400;

/** Of the pauses inside a scan, at least this share is a scanner's. */
const leastQuickShare = 0.5;

/** Shorter bursts are two keys rolled over one another. */
export const fewestCharacters = 3;

/** Far beyond any symbol; what runs on longer is cut so that it cannot fill the memory, and is answered as not known. */
export const mostCharacters = 12_000;

/** One key as the reader sees it. */
export type ScanKey = {
  readonly key: string;
  readonly isCtrl: boolean;
  /** The key is held down: hands, not a scanner. */
  readonly isRepeat: boolean;
  /** Milliseconds, monotonic. */
  readonly atMs: number;
};

export type ScanVerdict =
  /** Typed by hand. */
  | { readonly kind: 'typed' }
  /** A scan may have begun with this key, or somebody typed one character. */
  | { readonly kind: 'first' }
  | { readonly kind: 'inside' }
  /** The line end of a burst too short to be a label. */
  | { readonly kind: 'too-short' }
  /** The second half of a double line end. */
  | { readonly kind: 'tail' }
  | { readonly kind: 'scan'; readonly text: string };

/**
 * Scanners send control characters as Ctrl and the key that stands 64 places above them in ASCII: Ctrl+] is GS (0x1D),
 * which parts the fields of a GS1 element string; Ctrl+M and Ctrl+J are the line ends (from memory).
 */
function characterOf({ key, isCtrl }: ScanKey): string | null {
  if (key === 'Enter') return '\r';
  if (key === 'Tab') return '\t';
  if (key.length !== 1) return null;
  if (!isCtrl) return key;
  const code = key.toUpperCase().charCodeAt(0);
  return code >= 0x40 && code <= 0x5f ? String.fromCharCode(code & 0x1f) : null;
}

const groupSeparator = '\u001d';
const lineEnds: readonly string[] = ['\r', '\n', '\t'];

/** They go up and down between the characters of a scan and mean nothing by themselves. */
const modifiers: readonly string[] = ['Shift', 'Control', 'AltGraph', 'CapsLock'];

/** Within a pause that scanners make. */
function isQuickAfter(earlierMs: number, laterMs: number): boolean {
  const gapMs = laterMs - earlierMs;
  return gapMs >= 0 && gapMs <= greatestGapMs;
}

/** Tells the keys of a scanner from those of hands, by their pace. Knows nothing of the browser. */
export function createScanReader() {
  let buffer = '';
  let quickGaps = 0;
  let lastKeyAtMs = Number.NEGATIVE_INFINITY;
  let lastScanAtMs = Number.NEGATIVE_INFINITY;

  function forget() {
    buffer = '';
    quickGaps = 0;
  }

  function end(atMs: number): ScanVerdict {
    const text = buffer;
    const isPaceOfScanner = quickGaps >= leastQuickShare * text.length;
    forget();
    if (text.length >= fewestCharacters && isPaceOfScanner) {
      lastScanAtMs = atMs;
      return { kind: 'scan', text };
    }
    if (text !== '') return { kind: isPaceOfScanner ? 'too-short' : 'typed' };
    return isQuickAfter(lastScanAtMs, atMs) ? { kind: 'tail' } : { kind: 'typed' };
  }

  return {
    read(key: ScanKey): ScanVerdict {
      if (modifiers.includes(key.key)) return { kind: 'typed' };
      const character = characterOf(key);
      if (character === null || key.isRepeat) {
        forget();
        return { kind: 'typed' };
      }
      const gapMs = key.atMs - lastKeyAtMs;
      const isQuick = isQuickAfter(lastKeyAtMs, key.atMs);
      if (gapMs > greatestStutterMs || gapMs < 0) forget();
      else if (isQuick && buffer !== '') quickGaps += 1;
      lastKeyAtMs = key.atMs;
      if (lineEnds.includes(character)) return end(key.atMs);
      const isFirst = buffer === '';
      // A lone Ctrl and letter is somebody's shortcut; GS alone can begin a scan that way.
      if (isFirst && key.isCtrl && character !== groupSeparator) return { kind: 'typed' };
      if (buffer.length < mostCharacters) buffer += character;
      // A slow key may be a hand's: it is left to whatever has the focus.
      return { kind: isFirst || !isQuick ? 'first' : 'inside' };
    },

    forget,
  };
}
