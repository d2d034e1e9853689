import { createEvaluator, evaluateLoad } from '../../../src/domain/load/evaluate-load';
import type { Finding } from '../../../src/domain/load/finding';
import type { LoadView } from '../../../src/domain/load/model';
import type { LoadPolicy } from '../../../src/domain/load/policy';
import { placeKey, type Fault, type Host, type Planted } from './fault';
import { faults } from './faults';
import { placedOn } from './geometry';
import { legalCart, type LegalCart } from './legal-cart';
import { randomFrom } from './random';

/** A legal cart and what the rules say about it, which ought to be nothing that holds it. */
export type JudgedCart = { readonly cart: LegalCart; readonly findings: readonly Finding[] };

export type Trial = {
  readonly fault: Fault;
  readonly cartNumber: number;
  readonly planted: Planted;
  readonly isFound: boolean;
  /** null where the fault does not say what is to be measured. */
  readonly isMeasuredRight: boolean | null;
  /** Judged after the cart that it was copied from, with what was remembered of that one, it has the very same findings. */
  readonly isSameStepByStep: boolean;
  /** Everything the rules say about the spoilt copy that they did not say about the cart. */
  readonly newFindings: readonly Finding[];
};

export function judgeCart(seed: number, number: number): JudgedCart {
  const cart = legalCart(seed, number);
  return { cart, findings: evaluateLoad(cart.view, cart.policy) };
}

/** Plants a fault in a copy of a cart and has it judged; null where it cannot be planted there. */
export function tryFault(seed: number, { cart, findings }: JudgedCart, fault: Fault): Trial | null {
  const planted = plant(seed, cart, fault);
  // Where the rule already says something of this place, nothing could be told from its saying so again.
  if (planted === null || findings.some((finding) => isIt(finding, fault, planted))) return null;
  const before = new Set(findings.map((finding) => finding.key));
  const policy = planted.policy ?? cart.policy;
  const after = evaluateLoad(planted.view, policy);
  const newFindings = after.filter(({ key }) => !before.has(key));
  const hits = newFindings.filter((finding) => isIt(finding, fault, planted));
  const named = new Set(hits.flatMap((finding) => finding.places.map(placeKey)));
  const { measured } = planted;
  return {
    fault,
    cartNumber: cart.number,
    planted,
    isFound: planted.everyOne ? planted.at.every((place) => named.has(place)) : hits.length > 0,
    isMeasuredRight: measured === undefined || hits.length === 0 ? null : hits.some((hit) => isNear(hit, measured)),
    isSameStepByStep: told(stepByStep(cart, planted.view, policy)) === told(after),
    newFindings,
  };
}

function isNear({ figure }: Finding, measured: number): boolean {
  return figure !== null && Math.abs(figure.measured - measured) <= 0.001 + measured * 1e-6;
}

function stepByStep(cart: LegalCart, view: LoadView, policy: LoadPolicy): readonly Finding[] {
  const evaluate = createEvaluator();
  evaluate(cart.view, cart.policy);
  return evaluate(view, policy);
}

/** Everything of the findings but their fixes, which are worked out when they are read. */
function told(findings: readonly Finding[]): string {
  return JSON.stringify(
    findings.map(({ key, severity, title, remedy, places, figure }) => ({
      key,
      severity,
      title,
      remedy,
      places,
      figure,
    })),
  );
}

/** Some faults need a lucky pick out of what the cart holds. */
function plant(seed: number, cart: LegalCart, fault: Fault): Planted | null {
  const host: Host = { ...cart, placed: placedOn(cart.view) };
  const random = randomFrom(seed, cart.number, fault.name);
  for (let attempt = 0; attempt < 6; attempt += 1) {
    const planted = fault.plant(host, random);
    if (planted) return planted;
  }
  return null;
}

function isIt(finding: Finding, fault: Fault, planted: Planted): boolean {
  const rules = [fault.rule, ...(fault.orRules ?? [])];
  return rules.includes(finding.ruleId) && finding.places.some((place) => planted.at.includes(placeKey(place)));
}

/** Every kind of fault in so many copies, each in another cart, as far as there are carts it can be planted in. */
export function tryAllFaults(seed: number, carts: readonly JudgedCart[], copies: number): readonly Trial[] {
  return faults.flatMap((fault) => {
    const trials: Trial[] = [];
    for (const judged of randomFrom(seed, fault.name).shuffled(carts)) {
      if (trials.length === copies) break;
      const trial = tryFault(seed, judged, fault);
      if (trial) trials.push(trial);
    }
    return trials;
  });
}
