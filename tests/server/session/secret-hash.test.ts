import { beforeEach, expect, test, vi } from 'vitest';
import * as argon2 from '@node-rs/argon2';
import { hashSecret, isSecretOf } from '../../../server/platform/secret-hash';

vi.mock('@node-rs/argon2', async (load) => {
  const real = await load<typeof argon2>();
  return { ...real, verify: vi.fn(real.verify) };
});

const verify = vi.mocked(argon2.verify);

beforeEach(() => {
  verify.mockClear();
});

/** Kind, version and cost of a hash in PHC form. */
function costOf(hash: unknown): string {
  return String(hash).split('$').slice(1, 4).join('$');
}

test('takes as much work for nobody as for somebody, so that the time tells nothing', async () => {
  const kept = await hashSecret('lantern gravel thirty otters');
  expect(await isSecretOf(kept, 'something else entirely')).toBe(false);
  expect(await isSecretOf(null, 'something else entirely')).toBe(false);
  const compared = verify.mock.calls.map(([hash]) => costOf(hash));
  expect(compared).toHaveLength(2);
  expect(compared[1]).toBe(compared[0]);
});

test('has the cost the OWASP password storage sheet gives for Argon2id: 19 MiB, two passes, one lane (from memory)', async () => {
  expect(costOf(await hashSecret('lantern gravel thirty otters'))).toBe('argon2id$v=19$m=19456,t=2,p=1');
});

test('gives two hashes of one secret different salts, and knows both', async () => {
  const [first, second] = [await hashSecret('730418'), await hashSecret('730418')];
  expect(first).not.toBe(second);
  expect(await isSecretOf(first, '730418')).toBe(true);
  expect(await isSecretOf(second, '730418')).toBe(true);
  expect(await isSecretOf(first, '730419')).toBe(false);
});

test('compares the normalized form, as NIST SP 800-63B-4, 3.1.1.2 asks', async () => {
  const kept = await hashSecret('cafe\u0301 gravel thirty');
  expect(await isSecretOf(kept, 'café gravel thirty')).toBe(true);
  expect(await isSecretOf(kept, 'cafe gravel thirty')).toBe(false);
});

test('compares all of it, however long', async () => {
  const long = 'x'.repeat(128);
  const kept = await hashSecret(`${long}a`);
  expect(await isSecretOf(kept, `${long}b`)).toBe(false);
  expect(await isSecretOf(kept, `${long}a`)).toBe(true);
});
