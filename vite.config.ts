/// <reference types="vitest/config" />
import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

export default defineConfig({
  plugins: [react(), tailwindcss()],
  build: { outDir: 'dist/client', emptyOutDir: true, target: 'es2023' },
  worker: { format: 'es' },
  // `npm run dev`: pages come from here, the API from the server beside it
  server: { proxy: { '/api': `http://127.0.0.1:${process.env['PORT'] ?? '4180'}` } },
  test: {
    testTimeout: 30_000,
    hookTimeout: 60_000,
    projects: [
      {
        extends: true,
        test: {
          name: 'server',
          include: ['tests/server/**/*.test.ts'],
          globalSetup: 'tests/server/global-setup.ts',
        },
      },
      {
        extends: true,
        test: {
          name: 'pure',
          include: ['tests/**/*.test.ts', 'tests/**/*.test.tsx'],
          exclude: ['tests/server/**', 'tests/bench/**', 'node_modules/**'],
        },
      },
    ],
  },
});
