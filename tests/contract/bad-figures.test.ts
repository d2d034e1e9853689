import {
  holderKindFieldsSchema,
  programFieldsSchema,
  shelfFieldsSchema,
  sterilizerFieldsSchema,
} from '#contract/equipment';
import { itemFieldsSchema } from '#contract/items';
import { placementSchema } from '#contract/load-view';
import { loadPolicySchema } from '#contract/policy';
import { defaultPolicy, policyParameters } from '#domain/load/policy';
import { describe, expect, it } from 'vitest';
import type { z } from 'zod';
import { demonstrationItems } from '../../seeds/demonstration-catalogue';
import { demonstrationHolderKinds, hospitalCarts } from '../../seeds/demonstration-equipment-plan';

const noSizes = [NaN, Infinity, -Infinity, 0, -1, 100_000] as const;
const noMasses = [NaN, Infinity, -1, 100_000] as const;
const noPositions = [NaN, Infinity, -Infinity, 1e9] as const;

describe('a figure that cannot be is refused at the edge, with the field named', () => {
  function refusals(schema: z.ZodType, good: object, field: string, values: readonly unknown[]) {
    return values.map((value) => {
      const answer = schema.safeParse({ ...good, [field]: value });
      return [value, answer.success, answer.error?.issues.some(({ path }) => path[0] === field)];
    });
  }

  const [item] = demonstrationItems;
  const rack = { ...demonstrationHolderKinds[0] };
  const [shelf] = hospitalCarts[0]?.shelves ?? [];
  const program = {
    code: 'W4-30',
    name: 'Wrapped',
    type: 'dynamic-air-removal',
    temperatureC: 132,
    exposureS: 240,
    dryS: 1800,
    greatestLoadMassKg: null,
    isRetired: false,
  };
  const sterilizer = {
    code: 'ST-1',
    number: '1',
    name: 'Sterilizer 1',
    sizeClass: 'large',
    chamberWidthMm: 620,
    chamberDepthMm: 1250,
    chamberHeightMm: 700,
    drainXMm: 280,
    drainYMm: 90,
    greatestLoadMassKg: 100,
    steamLine: 'A',
    hasAirDetector: false,
    needsAirRemovalTest: true,
    serviceState: 'in-service',
    qualifiedPrograms: ['W4-30'],
    otherPrograms: [],
  };

  it.each([
    ['an item', itemFieldsSchema, { ...item }, ['lengthMm', 'widthMm', 'heightMm', 'greatestStackHeightMm'], noSizes],
    ['an item', itemFieldsSchema, { ...item }, ['clearanceMm'], [NaN, Infinity, -1, 100_000]],
    ['an item', itemFieldsSchema, { ...item }, ['massKg', 'metalMassKg', 'textileMassKg', 'massLimitKg'], noMasses],
    ['a shelf', shelfFieldsSchema, { ...shelf }, ['widthMm', 'depthMm', 'clearHeightMm'], noSizes],
    ['a shelf', shelfFieldsSchema, { ...shelf }, ['greatestMassKg'], noMasses],
    ['a kind of holder', holderKindFieldsSchema, rack, ['acrossMm', 'alongMm', 'pitchMm'], noSizes],
    ['a kind of holder', holderKindFieldsSchema, rack, ['massKg'], noMasses],
    ['a kind of holder', holderKindFieldsSchema, rack, ['slots'], [NaN, Infinity, 0, -1, 1.5, 1e6]],
    [
      'a sterilizer',
      sterilizerFieldsSchema,
      sterilizer,
      ['chamberWidthMm', 'chamberDepthMm', 'chamberHeightMm'],
      noSizes,
    ],
    ['a sterilizer', sterilizerFieldsSchema, sterilizer, ['drainXMm', 'drainYMm'], noPositions],
    ['a sterilizer', sterilizerFieldsSchema, sterilizer, ['greatestLoadMassKg'], noMasses],
    ['a program', programFieldsSchema, program, ['temperatureC'], [NaN, Infinity, 0, -1, 99, 151]],
    ['a program', programFieldsSchema, program, ['exposureS', 'dryS'], [NaN, Infinity, -1, 0.5, 1e9]],
    ['a program', programFieldsSchema, program, ['greatestLoadMassKg'], noMasses],
  ] satisfies readonly (readonly [string, z.ZodType, object, readonly string[], readonly number[]])[])(
    'of %s',
    (_of, schema, good, fields, values) => {
      expect(schema.safeParse(good).error?.issues ?? []).toEqual([]);
      for (const field of fields) {
        expect([field, refusals(schema, good, field, values)]).toEqual([
          field,
          values.map((value) => [value, false, true]),
        ]);
      }
    },
  );

  it('of a place', () => {
    const id = '018f0000-0000-7000-8000-000000000001';
    const spot = { at: 'shelf', shelfId: id, xMm: 0, yMm: 0, turn: 0, pose: 'flat', paper: null };
    const slot = { at: 'slot', holderId: id, slot: 1, pose: 'on-edge', paper: 'left' };
    expect([placementSchema.safeParse(spot).success, placementSchema.safeParse(slot).success]).toEqual([true, true]);
    for (const [good, field, values] of [
      [spot, 'xMm', noPositions],
      [spot, 'yMm', noPositions],
      [spot, 'turn', [45, NaN, null]],
      [slot, 'slot', [0, -1, 1.5, NaN, Infinity, 1e9]],
    ] as const) {
      expect(refusals(placementSchema, good, field, values)).toEqual(values.map((value) => [value, false, true]));
    }
  });

  it('of the house rules, beyond their range', () => {
    for (const parameter of policyParameters) {
      const values = parameter.form === 'choice' ? ['either', 1] : [NaN, Infinity, -1e9, 1e9];
      expect(refusals(loadPolicySchema, defaultPolicy, parameter.id, values)).toEqual(
        values.map((value) => [value, false, true]),
      );
    }
  });
});
