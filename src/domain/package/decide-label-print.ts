import type { PackageState } from '../load/model';
import { accept, refuse, type Result } from '../result';
import { stateInWords } from './state-words';

/*
 * Each package has one label. Another copy may be needed, because the first is torn or came off, and then a reason is kept:
 * two labels for one package are how a package comes to be counted twice (common practice, no source).
 */

export type LabelledPackage = {
  readonly code: string;
  readonly state: PackageState;
  /** Labels printed so far. */
  readonly copies: number;
};

export type LabelPrintRefusal = 'label.reason-missing' | 'label.not-any-more';

const gone: readonly PackageState[] = ['used', 'returned', 'discarded'];

/** Whether a label may be printed, and which copy it is, from 1. */
export function decideLabelPrint(
  labelled: LabelledPackage,
  reason: string | null,
): Result<{ readonly copy: number }, LabelPrintRefusal> {
  if (gone.includes(labelled.state)) {
    return refuse(
      'label.not-any-more',
      `${labelled.code} is ${stateInWords(labelled.state)}. It gets no label any more.`,
    );
  }
  if (labelled.copies > 0 && (reason === null || reason.trim() === '')) {
    return refuse('label.reason-missing', `${labelled.code} has a label already. Say why it needs another one.`);
  }
  return accept({ copy: labelled.copies + 1 });
}
