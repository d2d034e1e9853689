import {
  changedFields,
  fieldsOf,
  readCells,
  readHeader,
  whenLeftOut,
  type FieldProblem,
  type HeaderReading,
} from '#domain/catalogue/csv-column';
import type { NumberStyle } from '#domain/catalogue/csv-cell';
import { InvalidInput } from '../errors';
import type { CsvLine, CsvTable } from '../csv/read-csv-table';
import { keyOfKept, type Judge, type Kept, type FiledRegister } from './register';

export type PlannedLine<Fields> = {
  readonly line: number;
  readonly fields: Fields;
  readonly before: Kept<Fields> | null;
  /** Of what is there already: the values that change. */
  readonly changes: readonly string[];
};

export type LineProblem = { readonly line: number; readonly column: string | null; readonly sentence: string };

/** What a file would do, line by line. Nothing in it has been written. */
export type ImportPlan<Fields> = {
  readonly rows: number;
  readonly lines: readonly PlannedLine<Fields>[];
  readonly problems: readonly LineProblem[];
  readonly refused: number;
};

type Reading<Fields> =
  | { readonly ok: true; readonly planned: PlannedLine<Fields> }
  | { readonly ok: false; readonly problems: readonly FieldProblem[] };

type Desk<Fields extends object> = {
  readonly register: FiledRegister<Fields>;
  readonly header: HeaderReading<Fields>;
  readonly width: number;
  readonly style: NumberStyle;
  readonly byKey: ReadonlyMap<string, Kept<Fields>>;
  /** Key to the line it first stood on. */
  readonly seen: Map<string, number>;
};

function checkWidth(cells: readonly string[], width: number): FieldProblem[] {
  const surplus = cells.slice(width).some((cell) => cell.trim() !== '');
  if (cells.length >= width && !surplus) return [];
  return [{ field: null, sentence: `This row has ${cells.length} cells, and ${width} columns are named.` }];
}

function checkSeen<Fields extends object>(desk: Desk<Fields>, key: string | null, line: number): FieldProblem[] {
  if (key === null) return [];
  const earlier = desk.seen.get(key);
  if (earlier === undefined) {
    desk.seen.set(key, line);
    return [];
  }
  return [{ field: desk.register.keyField, sentence: `${key} stands on line ${earlier} already.` }];
}

function readLine<Fields extends object>(desk: Desk<Fields>, { line, cells }: CsvLine): Reading<Fields> {
  const { register } = desk;
  const width = checkWidth(cells, desk.width);
  if (width.length > 0) return { ok: false, problems: width };
  const { values, problems } = readCells(register.columns, desk.header, cells, desk.style);
  const key = register.keyOf(values);
  const all = [...problems, ...checkSeen(desk, key, line)];
  const before = (key === null ? undefined : desk.byKey.get(key)) ?? null;
  const whole = { ...(before?.fields ?? whenLeftOut(register.columns)), ...values };
  const parsed = register.schema.safeParse(whole);
  if (!parsed.success) {
    // A cell that could not be read is missing from the whole: one sentence about it is enough.
    const told = new Set(all.map((problem) => problem.field));
    for (const issue of parsed.error.issues) {
      const field = String(issue.path[0] ?? '');
      if (!told.has(field)) all.push({ field, sentence: issue.message });
    }
  }
  if (!parsed.success || all.length > 0) return { ok: false, problems: all };
  const settled = register.settle(parsed.data, before?.fields ?? null);
  if (settled.problems.length > 0) return { ok: false, problems: settled.problems };
  const { fields } = settled;
  const changes = before === null ? [] : changedFields(register.columns, before.fields, fields);
  return { ok: true, planned: { line, fields, before, changes } };
}

/** Takes out lines that do not go with the others, until those that stay do: a line may lean on one that is refused. */
function keepConsistent<Fields>(
  planned: readonly PlannedLine<Fields>[],
  judge: Judge<Fields>,
  note: (line: number, problems: readonly FieldProblem[]) => void,
): PlannedLine<Fields>[] {
  let staying = [...planned];
  for (;;) {
    const found = judge(staying.map((line) => line.fields));
    const next = staying.filter((line) => (found.get(line.fields) ?? []).length === 0);
    for (const line of staying) {
      const problems = found.get(line.fields) ?? [];
      if (problems.length > 0) note(line.line, problems);
    }
    if (next.length === staying.length) return staying;
    staying = next;
  }
}

/**
 * Works out what a file would add and change.
 * @throws InvalidInput when the header does not name the register's columns
 */
export function planImport<Fields extends object>(
  register: FiledRegister<Fields>,
  table: CsvTable,
  { kept, judge }: { readonly kept: readonly Kept<Fields>[]; readonly judge: Judge<Fields> },
): ImportPlan<Fields> {
  const header = readHeader(register.columns, table.header);
  if (!header.ok) throw new InvalidInput('file.header-wrong', header.refusal.sentence);
  const desk: Desk<Fields> = {
    register,
    header: header.value,
    width: table.header.map((word) => word.trim()).findLastIndex((word) => word !== '') + 1,
    style: table.delimiter === ';' ? 'comma' : 'point',
    byKey: new Map(kept.map((thing) => [keyOfKept(register, thing), thing])),
    seen: new Map(),
  };
  const problems: LineProblem[] = [];
  const refusedLines = new Set<number>();
  const note = (line: number, found: readonly FieldProblem[]) => {
    refusedLines.add(line);
    for (const { field, sentence } of found) {
      const column = fieldsOf(register.columns).find((known) => known === field);
      problems.push({ line, column: column === undefined ? null : register.columns[column].name, sentence });
    }
  };
  const readable: PlannedLine<Fields>[] = [];
  for (const line of table.lines) {
    const reading = readLine(desk, line);
    if (reading.ok) readable.push(reading.planned);
    else note(line.line, reading.problems);
  }
  const lines = keepConsistent(readable, judge, note);
  problems.sort((one, other) => one.line - other.line);
  return { rows: table.lines.length, lines, problems, refused: refusedLines.size };
}
