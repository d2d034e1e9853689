import type { StagingScanResponse } from '#contract/runs';
import type { ReactNode } from 'react';
import { Code } from '../../../components/ui/code';
import { ScanMark, type ScanAnswerLook } from '../../../components/ui/scan-answer';
import type { SoundName } from '../../../lib/sounds';

export type LastStaging =
  | { readonly kind: 'none' }
  | { readonly kind: 'answered'; readonly turn: number; readonly reply: StagingScanResponse }
  | { readonly kind: 'refused'; readonly turn: number; readonly sentence: string };

type Answer = { readonly look: ScanAnswerLook; readonly word: string; readonly sound: SoundName };

/** Each answer its own word, look and sound. */
const stagingAnswers: Readonly<Record<StagingScanResponse['answer'], Answer>> = {
  taken: { look: 'taken', word: 'Taken', sound: 'taken' },
  'already-here': { look: 'already-here', word: 'In it', sound: 'already-here' },
  'not-ready': { look: 'not-ready', word: 'Not taken', sound: 'not-taken' },
  'not-known': { look: 'not-known', word: 'Not known', sound: 'not-known' },
  held: { look: 'held', word: 'Held', sound: 'held' },
  'called-back': { look: 'called-back', word: 'Call back', sound: 'called-back' },
};

/** A package that was taken may still want a second look. */
export function answerOf({ answer, look }: Pick<StagingScanResponse, 'answer' | 'look'>): Answer {
  return answer === 'taken' && look !== null
    ? { look: 'look', word: 'Taken', sound: 'taken-but-look' }
    : stagingAnswers[answer];
}

type LineProps = Answer & { readonly title: ReactNode; readonly children: ReactNode; readonly aside: ReactNode };

function Line({ look, word, title, children, aside }: LineProps) {
  const isNo = !['taken', 'look', 'place'].includes(look);
  return (
    <div className={`flex flex-wrap items-center gap-x-4 gap-y-2 px-4 pt-4 pb-3 ${isNo ? 'animate-flash-edge' : ''}`}>
      <ScanMark look={look} word={word} isLarge />
      <div className="min-w-0 flex-1 animate-words-up">
        <p className="truncate text-scan max-tablet:text-say">{title}</p>
        <p className="line-clamp-2 text-[1.0625rem]/[1.4375rem] max-tablet:text-body">{children}</p>
      </div>
      {aside}
    </div>
  );
}

/** The last scan into a run, large enough to be read from the table. */
export function RunScanLine({ last, aside }: { last: LastStaging; aside: ReactNode }) {
  if (last.kind === 'none') {
    return (
      <Line look="place" word="Ready" sound="taken" title="Scan packages into this run" aside={aside}>
        The scanner of this station is listening.
      </Line>
    );
  }
  if (last.kind === 'refused') {
    return (
      <Line key={last.turn} {...stagingAnswers['not-ready']} title="Not taken" aside={aside}>
        {last.sentence}
      </Line>
    );
  }
  const { reply, turn } = last;
  return (
    <div key={turn} data-answer={reply.answer}>
      <Line
        {...answerOf(reply)}
        title={reply.package?.itemName ?? <Code>{reply.code || 'Nothing readable'}</Code>}
        aside={aside}
      >
        {reply.package !== null && reply.answer === 'taken' && reply.look === null ? (
          <Code className="font-semibold">{reply.package.code}</Code>
        ) : (
          reply.sentence
        )}
      </Line>
    </div>
  );
}
