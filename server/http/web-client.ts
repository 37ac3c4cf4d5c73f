import path from 'node:path';
import express, { type RequestHandler, Router } from 'express';

const HASHED_NAME = /[.-][0-9a-f]{32}\./;

/** Serves the exported web client; every other path of ours opens its first page, which routes by itself. */
export function webClient(root: string): Router {
  const router = Router();
  router.use(
    express.static(root, {
      index: false,
      setHeaders: (response, file) => {
        response.set(
          'Cache-Control',
          HASHED_NAME.test(path.basename(file)) ? 'public, max-age=31536000, immutable' : 'no-cache',
        );
      },
    }),
  );
  router.use(['/_expo', '/assets'], missing);
  router.get('/{*page}', (_, response) => {
    response.set('Cache-Control', 'no-cache').sendFile('index.html', { root: path.resolve(root) });
  });
  return router;
}

const missing: RequestHandler = (_, response) => void response.status(404).type('text').send('Not found');
