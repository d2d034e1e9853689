import { defaultPolicy, policyParameters } from '#domain/load/policy';
import {
  facingRules,
  findParameter,
  policyFor,
  readSettings,
  storedSettings,
  takesValue,
  type PolicySettings,
} from '#domain/policy/settings';
import { mm } from '#domain/units/quantity';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

const own: PolicySettings = {
  policy: { ...defaultPolicy, packageClearanceMm: mm(40), challengeDeviceMissing: 'advice' },
  facingBySterilizer: { 'sterilizer-1': 'alternating' },
};

/** As the database gives them back. */
const stored = JSON.parse(JSON.stringify(storedSettings(own))) as Record<string, unknown>;

function without(id: string): Record<string, unknown> {
  return Object.fromEntries(Object.entries(stored).filter(([name]) => name !== id));
}

describe('the settings of a version, read', () => {
  it('come back as they were kept', () => {
    expect(readSettings(stored)).toEqual({ settings: own, defaulted: [] });
  });

  it.each(policyParameters.map(({ id }) => id))('take the default of %s where the version lacks it', (id) => {
    const { settings, defaulted } = readSettings(without(id));
    expect(defaulted).toEqual([id]);
    expect(settings.policy).toEqual({ ...own.policy, [id]: defaultPolicy[id] });
  });

  it.each(policyParameters.map((parameter) => [parameter.id, parameter] as const))(
    'take the default of %s where what was kept is not taken any more',
    (id, parameter) => {
      const wrong = [
        null,
        true,
        [],
        {},
        ...(parameter.form === 'quantity' ? ['12', 1e9, -1e9] : ['no such choice', 3]),
      ];
      for (const value of wrong) {
        const { settings, defaulted } = readSettings({ ...stored, [id]: value });
        expect([value, settings.policy[id], defaulted]).toEqual([value, defaultPolicy[id], [id]]);
      }
    },
  );

  it('pass over what nobody knows any more', () => {
    expect(readSettings({ ...stored, fumesPerFortnight: 12 })).toEqual({ settings: own, defaulted: [] });
  });

  it('have no overrides where a version is older than those, and drop what is no facing rule', () => {
    expect(readSettings(without('facingBySterilizer')).settings.facingBySterilizer).toEqual({});
    const odd = { a: 'alternating', b: 'sideways', c: 4, d: null };
    expect(readSettings({ ...stored, facingBySterilizer: odd }).settings.facingBySterilizer).toEqual({
      a: 'alternating',
    });
  });

  it('are the defaults for a version of the first release, which kept none of this', () => {
    const { settings, defaulted } = readSettings({});
    expect(settings).toEqual({ policy: defaultPolicy, facingBySterilizer: {} });
    expect(defaulted).toEqual(policyParameters.map(({ id }) => id));
  });

  it('are a whole policy, whatever was kept', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (anything) => {
        const { settings } = readSettings(anything);
        expect(Object.keys(settings.policy).sort()).toEqual(Object.keys(defaultPolicy).sort());
        for (const parameter of policyParameters) {
          expect(takesValue(parameter, settings.policy[parameter.id])).toBe(true);
        }
      }),
    );
  });
});

describe('the facing rule', () => {
  it('is one of three, as the facility’s own parameter offers them', () => {
    expect(facingRules).toEqual(['one-way', 'alternating', 'not-set']);
  });

  it('is that of the load’s sterilizer where one is set for it, and nothing else differs', () => {
    expect(policyFor(own, 'sterilizer-1')).toEqual({ ...own.policy, facing: 'alternating' });
  });

  it('is the facility’s everywhere else', () => {
    expect(policyFor(own, 'sterilizer-2')).toEqual(own.policy);
  });
});

describe('a parameter', () => {
  it('is found by its id', () => {
    expect(findParameter('packageClearanceMm')?.label).toBe(
      policyParameters.find(({ id }) => id === 'packageClearanceMm')?.label,
    );
    expect(findParameter('fumesPerFortnight')).toBeUndefined();
  });

  it('takes the ends of its range and nothing beyond', () => {
    for (const parameter of policyParameters) {
      if (parameter.form !== 'quantity') continue;
      const { least, greatest } = parameter.range;
      expect([least, greatest].map((value) => takesValue(parameter, value))).toEqual([true, true]);
      expect([least - 0.001, greatest + 0.001, NaN].map((value) => takesValue(parameter, value))).toEqual([
        false,
        false,
        false,
      ]);
    }
  });
});
