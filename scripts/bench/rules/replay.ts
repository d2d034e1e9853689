import type { LoadView } from '../../../src/domain/load/model';
import { table } from '../../start/output';
import { Refusal } from '../../setup/refusal.mjs';
import { faults } from './faults';
import { itemOf, placedOn } from './geometry';
import { words } from './report';
import { judgeCart, tryFault } from './trial';

/** Shows one cart, as it is or with one fault planted, and everything the rules say about it. */
export function replay(seed: number, number: number, faultName: string | undefined): void {
  const judged = judgeCart(seed, number);
  if (faultName === undefined) {
    show(judged.cart.view);
    console.log(`\n  ${JSON.stringify(judged.cart.policy)}\n`);
    for (const finding of judged.findings) console.log(`  ${words(finding)}`);
    console.log(`  ${judged.findings.length} findings`);
    return;
  }
  const fault = faults.find((each) => each.name === faultName);
  if (!fault)
    throw new Refusal(
      `There is no fault called ${faultName}. There are: ${faults.map((each) => each.name).join(', ')}.`,
    );
  const trial = tryFault(seed, judged, fault);
  if (!trial) throw new Refusal(`${faultName} cannot be planted in cart ${number}.`);
  show(trial.planted.view);
  console.log(`\n  ${JSON.stringify(trial.planted.policy ?? judged.cart.policy)}\n`);
  console.log(
    `  Planted at ${trial.planted.at.join(', ')}; to be found by ${[fault.rule, ...(fault.orRules ?? [])].join(' or ')}.`,
  );
  for (const finding of trial.newFindings) console.log(`  ${words(finding)} ${JSON.stringify(finding.places)}`);
  console.log(trial.isFound ? '  Found.' : '  Missed.');
}

function show(view: LoadView): void {
  const { sterilizer, program, cart } = view;
  console.log(
    `\n  ${program.code}, chamber ${sterilizer.chamberWidthMm} x ${sterilizer.chamberDepthMm} mm, drain at ${sterilizer.drainXMm}, ${sterilizer.drainYMm}`,
  );
  for (const shelf of cart.shelves) {
    console.log(
      `  ${shelf.id}: ${shelf.widthMm} x ${shelf.depthMm} mm, ${shelf.clearHeightMm} mm high, ${shelf.surface}, ${shelf.greatestMassKg} kg`,
    );
  }
  for (const holder of view.holders) {
    console.log(
      `  ${holder.holderId}: ${holder.kindId}, ${holder.shelfId}, ${holder.xMm}, ${holder.yMm}, turn ${holder.turn}`,
    );
  }
  const placed = new Map(placedOn(view).map((each) => [each.one, each]));
  const rows = view.packages.map((one) => {
    const known = view.items.some((item) => item.id === one.itemId);
    const at = placed.get(one);
    const range = (from: number, to: number) => `${round(from)} to ${round(to)}`;
    return [
      one.packageId,
      known ? itemOf(view, one).code : one.itemId,
      at?.shelfId ?? '-',
      at ? `x ${range(at.rect.left, at.rect.right)}` : '',
      at ? `y ${range(at.rect.front, at.rect.back)}` : '',
      at ? `z ${range(at.bottom, at.top)}` : '',
      JSON.stringify(one.placement),
    ];
  });
  console.log(table(['package', 'item', 'shelf', 'x', 'y', 'z', 'placement'], rows));
}

function round(value: number): number {
  return Math.round(value * 10) / 10;
}
