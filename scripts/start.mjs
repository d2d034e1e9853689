import { existsSync } from 'node:fs';
import path from 'node:path';
import { top } from './setup/checkout.mjs';
import { ensureNpmPackages, requireNode } from './setup/npm-packages.mjs';
import { runMain } from './setup/refusal.mjs';

// Plain Node up to here: in a fresh checkout there is no package yet to read TypeScript with.
await runMain(async () => {
  requireNode();
  console.log('\nPaperside\n');
  await ensureNpmPackages(top);
  const settings = path.join(top, '.env');
  if (existsSync(settings)) process.loadEnvFile(settings);
  const { register } = await import('tsx/esm/api');
  register();
  const { start } = await import('./start/start');
  return start({ isWatching: process.argv.includes('--watch') });
});
