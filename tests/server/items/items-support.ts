import type { Item, ItemList } from '../../../src/contract/items';
import type { ImportPreview } from '../../../src/contract/csv-import';
import type { ProblemDetails } from '../../../src/contract/problem';
import { randomUUID } from 'node:crypto';
import type { Response } from 'supertest';
import { answer, type Answer } from '../../support/answer';
import { demonstrationItems } from '../../../seeds/demonstration-catalogue';
import type { TestApp } from '../../support/test-app';

/** What a form states about an item of the demonstration, with changes. */
export function anItem(code: string, changes: Readonly<Record<string, unknown>> = {}): Record<string, unknown> {
  const item = demonstrationItems.find((one) => one.code === code);
  if (!item) throw new Error(`The demonstration has no ${code}.`);
  return { ...item, preferredHolder: null, standsOn: [], ...changes };
}

/** Everything kept about items, to show that a refusal changed nothing. */
export async function itemsOnFile(app: TestApp): Promise<unknown> {
  return {
    items: await app.db('items').orderBy('id'),
    history: await app.db('audit_events').whereLike('kind', 'item%').count(),
  };
}

export async function addItem(
  app: TestApp,
  fields: Readonly<Record<string, unknown>>,
  facility: 'A' | 'B' = 'A',
): Promise<{ id: string; version: number; code: string }> {
  const agent = await app.as('supervisor', facility);
  const reply = await agent
    .post('/api/items')
    .send({ ...fields, requestId: randomUUID() })
    .expect(201);
  return reply.body as { id: string; version: number; code: string };
}

/** Whatever a route of items may answer. */
type ItemBody = ProblemDetails & Item & ItemList & ImportPreview;

export function answerOf(sent: PromiseLike<Response>): Promise<Answer<ItemBody>> {
  return answer<ItemBody>(sent);
}
