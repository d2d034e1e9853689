import type { LoadView } from '#domain/load/model';
import { shelfIdOf } from '#domain/load/look-up';
import type { LoadPolicy } from '#domain/load/policy';
import { suggestPlace } from '#domain/load/suggest-place';
import { useEffect, useState } from 'react';

const none: ReadonlyMap<string, string> = new Map();

function whenIdle(work: () => void): () => void {
  if (typeof requestIdleCallback === 'function') {
    const handle = requestIdleCallback(work, { timeout: 2_000 });
    return () => {
      cancelIdleCallback(handle);
    };
  }
  const timer = window.setTimeout(work, 50);
  return () => {
    window.clearTimeout(timer);
  };
}

/** What the plan for the packages still on the table depends on: it is made anew only when one of these changes. */
function planKey(view: LoadView): string {
  const holders = view.holders.map((holder) => `${holder.holderId} ${holder.shelfId}`).join();
  return `${view.loadId} ${holders} ${view.packages.length}`;
}

/**
 * On which shelf each package that is not scanned yet would go. Planned one package at a time while nothing else is to be
 * done, so that no scan waits for it.
 */
export function useExpectedShelves(view: LoadView, policy: LoadPolicy): ReadonlyMap<string, string> {
  const key = planKey(view);
  const [plan, setPlan] = useState<{ readonly key: string; readonly shelves: ReadonlyMap<string, string> }>({
    key: '',
    shelves: none,
  });

  useEffect(() => {
    let planned = view;
    const shelves = new Map<string, string>();
    const waiting = view.packages.filter((entry) => !entry.isScanned);
    let cancel = whenIdle(step);
    function step() {
      const next = waiting.shift();
      if (!next) {
        setPlan({ key, shelves });
        return;
      }
      const suggestion = suggestPlace(planned, next.packageId, policy);
      const shelfId = suggestion ? shelfIdOf(planned, suggestion.placement) : undefined;
      if (suggestion && shelfId !== undefined) {
        shelves.set(next.packageId, shelfId);
        const placed = { ...next, isScanned: true, placement: suggestion.placement };
        planned = {
          ...planned,
          packages: planned.packages.map((entry) => (entry.packageId === next.packageId ? placed : entry)),
        };
      }
      cancel = whenIdle(step);
    }
    return () => {
      cancel();
    };
    // The view itself changes with every scan; only what the key says makes another plan.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [key, policy]);

  return plan.key === key ? plan.shelves : none;
}
