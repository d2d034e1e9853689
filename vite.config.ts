import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

/** Where the API listens while Vite serves the client; `npm run dev` sets it. */
const apiUrl = process.env.API_URL ?? 'http://127.0.0.1:3001';

export default defineConfig({
  plugins: [react()],
  build: {
    outDir: 'dist/client',
    emptyOutDir: true,
    sourcemap: true,
    target: 'es2022',
    // Served from the department's own machine; the camera's decoder is large and loaded only where it is used.
    chunkSizeWarningLimit: 1500,
  },
  server: {
    host: '127.0.0.1',
    strictPort: true,
    proxy: { '/api': { target: apiUrl, changeOrigin: false } },
    // The checkout also holds the database and its password: only these three are anyone's to read.
    fs: { strict: true, allow: ['src', 'public', 'node_modules'] },
    watch: { ignored: ['**/.local/**', '**/.tsc/**', '**/dist/**'] },
  },
  test: {
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          include: ['tests/{domain,contract,architecture}/**/*.test.ts'],
          environment: 'node',
        },
      },
      {
        extends: true,
        test: {
          name: 'server',
          include: ['tests/{server,migrations}/**/*.test.ts'],
          environment: 'node',
          globalSetup: ['tests/support/template-database.ts'],
          testTimeout: 20_000,
          hookTimeout: 30_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'client',
          include: ['tests/client/**/*.test.{ts,tsx}'],
          environment: 'jsdom',
          // Typing key by key on a busy machine.
          testTimeout: 20_000,
          setupFiles: ['tests/support/client-setup.ts'],
        },
      },
      {
        extends: true,
        test: {
          name: 'commands',
          include: ['tests/scripts/**/*.test.ts'],
          environment: 'node',
          // They start and stop whole programs and wait for them.
          testTimeout: 180_000,
          hookTimeout: 180_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
