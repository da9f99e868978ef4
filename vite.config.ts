import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  plugins: [react(), tailwindcss()],
  publicDir: 'src/public',
  build: {
    manifest: true,
    target: 'baseline-widely-available',
    // Fonts and pictures stay files: the content policy allows no data: addresses for them.
    assetsInlineLimit: 0,
  },
  server: {
    host: '127.0.0.1',
    strictPort: true,
    proxy: { '/api': `http://127.0.0.1:${process.env['API_PORT'] ?? '4174'}` },
  },
  test: {
    // The machines that run this have two cores.
    maxWorkers: 2,
    allowOnly: false,
    // A busy machine is no failure; a test that hangs still ends.
    testTimeout: 30_000,
    hookTimeout: 60_000,
    projects: [
      {
        extends: true,
        test: {
          name: 'server',
          environment: 'node',
          include: ['tests/**/*.test.ts'],
          exclude: ['tests/client/**', 'tests/e2e/**'],
        },
      },
      {
        extends: true,
        test: {
          name: 'client',
          environment: 'jsdom',
          include: ['tests/client/**/*.test.{ts,tsx}'],
          setupFiles: ['tests/support/client-setup.ts'],
        },
      },
    ],
  },
});
