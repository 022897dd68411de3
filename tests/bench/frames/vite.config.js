import { fileURLToPath } from 'node:url';

import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

/** The page that measures frames; built afresh for every run. */
export default defineConfig({
  root: fileURLToPath(new URL('.', import.meta.url)),
  logLevel: 'error',
  plugins: [react()],
  resolve: {
    conditions: ['holdfast', 'module', 'browser', 'development|production'],
    dedupe: ['three', 'react', 'react-dom'],
  },
  build: { emptyOutDir: true, target: 'es2022', chunkSizeWarningLimit: 4000 },
});
