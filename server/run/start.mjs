// npm start: from a fresh clone to a running product. The server itself migrates, seeds the demo and says its address.
import './setup.mjs';
import { run } from './child.mjs';

process.exitCode = await run(process.execPath, ['--import', 'tsx', 'server/main.ts']);
