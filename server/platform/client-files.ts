import { existsSync } from 'node:fs';
import path from 'node:path';
import express, { type RequestHandler } from 'express';

const folder = path.resolve(import.meta.dirname, '../../dist');

/** Serves the built client: named-by-content files for ever, everything else as the one page. */
export function clientFiles(): RequestHandler[] {
  const page = path.join(folder, 'index.html');
  return [
    express.static(folder, {
      index: false,
      setHeaders(res, file) {
        const isNamedByContent = file.startsWith(path.join(folder, 'assets'));
        res.setHeader('Cache-Control', isNamedByContent ? 'public, max-age=31536000, immutable' : 'no-cache');
      },
    }),
    (req, res, next) => {
      const wantsPage =
        (req.method === 'GET' || req.method === 'HEAD') && !req.path.startsWith('/api/') && !path.extname(req.path);
      if (!wantsPage || !existsSync(page)) return next();
      res.setHeader('Cache-Control', 'no-cache');
      res.sendFile(page);
    },
  ];
}
