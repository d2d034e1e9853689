import { accept, refuse, type Result } from '../result';
import { readNumberCell, readYesNoCell, shorten, unguardCell, type NumberStyle } from './csv-cell';

/** How one value of a thing stands in a file: the header's word, what it means, and both directions. */
export type Column<Value> = {
  readonly name: string;
  /** For people who fill in the file. */
  readonly about: string;
  readonly example: string;
  readonly read: (cell: string, style: NumberStyle) => Result<Value>;
  readonly write: (value: Value) => string;
  /** What an empty cell means. Without it the cell has to be filled in. */
  readonly whenEmpty?: Value;
};

/** One column for every value of a thing; their order is the order in the file. */
export type ColumnSet<Fields> = { readonly [Field in keyof Fields]-?: Column<Fields[Field]> };

export type FieldProblem = {
  /** The thing's own name for the value, or null where the whole is meant. */
  readonly field: string | null;
  readonly sentence: string;
};

type About = { readonly name: string; readonly about: string; readonly example: string };

export function textColumn(about: About): Column<string> {
  return { ...about, read: accept, write: (value) => value };
}

export function textOrNothingColumn(about: About): Column<string | null> {
  return { ...about, read: accept, write: (value) => value ?? '', whenEmpty: null };
}

export function numberColumn<Value extends number>(about: About, unit: (value: number) => Value): Column<Value> {
  return {
    ...about,
    read: (cell, style) => {
      const number = readNumberCell(cell, style);
      return number.ok ? accept(unit(number.value)) : number;
    },
    write: String,
  };
}

export function numberOrNothingColumn<Value extends number>(
  about: About,
  unit: (value: number) => Value,
): Column<Value | null> {
  return {
    ...numberColumn(about, unit),
    write: (value) => (value === null ? '' : String(value)),
    whenEmpty: null,
  };
}

export function yesNoColumn(about: About, whenEmpty: boolean): Column<boolean> {
  return { ...about, read: readYesNoCell, write: (value) => (value ? 'yes' : 'no'), whenEmpty };
}

export function choiceColumn<Choice extends string>(about: About, choices: readonly Choice[]): Column<Choice> {
  return {
    ...about,
    read: (cell) => {
      const wanted = cell.toLowerCase().replace(/[\s_]+/g, '-');
      const choice = choices.find((one) => one === wanted);
      if (choice !== undefined) return accept(choice);
      return refuse('not-a-choice', `“${shorten(cell)}” is none of ${choices.join(', ')}.`);
    },
    write: (value) => value,
  };
}

export function choiceOrNothingColumn<Choice extends string>(
  about: About,
  choices: readonly Choice[],
): Column<Choice | null> {
  return { ...choiceColumn(about, choices), write: (value) => value ?? '', whenEmpty: null };
}

/** Codes separated by spaces. */
export function codesColumn(about: About): Column<readonly string[]> {
  return {
    ...about,
    read: (cell) => accept(cell.split(/[\s|]+/).filter((code) => code !== '')),
    write: (value) => value.join(' '),
    whenEmpty: [],
  };
}

/** The names of a set's values, in file order. */
export function fieldsOf<Fields>(columns: ColumnSet<Fields>): (keyof Fields & string)[] {
  return Object.keys(columns) as (keyof Fields & string)[];
}

/** Where each known column stands in a file. */
export type HeaderReading<Fields> = ReadonlyMap<keyof Fields & string, number>;

/**
 * Finds the columns in a header, in any order and in capitals or not. Unknown and doubled words are refused, since what
 * stands under a misspelt word would be lost without a sound; so is the lack of a column that may not be empty.
 */
export function readHeader<Fields>(
  columns: ColumnSet<Fields>,
  header: readonly string[],
): Result<HeaderReading<Fields>, 'header-wrong'> {
  const words = header.map((word) => word.trim().toLowerCase());
  while (words.at(-1) === '') words.pop();
  const fields = fieldsOf(columns);
  const known = new Set(fields.map((field) => columns[field].name));
  const unknown = words.filter((word) => !known.has(word)).map((word) => (word === '' ? '(empty)' : shorten(word)));
  const doubled = words.filter((word, at) => known.has(word) && words.indexOf(word) !== at);
  const missing = fields
    .filter((field) => columns[field].whenEmpty === undefined && !words.includes(columns[field].name))
    .map((field) => columns[field].name);
  const sentences = [
    ['Not known', unknown],
    ['Named twice', doubled],
    ['Missing', missing],
  ] as const;
  if (unknown.length + doubled.length + missing.length > 0) {
    const details = sentences
      .filter(([, list]) => list.length > 0)
      .map(([what, list]) => `${what}: ${listUpTo(list, 12)}.`);
    return refuse(
      'header-wrong',
      `The first line does not name the columns as they are known here. ${details.join(' ')}`,
    );
  }
  return accept(
    new Map(
      fields.flatMap((field) => {
        const at = words.indexOf(columns[field].name);
        return at < 0 ? [] : [[field, at] as const];
      }),
    ),
  );
}

function listUpTo(words: readonly string[], most: number): string {
  if (words.length <= most) return words.join(', ');
  return `${words.slice(0, most).join(', ')} and ${words.length - most} more`;
}

/** Reads the cells of one line. A column the file leaves out is left out of the result too. */
export function readCells<Fields>(
  columns: ColumnSet<Fields>,
  header: HeaderReading<Fields>,
  cells: readonly string[],
  style: NumberStyle,
): { readonly values: Partial<Fields>; readonly problems: readonly FieldProblem[] } {
  const values: Partial<Fields> = {};
  const problems: FieldProblem[] = [];
  for (const [field, at] of header) {
    const column = columns[field];
    const cell = unguardCell((cells[at] ?? '').trim());
    if (cell !== '') {
      const read = column.read(cell, style);
      if (read.ok) values[field] = read.value;
      else problems.push({ field, sentence: read.refusal.sentence });
    } else if (column.whenEmpty !== undefined) values[field] = column.whenEmpty;
    else problems.push({ field, sentence: 'Please fill this in.' });
  }
  return { values, problems };
}

/** What the columns a file left out mean for something new. */
export function whenLeftOut<Fields>(columns: ColumnSet<Fields>): Partial<Fields> {
  const values: Partial<Fields> = {};
  for (const field of fieldsOf(columns)) {
    const { whenEmpty } = columns[field];
    if (whenEmpty !== undefined) values[field] = whenEmpty;
  }
  return values;
}

/** The values that would be written differently. */
export function changedFields<Fields>(columns: ColumnSet<Fields>, before: Fields, after: Fields): string[] {
  return fieldsOf(columns).filter(
    (field) => columns[field].write(before[field]) !== columns[field].write(after[field]),
  );
}
