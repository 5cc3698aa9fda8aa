import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  plugins: [react(), tailwindcss()],
  // One copy of Yjs: a second one loses `instanceof` and with it the document.
  resolve: { dedupe: ['yjs', 'react', 'react-dom'] },
  build: { outDir: 'dist/client', assetsInlineLimit: 0, sourcemap: false },
  worker: { format: 'es' },
  test: {
    include: ['tests/**/*.test.{ts,tsx}'],
    environment: 'node',
  },
});
