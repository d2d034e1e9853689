import type { RunSummary } from '#contract/runs';
import type { Today, TodayLoad, TodaySterilizer } from '#contract/today';

/* Where things stand on the time axis of the day. All positions are in px from the left of the axis. */

const hourMs = 3_600_000;
const leastHours = 8;
const mostHours = 14;
/** Hours that are kept free to the right of now, for what is wanted. */
const hoursAhead = 3;

export type TimeSpan = { readonly fromMs: number; readonly toMs: number };

function floorHour(ms: number): number {
  return Math.floor(ms / hourMs) * hourMs;
}

/** The stretch of the day to show: all that happened so far and what is wanted next, in whole hours, now well inside. */
export function spanOf(today: Pick<Today, 'sterilizers' | 'runs'>, now: Date): TimeSpan {
  const nowMs = now.getTime();
  const starts = today.sterilizers.flatMap((one) => [
    ...one.tests.map((test) => Date.parse(test.testedAt)),
    ...one.loads.map((load) => Date.parse(load.openedAt)),
  ]);
  const wanted = today.runs.flatMap((run) => (run.wantedAt === null ? [] : [Date.parse(run.wantedAt)]));
  const last = Math.max(nowMs + hoursAhead * hourMs, ...wanted.filter((at) => at < nowMs + 8 * hourMs));
  const toMs = floorHour(last) + hourMs;
  const first = Math.min(nowMs - 2 * hourMs, ...starts);
  const earliest = floorHour(Math.max(first, toMs - mostHours * hourMs));
  return { fromMs: Math.min(earliest, toMs - leastHours * hourMs), toMs };
}

/** Px from the left for an instant; outside of the span it is outside of the axis. */
export function xOf(ms: number, span: TimeSpan, width: number): number {
  return ((ms - span.fromMs) / (span.toMs - span.fromMs)) * width;
}

/** Full hours within the span, the first one included. */
export function hoursOf(span: TimeSpan): number[] {
  const hours: number[] = [];
  for (let at = span.fromMs; at < span.toMs; at += hourMs) hours.push(at);
  return hours;
}

export type LoadBox = {
  readonly load: TodayLoad;
  readonly left: number;
  readonly width: number;
  /** 0 for the first line of the lane; a box that has no room there goes below. */
  readonly row: number;
};

/** Its count and its mark; an implant has a mark of its own. */
const leastBox = 61;
const leastBoxWithImplant = 84;
/** A load being built says so in words, which need room. */
const leastBuildingBox = 158;
const gap = 4;

type Extent = { readonly left: number; readonly right: number };

function firstFreeRow(rows: Extent[][], extent: Extent): number {
  const free = rows.findIndex((row) =>
    row.every(({ left, right }) => extent.left >= right + gap || extent.right + gap <= left),
  );
  return free === -1 ? rows.length : free;
}

/** The day's loads of a sterilizer as boxes from opened to closed, or to now while they are being built. */
export function loadBoxes(sterilizer: TodaySterilizer, span: TimeSpan, width: number, now: Date): LoadBox[] {
  const rows: Extent[][] = [];
  return sterilizer.loads.map((load) => {
    const isBuilding = load.state === 'building';
    const from = Math.max(0, xOf(Date.parse(load.openedAt), span, width));
    const to = xOf(load.closedAt === null ? now.getTime() : Date.parse(load.closedAt), span, width);
    const least = isBuilding ? leastBuildingBox : load.implants > 0 ? leastBoxWithImplant : leastBox;
    const boxWidth = Math.max(to - from, least);
    const left = Math.min(from, width - boxWidth);
    const extent = { left, right: left + boxWidth };
    const row = firstFreeRow(rows, extent);
    (rows[row] ??= []).push(extent);
    return { load, left, width: boxWidth, row };
  });
}

export type RunFlag = {
  readonly run: RunSummary;
  readonly x: number;
  /** Words to the left of the flag where there is no room at the right. */
  readonly isLeft: boolean;
};

const flagWidth = 170;

/** Runs that name this sterilizer and an hour, as flags at the hour they are wanted. */
export function runFlags(runs: readonly RunSummary[], sterilizerId: string, span: TimeSpan, width: number): RunFlag[] {
  return runs
    .filter((run) => run.sterilizer?.id === sterilizerId && run.wantedAt !== null && run.packages > 0)
    .map((run) => {
      const x = xOf(Date.parse(run.wantedAt ?? ''), span, width);
      return { run, x, isLeft: x + flagWidth > width };
    })
    .filter(({ x }) => x >= 0 && x <= width);
}
