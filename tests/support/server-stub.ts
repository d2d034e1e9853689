import { vi } from 'vitest';

export type Call = {
  readonly method: string;
  readonly path: string;
  readonly search: string;
  readonly headers: Headers;
  readonly body: unknown;
};

/** An answer: a reply with its HTTP status, nothing (204), a problem, or silence. */
export type Answer =
  | { readonly json: unknown; readonly status?: number }
  | { readonly nothing: true }
  | {
      readonly problem: string;
      readonly status: number;
      readonly detail: string;
      readonly fields?: readonly { pointer: string; detail: string }[];
    }
  | { readonly silence: true }
  | {
      readonly text: string;
      readonly status: number;
      readonly contentType: string;
      readonly headers?: Readonly<Record<string, string>>;
    };

type Handler = (call: Call) => Answer | Promise<Answer>;

function responseOf(answer: Answer, call: Call): Response {
  if ('silence' in answer) throw new TypeError('Failed to fetch');
  if ('nothing' in answer) return new Response(null, { status: 204 });
  if ('text' in answer) {
    const headers = { 'Content-Type': answer.contentType, ...answer.headers };
    return new Response(answer.text, { status: answer.status, headers });
  }
  if ('problem' in answer) {
    const body = {
      type: 'about:blank',
      title: 'A refusal',
      status: answer.status,
      detail: answer.detail,
      instance: call.path,
      code: answer.problem,
      reference: 'ref-1',
      ...(answer.fields ? { fields: answer.fields } : {}),
    };
    return Response.json(body, { status: answer.status, headers: { 'Content-Type': 'application/problem+json' } });
  }
  return Response.json(answer.json, { status: answer.status ?? 200 });
}

/**
 * A server at the HTTP edge: `stubServer({ 'GET /api/session': () => ({ json: session }) })`. What it is not told to
 * answer fails the test. Handlers may be changed while it runs.
 */
export function stubServer(handlers: Record<string, Handler>) {
  const calls: Call[] = [];
  vi.stubGlobal('fetch', async (input: string | URL | Request, init: RequestInit = {}) => {
    const url = new URL(input instanceof Request ? input.url : input, window.location.origin);
    const body = typeof init.body === 'string' ? (JSON.parse(init.body) as unknown) : (init.body ?? undefined);
    const call: Call = {
      method: init.method ?? 'GET',
      path: url.pathname,
      search: url.search,
      headers: new Headers(init.headers),
      body,
    };
    calls.push(call);
    const handle = handlers[`${call.method} ${call.path}`];
    if (!handle) {
      console.error(`a call that the test does not answer: ${call.method} ${call.path}`);
      throw new TypeError('no such address in this test');
    }
    const answer = await handle(call);
    init.signal?.throwIfAborted();
    return responseOf(answer, call);
  });
  return {
    calls,
    handlers,
    callsTo: (method: string, path: string) => calls.filter((call) => call.method === method && call.path === path),
  };
}
