/*
 * The air-removal test of the day has passed on this sterilizer before its first load.
 * Source: New Jersey Administrative Code 8:43G-8.8: prevacuum air-removal test daily and after repair.
 */
import { onLoad } from './places';
import type { Draft, Rule } from './rule';
import type { Scene } from './scene';
import { njMonitoring } from './sources';

export const airRemovalTest: Rule = {
  id: 'air-removal-test',
  about: 'load',
  name: 'The air-removal test of the day has passed',
  reason: 'Air left in the chamber keeps steam from the load, and only this test shows that the sterilizer removes it.',
  source: njMonitoring,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene): readonly Draft[] {
  const { sterilizer, today } = scene.view;
  const airRemoval =
    scene.view.airRemoval && mayBeOn(today, scene.view.airRemoval.testedAt) ? scene.view.airRemoval : null;
  if (!sterilizer.needsAirRemovalTest || airRemoval?.result === 'passed') return [];
  return [
    {
      subjects: [sterilizer.id],
      title: airRemoval
        ? `The air-removal test of ${sterilizer.name} failed today`
        : `No air-removal test of ${sterilizer.name} today`,
      remedy: airRemoval
        ? 'Do not run it. Tell the lead: it is tested again only after somebody has looked at it.'
        : 'Run the air-removal test in the empty chamber and write down its result.',
      places: onLoad,
    },
  ];
}

const hourMs = 3_600_000;

/**
 * Whether an instant falls on a calendar day in any time zone: they lie between 12 hours behind and 14 hours ahead of UTC.
 * Whoever gathers the load knows the facility's own zone and hands over the test of its day; one of another day proves nothing.
 */
function mayBeOn(day: string, instant: string): boolean {
  const begins = Date.parse(`${day}T00:00:00Z`);
  const at = Date.parse(instant);
  return at >= begins - 14 * hourMs && at < begins + (24 + 12) * hourMs;
}
