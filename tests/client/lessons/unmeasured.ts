import { vi } from 'vitest';

/** jsdom measures nothing: drawings are then made for the first width they are given. */
export function measureNothing(): void {
  vi.stubGlobal(
    'ResizeObserver',
    class {
      observe() {
        return undefined;
      }
      unobserve() {
        return undefined;
      }
      disconnect() {
        return undefined;
      }
    },
  );
}
