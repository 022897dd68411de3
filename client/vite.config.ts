import { fileURLToPath } from 'node:url';

import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

const folder = fileURLToPath(new URL('.', import.meta.url));

export default defineConfig({
  root: folder,
  plugins: [react(), tailwindcss()],
  resolve: {
    conditions: ['holdfast', 'module', 'browser', 'development|production'],
    dedupe: ['three', 'react', 'react-dom'],
  },
  server: {
    host: '127.0.0.1',
    port: 4311,
    proxy: { '/api': { target: 'http://127.0.0.1:4310', changeOrigin: false } },
  },
  build: {
    outDir: '../dist/client',
    emptyOutDir: true,
    target: 'es2022',
    // No data: addresses, so that the content security policy can stay strict.
    assetsInlineLimit: 0,
    chunkSizeWarningLimit: 1000,
    rolldownOptions: {
      output: {
        codeSplitting: {
          groups: [
            // Before the others, which would else draw it in: every page would wait for three.
            {
              name: 'react',
              test: /node_modules[\\/](react|react-dom|scheduler|use-sync-external-store)[\\/]/,
              priority: 2,
            },
            {
              name: 'three',
              test: /node_modules[\\/](three|three-stdlib|@react-three)[\\/]/,
              priority: 1,
            },
          ],
        },
      },
    },
  },
});
