import { hash, verify } from '@node-rs/argon2';

/* Passwords and PINs are kept as Argon2id hashes, the library's default kind, with the figures of the OWASP password storage sheet (memory). */

const settings = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/**
 * The hash of nobody's password, made with the same settings: comparing with it takes as long as with a real one, so
 * that the time of an answer does not tell whether there is such a person.
 */
const nobodysHash = '$argon2id$v=19$m=19456,t=2,p=1$TkI81nfCcJSoV9WsfhKFvw$fc/1ieEmgdwEt+4PWISWZX7+DCqqSSPHnzFMdOVwyRw';

/**
 * The form a secret is compared in: NFKC, as NIST SP 800-63B-4, 3.1.1.2 asks, so that the same word typed on another
 * keyboard is the same word.
 */
export function normalizeSecret(secret: string): string {
  return secret.normalize('NFKC');
}

export function hashSecret(secret: string): Promise<string> {
  return hash(normalizeSecret(secret), settings);
}

/** Null stands for "there is no such person": takes as long, and is false. */
export async function isSecretOf(kept: string | null, secret: string): Promise<boolean> {
  const isMatch = await verify(kept ?? nobodysHash, normalizeSecret(secret));
  return kept !== null && isMatch;
}
