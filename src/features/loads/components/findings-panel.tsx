import type { LoadDetail } from '#contract/loads';
import { ruleIds, type Finding, type Fix } from '#domain/load/finding';
import type { LetteredFinding } from '../../../components/cart-map/map-model';
import { Button } from '../../../components/ui/button';
import { TextWithCodes } from '../../../components/ui/code';
import { FilmPanel } from '../../../components/ui/film-panel';
import { PanelHead } from '../../../components/ui/heading';
import { levelOf, LevelWords, Pin } from '../../../components/ui/pin';
import { useLessonOpener } from '../../../lib/lesson-opener';
import { figureWords, limitWords } from '../figure-words';

type FindingsPanelProps = {
  readonly detail: LoadDetail;
  readonly open: readonly LetteredFinding[];
  readonly settled: readonly LetteredFinding[];
  readonly openKey: string | null;
  readonly mayAccept: boolean;
  readonly isBuilding: boolean;
  readonly onOpen: (key: string | null) => void;
  readonly onFix: (finding: Finding, fix: Fix) => void;
  readonly onAccept: (finding: Finding) => void;
};

/** Every finding with the letter of its pin; the open one lies on film and says what, why, how to fix it, and its source. */
export function FindingsPanel(props: FindingsPanelProps) {
  const { detail, open, settled, openKey } = props;
  const acceptanceOf = new Map(detail.acceptances.map((entry) => [entry.findingKey, entry]));
  return (
    <section aria-label="Findings">
      <PanelHead
        title={`Findings, ${open.length}`}
        aside={open.length === 0 ? 'nothing found' : 'letters match the pins'}
      />
      {open.length === 0 && <p className="py-1 text-row text-ink-2">The rules find nothing to put right.</p>}
      <ol>
        {open.map((entry) =>
          entry.finding.key === openKey ? (
            <OpenFinding key={entry.finding.key} {...props} entry={entry} />
          ) : (
            <li key={entry.finding.key} className="border-t border-paper-3 first:border-t-0">
              <button
                type="button"
                id={`finding-${entry.letter}`}
                aria-expanded={false}
                onClick={() => {
                  props.onOpen(entry.finding.key);
                }}
                className="grid min-h-12 w-full grid-cols-[1.625rem_1fr] items-center gap-x-2.5 py-1 pr-2 text-left"
              >
                <Pin letter={entry.letter} level={levelOf[entry.finding.severity]} isLevelSaid />
                <span>
                  <span className="block text-row leading-[1.15rem] font-semibold">
                    <TextWithCodes>{entry.finding.title}</TextWithCodes>
                  </span>
                  <span className="text-least text-ink-2">
                    <LevelWords level={levelOf[entry.finding.severity]} />
                    {entry.finding.fix && <span className="ml-2.5">can be put right by touch</span>}
                  </span>
                </span>
              </button>
            </li>
          ),
        )}
      </ol>
      {settled.length > 0 && (
        <details className="border-t border-paper-3 pt-1">
          <summary className="min-h-11 cursor-pointer py-2.5 text-row font-semibold">Settled, {settled.length}</summary>
          <ul>
            {settled.map(({ letter, finding }) => {
              const acceptance = acceptanceOf.get(finding.key);
              return (
                <li key={finding.key} className="grid grid-cols-[1.625rem_1fr] gap-x-2.5 py-1.5 text-small">
                  <Pin letter={letter} level="note" isLevelSaid />
                  <span>
                    <b className="font-semibold">{finding.title}</b>
                    {acceptance && (
                      <span className="block text-ink-2">
                        Left as it is by {acceptance.acceptedBy}: “{acceptance.reason}”
                      </span>
                    )}
                  </span>
                </li>
              );
            })}
          </ul>
        </details>
      )}
    </section>
  );
}

function OpenFinding({
  entry,
  mayAccept,
  isBuilding,
  onOpen,
  onFix,
  onAccept,
}: FindingsPanelProps & { entry: LetteredFinding }) {
  const { letter, finding } = entry;
  const { fix } = finding;
  const opener = useLessonOpener();
  // A closed load may keep a finding of a rule that there is no more; there is no lesson of it either.
  const openLesson = ruleIds.includes(finding.ruleId) ? opener : null;
  const isMendable = isBuilding && (fix !== null || finding.severity === 'accept');
  return (
    <li className="-ml-3">
      <FilmPanel seal="none" className="grid grid-cols-[1.625rem_1fr] gap-x-2.5 px-3 py-2">
        <Pin letter={letter} level={levelOf[finding.severity]} isLevelSaid />
        <div>
          <button
            type="button"
            id={`finding-${letter}`}
            aria-expanded
            onClick={() => {
              onOpen(null);
            }}
            className="min-h-6 w-full text-left text-row leading-[1.15rem] font-semibold"
          >
            <TextWithCodes>{finding.title}</TextWithCodes>
          </button>
          <p className="mt-0.5 text-small">{finding.reason}</p>
          <p className="mt-1 text-small">
            <b className="font-semibold">Fix:</b> {finding.remedy}
          </p>
          {finding.figure && (
            <p className="mt-1 text-small">
              Measured {figureWords(finding.figure, finding.figure.measured)}, {limitWords(finding.figure)}
            </p>
          )}
          <p className="mt-1 text-least text-ink-2">
            <LevelWords level={levelOf[finding.severity]} /> <span className="ml-1.5">{finding.source.text}</span>
          </p>
          {(isMendable || openLesson) && (
            <div className="mt-1.5 flex flex-wrap gap-2">
              {isMendable && fix && (
                <Button
                  size="small"
                  onPress={() => {
                    onFix(finding, fix);
                  }}
                >
                  {fix.label}
                </Button>
              )}
              {isMendable && finding.severity === 'accept' && (
                <Button
                  size="small"
                  kind="quiet"
                  blockedBecause={
                    mayAccept ? undefined : 'A lead or supervisor may let this stay, with a written reason.'
                  }
                  onPress={() => {
                    onAccept(finding);
                  }}
                >
                  Let it stay
                </Button>
              )}
              {openLesson && (
                <Button
                  size="small"
                  kind="plain"
                  onPress={() => {
                    openLesson(finding.ruleId);
                  }}
                >
                  Why? 90 seconds
                </Button>
              )}
            </div>
          )}
        </div>
      </FilmPanel>
    </li>
  );
}
