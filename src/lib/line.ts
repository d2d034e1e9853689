import { createStore, useStore } from './store';

/** Whether the server answers, learned from the calls themselves: a tablet's own idea of being online is no proof. */
export type Line = { readonly isUp: true } | { readonly isUp: false; readonly since: Date };

export const lineStore = createStore<Line>({ isUp: true });

export function noteLineUp(): void {
  if (!lineStore.get().isUp) lineStore.set({ isUp: true });
}

export function noteLineDown(at: Date): void {
  if (lineStore.get().isUp) lineStore.set({ isUp: false, since: at });
}

export function useLine(): Line {
  return useStore(lineStore);
}
