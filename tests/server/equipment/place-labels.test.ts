import { beforeAll, describe, expect, it } from 'vitest';
import { anId, openTestApp } from '../../support/test-app';
import { readPdf } from '../labels/draw/read-pdf';
import { addPiece, aCart, aHolder, aHolderKind, answerOf, type EquipmentBody } from './equipment-support';

const app = openTestApp();
let cart: EquipmentBody;
let kind: EquipmentBody;
let holders: EquipmentBody[];

beforeAll(async () => {
  cart = await addPiece(app, '/api/carts', aCart('C1', { name: 'Cart 1' }));
  kind = await addPiece(app, '/api/holder-kinds', aHolderKind('RS'));
  holders = [
    await addPiece(app, '/api/holders', aHolder('RS-1', 'RS')),
    await addPiece(app, '/api/holders', aHolder('RS-2', 'RS')),
    await addPiece(app, '/api/holders', aHolder('RS-3', 'RS', { condition: 'missing' })),
  ];
});

async function labelsOf(query: Readonly<Record<string, string>>): Promise<string[][]> {
  const technician = await app.as('technician');
  const reply = await technician.get('/api/place-labels').query(query).responseType('blob').expect(200);
  expect(reply.headers['content-type']).toBe('application/pdf');
  return readPdf(reply.body as Buffer).map((page) => page.texts.map((text) => text.words));
}

describe('place labels', () => {
  it('of a cart are one for each shelf', async () => {
    expect(await labelsOf({ cartId: cart.id })).toEqual([
      ['Cart 1, Lower shelf', `Shelf   ${cart.shelves[0]?.placeCode ?? ''}`],
      ['Cart 1, Upper shelf', `Shelf   ${cart.shelves[1]?.placeCode ?? ''}`],
    ]);
  });

  it('of a kind are one for each holder that is not missing', async () => {
    const words = await labelsOf({ holderKindId: kind.id });
    expect(words.map(([name]) => name)).toEqual(['RS-1', 'RS-2']);
    expect(words[0]).toContain('Small pouch rack, 8 slots');
  });

  it('of one holder is one, and a sheet holds many', async () => {
    const id = holders[2]?.id ?? '';
    expect(await labelsOf({ holderId: id })).toHaveLength(1);
    expect(await labelsOf({ holderKindId: kind.id, layout: 'sheet' })).toHaveLength(1);
  });

  it.each<[string, () => Readonly<Record<string, string>>, number]>([
    ['a cart that is not there', () => ({ cartId: anId() }), 404],
    ['a kind that is not there', () => ({ holderKindId: anId() }), 404],
    ['nothing named', () => ({}), 400],
    ['two things named', () => ({ cartId: cart.id, holderKindId: kind.id }), 400],
    ['an id that is none', () => ({ cartId: '1' }), 400],
    ['a layout of its own', () => ({ cartId: cart.id, layout: 'poster' }), 400],
  ])('are refused for %s', async (_what, query, status) => {
    const technician = await app.as('technician');
    const reply = await answerOf(technician.get('/api/place-labels').query(query()));
    expect([reply.status, typeof reply.body.detail]).toEqual([status, 'string']);
  });

  it('of another facility are not there', async () => {
    const stranger = await app.as('technician', 'B');
    for (const query of [{ cartId: cart.id }, { holderKindId: kind.id }, { holderId: holders[0]?.id ?? '' }]) {
      await stranger.get('/api/place-labels').query(query).expect(404);
    }
  });
});
