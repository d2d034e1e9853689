import { pino, type Logger } from 'pino';

export type { Logger };

/** No names of people and nothing scanned at info and above; cookies never. */
export function openLogger(level: string): Logger {
  return pino({ level, redact: ['req.headers.cookie', 'req.headers.authorization', 'res.headers["set-cookie"]'] });
}
