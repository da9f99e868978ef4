import { createServer } from 'node:http';
import { createApp } from './app.ts';
import { recoverImports } from './features/imports/background.ts';
import { readConfig } from './platform/config.ts';
import { endStreams } from './platform/event-stream.ts';
import { openServices } from './services.ts';

const config = readConfig(process.env);
const services = await openServices(config);
const { database, sessions, logger } = services;

await recoverImports(services);
// Loaded only where it is wanted: the demo's words and parameters are no part of a real shop's server.
const signIns = config.wantsDemo ? await (await import('../seeds/demo.ts')).seedDemo(services) : null;

const server = createServer(
  { headersTimeout: 10_000, requestTimeout: 300_000, connectionsCheckingInterval: 5000 },
  createApp(services),
);
server.listen(config.port, config.host, () => {
  const address = server.address();
  const port = typeof address === 'object' && address ? address.port : config.port;
  const lines = [`Panelgap is open at http://${config.host}:${port}`];
  if (signIns) {
    lines.push('', `Demo sign-ins, password ${signIns.password}:`);
    for (const person of signIns.people) lines.push(`  ${person.role.padEnd(11)} ${person.email}`);
  }
  process.stdout.write(`${lines.join('\n')}\n`);
});
server.on('error', (error) => {
  logger.fatal({ err: error }, `cannot listen on ${config.host}:${config.port}`);
  process.exit(1);
});

const sweep = setInterval(() => {
  sessions.sweep().catch((error: unknown) => logger.error({ err: error }, 'sweeping old sessions failed'));
}, 3_600_000);

let isStopping = false;

/** Stops taking requests, finishes those under way, and closes the books; ten seconds at most. */
function stop(): void {
  if (isStopping) return;
  isStopping = true;
  clearInterval(sweep);
  setTimeout(() => process.exit(1), 10_000).unref();
  server.close(() => {
    database.close().then(
      () => process.exit(0),
      () => process.exit(1),
    );
  });
  endStreams();
  server.closeIdleConnections();
}
process.on('SIGTERM', stop);
process.on('SIGINT', stop);
process.on('unhandledRejection', (error) => {
  logger.fatal({ err: error }, 'unhandled rejection');
  process.exit(1);
});
