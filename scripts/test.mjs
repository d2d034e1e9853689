import { top } from './setup/checkout.mjs';
import { ensureNpmPackages, requireNode } from './setup/npm-packages.mjs';
import { runMain } from './setup/refusal.mjs';

await runMain(async () => {
  requireNode();
  await ensureNpmPackages(top);
  const { register } = await import('tsx/esm/api');
  register();
  const { runEverything } = await import('./test/run');
  return runEverything();
});
