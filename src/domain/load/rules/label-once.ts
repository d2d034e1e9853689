/*
 * A label is on the list once.
 * Source: our own check; each package has a code of its own.
 */
import type { LoadPackage } from '../model';
import { takeOff } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { Scene } from './scene';
import { accountability } from './sources';
import { countWords } from './words';

export const labelOnce: Rule = {
  id: 'label-once',
  about: 'load',
  name: 'Each label once',
  reason: 'A label that stands for two packages proves neither of them.',
  source: accountability,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene): readonly Draft[] {
  const { packages } = scene.view;
  const isEachOnce =
    scene.listed.length === packages.length && new Set(packages.map((one) => one.code.trim())).size === packages.length;
  if (isEachOnce) return [];
  const byCode = new Map<string, LoadPackage[]>();
  for (const one of packages) {
    const code = one.code.trim();
    if (code === '') continue;
    const same = byCode.get(code);
    if (same) same.push(one);
    else byCode.set(code, [one]);
  }
  const ofCodes = [...byCode].filter(([, same]) => same.length > 1);
  const ids = countOf(packages.map((one) => one.packageId));
  const codesTold = new Set(ofCodes.map(([code]) => code));
  // One package twice under different codes: the list itself is broken.
  const ofIds = scene.listed.filter(({ one }) => (ids.get(one.packageId) ?? 0) > 1 && !codesTold.has(one.code.trim()));
  return [
    ...ofCodes.map(([code, same]) => draftOf(scene, code, same)),
    ...ofIds.map(({ one }) => draftOf(scene, one.code, new Array<LoadPackage>(ids.get(one.packageId) ?? 2).fill(one))),
  ];
}

function draftOf(scene: Scene, code: string, same: readonly LoadPackage[]): Draft {
  const distinct = [...new Map(same.map((one) => [one.packageId, one])).values()].sort((a, b) =>
    a.packageId < b.packageId ? -1 : 1,
  );
  const [first, ...others] = distinct;
  return {
    subjects: distinct.map((one) => one.packageId),
    title: `Label ${code} is on the list ${countWords(same.length, 'time', 'times')}`,
    remedy: 'Find out which package it is, and print the other a label of its own.',
    places: onPackage(...distinct),
    figure: { measured: same.length, limit: 1, unit: 'count', want: 'exactly', limitFrom: 'default' },
    fixes: () => (first && others.length === 1 ? others.map(takeOff) : []),
  };
}

function countOf(ids: readonly string[]): ReadonlyMap<string, number> {
  const counts = new Map<string, number>();
  for (const id of ids) counts.set(id, (counts.get(id) ?? 0) + 1);
  return counts;
}
