import { readdirSync } from 'node:fs';
import path from 'node:path';
import { build, createLogger } from 'vite';

/** Builds the client into the folder given. A warning is an error: the usual ones mean a missing font or style. */
const [outDir] = process.argv.slice(2);
if (outDir === undefined) throw new Error('Say into which folder: build-client.ts FOLDER');

const warnings: string[] = [];
function collect(message: string): void {
  warnings.push(message);
}
const customLogger = { ...createLogger('warn'), warn: collect, warnOnce: collect };

try {
  await build({ customLogger, build: { outDir, emptyOutDir: true } });
  if (!readdirSync(path.join(outDir, 'assets')).some((name) => name.endsWith('.woff2'))) {
    collect('The font is not in the build: its @import has to come before every other rule of the style sheet.');
  }
} catch (error) {
  collect(error instanceof Error ? error.message : String(error));
}
if (warnings.length > 0) {
  console.error(warnings.join('\n'));
  process.exitCode = 1;
}
