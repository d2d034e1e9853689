import { loadavg } from 'node:os';
import { createEvaluator, evaluateLoad } from '../../../src/domain/load/evaluate-load';
import type { Finding } from '../../../src/domain/load/finding';
import { table } from '../../start/output';
import { percentile } from '../support/percentile';
import { legalCart, type LegalCart } from './legal-cart';

const warmUps = 800;
const runs = 800;
const cartsEach = 8;

export type Speed = {
  readonly name: string;
  readonly p50Ms: number;
  readonly p99Ms: number;
  readonly cpuP50Ms: number;
  readonly cpuP99Ms: number;
};

/** Everything of every finding but its fix, which is worked out when somebody asks for it. */
function readAll(findings: readonly Finding[]): number {
  let read = 0;
  for (const { key, ruleId, severity, title, reason, remedy, source, places, figure } of findings) {
    read += key.length + ruleId.length + severity.length + title.length + reason.length + remedy.length;
    read += source.text.length + places.length + (figure?.measured ?? 0);
  }
  return read;
}

type Task = (cart: LegalCart, turn: number) => () => readonly Finding[];

const inFull: Task = (cart) => {
  const view = { ...cart.view };
  return () => evaluateLoad(view, cart.policy);
};

/** A load with one package still on the table has been judged; now it is scanned into its place. */
const afterOneScan: Task = (cart, turn) => {
  const { view, policy } = cart;
  const which = turn % view.packages.length;
  const before = view.packages.map((one, index) =>
    index === which ? { ...one, isScanned: false, placement: null } : one,
  );
  const evaluate = createEvaluator();
  evaluate({ ...view, packages: before }, policy);
  return () => evaluate(view, policy);
};

function measure(name: string, carts: readonly LegalCart[], task: Task): Speed {
  const wall: number[] = [];
  const cpu: number[] = [];
  for (let turn = 0; turn < warmUps + runs; turn += carts.length) {
    const judges = carts.map((cart, index) => task(cart, turn + index));
    for (const judge of judges) {
      const cpuBefore = process.cpuUsage();
      const from = performance.now();
      readAll(judge());
      const ms = performance.now() - from;
      const { user, system } = process.cpuUsage(cpuBefore);
      if (turn < warmUps) continue;
      wall.push(ms);
      cpu.push((user + system) / 1000);
    }
  }
  const [p50Ms, p99Ms] = [percentile(wall, 50), percentile(wall, 99)];
  return { name, p50Ms, p99Ms, cpuP50Ms: percentile(cpu, 50), cpuP99Ms: percentile(cpu, 99) };
}

function cartsOf(seed: number, packages: number): readonly LegalCart[] {
  return Array.from({ length: cartsEach }, (_, index) => {
    const cart = legalCart(seed, 1_000_000 + packages * 100 + index, packages);
    const { length } = cart.view.packages;
    if (length !== packages) throw new Error(`a cart of ${packages} packages has ${length}`);
    return cart;
  });
}

/** How long it takes to judge a load, on one thread: p50 and p99 in milliseconds. */
export function measureSpeed(seed: number): { readonly [size in 60 | 200 | 500]: Speed } & { readonly scan: Speed } {
  const sixty = cartsOf(seed, 60);
  return {
    60: measure('60 packages', sixty, inFull),
    200: measure('200 packages', cartsOf(seed, 200), inFull),
    500: measure('500 packages', cartsOf(seed, 500), inFull),
    scan: measure('the sixtieth after the 59', sixty, afterOneScan),
  };
}

export function printSpeed(speeds: readonly Speed[]): void {
  const load = loadavg().map((one) => one.toFixed(1));
  console.log(
    `\n  Judging a load, ${runs} runs each over ${cartsEach} carts after ${warmUps} to warm up, without fixes, on one thread.`,
  );
  console.log(`  Time of the processor is of all threads, the collector's too. Load average ${load.join(', ')}.\n`);
  console.log(
    table(
      ['ms', 'p50', 'p99', 'processor p50', 'processor p99'],
      speeds.map(({ name, p50Ms, p99Ms, cpuP50Ms, cpuP99Ms }) => [
        name,
        ...[p50Ms, p99Ms, cpuP50Ms, cpuP99Ms].map((ms) => ms.toFixed(2)),
      ]),
    ),
  );
}
