import type { JudgedAgain } from '#contract/judged-again';
import type { KeptFinding } from '#domain/policy/compare-findings';
import type { ReactNode } from 'react';
import { PanelHead } from '../../../components/ui/heading';
import { levelOf, LevelWords, type PinLevel } from '../../../components/ui/pin';
import { useFacility } from '../../../lib/facility';
import { figureWords } from '../finding-words';

type Side = { readonly finding: KeptFinding } | { readonly nothing: string };

type Row = { readonly key: string; readonly then: Side; readonly now: Side };

type Group = { readonly id: string; readonly title: string; readonly hint: string; readonly rows: readonly Row[] };

const notThen = { nothing: 'No such finding.' } as const;
const notNow = { nothing: 'No such finding any more.' } as const;

/** What differs comes first; what both say, last. */
function groupsOf(comparison: NonNullable<JudgedAgain['comparison']>): readonly Group[] {
  const pairs = (found: typeof comparison.changed): readonly Row[] =>
    found.map(({ then, now }) => ({ key: `${then.key} ${now.key}`, then: { finding: then }, now: { finding: now } }));
  return [
    {
      id: 'changed',
      title: 'Judged otherwise today',
      hint: 'the same thing, with another figure, limit or weight',
      rows: pairs(comparison.changed),
    },
    {
      id: 'only-now',
      title: 'Found only today',
      hint: 'the rules of then said nothing here',
      rows: comparison.onlyNow.map((finding) => ({ key: finding.key, then: notThen, now: { finding } })),
    },
    {
      id: 'only-then',
      title: 'Found only then',
      hint: 'today’s rules say nothing here',
      rows: comparison.onlyThen.map((finding) => ({ key: finding.key, then: { finding }, now: notNow })),
    },
    { id: 'both', title: 'The same then and today', hint: '', rows: pairs(comparison.both) },
  ].filter((group) => group.rows.length > 0);
}

type ComparedFindingsProps = {
  readonly comparison: NonNullable<JudgedAgain['comparison']>;
  readonly acceptances: JudgedAgain['then']['acceptances'];
};

/** Two judgements of one load, line by line: then at the left, today at the right. */
export function ComparedFindings({ comparison, acceptances }: ComparedFindingsProps) {
  const groups = groupsOf(comparison);
  if (groups.length === 0) {
    return <p className="text-row">Neither the rules of then nor those of today find anything in this load.</p>;
  }
  return (
    <div className="grid gap-7">
      {groups.map(({ id, title, hint, rows }) => (
        <section key={id} aria-labelledby={`compared-${id}`}>
          <PanelHead
            id={`compared-${id}`}
            title={`${title}, ${rows.length}`}
            {...(hint === '' ? {} : { aside: <span className="max-tablet:hidden">{hint}</span> })}
          />
          <ul>
            {rows.map((row) => (
              <li key={row.key} className="grid gap-x-10 gap-y-2.5 border-t border-paper-3 py-3 tablet:grid-cols-2">
                <SideOfRow when="As closed">
                  <OneSide side={row.then} acceptances={acceptances} />
                </SideOfRow>
                <SideOfRow when="By today’s rules">
                  <OneSide side={row.now} acceptances={acceptances} />
                </SideOfRow>
              </li>
            ))}
          </ul>
        </section>
      ))}
    </div>
  );
}

/** The column says when on the tablet; on the phone each part says it itself, and to a screen reader always. */
function SideOfRow({ when, children }: { readonly when: string; readonly children: ReactNode }) {
  return (
    <div>
      <p className="mb-0.5 text-least text-ink-2 tablet:sr-only">{when}</p>
      {children}
    </div>
  );
}

function OneSide({ side, acceptances }: { readonly side: Side } & Pick<ComparedFindingsProps, 'acceptances'>) {
  if ('nothing' in side) return <p className="text-row text-ink-2">{side.nothing}</p>;
  return <FindingInWords finding={side.finding} acceptances={acceptances} />;
}

/** Beside the words, so that the eye finds what holds the load. */
const edges: Readonly<Record<PinLevel, string>> = {
  hold: 'border-madder-3',
  look: 'border-straw-3 border-dashed',
  note: 'border-ink-3 border-dotted',
};

/** A finding as it was made, without anything to do about it. */
export function FindingInWords({
  finding,
  acceptances,
}: { readonly finding: KeptFinding } & Pick<ComparedFindingsProps, 'acceptances'>) {
  const { unitSystem } = useFacility();
  const level = levelOf[finding.severity];
  const acceptance = acceptances.find((one) => one.findingKey === finding.key);
  return (
    <div className={`border-l-[3px] pl-3 ${edges[level]}`}>
      <p className="text-row leading-[1.25rem] font-semibold">{finding.title}</p>
      <p className="text-small">
        <LevelWords level={level} />
        {finding.figure && <span className="ml-2.5 tabular-nums">{figureWords(finding.figure, unitSystem)}</span>}
      </p>
      <p className="text-least text-ink-2">{finding.source.text}</p>
      {acceptance && (
        <p className="mt-0.5 text-small text-ink-2">
          Left as it is by <b className="font-label text-ink-1">{acceptance.acceptedBy}</b>: “{acceptance.reason}”
        </p>
      )}
    </div>
  );
}
