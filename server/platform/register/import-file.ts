import type { ImportMode, ImportPreview, ImportResult } from '#contract/csv-import';
import { greatestImportRows } from '#contract/csv-import';
import { createHash } from 'node:crypto';
import type { Actor } from '../actor';
import { readCsvTable } from '../csv/read-csv-table';
import type { Db, Transaction } from '../db';
import { Conflict, InvalidInput, RuleRefused } from '../errors';
import { once } from '../once';
import { planImport, type ImportPlan, type PlannedLine } from './plan-import';
import { keyOfKept, lockRegister, type Desk, type FiledRegister, type Written } from './register';

/** Longer lists are cut: nobody reads them, and the counts say how many there are. */
const mostShown = 500;

type Asker = { readonly desk: Desk; readonly actor: Actor };

function requireFile(file: Buffer | null): Buffer {
  if (file === null) throw new InvalidInput('file.missing', 'Choose a CSV file first.');
  return file;
}

async function planFor<Fields extends object>(
  register: FiledRegister<Fields>,
  trx: Transaction | Db,
  { facilityId, file }: { readonly facilityId: string; readonly file: Buffer },
): Promise<ImportPlan<Fields>> {
  const table = readCsvTable(file, greatestImportRows);
  const kept = await register.list(trx, facilityId);
  const judge = await register.judge(trx, facilityId, kept);
  return planImport(register, table, { kept, judge });
}

function isAdded(line: PlannedLine<unknown>): boolean {
  return line.before === null;
}

function isChanged(line: PlannedLine<unknown>): boolean {
  return line.before !== null && line.changes.length > 0;
}

function countsOf(plan: ImportPlan<unknown>): ImportResult {
  const added = plan.lines.filter(isAdded).length;
  const changed = plan.lines.filter(isChanged).length;
  return { rows: plan.rows, added, changed, unchanged: plan.lines.length - added - changed, refused: plan.refused };
}

/** Names this file against what is kept now: the same plan, the same digest. */
function digestOf(plan: ImportPlan<unknown>, file: Buffer): string {
  const hash = createHash('sha256').update(createHash('sha256').update(file).digest());
  for (const line of plan.lines) {
    const basis = line.before === null ? 'new' : `${line.before.id} ${line.before.version}`;
    hash.update(`${line.line} ${basis} ${line.changes.join(' ')}\n`);
  }
  hash.update(String(plan.refused));
  return hash.digest('hex');
}

/** Says what a file would do. Writes nothing. */
export async function previewImport<Fields extends object>(
  register: FiledRegister<Fields>,
  { desk, actor }: Asker,
  uploaded: Buffer | null,
): Promise<ImportPreview> {
  const file = requireFile(uploaded);
  const plan = await planFor(register, desk.db, { facilityId: actor.facilityId, file });
  const moving = plan.lines.filter((line) => isAdded(line) || isChanged(line));
  const changes = moving.slice(0, mostShown).map((line) => ({
    line: line.line,
    name: register.keyOf(line.fields) ?? '',
    what: isAdded(line) ? ('added' as const) : ('changed' as const),
    changes: line.changes.map((field) => {
      const column = register.columns[field as keyof Fields];
      return {
        column: column.name,
        before: line.before === null ? '' : column.write(line.before.fields[field as keyof Fields]),
        after: column.write(line.fields[field as keyof Fields]),
      };
    }),
  }));
  return {
    ...countsOf(plan),
    digest: digestOf(plan, file),
    problems: plan.problems.slice(0, mostShown),
    problemsLeftOut: Math.max(0, plan.problems.length - mostShown),
    changes,
    changesLeftOut: moving.length - changes.length,
  };
}

/** Takes a file over as its preview said: the whole or the good lines, in one transaction. */
export async function importFile<Fields extends object>(
  register: FiledRegister<Fields>,
  { desk, actor }: Asker,
  {
    file: uploaded,
    requestId,
    mode,
    digest,
  }: {
    readonly file: Buffer | null;
    readonly requestId: string;
    readonly mode: ImportMode;
    readonly digest: string;
  },
): Promise<ImportResult> {
  const file = requireFile(uploaded);
  const body = { mode, digest, file: createHash('sha256').update(file).digest('hex') };
  return once({ ...desk, actor }, { requestId, act: `${register.name}.import`, body }, async (trx) => {
    await lockRegister(trx, actor.facilityId, register.name);
    const plan = await planFor(register, trx, { facilityId: actor.facilityId, file });
    if (digestOf(plan, file) !== digest) {
      throw new Conflict(
        'import.changed-meanwhile',
        'What is here, or the file, changed since you looked at the preview. Look again, then import it.',
      );
    }
    const counts = countsOf(plan);
    if (mode === 'all-or-nothing' && counts.refused > 0) {
      const rows = counts.refused === 1 ? 'One row has' : `${counts.refused} rows have`;
      throw new RuleRefused('import.rows-refused', `${rows} something to put right, so nothing was imported.`);
    }
    const written: Written<Fields>[] = plan.lines
      .filter((line) => isAdded(line) || isChanged(line))
      .map(({ before, fields }) => ({
        before,
        after: { id: before?.id ?? desk.ids.next(), version: (before?.version ?? 0) + 1, fields },
      }));
    const context = { trx, actor, at: desk.clock.now(), ids: desk.ids, requestId };
    await register.write(context, written);
    await register.noteImport(context, counts);
    return counts;
  });
}

/** Everything in the register, in the order of its keys, for a file that reads back to the same. */
export async function listForExport<Fields extends object>(
  register: FiledRegister<Fields>,
  db: Db,
  facilityId: string,
): Promise<Fields[]> {
  const kept = await register.list(db, facilityId);
  return kept
    .sort((one, other) => keyOfKept(register, one).localeCompare(keyOfKept(register, other), 'en', { numeric: true }))
    .map((thing) => thing.fields);
}
