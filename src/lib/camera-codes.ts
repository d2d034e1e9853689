const groupSeparator = '\u001d';

export type CameraFormat = 'code-128' | 'data-matrix' | 'qr-code' | 'other';

/** Symbology identifiers of the GS1 carriers: GS1 General Specifications, section on symbology identifiers (restated, ISO/IEC 15424). */
const gs1Identifiers: Readonly<Partial<Record<CameraFormat, string>>> = { 'data-matrix': ']d2', 'qr-code': ']Q3' };

/**
 * One spelling for what the decoder gives, the one that scanners use too: the decoder puts "]C1" before a GS1-128,
 * but a bare GS (0x1D) before a GS1 DataMatrix, where the identifier belongs.
 */
export function codeFromCamera(text: string, format: CameraFormat): string {
  const identifier = gs1Identifiers[format];
  return identifier !== undefined && text.startsWith(groupSeparator) ? identifier + text.slice(1) : text;
}

const sameCodePauseMs = 2_000;

/** Lets a code through once, and the same code again only after two seconds without it. */
export function createRepeatFilter() {
  let lastText = '';
  let lastSeenAtMs = Number.NEGATIVE_INFINITY;
  return function isNew(text: string, atMs: number): boolean {
    const isRepeat = text === lastText && atMs - lastSeenAtMs < sameCodePauseMs;
    lastText = text;
    lastSeenAtMs = atMs;
    return !isRepeat;
  };
}

/** Why there is no picture, and what to do, for the person holding the tablet. */
export function cameraRefusalInWords(error: unknown): string {
  // Names of the exceptions of getUserMedia: W3C Media Capture and Streams, section 10.
  const name = typeof error === 'object' && error !== null && 'name' in error ? error.name : '';
  switch (name) {
    case 'NotAllowedError':
    case 'SecurityError':
      return 'This tablet was told not to use its camera here. Allow the camera for this address in the browser, then try again.';
    case 'NotFoundError':
    case 'OverconstrainedError':
      return 'This device has no camera that can be used. Scan with the hand scanner, or key in the code.';
    case 'NotReadableError':
    case 'AbortError':
      return 'Another program is using the camera. Close it there, then try again.';
    default:
      return 'The camera did not start. Try again, or scan with the hand scanner.';
  }
}

/** Browsers give the camera to secure addresses only: W3C Media Capture and Streams, section 9.2. */
export const insecureAddressWords =
  'The camera works only when Paperside is opened over https. Ask whoever runs it for that address; until then scan with the hand scanner, or key in the code.';
