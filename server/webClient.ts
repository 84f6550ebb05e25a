import { existsSync } from 'node:fs';
import path from 'node:path';
import express, { type Express } from 'express';

/** Serves the exported client. Hashed files may be kept for a year; every other address answers index.html. */
export function serveClient(app: Express, folder: string): void {
  const root = path.resolve(folder);
  const immutable = { immutable: true, maxAge: '365d', fallthrough: false } as const;
  app.use('/_expo', express.static(path.join(root, '_expo'), immutable));
  app.use('/assets', express.static(path.join(root, 'assets'), immutable));
  app.use(express.static(root, { index: false, maxAge: 0 }));
  app.get('/{*path}', (request, response, next) => {
    const index = path.join(root, 'index.html');
    if (request.path.startsWith('/api/') || !existsSync(index)) {
      next();
      return;
    }
    response.setHeader('Cache-Control', 'no-cache');
    response.sendFile(index);
  });
}
