// The client's files, and its one page for every address of the product.
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import express, { type Express, type Request, type Response } from 'express';

const MARK = '<!--share-tags-->';

/** `tagsOf` gives the tags that a share link's preview is made of. */
export function servePages(
  app: Express,
  clientFolder: string,
  tagsOf: (token: string, req: Request) => Promise<string>,
): void {
  const indexFile = path.join(clientFolder, 'index.html');
  if (!existsSync(indexFile)) return;
  const page = readFileSync(indexFile, 'utf8');
  // built files carry their hash in the name
  app.use(
    '/assets',
    express.static(path.join(clientFolder, 'assets'), { immutable: true, maxAge: '1y', fallthrough: false }),
  );
  app.use(express.static(clientFolder, { index: false, maxAge: '1h' }));
  const send = (res: Response, tags: string): void => {
    res.setHeader('Content-Type', 'text/html; charset=utf-8');
    res.setHeader('Cache-Control', 'no-cache');
    res.send(page.replace(MARK, () => tags));
  };
  app.get('/s/:token', (req: Request<{ token: string }>, res, next) => {
    tagsOf(req.params.token, req as Request).then((tags) => send(res, tags), next);
  });
  app.get('/{*rest}', (_req, res) => send(res, ''));
}
