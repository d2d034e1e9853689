import { describe, expect, it } from 'vitest';
import { demonstrationItems } from '../../../seeds/demonstration-catalogue';
import { checkItem, checkItemReferences } from '../../../src/domain/catalogue/check-item';
import type { ItemFields } from '../../../src/domain/catalogue/item-fields';
import { kg, mm, seconds } from '../../../src/domain/units/quantity';

function theItem(code: string, changes: Partial<ItemFields> = {}): ItemFields {
  const item = demonstrationItems.find((one) => one.code === code);
  if (!item) throw new Error(`The demonstration has no ${code}.`);
  return { ...item, ...changes };
}

const pouch = (changes: Partial<ItemFields>) => theItem('P-01', changes);
const container = (changes: Partial<ItemFields>) => theItem('C-01', changes);
const need = theItem('W-01').cycleNeeds[0];
if (!need) throw new Error('W-01 has no cycle.');

function fieldsOf(item: ItemFields): (string | null)[] {
  return checkItem(item).map((problem) => problem.field);
}

describe('an item that holds together', () => {
  it.each(['P-01', 'W-01', 'W-10', 'W-12', 'C-01', 'G-01'])('%s', (code) => {
    expect(checkItem(theItem(code))).toEqual([]);
  });

  it('may be all metal', () => {
    expect(checkItem(pouch({ massKg: kg(0.3), metalMassKg: kg(0.1), textileMassKg: kg(0.2) }))).toEqual([]);
  });
});

describe('an item that does not hold together', () => {
  it.each<[string, ItemFields, string]>([
    ['a pouch in wrap', pouch({ packaging: 'wrap' }), 'packaging'],
    ['a container in wrap', container({ packaging: 'wrap', filterZones: [] }), 'packaging'],
    ['the short side longer than the long side', pouch({ widthMm: mm(251) }), 'widthMm'],
    ['metal heavier than the whole', pouch({ metalMassKg: kg(0.09) }), 'metalMassKg'],
    ['textile heavier than the whole', pouch({ metalMassKg: kg(0), textileMassKg: kg(0.09) }), 'textileMassKg'],
    ['metal and textile together heavier', pouch({ metalMassKg: kg(0.05), textileMassKg: kg(0.04) }), 'metalMassKg'],
    ['a container without filters', container({ filterZones: [] }), 'filterZones'],
    ['a pouch with filters', pouch({ filterZones: container({}).filterZones }), 'filterZones'],
    ['no cycle', pouch({ cycleNeeds: [] }), 'cycleNeeds'],
    ['the same cycle twice', pouch({ cycleNeeds: [need, need] }), 'cycleNeeds'],
    [
      'exposure limits the wrong way round',
      pouch({ cycleNeeds: [{ ...need, greatestExposureS: seconds(239) }] }),
      'cycleNeeds',
    ],
    ['dated without days', pouch({ expiryRule: 'dated' }), 'expiryDays'],
    ['event-related with days', pouch({ expiryDays: 30 }), 'expiryDays'],
    ['a wrong device identifier', pouch({ deviceIdentifier: '09506000134353' }), 'deviceIdentifier'],
    ['a revision of nothing', pouch({ ifuReference: null }), 'ifuReference'],
    ['a tray in a pouch holder', theItem('W-01', { preferredHolder: 'RM' }), 'preferredHolder'],
    ['a tray that faces somewhere', theItem('W-01', { facing: 'one-way' }), 'facing'],
    ['a tilted pouch', pouch({ pose: 'tilted' }), 'pose'],
  ])('%s', (_what, item, field) => {
    expect(fieldsOf(item)).toEqual([field]);
  });

  it('a filter that reaches over the edge, by a millimetre', () => {
    const zone = { face: 'lid' as const, xMm: mm(380), yMm: mm(100), lengthMm: mm(200), widthMm: mm(180) };
    expect(fieldsOf(container({ filterZones: [zone] }))).toEqual([]);
    expect(fieldsOf(container({ filterZones: [{ ...zone, xMm: mm(381) }] }))).toEqual(['filterZones']);
    expect(fieldsOf(container({ filterZones: [{ ...zone, yMm: mm(101) }] }))).toEqual(['filterZones']);
  });

  it('an exposure of exactly its least is one', () => {
    expect(fieldsOf(pouch({ cycleNeeds: [{ ...need, greatestExposureS: need.leastExposureS }] }))).toEqual([]);
  });
});

describe('what an item refers to', () => {
  const references = {
    itemCodes: new Set(['C-17', 'P-01']),
    holderKindCodes: new Set(['RS']),
    deviceIdentifiers: new Map([['09506000134352', 'P-01']]),
  };

  it('has to be there', () => {
    expect(checkItemReferences(container({}), references)).toEqual([
      { field: 'standsOn', sentence: 'There is no item with the code C-18.' },
    ]);
    expect(checkItemReferences(pouch({ preferredHolder: 'RX' }), references)).toEqual([
      { field: 'preferredHolder', sentence: 'There is no kind of holder with the code RX.' },
    ]);
  });

  it('may be carried by one item only', () => {
    const sameNumber = theItem('P-02', { deviceIdentifier: '09506000134352' });
    expect(checkItemReferences(sameNumber, references)).toEqual([
      { field: 'deviceIdentifier', sentence: 'P-01 already carries this device identifier.' },
    ]);
    expect(checkItemReferences(pouch({ deviceIdentifier: '09506000134352' }), references)).toEqual([]);
  });
});
