import assert from 'node:assert/strict';
import path from 'node:path';
import { cartListResponseSchema, holderListResponseSchema } from '../../../src/contract/equipment';
import { loadDetailSchema, type LoadDetail } from '../../../src/contract/loads';
import { paths } from '../../../src/contract/paths';
import { runListResponseSchema, runDetailSchema } from '../../../src/contract/runs';
import { readScan } from '../../../src/domain/label/read-scan';
import { demonstrationRuns } from '../../../seeds/demonstration-packages';
import type { Page } from 'playwright-core';
import { shelfIdOf } from '../../../src/domain/load/look-up';
import type { Caller } from '../../../scripts/running/caller';
import { decodeArea } from '../../server/labels/draw/decode-symbol';
import { readPdf } from '../../server/labels/draw/read-pdf';
import { loadPage, type LoadPage } from '../pages/load-page';
import { packPage } from '../pages/pack-page';
import { signInPage } from '../pages/sign-in-page';
import { barsOnLabel, filmOf, matrixOnLabel } from '../support/film';
import type { Journey } from '../support/journey';
import { see, seeGone, until } from '../support/see';
import { people, picturesFolder } from '../support/stage';

const run = demonstrationRuns.mixed.name;
const lower = 'Lower shelf';
const upper = 'Upper shelf';

type Pieces = {
  readonly pouches: readonly string[];
  readonly others: readonly string[];
  readonly all: readonly string[];
};

/** The codes on the labels of what waits in the run: what a technician has before them on the table. */
async function onTheTable(caller: Caller): Promise<Pieces> {
  const { runs } = await caller.get(paths.runs, runListResponseSchema);
  const found = runs.find((one) => one.name === run);
  if (!found) throw new Error(`No run is called ${run}.`);
  const { packages } = await caller.get(paths.run(found.id), runDetailSchema);
  const of = (isPouch: boolean) =>
    packages.filter((one) => (one.item.kind === 'pouch') === isPouch).map((one) => one.code);
  return { pouches: of(true), others: of(false), all: packages.map((one) => one.code) };
}

/** Codes as they are printed on the shelves and racks themselves. */
async function placeCodes(caller: Caller, cartName: string) {
  const { carts } = await caller.get(`${paths.carts}?pageSize=50`, cartListResponseSchema);
  const { holders } = await caller.get(`${paths.holders}?kind=RS&pageSize=50`, holderListResponseSchema);
  const shelves = carts.find((cart) => cart.name === cartName)?.shelves ?? [];
  const shelf = (name: string) => shelves.find((one) => one.name === name)?.placeCode ?? '';
  return { lower: shelf(lower), racks: holders.map((holder) => holder.placeCode) };
}

function detailOf(caller: Caller, loadId: string): Promise<LoadDetail> {
  return caller.get(paths.load(loadId), loadDetailSchema);
}

const faces = /faces the other way than the rest/;
const hasNoPlace = /has no place/;
const onEdge = /stands on edge, want it flat/;
const tooNear = /want 25 mm|touches|reaches/;

/** A pouch turned the wrong way, put right by the finding's own button. */
async function turnAndFix(load: LoadPage): Promise<void> {
  await load.chooseShelf(lower);
  await load.openPackage('Mayo scissors curved');
  await load.sheet.getByRole('button', { name: 'Paper right' }).click();
  await see(load.sheet.getByRole('status').filter({ hasText: 'paper side right' }));
  await load.done();
  assert.match(await load.readFinding(faces), /Holder RS-2, slot 1 /);
  assert.match(await load.fix(), /Turn it so paper is left/);
  await load.noFindingLike(faces);
}

/** A pouch that found no slot, given one by hand. */
async function placeByHand(load: LoadPage, code: string): Promise<void> {
  assert.match(await load.readFinding(hasNoPlace), /Scan the holder or shelf/);
  await load.openFromTable(code);
  await load.moveTo('Holder RS-2', 'Slot 1');
  await load.done();
  await load.noFindingLike(hasNoPlace);
}

