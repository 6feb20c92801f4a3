import { existsSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import express, { type RequestHandler, Router } from 'express';
import { AppError } from '#server/errors.ts';
import { onlyMethods } from './error-handler.ts';

const YEAR_S = 31_536_000;

/** The built client: hashed assets cached for ever, the page itself never, with this answer's nonce and the site's base in it.
 *  @param folder where the build put it @param base path of the site with a closing slash ('/' or '/bench/') */
export function clientPages(folder: string, base: string): Router {
  const router = Router();
  const page = pageReader(folder, base);
  const files = {
    index: false,
    redirect: false,
    fallthrough: true,
    dotfiles: 'ignore',
  } as const;
  router.use(
    '/assets',
    express.static(join(folder, 'assets'), {
      ...files,
      immutable: true,
      maxAge: YEAR_S * 1000,
    }),
  );
  router.use('/assets', (_request, _response, next) => next('router'));
  router.get('/index.html', sendPage(page));
  router.use(express.static(folder, { ...files, maxAge: 0 }));
  router.get('/{*splat}', sendPage(page));
  router.all('/{*splat}', onlyMethods('GET', 'HEAD'));
  return router;
}

function sendPage(page: () => string | null): RequestHandler {
  return (_request, response, next) => {
    const html = page();
    if (html === null) {
      next(
        new AppError('not-found', {
          message: 'The client has not been built: run npm start, or npm run build.',
        }),
      );
      return;
    }
    response.setHeader('Cache-Control', 'no-store');
    response.type('html').send(html.replaceAll('__CSP_NONCE__', response.locals.nonce as string));
  };
}

/** Reads index.html again only when it changed. */
function pageReader(folder: string, base: string): () => string | null {
  const file = join(folder, 'index.html');
  let kept: { changed: number; html: string } | null = null;
  return () => {
    if (!existsSync(file)) return null;
    const changed = statSync(file).mtimeMs;
    if (kept?.changed !== changed) kept = { changed, html: withBase(readFileSync(file, 'utf8'), base) };
    return kept.html;
  };
}

/** Puts the site's base into the page, first thing in the head, so that relative addresses work under every path.
 *  A base element that is there already gives way. */
export function withBase(html: string, base: string): string {
  const element = `<base href="${base.replaceAll('&', '&amp;').replaceAll('"', '&quot;')}">`;
  return html.replace(/<base\b[^>]*>/i, '').replace(/<head\b[^>]*>/i, (head) => `${head}${element}`);
}
