import { CsvError, parse } from 'csv-parse/sync';
import { InvalidInput } from '../errors';
import { decodeText } from './decode-text';

export type CsvLine = {
  /** Where it begins in the file, counted from 1. */
  readonly line: number;
  readonly cells: readonly string[];
};

export type CsvTable = {
  readonly header: readonly string[];
  readonly lines: readonly CsvLine[];
  readonly delimiter: ',' | ';' | '\t';
};

const delimiters = [',', ';', '\t'] as const;

/** Lines that explain the file, as the template has them, stand before the header and begin with this. */
const remark = '#';
const mostRemarks = 200;
const greatestCell = 20_000;

function isRemark(firstCell: string): boolean {
  return firstCell.trimStart().startsWith(remark);
}

/** The sign that parts the header's words: whichever is there most often outside of quotation marks. */
function delimiterOf(text: string): (typeof delimiters)[number] {
  const header =
    text.split(/\r\n|\n|\r/, mostRemarks + 1).find((line) => line.trim() !== '' && !isRemark(line.replace(/^"/, ''))) ??
    '';
  const bare = header.replace(/"(?:[^"]|"")*"/g, '');
  const count = (sign: string) => bare.split(sign).length - 1;
  return delimiters.reduce((best, sign) => (count(sign) > count(best) ? sign : best));
}

/** The line on which the quotation mark opens that nobody closes. */
function lineOfOpenQuote(text: string): number {
  let line = 1;
  let openedOn: number | null = null;
  for (const sign of text) {
    if (sign === '\n') line += 1;
    else if (sign === '"') openedOn = openedOn === null ? line : null;
  }
  return openedOn ?? line;
}

function sentenceOf(error: CsvError, text: string): string {
  const line = typeof error.lines === 'number' ? error.lines : 1;
  switch (error.code) {
    case 'CSV_QUOTE_NOT_CLOSED':
      return `A quotation mark opens on line ${lineOfOpenQuote(text)} and never closes.`;
    case 'INVALID_OPENING_QUOTE':
    case 'CSV_INVALID_CLOSING_QUOTE':
      return `Line ${line} has a quotation mark in the middle of a cell. Put the whole cell in quotation marks and write the one inside twice.`;
    case 'CSV_MAX_RECORD_SIZE':
      return `Line ${line} is too long to be a row of this file.`;
    default:
      return `Line ${line} of this file cannot be read as CSV.`;
  }
}

/** Files of very old spreadsheets end their lines with a carriage return alone. */
function lineEndsOf(text: string): string[] {
  return text.includes('\n') ? ['\r\n', '\n'] : ['\r'];
}

function parseAll(text: string, delimiter: string, mostRecords: number): string[][] {
  try {
    return parse(text, {
      delimiter,
      record_delimiter: lineEndsOf(text),
      relax_column_count: true,
      skip_empty_lines: true,
      max_record_size: greatestCell,
      to: mostRecords,
    });
  } catch (error) {
    if (error instanceof CsvError) throw new InvalidInput('file.not-csv', sentenceOf(error, text), { cause: error });
    throw error;
  }
}

/** The line on which each record begins, in the order of the records: one may go on over several lines in quotation marks. */
function beginningsOf(text: string): number[] {
  const end = text.includes('\n') ? '\n' : '\r';
  const beginnings: number[] = [];
  let line = 0;
  let isQuoted = false;
  for (const part of text.split(end)) {
    line += 1;
    const isEmpty = part === '' || part === '\r';
    if (!isQuoted && !isEmpty) beginnings.push(line);
    if (part.split('"').length % 2 === 0) isQuoted = !isQuoted;
  }
  return beginnings;
}

/**
 * Reads an uploaded CSV (RFC 4180): cells separated by commas, semicolons or tabs, remarks before the header passed over.
 * @throws InvalidInput, with the line, for whatever is not such a file or has too many rows
 */
export function readCsvTable(bytes: Buffer, mostRows: number): CsvTable {
  const text = decodeText(bytes);
  const delimiter = delimiterOf(text);
  const beginnings = beginningsOf(text);
  const records = parseAll(text, delimiter, mostRows + mostRemarks + 2)
    .map((cells, at) => ({ line: beginnings[at] ?? 0, cells }))
    .filter(({ cells }) => cells.some((cell) => cell.trim() !== ''));
  const headerAt = records.findIndex(({ cells }) => !isRemark(cells[0] ?? ''));
  const header = records[headerAt];
  if (header === undefined) throw new InvalidInput('file.empty', 'This file has no line that names its columns.');
  const lines = records.slice(headerAt + 1);
  if (lines.length > mostRows) {
    throw new InvalidInput(
      'file.too-many-rows',
      `This file has more than ${mostRows.toLocaleString('en-GB')} rows. Split it, and import the parts one after the other.`,
    );
  }
  if (lines.length === 0)
    throw new InvalidInput('file.no-rows', 'This file names its columns and has no rows under them.');
  return { header: header.cells, lines, delimiter };
}
