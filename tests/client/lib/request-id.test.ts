import { requestIdSchema } from '#contract/common';
import { describe, expect, it, vi } from 'vitest';
import { newRequestId } from '../../../src/lib/request-id';

describe('a request id', () => {
  it('is a UUID that the server takes, another one each time', () => {
    const ids = [newRequestId(), newRequestId()];
    for (const id of ids) expect(requestIdSchema.safeParse(id).success).toBe(true);
    expect(new Set(ids).size).toBe(2);
  });

  it('is one as well on a plain http address, where browsers offer no randomUUID', () => {
    const bytes = Uint8Array.from({ length: 16 }, () => 0xff);
    vi.stubGlobal('crypto', { getRandomValues: (target: Uint8Array) => (target.set(bytes), target) });
    // RFC 9562, section 5.4: four bits of version 4, two bits of variant 10.
    expect(newRequestId()).toBe('ffffffff-ffff-4fff-bfff-ffffffffffff');
  });
});
