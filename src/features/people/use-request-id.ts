import { useRef } from 'react';
import { isProblem } from '../../lib/errors';
import { newRequestId } from '../../lib/request-id';

/**
 * The id of one write. It is kept for every repeat of it, so that a press after a lost answer does nothing twice, and made
 * anew once the write is done or has turned out to be another one.
 */
export function useRequestId() {
  const id = useRef<string | null>(null);
  return {
    next(): string {
      id.current ??= newRequestId();
      return id.current;
    },
    done(): void {
      id.current = null;
    },
    /** After a refusal nothing was written; only an id that stands for something else must not come back. */
    refused(error: unknown): void {
      if (isProblem(error, 'request.reused')) id.current = null;
    },
  };
}
