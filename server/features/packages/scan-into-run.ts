import type { StagingScanResponse } from '#contract/runs';
import { readScan, type Scan } from '#domain/label/read-scan';
import { fits } from '#domain/load/cycle-match';
import { decideStaging, type StagingRefusal } from '#domain/package/decide-staging';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import type { Transaction } from '../../platform/db';
import { once } from '../../platform/once';
import { shownScan } from '../../platform/shown-scan';
import { programById } from '../equipment/read-model';
import { catalogueItems } from '../items/read-model';
import { facilityDay } from '../../platform/facility-day';
import { setRun } from './package-store';
import { findPackageByCode, lockPackages, type RunFacts } from './read-model';
import { lockWaitingRun, recordStaging, type RunAct } from './run-acts';

const answerTo: Readonly<Record<StagingRefusal, StagingScanResponse['answer']>> = {
  'package.called-back': 'called-back',
  'package.held': 'held',
  'package.expired': 'not-ready',
  'package.in-another-load': 'not-ready',
  'package.in-another-run': 'not-ready',
  'package.not-ready': 'not-ready',
};

function notAPackage(scan: Exclude<Scan, { kind: 'package' }>): string {
  switch (scan.kind) {
    case 'place':
      return 'That is the code of a place on a cart. Scan the package’s own label.';
    case 'badge':
      return 'That is a badge. Open “Change person” to use it.';
    case 'load-sticker':
      return `That is a load sticker of load ${scan.loadNumber}. Scan the package’s own label.`;
    case 'device':
      return 'That is the maker’s code. Scan the package’s own label.';
    case 'unreadable':
      return scan.sentence;
  }
}

/** Takes one scan at a run. Only the answer `taken` changes anything. */
export async function scanIntoRun(
  services: Services,
  actor: Actor,
  runId: string,
  request: { readonly requestId: string; readonly raw: string },
): Promise<StagingScanResponse> {
  const { db, clock } = services;
  const body = { runId, ...request };
  return once({ db, clock, actor }, { requestId: request.requestId, act: 'run.scan', body }, async (trx) => {
    const act: RunAct = { actor, at: clock.now(), requestId: request.requestId };
    const run = await lockWaitingRun(trx, actor, runId);
    const scan = readScan(request.raw);
    if (scan.kind !== 'package') {
      return {
        answer: 'not-known',
        look: null,
        sentence: notAPackage(scan),
        code: shownScan(request.raw),
        package: null,
      };
    }
    return stageScanned(trx, act, run, scan.code);
  });
}

async function stageScanned(trx: Transaction, act: RunAct, run: RunFacts, code: string): Promise<StagingScanResponse> {
  const known = await findPackageByCode(trx, code);
  // Another facility's label is not known here: not even that it exists.
  if (known?.facilityId !== act.actor.facilityId) {
    return { answer: 'not-known', look: null, sentence: `No package here has the code ${code}.`, code, package: null };
  }
  await lockPackages(trx, [known.id]);
  const facts = (await findPackageByCode(trx, code)) ?? known;
  const about = { look: null, code, package: { id: facts.id, code: facts.code, itemName: facts.itemName } };
  const { day } = await facilityDay(trx, act.actor.facilityId, act.at);
  const decision = decideStaging(facts, run, day);
  if (!decision.ok) return { ...about, answer: answerTo[decision.refusal.code], sentence: decision.refusal.sentence };
  if (decision.value === 'already-here') {
    return { ...about, answer: 'already-here', sentence: `${code} waits in “${run.name}” already.` };
  }
  await setRun(trx, [facts.id], run.id);
  await recordStaging(trx, act, 'package.staged', [facts.id], run.id);
  const unfit = await programNotPermitted(trx, act, run, facts.itemId);
  return unfit === null
    ? { ...about, answer: 'taken', sentence: `${facts.itemName} waits in “${run.name}”.` }
    : {
        ...about,
        answer: 'taken',
        look: 'program-not-permitted',
        sentence: `Its instructions for use do not permit ${unfit}. In that load it will be in the way.`,
      };
}

/** Code of the run's program where the item's instructions for use name cycles and this is none of them. */
async function programNotPermitted(
  trx: Transaction,
  act: RunAct,
  run: RunFacts,
  itemId: string,
): Promise<string | null> {
  if (run.programId === null) return null;
  const { facilityId } = act.actor;
  const program = await programById(trx, facilityId, run.programId);
  const [item] = await catalogueItems(trx, facilityId, [itemId]);
  if (!program || !item || item.cycleNeeds.length === 0 || fits(program, item.cycleNeeds)) return null;
  return program.code;
}
