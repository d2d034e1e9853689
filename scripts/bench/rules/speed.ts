import { evaluateLoad } from '../../../src/domain/load/evaluate-load';
import type { Finding } from '../../../src/domain/load/finding';
import type { LoadView } from '../../../src/domain/load/model';
import { table } from '../../start/output';
import { percentile } from '../support/percentile';
import { legalCart, type LegalCart } from './legal-cart';

const warmUps = 200;
const runs = 400;
const cartsEach = 8;

export type Speed = { readonly name: string; readonly p50Ms: number; readonly p99Ms: number };

/** Everything of every finding but its fix, which is worked out when somebody asks for it. */
function readAll(findings: readonly Finding[]): number {
  let read = 0;
  for (const { key, ruleId, severity, title, reason, remedy, source, places, figure } of findings) {
    read += key.length + ruleId.length + severity.length + title.length + reason.length + remedy.length;
    read += source.text.length + places.length + (figure?.measured ?? 0);
  }
  return read;
}

/** A copy that nothing worked out for another view can be looked up by. */
function fresh(view: LoadView): LoadView {
  return structuredClone(view);
}

function measure(name: string, carts: readonly LegalCart[], prepare: (view: LoadView) => LoadView): Speed {
  const times: number[] = [];
  for (let turn = 0; turn < warmUps + runs; turn += 1) {
    const cart = carts[turn % carts.length];
    if (!cart) throw new Error('no cart to measure');
    const view = prepare(cart.view);
    const from = performance.now();
    readAll(evaluateLoad(view, cart.policy));
    if (turn >= warmUps) times.push(performance.now() - from);
  }
  return { name, p50Ms: percentile(times, 50), p99Ms: percentile(times, 99) };
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
    60: measure('60 packages', sixty, fresh),
    200: measure('200 packages', cartsOf(seed, 200), fresh),
    500: measure('500 packages', cartsOf(seed, 500), fresh),
    scan: measure('one more of 60 placed, judged in full', sixty, (view) => ({ ...view })),
  };
}

export function printSpeed(speeds: readonly Speed[]): void {
  console.log(
    `\n  Judging a load, ${runs} runs each over ${cartsEach} carts after ${warmUps} to warm up, on one thread, without fixes.\n`,
  );
  console.log(
    table(
      ['ms', 'p50', 'p99'],
      speeds.map(({ name, p50Ms, p99Ms }) => [name, p50Ms.toFixed(2), p99Ms.toFixed(2)]),
    ),
  );
}
