import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import type { Plugin, Rolldown } from 'vite';
import { defineConfig } from 'vitest/config';

const PUBLIC = 'src/public';
/** Pages that open without signal; the files of all others are left to the network. */
const OFFLINE_PAGES = /\/src\/pages\/pre-bids?\.tsx$/;

export default defineConfig({
  plugins: [react(), tailwindcss(), offlineWorker()],
  publicDir: PUBLIC,
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

/** Writes the worker that keeps the pre-bid sheet's pages, with the list of the files that this build made for them. */
function offlineWorker(): Plugin {
  return {
    name: 'offline-worker',
    apply: 'build',
    enforce: 'post',
    generateBundle(_options, bundle) {
      const files = offlineFiles(bundle);
      const hash = createHash('sha256').update(files.join());
      const page = bundle['index.html'];
      if (page?.type === 'asset') hash.update(page.source);
      const asIs = readdirSync(PUBLIC);
      for (const name of asIs) hash.update(readFileSync(`${PUBLIC}/${name}`));
      const build = JSON.stringify(hash.digest('hex').slice(0, 16));
      const list = JSON.stringify([...files, ...asIs].map((name) => `/${name}`));
      const worker = readFileSync('src/app/offline-worker.js', 'utf8');
      const source = `const BUILD = ${build};\nconst FILES = ${list};\n${worker}`;
      this.emitFile({ type: 'asset', fileName: 'offline-worker.js', source });
    },
  };
}

/** Styles and fonts, the first script, and all that it leads to but other pages. */
function offlineFiles(bundle: Rolldown.OutputBundle): string[] {
  const files = new Set(Object.keys(bundle).filter((name) => /\.(css|woff2)$/.test(name)));
  const follow = (name: string) => {
    const chunk = bundle[name];
    if (chunk?.type !== 'chunk' || files.has(name)) return;
    files.add(name);
    for (const next of chunk.imports) follow(next);
    for (const next of chunk.dynamicImports) if (isForOffline(bundle[next])) follow(next);
  };
  for (const [name, chunk] of Object.entries(bundle)) if (chunk.type === 'chunk' && chunk.isEntry) follow(name);
  return [...files].sort();
}

function isForOffline(chunk: Rolldown.OutputBundle[string] | undefined): boolean {
  const module = chunk?.type === 'chunk' ? (chunk.facadeModuleId ?? '') : '';
  return !module.includes('/src/pages/') || OFFLINE_PAGES.test(module);
}
