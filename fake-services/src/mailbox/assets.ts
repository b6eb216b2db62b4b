import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { pageScript } from './page-script.js';
import { pageStyle } from './page-style.js';

export interface Asset {
  contentType: string;
  body: string | Buffer;
}

const { resolve } = createRequire(import.meta.url);
const fontPath = /^\/fonts\/(ibm-plex-(?:sans|mono))-(400|600)\.woff2$/;

/** The files the page is made of; null for any other path. */
export async function findAsset(path: string): Promise<Asset | null> {
  if (path === '/mailbox.css') return { contentType: 'text/css; charset=utf-8', body: pageStyle };
  if (path === '/mailbox.js') return { contentType: 'text/javascript; charset=utf-8', body: pageScript };
  const [, family, weight] = fontPath.exec(path) ?? [];
  return family && weight ? findFont(family, weight) : null;
}

/** The product's own typeface where its package is installed; without it the page takes the system's. */
async function findFont(family: string, weight: string): Promise<Asset | null> {
  try {
    const file = resolve(`@fontsource/${family}/files/${family}-latin-${weight}-normal.woff2`);
    return { contentType: 'font/woff2', body: await readFile(file) };
  } catch {
    return null;
  }
}
