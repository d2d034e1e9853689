import { fieldsOf, type ColumnSet } from '#domain/catalogue/csv-column';
import { guardCell } from '#domain/catalogue/csv-cell';

/** Told to spreadsheets, which else take the file for an older encoding. */
const byteOrderMark = '\uFEFF';

function cell(text: string): string {
  const guarded = guardCell(text);
  return /[",;\t\r\n]/.test(guarded) || guarded.startsWith('#') ? `"${guarded.replaceAll('"', '""')}"` : guarded;
}

// RFC 4180, section 2: lines end with CR and LF.
function line(cells: readonly string[]): string {
  return `${cells.map(cell).join(',')}\r\n`;
}

/** A file with one line per thing, that reads back to the same. */
export function writeCsv<Fields>(columns: ColumnSet<Fields>, things: readonly Fields[]): Buffer {
  const fields = fieldsOf(columns);
  const header = line(fields.map((field) => columns[field].name));
  const lines = things.map((thing) => line(fields.map((field) => columns[field].write(thing[field]))));
  return Buffer.from(byteOrderMark + header + lines.join(''), 'utf8');
}

/** An empty file to fill in: a remark for each column, then the header. */
export function writeCsvTemplate<Fields>(columns: ColumnSet<Fields>): Buffer {
  const fields = fieldsOf(columns);
  const remarks = fields.map((field) => {
    const { name, about, example, whenEmpty } = columns[field];
    const need = whenEmpty === undefined ? ' Must be filled in.' : '';
    return `"# ${name}: ${about}${need}${example === '' ? '' : ` Example: ${example}`}"\r\n`;
  });
  return Buffer.from(byteOrderMark + remarks.join('') + line(fields.map((field) => columns[field].name)), 'utf8');
}
