import { accept, refuse, type Result } from '../result';

export type AirRemovalTestRefusal =
  | 'air-removal-test.in-the-future'
  | 'air-removal-test.too-long-ago'
  | 'air-removal-test.pack-expired'
  | 'air-removal-test.passed-stays-in-service';

/** A tablet's clock may be a little ahead of the server's. */
const clockGraceMs = 2 * 60_000;
/** Long enough for any sheet that was written during a down time; a typed year that is wrong lies outside. */
const longestBackEntryMs = 366 * 86_400_000;

/**
 * Whether what is stated of an air-removal test may be taken as a test of its day.
 * Instants are ISO 8601 in UTC with Z; days YYYY-MM-DD. The pack has to be good on the day of the test, to the end of
 * the day it expires on. Common practice, no source.
 */
export function decideAirRemovalTest(test: {
  readonly testedAt: string;
  readonly testDay: string;
  readonly now: string;
  readonly result: 'passed' | 'failed';
  readonly packExpiresOn: string;
  readonly isTakenOutOfService: boolean;
}): Result<null, AirRemovalTestRefusal> {
  const ageMs = Date.parse(test.now) - Date.parse(test.testedAt);
  if (ageMs < -clockGraceMs) {
    return refuse('air-removal-test.in-the-future', 'This time has not come yet. Say when the test ran.');
  }
  if (ageMs > longestBackEntryMs) {
    return refuse('air-removal-test.too-long-ago', 'This was more than a year ago. Look at the date again.');
  }
  if (test.packExpiresOn < test.testDay) {
    return refuse(
      'air-removal-test.pack-expired',
      'The test pack had expired on the day of the test, so its sheet proves nothing. Run the test again with a good pack.',
    );
  }
  if (test.isTakenOutOfService && test.result === 'passed') {
    return refuse('air-removal-test.passed-stays-in-service', 'A test that passed takes no sterilizer out of service.');
  }
  return accept(null);
}
