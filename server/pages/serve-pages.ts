import { readFile, stat } from 'node:fs/promises';
import path from 'node:path';
import { Router, type RequestHandler } from 'express';
import { matchPage } from '#shared/paths.ts';
import type { Deps } from '../deps.ts';
import { AppError } from '../http/problem.ts';
import { headOf } from './heads.ts';
import { headMarkup, type PageHead } from './page-head.ts';

const NOTHING_HERE: PageHead = {
  title: 'Nothing here · Spyhole',
  description: 'There is no such page.',
  canonical: null,
  image: null,
  type: 'website',
  jsonLd: null,
};

/**
 * Serves the client's one document for every page, with the title, description and preview tags of
 * that page as a visitor would see it. The same for everybody: no session is read. What a visitor
 * does not find is a 404; its author's browser gets the document with it and asks the API.
 */
export function servePages(deps: Deps, dist: string): Router {
  const router = Router();
  const template = templateReader(path.join(dist, 'index.html'));
  const page: RequestHandler = async (request, response) => {
    const html = await template();
    if (html === null) {
      throw new AppError('away', 'The pages are not built yet: run npm run build, or npm start.');
    }
    const match = matchPage(request.path);
    const head = match ? await headOf(deps.db, match.pattern, match.parts) : null;
    response
      .status(head ? 200 : 404)
      .set('Cache-Control', 'no-cache')
      .type('html')
      .send(
        html.replace(/<!--head-->[\s\S]*?<title>[\s\S]*?<\/title>/, () =>
          headMarkup(head ?? NOTHING_HERE, deps.config.publicUrl),
        ),
      );
  };
  router.get('/robots.txt', (_request, response) => {
    response
      .type('text/plain')
      .send(
        'User-agent: *\nDisallow: /api/\nDisallow: /admin/\nDisallow: /write\nDisallow: /desk\n',
      );
  });
  router.get('/{*path}', page);
  router.use(() => {
    throw new AppError('not-found');
  });
  return router;
}

/** Reads the built document once, and again when a new build has replaced it. */
function templateReader(file: string): () => Promise<string | null> {
  let kept: { html: string; builtAt: number } | null = null;
  return async () => {
    try {
      const { mtimeMs } = await stat(file);
      if (kept?.builtAt !== mtimeMs) {
        kept = { html: await readFile(file, 'utf8'), builtAt: mtimeMs };
      }
      return kept.html;
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
      throw error;
    }
  };
}
