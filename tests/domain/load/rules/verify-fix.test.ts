import { judge } from '#domain/load/rules/judge';
import { sceneOf } from '#domain/load/rules/scene';
import { verifiedFixOf } from '#domain/load/rules/verify-fix';
import { defaultPolicy } from '#domain/load/policy';
import type { Fix } from '#domain/load/finding';
import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, onLower } from '../../../support/load-builder';

/** Two sets 12 mm apart that ask for 25, and the fixes to be tried. */
function firstGood(...fixes: readonly Fix[]): Fix | null {
  const view = aLoad()
    .withPackage('W-03', onLower(0, 0))
    .withPackage('W-04', onLower(272, 0))
    .withPackage('W-08', onLower(0, 600))
    .build();
  const scene = sceneOf(view, defaultPolicy);
  const judged = judge(scene);
  const [finding] = judged;
  if (!finding) throw new Error('Nothing was found');
  return verifiedFixOf(scene, judged, { ...finding, draft: { ...finding.draft, fixes: () => fixes } });
}

function moving(packageId: string, xMm: number, yMm: number): Fix {
  const placement = {
    at: 'shelf',
    shelfId: 'lower',
    xMm: mm(xMm),
    yMm: mm(yMm),
    turn: 0,
    pose: 'flat',
    paper: null,
  } as const;
  return { label: `${packageId} to ${xMm}, ${yMm}`, edits: [{ edit: 'place', packageId, placement }] };
}

const good = moving('W-04', 285, 0);

describe('a fix is verified before it is offered', () => {
  it('the first that removes the finding is taken, although it voids the count of the shelf', () => {
    expect(firstGood(good, moving('W-04', 290, 0))).toBe(good);
  });

  it.each([
    ['changes nothing', moving('W-04', 272, 0)],
    ['makes it only a little better', moving('W-04', 280, 0)],
    ['puts the same fault elsewhere', moving('W-04', 0, 840)],
    ['adds something heavier', moving('W-04', 285, 800)],
    ['cannot be carried out', moving('no such package', 0, 0)],
  ])('one that %s is passed over', (_name, bad) => {
    expect(firstGood(bad)).toBeNull();
    expect(firstGood(bad, good)).toBe(good);
  });
});
