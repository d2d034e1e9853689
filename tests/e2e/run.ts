import { rmSync } from 'node:fs';
import { setTimeout as sleep } from 'node:timers/promises';
import { launchBrowser } from '../../scripts/running/browser';
import { makeDemonstrations } from '../../scripts/running/demonstration-server';
import { listenForStop } from '../../scripts/setup/stop-request';
import type { Journey } from './support/journey';
import { createStage, picturesFolder } from './support/stage';
import { accessibility } from './journeys/accessibility';
import { firstLoad } from './journeys/first-load';
import { importCsv } from './journeys/import-csv';
import { keyboardOnly } from './journeys/keyboard-only';
import { policyChange } from './journeys/policy-change';
import { roles } from './journeys/roles';
import { scanAnswers } from './journeys/scan-answers';
import { sessionEnd } from './journeys/session-end';
import { twoStations } from './journeys/two-stations';

/*
 * The journeys: stories told in the real program, with a real database, in a real browser. `node --import tsx
 * tests/e2e/run.ts WORD` tells only those with the word in their file's name.
 */

const journeys: Readonly<Record<string, Journey>> = {
  'first-load': firstLoad,
  'scan-answers': scanAnswers,
  'session-end': sessionEnd,
  'two-stations': twoStations,
  roles,
  'keyboard-only': keyboardOnly,
  'import-csv': importCsv,
  'policy-change': policyChange,
  accessibility,
};

const journeyLimitMs = 600_000;
/** A page that is still busy with what was told last may never let itself be closed. */
const closingLimitMs = 20_000;

const stop = listenForStop();
const [only] = process.argv.slice(2);
const chosen = Object.entries(journeys).filter(
  ([name]) => only === undefined || only.split(',').some((one) => name.includes(one)),
);
rmSync(picturesFolder, { recursive: true, force: true });

let passed = 0;
let failed = 0;
const demonstrations = await makeDemonstrations('e2e');
try {
  const browser = await launchBrowser();
  try {
    for (const [name, journey] of chosen) {
      if (stop.isMade()) break;
      if (await tell(name, journey)) passed += 1;
      else failed += 1;
    }
  } finally {
    await Promise.race([browser.close(), sleep(closingLimitMs, undefined, { ref: false })]);
  }

  async function tell(name: string, journey: Journey): Promise<boolean> {
    const begunMs = performance.now();
    const demonstration = await demonstrations.start();
    const stage = createStage(demonstration, browser);
    try {
      await Promise.race([
        journey.run(stage),
        sleep(journeyLimitMs, undefined, { ref: false }).then(() => {
          throw new Error(`It took longer than ${journeyLimitMs / 1000} s.`);
        }),
        stop.made.then(() => {
          throw new Error('It was stopped.');
        }),
      ]);
      const troubles = stage.troubles();
      if (troubles.length > 0) throw new Error(`Unseen, but wrong:\n  ${[...new Set(troubles)].join('\n  ')}`);
      console.log(`  passed  ${journey.name} (${((performance.now() - begunMs) / 1000).toFixed(1)} s)`);
      return true;
    } catch (error) {
      console.log(`  FAILED  ${journey.name}`);
      console.log(indented(error instanceof Error ? (error.stack ?? error.message) : String(error)));
      const troubles = stage.troubles();
      if (troubles.length > 0) console.log(indented(`Unseen:\n${[...new Set(troubles)].join('\n')}`));
      for (const file of await stage.takePictures(name)) console.log(indented(`Picture: ${file}`));
      return false;
    } finally {
      await Promise.race([stage.close(), sleep(closingLimitMs, undefined, { ref: false })]);
      await demonstration.stop();
    }
  }
} finally {
  await demonstrations.release();
}
console.log(`\ne2e: ${passed} passed, ${failed} failed`);
// A journey that ran into its limit may still be waiting for something.
process.exit(failed === 0 && passed > 0 && !stop.isMade() ? 0 : 1);

function indented(text: string): string {
  return text.replaceAll(/^/gm, '          ');
}