/** A container stood on edge, laid flat again by hand. */
async function layFlatByHand(load: LoadPage): Promise<void> {
  await load.chooseShelf(upper);
  await load.openPackage('Eye micro set');
  await load.sheet.getByRole('button', { name: 'On edge' }).click();
  await see(load.sheet.getByRole('status').filter({ hasText: 'on edge' }));
  await load.done();
  await load.readFinding(onEdge);
  await load.openPackage(/Eye micro set.*on edge/);
  await load.sheet.getByRole('button', { name: 'Flat', exact: true }).click();
  await see(load.sheet.getByRole('status').filter({ hasNotText: 'on edge' }));
  await load.done();
  await load.noFindingLike(onEdge);
}

/** Two containers too near to each other, moved apart by the finding's own button. */
async function moveApart(load: LoadPage): Promise<void> {
  await load.openPackage('Eye micro set');
  const nudged = load.sheet.getByRole('group', { name: /^Nudge/ });
  const before = await nudged.innerText();
  await load.sheet.getByRole('button', { name: 'Move 10 mm away from the door' }).click();
  await until(
    'a nudge',
    () => nudged.innerText(),
    (now) => now !== before,
  );
  await load.done();
  await load.readFinding(tooNear);
  await load.fix();
  await load.noFindingLike(tooNear);
}

/** Two pouches that never came: the gate names them, and they go off the list. */
async function takeOffTheList(load: LoadPage, codes: readonly string[]): Promise<void> {
  await load.gateSays(`${codes.length} packages: scan or take off the list`);
  for (const code of codes) {
    await load.openFromTable(code);
    await load.sheet.getByRole('button', { name: 'Take it off the list' }).click();
    await load.sheet.getByRole('button', { name: 'Yes, take it off the list' }).click();
    await seeGone(load.sheet);
  }
  await see(load.table.getByText('Everything listed is on the cart.'));
}

/** The lead takes the station over, lets one finding stay with a reason, and the technician comes back to the same load. */
async function leadLetsItStay(station: Page, load: LoadPage): Promise<void> {
  await load.chooseShelf(lower);
  await load.openPackage('Suture removal scissors');
  await load.sheet.getByRole('button', { name: 'Paper right' }).click();
  await see(load.sheet.getByRole('status').filter({ hasText: 'paper side right' }));
  await load.done();
  await load.readFinding(faces);
  // A technician is told who may.
  await load.letItStay();
  await see(station.getByText('A lead or supervisor may let this stay, with a written reason.'));

  const number = await load.number();
  await signInPage(station).signInWithBadge(people.lead);
  assert.equal(await load.number(), number);
  await load.letItStay();
  await load.sheet.getByLabel('Why may it stay?').fill('The label would not be seen from the door otherwise');
  await load.sheet.getByRole('button', { name: 'Let it stay' }).click();
  await seeGone(load.sheet);
  await load.noFindingLike(faces);
  await signInPage(station).signInWithBadge(people.technician);
  assert.equal(await load.number(), number);
  await load.findings.getByText('Settled, 1').click();
  await see(load.findings.getByText('Left as it is by Lucasta Mburu'));
}

