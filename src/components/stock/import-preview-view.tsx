import type { ImportedRow, ImportPreview, ImportProblem } from '#contract/csv-import';
import { countOf } from '../../lib/format';
import { Code } from '../ui/code';
import { PanelHead } from '../ui/heading';

/** What a file would do, before it does: the counts in one line, what is wrong where, what changes to what. */
export function ImportPreviewView({ preview }: { preview: ImportPreview }) {
  return (
    <div className="grid gap-6">
      <Counts preview={preview} />
      {preview.problems.length > 0 && <Problems preview={preview} />}
      {preview.changes.length > 0 && <Changes preview={preview} />}
    </div>
  );
}

function Counts({ preview }: { preview: ImportPreview }) {
  const counts = [
    [preview.added, 'new'],
    [preview.changed, 'changed'],
    [preview.unchanged, 'as it is here'],
    [preview.refused, 'to put right'],
  ] as const;
  return (
    <dl className="flex flex-wrap gap-x-8 gap-y-2">
      {counts.map(([count, words]) => (
        <div key={words} className="flex flex-row-reverse items-baseline gap-2">
          <dt className="text-row text-ink-2">{words}</dt>
          <dd className={`text-say tabular-nums ${words === 'to put right' && count > 0 ? 'text-madder-3' : ''}`}>
            {count}
          </dd>
        </div>
      ))}
    </dl>
  );
}

function LeftOut({ count, what }: { count: number; what: string }) {
  if (count === 0) return null;
  return <p className="mt-2 text-small text-ink-2">And {countOf(count, what)} more.</p>;
}

function Problems({ preview }: { preview: ImportPreview }) {
  return (
    <section>
      <PanelHead level={3} title="To put right" aside="These rows stay out" />
      <table className="mt-1 text-row">
        <thead className="sr-only">
          <tr>
            <th scope="col">Line</th>
            <th scope="col">Column</th>
            <th scope="col">What is wrong</th>
          </tr>
        </thead>
        <tbody>
          {preview.problems.map((problem) => (
            <ProblemRow key={`${String(problem.line)} ${problem.column ?? ''} ${problem.sentence}`} problem={problem} />
          ))}
        </tbody>
      </table>
      <LeftOut count={preview.problemsLeftOut} what="remark" />
    </section>
  );
}

function ProblemRow({ problem }: { problem: ImportProblem }) {
  return (
    <tr className="border-t border-paper-3 align-top">
      <td className="w-20 py-2 whitespace-nowrap text-ink-2 tabular-nums">Line {problem.line}</td>
      <td className="w-44 py-2 pr-4 font-medium [overflow-wrap:anywhere] max-tablet:w-28">
        {problem.column ?? 'whole row'}
      </td>
      <td className="py-2 [overflow-wrap:anywhere]">{problem.sentence}</td>
    </tr>
  );
}

function Changes({ preview }: { preview: ImportPreview }) {
  return (
    <section>
      <PanelHead level={3} title="What it would do" />
      <table className="mt-1 text-row">
        <thead className="sr-only">
          <tr>
            <th scope="col">Line</th>
            <th scope="col">Which</th>
            <th scope="col">What</th>
          </tr>
        </thead>
        <tbody>
          {preview.changes.map((row) => (
            <ChangeRow key={row.line} row={row} />
          ))}
        </tbody>
      </table>
      <LeftOut count={preview.changesLeftOut} what="row" />
    </section>
  );
}

function ChangeRow({ row }: { row: ImportedRow }) {
  return (
    <tr className="border-t border-paper-3 align-top">
      <td className="w-20 py-2 whitespace-nowrap text-ink-2 tabular-nums">Line {row.line}</td>
      <td className="w-44 py-2 pr-4 font-medium max-tablet:w-28">
        <Code>{row.name}</Code>
      </td>
      <td className="py-2 [overflow-wrap:anywhere]">
        {row.what === 'added' ? (
          'New'
        ) : (
          <ul>
            {row.changes.map((change) => (
              <li key={change.column}>
                <span className="text-ink-2">{change.column}</span> {change.before === '' ? 'empty' : change.before}{' '}
                <span aria-label="becomes">→</span> {change.after === '' ? 'empty' : change.after}
              </li>
            ))}
          </ul>
        )}
      </td>
    </tr>
  );
}
