import type { Refusal } from '#domain/result';
import { Conflict, RuleRefused, type FieldProblem } from '../../platform/errors';

/** Refusals that somebody else's act has caused: looking again tells more than reading the rules. */
const causedByOthers: readonly string[] = [
  'package.in-another-load',
  'package.in-another-run',
  'package.not-in-run',
  'run.taken',
  'run.dropped',
];

/** The core's "no" as an error; with several, the first one speaks and all are pointed at. */
export function refusalError(refusal: Refusal, fields?: readonly FieldProblem[]): Conflict | RuleRefused {
  const extras = fields === undefined ? {} : { fields };
  return causedByOthers.includes(refusal.code)
    ? new Conflict(refusal.code, refusal.sentence, extras)
    : new RuleRefused(refusal.code, refusal.sentence, extras);
}
