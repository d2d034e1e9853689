import { randomUUID } from 'node:crypto';
import { problemMediaType, type ProblemDetails } from '#contract/problem';
import type { ErrorRequestHandler, RequestHandler } from 'express';
import { MulterError } from 'multer';
import { AppError, Conflict, InvalidInput, NotFound, TooLarge, TooManyTries } from '../platform/errors';
import type { Logger } from '../platform/logger';

/** What the body parser and the upload parser throw, in our own words. */
function fromParser(error: unknown): AppError | null {
  if (error instanceof MulterError) {
    return error.code === 'LIMIT_FILE_SIZE'
      ? new TooLarge('file.too-large', 'This file is too large to be taken in one go.', { cause: error })
      : new InvalidInput('file.not-understood', 'This upload cannot be read. Choose one file and try again.', {
          cause: error,
        });
  }
  if (typeof error !== 'object' || error === null || !('type' in error)) return null;
  switch (error.type) {
    case 'entity.too.large':
      return new TooLarge('request.too-large', 'This request is too large.', { cause: error });
    case 'entity.parse.failed':
    case 'encoding.unsupported':
    case 'charset.unsupported':
    case 'request.aborted':
    case 'request.size.invalid':
    case 'entity.verify.failed':
      return new InvalidInput('request.not-understood', 'This request cannot be read.', { cause: error });
    default:
      return null;
  }
}

// PostgreSQL error codes (manual, appendix A) that mean "this text cannot be kept", not "we are broken".
const textRefused = new Set(['22021', '22P05', '22P02']);
// Two transactions that waited for each other, or could not be put one after the other: one was rolled back whole.
// 57014 and 55P03: it waited for others longer than it may.
const gaveWay = new Set(['40P01', '40001', '57014', '55P03']);

function fromDatabase(error: unknown): AppError | null {
  if (typeof error !== 'object' || error === null || !('code' in error) || typeof error.code !== 'string') return null;
  if (textRefused.has(error.code)) {
    return new InvalidInput('request.text-not-kept', 'This has a character that cannot be kept.', { cause: error });
  }
  if (gaveWay.has(error.code)) {
    const sentence = 'Somebody else changed the same thing at this moment. Nothing was saved here; try again.';
    return new Conflict('request.gave-way', sentence, { cause: error });
  }
  return null;
}

/** What Express and its parts refuse by themselves: a broken percent sign, a missing file, a range beyond its end. */
function fromExpress(error: unknown): AppError | null {
  if (error instanceof URIError) return new InvalidInput('request.not-understood', 'This address cannot be read.');
  if (typeof error !== 'object' || error === null || !('status' in error)) return null;
  const { status } = error;
  if (typeof status !== 'number' || status < 400 || status > 499) return null;
  return status === 404
    ? new NotFound('route.none', 'There is nothing at this address.', { cause: error })
    : new InvalidInput('request.not-understood', 'This request cannot be read.', { cause: error });
}

/** The one place where an error becomes a reply. Whatever is not ours says nothing of itself outside. */
export function problemMiddleware(logger: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    if (response.headersSent) {
      next(error);
      return;
    }
    const reference = randomUUID();
    const known = error instanceof AppError ? error : (fromParser(error) ?? fromDatabase(error) ?? fromExpress(error));
    if (!known)
      logger.error({ err: error, reference, method: request.method, path: request.path }, 'unexpected failure');
    else logger.info({ code: known.code, reference, path: request.path }, 'refused');
    const problem: ProblemDetails = {
      type: 'about:blank',
      title: known?.title ?? 'Something went wrong here',
      status: known?.status ?? 500,
      detail: known?.message ?? 'Nothing was changed. Try again; if it stays, tell your administrator the reference.',
      instance: request.originalUrl.slice(0, 500),
      code: known?.code ?? 'server.failed',
      reference,
      ...(known?.fields ? { fields: [...known.fields] } : {}),
    };
    if (known instanceof TooManyTries) response.set('retry-after', String(known.retryAfterSeconds));
    response
      .status(problem.status)
      .type(problemMediaType)
      .set('cache-control', 'no-store')
      .send(JSON.stringify(problem));
  };
}

export const noSuchRoute: RequestHandler = (_request, _response, next) => {
  next(new NotFound('route.none', 'There is nothing at this address.'));
};
