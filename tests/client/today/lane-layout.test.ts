import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { hoursOf, loadBoxes, runFlags, spanOf, xOf } from '../../../src/features/today/lane-layout';
import { aDay, aLoad, aRun, aSterilizer, tenFortyEight } from './a-day';

const now = new Date(tenFortyEight);
const hourMs = 3_600_000;
const width = 900;

describe('the stretch of the day that is shown', () => {
  it('begins with the first test in whole hours and ends three hours ahead', () => {
    const span = spanOf(aDay(), now);
    expect(new Date(span.fromMs).toISOString()).toBe('2026-03-17T05:00:00.000Z');
    expect(new Date(span.toMs).toISOString()).toBe('2026-03-17T14:00:00.000Z');
    expect(hoursOf(span)).toHaveLength(9);
  });

  it('reaches to what is wanted later, but not to tomorrow', () => {
    const wanted = aDay({ runs: [aRun({ wantedAt: '2026-03-17T16:20:00.000Z' })] });
    expect(new Date(spanOf(wanted, now).toMs).toISOString()).toBe('2026-03-17T17:00:00.000Z');
    const tomorrow = aDay({ runs: [aRun({ wantedAt: '2026-03-18T09:00:00.000Z' })] });
    expect(new Date(spanOf(tomorrow, now).toMs).toISOString()).toBe('2026-03-17T14:00:00.000Z');
  });

  it('holds now within it, is 8 to 14 hours long and whole, whatever the day brought', () => {
    const instant = fc
      .integer({ min: -40, max: 20 })
      .map((hours) => new Date(now.getTime() + hours * hourMs).toISOString());
    fc.assert(
      fc.property(fc.array(instant), fc.array(instant), (opened, wanted) => {
        const day = aDay({
          sterilizers: [aSterilizer({ loads: opened.map((openedAt) => aLoad({ openedAt })) })],
          runs: wanted.map((wantedAt) => aRun({ wantedAt })),
        });
        const { fromMs, toMs } = spanOf(day, now);
        expect(fromMs).toBeLessThanOrEqual(now.getTime() - 2 * hourMs);
        expect(toMs).toBeGreaterThanOrEqual(now.getTime() + 2 * hourMs);
        expect((toMs - fromMs) / hourMs).toBeGreaterThanOrEqual(8);
        expect((toMs - fromMs) / hourMs).toBeLessThanOrEqual(14);
        expect(fromMs % hourMs).toBe(0);
      }),
    );
  });
});

describe('the boxes of a lane', () => {
  const span = { fromMs: Date.parse('2026-03-17T05:00:00Z'), toMs: Date.parse('2026-03-17T14:00:00Z') };

  it('lie from opened to closed: 100 px an hour here', () => {
    expect(xOf(Date.parse('2026-03-17T07:30:00Z'), span, width)).toBe(250);
    const closed = aLoad({ state: 'closed', openedAt: '2026-03-17T07:00:00Z', closedAt: '2026-03-17T08:30:00Z' });
    expect(loadBoxes(aSterilizer({ loads: [closed] }), span, width, now)).toMatchObject([
      { left: 200, width: 150, row: 0 },
    ]);
  });

  it('of one line never cover each other and stay on the lane, however many there are', () => {
    const minutes = fc.integer({ min: 0, max: 340 });
    const load = fc.record({ from: minutes, for: fc.integer({ min: 0, max: 120 }), isBuilding: fc.boolean() });
    fc.assert(
      fc.property(fc.array(load, { maxLength: 12 }), fc.integer({ min: 500, max: 1400 }), (drawn, axis) => {
        const loads = drawn.map((one) =>
          aLoad({
            state: one.isBuilding ? 'building' : 'closed',
            openedAt: new Date(span.fromMs + one.from * 60_000).toISOString(),
            closedAt: one.isBuilding ? null : new Date(span.fromMs + (one.from + one.for) * 60_000).toISOString(),
          }),
        );
        const boxes = loadBoxes(aSterilizer({ loads }), span, axis, now);
        expect(boxes).toHaveLength(loads.length);
        for (const [index, box] of boxes.entries()) {
          expect(box.left).toBeGreaterThanOrEqual(0);
          for (const other of boxes.slice(index + 1)) {
            if (other.row !== box.row) continue;
            expect(other.left >= box.left + box.width || box.left >= other.left + other.width).toBe(true);
          }
        }
      }),
    );
  });

  it('have room for their count and their marks, however short the load was open', () => {
    const brief = { state: 'closed', openedAt: '2026-03-17T09:00:00Z', closedAt: '2026-03-17T09:01:00Z' } as const;
    const widths = [aLoad({ ...brief, implants: 0 }), aLoad({ ...brief, implants: 1 })].map(
      (load) => loadBoxes(aSterilizer({ loads: [load] }), span, width, now)[0]?.width ?? 0,
    );
    // In px: edge and inset 9.5, two digits 18, a gap 8, a mark 15, inset and edge 9.5; another gap and mark 23.
    expect(widths[0]).toBeGreaterThanOrEqual(60);
    expect(widths[1]).toBeGreaterThanOrEqual(83);
  });

  it('take a second line when there is no room on the first', () => {
    const loads = [aLoad(), aLoad({ id: '0190f000-0000-7000-8000-000000000702', countOfDay: 2 })];
    expect(loadBoxes(aSterilizer({ loads }), span, width, now).map((box) => box.row)).toEqual([0, 1]);
  });
});

describe('the flags of runs', () => {
  const span = { fromMs: Date.parse('2026-03-17T05:00:00Z'), toMs: Date.parse('2026-03-17T14:00:00Z') };

  it('stand at the hour they are wanted, on their own sterilizer only', () => {
    const id = aSterilizer().id;
    const flags = runFlags(
      [aRun(), aRun({ sterilizer: null }), aRun({ packages: 0 }), aRun({ wantedAt: null })],
      id,
      span,
      width,
    );
    expect(flags).toMatchObject([{ x: 700, isLeft: false }]);
    expect(runFlags([aRun({ wantedAt: '2026-03-17T13:30:00Z' })], id, span, width)).toMatchObject([
      { x: 850, isLeft: true },
    ]);
    expect(runFlags([aRun({ wantedAt: '2026-03-17T20:00:00Z' })], id, span, width)).toEqual([]);
  });
});