export const firstLoad: Journey = {
  name: 'A load goes from printed labels to closed: scanned by camera and by hand scanner, put right, counted',
  async run(stage) {
    const caller = await stage.callAs(people.technician);
    const station = await stage.openStation();
    await signInPage(station).signIn(people.technician);

    const pack = packPage(station);
    const made = await pack.pack('P-01', 2);
    assert.equal(made.codes.length, 2);
    await pack.stageInto(run);
    const labels = readPdf(await caller.file(made.pdf));
    assert.equal(labels.length, 2);
    const [barsLabel, matrixLabel] = labels;
    const [barsCode = '', matrixCode = ''] = made.codes;
    if (!barsLabel || !matrixLabel) throw new Error('The labels are not there.');
    // Which symbol is on the film is known before the camera looks, so that it cannot read the other one.
    assert.equal(readScan(decodeArea(barsLabel, barsOnLabel, 'code-128') ?? '').kind, 'package');
    const matrix = readScan(decodeArea(matrixLabel, matrixOnLabel, 'data-matrix') ?? '');
    assert.ok(matrix.kind === 'package' && matrix.gtin !== null, 'the matrix is a GS1 DataMatrix with a GTIN');

    const table = await onTheTable(caller);
    assert.equal(table.all.length, 32);
    await pack.openLoadOf(run);
    const load = loadPage(station);
    const loadId = station.url().split('/').at(-1) ?? '';
    const detail = await detailOf(caller, loadId);
    const codes = await placeCodes(caller, detail.view.cart.name);

    // By camera: the bars of one label, the matrix of the other, as the printer would put them on paper.
    await load.mustSetPlace(codes.lower);
    await load.mustSetPlace(codes.racks[0] ?? '');
    for (const [page, area, code, name] of [
      [barsLabel, barsOnLabel, barsCode, 'bars'],
      [matrixLabel, matrixOnLabel, matrixCode, 'matrix'],
    ] as const) {
      const film = path.join(picturesFolder, `${name}.y4m`);
      filmOf(page, area, film);
      const tablet = await stage.openStation({ film, as: caller });
      await tablet.goto(`/loads/${loadId}`);
      const camera = loadPage(tablet);
      await camera.isOpen();
      const answer = await camera.scanWithCamera();
      // The film goes on: a slow machine may have read the label again, and been told that it is on the cart by now.
      assert.ok(['taken', 'already-here'].includes(answer.answer), answer.words);
      assert.ok(answer.words.includes(code), `${name}: ${answer.words}`);
      await tablet.context().close();
    }
    await until(
      'what the camera scanned',
      () => load.figures('Load'),
      ({ scanned }) => scanned === 2,
    );

    // By hand scanner: two places by their codes, then "tell me where".
    const pouches = table.pouches.filter((code) => !made.codes.includes(code));
    for (const code of pouches.slice(0, 6)) await load.mustTake(code);
    const [noSlotLeft = ''] = pouches.slice(6, 7);
    const full = await load.mustTake(noSlotLeft);
    assert.match(full.words, /no slot left/);
    await load.mustSetPlace(codes.racks[1] ?? '');
    await placeByHand(load, noSlotLeft);
    for (const code of pouches.slice(7, 14)) await load.mustTake(code);
    await load.tellMeWhere();
    for (const code of table.others) {
      const answer = await load.mustTake(code);
      assert.match(await load.whereToPutIt(), /(Lower|Upper) shelf/, answer.words);
    }
    assert.deepEqual([(await load.figures('Load')).listed, (await load.figures('Load')).scanned], [32, 30]);
    const onCart = (await detailOf(caller, loadId)).view;
    assert.deepEqual(
      [...new Set(onCart.packages.map((one) => one.placement && shelfIdOf(onCart, one.placement)))].length,
      3,
      'both shelves are used, and what is not scanned has no place',
    );
    assert.equal(onCart.holders.length, 2);

    await turnAndFix(load);
    await layFlatByHand(load);
    await moveApart(load);
    await leadLetsItStay(station, load);
    await takeOffTheList(load, pouches.slice(14));

    // Counted blind, once wrongly.
    const onLower = (await load.figures(lower)).scanned;
    const onUpper = (await load.figures(upper)).scanned;
    assert.equal(onLower + onUpper, 30);
    await load.count(lower, onLower - 1);
    await load.gateSays(`${lower}: counted ${onLower - 1}, scanned ${onLower}`);
    await load.close();
    // The button leads to what holds the load open: the count.
    await see(load.sheet.getByRole('heading', { name: `Count ${lower.toLowerCase()}` }));
    await load.enterCount(onLower);
    await load.count(upper, onUpper);
    await load.gateSays('Nothing holds this load open');

    await station.getByRole('button', { name: 'Load stickers' }).click();
    await load.sheet.getByRole('button', { name: 'Print 30 stickers' }).click();
    const sheet = load.sheet.getByRole('link', { name: 'Open the sheet to print' });
    const stickers = readPdf(await caller.file((await sheet.getAttribute('href')) ?? ''));
    const number = await load.number();
    const printed = stickers.flatMap((one) => one.texts.map((text) => text.words)).filter((words) => words === number);
    assert.equal(printed.length, 30, 'each sticker names the load');
    await load.done();

    await load.close();
    const closed = station.getByRole('region', { name: 'Closed' });
    await see(closed);
    assert.match(await closed.innerText(), /by Amabel Wyncote\s+30 packages, all listed, scanned and counted/);
    const after = await detailOf(caller, loadId);
    assert.equal(after.summary.state, 'closed');
    assert.match(after.closing?.digest ?? '', /^[0-9a-f]{64}$/);
    assert.equal(after.acceptances.length, 1);
  },
};
