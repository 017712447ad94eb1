import { existsSync } from 'node:fs';
import path from 'node:path';
import {
  static as serveFiles,
  type NextFunction,
  type Request,
  type RequestHandler,
  type Response,
} from 'express';

/** The part of an application this needs. */
interface PageServer {
  use(handler: RequestHandler): unknown;
}

/**
 * Serves the built user interface. Files under `assets` carry a hash in their name and are kept for good; any other
 * address that could be a page gets the one page, whose router takes it from there. The interface under `/api` and
 * missing assets never do.
 */
export function serveUserInterface(app: PageServer, folder: string): void {
  const page = path.join(folder, 'index.html');
  const files = serveFiles(folder, { index: false, setHeaders: setCaching });
  app.use((request: Request, response: Response, next: NextFunction) => {
    // No look at the disk for what is never a file: it was a fifth of the cost of a small answer.
    if (isInterface(request)) next();
    else files(request, response, next);
  });
  app.use((request: Request, response: Response, next: NextFunction) => {
    if (!isPageAddress(request) || !existsSync(page)) {
      next();
      return;
    }
    response.setHeader('Cache-Control', 'no-cache');
    response.sendFile(page);
  });
}

const isInterface = (request: Request): boolean => /^\/api(\/|$)/.test(request.path);

function isPageAddress(request: Request): boolean {
  if (request.method !== 'GET' && request.method !== 'HEAD') return false;
  if (isInterface(request) || /^\/assets(\/|$)/.test(request.path)) return false;
  return path.extname(request.path) === '';
}

function setCaching(response: { setHeader(name: string, value: string): unknown }, file: string): void {
  const isHashed = path.basename(path.dirname(file)) === 'assets';
  response.setHeader('Cache-Control', isHashed ? 'public, max-age=31536000, immutable' : 'no-cache');
}
