import { parseArgs } from 'node:util';
import { Refusal } from '../setup/refusal.mjs';
import { replay } from './rules/replay';
import { listFalseStops, printByRule, printCarts, printDoubts, printMisses, printOnLegalCarts } from './rules/report';
import { measureSpeed, printSpeed } from './rules/speed';
import { judgeCart, tryAllFaults } from './rules/trial';

export const description =
  'Share of planted faults that the rules find, false stops on legal carts, and time to judge a load.';

const copies = 50;
const fewestCopies = 40;

const usage = 'npm run bench -- rules [--seed N] [--carts N] [--cart N [--fault NAME]]';

/** Legal carts from a generator that knows nothing of the rules, and each kind of fault planted in copies of them. */
export function run(): Promise<void> {
  const { seed, carts: count, cart, fault } = readOptions();
  if (cart !== null) {
    replay(seed, cart, fault);
    return Promise.resolve();
  }
  console.log(`\n  Seed ${seed}. Another: ${usage}`);
  const judged = Array.from({ length: count }, (_, index) => judgeCart(seed, index + 1));
  printCarts(judged.map((each) => each.cart));
  const trials = tryAllFaults(seed, judged, copies);
  printByRule(trials);
  printMisses(seed, trials, fewestCopies);
  printDoubts(seed, trials);
  printOnLegalCarts(seed, judged);
  const speed = measureSpeed(seed);
  printSpeed([speed[60], speed[200], speed[500], speed.scan]);
  const found = trials.filter((trial) => trial.isFound).length;
  const ms = (value: number) => Number(value.toFixed(3));
  const figures = {
    bench: 'rules',
    carts: judged.length,
    faults: trials.length,
    detected_share: Math.floor((found / trials.length) * 10_000) / 10_000,
    false_stops: listFalseStops(judged).length,
    eval60_p99_ms: ms(speed[60].p99Ms),
    eval200_p99_ms: ms(speed[200].p99Ms),
    eval500_p99_ms: ms(speed[500].p99Ms),
    incremental_p99_ms: ms(speed.scan.p99Ms),
  };
  console.log(`\n${JSON.stringify(figures)}`);
  return Promise.resolve();
}

function readOptions() {
  const { values } = parseOptions();
  const whole = (name: 'seed' | 'carts' | 'cart', text: string) => {
    const value = Number(text);
    if (!Number.isSafeInteger(value) || value < 0) throw new Refusal(`--${name} takes a whole number. ${usage}`);
    return value;
  };
  if (values.fault !== undefined && values.cart === undefined) throw new Refusal(`--fault needs --cart. ${usage}`);
  return {
    seed: whole('seed', values.seed),
    carts: whole('carts', values.carts),
    cart: values.cart === undefined ? null : whole('cart', values.cart),
    fault: values.fault,
  };
}

function parseOptions() {
  try {
    return parseArgs({
      args: process.argv.slice(3),
      options: {
        seed: { type: 'string', default: '1' },
        carts: { type: 'string', default: '2000' },
        cart: { type: 'string' },
        fault: { type: 'string' },
      },
    });
  } catch (error) {
    throw new Refusal(`${error instanceof Error ? error.message : 'The options cannot be read.'} ${usage}`);
  }
}
