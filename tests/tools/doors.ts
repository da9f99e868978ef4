import { posix } from 'node:path';

/**
 * Who may import whom. A room is a folder of ours; `features/x` stands for one feature, and a feature may
 * import its own files but never another's. First match from the top.
 */
interface Door {
  readonly room: RegExp;
  /** Rooms that it may import besides itself. */
  readonly rooms: readonly RegExp[];
  /** Packages and Node's own modules; all where not said. */
  readonly packages?: readonly RegExp[];
}

const SHARED = /^shared$/;
const SERVER_ONLY =
  /^(node:|express|knex|better-sqlite3|lucia|multer|pino|helmet|compression|iconv-lite|@node-rs\/|@stdlib\/)/;
const CLIENT_ONLY = /^(react|@tanstack\/|@base-ui\/|@visx\/|lucide-react|@hookform\/)/;

const DOORS: readonly Door[] = [
  { room: SHARED, rooms: [], packages: [/^zod$/] },
  { room: /^server\/domain$/, rooms: [SHARED], packages: [/^simple-statistics$/, /^@stdlib\//] },
  { room: /^server\/platform$/, rooms: [SHARED] },
  { room: /^server\/books$/, rooms: [/^server\/(domain|platform)$/, SHARED] },
  { room: /^server\/features\//, rooms: [/^server\/(books|domain|platform)$/, SHARED] },
  { room: /^server\/run$/, rooms: [], packages: [/^node:/] },
  // app.ts and main.ts put the server together; the migrations and the demo are run from there.
  { room: /^server$/, rooms: [/^server\//, /^(migrations|seeds)$/, SHARED] },
  { room: /^src\/(lib|ui|charts)$/, rooms: [SHARED] },
  { room: /^src\/features\//, rooms: [/^src\/(lib|ui|charts)$/, SHARED] },
  { room: /^src(\/(app|pages))?$/, rooms: [/^src(\/|$)/, SHARED] },
  { room: /^(migrations|seeds)$/, rooms: [/^(server|migrations|seeds)(\/|$)/, SHARED] },
  { room: /^tests$/, rooms: [/^(server|src|migrations|seeds)(\/|$)/, SHARED] },
];

/** Room of a file, from its path below the top folder; null for a file that lies in no room. */
export function roomOf(path: string): string | null {
  const [first = '', second = '', third = ''] = path.split('/');
  if (second === '') return null;
  if (['shared', 'migrations', 'seeds', 'tests'].includes(first)) return first;
  if (first !== 'server' && first !== 'src') return null;
  if (third === '') return first;
  return second === 'features' ? `${first}/features/${third}` : `${first}/${second}`;
}

/** What is wrong with `path` importing `name`, in one sentence; null when nothing is. */
export function breach(path: string, name: string): string | null {
  const from = roomOf(path);
  const door = DOORS.find(({ room }) => from !== null && room.test(from));
  if (from === null || !door) return `${path} lies in no room of the house`;
  const isOurs = name.startsWith('.') || name.startsWith('#shared/');
  return isOurs ? roomBreach(path, from, door, name) : packageBreach(path, from, door, name);
}

function roomBreach(path: string, from: string, door: Door, name: string): string | null {
  const target = name.startsWith('#') ? name.slice(1) : posix.join(posix.dirname(path), name);
  const to = roomOf(target);
  if (posix.extname(target) === '') return `${path}: "${name}" lacks its extension`;
  if (to === from) return name.startsWith('#') ? `${path}: inside shared, import "${name}" by a relative path` : null;
  if (to === 'shared' && !name.startsWith('#')) return `${path}: import "${name}" through #shared/`;
  if (to !== null && door.rooms.some((room) => room.test(to))) return null;
  return `${path}: ${from} may not import ${to ?? target}`;
}

function packageBreach(path: string, from: string, door: Door, name: string): string | null {
  const isAllowed = door.packages?.some((allowed) => allowed.test(name)) ?? true;
  const isForeign =
    (from.startsWith('server') && CLIENT_ONLY.test(name)) || (from.startsWith('src') && SERVER_ONLY.test(name));
  if (!isAllowed || isForeign) return `${path}: ${from} may not import ${name}`;
  // The sign-in library is no longer kept up, so that it can be replaced it stays behind one file.
  if (name === 'lucia' && path !== 'server/platform/session.ts')
    return `${path}: only server/platform/session.ts may import lucia`;
  return null;
}
