import { randomUUID } from 'node:crypto';
import pino, { type Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/** JSON lines on standard output; no cookies, bodies or tokens. */
export function createLogger(level: string): Logger {
  return pino({ level });
}

/** One line for each answered API request, with its id; quiet for what went well and was only read. */
export function requestLog(logger: Logger) {
  return pinoHttp({
    logger,
    genReqId: () => randomUUID(),
    serializers: {
      req: (req: { id: string; method: string; url: string }) => ({
        id: req.id,
        method: req.method,
        path: req.url.split('?')[0],
      }),
      res: (res: { statusCode: number }) => ({ status: res.statusCode }),
    },
    customLogLevel: (req, res, error) => {
      if (error || res.statusCode >= 500) return 'error';
      return req.method === 'GET' && res.statusCode < 400 ? 'debug' : 'info';
    },
  });
}
