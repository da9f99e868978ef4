import type { RequestHandler } from 'express';
import { ProblemError } from './problems.ts';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Refuses writes that another site made the browser send: by Sec-Fetch-Site, and by an Origin other than the
 * configured one (or, where none is configured, than the host that was asked).
 */
export function sameOriginWrites(configured: string | null): RequestHandler {
  return (req, _res, next) => {
    if (SAFE.has(req.method)) return next();
    const site = req.headers['sec-fetch-site'];
    const origin = req.headers.origin;
    const isOwn = origin === undefined || (configured ? origin === configured : hostOf(origin) === req.headers.host);
    if ((site && site !== 'same-origin' && site !== 'none') || !isOwn) {
      throw new ProblemError(403, { detail: 'This was sent from another site.' });
    }
    next();
  };
}

function hostOf(origin: string): string | null {
  return URL.canParse(origin) ? new URL(origin).host : null;
}
