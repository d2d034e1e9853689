import type { LoadChange, LoadDetail } from '#contract/loads';

/**
 * The load after a change that the server has answered with, or null when this station holds another version than the
 * change started from: then it has to fetch anew.
 */
export function applyChange(detail: LoadDetail, change: LoadChange): LoadDetail | null {
  if (change.version <= detail.version) return detail;
  if (change.from !== detail.version) return null;
  const removed = new Set(change.removedPackageIds);
  const changed = new Map(change.packages.map((entry) => [entry.packageId, entry]));
  const kept = detail.view.packages.filter((entry) => !removed.has(entry.packageId));
  const known = new Set(kept.map((entry) => entry.packageId));
  const packages = [
    ...kept.map((entry) => changed.get(entry.packageId) ?? entry),
    ...change.packages.filter((entry) => !known.has(entry.packageId)),
  ];
  const knownItems = new Set(detail.view.items.map((item) => item.id));
  return {
    ...detail,
    version: change.version,
    counts: change.counts,
    acceptances: change.acceptances,
    undoable: change.undoable,
    summary: {
      ...detail.summary,
      version: change.version,
      listed: packages.length,
      scanned: packages.filter((entry) => entry.isScanned).length,
      program: { id: change.program.id, code: change.program.code, name: change.program.name },
    },
    view: {
      ...detail.view,
      packages,
      items: [...detail.view.items, ...change.items.filter((item) => !knownItems.has(item.id))],
      holders: change.holders,
      program: change.program,
      counts: change.counts.map(({ shelfId, counted }) => ({ shelfId, counted })),
      acceptances: change.acceptances.map(({ findingKey, ruleId, reason }) => ({ findingKey, ruleId, reason })),
    },
  };
}
