import { degrees } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, inBasket, inSlot, onTopOf, onUpper } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

const rule = 'pouch-in-holder';
const basket = aLoad().withHolder('TB-1', 'TB', { x: 20, y: 600 });

describe('pouches on edge are held', () => {
  it('says nothing about one in a rack of its kind', () => {
    const load = aLoad().withHolder('RL-1', 'RL', { x: 20, y: 40 }).withPackage('P-05', inSlot('RL-1', 1));
    expect(findingsOf(rule, load)).toEqual([]);
  });

  it('finds one that stands on a shelf or on another thing', () => {
    const load = aLoad()
      .withPackage('P-02', onUpper(0, 0))
      .withPackage('C-15', onUpper(200, 0))
      .withPackage('P-01', onTopOf('C-15', 250, 0));
    expect(findingsOf(rule, load)).toMatchObject([
      {
        severity: 'stop',
        title: 'Metzenbaum scissors stands in no holder and can fall over',
        figure: { measured: 90, limit: 30, unit: 'deg', want: 'at-most' },
      },
      { title: 'Adson forceps pair stands in no holder and can fall over' },
    ]);
  });

  it('finds it too where it is wedged in so that it cannot fall, then without a figure', () => {
    // 12 mm thick between two sets 10 mm away on either side.
    const load = aLoad()
      .withPackage('W-04', onUpper(0, 0))
      .withPackage('W-07', onUpper(292, 0))
      .withPackage('P-02', onUpper(270, 20));
    expect(findingsOf(rule, load)).toMatchObject([{ title: 'Metzenbaum scissors stands in no holder', figure: null }]);
  });

  it('other loose pouches do not hold it: they fall with it', () => {
    // Six of 45 mm between two sets 300 mm apart and 90 mm high: 30 mm in all to fall into, then the face comes down on
    // the edge of the set, tan a = 30 / 90.
    let load = aLoad().withPackage('W-04', onUpper(-100, 0)).withPackage('W-07', onUpper(460, 0));
    for (let index = 0; index < 6; index += 1) load = load.withPackage('P-05', onUpper(160 + index * 45, 0));
    const angles = findingsOf(rule, load, { greatestLeanDeg: degrees(5) }).map((finding) => finding.figure?.measured);
    expect(angles).toHaveLength(6);
    for (const angle of angles) expect(angle).toBeCloseTo(18.43, 2);
  });

  it('in a basket looks at how far it can lean, not at what it is called', () => {
    // 10 mm to the next one: 90 sin a + 12 cos a = 22, about 6.5 degrees. 12 mm from the basket's side: 7.8 degrees.
    const close = basket
      .withPackage('P-02', inBasket('TB-1', 12, 0, { turn: 90 }))
      .withPackage('P-03', inBasket('TB-1', 12, 22, { turn: 90 }));
    const angles = findingsOf(rule, close, { greatestLeanDeg: degrees(5) }).map((one) => one.figure?.measured ?? 0);
    expect(angles).toHaveLength(2);
    expect(findingsOf(rule, basket.withPackage('P-02', inBasket('TB-1', 0, 0, { turn: 90 })))).toHaveLength(1);
  });

  it('in a basket says nothing where neighbours on both sides keep it upright', () => {
    let load = basket;
    // 250 mm of basket, ten of 12 mm with 13 mm between.
    for (let index = 0; index < 10; index += 1)
      load = load.withPackage('P-02', inBasket('TB-1', 12, 6 + index * 25, { turn: 90 }));
    expect(titlesOf(rule, load)).toEqual([]);
    expect(titlesOf(rule, load, { greatestLeanDeg: degrees(5) }).length).toBeGreaterThan(0);
  });

  it('a neighbour that is too low lets it fall further', () => {
    const at = (code: string) =>
      basket
        .withPackage('P-04', inBasket('TB-1', 10, 40, { turn: 90 }))
        .withPackage(code, inBasket('TB-1', 10, 15, { turn: 90 }))
        .withPackage(code, inBasket('TB-1', 10, 65, { turn: 90 }));
    const leanOfTall = (code: string) =>
      findingsOf(rule, at(code), { greatestLeanDeg: degrees(0) }).find((one) => one.title.startsWith('Single curette'))
        ?.figure?.measured ?? 0;
    expect(leanOfTall('P-16')).toBeGreaterThan(leanOfTall('P-04') * 0.9);
  });

  it('in a slot far too wide for it is worth a note', () => {
    // 75 mm high and 10 mm thick in a pitch of 70 mm: about 60 degrees.
    const load = aLoad().withHolder('RL-1', 'RL', { x: 20, y: 40 }).withPackage('P-01', inSlot('RL-1', 2));
    const [finding] = findingsOf(rule, load);
    expect(finding).toMatchObject({
      severity: 'advice',
      title: 'Adson forceps pair in Holder RL-1, slot 2 can lean 60 degrees, want at most 30 degrees',
    });
    const radians = ((finding?.figure?.measured ?? 0) * Math.PI) / 180;
    expect(75 * Math.sin(radians) + 10 * Math.cos(radians)).toBeCloseTo(70, 6);
  });

  it('one lying flat is told as that and not here', () => {
    expect(titlesOf(rule, aLoad().withPackage('P-02', onUpper(0, 0, { pose: 'flat' })))).toEqual([]);
  });

  it('moves it into a holder that takes it, and offers nothing where there is none', () => {
    const load = aLoad().withPackage('P-05', onUpper(300, 0));
    expect(fixesOf(rule, load)).toEqual([null]);
    expect(fixesOf(rule, load.withHolder('RL-1', 'RL', { x: 20, y: 40 }))).toEqual([
      'Stand it in Holder RL-1, slot 1, paper side left',
    ]);
  });
});
