import { defineConfig } from 'vitest/config';
import { resolve } from 'node:path';
import react from '@vitejs/plugin-react';

// The page's own root is src/page, so that the top level of the repository holds no HTML of its own.
export default defineConfig({
  root: resolve(import.meta.dirname, 'src/page'),
  base: './',
  plugins: [react()],
  // The first script may weigh 330 kB compressed, about three times that as it is counted here.
  build: { outDir: '../../dist', emptyOutDir: true, target: 'es2022', chunkSizeWarningLimit: 990 },
  worker: { format: 'es' },
  server: { fs: { allow: ['../..'] } },
  test: {
    root: import.meta.dirname,
    environment: 'node',
    include: ['tests/**/*.test.ts'],
    exclude: ['node_modules/**', 'dist/**'],
    testTimeout: 60_000,
  },
});
