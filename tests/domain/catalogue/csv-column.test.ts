import { describe, expect, it } from 'vitest';
import { changedFields, readCells, readHeader, whenLeftOut } from '../../../src/domain/catalogue/csv-column';
import { programColumns } from '../../../src/domain/catalogue/equipment-columns';

const header = [
  'code',
  'name',
  'cycle_type',
  'temperature_c',
  'exposure_s',
  'dry_s',
  'greatest_load_mass_kg',
  'retired',
];

function read(cells: string[]) {
  const known = readHeader(programColumns, header);
  if (!known.ok) throw new Error(known.refusal.sentence);
  return readCells(programColumns, known.value, cells, 'point');
}

describe('the header', () => {
  it('is found in any order, in capitals or not, and without the columns that may be empty', () => {
    const found = readHeader(programColumns, [
      'Dry_S',
      ' exposure_s ',
      'temperature_c',
      'cycle_type',
      'NAME',
      'code',
      '',
    ]);
    expect(found.ok && [...found.value]).toEqual([
      ['code', 5],
      ['name', 4],
      ['type', 3],
      ['temperatureC', 2],
      ['exposureS', 1],
      ['dryS', 0],
    ]);
  });

  it('names what is unknown, what is there twice and what is missing', () => {
    expect(readHeader(programColumns, ['code', 'code', 'nmae', 'temperature_c', '', 'dry_s'])).toEqual({
      ok: false,
      refusal: {
        code: 'header-wrong',
        sentence:
          'The first line does not name the columns as they are known here. Not known: nmae, (empty). Named twice: code. Missing: name, cycle_type, exposure_s.',
      },
    });
  });

  it('cuts a long list of unknown words', () => {
    const words = Array.from({ length: 400 }, (_, at) => `x${at}`);
    const found = readHeader(programColumns, words);
    expect(found.ok || found.refusal.sentence.length).toBeLessThan(400);
  });
});

describe('a line', () => {
  it('becomes values', () => {
    const line = ['W4-30', 'Wrapped', 'dynamic-air-removal', '132', '240', '1800', '', 'no'];
    expect(read(line)).toEqual({
      values: {
        code: 'W4-30',
        name: 'Wrapped',
        type: 'dynamic-air-removal',
        temperatureC: 132,
        exposureS: 240,
        dryS: 1800,
        greatestLoadMassKg: null,
        isRetired: false,
      },
      problems: [],
    });
  });

  it('says of every cell what is wrong with it', () => {
    const { problems } = read(['', 'Wrapped', 'pulsed', 'hot', '240', '1800', '', 'perhaps']);
    expect(problems).toEqual([
      { field: 'code', sentence: 'Please fill this in.' },
      { field: 'type', sentence: '“pulsed” is none of dynamic-air-removal, gravity, immediate-use.' },
      { field: 'temperatureC', sentence: '“hot” is not a number.' },
      { field: 'isRetired', sentence: '“perhaps” is neither yes nor no.' },
    ]);
  });

  it('takes off the apostrophe that keeps a spreadsheet from running a cell', () => {
    expect(read(['X', "'=SUM(A1)", 'gravity', '121', '1800', '0', '', '']).values.name).toBe('=SUM(A1)');
  });
});

it('tells what a column that is left out means', () => {
  expect(whenLeftOut(programColumns)).toEqual({ greatestLoadMassKg: null, isRetired: false });
});

it('finds the values that would be written differently', () => {
  const before = read(['W', 'One', 'gravity', '121', '1800', '0', '', '']).values as never;
  const after = read(['W', 'Two', 'gravity', '121', '1800', '60', '', '']).values as never;
  expect(changedFields(programColumns, before, after)).toEqual(['name', 'dryS']);
});
