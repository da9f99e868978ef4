// All that must stand before the product runs: packages, SQLite, built pages.
import { build } from './build.mjs';
import { install } from './install.mjs';

await install();
await build();
