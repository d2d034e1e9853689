import { useRef } from 'react';
import type { FieldValues, Path, UseFormSetError } from 'react-hook-form';
import { fieldNameOf, isProblem } from '../../lib/errors';
import { newRequestId } from '../../lib/request-id';

/**
 * Sends one write under an id that is kept for every repeat of it, so that a press after a lost or unreadable answer does
 * nothing twice. It ends once the write is done, or when it has turned out to stand for something else: after a refusal
 * nothing was written, so the same id may come back.
 */
export function useWrite() {
  const id = useRef<string | null>(null);
  return async function write<Reply>(send: (requestId: string) => Promise<Reply>): Promise<Reply> {
    id.current ??= newRequestId();
    try {
      const reply = await send(id.current);
      id.current = null;
      return reply;
    } catch (error) {
      if (isProblem(error, 'request.reused')) id.current = null;
      throw error;
    }
  };
}

/** Puts what the server says about single values beside their fields. */
export function showAtFields<Values extends FieldValues>(error: unknown, setError: UseFormSetError<Values>): void {
  if (!isProblem(error)) return;
  for (const { pointer, detail } of error.fields) {
    // The pointer begins with the part of the request: "/body/massKg".
    const name = fieldNameOf(pointer).replace(/^body\.?/, '');
    if (name !== '') setError(name as Path<Values>, { message: detail }, { shouldFocus: true });
  }
}
