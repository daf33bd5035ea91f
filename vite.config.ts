import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

// One build for the client; the API is served by server/ on the same port.
export default defineConfig({
  plugins: [react(), tailwindcss()],
  build: {
    outDir: 'dist',
    sourcemap: false,
    rollupOptions: {
      input: { index: 'index.html', 'service-worker': 'src/service-worker.ts' },
      output: {
        // The service worker must keep one address over builds, at the root of its scope.
        entryFileNames: (chunk) => (chunk.name === 'service-worker' ? 'service-worker.js' : 'assets/[name]-[hash].js'),
      },
    },
  },
  test: {
    include: ['{shared,server,src,mocks,tests}/**/*.test.{ts,tsx}'],
    exclude: ['**/node_modules/**', 'dist/**'],
    globalSetup: ['tests/support/global-setup.ts'],
    testTimeout: 30_000,
    hookTimeout: 60_000,
    maxWorkers: 2,
  },
});
