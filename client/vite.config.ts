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
          // Without this a group draws in what it uses, React too, and every page waits for three.
          includeDependenciesRecursively: false,
          groups: [
            { name: 'three', test: /node_modules[\\/](three|three-stdlib|@react-three)[\\/]/ },
            {
              name: 'expressions',
              test: /node_modules[\\/](mathjs|decimal\.js|fraction\.js)[\\/]/,
            },
          ],
        },
      },
    },
  },
});
