// npm run dev: pages and API under one address, both reloading on change.
import { exitOf, launch, passSignals } from './child.mjs';
import { install } from './install.mjs';
import { say } from './place.mjs';

await install();

// The pages take the address that `npm start` would have; the API stands one port above and is reached through it.
const port = Number(process.env.PORT ?? 4173);
const apiPort = String(port + 1);
const origin = `http://127.0.0.1:${port}`;
say(`Pages with reload: ${origin}`);

const children = [
  launch(process.execPath, ['node_modules/tsx/dist/cli.mjs', 'watch', '--clear-screen=false', 'server/main.ts'], {
    PORT: apiPort,
    ORIGIN: process.env.ORIGIN ?? origin,
  }),
  launch(process.execPath, ['node_modules/vite/bin/vite.js', '--port', String(port), '--clearScreen', 'false'], {
    API_PORT: apiPort,
  }),
];
passSignals(children);

// One without the other is of no use: the first to end takes the other with it.
process.exitCode = await Promise.race(children.map(exitOf));
for (const child of children) child.kill('SIGTERM');
