import { ruleIds, type Finding, type RuleId, type Severity } from '../../../src/domain/load/finding';
import { table } from '../../start/output';
import { faults } from './faults';
import { itemOf } from './geometry';
import type { LegalCart } from './legal-cart';
import type { JudgedCart, Trial } from './trial';

/** In full, and never rounded up to a hundred that was not reached. */
export function shareText(part: number, whole: number): string {
  if (whole === 0) return 'none planted';
  return `${(Math.floor((part / whole) * 10_000) / 100).toFixed(2)} %`;
}

export function printCarts(carts: readonly LegalCart[]): void {
  const sizes = carts.map(({ view }) => view.packages.length).sort((a, b) => a - b);
  const with_ = (holds: (cart: LegalCart) => boolean) => String(carts.filter(holds).length);
  const packed = (packaging: string, kind?: string) =>
    with_(({ view }) =>
      view.packages.some((one) => {
        const item = itemOf(view, one);
        return item.packaging === packaging && (kind === undefined || item.kind === kind);
      }),
    );
  const placed = (at: string) => with_(({ view }) => view.packages.some((one) => one.placement?.at === at));
  const held = (form: string) =>
    with_(({ view }) =>
      view.holders.some((holder) => view.holderKinds.find((kind) => kind.id === holder.kindId)?.form === form),
    );
  const middle = sizes[Math.floor(sizes.length / 2)] ?? 0;
  console.log(
    `\n  ${carts.length} legal carts of ${sizes[0] ?? 0} to ${sizes.at(-1) ?? 0} packages, half of them up to ${middle}.\n`,
  );
  console.log(
    table(
      ['carts with', ''],
      [
        ['pouches', packed('paper-film-pouch')],
        ['double pouches', packed('double-pouch')],
        ['wrapped trays', packed('wrap', 'wrapped-tray')],
        ['basins', packed('wrap', 'basin')],
        ['textile packs', packed('wrap', 'textile-pack')],
        ['rigid containers', packed('rigid-container')],
        ['a challenge device', packed('wrap', 'challenge-device')],
        ['implants', with_(({ view }) => view.packages.some((one) => itemOf(view, one).isImplant))],
        ['racks', held('rack')],
        ['baskets', held('basket')],
        ['wedges', held('wedge')],
        ['spacers', held('spacer')],
        ['stacks', placed('package')],
        ['1 shelf', with_(({ view }) => view.cart.shelves.length === 1)],
        ['2 shelves', with_(({ view }) => view.cart.shelves.length === 2)],
        ['3 or 4 shelves', with_(({ view }) => view.cart.shelves.length > 2)],
        ['facing one way', with_(({ policy }) => policy.facing === 'one-way')],
        ['facing alternating', with_(({ policy }) => policy.facing === 'alternating')],
        ['facing not set', with_(({ policy }) => policy.facing === 'not-set')],
        ['facing by instructions', with_(({ view }) => view.items.some((item) => item.facing !== null))],
      ],
    ),
  );
}

export function printByRule(trials: readonly Trial[]): void {
  const rows = ruleIds.map((rule) => {
    const own = trials.filter((trial) => trial.fault.rule === rule);
    const found = own.filter((trial) => trial.isFound).length;
    const kinds = faults.filter((fault) => fault.rule === rule).length;
    const measured = own.filter((trial) => trial.isMeasuredRight !== null);
    const right = measured.filter((trial) => trial.isMeasuredRight).length;
    const figures = measured.length === 0 ? '' : `${right} of ${measured.length}`;
    return [rule, String(kinds), String(own.length), String(found), shareText(found, own.length), figures];
  });
  console.log(`\n${table(['rule', 'kinds of fault', 'planted', 'found', 'share', 'right figure'], rows)}`);
}

export function printMisses(seed: number, trials: readonly Trial[], fewest: number): void {
  const rare = faults
    .map((fault) => ({ name: fault.name, count: trials.filter((trial) => trial.fault === fault).length }))
    .filter(({ count }) => count < fewest);
  if (rare.length > 0) {
    console.log(
      `\n  Planted in fewer than ${fewest} copies: ${rare.map(({ name, count }) => `${name} (${count})`).join(', ')}.`,
    );
  }
  for (const fault of faults) {
    const missed = trials.filter((trial) => trial.fault === fault && !trial.isFound);
    const [first] = missed;
    if (!first) continue;
    const planted = trials.filter((trial) => trial.fault === fault).length;
    console.log(`\n  Missed: ${fault.name} (${fault.rule}), ${missed.length} of ${planted}.`);
    console.log(`    Carts ${missed.map((trial) => trial.cartNumber).join(' ')}.`);
    console.log(`    npm run bench -- rules --seed ${seed} --cart ${first.cartNumber} --fault ${fault.name}`);
    for (const finding of first.newFindings.slice(0, 3)) console.log(`    told instead: ${words(finding)}`);
  }
}

/** Figures that are not those the fault was planted with, and loads that are judged otherwise step by step. */
export function printDoubts(seed: number, trials: readonly Trial[]): void {
  const doubts = trials.flatMap((trial) => [
    ...(trial.isMeasuredRight === false ? [[trial, `not ${trial.planted.measured ?? ''} measured`] as const] : []),
    ...(trial.isSameStepByStep ? [] : [[trial, 'judged otherwise step by step'] as const]),
  ]);
  const alike = trials.filter((trial) => trial.isSameStepByStep).length;
  console.log(`\n  Judged step by step and in full alike: ${alike} of ${trials.length}.`);
  for (const fault of faults) {
    const own = doubts.filter(([trial]) => trial.fault === fault);
    const [first] = own;
    if (!first) continue;
    const [trial, what] = first;
    console.log(
      `  ${fault.name}, ${own.length} times: ${what}, --seed ${seed} --cart ${trial.cartNumber} --fault ${fault.name}`,
    );
  }
}

export function words(finding: Finding): string {
  return `${finding.severity} ${finding.ruleId}: ${finding.title}`;
}

export function listFalseStops(carts: readonly JudgedCart[]): readonly Finding[] {
  return carts.flatMap(({ findings }) => findings.filter((finding) => finding.severity === 'stop'));
}

/** What the rules say about the legal carts. A stop is a false one; the rest is for information. */
export function printOnLegalCarts(seed: number, carts: readonly JudgedCart[]): void {
  const rows: string[][] = [];
  for (const severity of ['stop', 'accept', 'advice'] satisfies Severity[]) {
    for (const rule of ruleIds) {
      const hit = carts.filter(({ findings }) => findings.some((each) => isSo(each, severity, rule)));
      const count = hit.reduce(
        (sum, { findings }) => sum + findings.filter((each) => isSo(each, severity, rule)).length,
        0,
      );
      const [first] = hit;
      if (first) {
        rows.push([severity, rule, String(count), String(hit.length), `--seed ${seed} --cart ${first.cart.number}`]);
      }
    }
  }
  console.log('\n  Said about legal carts:\n');
  console.log(rows.length === 0 ? '  nothing' : table(['severity', 'rule', 'findings', 'carts', 'the first'], rows));
  for (const { cart, findings } of carts) {
    for (const finding of findings.filter((each) => each.severity === 'stop')) {
      console.log(`  False stop: npm run bench -- rules --seed ${seed} --cart ${cart.number}: ${words(finding)}`);
    }
  }
}

function isSo(finding: Finding, severity: Severity, rule: RuleId): boolean {
  return finding.severity === severity && finding.ruleId === rule;
}
