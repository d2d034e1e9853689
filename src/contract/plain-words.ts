import { z } from 'zod';

/*
 * What a schema says where nobody wrote a sentence of its own for it. These reach people, in forms and in refusals, so they
 * are plain words and not the parser's.
 */

type Issue = z.core.$ZodRawIssue;

function tooFar(issue: Issue & { code: 'too_big' | 'too_small' }): string {
  const isBig = issue.code === 'too_big';
  const limit = String(isBig ? issue.maximum : issue.minimum);
  switch (issue.origin) {
    case 'string':
      return isBig ? `At most ${limit} characters.` : `At least ${limit} characters.`;
    case 'array':
    case 'set':
      return isBig ? `At most ${limit} of these.` : `At least ${limit} of these.`;
    case 'number':
    case 'int':
    case 'bigint':
      return isBig ? `This is more than ${limit}.` : `This is less than ${limit}.`;
    default:
      return isBig ? 'This is too much.' : 'This is too little.';
  }
}

function wordsFor(issue: Issue): string | undefined {
  switch (issue.code) {
    case 'invalid_type':
      if (issue.input === undefined) return 'This is missing.';
      return issue.expected === 'int' ? 'A whole number, please.' : 'This is not what belongs here.';
    case 'unrecognized_keys':
      return `Nothing of this name belongs here: ${issue.keys.join(', ').slice(0, 100)}.`;
    case 'invalid_value':
    case 'invalid_union':
      return 'This is none of the choices.';
    case 'invalid_format':
      return 'This is not written as it should be.';
    case 'too_big':
    case 'too_small':
      return tooFar(issue);
    default:
      return undefined;
  }
}

z.config({ customError: wordsFor });
