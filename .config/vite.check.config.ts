// Builds the command line check into one file with everything in it, so that it starts at once.
import { defineConfig } from 'vite';

export default defineConfig({
  publicDir: false,
  ssr: { noExternal: true },
  build: {
    ssr: 'server/cli/check.ts',
    outDir: 'dist/check',
    emptyOutDir: true,
    target: 'node20',
    minify: true,
    rolldownOptions: { output: { entryFileNames: 'check.js', inlineDynamicImports: true } },
  },
});
