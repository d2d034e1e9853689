import { v7 } from 'uuid';

/** Ids are UUID version 7 (RFC 9562, section 5.7): they sort by the time they were made. */
export type Ids = { readonly next: () => string };

export const timeOrderedIds: Ids = { next: () => v7() };
