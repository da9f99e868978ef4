import type { Config } from './platform/config.ts';
import { openDatabase } from './platform/database.ts';
import type { Services } from './platform/http.ts';
import { createLogger } from './platform/logger.ts';
import { passwordService } from './platform/passwords.ts';
import { sessionService } from './platform/session.ts';
import { signInThrottle } from './platform/throttle.ts';

/** Opens the warehouse and sets up everything that routes need. */
export async function openServices(config: Config, now: () => Date = () => new Date()): Promise<Services> {
  const database = await openDatabase(config.dataDir);
  return {
    config,
    database,
    sessions: sessionService(database, config.origin),
    passwords: passwordService(),
    throttle: signInThrottle(database, config.signInFailures),
    logger: createLogger(config.logLevel),
    now,
  };
}
