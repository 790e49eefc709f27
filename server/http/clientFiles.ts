import { existsSync } from 'node:fs';
import path from 'node:path';
import express, { Router } from 'express';
import type { Response } from 'express';

/**
 * The built client. Files under /assets have a hash in their names and never change; every other address is a page
 * of the client and gets index.html.
 *
 * @param directory dist/client
 */
export function clientFiles(directory: string): Router {
  const router = Router();
  router.use(express.static(directory, { index: false, setHeaders: setCaching }));
  router.get('/{*splat}', (request, response) => {
    if (/\.\w+$/.test(request.path)) {
      response.status(404).type('text/plain').send('There is no such file.\n');
      return;
    }
    const page = path.join(directory, 'index.html');
    if (!existsSync(page)) {
      response
        .status(503)
        .type('text/plain')
        .send('The client is not built: run "npm start", or "npm run dev".\n');
      return;
    }
    if (isPrivate(request.path)) response.set('X-Robots-Tag', 'noindex, nofollow');
    response.sendFile(page, { cacheControl: false, headers: { 'Cache-Control': 'no-cache' } });
  });
  return router;
}

/** Whoever has the address may look; a search engine shall not hand it out. */
const isPrivate = (pathname: string) => /^\/(share|reset-password)\//.test(pathname);

function setCaching(response: Response, file: string): void {
  const hashed = file.split(path.sep).includes('assets');
  response.set('Cache-Control', hashed ? 'public, max-age=31536000, immutable' : 'no-cache');
}
