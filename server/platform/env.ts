import { z } from 'zod';

const envSchema = z.object({
  DATABASE_URL: z.string().min(1, 'DATABASE_URL names the PostgreSQL database to use.'),
  PORT: z.coerce.number().int().min(0).max(65_535).default(3000),
  HOST: z.string().default('127.0.0.1'),
  SESSION_SECRET: z.string().min(32, 'SESSION_SECRET needs at least 32 characters.'),
  CLIENT_DIR: z.string().optional(),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('warn'),
  COOKIE_SECURE: z.enum(['yes', 'no']).default('no'),
  /** How many proxies stand in front, or their addresses: Express' own words. */
  TRUST_PROXY: z
    .string()
    .transform((text) => (/^\d+$/.test(text) ? Number(text) : text))
    .optional(),
});

export type Env = z.infer<typeof envSchema>;

/** Reads the environment once; refuses to start on a wrong value, naming it. */
export function readEnv(source: NodeJS.ProcessEnv): Env {
  const read = envSchema.safeParse(source);
  if (!read.success) {
    const lines = read.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`);
    throw new Error(`The server cannot start with these settings:\n${lines.join('\n')}`);
  }
  return read.data;
}
