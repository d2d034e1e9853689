import { randomUUID } from 'node:crypto';
import type { z } from 'zod';
import { paths } from '../../src/contract/paths';
import type { DemonstrationSignIn } from '../../seeds/demonstration-people';

/** A person at work through the API, for what is to be there before a screen is looked at. */
export type Caller = {
  readonly get: <Reply>(path: string, schema: z.ZodType<Reply>) => Promise<Reply>;
  /** Adds the request's id. */
  readonly post: <Reply>(path: string, body: object, schema: z.ZodType<Reply>) => Promise<Reply>;
  readonly file: (path: string) => Promise<Buffer>;
  /** What a browser needs to go on in this person's name. */
  readonly cookie: { readonly name: string; readonly value: string; readonly url: string };
};

export async function callAs(url: string, { staffNumber, password }: DemonstrationSignIn): Promise<Caller> {
  const headers = { 'content-type': 'application/json', 'x-requested-with': 'paperside' };
  const signedIn = await fetch(url + paths.session, {
    method: 'POST',
    headers,
    body: JSON.stringify({ staffNumber, password }),
  });
  const [name = '', value = ''] = (signedIn.headers.getSetCookie()[0] ?? '').split(';')[0]?.split(/=(.*)/s) ?? [];
  if (!signedIn.ok || value === '') throw new Error(`${staffNumber} could not sign in: ${await signedIn.text()}`);

  async function call(method: 'GET' | 'POST', path: string, body?: object): Promise<Response> {
    const reply = await fetch(url + path, {
      method,
      headers: { ...headers, cookie: `${name}=${value}` },
      ...(body === undefined ? {} : { body: JSON.stringify({ requestId: randomUUID(), ...body }) }),
    });
    if (!reply.ok) throw new Error(`${method} ${path} was answered ${reply.status}: ${await reply.text()}`);
    return reply;
  }

  return {
    get: async (path, schema) => schema.parse(await (await call('GET', path)).json()),
    post: async (path, body, schema) => schema.parse(await (await call('POST', path, body)).json()),
    file: async (path) => Buffer.from(await (await call('GET', path)).arrayBuffer()),
    cookie: { name, value, url },
  };
}
