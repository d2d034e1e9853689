import { describe, expect, it } from 'vitest';
import { decideLabelPrint } from '../../../src/domain/package/decide-label-print';

const code = 'P-20431784-52';

describe('printing a label', () => {
  it('is copy 1 for a package that has none, without a reason', () => {
    expect(decideLabelPrint({ code, state: 'packed', copies: 0 }, null)).toEqual({ ok: true, value: { copy: 1 } });
  });

  it('is the next copy with a reason', () => {
    expect(decideLabelPrint({ code, state: 'staged', copies: 2 }, 'Torn')).toEqual({ ok: true, value: { copy: 3 } });
  });

  it.each([null, '', '  '])('is refused a second time when the reason is %j', (reason) => {
    expect(decideLabelPrint({ code, state: 'packed', copies: 1 }, reason)).toMatchObject({
      ok: false,
      refusal: { code: 'label.reason-missing' },
    });
  });

  it.each(['used', 'returned', 'discarded'] as const)('is refused for a package that is %s, reason or not', (state) => {
    expect(decideLabelPrint({ code, state, copies: 1 }, 'Torn')).toMatchObject({
      ok: false,
      refusal: { code: 'label.not-any-more' },
    });
  });
});
