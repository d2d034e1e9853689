import { problemSchema } from '#contract/problem';
import { z } from 'zod';
import { msSinceAct } from './activity';
import { NoLineError, ProblemError } from './errors';
import { noteLineDown, noteLineUp } from './line';
import { noteServerTime } from './server-clock';
import { signedOutGate, type Verdict } from './signed-out-gate';

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

export type CallOptions = {
  readonly signal?: AbortSignal;
  /** ask: hold the call and let the person sign in again. throw: the caller deals with 401 itself. */
  readonly whenSignedOut?: 'ask' | 'throw';
  /** Milliseconds before the line is taken to be down. */
  readonly patienceMs?: number;
};

export type DownloadedFile = { readonly content: Blob; readonly name: string };

/** For replies without a body. */
export const noContentSchema = z.undefined();

const defaultPatienceMs = 20_000;

/** Longer without a touch or a key, and what is asked is asked by the screen itself. */
const handsOffMs = 10_000;

/** What a proxy in front of the server says when the server itself is away: RFC 9110, 15.6.3 to 15.6.5. */
const gatewayStatuses: readonly number[] = [502, 503, 504];

type Call = {
  readonly method: Method;
  readonly path: string;
  readonly body?: unknown;
  readonly options: CallOptions;
};

function requestInit({ method, body, options }: Call): RequestInit {
  const headers = new Headers({ Accept: 'application/json, application/problem+json' });
  if (method !== 'GET') {
    // A form on a foreign page cannot set this header, so the server takes no write without it.
    headers.set('X-Requested-With', 'paperside');
  } else if (msSinceAct() > handsOffMs) {
    // A screen that asks by itself keeps nobody signed in.
    headers.set('X-Background', 'yes');
  }
  const patience = AbortSignal.timeout(options.patienceMs ?? defaultPatienceMs);
  const init: RequestInit = {
    method,
    headers,
    credentials: 'same-origin',
    cache: 'no-store',
    signal: options.signal === undefined ? patience : AbortSignal.any([options.signal, patience]),
  };
  if (body instanceof FormData) init.body = body;
  else if (body !== undefined) {
    headers.set('Content-Type', 'application/json');
    init.body = JSON.stringify(body);
  }
  return init;
}

async function reach(call: Call): Promise<Response> {
  let response: Response;
  try {
    response = await fetch(call.path, requestInit(call));
  } catch (error) {
    if (call.options.signal?.aborted === true) throw error;
    noteLineDown(new Date());
    throw new NoLineError(`no answer from ${call.path}`, { cause: error });
  }
  if (gatewayStatuses.includes(response.status) && !isProblemReply(response)) {
    noteLineDown(new Date());
    throw new NoLineError(`nothing behind ${call.path}`);
  }
  noteLineUp();
  noteServerTime(response.headers.get('Date'), Date.now());
  return response;
}

function isProblemReply(response: Response): boolean {
  return (response.headers.get('Content-Type') ?? '').includes('json');
}

async function problemOf(response: Response): Promise<ProblemError> {
  const parsed = problemSchema.safeParse(await response.json().catch(() => null));
  if (parsed.success) return new ProblemError(parsed.data);
  return new ProblemError({
    code: 'reply.unreadable',
    status: response.status,
    detail: 'The server answered in a way this screen does not understand. Load the page again.',
  });
}

function afterTheGate(verdict: Verdict, refused: ProblemError): ProblemError {
  if (verdict !== 'other-person') return refused;
  return new ProblemError({
    code: 'session.other-person',
    status: 401,
    detail: 'This was not saved: the sign-in it was made under had ended. Do it again in your own name.',
  });
}

/** Sends one call; on 401 in the middle of work it waits for the person and goes on where it stood. */
async function send(call: Call): Promise<Response> {
  const response = await reach(call);
  if (response.ok) return response;
  const problem = await problemOf(response);
  if (response.status !== 401 || call.options.whenSignedOut === 'throw') throw problem;
  const verdict = await signedOutGate.hold(call.method === 'GET' ? 'read' : 'write', call.options.signal);
  if (verdict !== 'again') throw afterTheGate(verdict, problem);
  return send(call);
}

async function sendAndParse<Reply>(call: Call, schema: z.ZodType<Reply>): Promise<Reply> {
  const response = await send(call);
  const text = await response.text();
  let body: unknown;
  try {
    body = text === '' ? undefined : JSON.parse(text);
  } catch {
    body = null;
  }
  const parsed = schema.safeParse(body);
  if (parsed.success) return parsed.data;
  throw new ProblemError({
    code: 'reply.unreadable',
    status: response.status,
    detail: 'This screen is older or newer than the server and cannot read its answer. Load the page again.',
  });
}

/** The one way to the server. Replies are parsed; every "no" arrives as a ProblemError, silence as a NoLineError. */
export const api = {
  get: <Reply>(path: string, schema: z.ZodType<Reply>, options: CallOptions = {}) =>
    sendAndParse({ method: 'GET', path, options }, schema),
  post: <Reply>(path: string, body: unknown, schema: z.ZodType<Reply>, options: CallOptions = {}) =>
    sendAndParse({ method: 'POST', path, body, options }, schema),
  put: <Reply>(path: string, body: unknown, schema: z.ZodType<Reply>, options: CallOptions = {}) =>
    sendAndParse({ method: 'PUT', path, body, options }, schema),
  patch: <Reply>(path: string, body: unknown, schema: z.ZodType<Reply>, options: CallOptions = {}) =>
    sendAndParse({ method: 'PATCH', path, body, options }, schema),
  delete: <Reply>(path: string, body: unknown, schema: z.ZodType<Reply>, options: CallOptions = {}) =>
    sendAndParse({ method: 'DELETE', path, body, options }, schema),
  /** A file with its form fields. */
  upload: <Reply>(path: string, form: FormData, schema: z.ZodType<Reply>, options: CallOptions = {}) =>
    sendAndParse({ method: 'POST', path, body: form, options: { patienceMs: 120_000, ...options } }, schema),
  /** A file, such as a sheet of labels, with the name the server gives it. */
  async download(path: string, options: CallOptions = {}): Promise<DownloadedFile> {
    const response = await send({ method: 'GET', path, options: { patienceMs: 60_000, ...options } });
    const named = /filename="([^"]+)"/.exec(response.headers.get('Content-Disposition') ?? '')?.[1];
    return { content: await response.blob(), name: named ?? 'file' };
  },
} as const;

/** Adds the query parameters that have a value: `withQuery('/api/items', { search: 'tray', page: 2 })`. */
export function withQuery(
  path: string,
  parameters: Readonly<Record<string, string | number | boolean | null | undefined>>,
): string {
  const query = new URLSearchParams();
  for (const [name, value] of Object.entries(parameters)) {
    if (value !== undefined && value !== null && value !== '') query.set(name, String(value));
  }
  const text = query.toString();
  return text === '' ? path : `${path}?${text}`;
}
