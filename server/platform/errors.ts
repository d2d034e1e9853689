/** The short vocabulary of refusals. One middleware turns them into problem details; nothing else speaks HTTP. */
export type FieldProblem = { readonly pointer: string; readonly detail: string };

type Extras = { readonly fields?: readonly FieldProblem[]; readonly cause?: unknown };

export abstract class AppError extends Error {
  abstract readonly status: number;
  abstract readonly title: string;
  readonly fields: readonly FieldProblem[] | undefined;

  constructor(
    /** Stable, for programs. */
    readonly code: string,
    /** One plain sentence, for people. */
    sentence: string,
    extras: Extras = {},
  ) {
    super(sentence, { cause: extras.cause });
    this.fields = extras.fields;
  }
}

export class InvalidInput extends AppError {
  readonly status = 400;
  readonly title = 'Something in this request cannot be used';
}

export class NotSignedIn extends AppError {
  readonly status = 401;
  readonly title = 'Nobody is signed in';
}

export class NotAllowed extends AppError {
  readonly status = 403;
  readonly title = 'This needs another role';
}

export class NotFound extends AppError {
  readonly status = 404;
  readonly title = 'Not found';
}

export class Conflict extends AppError {
  readonly status = 409;
  readonly title = 'Something changed meanwhile';
}

export class TooLarge extends AppError {
  readonly status = 413;
  readonly title = 'Too large';
}

/** The trade's own rules say no: the request was understood, and may not be done. */
export class RuleRefused extends AppError {
  readonly status = 422;
  readonly title = 'The rules do not allow this';
}

export class TooManyTries extends AppError {
  readonly status = 429;
  readonly title = 'Too many tries';

  constructor(
    code: string,
    sentence: string,
    readonly retryAfterSeconds: number,
  ) {
    super(code, sentence);
  }
}
