import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

const serverFolders =
  'api,calendar,code-health,db,jobs,mail,print,published,reading,reminders,retention,rules,setup,storage,use-cases';

/** During development the launcher runs the API on a port of its own and names it here. */
const apiPort = process.env.API_PORT ?? process.env.PORT ?? '4180';

export default defineConfig({
  plugins: [react(), tailwindcss()],
  build: {
    outDir: 'dist',
    manifest: true,
    // Everything is a file of its own: the content security policy needs no exception for data URLs.
    assetsInlineLimit: 0,
    chunkSizeWarningLimit: 800,
  },
  server: {
    host: process.env.HOST ?? '127.0.0.1',
    strictPort: true,
    proxy: { '/api': { target: `http://127.0.0.1:${apiPort}`, xfwd: true } },
    watch: { ignored: ['**/.data/**', '**/uploads/**', '**/dist/**'] },
  },
  test: {
    // Two cores: two test processes, whatever the machine that runs the tests says of itself.
    maxWorkers: 2,
    projects: [
      {
        extends: true,
        test: {
          name: 'server',
          environment: 'node',
          include: [`tests/{${serverFolders}}/**/*.test.ts`],
          globalSetup: ['tests/setup/cluster.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'client',
          environment: 'jsdom',
          include: ['tests/client/**/*.test.{ts,tsx}'],
          setupFiles: ['tests/setup/client.ts'],
          testTimeout: 15_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'journeys',
          environment: 'node',
          include: ['tests/journeys/**/*.test.ts'],
          globalSetup: ['tests/setup/cluster.ts'],
          testTimeout: 180_000,
          hookTimeout: 120_000,
          // A browser, a server and a reader at once fill the machine: one journey at a time.
          fileParallelism: false,
          sequence: { groupOrder: 1 },
        },
      },
    ],
  },
});
