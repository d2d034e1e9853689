import type { ScanResponse } from '#contract/loads';
import type { SoundName } from '../../lib/sounds';
import type { ScanAnswerLook } from '../../components/ui/scan-answer';

export type AnswerLook = {
  readonly look: ScanAnswerLook;
  readonly word: string;
  readonly sound: SoundName;
};

/** Six answers to a package and two to a place: each its own word, look and sound. */
export function lookOf(reply: Pick<ScanResponse, 'answer' | 'look'>): AnswerLook {
  switch (reply.answer) {
    case 'taken':
      if (reply.look === 'no-slot-left') return { look: 'look', word: 'Taken', sound: 'holder-full' };
      return reply.look === null
        ? { look: 'taken', word: 'Taken', sound: 'taken' }
        : { look: 'look', word: 'Taken', sound: 'taken-but-look' };
    case 'already-here':
      return { look: 'already-here', word: 'On it', sound: 'already-here' };
    case 'not-known':
      return { look: 'not-known', word: 'Not known', sound: 'not-known' };
    case 'not-ready':
      return { look: 'not-ready', word: 'Not taken', sound: 'not-taken' };
    case 'held':
      return { look: 'held', word: 'Held', sound: 'held' };
    case 'called-back':
      return { look: 'called-back', word: 'Call back', sound: 'called-back' };
    case 'place-set':
      return { look: 'place', word: 'Place', sound: 'place-set' };
    case 'place-refused':
      return { look: 'not-ready', word: 'Not here', sound: 'wrong-place' };
  }
}
