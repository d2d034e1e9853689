import type { ProblemDetails } from '#contract/problem';

/** The server said no, in words for people and with a `code` for the program. Branch on `code`, never on prose. */
export class ProblemError extends Error {
  override readonly name = 'ProblemError';
  readonly code: string;
  /** HTTP status code. */
  readonly httpStatus: number;
  /** One plain sentence for the person at the screen. */
  readonly sentence: string;
  /** Also in the server's log; null when the reply did not come from our server. */
  readonly reference: string | null;
  readonly fields: readonly { readonly pointer: string; readonly detail: string }[];

  constructor(problem: Pick<ProblemDetails, 'code' | 'status' | 'detail'> & Partial<ProblemDetails>) {
    super(`${problem.code}: ${problem.detail}`);
    this.code = problem.code;
    this.httpStatus = problem.status;
    this.sentence = problem.detail;
    this.reference = problem.reference ?? null;
    this.fields = problem.fields ?? [];
  }
}

/** No answer came: the network or the server is away. What was asked may or may not have been done. */
export class NoLineError extends Error {
  override readonly name = 'NoLineError';
}

export function isProblem(error: unknown, code?: string): error is ProblemError {
  return error instanceof ProblemError && (code === undefined || error.code === code);
}

/** What to tell the person, whatever was thrown. */
export function sentenceOf(error: unknown): string {
  if (error instanceof ProblemError) return error.sentence;
  if (error instanceof NoLineError) return 'The server did not answer. Nothing here is lost. Try again.';
  return 'Something went wrong on this screen. Try again.';
}

/** How a form calls the field a JSON pointer (RFC 6901) of the server names: "/body/packages/0/code" is "packages.0.code". */
export function fieldNameOf(pointer: string): string {
  return pointer
    .replace(/^\/body(?=\/)/, '')
    .split('/')
    .filter((part) => part !== '')
    .map((part) => part.replaceAll('~1', '/').replaceAll('~0', '~'))
    .join('.');
}
