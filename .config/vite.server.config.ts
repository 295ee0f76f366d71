// Builds the server, its worker threads and its commands for Node.
import fs from 'node:fs';
import { defineConfig } from 'vite';

const ENTRIES = {
  main: 'server/main.ts',
  settings: 'server/cli/settings.ts',
  migrate: 'server/db/migrate.ts',
  seed: 'server/db/seed.ts',
  'dry-fit-worker': 'server/dry-fits/worker.ts',
  'mesh-worker': 'server/meshes/worker.ts',
};

export default defineConfig({
  publicDir: false,
  build: {
    ssr: true,
    outDir: 'dist/server',
    emptyOutDir: true,
    target: 'node20',
    sourcemap: true,
    minify: false,
    rolldownOptions: {
      input: Object.fromEntries(Object.entries(ENTRIES).filter(([, file]) => fs.existsSync(file))),
      output: { entryFileNames: '[name].js', chunkFileNames: 'chunks/[name]-[hash].js' },
    },
  },
});
