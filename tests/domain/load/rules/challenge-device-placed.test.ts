import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, nowhere, onLower, onUpper } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

const rule = 'challenge-device-placed';
const implants = aLoad().withPackage('C-05', onLower(0, 250)).withPackage('P-19', nowhere);

describe('the challenge device is at the coldest place', () => {
  it('is not asked for without implants, and not by a house that does not ask', () => {
    expect(titlesOf(rule, aLoad().withPackage('C-01', onLower(0, 0)))).toEqual([]);
    expect(titlesOf(rule, implants, { challengeDevice: 'not-asked' })).toEqual([]);
    expect(titlesOf(rule, aLoad(), { challengeDevice: 'every-load' })).toEqual([]);
  });

  it('is missed where the load holds an implant, with the weight the house gives it', () => {
    expect(findingsOf(rule, implants)).toMatchObject([
      {
        severity: 'stop',
        title: 'The load holds 2 implants and no challenge device is placed',
        places: [{ on: 'load' }],
        fix: null,
      },
    ]);
    expect(findingsOf(rule, implants, { challengeDeviceMissing: 'accept' })[0]?.severity).toBe('accept');
  });

  it('is missed in every load where the house says so', () => {
    const load = aLoad().withPackage('C-01', onLower(0, 250));
    expect(titlesOf(rule, load, { challengeDevice: 'every-load' })).toEqual([
      'This load is asked for one and no challenge device is placed',
    ]);
  });

  it('one on the list that has no place is put over the drain', () => {
    const load = implants.withPackage('PCD', nowhere);
    expect(findingsOf(rule, load)).toMatchObject([
      {
        places: [{ on: 'package', packageId: 'PCD' }],
        fix: {
          label: 'Put it on Lower shelf, over the drain',
          // The drain is 280 mm from the left and 90 mm from the door, the device 130 mm square.
          edits: [{ placement: { at: 'shelf', shelfId: 'lower', xMm: 215, yMm: 25 } }],
        },
      },
    ]);
  });

  it('says nothing of one near the drain, measured to its nearest point', () => {
    expect(titlesOf(rule, implants.withPackage('PCD', onLower(215, 390)))).toEqual([]);
    // 301 mm straight behind the drain.
    const far = implants.withPackage('PCD', onLower(300, 391)).withSterilizer({ drainXMm: mm(365) });
    expect(findingsOf(rule, far)).toMatchObject([
      {
        severity: 'accept',
        title: 'Challenge pack is 301 mm from the drain, want at most 300 mm',
        figure: { measured: 301, limit: 300, unit: 'mm' },
      },
    ]);
    expect(titlesOf(rule, far, { challengeDeviceReachMm: mm(301) })).toEqual([]);
  });

  it('finds one that is not on the lowest shelf, and moves it there', () => {
    const load = implants.withPackage('PCD', onUpper(215, 25));
    expect(titlesOf(rule, load)).toEqual(['Challenge pack is not on the lowest shelf']);
    expect(fixesOf(rule, load)).toEqual(['Put it on Lower shelf, over the drain']);
  });

  it('one good one is enough', () => {
    const load = implants.withPackage('PCD', onUpper(0, 900)).withPackage('PCD', onLower(305, 30));
    expect(titlesOf(rule, load)).toEqual([]);
  });

  it('a lowest shelf that is out of use is not the lowest', () => {
    const load = implants.withShelf('lower', { isUsable: false }).withPackage('PCD', onUpper(215, 25));
    expect(titlesOf(rule, load)).toEqual([]);
  });
});
