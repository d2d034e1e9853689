import { applyEdits } from '#domain/load/apply-edit';
import { arrangeRest, expectedShelves } from '#domain/load/arrange-rest';
import { evaluateLoad } from '#domain/load/evaluate-load';
import type { LoadView } from '#domain/load/model';
import { defaultPolicy } from '#domain/load/policy';
import { mm } from '#domain/units/quantity';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { aLoad } from '../../support/arbitrary-load';
import {
  aHolder,
  aPackage,
  aView,
  cable,
  challengePack,
  container,
  drapes,
  forceps,
  inSlot,
  lowerShelf,
  mediumRack,
  onShelf,
  smallRack,
  speculum,
  tray,
  upperShelf,
} from '../../support/building-load';

const holders = [aHolder('rs-1', smallRack), aHolder('rm-1', mediumRack, { xMm: mm(300) })];

function arranged(view: LoadView): LoadView {
  const result = applyEdits(view, arrangeRest(view, defaultPolicy).edits);
  if (!result.ok) throw new Error(result.refusal.sentence);
  return result.value;
}

const stopsOf = (view: LoadView) =>
  evaluateLoad(view, defaultPolicy)
    .filter(({ ruleId, severity }) => severity === 'stop' && ruleId !== 'unplaced' && !ruleId.startsWith('count-'))
    .map((finding) => finding.key);

describe('arrangeRest', () => {
  it('gives everything scanned a place that holds no load', () => {
    const view = aView({
      holders,
      packages: [
        ...Array.from({ length: 6 }, (_, index) => aPackage(`p${index}`, forceps)),
        aPackage('p6', cable),
        aPackage('p7', cable),
        aPackage('c1', container),
        aPackage('t1', tray),
        aPackage('x1', drapes),
        aPackage('d1', challengePack),
      ],
    });
    const { edits, couldNotPlace } = arrangeRest(view, defaultPolicy);
    expect(couldNotPlace).toEqual([]);
    expect(edits).toHaveLength(view.packages.length);
    const after = arranged(view);
    expect(after.packages.every((one) => one.placement !== null)).toBe(true);
    expect(stopsOf(after).filter((key) => !stopsOf(view).includes(key))).toEqual([]);
  });

  it('leaves what has a place where it is', () => {
    const placed = aPackage('p1', forceps, { placement: inSlot('rs-1', 5, 'right') });
    const { edits } = arrangeRest(aView({ holders, packages: [placed, aPackage('p2', forceps)] }), defaultPolicy);
    expect(edits).toEqual([{ edit: 'place', packageId: 'p2', placement: inSlot('rs-1', 1, 'right') }]);
  });

  it('names what it could not place, and why', () => {
    const view = aView({ holders, packages: [aPackage('p1', speculum), aPackage('p2', forceps)] });
    const { edits, couldNotPlace } = arrangeRest(view, defaultPolicy);
    expect(edits).toHaveLength(1);
    expect(couldNotPlace).toEqual([
      { packageId: 'p1', why: 'No holder on the cart has a free slot that fits Speculum medium.' },
    ]);
    const strange = aView({ items: [], packages: [aPackage('p3', forceps)] });
    expect(arrangeRest(strange, defaultPolicy).couldNotPlace).toEqual([
      { packageId: 'p3', why: 'P3 is not in the catalogue.' },
    ]);
  });

  it('leaves what is not scanned alone, except for a preview', () => {
    const view = aView({ holders, packages: [aPackage('p1', forceps, { isScanned: false }), aPackage('p2', forceps)] });
    expect(arrangeRest(view, defaultPolicy).edits).toHaveLength(1);
    expect(arrangeRest(view, defaultPolicy, { includeUnscanned: true }).edits).toHaveLength(2);
  });

  it('can be applied as it is, and never adds a finding that holds the load', () => {
    let placed = 0;
    fc.assert(
      fc.property(aLoad, (view) => {
        const frozen = structuredClone(view);
        const { edits, couldNotPlace } = arrangeRest(view, defaultPolicy);
        const after = applyEdits(view, edits);
        if (!after.ok) throw new Error(after.refusal.sentence);
        const rest = view.packages.filter((one) => one.isScanned && one.placement === null);
        expect(edits.length + couldNotPlace.length).toBe(rest.length);
        const known = new Set(stopsOf(view));
        expect(stopsOf(after.value).filter((key) => !known.has(key))).toEqual([]);
        expect(view).toEqual(frozen);
        placed += edits.length;
      }),
      { numRuns: 50 },
    );
    expect(placed).toBeGreaterThan(25);
  }, 60_000);
});

describe('expectedShelves', () => {
  it('says on which shelf each package that is not scanned would go', () => {
    const view = aView({
      holders,
      packages: [
        aPackage('p1', forceps, { isScanned: false }),
        aPackage('c1', container, { isScanned: false }),
        aPackage('p5', speculum, { isScanned: false }),
        aPackage('t1', tray, { placement: onShelf(lowerShelf, 30, 700) }),
      ],
    });
    expect(expectedShelves(view, defaultPolicy)).toEqual(
      new Map([
        ['p1', upperShelf.id],
        ['c1', lowerShelf.id],
      ]),
    );
  });
});
