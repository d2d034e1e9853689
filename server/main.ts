import { createServer } from 'node:http';
import { createApp } from './app';
import { systemClock } from './platform/clock';
import { openDb, openSessionPool } from './platform/db';
import { readEnv } from './platform/env';
import { timeOrderedIds } from './platform/ids';
import { openLogger } from './platform/logger';

const env = readEnv(process.env);
const logger = openLogger(env.LOG_LEVEL);
const db = openDb(env.DATABASE_URL);
const sessionPool = openSessionPool(env.DATABASE_URL);
// A broken idle connection is replaced by the pool; without a listener it would end the process.
sessionPool.on('error', (error) => {
  logger.warn({ err: error }, 'a session connection broke');
});

const app = createApp(
  { db, clock: systemClock, ids: timeOrderedIds, logger },
  {
    sessionPool,
    sessionSecret: env.SESSION_SECRET,
    isCookieSecure: env.COOKIE_SECURE === 'yes',
    trustProxy: env.TRUST_PROXY ?? null,
    clientDir: env.CLIENT_DIR ?? null,
  },
);

const server = createServer(app);
server.on('error', (error: NodeJS.ErrnoException) => {
  const sentence =
    error.code === 'EADDRINUSE'
      ? `Port ${env.PORT} is already taken by another program. Stop it, or choose another: PORT=${env.PORT + 1} npm start`
      : `The server cannot listen on port ${env.PORT}: ${error.message}`;
  process.stderr.write(`${sentence}\n`);
  process.exitCode = 1;
  void stop();
});
server.listen(env.PORT, env.HOST, () => {
  const address = server.address();
  const port = typeof address === 'object' && address ? address.port : env.PORT;
  process.stdout.write(`paperside listening on ${port}\n`);
  // Told to a parent process that waits for it.
  process.send?.({ listening: port });
});

let isStopping = false;

async function stop(): Promise<void> {
  if (isStopping) return;
  isStopping = true;
  const closed = new Promise<void>((resolve) => {
    server.close(() => {
      resolve();
    });
  });
  server.closeIdleConnections();
  // Streams and slow downloads do not end by themselves.
  setTimeout(() => {
    server.closeAllConnections();
  }, 1_000).unref();
  await closed;
  await sessionPool.end();
  await db.destroy();
  // An open channel would keep this process alive.
  if (process.connected) process.disconnect();
}

for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) {
  process.on(signal, () => {
    void stop();
  });
}
// The channel closes by itself when the parent dies: nobody would be left to stop this server.
if (process.connected) {
  process.on('disconnect', () => {
    void stop();
  });
}
