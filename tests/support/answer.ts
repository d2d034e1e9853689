import type { Response } from 'supertest';

export type Answer<Body> = {
  readonly status: number;
  readonly text: string;
  readonly headers: Readonly<Record<string, string>>;
  readonly body: Body;
};

/** A reply whose body is looked at as a `Body`: that it is one is for the test to show. */
export async function answer<Body>(sent: PromiseLike<Response>): Promise<Answer<Body>> {
  const reply = await sent;
  return { status: reply.status, text: reply.text, headers: reply.headers, body: reply.body as Body };
}
