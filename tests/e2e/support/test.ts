import { test as base, expect } from '@playwright/test';
import { type RunningServer, startServer } from './server.ts';

interface Own {
  /** A server with empty books, one per worker and shared by its tests: each test signs up its own shop. */
  emptyServer: RunningServer;
  /** A server with the demo shop, one per worker: its tests leave no entry and no hours behind. */
  demoServer: RunningServer;
}

/** Playwright's test with our servers; addresses are relative to the empty server. Any complaint in the console fails it. */
export const test = base.extend<object, Own>({
  emptyServer: [served(false), { scope: 'worker' }],
  demoServer: [served(true), { scope: 'worker', timeout: 120_000 }],
  baseURL: async ({ emptyServer }, provide) => provide(emptyServer.origin),
  page: async ({ page }, provide) => {
    const complaints: string[] = [];
    page.on('pageerror', (error) => complaints.push(error.message));
    page.on('console', (message) => {
      // Answers such as 401 are the API's business, and tests look at what the page makes of them.
      const isAnswer = message.text().startsWith('Failed to load resource');
      if (['error', 'warning'].includes(message.type()) && !isAnswer) complaints.push(message.text());
    });
    await provide(page);
    expect(complaints, 'complaints in the browser console').toEqual([]);
  },
});

/** The same on the demo server. */
export const demoTest = test.extend({
  baseURL: async ({ demoServer }, provide) => provide(demoServer.origin),
});

export { expect };

function served(demo: boolean) {
  // oxlint-disable-next-line no-empty-pattern -- Playwright insists on a pattern here
  return async ({}: object, provide: (server: RunningServer) => Promise<void>) => {
    const server = await startServer({ demo });
    await provide(server);
    await server.stop();
  };
}
