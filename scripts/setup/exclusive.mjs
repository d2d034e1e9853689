import { createHash } from 'node:crypto';
import net from 'node:net';
import { setTimeout as sleep } from 'node:timers/promises';
import { Refusal } from './refusal.mjs';

/**
 * Runs `body` while no other process runs one under the same name for the same folder.
 *
 * The lock is a socket in Linux's abstract namespace: the kernel gives it up with the process that holds it, so a
 * power cut or a kill leaves nothing behind to clean.
 * @template T
 * @param {string} folder absolute path of what is being protected
 * @param {string} purpose completes "another command is ..."
 * @param {() => Promise<T>} body
 * @param {number} [limitMs] how long to wait for the other process
 * @returns {Promise<T>}
 */
export async function exclusively(folder, purpose, body, limitMs = 300_000) {
  const name = createHash('sha256').update(`${purpose}\n${folder}`).digest('hex').slice(0, 32);
  const until = Date.now() + limitMs;
  let server = await tryToListen(name);
  while (server === undefined) {
    if (Date.now() > until) {
      throw new Refusal(
        `Another command has been ${purpose} for ${String(limitMs / 1000)} s. End it, then start again.`,
      );
    }
    await sleep(50);
    server = await tryToListen(name);
  }
  try {
    return await body();
  } finally {
    server.close();
  }
}

/**
 * @param {string} name
 * @returns {Promise<net.Server | undefined>} undefined while somebody else holds it
 */
function tryToListen(name) {
  return new Promise((resolve, reject) => {
    const server = net.createServer((socket) => socket.destroy());
    server.once('error', (/** @type {NodeJS.ErrnoException} */ error) => {
      if (error.code === 'EADDRINUSE') resolve(undefined);
      else reject(error);
    });
    server.listen(`\0paperside-${name}`, () => {
      server.unref();
      resolve(server);
    });
  });
}
