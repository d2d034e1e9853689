import { applyEdit } from '#domain/load/apply-edit';
import { createEvaluator, evaluateLoad, type Evaluator } from '#domain/load/evaluate-load';
import type { LoadEdit } from '#domain/load/finding';
import type { LoadView } from '#domain/load/model';
import { defaultPolicy } from '#domain/load/policy';
import { mm } from '#domain/units/quantity';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cart } from '../../support/arbitrary-cart';
import { aLoad, inSlot, onLower } from '../../support/load-builder';

/** Something that happens to a load, by numbers that pick what of it. */
type Act = { readonly kind: number; readonly pick: number; readonly x: number; readonly y: number };

const act: fc.Arbitrary<Act> = fc.record({
  kind: fc.nat({ max: 6 }),
  pick: fc.nat({ max: 40 }),
  x: fc.integer({ min: -20, max: 500 }),
  y: fc.integer({ min: -20, max: 1000 }),
});

function carriedOut(view: LoadView, { kind, pick, x, y }: Act): LoadView {
  const one = view.packages[pick % Math.max(view.packages.length, 1)];
  const holder = view.holders[pick % Math.max(view.holders.length, 1)];
  if (!one) return view;
  const changed = (packages: LoadView['packages']) => ({ ...view, packages });
  const edits: readonly (LoadEdit | null)[] = [
    {
      edit: 'place',
      packageId: one.packageId,
      placement: {
        at: 'shelf',
        shelfId: view.cart.shelves[pick % 2]?.id ?? '',
        xMm: mm(x),
        yMm: mm(y),
        turn: pick % 3 === 0 ? 90 : 0,
        pose: 'flat',
        paper: null,
      },
    },
    { edit: 'turn-paper', packageId: one.packageId, paper: pick % 2 === 0 ? 'left' : 'right' },
    { edit: 'take-off', packageId: one.packageId },
    holder
      ? {
          edit: 'place-holder',
          holderId: holder.holderId,
          shelfId: view.cart.shelves[pick % 2]?.id ?? '',
          xMm: mm(x),
          yMm: mm(y),
          turn: 90,
        }
      : null,
    { edit: 'change-program', programId: view.qualifiedPrograms[pick % view.qualifiedPrograms.length]?.id ?? '' },
  ];
  const edit = edits[kind];
  if (edit) {
    const result = applyEdit(view, edit);
    return result.ok ? result.value : view;
  }
  if (kind === 5) return changed(view.packages.map((p) => (p === one ? { ...p, isScanned: !p.isScanned } : p)));
  // One more of the same item: names that were plain get a code.
  return changed([...view.packages, { ...one, packageId: `${one.packageId} again`, code: `${one.code}-${x}` }]);
}

/** Without the fixes: to work one out means to judge the load many times more. */
function toldBy(evaluate: Evaluator) {
  return (view: LoadView) =>
    evaluate(view, defaultPolicy).map(({ key, title, severity, places, figure, reason }) => {
      return { key, title, severity, places, figure, reason };
    });
}

describe('judging a load again and again while it changes', () => {
  it('says each time exactly what judging it from scratch says', () => {
    fc.assert(
      fc.property(cart, fc.array(act, { maxLength: 6 }), (begun, acts) => {
        const evaluate = createEvaluator();
        let view = begun;
        expect(toldBy(evaluate)(view)).toEqual(toldBy(evaluateLoad)(view));
        for (const one of acts) {
          view = carriedOut(view, one);
          expect(toldBy(evaluate)(view)).toEqual(toldBy(evaluateLoad)(view));
        }
      }),
    );
  });

  it('offers the same fixes', () => {
    fc.assert(
      fc.property(cart, act, (begun, one) => {
        const evaluate = createEvaluator();
        evaluate(begun, defaultPolicy);
        const view = carriedOut(begun, one);
        expect(evaluate(view, defaultPolicy)).toEqual(evaluateLoad(view, defaultPolicy));
      }),
      { numRuns: 12 },
    );
  });

  it('takes another policy into account at once', () => {
    const view = aLoad()
      .withHolder('RS-1', 'RS', { x: 20, y: 40 })
      .withPackage('P-01', inSlot('RS-1', 1))
      .withPackage('P-02', inSlot('RS-1', 2, 'right'))
      .build();
    const evaluate = createEvaluator();
    expect(evaluate(view, defaultPolicy).map((finding) => finding.ruleId)).toEqual(['facing']);
    expect(evaluate(view, { ...defaultPolicy, facing: 'not-set' })).toEqual([]);
    expect(evaluate(view, defaultPolicy).map((finding) => finding.ruleId)).toEqual(['facing']);
  });

  it('names a package by its code as soon as the load holds another of its item', () => {
    const one = aLoad().withPackage('W-03', onLower(0, 0, { pose: 'on-edge' }));
    const evaluate = createEvaluator();
    const titles = (view: LoadView) =>
      evaluate(view, defaultPolicy).flatMap(({ ruleId, title }) => (ruleId === 'tray-flat' ? [title] : []));
    const [plain = ''] = titles(one.build());
    const again = one.withPackage('W-03', onLower(0, 600)).build();
    const [named = ''] = titles(again);
    expect(named).not.toBe(plain);
    expect(named).toContain(again.packages[0]?.code ?? 'no code');
  });
});
