import { randomBytes } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import type { INestApplication } from '@nestjs/common';
import express, { type NextFunction, type Request, type Response } from 'express';
import helmet from 'helmet';

/**
 * Security headers for everything, and the built page for every path that is not the API's. Styles that antd injects carry the nonce of
 * this answer; there is no inline script.
 */
export function servePage(app: INestApplication, staticDir: string | undefined, isHttps: boolean): void {
  app.use((_request: Request, response: Response, next: NextFunction) => {
    response.locals.nonce = randomBytes(16).toString('base64');
    next();
  });
  app.use(securityHeaders(isHttps));
  // answers are one reader's: no cache on the way or in the browser keeps them (ASVS 5.0 14.3.2)
  app.use('/api', (_request: Request, response: Response, next: NextFunction) => {
    response.setHeader('Cache-Control', 'no-store');
    next();
  });
  if (staticDir === undefined) return;
  const root = resolve(staticDir);
  const page = readFileSync(join(root, 'index.html'), 'utf8');
  app.use('/assets', express.static(join(root, 'assets'), { immutable: true, maxAge: '365d', fallthrough: false }));
  app.use(express.static(root, { index: false, maxAge: '1h' }));
  app.use((request: Request, response: Response, next: NextFunction) => {
    if (request.method !== 'GET' || /^\/(api|socket\.io)(\/|$)/.test(request.path)) {
      next();
      return;
    }
    response.setHeader('Cache-Control', 'no-store');
    response.type('html').send(page.replaceAll('__CSP_NONCE__', response.locals.nonce as string));
  });
}

function securityHeaders(isHttps: boolean) {
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'", (_request, response) => `'nonce-${(response as Response).locals.nonce as string}'`],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        ...(isHttps && { upgradeInsecureRequests: [] }),
      },
    },
    strictTransportSecurity: isHttps ? { maxAge: 31_536_000 } : false,
    referrerPolicy: { policy: 'no-referrer' },
    crossOriginEmbedderPolicy: false,
  });
}
