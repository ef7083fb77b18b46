import { type NestExpressApplication } from '@nestjs/platform-express';
import express, { type Request, type Response } from 'express';
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

const built = fileURLToPath(new URL('../../../dashboard/dist', import.meta.url));

/**
 * Serves the built dashboard: files with a hash in their name for a year, the page itself never from a cache,
 * and the page for every address that is neither a file nor the API's, so that a deep link opens.
 */
export function serveDashboard(app: NestExpressApplication): void {
  const page = join(built, 'index.html');
  app.use(
    '/assets',
    express.static(join(built, 'assets'), {
      immutable: true,
      maxAge: '1y',
      index: false,
      fallthrough: false,
    }),
  );
  app.use(express.static(built, { index: false, maxAge: '1h' }));
  app.use((request: Request, response: Response, next: (error?: unknown) => void) => {
    const wantsPage = request.method === 'GET' && !/^\/api(\/|$)/.test(request.path);
    if (!wantsPage || !existsSync(page)) return next();
    response.setHeader('Cache-Control', 'no-cache');
    response.sendFile(page);
  });
}
