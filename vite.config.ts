import react from '@vitejs/plugin-react';
import tailwindcss from '@tailwindcss/vite';
import { defineConfig } from 'vitest/config';

/** `npm run dev` sets API_PORT: Vite serves the client and passes the rest on to the server. */
const apiOrigin = `http://127.0.0.1:${process.env['API_PORT'] ?? '3001'}`;
const proxied = ['/api', '/media', '/health'];

export default defineConfig({
  plugins: [react(), tailwindcss()],
  server: {
    host: '127.0.0.1',
    proxy: Object.fromEntries(proxied.map((path) => [path, { target: apiOrigin, xfwd: true }])),
  },
  // No inlined assets: the content security policy allows fonts and pictures from files only.
  build: {
    outDir: 'dist',
    sourcemap: false,
    target: 'es2022',
    manifest: true,
    assetsInlineLimit: 0,
  },
  test: {
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          include: ['tests/unit/**/*.test.ts'],
          environment: 'node',
          // Only against hanging: nothing here measures time on the clock.
          testTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'pages',
          include: ['tests/pages/**/*.test.tsx'],
          environment: 'jsdom',
          testTimeout: 60_000,
          setupFiles: ['tests/support/pages-setup.ts'],
        },
      },
      {
        extends: true,
        test: {
          name: 'api',
          include: ['tests/api/**/*.test.ts', 'tests/migrations/**/*.test.ts'],
          environment: 'node',
          globalSetup: ['tests/support/global-setup.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
          maxWorkers: 2,
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          include: ['tests/browser/**/*.test.ts'],
          environment: 'node',
          globalSetup: ['tests/browser/global-setup.ts'],
          testTimeout: 180_000,
          hookTimeout: 180_000,
          maxWorkers: 1,
        },
      },
    ],
  },
});
