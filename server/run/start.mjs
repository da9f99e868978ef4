// npm start: from a fresh clone to a running product. The server itself migrates, seeds the demo and says its address.
import './setup.mjs';
import { run } from './child.mjs';

// Where memory is plenty, Node lets garbage pile up; with a limit named, it stays under 300 MB in all.
const memory = ['--max-old-space-size=512', '--max-semi-space-size=4'];
process.exitCode = await run(process.execPath, [...memory, '--import', 'tsx', 'server/main.ts']);
