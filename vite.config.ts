import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

export default defineConfig(({ isSsrBuild }) => ({
  plugins: [react(), tailwindcss()],
  // One copy of Yjs: a second one loses `instanceof` and with it the document.
  resolve: { dedupe: ['yjs', 'react', 'react-dom'] },
  build: isSsrBuild
    ? {
        outDir: 'dist/server',
        // The solving threads begin at a file of their own.
        rolldownOptions: { input: { index: 'server/index.ts', 'solve.worker': 'server/solving/solve.worker.ts' } },
      }
    : { outDir: 'dist/client', assetsInlineLimit: 0, sourcemap: false },
  worker: { format: 'es' },
  test: {
    include: ['tests/**/*.test.{ts,tsx}'],
    environment: 'node',
    // A busy machine takes its time to start a thread and solve its first circuits.
    testTimeout: 30_000,
  },
}));
