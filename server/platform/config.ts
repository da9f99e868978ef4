import path from 'node:path';
import { z } from 'zod';

const flag = z.stringbool().optional();

const environmentSchema = z.object({
  PORT: z.coerce.number().int().min(0).max(65_535).default(4173),
  HOST: z.string().min(1).default('127.0.0.1'),
  DATA_DIR: z.string().min(1).default('./data'),
  ORIGIN: z.url().optional(),
  DEMO: flag,
  TRUST_PROXY: z.string().optional(),
  NODE_ENV: z.string().optional(),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
  IMPORT_MAX_BYTES: z.coerce
    .number()
    .int()
    .positive()
    .default(200 * 1024 * 1024),
  SIGN_IN_FAILURES: z.coerce.number().int().positive().default(10),
});

export interface Config {
  readonly port: number;
  readonly host: string;
  /** Everything that the server writes lies below it. Absolute. */
  readonly dataDir: string;
  /** The outside address, if one is configured; an https one turns on Secure cookies. */
  readonly origin: string | null;
  /** Fill an empty database with the demo shop? */
  readonly wantsDemo: boolean;
  readonly trustProxy: string | null;
  readonly logLevel: string;
  readonly importMaxBytes: number;
  /** Failed sign-ins allowed per account and source in a quarter of an hour. */
  readonly signInFailures: number;
}

/** Reads the environment; throws with the name of the variable that cannot be used. */
export function readConfig(environment: NodeJS.ProcessEnv): Config {
  const parsed = environmentSchema.safeParse(environment);
  if (!parsed.success) throw new Error(`Environment: ${z.prettifyError(parsed.error)}`);
  const env = parsed.data;
  const isLoopback = ['127.0.0.1', 'localhost', '::1'].includes(env.HOST);
  const isProduction = env.NODE_ENV === 'production';
  return {
    port: env.PORT,
    host: env.HOST,
    dataDir: path.resolve(env.DATA_DIR),
    origin: env.ORIGIN ? new URL(env.ORIGIN).origin : null,
    wantsDemo: !isProduction && (env.DEMO ?? isLoopback),
    trustProxy: env.TRUST_PROXY ?? null,
    logLevel: env.LOG_LEVEL,
    importMaxBytes: env.IMPORT_MAX_BYTES,
    signInFailures: env.SIGN_IN_FAILURES,
  };
}
