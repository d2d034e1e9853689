import { InvalidInput } from '../errors';

const zipStart = Buffer.from([0x50, 0x4b, 0x03, 0x04]);
const oldOfficeStart = Buffer.from([0xd0, 0xcf, 0x11, 0xe0]);
const utf8Mark = Buffer.from([0xef, 0xbb, 0xbf]);
const littleEndianMark = Buffer.from([0xff, 0xfe]);
const bigEndianMark = Buffer.from([0xfe, 0xff]);
const newline = 0x0a;

function startsWith(bytes: Buffer, mark: Buffer): boolean {
  return bytes.subarray(0, mark.length).equals(mark);
}

function decode(bytes: Buffer, encoding: string): string | null {
  try {
    return new TextDecoder(encoding, { fatal: true }).decode(bytes);
  } catch {
    return null;
  }
}

/** The line, counted from 1, on which the first bytes stand that are no UTF-8. */
function firstBadLine(bytes: Buffer): number {
  let line = 1;
  let from = 0;
  while (from < bytes.length) {
    const end = bytes.indexOf(newline, from);
    const to = end < 0 ? bytes.length : end + 1;
    // No byte of a longer UTF-8 character is a line feed (RFC 3629, section 3), so lines can be looked at one by one.
    if (decode(bytes.subarray(from, to), 'utf-8') === null) return line;
    line += 1;
    from = to;
  }
  return line;
}

function decodeUtf16(bytes: Buffer, encoding: 'utf-16le' | 'utf-16be'): string {
  const text = decode(bytes, encoding);
  if (text === null) throw new InvalidInput('file.cut-off', 'This file is cut off or damaged. Save it again.');
  return text;
}

/**
 * Reads the text of an uploaded file: UTF-8 with or without a byte order mark, or UTF-16 with one.
 * @throws InvalidInput for anything else, saying where and what to do
 */
export function decodeText(bytes: Buffer): string {
  if (bytes.length === 0) throw new InvalidInput('file.empty', 'This file is empty.');
  if (startsWith(bytes, zipStart) || startsWith(bytes, oldOfficeStart)) {
    throw new InvalidInput('file.spreadsheet', 'This is a spreadsheet. Save it as “CSV UTF-8” and choose that file.');
  }
  if (startsWith(bytes, littleEndianMark)) return requireNoNul(decodeUtf16(bytes, 'utf-16le'));
  if (startsWith(bytes, bigEndianMark)) return requireNoNul(decodeUtf16(bytes, 'utf-16be'));
  const nulAt = bytes.indexOf(0);
  if (nulAt >= 0) refuseNul(bytes.subarray(0, nulAt).toString('latin1'));
  const text = decode(startsWith(bytes, utf8Mark) ? bytes.subarray(utf8Mark.length) : bytes, 'utf-8');
  if (text !== null) return text;
  throw new InvalidInput(
    'file.not-utf-8',
    `Line ${firstBadLine(bytes)} of this file is not UTF-8 text: it was saved in an older encoding, where letters such as é or µ get lost. Save it as “CSV UTF-8” and choose it again.`,
  );
}

function requireNoNul(text: string): string {
  const at = text.indexOf('\0');
  if (at >= 0) refuseNul(text.slice(0, at));
  return text;
}

function refuseNul(before: string): never {
  const line = before.split('\n').length;
  throw new InvalidInput(
    'file.has-nul',
    `Line ${line} of this file has a character with no meaning in text (NUL): it is damaged, or is not a CSV file.`,
  );
}
