import type { TodayLoad, TodaySterilizer } from '#contract/today';
import { serviceStateWords } from '#domain/catalogue/service-state-words';
import { formatTime } from '../../lib/format';

/** What a load on a lane is doing, in a few words. */
export function loadInWords(load: TodayLoad): string {
  switch (load.state) {
    case 'building':
      return `${load.scanned} of ${load.listed} scanned`;
    case 'closed':
      return 'closed';
    case 'in-sterilizer':
      return 'in the sterilizer';
    case 'cooling':
      return 'cooling';
    case 'awaiting-proof':
      return 'waits for proof';
    case 'ready-to-sign':
      return 'ready to sign';
    case 'released':
    case 'released-implant-early':
      return 'released';
    case 'held':
      return 'held';
    case 'failed':
      return 'failed';
    case 'set-aside':
      return 'set aside';
    case 'aborted':
      return 'cycle broken off';
    case 'abandoned':
      return 'given up';
  }
}

/** Two digits, as at the end of its number. */
export function countOfDay(load: TodayLoad): string {
  return String(load.countOfDay).padStart(2, '0');
}

export type Standing = {
  /** What it does now. */
  readonly now: string;
  /** Whether that keeps loads off it. */
  readonly isOut: boolean;
  /** Its air-removal test of the day. */
  readonly test: string;
  readonly testState: 'passed' | 'failed' | 'missing' | 'not-asked';
};

function nowOf(sterilizer: TodaySterilizer): string {
  const building = sterilizer.loads.filter((load) => load.state === 'building');
  const closed = sterilizer.loads.filter((load) => load.state === 'closed');
  const parts = [
    ...(closed.length > 0 ? [`${closed.map(countOfDay).join(', ')} closed`] : []),
    ...(building.length > 0 ? [`${building.map(countOfDay).join(', ')} loading`] : []),
  ];
  return parts.length === 0 ? 'Free' : parts.join('. ');
}

/** How a sterilizer stands: in words for the lane's head and for the phone. */
export function standingOf(sterilizer: TodaySterilizer, timeZone: string): Standing {
  const last = sterilizer.tests.at(-1);
  const isOut = sterilizer.serviceState !== 'in-service';
  const now = isOut ? serviceStateWords[sterilizer.serviceState] : nowOf(sterilizer);
  if (!sterilizer.needsAirRemovalTest) return { now, isOut, test: 'No air removal test asked', testState: 'not-asked' };
  if (last === undefined) return { now, isOut, test: 'Air removal not yet tested', testState: 'missing' };
  const at = formatTime(last.testedAt, timeZone);
  return { now, isOut, test: `Air removal ${last.result} ${at}`, testState: last.result };
}
